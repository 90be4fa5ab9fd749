/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * The nodes of a term in an order in which every node comes after its operands, shared sub-terms
 * once. Whatever is computed over a term runs along it in a loop, so that neither a long sum nor a
 * named expression used a thousand times costs depth or repetition.
 */
final class TermTape {

  private final Term[] nodes;
  private final int[][] operands;
  private final boolean[] varying;

  private TermTape(List<Term> nodes, List<int[]> operands) {
    this.nodes = nodes.toArray(Term[]::new);
    this.operands = operands.toArray(int[][]::new);
    this.varying = new boolean[this.nodes.length];
    for (int i = 0; i < varying.length; i++) {
      varying[i] =
          this.nodes[i] instanceof Term.Time
              || this.operands[i].length == 0
                  && this.nodes[i] instanceof Term.LetTerm(Let let)
                  && let.dependsOnTime();
      for (int operand : this.operands[i]) {
        varying[i] |= varying[operand];
      }
    }
  }

  /** Lays out a term; the values of its parameters and named expressions belong to it. */
  static TermTape of(Term root) {
    return of(root, Set.of());
  }

  /**
   * Lays out a term.
   *
   * @param closed named expressions whose values do not belong to it: they are nodes without
   *     operands
   */
  static TermTape of(Term root, Set<Let> closed) {
    List<Term> nodes = new ArrayList<>();
    List<int[]> operands = new ArrayList<>();
    Map<Object, Integer> places = new IdentityHashMap<>();
    Deque<Term> open = new ArrayDeque<>();
    open.push(root);
    while (!open.isEmpty()) {
      Term term = open.peek();
      if (places.containsKey(identity(term))) {
        open.pop();
        continue;
      }
      boolean isClosed = term instanceof Term.LetTerm(Let let) && closed.contains(let);
      List<Term> below = isClosed ? List.of() : operands(term);
      int[] indices = new int[below.size()];
      boolean ready = true;
      for (int i = 0; i < indices.length; i++) {
        Integer place = places.get(identity(below.get(i)));
        if (place == null) {
          open.push(below.get(i));
          ready = false;
        } else {
          indices[i] = place;
        }
      }
      if (ready) {
        open.pop();
        places.put(identity(term), nodes.size());
        nodes.add(term);
        operands.add(indices);
      }
    }
    return new TermTape(nodes, operands);
  }

  /**
   * Returns what stands for a term: time is one node, and so is each parameter and each named
   * expression.
   */
  static Object identity(Term term) {
    return switch (term) {
      case Term.Time time -> Term.Time.class;
      case Term.ParameterTerm parameter -> parameter.parameter();
      case Term.LetTerm let -> let.let();
      case Term.Constant number -> number;
      case Term.Sum sum -> sum;
      case Term.Difference difference -> difference;
      case Term.Product product -> product;
      case Term.Quotient quotient -> quotient;
      case Term.Negation negation -> negation;
      case Term.Power power -> power;
      case Term.Switch choice -> choice;
      case Term.Pulse pulse -> pulse;
      case Term.CurveTerm curve -> curve;
      case Term.FunctionTerm call -> call;
    };
  }

  /** Returns the terms right below a term; for a parameter or a named expression, its value. */
  static List<Term> operands(Term term) {
    return switch (term) {
      case Term.Constant number -> List.of();
      case Term.Time time -> List.of();
      case Term.ParameterTerm parameter -> List.of(parameter.parameter().value());
      case Term.LetTerm let -> List.of(let.let().value());
      case Term.Sum sum -> List.of(sum.left(), sum.right());
      case Term.Difference difference -> List.of(difference.left(), difference.right());
      case Term.Product product -> List.of(product.left(), product.right());
      case Term.Quotient quotient -> List.of(quotient.left(), quotient.right());
      case Term.Negation negation -> List.of(negation.operand());
      case Term.Power power -> List.of(power.base(), power.exponent());
      case Term.Switch choice -> List.of(choice.gap(), choice.then(), choice.otherwise());
      case Term.CurveTerm curve -> List.of(curve.time());
      case Term.Pulse pulse -> List.of(pulse.time(), pulse.period(), pulse.width(), pulse.start());
      case Term.FunctionTerm call -> call.arguments();
    };
  }

  /** Returns the number of nodes; the last one is the term itself. */
  int size() {
    return nodes.length;
  }

  /** Returns a node. */
  Term node(int index) {
    return nodes[index];
  }

  /** Tells whether a node is a named expression whose value does not belong to the tape. */
  boolean isClosed(int index) {
    return operands[index].length == 0 && nodes[index] instanceof Term.LetTerm;
  }

  /** Returns the index of an operand of a node. */
  int operand(int index, int which) {
    return operands[index][which];
  }

  /** Tells whether time occurs in a node. */
  boolean varies(int index) {
    return varying[index];
  }
}
