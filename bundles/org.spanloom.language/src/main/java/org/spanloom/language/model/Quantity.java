/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.UnaryOperator;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;

/**
 * The value of an expression: affine in the states, in coherent SI units.
 *
 * @param coefficients factors of the states in it, in the order of their appearance
 * @param constant the part without states
 * @param dimension its dimension
 * @param zero whether it is the number 0 as written, which fits every dimension
 * @param depth bound on the depth of the terms in it, named expressions followed
 */
record Quantity(
    Map<StateKey, Part> coefficients, Part constant, Dimension dimension, boolean zero, int depth)
    implements Value {

  /**
   * A term with the places in the text it comes from.
   *
   * @param term the term
   * @param sources the places, the outermost first; the first {@value #MOST_SOURCES} of them
   * @param placed whether the place in the statement at hand is among them already
   */
  record Part(Term term, List<Span> sources, boolean placed) {

    static final Part ZERO = new Part(Term.ZERO, List.of(), false);

    /** Values that rest on values that rest on others would come from everywhere in the end. */
    private static final int MOST_SOURCES = 100;

    Part {
      sources = List.copyOf(sources.subList(0, Math.min(sources.size(), MOST_SOURCES)));
    }

    Part map(UnaryOperator<Term> change) {
      return new Part(change.apply(term), sources, placed);
    }

    Part placedAt(Span span) {
      if (placed) {
        return this;
      }
      List<Span> all = new ArrayList<>();
      all.add(span);
      all.addAll(sources);
      return new Part(term, all, true);
    }

    /** Returns the part as one that comes from a place in another statement. */
    Part from(Span place) {
      return new Part(term, List.of(place), false);
    }

    /** Returns the same part as a statement sees it that uses it by name. */
    Part inherited() {
      return new Part(term, sources, false);
    }
  }

  static Quantity constant(Term term, Dimension dimension, int depth) {
    return new Quantity(Map.of(), new Part(term, List.of(), false), dimension, false, depth);
  }

  static Quantity state(StateKey key, Dimension dimension) {
    Map<StateKey, Part> one = Map.of(key, new Part(Term.ONE, List.of(), false));
    return new Quantity(one, Part.ZERO, dimension, false, 1);
  }

  @Override
  public boolean holdsStates() {
    return !coefficients.isEmpty();
  }

  /** Returns the quantity with every part changed; parts that become 0 are left out. */
  Quantity map(UnaryOperator<Term> change, Dimension newDimension, int newDepth) {
    if (!holdsStates()) {
      return new Quantity(Map.of(), constant.map(change), newDimension, false, newDepth);
    }
    Map<StateKey, Part> changed = new LinkedHashMap<>();
    coefficients.forEach((key, part) -> {
      Part mapped = part.map(change);
      if (!Simplifier.isZero(mapped.term())) {
        changed.put(key, mapped);
      }
    });
    // Beside states a constant part of 0 is no part at all: it has no place in the text, and 0/h
    // would be one.
    boolean absent = holdsStates() && Simplifier.isZero(constant.term());
    Part rest = absent ? Part.ZERO : constant.map(change);
    return new Quantity(changed, rest, newDimension, false, newDepth);
  }

  /**
   * Returns a product of which at most one factor holds states. Unlike with {@link #map} its parts
   * come from the places of both, as is wanted of entries of matrices, which stand elsewhere than
   * their products.
   */
  static Quantity product(Quantity left, Quantity right, Dimension dimension) {
    int depth = Math.max(left.depth, right.depth) + 1;
    Map<StateKey, Part> parts = new LinkedHashMap<>();
    left.coefficients.forEach((key, part) -> parts.put(key, product(part, right.constant)));
    right.coefficients.forEach((key, part) -> parts.put(key, product(left.constant, part)));
    Part besideStates = left.holdsStates() ? left.constant : right.constant;
    boolean absent = !parts.isEmpty() && Simplifier.isZero(besideStates.term());
    Part rest = absent ? Part.ZERO : product(left.constant, right.constant);
    return new Quantity(parts, rest, dimension, false, depth);
  }

  private static Part product(Part left, Part right) {
    Set<Span> places = new LinkedHashSet<>(left.sources);
    places.addAll(right.sources);
    Term term = Simplifier.product(left.term, right.term);
    return new Part(term, List.copyOf(places), left.placed || right.placed);
  }

  /** Returns the quantity as one that comes from a place in another statement. */
  Quantity from(Span place) {
    Map<StateKey, Part> changed = new LinkedHashMap<>();
    coefficients.forEach((key, part) -> changed.put(key, part.from(place)));
    boolean absent = holdsStates() && Simplifier.isZero(constant.term());
    Part rest = absent ? Part.ZERO : constant.from(place);
    return new Quantity(changed, rest, dimension, zero, depth);
  }

  /** Returns the state or derivative that the quantity is, if it is nothing but that. */
  Optional<StateKey> single() {
    boolean alone = coefficients.size() == 1 && Simplifier.isZero(constant.term());
    return alone && Term.ONE.equals(coefficients.values().iterator().next().term())
        ? Optional.of(coefficients.keySet().iterator().next())
        : Optional.empty();
  }

  /** Returns the quantity as a statement sees it that uses it by name. */
  Quantity inherited() {
    Map<StateKey, Part> changed = new LinkedHashMap<>();
    coefficients.forEach((key, part) -> changed.put(key, part.inherited()));
    return new Quantity(changed, constant.inherited(), dimension, zero, depth);
  }
}
