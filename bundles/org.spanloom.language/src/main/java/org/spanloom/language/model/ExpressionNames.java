/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.MissingExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Expression.ParenthesisedExpression;
import org.spanloom.language.syntax.Expression.PowerExpression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.syntax.Expression.SumExpression;

/** Lists the names in an expression. */
final class ExpressionNames {

  private ExpressionNames() {}

  /** Returns every use of a name, called functions included, in the order of the text. */
  static List<NameExpression> of(Expression expression) {
    List<NameExpression> names = new ArrayList<>();
    collect(expression, names);
    return names;
  }

  private static void collect(Expression expression, List<NameExpression> names) {
    switch (expression) {
      case NumberExpression number -> {}
      case MissingExpression missing -> {}
      case NameExpression name -> names.add(name);
      case CallExpression call -> {
        names.add(call.callee());
        call.arguments().forEach(a -> collect(a.value(), names));
      }
      case SignedExpression signed -> collect(signed.operand(), names);
      case SumExpression sum -> sum.addends().forEach(a -> collect(a.value(), names));
      case ProductExpression product -> product.factors().forEach(f -> collect(f.value(), names));
      case PowerExpression power -> {
        collect(power.base(), names);
        collect(power.exponent(), names);
      }
      case ParenthesisedExpression parenthesised -> collect(parenthesised.inner(), names);
    }
  }

  /** Adds every call in an expression, in the order of the text. */
  static void calls(Expression expression, List<CallExpression> calls) {
    switch (expression) {
      case NumberExpression number -> {}
      case MissingExpression missing -> {}
      case NameExpression name -> {}
      case CallExpression call -> {
        calls.add(call);
        call.arguments().forEach(a -> calls(a.value(), calls));
      }
      case SignedExpression signed -> calls(signed.operand(), calls);
      case SumExpression sum -> sum.addends().forEach(a -> calls(a.value(), calls));
      case ProductExpression product -> product.factors().forEach(f -> calls(f.value(), calls));
      case PowerExpression power -> {
        calls(power.base(), calls);
        calls(power.exponent(), calls);
      }
      case ParenthesisedExpression parenthesised -> calls(parenthesised.inner(), calls);
    }
  }
}
