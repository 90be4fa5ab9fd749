/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import java.util.List;
import java.util.Optional;
import org.ejml.data.Complex_F64;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.exponential.ExponentialSolution;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The method for a system and its order.
 *
 * @param method the method
 * @param order order of the method: local errors shrink with the power of one more; 0 for the
 *     exponential, which has none
 */
public record MethodChoice(Method method, int order) {

  private static final int MOST_STATES_FOR_EIGENVALUES = 100;

  /** Above this many states products of full matrices cost more than the steps they save. */
  private static final int MOST_STATES_FOR_MAGNUS = 40;

  /** Up to this many states a step of a Magnus integrator is cheap whatever the system does. */
  private static final int FEW_STATES = 8;

  private static final List<MethodChoice> ALL =
      List.of(
          new MethodChoice(Method.MATRIX_EXPONENTIAL, 0),
          new MethodChoice(Method.MAGNUS, 4),
          new MethodChoice(Method.MAGNUS, 6),
          new MethodChoice(Method.MAGNUS, 8),
          new MethodChoice(Method.RADAU_COLLOCATION, 5),
          new MethodChoice(Method.RADAU_COLLOCATION, 9),
          new MethodChoice(Method.RADAU_COLLOCATION, 13),
          new MethodChoice(Method.GAUSS_COLLOCATION, 6),
          new MethodChoice(Method.GAUSS_COLLOCATION, 10),
          new MethodChoice(Method.GAUSS_COLLOCATION, 14));

  /** Returns the names by which a method can be asked for, in a fixed order. */
  public static List<String> names() {
    return ALL.stream().map(MethodChoice::name).toList();
  }

  /** Returns the method of a name, if there is one. */
  public static Optional<MethodChoice> named(String name) {
    return ALL.stream().filter(choice -> choice.name().equals(name)).findFirst();
  }

  /** Returns the name by which it can be asked for, for example "magnus8". */
  public String name() {
    return switch (method) {
      case MATRIX_EXPONENTIAL -> "exponential";
      case MAGNUS -> "magnus" + order;
      case RADAU_COLLOCATION -> "radau" + order;
      case GAUSS_COLLOCATION -> "gauss" + order;
    };
  }

  /**
   * Chooses for a system.
   *
   * @param values the system, n at least 1, and a bounded range longer than 0
   * @param watch asked while working
   */
  public static MethodChoice of(InitialValues values, Watch watch) {
    if (fitsExponential(values)) {
      return new MethodChoice(Method.MATRIX_EXPONENTIAL, 0);
    }
    int n = values.system().dimension();
    double relative = values.accuracy().relative();
    if (n > MOST_STATES_FOR_EIGENVALUES) {
      return new MethodChoice(Method.RADAU_COLLOCATION, 2 * stages(n, relative) - 1);
    }
    Tempo tempo = Tempo.of(values, watch);
    if (tempo.suitsMagnus(n)) {
      return new MethodChoice(Method.MAGNUS, relative >= 1e-2 ? 6 : 8);
    }
    return tempo.decaysFast()
        ? new MethodChoice(Method.RADAU_COLLOCATION, 2 * stages(n, relative) - 1)
        : new MethodChoice(Method.GAUSS_COLLOCATION, 2 * stages(n, relative));
  }

  /** Tells whether the system is constant, finite, and of a size that the exponential can hold. */
  static boolean fitsExponential(InitialValues values) {
    LinearSystem system = values.system();
    TimeRange span = values.span();
    int n = system.dimension();
    if (!system.hasConstantMatrix() || values.forced() && !system.hasConstantForcing()) {
      return false;
    }
    double[] a = new double[n * n];
    system.matrix(span.start(), Side.AFTER, a);
    return Rows.isFinite(a) && ExponentialSolution.fits(a, n, span.length());
  }

  /**
   * More points pay off when much accuracy is asked for; with many states their factorisation costs
   * more.
   */
  private static int stages(int n, double relative) {
    if (n <= 12) {
      return relative > 1e-5 ? 5 : 7;
    }
    if (relative > 1e-4) {
      return 3;
    }
    return relative >= 1e-10 ? 5 : 7;
  }

  /**
   * How fast a system decays and turns, by the eigenvalues of A at five times.
   *
   * @param decaysFast whether some direction decays much faster than it turns and than the range
   *     lasts, at any of the times
   * @param decay fastest decay, times the length of the range
   * @param turns fastest turning, in radians over the range
   * @param change how much A changes, relative to its size, while the fastest direction turns by
   *     one radian; the most that was seen
   */
  private record Tempo(boolean decaysFast, double decay, double turns, double change) {

    static final Tempo UNKNOWN =
        new Tempo(true, Double.POSITIVE_INFINITY, 0, Double.POSITIVE_INFINITY);

    static Tempo of(InitialValues values, Watch watch) {
      LinearSystem system = values.system();
      TimeRange span = values.span();
      int n = system.dimension();
      boolean decaysFast = false;
      double mostDecay = 0;
      double mostTurning = 0;
      double mostChange = 0;
      double[] later = new double[n * n];
      for (int k = 0; k < 5; k++) {
        watch.ask();
        DMatrixRMaj a = new DMatrixRMaj(n, n);
        double t = span.start() + span.length() * (2 * k + 1) / 10;
        system.matrix(t, Side.AFTER, a.data);
        EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, false);
        double[] here = a.data.clone();
        if (!Rows.isFinite(a.data) || !eigen.decompose(a)) {
          return UNKNOWN;
        }
        double decay = 0;
        double turning = 0;
        for (int i = 0; i < n; i++) {
          Complex_F64 value = eigen.getEigenvalue(i);
          decay = Math.max(decay, -value.getReal());
          turning = Math.max(turning, Math.abs(value.getImaginary()));
        }
        decaysFast |= decay * span.length() > 50 && decay > 0.5 * turning;
        mostDecay = Math.max(mostDecay, decay);
        mostTurning = Math.max(mostTurning, turning);
        if (turning > 0) {
          system.matrix(Math.min(t + 1 / turning, span.end()), Side.BEFORE, later);
          mostChange = Math.max(mostChange, change(here, later));
        }
      }
      return new Tempo(
          decaysFast, mostDecay * span.length(), mostTurning * span.length(), mostChange);
    }

    private static double change(double[] here, double[] later) {
      double size = 0;
      double off = 0;
      for (int e = 0; e < here.length; e++) {
        size = Math.max(size, Math.abs(here[e]));
        off = Math.max(off, Math.abs(later[e] - here[e]));
      }
      return size > 0 ? off / size : 0;
    }

    /** Oscillations that change slowly, or so few states that a step costs little. */
    boolean suitsMagnus(int n) {
      if (n <= FEW_STATES) {
        return decay < 400;
      }
      return n <= MOST_STATES_FOR_MAGNUS && turns > 200 && decay < 0.25 * turns && change < 0.02;
    }
  }
}
