/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.io.PrintStream;
import java.lang.management.ManagementFactory;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.DoubleFunction;

/**
 * One table of processor times to the same errors, all measured in one run: ours, Hipparchus and,
 * where its driver was built, CVODE. Shorter than the benchmarks, and good for ratios.
 */
final class PeerTable {

  private static final double[] TARGETS = {1e-5, 1e-8, 1e-10};
  private static final double MOST_SECONDS = 2;
  private static final int MOST_RUNS = 60;

  private PeerTable() {}

  /** Milliseconds, and the tolerance with which the error was reached. */
  private record Time(double milliseconds, double tolerance) {
    @Override
    public String toString() {
      return String.format(Locale.ROOT, "%9.2f (%.0e)", milliseconds, tolerance);
    }
  }

  /** Prints the table for problems; all of them where none is named. */
  static void print(List<String> names, PrintStream out) {
    List<PeerProblem> problems =
        names.isEmpty()
            ? List.of(PeerProblem.values())
            : names.stream().map(PeerProblem::valueOf).toList();
    out.println(
        "Processor time in ms to an error at the end of the range; in brackets the tolerance that"
            + " it took.");
    if (!CvodeDriver.isThere()) {
      out.println("CVODE is left out: its library (Debian's libsundials-dev) is not installed.");
    }
    out.printf(
        Locale.ROOT,
        "%-8s %7s %18s %18s %18s %8s%n",
        "problem",
        "error",
        "Spanloom",
        "Dormand-Prince",
        "CVODE",
        "ratio");
    for (PeerProblem problem : problems) {
      double[] reference = problem.reference();
      for (double target : TARGETS) {
        Optional<Time> ours = time(problem::spanloom, reference, target);
        Optional<Time> explicit =
            problem.suitsExplicit()
                ? time(problem::dormandPrince, reference, target)
                : Optional.empty();
        Optional<Time> cvode =
            CvodeDriver.isThere() ? cvode(problem, reference, target) : Optional.empty();
        double best =
            Math.min(
                explicit.map(Time::milliseconds).orElse(Double.POSITIVE_INFINITY),
                cvode.map(Time::milliseconds).orElse(Double.POSITIVE_INFINITY));
        out.printf(
            Locale.ROOT,
            "%-8s %7.0e %18s %18s %18s %8s%n",
            problem,
            target,
            shown(ours),
            problem.suitsExplicit() ? shown(explicit) : "over a minute",
            CvodeDriver.isThere() ? shown(cvode) : "-",
            ours.isPresent() && best < Double.POSITIVE_INFINITY
                ? String.format(Locale.ROOT, "%.2f", best / ours.get().milliseconds())
                : "-");
      }
    }
  }

  private static String shown(Optional<Time> time) {
    return time.map(Time::toString).orElse("not reached");
  }

  private static Optional<Time> time(
      DoubleFunction<double[]> solve, double[] reference, double target) {
    double tolerance = Calibration.tolerance(solve, reference, target);
    if (tolerance == 0) {
      return Optional.empty();
    }
    double best = Double.POSITIVE_INFINITY;
    double spent = 0;
    for (int run = 0; run < MOST_RUNS && spent < MOST_SECONDS; run++) {
      long before = ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
      double[] values = solve.apply(tolerance);
      double seconds =
          (ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() - before) / 1e9;
      spent += seconds;
      best = Math.min(best, Arrays.stream(values).allMatch(Double::isFinite) ? seconds : best);
    }
    return Optional.of(new Time(best * 1e3, tolerance));
  }

  private static Optional<Time> cvode(PeerProblem problem, double[] reference, double target) {
    double tolerance =
        Calibration.tolerance(
            asked -> CvodeDriver.run(problem, asked, 1).values(), reference, target);
    return tolerance == 0
        ? Optional.empty()
        : Optional.of(new Time(CvodeDriver.run(problem, tolerance, 5).seconds() * 1e3, tolerance));
  }
}
