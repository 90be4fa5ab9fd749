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
import org.spanloom.language.model.Quantity.Part;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;

/**
 * Adds quantities. Few summands are added from left to right as written; many by halves, so that
 * the depth of the term grows with the logarithm of their number.
 */
final class QuantitySum {

  private static final int FEW = 8;

  private final Map<StateKey, Summands> states = new LinkedHashMap<>();
  private final Summands constants = new Summands();
  private int depth;
  private int count;

  /** The summands of one place. */
  private static final class Summands {
    private final List<Term> terms = new ArrayList<>();
    private final List<Boolean> subtracted = new ArrayList<>();
    private final List<Span> sources = new ArrayList<>();

    void add(boolean minus, Part part) {
      if (!Simplifier.isZero(part.term())) {
        terms.add(part.term());
        subtracted.add(minus);
        sources.addAll(part.sources());
      }
    }

    Part total() {
      List<Span> places =
          sources.size() < 2 ? List.copyOf(sources) : List.copyOf(new LinkedHashSet<>(sources));
      return new Part(total(0, terms.size()), places, true);
    }

    private Term total(int from, int to) {
      if (from == to) {
        return Term.ZERO;
      }
      if (to - from > FEW) {
        int middle = (from + to) >>> 1;
        return Simplifier.sum(total(from, middle), total(middle, to));
      }
      Term sum = subtracted.get(from) ? Simplifier.negation(terms.get(from)) : terms.get(from);
      for (int i = from + 1; i < to; i++) {
        sum =
            subtracted.get(i)
                ? Simplifier.difference(sum, terms.get(i))
                : Simplifier.sum(sum, terms.get(i));
      }
      return sum;
    }
  }

  /** Adds or subtracts a quantity that stands at a place. */
  void add(boolean minus, Quantity quantity, Span place) {
    quantity
        .coefficients()
        .forEach((key, part) ->
            states.computeIfAbsent(key, k -> new Summands()).add(minus, part.placedAt(place)));
    constants.add(minus, quantity.constant().placedAt(place));
    depth = Math.max(depth, quantity.depth());
    count++;
  }

  /** Adds a quantity that stands at no place of its own in the statement at hand. */
  void add(Quantity quantity) {
    quantity.coefficients().forEach((key, part) -> addState(false, key, part));
    constants.add(false, quantity.constant());
    depth = Math.max(depth, quantity.depth());
    count++;
  }

  /** Adds or subtracts the coefficient of one state. */
  void addState(boolean minus, StateKey key, Part part) {
    states.computeIfAbsent(key, k -> new Summands()).add(minus, part);
  }

  /** Adds or subtracts a part without states. */
  void addConstant(boolean minus, Part part) {
    constants.add(minus, part);
  }

  /** Returns the sum; states whose coefficient is 0 are left out. */
  Quantity total(Dimension dimension) {
    Map<StateKey, Part> coefficients = new LinkedHashMap<>();
    states.forEach((key, summands) -> {
      Part part = summands.total();
      if (!Simplifier.isZero(part.term())) {
        coefficients.put(key, part);
      }
    });
    int deeper = Math.min(count, FEW) + Integer.SIZE - Integer.numberOfLeadingZeros(count / FEW);
    return new Quantity(coefficients, constants.total(), dimension, false, depth + deeper);
  }
}
