/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.Collection;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.openjdk.jmh.results.RunResult;

/** Bytes a second, the ratio to the Eclipse Java compiler's parser, and the growth with size. */
final class FrontEndSummary {

  private FrontEndSummary() {}

  static void print(Collection<RunResult> results, PrintStream out) {
    Map<String, Map<Integer, Double>> times = new TreeMap<>();
    for (RunResult result : results) {
      String name = result.getParams().getBenchmark();
      if (name.contains(FrontEndBenchmark.class.getSimpleName() + ".")) {
        times
            .computeIfAbsent(name.substring(name.lastIndexOf('.') + 1), k -> new TreeMap<>())
            .put(
                Integer.parseInt(result.getParams().getParam("statements")),
                result.getPrimaryResult().getScore());
      }
    }
    Map<Integer, Double> eclipse = times.getOrDefault("parseJavaByEclipse", Map.of());
    times.forEach((name, bySize) -> {
      bySize.forEach((size, milliseconds) -> {
        int bytes = LargeModel.text(size).getBytes(StandardCharsets.UTF_8).length;
        out.printf(
            Locale.ROOT,
            "%-20s %7d statements %8.1f ms %6.1f MB/s",
            name,
            size,
            milliseconds,
            bytes / milliseconds / 1e3);
        if (eclipse.containsKey(size)) {
          out.printf(
              Locale.ROOT,
              "   %5.2f x the speed of the Eclipse Java compiler's parser",
              eclipse.get(size) / milliseconds);
        }
        out.println();
      });
      if (bySize.size() > 2) {
        out.printf(Locale.ROOT, "%-20s time ~ statements^%.2f%n", name, exponent(bySize));
      }
    });
  }

  /** The slope of the straight line through the logarithms, by least squares. */
  private static double exponent(Map<Integer, Double> times) {
    double n = times.size();
    double meanX = times.keySet().stream().mapToDouble(Math::log).sum() / n;
    double meanY = times.values().stream().mapToDouble(Math::log).sum() / n;
    double above = 0;
    double below = 0;
    for (Map.Entry<Integer, Double> entry : times.entrySet()) {
      double x = Math.log(entry.getKey()) - meanX;
      above += x * (Math.log(entry.getValue()) - meanY);
      below += x * x;
    }
    return above / below;
  }
}
