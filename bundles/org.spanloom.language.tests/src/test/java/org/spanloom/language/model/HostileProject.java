/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.ProjectFile;
import org.spanloom.language.files.ProjectFiles;

/** A project in memory whose files cost time or memory, as the file {@code hostile.span}. */
final class HostileProject implements ProjectFiles {

  /** A system with two parts of the system before it in each file of a chain without end. */
  private static String doubling(int number) {
    return "import \"doubling"
        + (number + 1)
        + ".span\"\nsystem D"
        + number
        + " over t [h] from 0 to 1 { state x = 1; x' = 0; part a = D"
        + (number + 1)
        + "; part b = D"
        + (number + 1)
        + " }\n";
  }

  @Override
  public FileKey self() {
    return new FileKey("hostile.span");
  }

  @Override
  public ProjectFile read(FileKey key) {
    String path = key.path();
    if (path.matches("doubling[0-9]{1,6}\\.span")) {
      return new ProjectFile.Content(doubling(Integer.parseInt(path.replaceAll("[^0-9]", ""))));
    }
    return switch (path) {
      // Its header speaks of rows without end; whoever holds files reads the limit and no more.
      case "endless.csv", "endless.mtx", "endless.span" -> new ProjectFile.TooLarge(SIZE_LIMIT);
      case "claims.mtx" ->
          new ProjectFile.Content(
              "%%MatrixMarket matrix coordinate real general\n"
                  + "1000000000 1000000000 1000000000\n1 1 1\n");
      case "dense.mtx" ->
          new ProjectFile.Content(
              "%%MatrixMarket matrix array real general\n1000000000 1000000000\n1\n");
      case "rows.csv" -> new ProjectFile.Content("hour,air\n" + "1,2\n".repeat(1_000_000));
      case "rising.csv" -> new ProjectFile.Content(rising(1_000_000));
      case "commas.csv" -> new ProjectFile.Content("hour,air\n1" + ",".repeat(5_000_000));
      case "quote.csv" -> new ProjectFile.Content("hour,air\n\"" + "1,2\n".repeat(1_000_000));
      case "heads.csv" -> new ProjectFile.Content("a,".repeat(2_000_000) + "\n1,2\n");
      case "self.span" -> new ProjectFile.Content("import \"self.span\"\nparameter s = 1\n");
      case "ring.span" -> new ProjectFile.Content("import \"hostile.span\"\n");
      default -> new ProjectFile.Missing(List.of());
    };
  }

  private static String rising(int rows) {
    StringBuilder text = new StringBuilder("hour,air\n");
    for (int i = 0; i < rows; i++) {
      text.append(i).append(",1\n");
    }
    return text.toString();
  }
}
