/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;

/**
 * A condition on a node of a tape without which the term has no value.
 *
 * @param kind what must hold
 * @param node the node it must hold of
 * @param owner the operation that asks for it
 * @param shown the node to show to a reader: the parameter or named expression that holds it, else
 *     the node
 */
record Guard(Kind kind, int node, int owner, int shown) {

  /** What must hold of the node. */
  enum Kind {
    /** Not 0. */
    DIVISOR,
    /** No odd number of quarter turns. */
    TANGENT,
    /** Positive. */
    LOGARITHM,
    /** Not negative. */
    ROOT,
    /** From -1 to 1. */
    INVERSE,
    /** Depends on the exponent. */
    POWER,
    /** Not beyond the largest number. */
    FINITE
  }

  /** What an enclosure says about a guard. */
  enum Verdict {
    /** It holds for all values. */
    HOLDS,
    /** It fails for all values. */
    FAILS,
    /** Neither. */
    OPEN
  }

  /** Returns the guards of a term, those of operands before those of the operations on them. */
  static List<Guard> of(TermTape tape) {
    List<Guard> guards = new ArrayList<>();
    for (int i = 0; i < tape.size(); i++) {
      if (tape.node(i) instanceof Term.Quotient) {
        divisors(tape, Kind.DIVISOR, tape.operand(i, 1), i, guards);
      } else if (tape.node(i) instanceof Term.Power power) {
        int base = tape.operand(i, 0);
        if (power.exponent() instanceof Term.Constant n
            && n.value() < 0
            && n.value() == Math.rint(n.value())) {
          divisors(tape, Kind.POWER, base, i, guards);
        } else {
          guards.add(new Guard(Kind.POWER, base, i, base));
        }
      } else if (tape.node(i) instanceof Term.FunctionTerm call) {
        int operand = tape.operand(i, 0);
        switch (call.function().domain()) {
          case EVERYWHERE -> {}
          case POSITIVE -> guards.add(new Guard(Kind.LOGARITHM, operand, i, operand));
          case NOT_NEGATIVE -> guards.add(new Guard(Kind.ROOT, operand, i, operand));
          case FROM_MINUS_ONE_TO_ONE -> guards.add(new Guard(Kind.INVERSE, operand, i, operand));
          case NOT_ODD_QUARTER_TURNS -> guards.add(new Guard(Kind.TANGENT, operand, i, operand));
        }
      }
    }
    return guards;
  }

  /**
   * Takes a divisor apart into factors that must each not be 0: a double zero such as that of
   * {@code (t - 1)^2} is then a change of sign.
   */
  private static void divisors(
      TermTape tape, Kind kind, int divisor, int owner, List<Guard> guards) {
    Deque<Factor> open = new ArrayDeque<>(List.of(new Factor(divisor, divisor, false)));
    while (!open.isEmpty()) {
      Factor factor = open.pop();
      int i = factor.node();
      switch (tape.node(i)) {
        case Term.Product product -> {
          open.push(factor.below(tape.operand(i, 1)));
          open.push(factor.below(tape.operand(i, 0)));
        }
        case Term.Quotient quotient -> open.push(factor.below(tape.operand(i, 0)));
        case Term.Negation negation -> open.push(factor.below(tape.operand(i, 0)));
        case Term.Power power -> open.push(factor.below(tape.operand(i, 0)));
        case Term.ParameterTerm parameter -> open.push(factor.named(tape.operand(i, 0)));
        case Term.LetTerm let when tape.isClosed(i) -> guards.add(factor.guard(kind, owner));
        case Term.LetTerm let -> open.push(factor.named(tape.operand(i, 0)));
        case Term.FunctionTerm call -> {
          switch (call.function()) {
            case SQRT, ABS, SIGN, SINH, TANH, ASIN, ATAN ->
                open.push(factor.below(tape.operand(i, 0)));
            case EXP, COSH -> {}
            case SIN, COS, TAN, ACOS, LOG, LOG10, MIN, MAX -> guards.add(factor.guard(kind, owner));
          }
        }
        case Term.Constant number -> guards.add(factor.guard(kind, owner));
        case Term.Time t -> guards.add(factor.guard(kind, owner));
        case Term.Sum sum -> guards.add(factor.guard(kind, owner));
        case Term.Difference difference -> guards.add(factor.guard(kind, owner));
        case Term.Switch choice -> {
          open.push(factor.below(tape.operand(i, 2)));
          open.push(factor.below(tape.operand(i, 1)));
        }
        case Term.Pulse pulse -> guards.add(factor.guard(kind, owner));
        case Term.CurveTerm curve -> guards.add(factor.guard(kind, owner));
      }
    }
  }

  /** A factor of a divisor, with the name it was met under. */
  private record Factor(int node, int shown, boolean isNamed) {

    Factor below(int operand) {
      return new Factor(operand, isNamed ? shown : operand, isNamed);
    }

    Factor named(int operand) {
      return new Factor(operand, isNamed ? shown : node, true);
    }

    Guard guard(Kind kind, int owner) {
      return new Guard(kind, node, owner, shown);
    }
  }

  /**
   * Judges the guard.
   *
   * @param x what encloses the node
   * @param exponent what encloses the exponent where the owner is a power
   */
  Verdict judge(Interval x, Interval exponent) {
    if (x.isEmpty()) {
      return Verdict.OPEN;
    }
    return switch (kind) {
      case DIVISOR -> notZero(x);
      case TANGENT -> IntervalFunctions.mayHavePole(x) ? Verdict.OPEN : Verdict.HOLDS;
      case LOGARITHM -> positive(x);
      case ROOT -> notNegative(x);
      case INVERSE -> notNegative(Interval.at(1).minus(x.absolute()));
      case POWER -> power(x, exponent);
      case FINITE -> finite(x);
    };
  }

  /** Tells whether the guard is about a zero to be avoided, and not about a bound to be kept. */
  boolean avoidsZero(Interval exponent) {
    return switch (kind) {
      case DIVISOR, TANGENT -> true;
      case POWER -> isWhole(exponent);
      case LOGARITHM, ROOT, INVERSE, FINITE -> false;
    };
  }

  /** Tells whether the operation grows without bound as the guard comes to fail. */
  boolean keepsBounded(Interval exponent) {
    return switch (kind) {
      case DIVISOR, TANGENT, LOGARITHM -> true;
      case POWER -> !exponent.isEmpty() && exponent.low() < 0;
      case ROOT, INVERSE, FINITE -> false;
    };
  }

  private static Verdict power(Interval x, Interval exponent) {
    if (exponent.isEmpty()) {
      return Verdict.OPEN;
    }
    if (isWhole(exponent)) {
      return exponent.low() >= 0 ? Verdict.HOLDS : notZero(x);
    }
    if (exponent.low() > 0) {
      return notNegative(x);
    }
    if (exponent.high() < 0) {
      return positive(x);
    }
    return x.low() > 0 ? Verdict.HOLDS : x.high() < 0 ? Verdict.FAILS : Verdict.OPEN;
  }

  private static boolean isWhole(Interval exponent) {
    return exponent.isPoint() && exponent.low() == Math.rint(exponent.low());
  }

  private static Verdict notZero(Interval x) {
    if (!x.contains(0)) {
      return Verdict.HOLDS;
    }
    return x.low() == 0 && x.high() == 0 ? Verdict.FAILS : Verdict.OPEN;
  }

  private static Verdict positive(Interval x) {
    return x.low() > 0 ? Verdict.HOLDS : x.high() <= 0 ? Verdict.FAILS : Verdict.OPEN;
  }

  private static Verdict notNegative(Interval x) {
    return x.low() >= 0 ? Verdict.HOLDS : x.high() < 0 ? Verdict.FAILS : Verdict.OPEN;
  }

  private static Verdict finite(Interval x) {
    if (x.isBounded()) {
      return Verdict.HOLDS;
    }
    boolean beyond = x.low() == Double.MAX_VALUE || x.high() == -Double.MAX_VALUE;
    return beyond ? Verdict.FAILS : Verdict.OPEN;
  }
}
