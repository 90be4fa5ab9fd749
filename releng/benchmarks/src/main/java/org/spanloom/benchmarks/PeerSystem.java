/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.util.Arrays;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.TimeRange;

/**
 * The systems of the numerical benchmarks. All parameters are invented; random numbers come from
 * {@code s = (1103515245 s + 12345) mod 2^31, u = s / 2^31}, the seed being the first s.
 *
 * @param name "P1" to "P6"
 * @param dimension number of states
 * @param range where it is solved, from the start
 * @param a writes A, row by row
 * @param b writes b
 * @param start initial values of its trajectory
 * @param pattern entries of A that are not always zero
 */
@SuppressWarnings("ArrayRecordComponent") // nobody compares systems
record PeerSystem(
    String name,
    int dimension,
    TimeRange range,
    Coefficients a,
    Coefficients b,
    double[] start,
    SparsityPattern pattern)
    implements LinearSystem {

  /** Writes coefficients at a time. */
  @FunctionalInterface
  interface Coefficients {
    void write(double t, double[] entries);
  }

  private static final Coefficients NONE = (t, b) -> Arrays.fill(b, 0);

  private static final class Random {
    private long state;

    Random(long seed) {
      state = seed;
    }

    double unit() {
      state = (1103515245L * state + 12345) % (1L << 31);
      return state / (double) (1L << 31);
    }
  }

  private static PeerSystem of(
      String name, double end, Coefficients a, Coefficients b, double... start) {
    int n = start.length;
    double[] sample = new double[n * n];
    a.write(0.3, sample);
    int[] rowStart = new int[n + 1];
    int[] columns = new int[n * n];
    int count = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (sample[i * n + j] != 0) {
          columns[count++] = j;
        }
      }
      rowStart[i + 1] = count;
    }
    SparsityPattern pattern = new SparsityPattern(rowStart, Arrays.copyOf(columns, count));
    return new PeerSystem(name, n, new TimeRange(0, end), a, b, start, pattern);
  }

  /** P1: four states, not stiff: {@code A0 + A1 sin t + A2 cos 2t} on [0, 20]. */
  static PeerSystem smooth() {
    Random random = new Random(1);
    double[][] parts = new double[3][16];
    for (double[] part : parts) {
      Arrays.setAll(part, e -> 2 * random.unit() - 1);
    }
    for (int i = 0; i < 4; i++) {
      parts[0][5 * i] -= 0.5;
    }
    Coefficients a =
        (t, out) -> {
          double sin = Math.sin(t);
          double cos = Math.cos(2 * t);
          for (int e = 0; e < 16; e++) {
            out[e] = parts[0][e] + parts[1][e] * sin + parts[2][e] * cos;
          }
        };
    return of("P1", 20, a, NONE, 1, 0, 0, 0);
  }

  /** P2: a stiff thermal network of 60 nodes and 120 conductances on [0, 100]. */
  static PeerSystem network() {
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
    Coefficients a =
        (t, out) -> {
          Arrays.fill(out, 0);
          for (int e = 0; e < 2 * n; e++) {
            int i = e % n;
            int j = e < n ? (i + 1) % n : (i + 7) % n;
            double g = conductance[e] * (1 + 0.5 * Math.sin(2 * Math.PI * t / 10 + phase[e]));
            out[i * n + i] -= g / capacity[i];
            out[i * n + j] += g / capacity[i];
            out[j * n + j] -= g / capacity[j];
            out[j * n + i] += g / capacity[j];
          }
          for (int i = 0; i < n; i += 10) {
            out[i * n + i] -= 0.05 / capacity[i];
          }
        };
    Coefficients b =
        (t, out) -> {
          double outside = 20 + 10 * Math.sin(2 * Math.PI * t / 24);
          for (int i = 0; i < n; i++) {
            double leak = i % 10 == 0 ? 0.05 : 0;
            out[i] = (leak * outside + heat[i] * (1 + Math.cos(t))) / capacity[i];
          }
        };
    return of("P2", 100, a, b, start);
  }

  /** P3: a parabolic equation on n points, tridiagonal, on [0, 5]. */
  static PeerSystem parabolic(int n) {
    double h = 1.0 / (n + 1);
    Coefficients a =
        (t, out) -> {
          Arrays.fill(out, 0);
          double swing = 0.5 * Math.sin(2 * Math.PI * t);
          for (int i = 0; i < n; i++) {
            double x = (i + 1) * h;
            double left = 1 + swing * Math.cos(Math.PI * (x - h / 2));
            double right = 1 + swing * Math.cos(Math.PI * (x + h / 2));
            out[i * n + i] = -(left + right) / (h * h) - 5 * (1 + Math.sin(3 * x) * Math.cos(t));
            if (i > 0) {
              out[i * n + i - 1] = left / (h * h);
            }
            if (i < n - 1) {
              out[i * n + i + 1] = right / (h * h);
            }
          }
        };
    Coefficients b =
        (t, out) -> {
          for (int i = 0; i < n; i++) {
            double x = (i + 1) * h - 0.5;
            out[i] = 10 * Math.exp(-50 * x * x) * (1 + Math.sin(2 * Math.PI * t));
          }
        };
    double[] start = new double[n];
    Arrays.setAll(start, i -> Math.sin(Math.PI * (i + 1) * h));
    return of("P3", 5, a, b, start);
  }

  /** P4: twenty coupled oscillators with periodic stiffness, for a number of periods pi. */
  static PeerSystem oscillators(int periods) {
    int m = 20;
    int n = 2 * m;
    Coefficients a =
        (t, out) -> {
          Arrays.fill(out, 0);
          for (int i = 0; i < m; i++) {
            out[i * n + m + i] = 1;
            int row = (m + i) * n;
            out[row + m + i] = -2 * 0.005;
            out[row + i] = -(1 + 0.02 * i + 0.3 * Math.cos(2 * t) + 0.6);
            if (i > 0) {
              out[row + i - 1] = 0.3;
            }
            if (i < m - 1) {
              out[row + i + 1] = 0.3;
            }
          }
        };
    double[] start = new double[n];
    Arrays.setAll(start, i -> i < m ? 1.0 / (1 + i) : 0);
    return of("P4", Math.PI * periods, a, NONE, start);
  }

  /** P6: two coupled oscillations of frequency 1000 on [0, 20], some 3200 periods. */
  static PeerSystem fast() {
    double w = 1000;
    Coefficients a =
        (t, out) -> {
          Arrays.fill(out, 0);
          out[1] = w;
          out[4] = -w * (1 + 0.1 * Math.sin(t / 2));
          out[6] = 5;
          out[11] = 1.01 * w;
          out[14] = -1.01 * w * (1 + 0.1 * Math.cos(t / 3));
          out[12] = 5;
        };
    return of("P6", 20, a, NONE, 1, 0, 1, 0);
  }

  @Override
  public void matrix(double t, Side side, double[] entries) {
    a.write(t, entries);
  }

  @Override
  public void forcing(double t, Side side, double[] entries) {
    b.write(t, entries);
  }

  @Override
  public boolean hasConstantMatrix() {
    return false;
  }

  @Override
  public boolean hasConstantForcing() {
    return b == NONE;
  }

  @Override
  public double[] breakpoints() {
    return new double[0];
  }
}
