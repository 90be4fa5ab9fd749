/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.ReferenceProblem;
import org.spanloom.numerics.ReferenceProblems;

/** Published numbers at three accuracies: is the error what was asked for, and is it admitted? */
class ReferenceTableTests {

  private static final double[] TOLERANCES = {1e-5, 1e-8, 1e-11};
  private static final List<Row> ROWS = new ArrayList<>();

  /** One solution against the published number. */
  private record Row(
      ReferenceProblem problem,
      double tolerance,
      double error,
      double estimate,
      double asked,
      double rounding,
      String method) {

    /** Whether the true error stays within the estimate, as far as double precision can tell. */
    boolean admitted() {
      return error <= estimate + rounding;
    }

    boolean within() {
      return error <= asked + rounding;
    }

    /** Whether the estimate is no more than a hundred times too large. */
    boolean sharp() {
      return estimate <= 100 * error + 100 * rounding;
    }

    @Override
    public String toString() {
      return String.format(
          Locale.ROOT,
          "%-40s %7.0e  true %8.1e  estimate %8.1e  ratio %8.1e  floor %8.1e %s%s%s %s",
          problem,
          tolerance,
          error,
          estimate,
          estimate / error,
          rounding,
          admitted() ? "" : " NOT ADMITTED",
          within() ? "" : " OUTSIDE",
          sharp() ? "" : " WIDE",
          method);
    }
  }

  @BeforeAll
  static void solve() {
    for (ReferenceProblem problem : ReferenceProblems.all()) {
      double rounding = problem.roundingOfStart();
      for (double tolerance : TOLERANCES) {
        Solution solution = problem.solved(tolerance);
        Row row =
            new Row(
                problem,
                tolerance,
                Math.abs(problem.computed(solution) - problem.exact()),
                problem.estimate(solution),
                problem.asked(tolerance, solution),
                rounding,
                solution.method());
        ROWS.add(row);
        System.out.println(row);
      }
    }
  }

  @Test
  void everyErrorIsAdmitted() {
    assertEquals(List.of(), ROWS.stream().filter(row -> !row.admitted()).toList());
  }

  @Test
  void everyErrorIsWithinWhatWasAskedWhereTheEstimateSaysSo() {
    assertEquals(
        List.of(),
        ROWS.stream().filter(row -> row.estimate() <= row.asked() && !row.within()).toList());
  }

  @Test
  void estimatesSayThatMostAccuraciesAreMet() {
    long met =
        ROWS.stream().filter(row -> row.estimate() <= row.asked() + 100 * row.rounding()).count();
    System.out.printf(Locale.ROOT, "met by the estimate: %d of %d%n", met, ROWS.size());
    assertTrue(met >= 0.9 * ROWS.size(), met + " of " + ROWS.size());
  }

  @Test
  void nineInTenEstimatesAreWithinAHundredErrorsAndAHundredRoundings() {
    long sharp = ROWS.stream().filter(Row::sharp).count();
    System.out.printf(Locale.ROOT, "sharp: %d of %d%n", sharp, ROWS.size());
    assertTrue(sharp >= 0.9 * ROWS.size(), sharp + " of " + ROWS.size());
  }
}
