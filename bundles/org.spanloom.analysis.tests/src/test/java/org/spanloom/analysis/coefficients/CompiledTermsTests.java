/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.language.model.Function;
import org.spanloom.language.model.Let;
import org.spanloom.language.model.Parameter;
import org.spanloom.language.model.Term;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

class CompiledTermsTests {

  private static final Span NOWHERE = new Span(0, 0);
  private static final Term TIME = new Term.Time();

  private static double value(Term term, double t) {
    return new TermCompiler(1, Map.of()).compile(List.of(term)).at(t)[0];
  }

  private static Parameter parameter(String name, Term value) {
    return new Parameter(name, UnitOfMeasure.ONE, value, Optional.empty(), "", NOWHERE, NOWHERE);
  }

  /** The meaning of a term, written as plainly as possible. */
  private static double meaning(Term term, double t) {
    return switch (term) {
      case Term.Constant c -> c.value();
      case Term.Time x -> t;
      case Term.ParameterTerm p -> meaning(p.parameter().value(), t);
      case Term.LetTerm l -> meaning(l.let().value(), t);
      case Term.Sum s -> meaning(s.left(), t) + meaning(s.right(), t);
      case Term.Difference d -> meaning(d.left(), t) - meaning(d.right(), t);
      case Term.Product p -> meaning(p.left(), t) * meaning(p.right(), t);
      case Term.Quotient q -> meaning(q.left(), t) / meaning(q.right(), t);
      case Term.Negation n -> -meaning(n.operand(), t);
      case Term.Power p -> {
        double exponent = meaning(p.exponent(), t);
        double base = meaning(p.base(), t);
        yield exponent == 2 ? base * base : StrictMath.pow(base, exponent);
      }
      case Term.Switch s ->
          s.holds(meaning(s.gap(), t)) ? meaning(s.then(), t) : meaning(s.otherwise(), t);
      case Term.CurveTerm c -> c.curve().at(meaning(c.time(), t));
      case Term.Pulse p ->
          (t - meaning(p.start(), t)) % meaning(p.period(), t) < meaning(p.width(), t) ? 1 : 0;
      case Term.FunctionTerm f ->
          f.function().apply(f.arguments().stream().mapToDouble(a -> meaning(a, t)).toArray());
    };
  }

  private static Term random(SplittableRandom random, int depth, List<Term> shared) {
    int choice = random.nextInt(depth == 0 ? 3 : 14);
    return switch (choice) {
      case 0 -> new Term.Constant(random.nextInt(9) - 4 + 0.25);
      case 1 -> TIME;
      case 2 -> shared.isEmpty() ? TIME : shared.get(random.nextInt(shared.size()));
      case 3 -> new Term.Sum(random(random, depth - 1, shared), random(random, depth - 1, shared));
      case 4 ->
          new Term.Difference(random(random, depth - 1, shared), random(random, depth - 1, shared));
      case 5, 6 ->
          new Term.Product(random(random, depth - 1, shared), random(random, depth - 1, shared));
      case 7 ->
          new Term.Quotient(random(random, depth - 1, shared), random(random, depth - 1, shared));
      case 8 -> new Term.Negation(random(random, depth - 1, shared));
      case 9 -> new Term.Power(random(random, depth - 1, shared), new Term.Constant(2));
      case 10 ->
          new Term.Power(random(random, depth - 1, shared), new Term.Constant(random.nextInt(5)));
      case 11 ->
          new Term.Switch(
              random(random, depth - 1, shared),
              random.nextBoolean(),
              random(random, depth - 1, shared),
              random(random, depth - 1, shared));
      case 12 ->
          new Term.Pulse(
              TIME, new Term.Constant(0.75), new Term.Constant(0.25), new Term.Constant(-64));
      default -> {
        Function function = Function.values()[random.nextInt(Function.values().length)];
        List<Term> arguments = new ArrayList<>();
        for (int k = 0; k < function.arity(); k++) {
          arguments.add(random(random, depth - 1, shared));
        }
        yield new Term.FunctionTerm(function, arguments);
      }
    };
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void compiledTermsGiveTheBitsOfTheirMeaning(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    List<Term> terms = new ArrayList<>();
    for (int k = 0; k < 120; k++) {
      terms.add(random(random, 1 + random.nextInt(7), terms));
    }
    CompiledTerms compiled = new TermCompiler(1, Map.of()).compile(terms);
    for (double t : new double[] {-1.5, 0, 0.3, 2, 7.25}) {
      double[] values = compiled.at(t);
      for (int k = 0; k < terms.size(); k++) {
        assertEquals(meaning(terms.get(k), t), values[k], 0.0, "term " + k + " at " + t);
      }
    }
  }

  @Test
  void everyFunctionIsCompiled() {
    for (Function function : Function.values()) {
      Term half = new Term.Product(new Term.Constant(0.5), TIME);
      Term term =
          new Term.FunctionTerm(
              function, function.arity() == 1 ? List.of(half) : List.of(half, TIME));
      assertEquals(meaning(term, 0.75), value(term, 0.75), 0.0, function.code());
    }
  }

  @Test
  void aSumOfAHundredThousandTermsIsCompiledInParts() {
    Term sum = Term.ZERO;
    for (int k = 0; k < 100_000; k++) {
      sum = new Term.Sum(sum, new Term.Product(new Term.Constant(k), TIME));
    }
    assertEquals(100_000.0 * 99_999 / 2 * 0.5, value(sum, 0.5), 0.0);
  }

  @Test
  void aBalancedTreeOfManyLeavesIsCompiledInParts() {
    List<Term> level = new ArrayList<>();
    for (int k = 0; k < 1 << 15; k++) {
      level.add(new Term.Product(new Term.Constant(k), TIME));
    }
    while (level.size() > 1) {
      List<Term> next = new ArrayList<>();
      for (int k = 0; k < level.size(); k += 2) {
        next.add(new Term.Sum(level.get(k), level.get(k + 1)));
      }
      level = next;
    }
    assertEquals((1 << 15) * ((1 << 15) - 1) / 2.0 * 2, value(level.getFirst(), 2), 0.0);
  }

  @Test
  void constantsAreFoldedAndParametersReplaced() {
    Parameter k = parameter("k", new Term.Constant(3));
    Parameter twice =
        parameter("twice", new Term.Product(new Term.Constant(2), new Term.ParameterTerm(k)));
    Term term = new Term.ParameterTerm(twice);
    assertEquals(6, new TermCompiler(1, Map.of()).constant(term), 0.0);
    assertEquals(10, new TermCompiler(1, Map.of("k", 5.0)).constant(term), 0.0);
    assertEquals(7, new TermCompiler(1, Map.of("twice", 7.0)).constant(term), 0.0);
    assertTrue(new TermCompiler(1, Map.of()).compile(List.of(term)).isConstant());
  }

  @Test
  void namedExpressionsAreSharedAndTimeIsConverted() {
    Let let =
        new Let(
            "u",
            UnitOfMeasure.ONE,
            new Term.FunctionTerm(Function.SIN, List.of(TIME)),
            true,
            false,
            "",
            NOWHERE,
            NOWHERE);
    Term term = new Term.Product(new Term.LetTerm(let), new Term.LetTerm(let));
    TermCompiler compiler = new TermCompiler(3600, Map.of());
    double sine = StrictMath.sin(2 * 3600.0);
    assertEquals(sine * sine, compiler.compile(List.of(term)).at(2)[0], 0.0);
    assertFalse(compiler.compile(List.of(term)).isConstant());
    assertThrows(IllegalArgumentException.class, () -> compiler.constant(term));
  }
}
