/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import java.util.List;
import java.util.function.Consumer;
import org.spanloom.language.syntax.BlockLine;
import org.spanloom.language.syntax.BlockLine.RepeatedLines;
import org.spanloom.language.syntax.BlockLine.SingleLine;
import org.spanloom.language.syntax.MatrixSource.MatrixExpression;
import org.spanloom.language.syntax.MatrixSource.MatrixFile;
import org.spanloom.language.syntax.MatrixSource.MatrixRow;
import org.spanloom.language.syntax.MatrixSource.MatrixRows;
import org.spanloom.language.syntax.QuotedText;
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
import org.spanloom.language.syntax.Statement.JumpTime;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.RequireStatement;
import org.spanloom.language.syntax.Statement.Setting;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.Statement.TransferEnd;
import org.spanloom.language.syntax.Statement.TransferStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.syntax.TableSource.TableFile;
import org.spanloom.language.syntax.TableSource.TableRow;
import org.spanloom.language.syntax.TableSource.TableRows;

/**
 * Writes a tree as a model text in its canonical layout. Reading the text of a tree without
 * problems gives the same tree, but for the places in it. Comments are no part of a tree and are
 * left out; documentation comments stand above what they document.
 */
public final class Printer {

  private final SyntaxFile file;
  private final ExpressionPrinter out = new ExpressionPrinter();
  private int loops;

  private Printer(SyntaxFile file) {
    this.file = file;
  }

  /** Returns the text of a tree. */
  public static String print(SyntaxFile file) {
    Printer printer = new Printer(file);
    file.statements().forEach(printer::statement);
    return Formatter.format(printer.out.text());
  }

  private void statement(Statement statement) {
    switch (statement) {
      case SystemStatement system -> system(system);
      case ParameterStatement parameter -> {
        documentation(parameter.documentation());
        out.words("parameter", parameter.name().text()).unit(parameter.unit()).words("=");
        out.expression(parameter.value());
        parameter
            .uncertainty()
            .ifPresent(u -> {
              out.words("±").expression(u.halfWidth());
              out.words(u.percent() ? "%" : "");
            });
      }
      case LetStatement let -> {
        documentation(let.documentation());
        out.words("let", let.name().text());
        let.argument().ifPresent(a -> out.words("(", a.text(), ")"));
        out.unit(let.unit()).words("=").expression(let.value());
      }
      case InputStatement input -> {
        documentation(input.documentation());
        out.words("input", input.name().text(), "(", input.argument().text(), ")");
        out.unit(input.unit()).words("=").expression(input.value());
      }
      case StateStatement state -> {
        documentation(state.documentation());
        out.words("state", state.name().text()).ranges(state.ranges());
        out.words("'".repeat(state.primes())).unit(state.unit());
        state.initial().ifPresent(e -> out.words("=").expression(e));
        state.scale().ifPresent(e -> out.words("scale").expression(e));
      }
      case MatrixStatement matrix -> matrix(matrix);
      case ImportStatement read -> out.words("import", "\"" + read.path().text() + "\"");
      case PartStatement part -> part(part);
      case TableStatement table -> table(table);
      case OutputStatement output -> {
        documentation(output.documentation());
        out.words("output", output.name().text()).unit(output.unit()).words("=");
        out.expression(output.value());
      }
      case EquationStatement equation -> {
        documentation(equation.documentation());
        out.expression(equation.left()).words("=").expression(equation.right());
      }
      case TransferStatement transfer -> {
        documentation(transfer.documentation());
        out.words("transfer");
        end(transfer.from());
        out.words("->");
        end(transfer.to());
        out.words("=").expression(transfer.flow());
      }
      case ForStatement loop -> {
        out.words("for").turns(loop.turns()).words("{").endLine();
        // A declaration that is not indented would end the loop.
        loops++;
        for (Statement repeated : loop.body()) {
          out.words(" ".repeat(loops));
          statement(repeated);
        }
        loops--;
        out.words("}");
      }
      case JumpStatement jump -> jump(jump);
      case InitialValuesStatement values -> initialValues(values);
      case BoundaryStatement boundary -> boundary(boundary);
      case BasisStatement basis -> basis(basis);
      case RequireStatement require -> {
        documentation(require.documentation());
        out.words("require").clause(require.clause());
      }
      case AccuracyStatement accuracy -> out.words("accuracy").expression(accuracy.value());
      case UnreadStatement unread -> out.words(file.source().slice(unread.span()));
    }
    out.endLine();
  }

  private void documentation(String text) {
    text.lines().forEach(line -> out.words("##", line).endLine());
  }

  private void system(SystemStatement system) {
    documentation(system.documentation());
    out.words("system", system.name().text());
    system
        .over()
        .ifPresent(over -> {
          out.words("over", over.name().text()).unit(over.unit());
          over.start().ifPresent(b -> out.words(b.open() ? "after" : "from").expression(b.value()));
          over.end().ifPresent(b -> out.words(b.open() ? "before" : "to").expression(b.value()));
        });
    out.words("{").endLine();
    system.body().forEach(this::statement);
    out.words("}");
  }

  private void table(TableStatement table) {
    documentation(table.documentation());
    out.words("table", table.name().text(), "(", table.argument().text(), ")").unit(table.unit());
    out.words("=");
    if (table.source() instanceof TableFile file) {
      out.words("file", quoted(file.path()), "time", quoted(file.time())).unit(file.timeUnit());
      out.words("column", quoted(file.column()));
    }
    out.words(table.method().words(), table.extended() ? "extended" : "");
    if (table.source() instanceof TableRows rows) {
      for (TableRow row : rows.rows()) {
        out.endLine().words("row").list(List.of(row.time(), row.value()));
      }
    }
  }

  private static String quoted(QuotedText text) {
    return "\"" + text.text() + "\"";
  }

  private void matrix(MatrixStatement matrix) {
    documentation(matrix.documentation());
    out.words("matrix", matrix.name().text());
    matrix.argument().ifPresent(a -> out.words("(", a.text(), ")"));
    out.unit(matrix.unit()).words("=");
    switch (matrix.source()) {
      case MatrixFile inFile -> out.words("file", "\"" + inFile.path().text() + "\"");
      case MatrixExpression expression -> out.expression(expression.value());
      case MatrixRows rows -> {
        for (MatrixRow row : rows.rows()) {
          out.endLine().words("row").list(row.values());
        }
      }
    }
  }

  private void end(TransferEnd end) {
    end.state().ifPresentOrElse(out::expression, () -> out.words("outside"));
  }

  private void jump(JumpStatement jump) {
    documentation(jump.documentation());
    out.words("jump");
    switch (jump.time()) {
      case JumpTime.Once once -> out.words("at").expression(once.time());
      case JumpTime.Repeated repeated -> {
        out.words("every").expression(repeated.period());
        out.words("from").expression(repeated.first());
        out.words("to").expression(repeated.last());
      }
    }
    out.words("{").endLine();
    lines(
        jump.changes(),
        c -> out.expression(c.target()).words("becomes").expression(c.value()).endLine());
    out.words("}");
  }

  private void part(PartStatement part) {
    documentation(part.documentation());
    out.words("part", part.name().text(), "=", part.system().text());
    if (!part.bindings().isEmpty()) {
      out.words("{").endLine();
      settings(part.bindings());
      out.words("}");
    }
  }

  private void settings(List<Setting> settings) {
    for (Setting setting : settings) {
      out.expression(setting.target()).words("=").expression(setting.value()).endLine();
    }
  }

  private void initialValues(InitialValuesStatement values) {
    documentation(values.documentation());
    out.words("initial", "values", values.name().text());
    values.time().ifPresent(e -> out.words("at").expression(e));
    out.words("{").endLine();
    lines(
        values.settings(),
        s -> out.expression(s.target()).words("=").expression(s.value()).endLine());
    out.words("}");
  }

  private void boundary(BoundaryStatement boundary) {
    documentation(boundary.documentation());
    out.words("boundary", boundary.name().text(), "{").endLine();
    lines(
        boundary.conditions(),
        c -> out.expression(c.left()).words("=").expression(c.right()).endLine());
    out.words("}");
  }

  private void basis(BasisStatement basis) {
    documentation(basis.documentation());
    out.words("basis", basis.name().text());
    basis.argument().ifPresent(a -> out.words("(", a.text(), ")"));
    basis.time().ifPresent(e -> out.words("at").expression(e));
    out.words(basis.hasRows() ? "=" : "");
    out.endLine();
    lines(
        basis.rows(),
        r -> out.words("row").expression(r.target()).words("=").list(r.values()).endLine());
  }

  private <T> void lines(List<BlockLine<T>> lines, Consumer<T> printer) {
    for (BlockLine<T> line : lines) {
      switch (line) {
        case SingleLine<T> single -> printer.accept(single.content());
        case RepeatedLines<T> loop -> {
          out.words("for").turns(loop.turns()).words("{").endLine();
          lines(loop.lines(), printer);
          out.words("}").endLine();
        }
      }
    }
  }
}
