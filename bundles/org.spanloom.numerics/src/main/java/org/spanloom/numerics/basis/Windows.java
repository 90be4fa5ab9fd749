/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import java.util.OptionalDouble;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/**
 * Counts the consecutive windows, each with a principal basis of its own from its start, that cover
 * a range with scaled condition numbers below a limit. Each window goes as far as it can, which
 * makes their number least.
 */
public final class Windows {

  private static final int MOST = 2_000;
  private static final int MOST_TRIALS = 8_000;

  private final LinearSystem system;
  private final TimeRange range;
  private final Accuracy accuracy;
  private final double limit;
  private final Progress progress;

  private Windows(
      LinearSystem system, TimeRange range, Accuracy accuracy, double limit, Progress progress) {
    this.system = system;
    this.range = range;
    this.accuracy = accuracy;
    this.limit = limit;
    this.progress = progress;
  }

  /**
   * Counts.
   *
   * @param system the system
   * @param range bounded range to cover
   * @param accuracy error asked of each basis
   * @param limit scaled condition number that no window may exceed, larger than 1
   * @param progress watched and asked while working
   * @return the number, at least 1; unsolved when more than {@value #MOST} would be needed
   */
  public static Outcome<Integer> count(
      LinearSystem system, TimeRange range, Accuracy accuracy, double limit, Progress progress) {
    return new Windows(system, range, accuracy, limit, progress).count();
  }

  /** Where a window ends. */
  private sealed interface End {
    /** At a time, or beyond the horizon that was tried when {@code limited} is false. */
    record At(double time, boolean limited) implements End {}

    record Stopped(Outcome<Integer> outcome) implements End {}

    /** The basis overflows before the horizon. */
    record TooFar() implements End {}
  }

  private Outcome<Integer> count() {
    if (system.dimension() <= 1 || range.length() == 0) {
      return new Outcome.Solved<>(1);
    }
    double start = range.start();
    double step = range.length();
    int windows = 1;
    for (int trial = 0; trial < MOST_TRIALS && windows <= MOST; trial++) {
      double horizon = start + step >= range.end() ? range.end() : start + step;
      if (!(horizon > start)) {
        return tooMany(start);
      }
      switch (end(start, horizon)) {
        case End.Stopped stopped -> {
          return stopped.outcome();
        }
        case End.TooFar tooFar -> step /= 8;
        case End.At at when !at.limited() && horizon >= range.end() -> {
          return new Outcome.Solved<>(windows);
        }
        case End.At at when !at.limited() -> step *= 2;
        case End.At at -> {
          double length = at.time() - start;
          if (system.hasConstantMatrix() && system.jumps().isEmpty()) {
            return equal(length);
          }
          windows++;
          start = at.time();
          step = 2 * length;
          progress.worked((start - range.start()) / range.length());
        }
      }
    }
    return tooMany(start);
  }

  /** With constant coefficients all windows are equally long. */
  private Outcome<Integer> equal(double length) {
    double count = Math.ceil(range.length() / length);
    return count <= MOST ? new Outcome.Solved<>((int) count) : tooMany(range.start() + length);
  }

  private Outcome<Integer> tooMany(double time) {
    return new Outcome.Unsolved<>(
        Outcome.Reason.TOO_MUCH_WORK, time, "more than " + MOST + " windows");
  }

  private End end(double start, double horizon) {
    int n = system.dimension();
    double[] identity = new double[n * n];
    for (int i = 0; i < n; i++) {
      identity[i * n + i] = 1;
    }
    TimeRange window = new TimeRange(start, horizon);
    return switch (SolutionSolver.homogeneous(
        system, start, identity, window, accuracy, progress)) {
      case Outcome.Cancelled<Solution> c -> new End.Stopped(new Outcome.Cancelled<>());
      case Outcome.Unsolved<Solution> u when u.reason() == Outcome.Reason.OVERFLOW ->
          new End.TooFar();
      case Outcome.Unsolved<Solution> u ->
          new End.Stopped(new Outcome.Unsolved<>(u.reason(), u.time(), u.detail()));
      case Outcome.Solved<Solution> s -> end(s.value(), window);
    };
  }

  private End end(Solution basis, TimeRange window) {
    return switch (ConditionProfile.firstScaledAbove(
        system, basis, window, limit, new Silent(progress))) {
      case Outcome.Cancelled<OptionalDouble> c -> new End.Stopped(new Outcome.Cancelled<>());
      case Outcome.Unsolved<OptionalDouble> u ->
          new End.Stopped(new Outcome.Unsolved<>(u.reason(), u.time(), u.detail()));
      case Outcome.Solved<OptionalDouble> s ->
          s.value().isPresent()
              ? new End.At(s.value().getAsDouble(), true)
              : new End.At(window.end(), false);
    };
  }

  /** Passes on the wish to cancel, but not the progress of a part. */
  private record Silent(Progress whole) implements Progress {
    @Override
    public void worked(double fraction) {}

    @Override
    public boolean isCancelled() {
      return whole.isCancelled();
    }
  }
}
