/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.syntax.Statement.TransferStatement;
import org.spanloom.language.text.Span;

/** Which way a transfer leads, and how to put one right. */
final class TransferDirection {

  private TransferDirection() {}

  /** Offers the first state in the flow as the place that a transfer between outside comes from. */
  static Fix[] stateInFlow(Frame frame, TransferStatement transfer) {
    return ExpressionNames.of(transfer.flow()).stream()
        .map(n -> n.name().text())
        .filter(name -> frame.state(name).isPresent())
        .limit(1)
        .map(name -> Fix.replace("Lead from " + name, transfer.from().span(), name))
        .toArray(Fix[]::new);
  }

  /**
   * Reports a flow with a minus in front: it runs against the arrow. With the ends swapped and
   * without the sign it says the same.
   */
  static void reportReversed(Frame frame, TransferStatement transfer) {
    Optional<Span> minus = leadingMinus(transfer.flow());
    if (minus.isPresent()) {
      String from = frame.slice(transfer.from().span());
      String to = frame.slice(transfer.to().span());
      frame
          .problems()
          .report(
              ProblemKind.TRANSFER_REVERSED,
              transfer.flow().span(),
              "With its minus, this flow leads from "
                  + to
                  + " to "
                  + from
                  + ", against the arrow: swap the ends and remove the sign.",
              new Fix(
                  "Swap the ends",
                  List.of(
                      new TextEdit(transfer.from().span(), to),
                      new TextEdit(transfer.to().span(), from),
                      new TextEdit(minus.get(), ""))));
    }
  }

  private static Optional<Span> leadingMinus(Expression expression) {
    return switch (expression) {
      case SignedExpression signed when signed.negative() ->
          Optional.of(new Span(signed.span().start(), signed.operand().span().start()));
      case ProductExpression product -> leadingMinus(product.factors().getFirst().value());
      default -> Optional.empty();
    };
  }
}
