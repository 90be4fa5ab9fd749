/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.settings;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SettingsReaderTests {

  @Test
  void everyKeyIsRead() {
    SettingsReader.Result result =
        SettingsReader.parse(
            "spanloom.settings",
            """
            # the station's own thresholds
            digits.wanted = 4      # results are read to four digits
            digits.least = 2
            window.condition = 1e6
            basis.accuracy = 1e-9
            residual.limit = 1e-6
            """);
    assertEquals(List.of(), result.problems());
    assertEquals(4, result.settings().digitsWanted(1e-6));
    assertEquals(2, result.settings().digitsLeast());
    assertEquals(1e6, result.settings().windowCondition());
    assertEquals(1e-9, result.settings().basisAccuracy());
    assertEquals(1e-6, result.settings().residualLimit());
  }

  @Test
  void withoutAWordTheDigitsAreThoseOfTheAccuracy() {
    assertEquals(6, Settings.DEFAULTS.digitsWanted(1e-6), 1e-12);
    assertEquals(9, Settings.DEFAULTS.digitsWanted(1e-9), 1e-12);
  }

  @Test
  void aLineThatCannotBeReadIsNamedAndTheOthersCount() {
    SettingsReader.Result result =
        SettingsReader.parse(
            "spanloom.settings", "digit.wanted = 4\nwindow.condition = much\ndigits.least = 2\n");
    assertEquals(2, result.problems().size());
    assertTrue(
        result.problems().get(0).startsWith("spanloom.settings:1: 'digit.wanted = 4' is not a"));
    assertEquals(
        "spanloom.settings:2: window.condition must be a number from 10.0 to 1.0E15",
        result.problems().get(1));
    assertEquals(2, result.settings().digitsLeast());
  }

  @Test
  void theNearestFileAboveAModelHolds(@TempDir Path folder) throws IOException {
    Path outer = Files.writeString(folder.resolve(Settings.FILE_NAME), "digits.least = 3\n");
    Path inner = Files.createDirectories(folder.resolve("inner/deep"));
    assertEquals(Optional.of(outer.toAbsolutePath()), SettingsReader.find(inner.resolve("a.span")));
    Path nearer =
        Files.writeString(
            folder.resolve("inner").resolve(Settings.FILE_NAME), "digits.least = 2\n");
    assertEquals(
        Optional.of(nearer.toAbsolutePath()), SettingsReader.find(inner.resolve("a.span")));
  }

  @Test
  void aFileThatIsNotTextIsRefused(@TempDir Path folder) throws IOException {
    Path file = Files.write(folder.resolve(Settings.FILE_NAME), new byte[] {(byte) 0xff, 0, 1});
    assertEquals(
        List.of(file + ": not UTF-8 text, not read"), SettingsReader.read(file).problems());
  }
}
