/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SolveCommandTests {

  @TempDir Path folder;

  @Test
  void listsTimeStatesAndOutputsInDeclaredUnits() {
    CommandRun run = CommandRun.of("solve", Models.drain(folder), "--at", "0,2,10");
    assertEquals(0, run.code(), run.err());
    PrintedResult result = new PrintedResult(run);
    assertEquals(List.of("t", "upper", "lower", "total"), result.names());
    assertEquals(3, result.rows().size());
    double[] row = result.rows().get(1);
    assertEquals(2, row[0]);
    assertEquals(8 * Math.exp(-1), row[1], 1e-9);
    assertEquals(8000 * (1 - Math.exp(-1)), row[2], 1e-6);
    assertEquals(8, row[3], 1e-9);
  }

  @Test
  void writesLineFeedsAndStartsWithTheNames() {
    CommandRun run = CommandRun.of("solve", Models.drain(folder), "--at", "0");
    assertEquals("t,upper,lower,total\n0,8,0,8\n", run.out());
  }

  @Test
  void keepsTheOrderOfTheTimesAndRepeatsThem() {
    CommandRun run = CommandRun.of("solve", Models.drain(folder), "--at", "5,1,5");
    List<double[]> rows = new PrintedResult(run).rows();
    assertEquals(5, rows.get(0)[0]);
    assertEquals(1, rows.get(1)[0]);
    assertEquals(rows.get(0)[1], rows.get(2)[1]);
  }

  @Test
  void listsEvenPointsOverTheIntervalOrAPartOfIt() {
    CommandRun whole = CommandRun.of("solve", Models.drain(folder), "--points", "5");
    assertEquals(
        List.of(0.0, 2.5, 5.0, 7.5, 10.0),
        new PrintedResult(whole).rows().stream().map(r -> r[0]).toList());
    CommandRun part =
        CommandRun.of(
            "solve", Models.drain(folder), "--from", "1", "--until", "2", "--points", "3");
    assertEquals(
        List.of(1.0, 1.5, 2.0), new PrintedResult(part).rows().stream().map(r -> r[0]).toList());
    assertEquals(8 * Math.exp(-1), new PrintedResult(part).last("upper"), 1e-9);
    CommandRun unasked = CommandRun.of("solve", Models.drain(folder));
    assertEquals(101, new PrintedResult(unasked).rows().size());
  }

  @Test
  void quotesDerivativesAndPicksSystemAndInitialValues() {
    Path file = Models.twoSystems(folder);
    CommandRun run =
        CommandRun.of("solve", file, "--system", "Swing", "--initial", "pushed", "--at", "1");
    assertEquals(0, run.code(), run.err());
    assertTrue(run.out().startsWith("t,x,\"x'\"\n"), run.out());
    assertEquals(Math.sin(2) / 2, new PrintedResult(run).last("x"), 1e-9);
  }

  @Test
  void setsParametersInTheirDeclaredUnit() {
    CommandRun run = CommandRun.of("solve", Models.drain(folder), "--set", "k=0.25", "--at", "4");
    assertEquals(8 * Math.exp(-1), new PrintedResult(run).last("upper"), 1e-9);
  }

  /** x' = u(t) with u = 3 e^-t from x(0) = 0 has the solution 3 (1 - e^-t). */
  @Test
  void takesTheDefaultOfAnInputAndRefusesToSetIt() {
    Path file =
        CommandRun.model(
            folder,
            "fill.span",
            """
            system Fill over t [min] from 0 to 5 {
              parameter rate [/min] = 1
              input inlet(t) [L/min] = 3 [L/min]*exp(-rate*t)
              state held [mL] = 0
              transfer outside -> held = inlet(t)
              accuracy 1e-10
            }
            """);
    CommandRun run = CommandRun.of("solve", file, "--at", "2");
    assertEquals(0, run.code(), run.err());
    assertEquals(3000 * (1 - Math.exp(-2)), new PrintedResult(run).last("held"), 1e-6);
    CommandRun refused = CommandRun.of("solve", file, "--set", "inlet=4", "--at", "2");
    assertEquals(2, refused.code());
    assertTrue(
        refused.err().contains("'inlet' is an input, a function of t, and cannot be set"),
        refused.err());
  }

  @Test
  void tellsTheErrorOfEachColumnAndItIsTrue() {
    CommandRun run = CommandRun.of("solve", Models.drain(folder), "--at", "2");
    List<String> lines = run.err().lines().toList();
    assertEquals(5, lines.size(), run.err());
    assertTrue(lines.get(0).contains("1e-10") || lines.get(0).contains("1.00e-10"), run.err());
    String[] cells = lines.get(2).strip().split(" +", -1);
    assertEquals("upper", cells[0]);
    assertEquals("L", cells[1]);
    double estimate = Double.parseDouble(cells[2]);
    double error = Math.abs(new PrintedResult(run).last("upper") - 8 * Math.exp(-1));
    assertTrue(error <= estimate && estimate <= 1e-8, run.err());
  }

  @Test
  void aTighterAccuracyIsAskedFor() {
    Path file =
        CommandRun.model(
            folder,
            "airy.span",
            """
            system Airy over t from 0 to 5 {
              state x = 1
              state x' = 0
              x'' = -t*x
            }
            """);
    CommandRun run = CommandRun.of("solve", file, "--accuracy", "1e-11", "--at", "5");
    assertTrue(run.err().contains("1.00e-11"), run.err());
    // x(5) = (sqrt(3) Ai(-5) + Bi(-5)) Gamma(2/3) 3^(1/6) / 2; from the functions' values in NIST
    // DLMF 9, digits
    // computed with 40-digit arithmetic.
    assertEquals(0.3814818980850609, new PrintedResult(run).last("x"), 1e-10);
  }

  @Test
  void takesTheMethodAskedFor() {
    Path file =
        CommandRun.model(
            folder,
            "mast.span",
            """
            system Mast over t [s] from 0 to 4 {
              state x [m] = 0.1
              state x' [m/s] = 0
              x'' = -(9 + sin(t/1 [s]))/1 [s2]*x - 0.1 [Hz]*x'
            }
            """);
    double[] reached = new double[3];
    String[] methods = {"magnus6", "radau9", "gauss14"};
    String[] labels = {
      "Magnus integrator, order 6", "Radau IIA collocation, order 9", "Gauss collocation, order 14"
    };
    for (int k = 0; k < 3; k++) {
      CommandRun run = CommandRun.of("solve", file, "--at", "4", "--method", methods[k]);
      assertEquals(0, run.code(), run.err());
      assertTrue(run.err().contains("method: " + labels[k] + ";"), run.err());
      reached[k] = new PrintedResult(run).last("x");
    }
    assertEquals(reached[0], reached[1], 1e-6);
    assertEquals(reached[0], reached[2], 1e-6);
  }

  @Test
  void aMethodThatDoesNotApplyIsRefused() {
    CommandRun unknown = CommandRun.of("solve", Models.drain(folder), "--method", "radau7");
    assertEquals(2, unknown.code());
    assertTrue(
        unknown
            .err()
            .contains(
                "there is no method 'radau7'; choose one of: exponential, magnus4, magnus6,"
                    + " magnus8,"),
        unknown.err());
    Path file =
        CommandRun.model(
            folder,
            "leak.span",
            """
            system Leak over t from 0 to 4 {
              state x = 1
              x' = -(1 + t)*x
            }
            """);
    CommandRun run = CommandRun.of("solve", file, "--method", "exponential");
    assertEquals(1, run.code(), run.err());
    assertTrue(
        run.err().contains("the method asked for does not apply; leave the method out"), run.err());
  }

  @Test
  void writesAFileAndNothingElse() throws Exception {
    Path target = folder.resolve("out.csv");
    CommandRun run = CommandRun.of("solve", Models.drain(folder), "--at", "0", "--output", target);
    assertEquals(0, run.code(), run.err());
    assertEquals("", run.out());
    assertEquals("t,upper,lower,total\n0,8,0,8\n", Files.readString(target));
  }

  @Test
  void theLocaleDoesNotMatter() {
    Locale before = Locale.getDefault();
    try {
      CommandRun english = CommandRun.of("solve", Models.drain(folder), "--points", "7");
      Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
      assertEquals(english, CommandRun.of("solve", Models.drain(folder), "--points", "7"));
    } finally {
      Locale.setDefault(before);
    }
  }

  @Test
  void aModelWithErrorsIsFoundNotRefused() {
    Path file =
        CommandRun.model(
            folder, "bad.span", "system S over t from 0 to 1 {\n  state x = 1\n  x' = y\n}\n");
    CommandRun run = CommandRun.of("solve", file, "--at", "1");
    assertEquals(1, run.code(), run.err());
    assertEquals("", run.out());
    run.assertOneMessage("bad.span:3:");
    assertFalse(run.err().contains("1.0"));
  }
}
