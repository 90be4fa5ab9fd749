/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.Addend;
import org.spanloom.language.syntax.Expression.Factor;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Expression.ParenthesisedExpression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.syntax.Expression.SumExpression;
import org.spanloom.language.text.SourceText;

/**
 * Takes an expression that is linear in states apart into the texts of its coefficients, each with
 * its factors in the order in which they stand.
 */
final class LinearText {

  /** In the place of a state: the part without states. */
  static final String CONSTANT = "";

  private final SourceText source;
  private final Set<String> states;

  /** A product with a sign; without factors it is 1. */
  private record Piece(boolean negative, String factors) {

    /** Takes a text that may have a sign of its own. */
    static Piece of(boolean negative, String text) {
      boolean signed = text.startsWith("-");
      return new Piece(negative != signed, signed ? text.substring(1).strip() : text);
    }

    String signed() {
      return (negative ? "-" : "") + (factors.isEmpty() ? "1" : factors);
    }
  }

  private LinearText(SourceText source, Set<String> states) {
    this.source = source;
    this.states = states;
  }

  /**
   * Returns the coefficients by the name of the state, {@link #CONSTANT} for the rest; nothing
   * where the text is of another form.
   */
  static Optional<Map<String, String>> of(
      SourceText source, Expression expression, Set<String> states) {
    return new LinearText(source, states)
        .pieces(expression)
        .map(pieces -> {
          Map<String, String> texts = new LinkedHashMap<>();
          pieces.forEach((state, list) -> texts.put(state, sum(list)));
          return texts;
        });
  }

  private static String sum(List<Piece> pieces) {
    StringBuilder text = new StringBuilder(pieces.getFirst().signed());
    for (Piece piece : pieces.subList(1, pieces.size())) {
      text.append(piece.negative() ? " - " : " + ")
          .append(new Piece(false, piece.factors()).signed());
    }
    return text.toString();
  }

  private boolean holdsStates(Expression expression) {
    return switch (expression) {
      case NameExpression name -> states.contains(name.name().text());
      case SignedExpression signed -> holdsStates(signed.operand());
      case ParenthesisedExpression inner -> holdsStates(inner.inner());
      case SumExpression sum -> sum.addends().stream().anyMatch(a -> holdsStates(a.value()));
      case ProductExpression product ->
          product.factors().stream().anyMatch(f -> holdsStates(f.value()));
      default -> false;
    };
  }

  private Optional<Map<String, List<Piece>>> pieces(Expression expression) {
    if (!holdsStates(expression)) {
      return Optional.of(
          Map.of(CONSTANT, List.of(Piece.of(false, source.slice(expression.span())))));
    }
    return switch (expression) {
      case NameExpression name when name.primes() == 0 ->
          Optional.of(Map.of(name.name().text(), List.of(new Piece(false, ""))));
      case ParenthesisedExpression inner -> pieces(inner.inner());
      case SignedExpression signed ->
          pieces(signed.operand()).map(p -> signed.negative() ? negated(p) : p);
      case SumExpression sum -> sum(sum);
      case ProductExpression product -> product(product);
      default -> Optional.empty();
    };
  }

  private static Map<String, List<Piece>> negated(Map<String, List<Piece>> pieces) {
    Map<String, List<Piece>> turned = new LinkedHashMap<>();
    pieces.forEach((state, list) ->
        turned.put(state, list.stream().map(p -> new Piece(!p.negative(), p.factors())).toList()));
    return turned;
  }

  private Optional<Map<String, List<Piece>>> sum(SumExpression sum) {
    Map<String, List<Piece>> all = new LinkedHashMap<>();
    for (Addend addend : sum.addends()) {
      Optional<Map<String, List<Piece>>> found = pieces(addend.value());
      if (found.isEmpty()) {
        return found;
      }
      Map<String, List<Piece>> signed = addend.subtracted() ? negated(found.get()) : found.get();
      signed.forEach(
          (state, list) -> all.computeIfAbsent(state, s -> new ArrayList<>()).addAll(list));
    }
    return Optional.of(all);
  }

  private Optional<Map<String, List<Piece>>> product(ProductExpression product) {
    int place = -1;
    for (int i = 0; i < product.factors().size(); i++) {
      if (holdsStates(product.factors().get(i).value())) {
        boolean taken = place >= 0 || product.factors().get(i).divides();
        if (taken) {
          return Optional.empty();
        }
        place = i;
      }
    }
    int linear = place;
    return pieces(product.factors().get(place).value())
        .map(inner -> {
          Map<String, List<Piece>> all = new LinkedHashMap<>();
          inner.forEach((state, list) ->
              all.put(state, list.stream().map(p -> inserted(product, linear, p)).toList()));
          return all;
        });
  }

  /** Returns the product with a piece in the place of the factor that holds the states. */
  private Piece inserted(ProductExpression product, int place, Piece piece) {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < product.factors().size(); i++) {
      Factor factor = product.factors().get(i);
      String shown = source.slice(factor.value().span());
      if (i == place) {
        boolean alone = piece.factors().matches("[\\w.]*");
        shown = alone ? piece.factors() : "(" + piece.factors() + ")";
      }
      if (!shown.isEmpty()) {
        String sign = factor.divides() ? "/" : "*";
        boolean first = text.isEmpty();
        text.append(first && factor.divides() ? "1/" : first ? "" : sign).append(shown);
      }
    }
    return Piece.of(piece.negative(), text.toString());
  }
}
