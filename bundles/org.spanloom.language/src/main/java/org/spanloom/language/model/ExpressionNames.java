/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
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

/** Lists the names and calls in an expression. */
final class ExpressionNames {

  private ExpressionNames() {}

  /** Returns every use of a name, called functions included, in the order of the text. */
  static List<NameExpression> of(Expression expression) {
    List<NameExpression> names = new ArrayList<>();
    visit(
        expression,
        part -> {
          if (part instanceof NameExpression name) {
            names.add(name);
          }
        });
    return names;
  }

  /** Returns every call, in the order of the text. */
  static List<CallExpression> calls(Expression expression) {
    List<CallExpression> calls = new ArrayList<>();
    visit(
        expression,
        part -> {
          if (part instanceof CallExpression call) {
            calls.add(call);
          }
        });
    return calls;
  }

  /** Hands out an expression and all its parts, each before its own parts. */
  private static void visit(Expression expression, Consumer<Expression> visitor) {
    visitor.accept(expression);
    switch (expression) {
      case NumberExpression number -> {}
      case MissingExpression missing -> {}
      case NameExpression name -> name.indices().forEach(i -> visit(i, visitor));
      case IndexedSumExpression sum -> {
        visit(sum.turns().from(), visitor);
        visit(sum.turns().to(), visitor);
        visit(sum.body(), visitor);
      }
      case CallExpression call -> {
        visit(call.callee(), visitor);
        for (Argument argument : call.arguments()) {
          visit(argument.value(), visitor);
        }
      }
      case SignedExpression signed -> visit(signed.operand(), visitor);
      case SumExpression sum -> {
        for (Addend addend : sum.addends()) {
          visit(addend.value(), visitor);
        }
      }
      case ProductExpression product -> {
        for (Factor factor : product.factors()) {
          visit(factor.value(), visitor);
        }
      }
      case PowerExpression power -> {
        visit(power.base(), visitor);
        visit(power.exponent(), visitor);
      }
      case ChoiceExpression choice -> {
        visit(choice.condition().left(), visitor);
        visit(choice.condition().right(), visitor);
        visit(choice.then(), visitor);
        visit(choice.otherwise(), visitor);
      }
      case ParenthesisedExpression parenthesised -> visit(parenthesised.inner(), visitor);
    }
  }
}
