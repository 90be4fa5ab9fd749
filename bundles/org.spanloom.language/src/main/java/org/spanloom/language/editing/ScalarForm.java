/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.spanloom.language.model.Model;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.Addend;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.syntax.Expression.SumExpression;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.MatrixSource.MatrixRows;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.text.SourceText;

/**
 * Writes an equation of matrices such as {@code M*q'' + K*q = F(t)} as one equation for each row,
 * with the entries as they stand in the rows of the matrices. What nothing else uses is removed.
 */
public final class ScalarForm {

  private final SourceText source;
  private final EquationStatement equation;
  private final Map<String, MatrixStatement> matrices = new HashMap<>();
  private int rows = -1;

  /** A summand: a matrix times a column, or a column alone. */
  private record Term(
      boolean negative, Optional<MatrixStatement> matrix, MatrixStatement column, int primes) {}

  private ScalarForm(SourceText source, EquationStatement equation) {
    this.source = source;
    this.equation = equation;
  }

  /** Returns the edits for the equation at an offset, if it has that form. */
  public static Optional<Fix> at(Model model, int offset) {
    for (Statement statement : model.syntax().statements()) {
      if (statement instanceof SystemStatement system && system.span().touches(offset)) {
        boolean sound =
            model.systems().stream()
                .anyMatch(s -> s.span().equals(system.span()) && s.equations().isPresent());
        return sound ? at(model, system, offset) : Optional.empty();
      }
    }
    return Optional.empty();
  }

  private static Optional<Fix> at(Model model, SystemStatement system, int offset) {
    for (Statement statement : system.body()) {
      if (statement instanceof EquationStatement equation && equation.span().touches(offset)) {
        ScalarForm form = new ScalarForm(model.source(), equation);
        form.collect(model.syntax().statements());
        form.collect(system.body());
        return form.fix();
      }
    }
    return Optional.empty();
  }

  private void collect(List<Statement> statements) {
    for (Statement statement : statements) {
      if (statement instanceof MatrixStatement matrix
          && matrix.source() instanceof MatrixRows rows
          && !rows.rows().isEmpty()) {
        matrices.put(matrix.name().text(), matrix);
      }
    }
  }

  private Optional<Fix> fix() {
    Optional<List<Term>> left = terms(equation.left());
    Optional<List<Term>> right = terms(equation.right());
    if (left.isEmpty() || right.isEmpty() || rows < 1) {
      return Optional.empty();
    }
    List<String> lines = new ArrayList<>();
    for (int row = 0; row < rows; row++) {
      lines.add(side(left.get(), row) + " = " + side(right.get(), row));
    }
    String indent = WholeLines.indent(source, equation.span());
    List<TextEdit> edits = new ArrayList<>();
    edits.add(new TextEdit(equation.span(), String.join("\n" + indent, lines)));
    for (MatrixStatement matrix : usedHereOnly()) {
      edits.add(new TextEdit(WholeLines.around(source, matrix.span()), ""));
    }
    edits.sort(Comparator.comparingInt(e -> e.span().start()));
    return Optional.of(new Fix("Write an equation for each row", edits));
  }

  private Optional<List<Term>> terms(Expression side) {
    List<Term> terms = new ArrayList<>();
    boolean zero = side instanceof NumberExpression number && number.digits().equals("0");
    List<Addend> addends =
        side instanceof SumExpression sum ? sum.addends() : List.of(new Addend(false, side));
    for (Addend addend : zero ? List.<Addend>of() : addends) {
      Optional<Term> term = term(addend);
      if (term.isEmpty()) {
        return Optional.empty();
      }
      terms.add(term.get());
    }
    return Optional.of(terms);
  }

  private Optional<Term> term(Addend addend) {
    boolean signed = addend.value() instanceof SignedExpression s && s.negative();
    Expression value = signed ? ((SignedExpression) addend.value()).operand() : addend.value();
    if (!(value instanceof ProductExpression product)) {
      return column(addend.subtracted() != signed, Optional.empty(), value);
    }
    boolean two = product.factors().size() == 2 && !product.factors().getLast().divides();
    Expression first = product.factors().getFirst().value();
    boolean minus = first instanceof SignedExpression s && s.negative();
    Expression name = minus ? ((SignedExpression) first).operand() : first;
    Optional<MatrixStatement> matrix = two ? matrix(name) : Optional.empty();
    return matrix.flatMap(m ->
        column((addend.subtracted() != signed) != minus, matrix, product.factors().get(1).value()));
  }

  /** Returns a summand whose column has as many rows as the others. */
  private Optional<Term> column(
      boolean negative, Optional<MatrixStatement> matrix, Expression value) {
    Optional<MatrixStatement> column = matrix(value);
    if (column.isEmpty() || width(column.get()) != 1) {
      return Optional.empty();
    }
    int primes = value instanceof NameExpression name ? name.primes() : 0;
    int height = height(matrix.orElse(column.get()));
    boolean fits = rows < 0 || rows == height;
    rows = height;
    return fits ? Optional.of(new Term(negative, matrix, column.get(), primes)) : Optional.empty();
  }

  private Optional<MatrixStatement> matrix(Expression value) {
    return switch (value) {
      case NameExpression name -> Optional.ofNullable(matrices.get(name.name().text()));
      case CallExpression call -> Optional.ofNullable(matrices.get(call.callee().name().text()));
      default -> Optional.empty();
    };
  }

  private static List<List<Expression>> entries(MatrixStatement matrix) {
    return matrix.source() instanceof MatrixRows rows
        ? rows.rows().stream().map(r -> r.values()).toList()
        : List.of();
  }

  private static int height(MatrixStatement matrix) {
    return entries(matrix).size();
  }

  private static int width(MatrixStatement matrix) {
    return entries(matrix).getFirst().size();
  }

  private String side(List<Term> terms, int row) {
    StringBuilder text = new StringBuilder();
    for (Term term : terms) {
      if (term.matrix().isEmpty()) {
        add(text, term.negative(), "", entry(term.column(), row, 0), term.primes());
      } else {
        for (int j = 0; j < height(term.column()); j++) {
          String factor = entry(term.matrix().get(), row, j);
          add(text, term.negative(), factor, entry(term.column(), j, 0), term.primes());
        }
      }
    }
    return text.isEmpty() ? "0" : text.toString();
  }

  private static void add(
      StringBuilder text, boolean negative, String factor, String value, int primes) {
    if (factor.equals("0") || value.equals("0")) {
      return;
    }
    String product = factor.isEmpty() || factor.equals("1") ? "" : factor + "*";
    String all = product + value + "'".repeat(primes);
    boolean signed = all.startsWith("-");
    boolean minus = negative != signed;
    text.append(text.isEmpty() ? (minus ? "-" : "") : minus ? " - " : " + ");
    text.append(signed ? all.substring(1).strip() : all);
  }

  /** Returns an entry as a factor: sums in parentheses, lone numbers with the unit they take. */
  private String entry(MatrixStatement matrix, int row, int column) {
    Expression entry = entries(matrix).get(row).get(column);
    String text = source.slice(entry.span());
    Expression bare = entry instanceof SignedExpression signed ? signed.operand() : entry;
    if (bare instanceof NumberExpression number && number.unit().isEmpty()) {
      boolean zero = number.digits().matches("[0.]+");
      String unit = matrix.unit().map(u -> " [" + u.code() + "]").orElse("");
      return zero ? "0" : text + unit;
    }
    return entry instanceof SumExpression ? "(" + text + ")" : text;
  }

  /** Returns the matrices that no other statement uses, in the order of the text. */
  private List<MatrixStatement> usedHereOnly() {
    Map<String, Integer> all = count(source.content());
    Map<String, Integer> here = count(source.slice(equation.span()));
    List<MatrixStatement> spare = new ArrayList<>();
    for (Map.Entry<String, Integer> name : new TreeMap<>(here).entrySet()) {
      MatrixStatement matrix = matrices.get(name.getKey());
      boolean documented = matrix != null && source.slice(matrix.span()).contains("#");
      if (matrix != null && !documented && all.get(name.getKey()) == name.getValue() + 1) {
        spare.add(matrix);
      }
    }
    return spare;
  }

  private static Map<String, Integer> count(String text) {
    Map<String, Integer> counts = new HashMap<>();
    Lexer.lex(text).stream()
        .filter(t -> t.kind().isName())
        .forEach(t -> counts.merge(text.substring(t.start(), t.end()), 1, Integer::sum));
    return counts;
  }
}
