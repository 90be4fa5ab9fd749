/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import java.util.Random;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** Terms for tests, written as they are: nothing is simplified. */
final class TestTerms {

  static final Term T = new Term.Time();

  private TestTerms() {}

  static Term c(double value) {
    return new Term.Constant(value);
  }

  static Term add(Term a, Term b) {
    return new Term.Sum(a, b);
  }

  static Term sub(Term a, Term b) {
    return new Term.Difference(a, b);
  }

  static Term mul(Term a, Term b) {
    return new Term.Product(a, b);
  }

  static Term div(Term a, Term b) {
    return new Term.Quotient(a, b);
  }

  static Term neg(Term a) {
    return new Term.Negation(a);
  }

  static Term pow(Term a, Term b) {
    return new Term.Power(a, b);
  }

  static Term pow(Term a, double b) {
    return new Term.Power(a, c(b));
  }

  static Term f(Function function, Term... arguments) {
    return new Term.FunctionTerm(function, List.of(arguments));
  }

  static Term sin(Term a) {
    return f(Function.SIN, a);
  }

  static Term cos(Term a) {
    return f(Function.COS, a);
  }

  static Term exp(Term a) {
    return f(Function.EXP, a);
  }

  static Parameter parameter(String name, Term value) {
    Span nowhere = new Span(0, 0);
    return new Parameter(
        name, UnitOfMeasure.ONE, value, java.util.Optional.empty(), "", nowhere, nowhere);
  }

  static Term p(Parameter parameter) {
    return new Term.ParameterTerm(parameter);
  }

  static Term let(String name, Term value, boolean ofTime) {
    Span nowhere = new Span(0, 0);
    return new Term.LetTerm(
        new Let(name, UnitOfMeasure.ONE, value, ofTime, false, "", nowhere, nowhere));
  }

  /** A random term: smooth ones only, or with corners and places where it is undefined as well. */
  static Term random(Random random, int depth, boolean smooth) {
    if (depth == 0 || random.nextInt(8) == 0) {
      return switch (random.nextInt(4)) {
        case 0 -> c(random.nextInt(7) - 3);
        case 1 -> c(Math.round(random.nextDouble() * 4000 - 2000) / 1000.0);
        default -> T;
      };
    }
    Term a = random(random, depth - 1, smooth);
    Term b = random(random, depth - 1, smooth);
    return switch (random.nextInt(smooth ? 9 : 18)) {
      case 0 -> add(a, b);
      case 1 -> sub(a, b);
      case 2, 3 -> mul(a, b);
      case 4 -> neg(a);
      case 5 -> pow(a, random.nextInt(4));
      case 6 -> sin(a);
      case 7 -> cos(a);
      case 8 -> f(Function.TANH, a);
      case 9 -> div(a, b);
      case 10 -> f(Function.SQRT, a);
      case 11 -> f(Function.LOG, a);
      case 12 -> f(Function.ABS, a);
      case 13 -> f(Function.MIN, a, b);
      case 14 -> f(Function.MAX, a, b);
      case 15 -> pow(a, b);
      case 16 -> f(Function.values()[random.nextInt(15)], a);
      default -> pow(a, -1 - random.nextInt(2));
    };
  }
}
