/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.requirement;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.spanloom.numerics.TimeRange;

/**
 * The time of the least value of a function along a solution: sampled at the steps of the method,
 * between them and evenly, then refined at the lowest samples by golden section.
 */
final class Minimum {

  private static final int EVEN = 400;
  private static final int REFINED = 12;
  private static final int HALVINGS = 60;
  private static final double GOLDEN = (Math.sqrt(5) - 1) / 2;

  private Minimum() {}

  /**
   * Finds it.
   *
   * @param function the function, continuous between the nodes
   * @param nodes steps of the method, increasing
   * @param range where to look, bounded
   */
  static double of(DoubleUnaryOperator function, double[] nodes, TimeRange range) {
    double[] times = times(nodes, range);
    double[] values = Arrays.stream(times).map(function).toArray();
    List<Integer> lowest =
        IntStream.range(0, times.length)
            .filter(k -> isLow(values, k))
            .boxed()
            .sorted(Comparator.comparingDouble(k -> values[k]))
            .limit(REFINED)
            .toList();
    double best = times[0];
    double least = values[0];
    for (int k : lowest) {
      double t =
          refined(function, times[Math.max(0, k - 1)], times[Math.min(times.length - 1, k + 1)]);
      double value = function.applyAsDouble(t);
      if (values[k] <= value) {
        t = times[k];
        value = values[k];
      }
      if (value < least) {
        least = value;
        best = t;
      }
    }
    return best;
  }

  private static boolean isLow(double[] values, int k) {
    return (k == 0 || values[k] <= values[k - 1])
        && (k == values.length - 1 || values[k] <= values[k + 1]);
  }

  private static double[] times(double[] nodes, TimeRange range) {
    DoubleStream even =
        IntStream.rangeClosed(0, EVEN)
            .mapToDouble(k -> k == EVEN ? range.end() : range.start() + range.length() * k / EVEN);
    DoubleStream middles =
        IntStream.range(1, nodes.length).mapToDouble(k -> (nodes[k - 1] + nodes[k]) / 2);
    return DoubleStream.concat(even, DoubleStream.concat(Arrays.stream(nodes), middles))
        .filter(range::contains)
        .sorted()
        .distinct()
        .toArray();
  }

  private static double refined(DoubleUnaryOperator function, double from, double to) {
    double a = from;
    double b = to;
    double c = b - GOLDEN * (b - a);
    double d = a + GOLDEN * (b - a);
    double atC = function.applyAsDouble(c);
    double atD = function.applyAsDouble(d);
    for (int k = 0; k < HALVINGS && b - a > 1e-9 * Math.abs(b) && a < c && d < b; k++) {
      if (atC < atD) {
        b = d;
        d = c;
        atD = atC;
        c = b - GOLDEN * (b - a);
        atC = function.applyAsDouble(c);
      } else {
        a = c;
        c = d;
        atC = atD;
        d = a + GOLDEN * (b - a);
        atD = function.applyAsDouble(d);
      }
    }
    return (a + b) / 2;
  }
}
