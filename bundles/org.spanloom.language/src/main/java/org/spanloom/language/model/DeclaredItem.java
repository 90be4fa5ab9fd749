/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.MatrixSource;
import org.spanloom.language.syntax.MatrixSource.MatrixExpression;
import org.spanloom.language.syntax.MatrixSource.MatrixFile;
import org.spanloom.language.syntax.MatrixSource.MatrixRows;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.TableSource.TableRows;

/** A declaration of one frame that is to be read after those it uses. */
record DeclaredItem(Declarations owner, Declaration declaration) {

  /** Returns its name as the whole system uses it. */
  String label() {
    return owner.frame().label(declaration.name().text());
  }

  /** Returns the declarations that it uses, in the order of the text. */
  List<DeclaredItem> uses() {
    Optional<Binding> binding = owner.binding(declaration);
    List<DeclaredItem> uses = new ArrayList<>();
    Declarations where = binding.map(b -> b.frame().declarations()).orElse(owner);
    List<NameExpression> names =
        binding.map(b -> ExpressionNames.of(b.value())).orElseGet(() -> names(declaration));
    names.forEach(name -> where.item(name.name().text()).ifPresent(uses::add));
    return uses;
  }

  /** Returns the names that a declaration uses, in the order of the text. */
  static List<NameExpression> names(Declaration declaration) {
    List<NameExpression> names = new ArrayList<>();
    expressions(declaration).forEach(e -> names.addAll(ExpressionNames.of(e)));
    return names;
  }

  private static List<Expression> expressions(Declaration declaration) {
    List<Expression> expressions = new ArrayList<>();
    switch (declaration) {
      case ParameterStatement parameter -> {
        expressions.add(parameter.value());
        parameter.uncertainty().ifPresent(u -> expressions.add(u.halfWidth()));
      }
      case LetStatement let -> expressions.add(let.value());
      case InputStatement input -> expressions.add(input.value());
      case MatrixStatement matrix -> expressions.addAll(expressions(matrix.source()));
      case TableStatement table -> {
        if (table.source() instanceof TableRows rows) {
          rows.rows().forEach(r -> expressions.addAll(List.of(r.time(), r.value())));
        }
      }
      case OutputStatement output -> expressions.add(output.value());
      default -> {}
    }
    return expressions;
  }

  private static List<Expression> expressions(MatrixSource source) {
    return switch (source) {
      case MatrixRows rows -> rows.rows().stream().flatMap(r -> r.values().stream()).toList();
      case MatrixExpression expression -> List.of(expression.value());
      case MatrixFile file -> List.of();
    };
  }
}
