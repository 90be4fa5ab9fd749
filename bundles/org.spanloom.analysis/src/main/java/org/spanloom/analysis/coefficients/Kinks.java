/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import org.spanloom.numerics.TimeRange;

/**
 * The times at which a coefficient has a corner or a jump: where the argument of {@code abs} or
 * {@code sign}, or the difference of the arguments of {@code min} or {@code max}, changes its sign.
 *
 * <p>They are looked for between {@value #SAMPLES} even samples of a bounded range, so a pair of
 * changes closer than that can be missed.
 */
final class Kinks {

  private static final int SAMPLES = 4_000;
  private static final int MOST = 2_000;

  private Kinks() {}

  /**
   * Returns the times, strictly inside the range, increasing.
   *
   * @param graph the coefficients
   * @param range their interval; none are looked for where it has no bounds
   */
  static double[] of(TermGraph graph, TimeRange range) {
    List<Integer> switches = switches(graph);
    if (switches.isEmpty() || !range.isBounded() || !(range.length() > 0)) {
      return new double[0];
    }
    int[] nodes = switches.stream().mapToInt(Integer::intValue).toArray();
    CompiledTerms terms = new CompiledTerms(graph, nodes);
    TreeSet<Double> times = new TreeSet<>();
    double[] before = terms.at(range.start());
    double from = range.start();
    for (int k = 1; k <= SAMPLES && times.size() < MOST; k++) {
      double to = k == SAMPLES ? range.end() : range.start() + range.length() * k / SAMPLES;
      double[] after = terms.at(to);
      for (int i = 0; i < nodes.length; i++) {
        if (after[i] == 0 && k < SAMPLES) {
          times.add(to);
        } else if (before[i] * after[i] < 0) {
          times.add(crossing(terms, i, from, to));
        }
      }
      before = after;
      from = to;
    }
    return times.stream()
        .filter(t -> range.start() < t && t < range.end())
        .mapToDouble(Double::doubleValue)
        .toArray();
  }

  private static List<Integer> switches(TermGraph graph) {
    List<Integer> switches = new ArrayList<>();
    int size = graph.size();
    for (int i = 0; i < size; i++) {
      TermGraph.Node node = graph.node(i);
      if (node.operation() == TermGraph.Operation.CALL) {
        switch (node.function()) {
          case ABS, SIGN -> switches.add(node.left());
          case MIN, MAX ->
              switches.add(graph.combine(TermGraph.Operation.SUBTRACT, node.left(), node.right()));
          case SIN, COS, TAN, ASIN, ACOS, ATAN, SINH, COSH, TANH, EXP, LOG, LOG10, SQRT -> {}
        }
      }
    }
    return switches;
  }

  /** Halves down to neighbouring numbers. */
  private static double crossing(CompiledTerms terms, int place, double from, double to) {
    double a = from;
    double b = to;
    boolean negative = terms.at(a)[place] < 0;
    double middle = a + (b - a) / 2;
    while (a < middle && middle < b) {
      if (terms.at(middle)[place] < 0 == negative) {
        a = middle;
      } else {
        b = middle;
      }
      middle = a + (b - a) / 2;
    }
    return b;
  }
}
