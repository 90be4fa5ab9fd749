/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import org.spanloom.language.model.LinearForm;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.model.Term;
import org.spanloom.language.model.TimeInterval;
import org.spanloom.language.units.UnitOfMeasure;
import org.spanloom.numerics.CoupledSystem;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.TimeRange;

/**
 * Turns the linear form of a model, {@code M x' = K x + f} in coherent SI units, into coefficients
 * in declared units.
 *
 * <p>With {@code x = F y + o} (F the sizes of the states' units, o their zero points) and {@code t
 * = T s}, row i is {@code sum M_ij F_j/F_i y_j' = T/F_i (sum K_ij F_j y_j + sum K_ij o_j + f_i)}.
 * Where row i has no other mass than M_ii, it is divided by it symbolically, so that A and b stay
 * expressions; else {@link CoupledSystem} solves for the derivatives at each time.
 */
public final class SystemCompiler {

  private final SystemModel model;
  private final LinearForm form;
  private final TermCompiler terms;
  private final TermGraph graph;
  private final int n;

  /** An entry of A and the node of its value. */
  private record Entry(int row, int column, int node) {}

  private SystemCompiler(SystemModel model, LinearForm form, Map<String, Double> parameters) {
    this.model = model;
    this.form = form;
    this.n = form.dimension();
    this.terms = new TermCompiler(model.timeUnit().factor(), parameters);
    this.graph = terms.graph();
  }

  /**
   * Compiles.
   *
   * @param model a sound system
   * @param parameters values that replace those of parameters, by name, in coherent SI units
   * @throws IllegalArgumentException if the equations of the system are not known, or if there is a
   *     {@link #refusal}
   */
  public static CompiledSystem compile(SystemModel model, Map<String, Double> parameters) {
    LinearForm form =
        model
            .equations()
            .orElseThrow(() -> new IllegalArgumentException(model.name() + " has no linear form"));
    SystemCompiler compiler = new SystemCompiler(model, form, parameters);
    List<Jump> jumps = new JumpCompiler(model, compiler.terms, parameters).jumps();
    Breakpoints corners = compiler.breakpoints();
    return new CompiledSystem(
        model, compiler.system(jumps, corners), compiler.terms, corners.gap());
  }

  /**
   * Says why values of parameters leave a system without meaning; empty where they do not.
   *
   * @param model a sound system
   * @param parameters values that replace those of parameters, by name, in coherent SI units
   */
  public static Optional<String> refusal(SystemModel model, Map<String, Double> parameters) {
    return JumpCompiler.refusal(model, parameters);
  }

  private LinearSystem system(List<Jump> jumps, Breakpoints corners) {
    int[] coupled = coupledRows();
    int[] divisor = divisors(coupled);
    List<Entry> a = new ArrayList<>();
    int[] b = new int[n];
    Arrays.fill(b, -1);
    double second = model.timeUnit().factor();
    for (LinearForm.MatrixEntry entry : form.matrix()) {
      int i = entry.row();
      int term = graph.add(entry.term());
      UnitOfMeasure from = unit(entry.column());
      double size = second * from.factor() / unit(i).factor();
      a.add(new Entry(i, entry.column(), graph.scaled(divided(term, divisor[i]), size)));
      if (from.offset() != 0) {
        double share = second * from.offset() / unit(i).factor();
        b[i] = sum(b[i], graph.scaled(divided(term, divisor[i]), share));
      }
    }
    for (LinearForm.VectorEntry entry : form.forcing()) {
      int i = entry.row();
      int term = divided(graph.add(entry.term()), divisor[i]);
      b[i] = sum(b[i], graph.scaled(term, second / unit(i).factor()));
    }
    a.sort(Comparator.comparingInt(Entry::row).thenComparingInt(Entry::column));
    int[] mass = mass(coupled);
    LinearSystem right =
        new CoefficientSystem(
            n,
            range(),
            new CompiledTerms(graph, a.stream().mapToInt(Entry::node).toArray()),
            new CompiledTerms(graph, b),
            pattern(a),
            corners,
            jumps);
    return coupled.length == 0 ? right : coupled(right, coupled, mass, corners);
  }

  private Breakpoints breakpoints() {
    List<Term> coefficients = new ArrayList<>();
    form.mass().forEach(e -> coefficients.add(e.term()));
    form.matrix().forEach(e -> coefficients.add(e.term()));
    form.forcing().forEach(e -> coefficients.add(e.term()));
    return new Breakpoints(coefficients, model.timeUnit().factor(), terms.parameters(), range());
  }

  private UnitOfMeasure unit(int component) {
    return model.states().get(component).unit();
  }

  private int divided(int term, int divisor) {
    return divisor < 0 ? term : graph.combine(TermGraph.Operation.DIVIDE, term, divisor);
  }

  private int sum(int left, int right) {
    return left < 0 ? right : graph.combine(TermGraph.Operation.ADD, left, right);
  }

  /** The components whose derivatives stand in one equation with others, and those others. */
  private int[] coupledRows() {
    TreeSet<Integer> rows = new TreeSet<>();
    for (LinearForm.MatrixEntry entry : form.mass()) {
      if (entry.row() != entry.column()) {
        rows.add(entry.row());
        rows.add(entry.column());
      }
    }
    return rows.stream().mapToInt(Integer::intValue).toArray();
  }

  /**
   * For each row that is not coupled the node of its mass, or -1 where that is 1 or the row is
   * coupled.
   */
  private int[] divisors(int[] coupled) {
    int[] divisor = new int[n];
    Arrays.fill(divisor, -1);
    for (LinearForm.MatrixEntry entry : form.mass()) {
      if (Arrays.binarySearch(coupled, entry.row()) < 0) {
        int node = graph.add(entry.term());
        boolean one = graph.isConstant(node) && graph.node(node).value() == 1;
        divisor[entry.row()] = one ? -1 : node;
      }
    }
    return divisor;
  }

  private TimeRange range() {
    TimeInterval interval = model.interval();
    return new TimeRange(interval.start(), interval.end());
  }

  private SparsityPattern pattern(List<Entry> entries) {
    int[] start = new int[n + 1];
    entries.forEach(e -> start[e.row() + 1]++);
    for (int i = 0; i < n; i++) {
      start[i + 1] += start[i];
    }
    return new SparsityPattern(start, entries.stream().mapToInt(Entry::column).toArray());
  }

  /**
   * Puts the masses of the coupled rows into the graph: their nodes row by row, -1 where there is
   * none.
   */
  private int[] mass(int[] rows) {
    int k = rows.length;
    int[] nodes = new int[k * k];
    Arrays.fill(nodes, -1);
    for (LinearForm.MatrixEntry entry : form.mass()) {
      int i = Arrays.binarySearch(rows, entry.row());
      int j = Arrays.binarySearch(rows, entry.column());
      if (i >= 0) {
        double scale = unit(entry.column()).factor() / unit(entry.row()).factor();
        nodes[i * k + j] = graph.scaled(graph.add(entry.term()), scale);
      }
    }
    return nodes;
  }

  private LinearSystem coupled(LinearSystem right, int[] rows, int[] nodes, Breakpoints corners) {
    CompiledTerms mass = new CompiledTerms(graph, nodes);
    return new CoupledSystem(
        right, rows, (t, side, m) -> mass.evaluate(corners.beside(t, side), m), mass.isConstant());
  }
}
