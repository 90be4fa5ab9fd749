/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/**
 * A collocation method with points {@code 0 < c_1 < ... < c_s <= 1} on the unit step.
 *
 * <p>With {@code Z_i = x(t + c_i h) - x(t)} the collocation conditions of {@code x' = A x + b} read
 *
 * <pre>
 * sum_j D_ij Z_j = h (A_i (x + Z_i) + b_i),    i = 1..s,
 * x(t + h) = x + sum_i e_i Z_i,
 * </pre>
 *
 * where D holds the derivatives at c_i of the Lagrange polynomials on {0, c_1, ..., c_s}; it is the
 * inverse of the Runge-Kutta matrix. Sources: Butcher 1964, Math. Comp. 18, 50; Hairer &amp;
 * Wanner, Solving Ordinary Differential Equations II (1996), sections IV.5 and IV.8 (from memory).
 * The points are computed as zeros of Legendre polynomials, not taken from a table.
 */
public final class CollocationTableau {

  /** The family a method belongs to. */
  public enum Family {
    /** c_s = 1, order 2s - 1, damps what is much faster than the step. */
    RADAU_IIA("Radau IIA"),
    /** Order 2s, neither damps nor excites oscillations. */
    GAUSS("Gauss");

    private final String label;

    Family(String label) {
      this.label = label;
    }

    /** Returns the name for reports. */
    public String label() {
      return label;
    }
  }

  private static final MathContext EXACT = MathContext.DECIMAL128;

  private record Key(Family family, int stages) {}

  private static final Map<Key, CollocationTableau> KNOWN = new ConcurrentHashMap<>();

  private final Family family;
  private final double[] points;
  private final double[][] derivative;
  private final double[] end;
  private final double rounding;
  private final double[] barycentric;
  private final StageEigenvectors eigenvectors;
  private final double[] beforeFirst;
  private final double[] afterLast;
  private final double[] leading;
  private final double[] nextToLeading;

  private CollocationTableau(Family family, int stages) {
    this.family = family;
    points = family == Family.GAUSS ? gaussPoints(stages) : radauPoints(stages);
    BigDecimal[] weights = barycentricWeights(points);
    barycentric = new double[stages + 1];
    for (int i = 0; i <= stages; i++) {
      barycentric[i] = weights[i].doubleValue();
    }
    derivative = derivativeMatrix(points, weights);
    rounding = roundingOf(points, derivative);
    eigenvectors = new StageEigenvectors(derivative);
    end = new double[stages];
    weightsAt(1, end);
    beforeFirst = extrapolation(0);
    afterLast = extrapolation(1);
    leading = legendreCoefficient(stages);
    nextToLeading = legendreCoefficient(stages - 1);
  }

  /**
   * Returns a method.
   *
   * @param family its family
   * @param stages number of points s, from 2 to 20
   */
  public static CollocationTableau of(Family family, int stages) {
    return KNOWN.computeIfAbsent(
        new Key(family, stages), key -> new CollocationTableau(key.family(), key.stages()));
  }

  /** Returns the family. */
  public Family family() {
    return family;
  }

  /** Returns s. */
  public int stages() {
    return points.length;
  }

  /** Returns the order of the values at the ends of steps. */
  public int order() {
    return family == Family.GAUSS ? 2 * points.length : 2 * points.length - 1;
  }

  /** Returns point i, in (0, 1]. */
  public double point(int i) {
    return points[i];
  }

  /** Returns D_ij. */
  double derivative(int i, int j) {
    return derivative[i][j];
  }

  /** Returns e_i, the weight of Z_i in the value at the end. */
  double end(int i) {
    return end[i];
  }

  /** Returns the relative error that the rounding of D makes in every step. */
  double rounding() {
    return rounding;
  }

  /** Returns the eigenvectors of D. */
  StageEigenvectors eigenvectors() {
    return eigenvectors;
  }

  /** Tells whether the last point is the end of the step. */
  boolean endsAtPoint() {
    return family == Family.RADAU_IIA;
  }

  /** Returns the weight of Z_i in the coefficient of the Legendre polynomial of degree s. */
  double leading(int i) {
    return leading[i];
  }

  /** Returns the weight of Z_i in the coefficient of the Legendre polynomial of degree s - 1. */
  double nextToLeading(int i) {
    return nextToLeading[i];
  }

  /**
   * Returns the weight of the value at point i in the polynomial through the points, at the start
   * of the step.
   */
  double beforeFirst(int i) {
    return beforeFirst[i];
  }

  /**
   * Returns the weight of the value at point i in the polynomial through the points, at the end of
   * the step.
   */
  double afterLast(int i) {
    return afterLast[i];
  }

  private double[] extrapolation(double theta) {
    double[] w = new double[points.length];
    for (int i = 0; i < w.length; i++) {
      w[i] = 1;
      for (int j = 0; j < w.length; j++) {
        if (j != i) {
          w[i] *= (theta - points[j]) / (points[i] - points[j]);
        }
      }
    }
    return w;
  }

  /**
   * Writes the weights with which {@code x + sum w_i Z_i} is the collocation polynomial at a place
   * in the step.
   *
   * @param theta from 0 to 1
   * @param weights receives s weights
   */
  void weightsAt(double theta, double[] weights) {
    int s = points.length;
    for (int i = 0; i < s; i++) {
      if (theta == points[i]) {
        java.util.Arrays.fill(weights, 0);
        weights[i] = 1;
        return;
      }
    }
    if (theta == 0) {
      java.util.Arrays.fill(weights, 0);
      return;
    }
    double sum = barycentric[0] / theta;
    for (int i = 0; i < s; i++) {
      weights[i] = barycentric[i + 1] / (theta - points[i]);
      sum += weights[i];
    }
    for (int i = 0; i < s; i++) {
      weights[i] /= sum;
    }
  }

  /**
   * Weights of the barycentric formula on {0, c_1, ..., c_s} (Berrut &amp; Trefethen 2004, SIAM
   * Review 46, 501).
   */
  private static BigDecimal[] barycentricWeights(double[] points) {
    int s = points.length;
    BigDecimal[] w = new BigDecimal[s + 1];
    for (int i = 0; i <= s; i++) {
      BigDecimal product = BigDecimal.ONE;
      for (int j = 0; j <= s; j++) {
        if (j != i) {
          product = product.multiply(node(points, i).subtract(node(points, j)), EXACT);
        }
      }
      w[i] = BigDecimal.ONE.divide(product, EXACT);
    }
    return w;
  }

  private static BigDecimal node(double[] points, int i) {
    return i == 0 ? BigDecimal.ZERO : new BigDecimal(points[i - 1]);
  }

  /**
   * Entries are rounded once only: their errors are the same in every step and add up over many.
   */
  private static double[][] derivativeMatrix(double[] points, BigDecimal[] w) {
    int s = points.length;
    double[][] d = new double[s][s];
    for (int i = 1; i <= s; i++) {
      BigDecimal sum = BigDecimal.ZERO;
      for (int j = 0; j <= s; j++) {
        if (j != i) {
          BigDecimal distance = node(points, i).subtract(node(points, j));
          BigDecimal entry = w[j].divide(w[i], EXACT).divide(distance, EXACT);
          sum = sum.add(entry);
          if (j > 0) {
            d[i - 1][j - 1] = entry.doubleValue();
          }
        }
      }
      d[i - 1][i - 1] = -sum.doubleValue();
      keepStraightLines(d[i - 1], points);
    }
    return d;
  }

  /**
   * Moves the smallest entry of a row, where rounding is finest, so that sum_j D_ij c_j = 1 holds
   * as well as it can.
   */
  private static void keepStraightLines(double[] row, double[] points) {
    int smallest = 0;
    for (int j = 1; j < row.length; j++) {
      if (Math.abs(row[j] * points[j]) < Math.abs(row[smallest] * points[smallest])) {
        smallest = j;
      }
    }
    BigDecimal off = momentError(row, points, 1, BigDecimal.ONE);
    BigDecimal point = new BigDecimal(points[smallest]);
    row[smallest] = new BigDecimal(row[smallest]).subtract(off.divide(point, EXACT)).doubleValue();
  }

  /** Returns sum_j D_ij c_j^power - wanted. */
  private static BigDecimal momentError(
      double[] row, double[] points, int power, BigDecimal wanted) {
    BigDecimal sum = wanted.negate();
    for (int j = 0; j < row.length; j++) {
      BigDecimal moment = new BigDecimal(points[j]).pow(power, EXACT);
      sum = sum.add(new BigDecimal(row[j]).multiply(moment));
    }
    return sum;
  }

  /** Returns how far D, as rounded, is from differentiating t and t^2. */
  private static double roundingOf(double[] points, double[][] derivative) {
    double largest = 0;
    for (int i = 0; i < points.length; i++) {
      BigDecimal slope = new BigDecimal(points[i]).multiply(BigDecimal.TWO);
      double line = momentError(derivative[i], points, 1, BigDecimal.ONE).doubleValue();
      double square = momentError(derivative[i], points, 2, slope).doubleValue();
      largest = Math.max(largest, Math.abs(line) + Math.abs(square) / 2);
    }
    return largest;
  }

  /**
   * Legendre coefficient of a degree of the polynomial that is Z_i at c_i and 0 at 0, by Gauss
   * quadrature.
   */
  private double[] legendreCoefficient(int degree) {
    int s = points.length;
    double[] result = new double[s];
    double[] nodes = gaussPoints(s + 1);
    double[] weights = new double[s];
    for (double node : nodes) {
      double x = 2 * node - 1;
      double[] p = legendre(s + 1, x);
      double slope = legendreSlope(s + 1, x, p);
      double quadrature = 2 / ((1 - x * x) * slope * slope);
      weightsAt(node, weights);
      for (int i = 0; i < s; i++) {
        result[i] += (2 * degree + 1) / 2.0 * quadrature * legendre(degree, x)[0] * weights[i];
      }
    }
    return result;
  }

  /** Zeros of the Legendre polynomial of degree s, moved to (0, 1). */
  private static double[] gaussPoints(int s) {
    double[] c = new double[s];
    for (int k = 0; k < s; k++) {
      double x = -Math.cos(Math.PI * (k + 0.75) / (s + 0.5));
      for (int step = 0; step < 20; step++) {
        double[] p = legendre(s, x);
        double move = p[0] / legendreSlope(s, x, p);
        x -= move;
        if (Math.abs(move) < 1e-16) {
          break;
        }
      }
      c[k] = (1 + x) / 2;
    }
    return c;
  }

  /** Zeros of P_s - P_(s-1), moved to (0, 1]; the last is 1. */
  private static double[] radauPoints(int s) {
    double[] c = new double[s];
    int found = 0;
    int cells = 400 * s;
    double left = -1;
    double leftValue = radauPolynomial(s, left);
    for (int k = 1; k < cells && found < s - 1; k++) {
      double right = -Math.cos(Math.PI * k / cells);
      double rightValue = radauPolynomial(s, right);
      if (leftValue * rightValue < 0) {
        c[found++] = (1 + bisect(s, left, right)) / 2;
      }
      left = right;
      leftValue = rightValue;
    }
    c[s - 1] = 1;
    return c;
  }

  private static double bisect(int s, double from, double to) {
    double left = from;
    double right = to;
    double sign = radauPolynomial(s, left);
    for (int k = 0; k < 70; k++) {
      double middle = (left + right) / 2;
      if (radauPolynomial(s, middle) * sign > 0) {
        left = middle;
      } else {
        right = middle;
      }
    }
    return (left + right) / 2;
  }

  private static double radauPolynomial(int s, double x) {
    double[] p = legendre(s, x);
    return p[0] - p[1];
  }

  /** Returns P_degree(x) and P_(degree-1)(x) by the three-term recurrence. */
  private static double[] legendre(int degree, double x) {
    double before = 0;
    double p = 1;
    for (int k = 1; k <= degree; k++) {
      double next = ((2 * k - 1) * x * p - (k - 1) * before) / k;
      before = p;
      p = next;
    }
    return new double[] {p, before};
  }

  private static double legendreSlope(int degree, double x, double[] p) {
    return degree * (x * p[0] - p[1]) / (x * x - 1);
  }
}
