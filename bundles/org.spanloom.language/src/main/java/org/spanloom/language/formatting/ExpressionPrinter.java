/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.Addend;
import org.spanloom.language.syntax.Expression.Argument;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.ChoiceExpression;
import org.spanloom.language.syntax.Expression.Factor;
import org.spanloom.language.syntax.Expression.IndexedSumExpression;
import org.spanloom.language.syntax.Expression.MissingExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Expression.ParenthesisedExpression;
import org.spanloom.language.syntax.Expression.PowerExpression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.syntax.Expression.SumExpression;
import org.spanloom.language.syntax.IndexRange;
import org.spanloom.language.syntax.RequireClause;
import org.spanloom.language.syntax.RequireClause.Compares;
import org.spanloom.language.syntax.RequireClause.HasPeriod;
import org.spanloom.language.syntax.RequireClause.IsInvariant;
import org.spanloom.language.syntax.RequireClause.IsNonnegative;
import org.spanloom.language.syntax.RequireClause.IsStable;
import org.spanloom.language.syntax.RequireClause.LimitsCondition;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.syntax.Turns;
import org.spanloom.language.syntax.UnitText;

/** Writes expressions and clauses with a blank between any two signs; the layout comes later. */
final class ExpressionPrinter {

  private final StringBuilder text = new StringBuilder();

  /** Returns what was written. */
  String text() {
    return text.toString();
  }

  ExpressionPrinter words(String... words) {
    for (String word : words) {
      if (!word.isEmpty()) {
        text.append(word).append(' ');
      }
    }
    return this;
  }

  ExpressionPrinter endLine() {
    text.append('\n');
    return this;
  }

  ExpressionPrinter unit(Optional<UnitText> unit) {
    unit.ifPresent(u -> words("[" + u.code() + "]"));
    return this;
  }

  ExpressionPrinter list(List<Expression> expressions) {
    for (int i = 0; i < expressions.size(); i++) {
      words(i == 0 ? "" : ",").expression(expressions.get(i));
    }
    return this;
  }

  ExpressionPrinter expression(Expression expression) {
    switch (expression) {
      case NumberExpression number -> words(number.digits()).unit(number.unit());
      case NameExpression name when name.isIndexed() -> {
        words(name.name().text(), "[").list(name.indices()).words("]");
        words("'".repeat(name.primes()));
      }
      case NameExpression name -> words(name.label());
      case IndexedSumExpression sum -> {
        words("sum", "over").turns(sum.turns()).words("of").expression(sum.body());
      }
      case CallExpression call -> call(call);
      case SignedExpression signed ->
          words(signed.negative() ? "-" : "+").expression(signed.operand());
      case SumExpression sum -> {
        for (int i = 0; i < sum.addends().size(); i++) {
          Addend addend = sum.addends().get(i);
          words(i == 0 ? "" : addend.subtracted() ? "-" : "+").expression(addend.value());
        }
      }
      case ProductExpression product -> {
        for (int i = 0; i < product.factors().size(); i++) {
          Factor factor = product.factors().get(i);
          words(i == 0 ? "" : factor.divides() ? "/" : "*").expression(factor.value());
        }
      }
      case PowerExpression power ->
          expression(power.base()).words("^").expression(power.exponent());
      case ChoiceExpression choice -> {
        words("if").expression(choice.condition().left()).sign(choice.condition().sign());
        expression(choice.condition().right());
        words("then").expression(choice.then()).words("else").expression(choice.otherwise());
      }
      case ParenthesisedExpression inner -> words("(").expression(inner.inner()).words(")");
      case MissingExpression missing -> {}
    }
    return this;
  }

  ExpressionPrinter turns(Turns turns) {
    words(turns.index().text(), "from").expression(turns.from());
    return words("to").expression(turns.to());
  }

  ExpressionPrinter ranges(List<IndexRange> ranges) {
    for (int i = 0; i < ranges.size(); i++) {
      words(i == 0 ? "[" : ",").expression(ranges.get(i).from());
      words("..").expression(ranges.get(i).to());
    }
    return words(ranges.isEmpty() ? "" : "]");
  }

  private void call(CallExpression call) {
    expression(call.callee()).words("(");
    for (int i = 0; i < call.arguments().size(); i++) {
      Argument argument = call.arguments().get(i);
      words(i == 0 ? "" : ",");
      argument.label().ifPresent(l -> words(l.text(), "="));
      words(argument.before() ? "before" : "").expression(argument.value());
    }
    words(")");
  }

  ExpressionPrinter clause(RequireClause clause) {
    switch (clause) {
      case Compares compares -> {
        expression(compares.comparison().left()).sign(compares.comparison().sign());
        expression(compares.comparison().right()).words(compares.throughout() ? "throughout" : "");
        compares.until().ifPresent(e -> words("until").expression(e));
        compares.under().ifPresent(n -> words("under", n.text()));
      }
      case LimitsCondition limits -> {
        words(limits.scaled() ? "scaled" : "", "condition", "(", limits.basis().text(), ")");
        sign(limits.sign()).expression(limits.limit());
        limits.until().ifPresent(e -> words("until").expression(e));
      }
      case IsStable stable -> words("stable");
      case IsNonnegative nonnegative -> {
        words("nonnegative");
        nonnegative.under().ifPresent(n -> words("under", n.text()));
      }
      case IsInvariant invariant -> words("invariant").expression(invariant.value());
      case HasPeriod period -> words("period").expression(period.period());
    }
    return this;
  }

  private ExpressionPrinter sign(TokenKind sign) {
    return words(
        switch (sign) {
          case LESS -> "<";
          case AT_MOST -> "<=";
          case GREATER -> ">";
          case AT_LEAST -> ">=";
          default -> "=";
        });
  }
}
