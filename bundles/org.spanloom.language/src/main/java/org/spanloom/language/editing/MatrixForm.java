/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Writes the equations {@code x' = ...} of a system as one of a matrix: {@code x' = A*x + b}. The
 * states must have one dimension. Coefficients keep their factors and their order, so that the
 * numbers stay what they are.
 */
public final class MatrixForm {

  private final SourceText source;
  private final SystemModel system;
  private final SystemStatement statement;

  private MatrixForm(SourceText source, SystemModel system, SystemStatement statement) {
    this.source = source;
    this.system = system;
    this.statement = statement;
  }

  /** Returns the edits for the system at an offset, if its equations have that form. */
  public static Optional<Fix> at(Model model, int offset) {
    for (Statement statement : model.syntax().statements()) {
      if (statement instanceof SystemStatement system && system.span().touches(offset)) {
        return model.systems().stream()
            .filter(s -> s.span().equals(system.span()) && s.equations().isPresent())
            .findFirst()
            .flatMap(s -> new MatrixForm(model.source(), s, system).fix());
      }
    }
    return Optional.empty();
  }

  private Optional<Fix> fix() {
    List<StateComponent> states = system.states();
    UnitOfMeasure unit = states.getFirst().unit();
    boolean plain =
        states.size() > 1
            && states.stream()
                .allMatch(s ->
                    s.order() == 0
                        && s.label().equals(s.name())
                        && s.unit().offset() == 0
                        && s.unit().dimension().equals(unit.dimension()));
    Set<String> names = new LinkedHashSet<>();
    states.forEach(s -> names.add(s.name()));
    Map<String, EquationStatement> equations = new HashMap<>();
    Map<String, Map<String, String>> rows = new HashMap<>();
    for (Statement inner : statement.body()) {
      if (inner instanceof EquationStatement equation) {
        Optional<String> state = governed(equation).filter(names::contains);
        Optional<Map<String, String>> row = LinearText.of(source, equation.right(), names);
        if (!plain || state.isEmpty() || row.isEmpty()) {
          return Optional.empty();
        }
        equations.put(state.get(), equation);
        rows.put(state.get(), row.get());
      }
    }
    return equations.size() == states.size()
        ? Optional.of(new Fix("Write the equations with a matrix", edits(names, equations, rows)))
        : Optional.empty();
  }

  private static Optional<String> governed(EquationStatement equation) {
    return equation.left() instanceof NameExpression name && name.primes() == 1
        ? Optional.of(name.name().text())
        : Optional.empty();
  }

  private List<TextEdit> edits(
      Set<String> names,
      Map<String, EquationStatement> equations,
      Map<String, Map<String, String>> rows) {
    List<Span> places =
        equations.values().stream()
            .map(EquationStatement::span)
            .sorted((a, b) -> Integer.compare(a.start(), b.start()))
            .toList();
    List<TextEdit> edits = new ArrayList<>();
    edits.add(
        new TextEdit(
            places.getFirst(), block(WholeLines.indent(source, places.getFirst()), names, rows)));
    for (Span place : places.subList(1, places.size())) {
      edits.add(new TextEdit(WholeLines.around(source, place), ""));
    }
    return edits;
  }

  private String block(String indent, Set<String> names, Map<String, Map<String, String>> rows) {
    Set<String> taken = words();
    String matrix = free("A", taken);
    String column = free("b", taken);
    String vector = free("x", taken);
    List<String> coefficients = new ArrayList<>();
    List<String> rest = new ArrayList<>();
    boolean forced = false;
    for (String row : names) {
      List<String> entries = new ArrayList<>();
      names.forEach(state -> entries.add(rows.get(row).getOrDefault(state, "0")));
      coefficients.add(String.join(", ", entries));
      String constant = rows.get(row).getOrDefault(LinearText.CONSTANT, "0");
      rest.add(constant);
      forced |= !constant.equals("0");
    }
    StringBuilder text = new StringBuilder();
    rows(text, indent, matrix + argument(coefficients) + unit("", true), coefficients);
    String stateUnit = system.states().getFirst().unit().code();
    if (forced) {
      rows(text, indent, column + argument(rest) + unit(stateUnit, true), rest);
    }
    rows(text, indent, vector + unit(stateUnit, false), List.copyOf(names));
    text.append(vector + "' = " + matrix + argument(coefficients) + "*" + vector);
    text.append(forced ? " + " + column + argument(rest) : "");
    return text.toString();
  }

  private static void rows(StringBuilder text, String indent, String head, List<String> rows) {
    text.append("matrix ").append(head).append(" =\n");
    rows.forEach(row -> text.append(indent).append("  row ").append(row).append('\n'));
    text.append(indent);
  }

  /** Returns the argument of a matrix in which the independent variable occurs. */
  private String argument(List<String> rows) {
    boolean found =
        rows.stream()
            .anyMatch(row ->
                Lexer.lex(row).stream()
                    .anyMatch(t -> row.substring(t.start(), t.end()).equals(system.timeName())));
    return found ? "(" + system.timeName() + ")" : "";
  }

  private String unit(String code, boolean overTime) {
    String time = system.timeUnit().code();
    boolean divides = overTime && !time.equals(UnitOfMeasure.ONE.code());
    boolean single = time.chars().allMatch(Character::isLetter);
    String own = code.equals(UnitOfMeasure.ONE.code()) ? "" : code;
    String all = own + (divides ? "/" + (single ? time : "(" + time + ")") : "");
    return all.isEmpty() ? "" : " [" + all + "]";
  }

  private Set<String> words() {
    Set<String> words = new HashSet<>();
    for (Token token : Lexer.lex(source.content())) {
      words.add(source.slice(token.span()));
    }
    return words;
  }

  private static String free(String wanted, Set<String> taken) {
    String name = wanted;
    for (int i = 1; taken.contains(name); i++) {
      name = wanted + "_" + i;
    }
    return name;
  }
}
