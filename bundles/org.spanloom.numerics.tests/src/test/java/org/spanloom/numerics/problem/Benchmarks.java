/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.problem;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;

/**
 * Larger problems with invented parameters, and reference solutions computed in more than double
 * precision.
 *
 * <p>Random numbers: {@code s = (1103515245 s + 12345) mod 2^31, u = s / 2^31}; the seed is the
 * first s.
 */
public final class Benchmarks {

  private Benchmarks() {}

  private static final class Random {
    private long state;

    Random(long seed) {
      state = seed;
    }

    double unit() {
      state = (1103515245L * state + 12345) % (1L << 31);
      return state / (double) (1L << 31);
    }

    double signed() {
      return 2 * unit() - 1;
    }
  }

  /** Returns reference values. */
  public static double[] reference(String name) {
    try (InputStream in =
            Benchmarks.class.getResourceAsStream("/org/spanloom/numerics/benchmark/" + name);
        BufferedReader reader =
            new BufferedReader(new InputStreamReader(in, StandardCharsets.US_ASCII))) {
      return reader
          .lines()
          .filter(line -> !line.startsWith("#"))
          .mapToDouble(Double::parseDouble)
          .toArray();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** P1: 4 states, not stiff, {@code A0 + A1 sin t + A2 cos 2t} on [0, 20]. */
  public static FormulaSystem smooth() {
    Random random = new Random(1);
    double[][] m = new double[3][16];
    for (double[] matrix : m) {
      Arrays.setAll(matrix, e -> random.signed());
    }
    for (int i = 0; i < 4; i++) {
      m[0][5 * i] -= 0.5;
    }
    return FormulaSystem.homogeneous(
        4,
        0,
        20,
        (t, a) -> {
          for (int e = 0; e < 16; e++) {
            a[e] = m[0][e] + m[1][e] * Math.sin(t) + m[2][e] * Math.cos(2 * t);
          }
        });
  }

  /** P2: a stiff thermal network of 60 nodes on [0, 100]. */
  public record Network(FormulaSystem system, double[] start) {}

  /** Returns P2. */
  public static Network network() {
    int n = 60;
    Random random = new Random(2);
    double[] capacity = new double[n];
    Arrays.setAll(capacity, i -> Math.pow(10, -1 + 2 * random.unit()));
    double[] conductance = new double[2 * n];
    double[] phase = new double[2 * n];
    for (int e = 0; e < 2 * n; e++) {
      double u = random.unit();
      conductance[e] = e < n ? Math.pow(10, -1 + 5 * u) : Math.pow(10, -2 + 2 * u);
      phase[e] = 2 * Math.PI * random.unit();
    }
    double[] heat = new double[n];
    Arrays.setAll(heat, i -> 5 * random.unit());
    double[] start = new double[n];
    Arrays.setAll(start, i -> 15 + 10 * random.unit());
    FormulaSystem.Smooth matrix =
        (t, a) -> {
          Arrays.fill(a, 0);
          for (int e = 0; e < 2 * n; e++) {
            int i = e % n;
            int j = e < n ? (i + 1) % n : (i + 7) % n;
            double g = conductance[e] * (1 + 0.5 * Math.sin(2 * Math.PI * t / 10 + phase[e]));
            a[i * n + i] -= g / capacity[i];
            a[i * n + j] += g / capacity[i];
            a[j * n + j] -= g / capacity[j];
            a[j * n + i] += g / capacity[j];
          }
          for (int i = 0; i < n; i += 10) {
            a[i * n + i] -= 0.05 / capacity[i];
          }
        };
    FormulaSystem.Smooth forcing =
        (t, b) -> {
          double outside = 20 + 10 * Math.sin(2 * Math.PI * t / 24);
          for (int i = 0; i < n; i++) {
            double leak = i % 10 == 0 ? 0.05 : 0;
            b[i] = (leak * outside + heat[i] * (1 + Math.cos(t))) / capacity[i];
          }
        };
    return new Network(sparse(FormulaSystem.forced(n, 0, 100, matrix, forcing)), start);
  }

  /** P3: a parabolic equation on 400 points, tridiagonal, on [0, 5]; starts from sin(pi x). */
  public static FormulaSystem parabolic() {
    int n = 400;
    double h = 1.0 / 401;
    FormulaSystem.Smooth matrix =
        (t, a) -> {
          Arrays.fill(a, 0);
          for (int i = 0; i < n; i++) {
            double x = (i + 1) * h;
            double left = 1 + 0.5 * Math.sin(2 * Math.PI * t) * Math.cos(Math.PI * (x - h / 2));
            double right = 1 + 0.5 * Math.sin(2 * Math.PI * t) * Math.cos(Math.PI * (x + h / 2));
            a[i * n + i] = -(left + right) / (h * h) - 5 * (1 + Math.sin(3 * x) * Math.cos(t));
            if (i > 0) {
              a[i * n + i - 1] = left / (h * h);
            }
            if (i < n - 1) {
              a[i * n + i + 1] = right / (h * h);
            }
          }
        };
    FormulaSystem.Smooth forcing =
        (t, b) -> {
          for (int i = 0; i < n; i++) {
            double x = (i + 1) * h - 0.5;
            b[i] = 10 * Math.exp(-50 * x * x) * (1 + Math.sin(2 * Math.PI * t));
          }
        };
    return sparse(FormulaSystem.forced(n, 0, 5, matrix, forcing));
  }

  /** P4: 20 coupled oscillators with periodic stiffness, for a number of periods pi. */
  public static FormulaSystem oscillators(int periods) {
    int m = 20;
    int n = 2 * m;
    FormulaSystem.Smooth matrix =
        (t, a) -> {
          Arrays.fill(a, 0);
          for (int i = 0; i < m; i++) {
            a[i * n + m + i] = 1;
            int row = (m + i) * n;
            a[row + m + i] = -2 * 0.005;
            a[row + i] = -(1 + 0.02 * i + 0.3 * Math.cos(2 * t) + 0.6);
            if (i > 0) {
              a[row + i - 1] = 0.3;
            }
            if (i < m - 1) {
              a[row + i + 1] = 0.3;
            }
          }
        };
    return sparse(FormulaSystem.homogeneous(n, 0, Math.PI * periods, matrix));
  }

  /** P6: two coupled oscillations of frequency 1000 on [0, 20], some 3200 periods. */
  public static FormulaSystem fast() {
    double w = 1000;
    return FormulaSystem.homogeneous(
        4,
        0,
        20,
        (t, a) -> {
          Arrays.fill(a, 0);
          a[1] = w;
          a[4] = -w * (1 + 0.1 * Math.sin(t / 2));
          a[6] = 5;
          a[11] = 1.01 * w;
          a[14] = -1.01 * w * (1 + 0.1 * Math.cos(t / 3));
          a[12] = 5;
        });
  }

  private static FormulaSystem sparse(FormulaSystem system) {
    int n = system.dimension();
    double[] a = new double[n * n];
    system.matrix(0.3, org.spanloom.numerics.Side.AFTER, a);
    return system.withPattern(FormulaSystem.patternOf(a, n));
  }
}
