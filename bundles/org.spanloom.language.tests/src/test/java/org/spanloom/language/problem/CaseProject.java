/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.problem;

import java.util.Map;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.ProjectFile;
import org.spanloom.language.files.ProjectFiles;
import org.spanloom.language.files.TextFiles;

/** The project that the cases stand in, as the file {@code case.span}. */
final class CaseProject implements ProjectFiles {

  private static final String ZONE =
      """
      parameter shared = 3
      system Zone over t [s] from 0 to 10 {
        parameter g [1/s] = 0.5
        parameter a = 2
        input u(t) = 1
        let f(t) = 2*u(t)/a
        state x = 1
        output double = 2*x
        x' = g*(f(t) - x)
        require x < 3 throughout
      }
      """;

  private final TextFiles texts =
      new TextFiles(
          "case.span",
          Map.of(
              "zone.span", ZONE,
              "other.span", "parameter unlike = 1\nparameter shared = 4\n",
              "broken.span", "parameter k = 2\nparameter broken = 2 +\nlet b = nobody\n",
              "loop.span", "import \"round.span\"\n",
              "round.span", "import \"case.span\"\n"));

  @Override
  public FileKey self() {
    return texts.self();
  }

  @Override
  public ProjectFile read(FileKey key) {
    return switch (key.path()) {
      case "huge.span" -> new ProjectFile.TooLarge(SIZE_LIMIT);
      case "picture.span" -> new ProjectFile.Unreadable("it is not UTF-8 text, see line 1");
      case "linked.span" -> new ProjectFile.Outside();
      default -> texts.read(key);
    };
  }
}
