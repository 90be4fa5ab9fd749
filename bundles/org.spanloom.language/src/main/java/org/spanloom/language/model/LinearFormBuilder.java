/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.IntStream;
import org.spanloom.language.model.LinearForm.MatrixEntry;
import org.spanloom.language.model.LinearForm.VectorEntry;
import org.spanloom.language.model.Meaning.StateMeaning;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.text.Span;

/** Finds the equation that governs each state and builds the linear form. */
final class LinearFormBuilder {

  private final EquationReader reader;
  private final StateVector vector;
  private final List<ResolvedEquation> equations;
  private final List<Quantity> massSides = new ArrayList<>();
  private final boolean[] held;
  private final EquationMatching matching;

  LinearFormBuilder(EquationReader reader, StateVector vector) {
    this.reader = reader;
    this.vector = vector;
    this.equations = reader.equations();
    this.held = new boolean[vector.states().size()];
    List<int[]> statesOf = new ArrayList<>();
    for (ResolvedEquation equation : equations) {
      Quantity side = equation.massSide(vector);
      massSides.add(side);
      int[] states =
          side.coefficients().keySet().stream().mapToInt(StateKey::state).distinct().toArray();
      statesOf.add(candidates(equation, states));
      for (int state : states) {
        held[state] = true;
      }
    }
    this.matching = EquationMatching.of(statesOf, held.length);
  }

  /** Returns the states an equation may govern; a balance governs its own state and no other. */
  private static int[] candidates(ResolvedEquation equation, int[] states) {
    return equation.balanced().isEmpty()
        ? states
        : IntStream.of(states).filter(s -> s == equation.balanced().getAsInt()).toArray();
  }

  /** Returns the statement that governs a state; its declaration where there is none. */
  Span governing(StateMeaning state) {
    int equation = matching.equationOf(state.index());
    return equation < 0 ? state.declared() : equations.get(equation).placed();
  }

  /**
   * Reports states and equations that do not fit together, and returns the linear form where all
   * do.
   */
  Optional<LinearForm> build() {
    boolean complete = reader.allRead();
    Map<Span, List<Integer>> spare = new LinkedHashMap<>();
    for (int e = 0; e < equations.size(); e++) {
      if (matching.stateOf(e) < 0) {
        spare.computeIfAbsent(equations.get(e).span(), s -> new ArrayList<>()).add(e);
      }
    }
    spare.values().forEach(turns -> reportSpareEquation(turns.getFirst(), turns.size() - 1));
    Map<String, List<StateMeaning>> alone = new LinkedHashMap<>();
    for (StateMeaning state : vector.states()) {
      if (matching.equationOf(state.index()) < 0 && isToReport(state)) {
        alone.computeIfAbsent(state.declaredName(), s -> new ArrayList<>()).add(state);
      }
      complete &= matching.equationOf(state.index()) >= 0;
    }
    alone.values().forEach(this::reportAlone);
    complete &= spare.isEmpty();
    return complete && vector.dimension() > 0 ? Optional.of(form()) : Optional.empty();
  }

  /** Says for how many more equations of a statement something is so. */
  private static String more(int further) {
    return further == 0
        ? ""
        : " (So it is with "
            + further
            + (further == 1 ? " more equation" : " more equations")
            + " of this line.)";
  }

  private void reportSpareEquation(int index, int further) {
    ResolvedEquation equation = equations.get(index);
    int[] states =
        massSides.get(index).coefficients().keySet().stream().mapToInt(StateKey::state).toArray();
    if (states.length == 0) {
      equation
          .frame()
          .problems()
          .report(
              ProblemKind.EQUATION_WITHOUT_STATE,
              equation.span(),
              "The equation gives no derivative: "
                  + reasonForNoDerivative(equation)
                  + more(further));
    } else if (IntStream.of(states).allMatch(this::isBalanced)) {
      String name = vector.states().get(states[0]).name();
      equation
          .frame()
          .problems()
          .report(
              ProblemKind.TOO_MANY_EQUATIONS,
              equation.span(),
              "\""
                  + name
                  + "\" is governed by transfers, and a state is governed by transfers or by an"
                  + " equation, never both: write this as transfers or remove the others."
                  + more(further));
    } else if (reader.allRead()) {
      StateMeaning state = vector.states().get(states[0]);
      String highest = StateVector.label(state, vector.order(states[0]));
      equation
          .frame()
          .problems()
          .report(
              ProblemKind.TOO_MANY_EQUATIONS,
              equation.span(),
              "There is one equation too many: \""
                  + highest
                  + "\""
                  + (states.length == 1 ? " is" : " and the other derivatives in this one are")
                  + " given by other equations already. Remove one of them or declare another"
                  + " state."
                  + more(further));
    }
  }

  private boolean isBalanced(int state) {
    int equation = matching.equationOf(state);
    return equation >= 0 && equations.get(equation).balanced().isPresent();
  }

  private String reasonForNoDerivative(ResolvedEquation equation) {
    List<StateKey> keys = new ArrayList<>(equation.left().coefficients().keySet());
    keys.addAll(equation.right().coefficients().keySet());
    Optional<StateKey> lower = keys.stream().filter(k -> k.order() > 0).findFirst();
    if (lower.isEmpty()) {
      return "no state in it has a prime. Write a derivative such as x', or declare an output or a"
          + " let.";
    }
    StateMeaning state = vector.states().get(lower.get().state());
    String highest = StateVector.label(state, vector.order(state.index()));
    String found = StateVector.label(state, lower.get().order());
    boolean cancels = lower.get().order() == vector.order(state.index());
    return cancels
        ? "\"" + highest + "\" cancels in it. Check both sides."
        : "\""
            + highest
            + "\" stands elsewhere, so that \""
            + found
            + "\" is a state of its own here. Use one order for \""
            + state.name()
            + "\".";
  }

  private boolean isToReport(StateMeaning state) {
    return reader.allRead() || !held[state.index()] && !reader.isMentioned(state.index());
  }

  /** Reports a state without an equation, or members of a family. */
  private void reportAlone(List<StateMeaning> states) {
    StateMeaning state = states.getFirst();
    String highest = StateVector.label(state, vector.order(state.index()));
    String more =
        states.size() == 1
            ? ""
            : " (So it is with "
                + (states.size() - 1)
                + " more member"
                + (states.size() == 2 ? "" : "s")
                + " of \""
                + state.statement().name().text()
                + "\".)";
    Frame frame = state.frame();
    if (held[state.index()]) {
      frame
          .problems()
          .report(
              ProblemKind.SINGULAR_MASS_MATRIX,
              state.statement().name().span(),
              "The equations cannot be solved for \""
                  + highest
                  + "\": every equation that holds it is needed for another derivative. Write one"
                  + " more."
                  + more);
      return;
    }
    Fix[] fixes =
        EquationStub.of(vector, states).stream()
            .map(text ->
                Fix.insert(
                    states.size() == 1 ? "Insert an equation" : "Insert equations",
                    frame.lastStatementEnd(state.statement().span().end()),
                    text))
            .toArray(Fix[]::new);
    frame
        .problems()
        .report(
            ProblemKind.STATE_WITHOUT_EQUATION,
            state.statement().name().span(),
            "The state \""
                + state.name()
                + "\" has no equation: \""
                + highest
                + "\" stands in none. Write one, or declare a parameter instead."
                + more,
            fixes);
  }

  private LinearForm form() {
    List<MatrixEntry> mass = new ArrayList<>();
    List<MatrixEntry> matrix = new ArrayList<>();
    List<VectorEntry> forcing = new ArrayList<>();
    for (StateMeaning state : vector.states()) {
      List<Span> declaration = List.of(state.declared());
      int row = vector.last(state.index());
      for (int i = vector.first(state.index()); i < row; i++) {
        mass.add(new MatrixEntry(i, i, Term.ONE, declaration));
        matrix.add(new MatrixEntry(i, i + 1, Term.ONE, declaration));
      }
      int equation = matching.equationOf(state.index());
      addRow(row, massSides.get(equation), mass);
      Quantity force = equations.get(equation).forceSide(vector);
      addRow(row, force, matrix);
      if (!Simplifier.isZero(force.constant().term())) {
        forcing.add(new VectorEntry(row, force.constant().term(), force.constant().sources()));
      }
    }
    return new LinearForm(vector.dimension(), mass, matrix, forcing);
  }

  private void addRow(int row, Quantity side, List<MatrixEntry> entries) {
    TreeMap<Integer, MatrixEntry> byColumn = new TreeMap<>();
    side.coefficients()
        .forEach((key, part) -> {
          int column = vector.isComponent(key) ? vector.component(key) : vector.last(key.state());
          byColumn.put(column, new MatrixEntry(row, column, part.term(), part.sources()));
        });
    entries.addAll(byColumn.values());
  }
}
