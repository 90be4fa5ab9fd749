/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.Solved;
import org.spanloom.numerics.solution.InitialValues;
import org.spanloom.numerics.solution.Solution;

/** Are the exponents those of the Magnus series, and the orders those that are claimed? */
final class MagnusExponentTests {

  /** Words over the letters 1..s; a letter weighs its number. */
  private record Words(List<int[]> all, int letters) {
    static Words upTo(int weight, int letters) {
      List<int[]> all = new ArrayList<>();
      add(new int[0], weight, letters, all);
      return new Words(all, letters);
    }

    private static void add(int[] word, int left, int letters, List<int[]> all) {
      all.add(word);
      for (int letter = 1; letter <= Math.min(letters, left); letter++) {
        int[] longer = Arrays.copyOf(word, word.length + 1);
        longer[word.length] = letter;
        add(longer, left - letter, letters, all);
      }
    }

    int indexOf(int first, int[] rest) {
      int[] word = new int[rest.length + 1];
      word[0] = first;
      System.arraycopy(rest, 0, word, 1, rest.length);
      for (int k = 0; k < all.size(); k++) {
        if (Arrays.equals(all.get(k), word)) {
          return k;
        }
      }
      return -1;
    }

    /** The matrix that puts a letter in front of every word. */
    double[] inFront(int letter) {
      int n = all.size();
      double[] matrix = new double[n * n];
      for (int k = 0; k < n; k++) {
        int row = indexOf(letter, all.get(k));
        if (row >= 0) {
          matrix[row * n + k] = 1;
        }
      }
      return matrix;
    }
  }

  /**
   * The coefficient of a word in the solution over tau from -1/2 to 1/2 of {@code X' = (alpha_1 +
   * alpha_2 tau + ...) X}: an iterated integral of powers of tau, the first letter last in time.
   */
  private static double coefficient(int[] word) {
    double[] polynomial = {1};
    for (int k = word.length - 1; k >= 0; k--) {
      double[] integral = new double[polynomial.length + word[k]];
      double atStart = 0;
      for (int d = 0; d < polynomial.length; d++) {
        int degree = d + word[k];
        integral[degree] = polynomial[d] / degree;
        atStart += integral[degree] * Math.pow(-0.5, degree);
      }
      integral[0] -= atStart;
      polynomial = integral;
    }
    double value = 0;
    for (int d = polynomial.length - 1; d >= 0; d--) {
      value = value * 0.5 + polynomial[d];
    }
    return value;
  }

  /**
   * In an algebra where nothing commutes and products of more than p letters vanish, e^Omega must
   * have the coefficients of the exact solution.
   */
  @ParameterizedTest
  @EnumSource(MagnusOrder.class)
  void exponentsAgreeWithTheSeriesWordByWord(MagnusOrder order) {
    Words words = Words.upTo(order.order(), order.count());
    int n = words.all().size();
    double[][] letters = new double[order.count()][];
    Arrays.setAll(letters, k -> words.inFront(k + 1));
    double[][] a = new double[order.count()][n * n];
    for (int i = 0; i < order.count(); i++) {
      double tau = order.point(i) - 0.5;
      for (int k = 0; k < order.count(); k++) {
        for (int e = 0; e < n * n; e++) {
          a[i][e] += Math.pow(tau, k) * letters[k][e];
        }
      }
    }
    double[] omega = new double[n * n];
    new MagnusExponent(order, n).write(1, a, omega);
    double[] term = new double[n];
    term[0] = 1;
    double[] sum = term.clone();
    for (int k = 1; k <= order.order(); k++) {
      double[] next = new double[n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          next[i] += omega[i * n + j] * term[j] / k;
        }
        sum[i] += next[i];
      }
      term = next;
    }
    for (int k = 0; k < n; k++) {
      int[] word = words.all().get(k);
      assertEquals(coefficient(word), sum[k], 2e-14, () -> "word " + Arrays.toString(word));
    }
  }

  private static final FormulaSystem SWINGING =
      FormulaSystem.forced(
          3,
          0,
          1,
          (t, a) -> {
            double[] rows = {
              -0.2, 1 + t, Math.sin(t), -2, 0.1 * t, 1, Math.cos(3 * t), 0.5, -0.4 * t * t
            };
            System.arraycopy(rows, 0, a, 0, 9);
          },
          (t, b) -> {
            b[0] = Math.exp(-t);
            b[1] = 1;
            b[2] = t;
          });

  /** Halving a step of order p divides its error by 2^(p+1). */
  @ParameterizedTest
  @EnumSource(MagnusOrder.class)
  void localErrorsShrinkWithTheOrder(MagnusOrder order) {
    double[] x0 = {1, -0.5, 0.25};
    InitialValues values =
        new InitialValues(SWINGING, true, 0, x0, 1, SWINGING.range(), Solved.accuracy(3, 1e-9));
    BalancedSystem balanced = BalancedSystem.of(values);
    Solution exact = Solved.trajectory(SWINGING, 1e-14, x0);
    double h = order == MagnusOrder.EIGHT ? 0.6 : 0.15;
    double ratio = error(balanced, order, x0, exact, h) / error(balanced, order, x0, exact, h / 2);
    double measured = Math.log(ratio) / Math.log(2);
    assertTrue(
        Math.abs(measured - (order.order() + 1)) < 0.6, () -> order + ": measured " + measured);
  }

  private static double error(
      BalancedSystem balanced, MagnusOrder order, double[] x0, Solution exact, double h) {
    double[] y = balanced.scaled(x0, 1);
    double[] matrix = new StepPropagator(balanced, order).over(0, h, Watch.NONE);
    double[] end = new double[y.length];
    org.spanloom.numerics.internal.algebra.Flat.product(matrix, y, end, balanced.size(), 1);
    double[] x = new double[3];
    balanced.unscaled(end, 1, x);
    double[] right = Solved.at(exact, h);
    double off = 0;
    for (int i = 0; i < 3; i++) {
      off = Math.max(off, Math.abs(x[i] - right[i]));
    }
    return off;
  }

  /** A spinning body: A is skew, so its propagators are rotations whatever the step. */
  @ParameterizedTest
  @EnumSource(MagnusOrder.class)
  void rotationsStayRotations(MagnusOrder order) {
    FormulaSystem spinning =
        FormulaSystem.homogeneous(
            3,
            0,
            50,
            (t, a) -> {
              double x = 2 * Math.cos(0.3 * t);
              double y = 3 * Math.sin(0.2 * t);
              double[] rows = {0, -5, y, 5, 0, -x, -y, x, 0};
              System.arraycopy(rows, 0, a, 0, 9);
            });
    Solution basis =
        MagnusSolver.solve(
            new InitialValues(
                spinning,
                false,
                0,
                Solved.identity(3),
                3,
                spinning.range(),
                Solved.accuracy(3, 1e-6)),
            order,
            Watch.NONE);
    double[] x = Solved.at(basis, 50);
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        double product = 0;
        for (int k = 0; k < 3; k++) {
          product += x[k * 3 + i] * x[k * 3 + j];
        }
        assertEquals(i == j ? 1 : 0, product, 1e-12);
      }
    }
  }
}
