/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.editing.OutlineNode.Kind;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.AccuracyStatement;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.ForStatement;
import org.spanloom.language.syntax.Statement.ImportStatement;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.JumpStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.RequireStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.Statement.TransferStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.syntax.UnitText;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/** Lists the statements of a file as a tree. */
public final class Outline {

  private static final int LONGEST_LABEL = 80;

  private final SourceText source;

  private Outline(SourceText source) {
    this.source = source;
  }

  /**
   * Returns one node for each statement, in the order of the text; those of a system are its
   * children.
   */
  public static List<OutlineNode> of(SyntaxFile file) {
    return new Outline(file.source()).nodes(file.statements());
  }

  private List<OutlineNode> nodes(List<Statement> statements) {
    List<OutlineNode> nodes = new ArrayList<>();
    for (Statement statement : statements) {
      nodes.add(node(statement));
    }
    return nodes;
  }

  private OutlineNode node(Statement statement) {
    return switch (statement) {
      case SystemStatement system -> system(system);
      case ParameterStatement p -> leaf(Kind.PARAMETER, p.name(), unit(p.unit()), p.span());
      case LetStatement let ->
          new OutlineNode(
              Kind.LET,
              let.name().text() + let.argument().map(a -> "(" + a.text() + ")").orElse(""),
              unit(let.unit()),
              let.span(),
              let.name().span(),
              List.of());
      case InputStatement input ->
          new OutlineNode(
              Kind.LET,
              input.name().text() + "(" + input.argument().text() + ")",
              unit(input.unit()),
              input.span(),
              input.name().span(),
              List.of());
      case StateStatement state ->
          new OutlineNode(
              Kind.STATE,
              state.label() + ranges(state),
              unit(state.unit()),
              state.span(),
              state.name().span(),
              List.of());
      case TableStatement table ->
          new OutlineNode(
              Kind.LET,
              table.name().text() + "(" + table.argument().text() + ")",
              unit(table.unit()),
              table.span(),
              table.name().span(),
              List.of());
      case MatrixStatement matrix ->
          new OutlineNode(
              Kind.MATRIX,
              matrix.name().text() + matrix.argument().map(a -> "(" + a.text() + ")").orElse(""),
              unit(matrix.unit()),
              matrix.span(),
              matrix.name().span(),
              List.of());
      case PartStatement part -> leaf(Kind.PART, part.name(), part.system().text(), part.span());
      case ImportStatement read -> text(Kind.IMPORT, read.span(), read.span());
      case OutputStatement output ->
          leaf(Kind.OUTPUT, output.name(), unit(output.unit()), output.span());
      case EquationStatement equation -> text(Kind.EQUATION, equation.span(), equation.span());
      case TransferStatement transfer -> text(Kind.EQUATION, transfer.span(), transfer.span());
      case JumpStatement jump -> text(Kind.JUMP, jump.header(), jump.span());
      case BoundaryStatement boundary ->
          leaf(Kind.BOUNDARY, boundary.name(), "boundary conditions", boundary.span());
      case ForStatement loop ->
          new OutlineNode(
              Kind.LOOP,
              oneLine("for " + source.slice(loop.turns().span())),
              "",
              loop.span(),
              loop.turns().span(),
              nodes(loop.body()));
      case InitialValuesStatement values ->
          leaf(Kind.INITIAL_VALUES, values.name(), "initial values", values.span());
      case BasisStatement basis -> leaf(Kind.BASIS, basis.name(), "basis", basis.span());
      case RequireStatement require ->
          text(Kind.REQUIREMENT, require.clause().span(), require.span());
      case AccuracyStatement accuracy -> text(Kind.ACCURACY, accuracy.span(), accuracy.span());
      case UnreadStatement unread -> text(Kind.UNREAD, unread.span(), unread.span());
    };
  }

  private OutlineNode system(SystemStatement system) {
    return new OutlineNode(
        Kind.SYSTEM,
        system.name().text(),
        system.over().map(o -> oneLine(source.slice(o.span()))).orElse(""),
        system.span(),
        system.name().span(),
        nodes(system.body()));
  }

  private String ranges(StateStatement state) {
    return state.ranges().stream()
        .map(r -> oneLine(source.slice(r.span())))
        .reduce((a, b) -> a + ", " + b)
        .map(text -> "[" + text + "]")
        .orElse("");
  }

  private static OutlineNode leaf(Kind kind, Name name, String detail, Span span) {
    return new OutlineNode(kind, name.text(), detail, span, name.span(), List.of());
  }

  private OutlineNode text(Kind kind, Span shown, Span span) {
    return new OutlineNode(kind, oneLine(source.slice(shown)), "", span, span, List.of());
  }

  private static String unit(Optional<UnitText> unit) {
    return unit.map(u -> "[" + u.code() + "]").orElse("");
  }

  private static String oneLine(String text) {
    String head = text.length() > 4 * LONGEST_LABEL ? text.substring(0, 4 * LONGEST_LABEL) : text;
    String line = head.replaceAll("#[^\r\n]*", " ").replaceAll("\\s+", " ").strip();
    return line.length() <= LONGEST_LABEL ? line : line.substring(0, LONGEST_LABEL - 3) + "...";
  }
}
