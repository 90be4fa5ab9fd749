/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import org.spanloom.language.model.Curve;
import org.spanloom.language.model.Function;
import org.spanloom.language.model.Parameter;
import org.spanloom.language.model.PulseTrain;
import org.spanloom.language.model.Term;

/**
 * Terms as a graph without repetition: equal sub-terms are one node, constant ones are folded by
 * the very operations that the compiled program would run, so that folding never changes a bit.
 *
 * <p>A node is a number; the nodes it uses have smaller numbers. The walk over a term uses no
 * recursion, so that a sum of a hundred thousand terms is no deeper than one of two.
 */
final class TermGraph {

  /** What a node computes. */
  enum Operation {
    /** A number. */
    CONSTANT,
    /** The time, in the unit of the caller. */
    TIME,
    /** Left plus right. */
    ADD,
    /** Left minus right. */
    SUBTRACT,
    /** Left times right. */
    MULTIPLY,
    /** Left over right. */
    DIVIDE,
    /** Minus left. */
    NEGATE,
    /** Left to the power of right. */
    POWER,
    /** A function of left and, if it takes two arguments, right. */
    CALL,
    /** Right where left is negative (or 0, if the bits say so), else third. */
    SWITCH,
    /** A curve at the time left. */
    CURVE
  }

  /**
   * A node.
   *
   * @param operation what it computes
   * @param left first operand, or -1
   * @param right second operand, or -1
   * @param third third operand, or -1
   * @param bits bits of a constant, number of the function of a call or of a curve, 1 for a switch
   *     that counts a gap of 0 in, else 0
   */
  record Node(Operation operation, int left, int right, int third, long bits) {

    Node(Operation operation, int left, int right, long bits) {
      this(operation, left, right, -1, bits);
    }

    /** Returns the value of a constant. */
    double value() {
      return Double.longBitsToDouble(bits);
    }

    /** Returns the function of a call. */
    Function function() {
      return FUNCTIONS[(int) bits];
    }
  }

  private static final Function[] FUNCTIONS = Function.values();

  private final List<Node> nodes = new ArrayList<>();
  private final Map<Node, Integer> numbers = new HashMap<>();
  private final List<Curve> curves = new ArrayList<>();
  private final Map<Curve, Integer> curveNumbers = new HashMap<>();
  private final Map<Term, Integer> known = new IdentityHashMap<>();
  private final Map<String, Double> parameters;
  private final double timeFactor;

  /**
   * Starts an empty graph.
   *
   * @param timeFactor size of the caller's time unit in seconds (in coherent SI units)
   * @param parameters values that replace those of parameters, by name, in coherent SI units
   */
  TermGraph(double timeFactor, Map<String, Double> parameters) {
    this.timeFactor = timeFactor;
    this.parameters = Map.copyOf(parameters);
  }

  /** Returns a node by number. */
  Node node(int number) {
    return nodes.get(number);
  }

  /** Returns the curves, by their numbers. */
  List<Curve> curves() {
    return List.copyOf(curves);
  }

  /** Returns the number of nodes. */
  int size() {
    return nodes.size();
  }

  /** Tells whether a node is a number. */
  boolean isConstant(int number) {
    return node(number).operation() == Operation.CONSTANT;
  }

  /** Returns the node of a number. */
  int constant(double value) {
    return intern(new Node(Operation.CONSTANT, -1, -1, Double.doubleToLongBits(value)));
  }

  /** Returns the node of a product with a number; a factor of 1 adds none. */
  int scaled(int number, double factor) {
    return factor == 1 ? number : combine(Operation.MULTIPLY, number, constant(factor), 0);
  }

  /** Returns the node of an operation on two nodes. */
  int combine(Operation operation, int left, int right) {
    return combine(operation, left, right, 0);
  }

  /** Returns the node of a term. */
  int add(Term root) {
    Deque<Term> open = new ArrayDeque<>();
    open.push(root);
    while (!open.isEmpty()) {
      Term term = open.peek();
      if (known.containsKey(term)) {
        open.pop();
        continue;
      }
      boolean ready = true;
      for (Term operand : operands(term)) {
        if (!known.containsKey(operand)) {
          open.push(operand);
          ready = false;
        }
      }
      if (ready) {
        open.pop();
        known.put(term, number(term));
      }
    }
    return known.get(root);
  }

  private List<Term> operands(Term term) {
    return switch (term) {
      case Term.Constant c -> List.of();
      case Term.Time t -> List.of();
      case Term.ParameterTerm p ->
          parameters.containsKey(p.parameter().name()) ? List.of() : List.of(p.parameter().value());
      case Term.LetTerm l -> List.of(l.let().value());
      case Term.Sum s -> List.of(s.left(), s.right());
      case Term.Difference d -> List.of(d.left(), d.right());
      case Term.Product p -> List.of(p.left(), p.right());
      case Term.Quotient q -> List.of(q.left(), q.right());
      case Term.Negation n -> List.of(n.operand());
      case Term.Power p -> List.of(p.base(), p.exponent());
      case Term.Switch s -> List.of(s.gap(), s.then(), s.otherwise());
      case Term.CurveTerm c -> List.of(c.time());
      case Term.Pulse p -> List.of(p.time(), p.period(), p.width(), p.start());
      case Term.FunctionTerm f -> f.arguments();
    };
  }

  private int number(Term term) {
    return switch (term) {
      case Term.Constant c -> constant(c.value());
      case Term.Time t -> scaled(intern(new Node(Operation.TIME, -1, -1, 0)), timeFactor);
      case Term.ParameterTerm p -> parameter(p.parameter());
      case Term.LetTerm l -> known.get(l.let().value());
      case Term.Sum s -> binary(Operation.ADD, s.left(), s.right());
      case Term.Difference d -> binary(Operation.SUBTRACT, d.left(), d.right());
      case Term.Product p -> binary(Operation.MULTIPLY, p.left(), p.right());
      case Term.Quotient q -> binary(Operation.DIVIDE, q.left(), q.right());
      case Term.Negation n -> combine(Operation.NEGATE, known.get(n.operand()), -1, 0);
      case Term.Power p -> binary(Operation.POWER, p.base(), p.exponent());
      case Term.Switch s -> choice(s);
      case Term.CurveTerm c -> curve(c.curve(), known.get(c.time()));
      case Term.Pulse p ->
          curve(
              new PulseTrain(value(p.period()), value(p.width()), value(p.start())),
              known.get(p.time()));
      case Term.FunctionTerm f -> call(f);
    };
  }

  private int parameter(Parameter parameter) {
    Double replaced = parameters.get(parameter.name());
    return replaced == null ? known.get(parameter.value()) : constant(replaced);
  }

  private int binary(Operation operation, Term left, Term right) {
    return combine(operation, known.get(left), known.get(right), 0);
  }

  private double value(Term constant) {
    return node(known.get(constant)).value();
  }

  private int choice(Term.Switch term) {
    int gap = known.get(term.gap());
    int then = known.get(term.then());
    int otherwise = known.get(term.otherwise());
    if (isConstant(gap)) {
      return term.holds(node(gap).value()) ? then : otherwise;
    }
    return intern(new Node(Operation.SWITCH, gap, then, otherwise, term.atZero() ? 1 : 0));
  }

  private int curve(Curve curve, int time) {
    if (isConstant(time)) {
      return constant(curve.at(node(time).value()));
    }
    Integer number = curveNumbers.get(curve);
    if (number == null) {
      number = curves.size();
      curves.add(curve);
      curveNumbers.put(curve, number);
    }
    return intern(new Node(Operation.CURVE, time, -1, number));
  }

  private int call(Term.FunctionTerm term) {
    int left = known.get(term.arguments().get(0));
    int right = term.arguments().size() == 2 ? known.get(term.arguments().get(1)) : -1;
    return combine(Operation.CALL, left, right, term.function().ordinal());
  }

  private int combine(Operation operation, int left, int right, long bits) {
    Node node = new Node(operation, left, right, bits);
    boolean fold = isConstant(left) && (right < 0 || isConstant(right));
    if (!fold) {
      return intern(node);
    }
    return constant(value(node, node(left).value(), right < 0 ? 0 : node(right).value()));
  }

  private int intern(Node node) {
    Integer number = numbers.get(node);
    if (number == null) {
      number = nodes.size();
      nodes.add(node);
      numbers.put(node, number);
    }
    return number;
  }

  private static double value(Node node, double left, double right) {
    return switch (node.operation()) {
      case CONSTANT, TIME, SWITCH, CURVE ->
          throw new IllegalStateException(node + " is not folded here");
      case ADD -> left + right;
      case SUBTRACT -> left - right;
      case MULTIPLY -> left * right;
      case DIVIDE -> left / right;
      case NEGATE -> -left;
      case POWER -> power(left, right);
      case CALL ->
          node.right() < 0 ? node.function().apply(left) : node.function().apply(left, right);
    };
  }

  /** A square is one multiplication, rounded once; every other power is left to the library. */
  private static double power(double base, double exponent) {
    return exponent == 2 ? base * base : StrictMath.pow(base, exponent);
  }
}
