/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Consumer;
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

/**
 * Puts declarations into an order in which each comes after those it uses, by depth-first search;
 * the order of the text decides wherever it can. Declarations that need each other are handed out
 * as cycles.
 */
final class DeclarationOrder {

  private enum Colour {
    UNSEEN,
    OPEN,
    DONE
  }

  private final List<Declaration> declarations;
  private final Map<String, Integer> places = new HashMap<>();
  private final Colour[] colours;
  private final List<Declaration> ordered = new ArrayList<>();
  private final Consumer<List<Declaration>> cycles;

  /** A declaration whose uses are being followed. */
  private static final class Visit {
    private final int place;
    private final List<NameExpression> uses;
    private int next;

    Visit(int place, List<NameExpression> uses) {
      this.place = place;
      this.uses = uses;
    }
  }

  private DeclarationOrder(List<Declaration> declarations, Consumer<List<Declaration>> cycles) {
    this.declarations = declarations;
    this.cycles = cycles;
    this.colours = new Colour[declarations.size()];
    for (int i = 0; i < colours.length; i++) {
      places.put(declarations.get(i).name().text(), i);
      colours[i] = Colour.UNSEEN;
    }
  }

  /**
   * Returns the declarations in order.
   *
   * @param declarations parameters, named expressions and outputs with names of their own
   * @param cycles takes each cycle found, in the order of use
   */
  static List<Declaration> of(List<Declaration> declarations, Consumer<List<Declaration>> cycles) {
    DeclarationOrder order = new DeclarationOrder(declarations, cycles);
    for (int i = 0; i < declarations.size(); i++) {
      if (order.colours[i] == Colour.UNSEEN) {
        order.visit(i);
      }
    }
    return order.ordered;
  }

  private void visit(int root) {
    Deque<Visit> path = new ArrayDeque<>();
    path.push(open(root));
    while (!path.isEmpty()) {
      Visit top = path.peek();
      if (top.next == top.uses.size()) {
        path.pop();
        colours[top.place] = Colour.DONE;
        ordered.add(declarations.get(top.place));
        continue;
      }
      Integer used = places.get(top.uses.get(top.next++).name().text());
      if (used != null && colours[used] == Colour.UNSEEN) {
        path.push(open(used));
      } else if (used != null && colours[used] == Colour.OPEN) {
        reportCycle(path, used);
      }
    }
  }

  private Visit open(int place) {
    colours[place] = Colour.OPEN;
    return new Visit(place, uses(declarations.get(place)));
  }

  private void reportCycle(Deque<Visit> path, int first) {
    List<Declaration> cycle = new ArrayList<>();
    for (Visit visit : path) {
      cycle.addFirst(declarations.get(visit.place));
      if (visit.place == first) {
        break;
      }
    }
    cycles.accept(cycle);
  }

  private static List<Expression> expressions(MatrixSource source) {
    return switch (source) {
      case MatrixRows rows -> rows.rows().stream().flatMap(r -> r.values().stream()).toList();
      case MatrixExpression expression -> List.of(expression.value());
      case MatrixFile file -> List.of();
    };
  }

  /** Returns the names that a declaration uses. */
  static List<NameExpression> uses(Declaration declaration) {
    List<Expression> expressions = new ArrayList<>();
    switch (declaration) {
      case ParameterStatement parameter -> {
        expressions.add(parameter.value());
        parameter.uncertainty().ifPresent(u -> expressions.add(u.halfWidth()));
      }
      case LetStatement let -> expressions.add(let.value());
      case InputStatement input -> expressions.add(input.value());
      case MatrixStatement matrix -> expressions.addAll(expressions(matrix.source()));
      case OutputStatement output -> expressions.add(output.value());
      default -> {}
    }
    List<NameExpression> uses = new ArrayList<>();
    expressions.forEach(e -> uses.addAll(ExpressionNames.of(e)));
    return uses;
  }
}
