/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.OutputStream;
import java.io.RandomAccessFile;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Each wrong input gets one line that says what to do, exit code 2 and never a stack trace. */
class BadInputTests {

  @TempDir Path folder;

  @ParameterizedTest
  @ValueSource(strings = {"check", "solve", "basis"})
  void aMissingFile(String command) {
    run(command, folder.resolve("missing.span")).assertRefused("missing.span", "no such file");
  }

  @ParameterizedTest
  @ValueSource(strings = {"check", "solve", "basis"})
  void aBinaryFile(String command) throws IOException {
    Path file = Files.write(folder.resolve("b.span"), new byte[] {'s', '\n', 0, 1, 2});
    run(command, file).assertRefused("b.span", "not a text file", "line 2");
  }

  @ParameterizedTest
  @ValueSource(strings = {"check", "solve", "basis"})
  void aFileOf200Megabytes(String command) throws IOException {
    Path file = folder.resolve("big.span");
    try (RandomAccessFile big = new RandomAccessFile(file.toFile(), "rw")) {
      big.setLength(200L << 20);
    }
    run(command, file).assertRefused("big.span", "larger than 64 MB");
  }

  @ParameterizedTest
  @ValueSource(strings = {"check", "solve", "basis"})
  void anEncodingThatIsNotUtf8(String command) throws IOException {
    Path file =
        Files.write(
            folder.resolve("latin.span"),
            "# one\n# 5 \u00B1 1\n".getBytes(StandardCharsets.ISO_8859_1));
    run(command, file).assertRefused("latin.span", "UTF-8", "line 2 (byte 10)");
    Path wide =
        Files.write(folder.resolve("wide.span"), "system".getBytes(StandardCharsets.UTF_16));
    run(command, wide).assertRefused("wide.span", "UTF-16", "save it as UTF-8");
  }

  @Test
  void aDirectoryWithoutModels() {
    run("check", folder).assertRefused(folder.toString(), "no model file (*.span)");
  }

  @ParameterizedTest
  @ValueSource(strings = {"solve", "basis"})
  void aDirectoryWhereAFileIsMeant(String command) {
    run(command, folder).assertRefused("directory", "name a model file");
  }

  @Test
  void aDeviceWithoutEnd() {
    CommandRun.of("check", "/dev/zero").assertRefused("larger than 64 MB");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "--system Brook | Brook | Pools",
        "--initial cold | cold | ",
        "--at 11 | 11 | from 0 to 10",
        "--at -0.001 | -0.001 | from 0 to 10",
        "--at NaN | --at | not a number",
        "--at 1;2 | --at | not a number",
        "--at 1e400 | --at | too large",
        "--at , | --at | not a number",
        "--from 20 | 20 | from 0 to 10",
        "--from 5 --until 4 | 5 | 4",
        "--from x | --from | not a number",
        "--until 1,5 | --until | not a number",
        "--points 1 | --points | from 2 to 1000000",
        "--points 0 | --points | from 2 to 1000000",
        "--points -3 | --points | from 2 to 1000000",
        "--points 1000000000 | --points | from 2 to 1000000",
        "--points 99999999999999 | --points | from 2 to 1000000",
        "--points 2.5 | --points | whole number",
        "--points 5 --at 1 | --points | --at",
        "--at 1 --from 0 | --at | --from",
        "--set kk=1 | kk | k",
        "--set k=NaN | --set k | not a number",
        "--set k=1e999 | --set k | too large",
        "--set k= | --set k | not a number",
        "--set k | --set | NAME=VALUE",
        "--set =1 | --set | NAME=VALUE",
        "--set k=1 --set k=2 | k | twice",
        "--accuracy 0 | --accuracy | 1e-14",
        "--accuracy -1e-6 | --accuracy | 1e-14",
        "--accuracy 2 | --accuracy | 1e-14",
        "--accuracy 1e-20 | --accuracy | 1e-14",
        "--output /nowhere/at/all/x.csv | x.csv | no such file or directory",
        "--points | --points | needs a value",
        "--nonsense | --nonsense | solve --help",
        "other.span | other.span | too many",
        "--at 1 --at 2 | --at | once"
      })
  void anArgumentThatWillNotDo(String arguments, String part, String other) {
    Path file = Models.drain(folder);
    String[] all = ("solve " + file + " " + arguments).split(" ", -1);
    CommandRun.of(all).assertRefused(part, other == null ? "" : other);
  }

  @ParameterizedTest
  @ValueSource(strings = {"solve", "basis"})
  void severalSystemsWithoutAChoice(String command) {
    Path file = Models.twoSystems(folder);
    CommandRun.of(command, file, "--at", "1").assertRefused("Swing, Fall");
  }

  @Test
  void severalInitialValuesWithoutAChoice() {
    Path file = Models.twoSystems(folder);
    CommandRun.of("solve", file, "--system", "Swing", "--at", "1").assertRefused("pulled, pushed");
  }

  @Test
  void anInfiniteIntervalNeedsAnEnd() {
    Path file = Models.twoSystems(folder);
    CommandRun.of("solve", file, "--system", "Fall").assertRefused("Fall", "end", "last time");
  }

  @Test
  void aTableBeyondTheLimit() {
    StringBuilder text = new StringBuilder("system Wide over t from 0 to 1 {\n");
    for (int i = 0; i < 60; i++) {
      text.append("  state x").append(i).append(" = 1\n");
      text.append("  x").append(i).append("' = -x").append(i).append("\n");
    }
    Path file = CommandRun.model(folder, "wide.span", text + "}\n");
    CommandRun.of("solve", file, "--points", "1000000").assertRefused("limit");
  }

  @Test
  void basisWithoutTimesOrWithAnUnknownBasis() {
    Path file = Models.twoSystems(folder);
    CommandRun.of("basis", file, "--system", "Swing").assertRefused("--at");
    CommandRun.of("basis", file, "--system", "Swing", "--basis", "par", "--at", "1")
        .assertRefused("par", "start, pair");
    CommandRun.of("basis", file, "--system", "Swing", "--at", "1").assertRefused("start, pair");
    CommandRun.of("basis", file, "--system", "Swing", "--basis", "pair", "--at", "21")
        .assertRefused("21", "from 0 to 20");
  }

  @ParameterizedTest
  @ValueSource(strings = {"", "chek", "--nonsense", "-x", "workbench"})
  void aWordThatIsNoCommand(String word) {
    CommandRun.of(new String[] {word}).assertRefused("check, solve, basis");
  }

  @Test
  void noArgumentsAtAll() {
    CommandRun run = CommandRun.of(new String[0]);
    assertEquals(2, run.code());
    assertEquals("", run.out());
    assertTrue(run.err().contains("spanloom check"), run.err());
  }

  @ParameterizedTest
  @ValueSource(strings = {"check", "solve", "basis"})
  void aCommandWithoutAFile(String command) {
    CommandRun.of(new String[] {command}).assertRefused("missing", command + " --help");
  }

  @Test
  void anUnknownFormatAndWrongSettings() throws IOException {
    Path file = Models.drain(folder);
    CommandRun.of("check", file, "--format", "xml").assertRefused("xml", "text or json");
    CommandRun.of("check", file, "--settings", folder.resolve("none"))
        .assertRefused("none", "no such file");
    Path settings = Files.writeString(folder.resolve("s"), "digits.wanted = many\n");
    CommandRun run = CommandRun.of("check", file, "--settings", settings);
    assertEquals(2, run.code());
    run.assertOneMessage("s:1:", "digits.wanted");
  }

  @Test
  void aPathThatNoFileCanHave() {
    CommandRun.of(new String[] {"check", "a\0b"}).assertRefused("cannot be the name of a file");
    CommandRun.of(new String[] {"solve", "a\0b"}).assertRefused("cannot be the name of a file");
  }

  @Test
  void whatCanBeReadIsStillChecked() throws IOException {
    Path good = Models.drain(folder);
    CommandRun run = CommandRun.of("check", folder.resolve("missing.span"), good);
    assertEquals(2, run.code());
    run.assertOneMessage("missing.span");
    assertTrue(run.out().contains("pools.span"), run.out());
  }

  @Test
  void anAbsurdNumberIsAFindingOfTheModel() {
    Path file =
        CommandRun.model(
            folder,
            "absurd.span",
            "system S over t from 0 to 1 {\n  parameter p = 1e400\n  state x = 1\n  x' = -p*x\n}\n");
    CommandRun run = CommandRun.of("check", file);
    assertEquals(1, run.code(), run.err());
    assertEquals("", run.err());
    assertTrue(run.out().contains("absurd.span:2:17: error:"), run.out());
    assertTrue(run.out().contains("[number-out-of-range]"), run.out());
  }

  @Test
  void aReaderThatHasGone() {
    OutputStream closed =
        new OutputStream() {
          @Override
          public void write(int b) throws IOException {
            throw new IOException("Broken pipe");
          }
        };
    CommandRun.into(closed, "solve", Models.drain(folder).toString())
        .assertRefused("standard output", "Broken pipe");
  }

  @Test
  void aMistakeOfTheProgramItselfIsOneLineWithThePlaceAndNoTraceUnlessAskedFor() {
    OutputStream faulty =
        new OutputStream() {
          @Override
          public void write(int b) {
            throw new IllegalStateException("cannot happen");
          }
        };
    CommandRun run = CommandRun.into(faulty, "--version");
    assertEquals(2, run.code());
    assertEquals(1, run.err().lines().count(), run.err());
    assertTrue(
        run.err().matches("(?s)spanloom: internal error \\S+\\.\\d+-IllegalStateException; .*"),
        run.err());
    System.setProperty("spanloom.trace", "true");
    try {
      CommandRun traced = CommandRun.into(faulty, "--version");
      assertTrue(traced.err().contains("\tat org.spanloom.cli.Main"), traced.err());
    } finally {
      System.clearProperty("spanloom.trace");
    }
  }

  private static CommandRun run(String command, Path file) {
    return command.equals("basis")
        ? CommandRun.of(command, file, "--at", "0")
        : CommandRun.of(command, file);
  }
}
