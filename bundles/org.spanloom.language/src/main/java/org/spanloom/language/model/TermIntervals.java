/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** Encloses the values that a term takes over a range of times, by interval arithmetic. */
public final class TermIntervals {

  private final TermTape tape;
  private final Map<String, Double> replaced;
  private final Map<Let, Interval> closed;
  private final Interval[] ranges;

  /**
   * Exponents that do not vary, as the number a run would take, so that 1/3 is one exponent and not
   * two.
   */
  private final Map<Integer, Interval> exponents = new HashMap<>();

  private final Map<Integer, Interval> narrowed = new HashMap<>();

  /** Prepares a term, parameters as declared. */
  TermIntervals(TermTape tape) {
    this(tape, Map.of());
  }

  /**
   * Prepares a term; nodes without time are enclosed once.
   *
   * @param replaced values of parameters in coherent SI units, by name
   */
  TermIntervals(TermTape tape, Map<String, Double> replaced) {
    this(tape, replaced, Map.of());
  }

  /**
   * Prepares a term.
   *
   * @param replaced values of parameters in coherent SI units, by name
   * @param closed what encloses the named expressions that have no operands on the tape
   */
  TermIntervals(TermTape tape, Map<String, Double> replaced, Map<Let, Interval> closed) {
    this.tape = tape;
    this.replaced = replaced;
    this.closed = closed;
    this.ranges = new Interval[tape.size()];
    for (int i = 0; i < ranges.length; i++) {
      if (closed.isEmpty()
          && tape.node(i) instanceof Term.Power power
          && !tape.varies(tape.operand(i, 1))) {
        exponents.put(i, Interval.at(TermEvaluator.of(power.exponent(), replaced).at(Double.NaN)));
      }
      if (!tape.varies(i)) {
        ranges[i] = range(i, Interval.EMPTY);
      }
    }
  }

  /**
   * Encloses the values of a term.
   *
   * @param term the term, parameters as declared
   * @param times range of times in coherent SI units; ends may be infinite
   * @return an interval that contains every value the term takes where it is defined, in coherent
   *     SI units; often wider than need be
   */
  public static Interval range(Term term, Interval times) {
    TermTape tape = TermTape.of(term);
    TermIntervals intervals = new TermIntervals(tape);
    intervals.enclose(times);
    return intervals.of(tape.size() - 1);
  }

  /** Encloses all nodes over a range of times. */
  void enclose(Interval times) {
    narrowed.clear();
    compute(times);
  }

  /** Uses what is known better about a node, for it and for all that rests on it. */
  void narrow(int node, Interval range, Interval times) {
    narrowed.put(node, range);
    compute(times);
  }

  private void compute(Interval times) {
    for (int i = 0; i < ranges.length; i++) {
      if (tape.varies(i)) {
        Interval range = range(i, times);
        Interval better = narrowed.isEmpty() ? null : narrowed.get(i);
        ranges[i] = better == null ? range : range.intersect(better);
      }
    }
  }

  /** Returns what encloses a node over the last range of times. */
  Interval of(int node) {
    return ranges[node];
  }

  private Interval range(int i, Interval times) {
    return switch (tape.node(i)) {
      case Term.Constant number -> Interval.at(number.value());
      case Term.Time t -> times;
      case Term.ParameterTerm(Parameter parameter) ->
          replaced.containsKey(parameter.name())
              ? Interval.at(replaced.get(parameter.name()))
              : below(i, 0);
      case Term.LetTerm(Let let) -> tape.isClosed(i) ? closed.get(let) : below(i, 0);
      case Term.Sum sum -> below(i, 0).plus(below(i, 1));
      case Term.Difference difference -> below(i, 0).minus(below(i, 1));
      case Term.Product product ->
          isSquare(i) ? below(i, 0).squared() : below(i, 0).times(below(i, 1));
      case Term.Quotient quotient -> below(i, 0).over(below(i, 1));
      case Term.Negation negation -> below(i, 0).negated();
      case Term.Power power -> power(below(i, 0), exponent(i));
      case Term.Switch choice ->
          switch (Branch.of(choice, below(i, 0))) {
            case THEN -> below(i, 1);
            case OTHERWISE -> below(i, 2);
            case OPEN -> below(i, 1).hull(below(i, 2));
          };
      case Term.Pulse pulse -> pulse(i);
      case Term.CurveTerm curve -> curve.curve().over(below(i, 0));
      case Term.FunctionTerm(Function function, List<Term> arguments) ->
          switch (function) {
            case MIN -> below(i, 0).smaller(below(i, 1));
            case MAX -> below(i, 0).larger(below(i, 1));
            case SIN,
                COS,
                TAN,
                ASIN,
                ACOS,
                ATAN,
                SINH,
                COSH,
                TANH,
                EXP,
                LOG,
                LOG10,
                SQRT,
                ABS,
                SIGN ->
                IntervalFunctions.image(function, below(i, 0));
          };
    };
  }

  private Interval pulse(int i) {
    Interval period = below(i, 1);
    Interval width = below(i, 2);
    Interval start = below(i, 3);
    boolean fixed = period.isPoint() && width.isPoint() && start.isPoint();
    return fixed
        ? new PulseTrain(period.low(), width.low(), start.low()).over(below(i, 0))
        : new Interval(0, 1);
  }

  private boolean isSquare(int i) {
    return tape.operand(i, 0) == tape.operand(i, 1);
  }

  private static Interval power(Interval base, Interval exponent) {
    boolean whole = exponent.isPoint() && exponent.low() == Math.rint(exponent.low());
    return whole
        ? IntervalFunctions.wholePower(base, exponent.low())
        : IntervalFunctions.power(base, exponent);
  }

  /** Returns what encloses the exponent of a power. */
  Interval exponent(int power) {
    Interval fixed = exponents.get(power);
    return fixed == null ? below(power, 1) : fixed;
  }

  private Interval below(int i, int which) {
    return ranges[tape.operand(i, which)];
  }
}
