/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.TextFiles;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.text.SourceText;

class MatrixFileTests {

  private static final String SYSTEM =
      """
      system S over t [s] from 0 to 10 {
        state a [m] = 1
        state b [m] = 0
        matrix q [m] =
          row a
          row b
        matrix K [kN/m] = file "data/stiffness.mtx"
        2 [kg/s]*q' = -K*q*1 [s]/1 [s]
      }
      """;

  private static Model read(String text, String file) {
    TextFiles files = new TextFiles("models/boom.span", Map.of("models/data/stiffness.mtx", file));
    return ModelReader.read(new SourceText("models/boom.span", text), files, () -> false);
  }

  private static List<String> problems(Model model) {
    return model.problems().stream().map(MatrixFileTests::shown).toList();
  }

  private static String shown(Problem problem) {
    return problem.kind().id() + " " + problem.span().start() + " " + problem.message();
  }

  @Test
  void aFileGivesTheEntriesInTheUnitOfTheMatrix() {
    Model model =
        read(
            SYSTEM,
            "%%MatrixMarket matrix coordinate real symmetric\n2 2 3\n1 1 3.5\n2 1 -1\n2 2 1\n");
    assertEquals(List.of(), problems(model));
    assertEquals(
        """
        M[a, a] = 2
        M[b, b] = 2
        K[a, a] = -3500
        K[a, b] = 1000
        K[b, a] = 1000
        K[b, b] = -1000
        """,
        ModelListing.equations(model.systems().getFirst()));
    assertEquals(List.of(new FileKey("models/data/stiffness.mtx")), model.files());
  }

  @Test
  void anEntryComesFromTheNameOfItsFile() {
    Model model = read(SYSTEM, "%%MatrixMarket matrix array real general\n2 2\n1\n2\n3\n4\n");
    assertEquals(
        List.of("-K*q*1 [s]/1 [s]", "\"data/stiffness.mtx\"", "a"),
        model.systems().getFirst().equations().orElseThrow().matrix().getFirst().sources().stream()
            .map(s -> SYSTEM.substring(s.start(), s.end()))
            .toList());
  }

  @Test
  void aFaultNamesTheLineOfTheFile() {
    int place = SYSTEM.indexOf("\"data");
    assertEquals(
        List.of(
            "file-malformed "
                + place
                + " Line 3 of \"data/stiffness.mtx\": \"x\" is not a number. Mend the file."),
        problems(read(SYSTEM, "%%MatrixMarket matrix array real general\n2 2\nx\n2\n3\n4\n")));
    assertEquals(
        List.of(
            "matrix-too-large "
                + place
                + " Line 2 of \"data/stiffness.mtx\": a matrix has at most 100000 rows and columns."
                + " Mend the file."),
        problems(
            read(SYSTEM, "%%MatrixMarket matrix coordinate real general\n1000000000 1 1\n1 1 1")));
  }

  @Test
  void aFileThatIsNotThereIsReportedOnce() {
    List<Problem> problems = read(SYSTEM.replace("stiffness", "stifness"), "").problems();
    assertEquals(1, problems.size(), problems.toString());
    assertEquals("file-missing", problems.getFirst().kind().id());
    assertEquals("Write \"data/stiffness.mtx\"", problems.getFirst().fixes().getFirst().label());
  }

  /** Work grows with the entries: a band of 1000 rows is read, multiplied and laid out. */
  @Test
  void aLargeBandIsRead() {
    int n = 1000;
    StringBuilder file = new StringBuilder("%%MatrixMarket matrix coordinate real symmetric\n");
    file.append(n + " " + n + " " + (2 * n - 1) + "\n");
    StringBuilder text = new StringBuilder("system S over t [s] from 0 to 10 {\n");
    StringBuilder column = new StringBuilder("matrix q [m] =\n");
    for (int i = 1; i <= n; i++) {
      file.append(i + " " + i + " 2\n");
      file.append(i > 1 ? i + " " + (i - 1) + " -1\n" : "");
      text.append("state x" + i + " [m] = 1\n");
      column.append("row x" + i + "\n");
    }
    text.append(column).append("matrix K [/s] = file \"data/stiffness.mtx\"\nq' = -K*q\n}\n");
    Model model = read(text.toString(), file.toString());
    assertEquals(List.of(), problems(model));
    LinearForm form = model.systems().getFirst().equations().orElseThrow();
    assertEquals(3 * n - 2, form.matrix().size());
    assertTrue(form.hasDiagonalMass());
  }
}
