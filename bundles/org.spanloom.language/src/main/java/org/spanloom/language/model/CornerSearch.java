/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.model.Corners.Corner;

/**
 * Finds the {@link Corners} of terms over a bounded range of times. Those of a term come from what
 * it is built of: each choice, pulse, {@code abs}, {@code sign}, {@code min} and {@code max} is
 * looked at once, however often it is used.
 */
public final class CornerSearch {

  /** Times that are this near, in units in the last place, are one corner. */
  private static final int ONE_CORNER = 8;

  private static final int MOST_COLLECTED = 4 * Corners.LIMIT;

  private final TimeGrid grid;
  private final Map<String, Double> replaced;
  private final Map<Object, List<Corner>> known = new IdentityHashMap<>();
  private final List<Corner> found = new ArrayList<>();
  private Optional<Corners.Gap> gap = Optional.empty();

  /**
   * Starts a search.
   *
   * @param from start of the range, in the unit of the caller
   * @param to end of the range
   * @param factor the unit in coherent SI units
   * @param replaced values that replace those of parameters, in coherent SI units, by name
   */
  public CornerSearch(double from, double to, double factor, Map<String, Double> replaced) {
    this.grid = new TimeGrid(from, to, factor);
    this.replaced = Map.copyOf(replaced);
  }

  /** Looks through a term. */
  public void add(Term root) {
    Deque<Term> open = new ArrayDeque<>();
    open.push(root);
    while (!open.isEmpty()) {
      Term term = open.peek();
      if (known.containsKey(TermTape.identity(term))) {
        open.pop();
        continue;
      }
      boolean ready = true;
      for (Term operand : TermTape.operands(term)) {
        if (!known.containsKey(TermTape.identity(operand))) {
          open.push(operand);
          ready = false;
        }
      }
      if (ready) {
        open.pop();
        List<Corner> corners = corners(term);
        known.put(TermTape.identity(term), corners);
        found.addAll(corners);
      }
    }
  }

  /** Returns what was found. */
  public Corners result() {
    List<Corner> merged = merged(found);
    if (merged.size() > Corners.LIMIT) {
      note(new Corners.TooMany());
    }
    boolean listed = gap.isEmpty() || !(gap.get() instanceof Corners.TooMany);
    return new Corners(listed ? merged : List.of(), gap);
  }

  private List<Corner> corners(Term term) {
    return switch (term) {
      case Term.FunctionTerm(Function function, List<Term> u) ->
          switch (function) {
            case ABS, SIGN -> signChanges(u.getFirst());
            case MIN, MAX -> signChanges(new Term.Difference(u.getFirst(), u.getLast()));
            case SIN, COS, TAN, ASIN, ACOS, ATAN, SINH, COSH, TANH, EXP, LOG, LOG10, SQRT ->
                List.of();
          };
      case Term.Switch choice -> signChanges(choice.gap());
      case Term.Pulse pulse -> pulse.time() instanceof Term.Time ? edges(pulse) : List.of();
      case Term.CurveTerm curve ->
          curve.time() instanceof Term.Time ? knots(curve.curve()) : List.of();
      case Term.Constant c -> List.of();
      case Term.Time t -> List.of();
      case Term.ParameterTerm p -> List.of();
      case Term.LetTerm let -> List.of();
      case Term.Sum sum -> List.of();
      case Term.Difference difference -> List.of();
      case Term.Product product -> List.of();
      case Term.Quotient quotient -> List.of();
      case Term.Negation negation -> List.of();
      case Term.Power power -> List.of();
    };
  }

  private List<Corner> signChanges(Term term) {
    TermTape tape = TermTape.of(term);
    if (!tape.varies(tape.size() - 1) || tooMany()) {
      return List.of();
    }
    List<Corner> inner = new ArrayList<>();
    for (int i = 0; i < tape.size(); i++) {
      inner.addAll(known.getOrDefault(TermTape.identity(tape.node(i)), List.of()));
    }
    SignChanges changes = new SignChanges(term, tape, grid, replaced);
    List<Corner> corners = changes.between(merged(inner));
    changes.untraced().ifPresent(time -> note(new Corners.Untraced(term, time)));
    return corners;
  }

  private List<Corner> edges(Term.Pulse pulse) {
    PulseTrain train =
        new PulseTrain(value(pulse.period()), value(pulse.width()), value(pulse.start()));
    if (!train.isSound() || tooMany()) {
      return List.of();
    }
    double first = train.pulseAt(grid.base(grid.from()));
    double last = train.pulseAt(grid.base(grid.to())) + 1;
    if (!(last - first < Corners.LIMIT / 2)) {
      note(new Corners.TooMany());
      return List.of();
    }
    List<Corner> edges = new ArrayList<>();
    for (double k = first; k <= last; k++) {
      grid.step(train.rise(k)).ifPresent(edges::add);
      grid.step(train.fall(k)).ifPresent(edges::add);
    }
    return edges;
  }

  private List<Corner> knots(PiecewiseCurve curve) {
    List<Corner> knots = new ArrayList<>();
    double end = grid.base(grid.to());
    for (int k = curve.knotFrom(grid.base(grid.from()));
        k < curve.size() && curve.knot(k) <= end && !tooMany();
        k++) {
      grid.step(curve.knot(k)).ifPresent(knots::add);
    }
    return knots;
  }

  private double value(Term constant) {
    return TermEvaluator.of(constant, replaced).at(Double.NaN);
  }

  private boolean tooMany() {
    if (found.size() > MOST_COLLECTED) {
      note(new Corners.TooMany());
    }
    return gap.isPresent() && gap.get() instanceof Corners.TooMany;
  }

  /** Keeps the first gap, unless another says that nothing is listed at all. */
  private void note(Corners.Gap other) {
    if (gap.isEmpty() || other instanceof Corners.TooMany) {
      gap = Optional.of(other);
    }
  }

  /** Sorts corners and makes one of those that rounding alone keeps apart. */
  private static List<Corner> merged(List<Corner> corners) {
    List<Corner> sorted = new ArrayList<>(corners);
    sorted.sort(
        Comparator.comparingDouble(Corner::time)
            .thenComparingDouble(Corner::before)
            .thenComparingDouble(Corner::after));
    List<Corner> merged = new ArrayList<>();
    for (Corner corner : sorted) {
      if (merged.isEmpty() || !areOne(merged.getLast(), corner)) {
        merged.add(corner);
      } else {
        Corner last = merged.removeLast();
        double before = Math.min(last.before(), corner.before());
        double after = Math.max(last.after(), corner.after());
        merged.add(new Corner(TimeGrid.rounder(last.time(), corner.time()), before, after));
      }
    }
    return merged;
  }

  private static boolean areOne(Corner left, Corner right) {
    double near = ONE_CORNER * Math.ulp(Math.max(Math.abs(left.time()), Math.abs(right.time())));
    return right.before() <= left.after() || right.time() - left.time() <= near;
  }
}
