/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.function.UnaryOperator;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.Factor;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;

/**
 * Sums and products of matrices, entry by entry over what is stored. Shapes that do not fit are
 * reported. A matrix of one row and one column is the same as its entry.
 */
final class MatrixAlgebra {

  private final Resolver resolver;
  private final Frame frame;
  private final Problems problems;

  /** One value of a sum with its place. */
  record Summand(boolean subtracted, Value value, Span span) {}

  MatrixAlgebra(Resolver resolver, Frame frame) {
    this.resolver = resolver;
    this.frame = frame;
    this.problems = frame.problems();
  }

  /** Returns a matrix, or its entry if it has one only. */
  static Value simplest(MatrixValue matrix) {
    return matrix.single().isPresent() ? matrix.single().get() : matrix;
  }

  /** Returns a value that must be a single one; reports a matrix. */
  Optional<Quantity> single(Value value, Span span) {
    return switch (value) {
      case Quantity quantity -> Optional.of(quantity);
      case MatrixValue matrix -> {
        problems.report(
            ProblemKind.SHAPE_MISMATCH,
            span,
            "\""
                + resolver.shown(span)
                + "\" is "
                + matrix.shape()
                + ", but a single value belongs here: write an entry of it.");
        yield Optional.empty();
      }
    };
  }

  /**
   * Returns the sum of values of one dimension, among them a matrix; reports those of other shapes.
   */
  Optional<? extends Value> sum(List<Summand> summands, Dimension dimension) {
    List<Summand> terms = summands.stream().filter(s -> !s.value().zero()).toList();
    Summand first = terms.getFirst();
    for (Summand summand : terms) {
      if (!shape(summand.value()).equals(shape(first.value()))) {
        reportSum(first, summand);
        return Optional.empty();
      }
    }
    MatrixValue model = (MatrixValue) first.value();
    List<MatrixValue.Entry> entries = new ArrayList<>();
    for (int row = 0; row < model.rows(); row++) {
      TreeMap<Integer, QuantitySum> sums = new TreeMap<>();
      int touched = 0;
      for (Summand summand : terms) {
        for (MatrixValue.Entry entry : ((MatrixValue) summand.value()).row(row)) {
          sums.computeIfAbsent(entry.column(), c -> new QuantitySum())
              .add(summand.subtracted(), entry.value(), frame.placed(summand.span()));
          touched++;
        }
      }
      if (!counted(touched, first.span())) {
        return Optional.empty();
      }
      addRow(row, sums, dimension, false, entries);
    }
    return Optional.of(
        simplest(new MatrixValue(model.rows(), model.columns(), entries, dimension)));
  }

  private static void addRow(
      int row,
      Map<Integer, QuantitySum> sums,
      Dimension dimension,
      boolean unplaced,
      List<MatrixValue.Entry> entries) {
    sums.forEach((column, sum) -> {
      Quantity total = sum.total(dimension);
      if (!MatrixValue.isZero(total)) {
        entries.add(new MatrixValue.Entry(row, column, unplaced ? total.inherited() : total));
      }
    });
  }

  /** Returns the shape of a value in words, for messages. */
  static String shape(Value value) {
    return switch (value) {
      case Quantity quantity -> "a single value";
      case MatrixValue matrix -> matrix.shape();
    };
  }

  private void reportSum(Summand first, Summand other) {
    problems.report(
        ProblemKind.SHAPE_MISMATCH,
        other.span(),
        "\""
            + resolver.shown(other.span())
            + "\" is "
            + shape(other.value())
            + ", but \""
            + resolver.shown(first.span())
            + "\" is "
            + shape(first.value())
            + ": only matrices of one shape can be added.");
  }

  /**
   * Returns the product or quotient of two values, of which one is a matrix and at most one holds
   * states.
   *
   * @param factor the right one as written
   * @param dimension the dimension of the result
   * @param product the whole product as written, in which the left value ends before the factor
   */
  Optional<? extends Value> product(
      Value left, Value right, Factor factor, Dimension dimension, ProductExpression product) {
    if (factor.divides()) {
      return quotient(left, right, factor, dimension);
    }
    return switch (left) {
      case Quantity a ->
          scaled((MatrixValue) right, q -> Quantity.product(a, q, dimension), dimension, product);
      case MatrixValue a ->
          switch (right) {
            case Quantity b ->
                scaled(a, q -> Quantity.product(q, b, dimension), dimension, product);
            case MatrixValue b -> matrixProduct(a, b, factor, dimension, product);
          };
    };
  }

  private Optional<Value> quotient(Value left, Value right, Factor factor, Dimension dimension) {
    Span span = factor.value().span();
    if (!(right instanceof Quantity divisor) || !(left instanceof MatrixValue matrix)) {
      problems.report(
          ProblemKind.SHAPE_MISMATCH,
          span,
          "\""
              + resolver.shown(span)
              + "\" is "
              + shape(right)
              + ", and nothing can be divided by a matrix: multiply the other side of the equation"
              + " by it.");
      return Optional.empty();
    }
    Term by = divisor.constant().term();
    if (Simplifier.isZero(by)) {
      problems.report(
          ProblemKind.NUMBER_OUT_OF_RANGE,
          span,
          "\""
              + resolver.shown(span)
              + "\" is 0, and a matrix is divided by it: check the divisor.");
      return Optional.empty();
    }
    int depth = divisor.depth();
    return counted(matrix.entries().size(), span)
        ? Optional.of(
            matrix.map(
                q ->
                    q.map(
                        t -> Simplifier.quotient(t, by), dimension, Math.max(q.depth(), depth) + 1),
                dimension))
        : Optional.empty();
  }

  private Optional<Value> scaled(
      MatrixValue matrix,
      UnaryOperator<Quantity> change,
      Dimension dimension,
      ProductExpression product) {
    return counted(matrix.entries().size(), product.span())
        ? Optional.of(matrix.map(change, dimension))
        : Optional.empty();
  }

  private Optional<Value> matrixProduct(
      MatrixValue left,
      MatrixValue right,
      Factor factor,
      Dimension dimension,
      ProductExpression product) {
    if (left.columns() != right.rows()) {
      reportProduct(left, right, factor, product);
      return Optional.empty();
    }
    List<MatrixValue.Entry> entries = new ArrayList<>();
    for (int row = 0; row < left.rows(); row++) {
      TreeMap<Integer, QuantitySum> sums = new TreeMap<>();
      for (MatrixValue.Entry a : left.row(row)) {
        List<MatrixValue.Entry> others = right.row(a.column());
        if (!counted(others.size(), product.span())) {
          return Optional.empty();
        }
        for (MatrixValue.Entry b : others) {
          sums.computeIfAbsent(b.column(), c -> new QuantitySum())
              .add(Quantity.product(a.value(), b.value(), dimension));
        }
      }
      addRow(row, sums, dimension, true, entries);
    }
    return Optional.of(simplest(new MatrixValue(left.rows(), right.columns(), entries, dimension)));
  }

  private void reportProduct(
      MatrixValue left, MatrixValue right, Factor factor, ProductExpression product) {
    int place = product.factors().indexOf(factor);
    Span before =
        new Span(product.span().start(), product.factors().get(place - 1).value().span().end());
    Expression first = product.factors().getFirst().value();
    boolean turned = left.rows() == right.rows() && place == 1 && first instanceof NameExpression;
    Fix[] fixes =
        turned
            ? new Fix[] {
              new Fix(
                  "Write transpose(" + resolver.shown(before) + ")",
                  List.of(
                      new TextEdit(new Span(before.start(), before.start()), "transpose("),
                      new TextEdit(new Span(before.end(), before.end()), ")")))
            }
            : new Fix[0];
    problems.report(
        ProblemKind.SHAPE_MISMATCH,
        product.span(),
        "\""
            + resolver.shown(before)
            + "\" is "
            + left.shape()
            + ", but \""
            + resolver.shown(factor.value().span())
            + "\" is "
            + right.shape()
            + ": in a product the left factor has as many columns as the right one has rows"
            + (turned ? "; transpose(...) exchanges them." : "."),
        fixes);
  }

  /** Returns a value with rows and columns exchanged. */
  Value transposed(Value value) {
    return switch (value) {
      case Quantity quantity -> quantity;
      case MatrixValue matrix -> matrix.transposed();
    };
  }

  private boolean counted(int entries, Span span) {
    if (frame.file().matrices().allows(entries)) {
      return true;
    }
    problems.report(
        ProblemKind.MATRIX_TOO_LARGE,
        span,
        "The sums and products of matrices in this model have more than "
            + MatrixBudget.ENTRY_LIMIT
            + " entries together: use sparser or smaller matrices.");
    return false;
  }
}
