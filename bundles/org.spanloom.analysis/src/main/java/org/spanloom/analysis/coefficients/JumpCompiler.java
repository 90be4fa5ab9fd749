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
import java.util.TreeMap;
import java.util.stream.Stream;
import org.spanloom.language.model.AffineValue;
import org.spanloom.language.model.Jump;
import org.spanloom.language.model.JumpTimes;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.model.Term;
import org.spanloom.language.units.UnitOfMeasure;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;

/**
 * Turns the jumps of a model, {@code x = J x + d} in coherent SI units, into jumps in declared
 * units: with {@code x = F y + o} row i is {@code sum J_ij F_j/F_i y_j + (sum J_ij o_j - o_i +
 * d_i)/F_i}.
 */
final class JumpCompiler {

  private final SystemModel model;
  private final TermCompiler terms;
  private final Map<String, Double> parameters;

  JumpCompiler(SystemModel model, TermCompiler terms, Map<String, Double> parameters) {
    this.model = model;
    this.terms = terms;
    this.parameters = parameters;
  }

  /**
   * Says why jumps cannot take place with other values of parameters than those declared; empty
   * where they can.
   */
  static Optional<String> refusal(SystemModel model, Map<String, Double> parameters) {
    double start = model.interval().start();
    double end = model.interval().end();
    long count = 0;
    for (Jump jump : model.jumps()) {
      long more = jump.times().count(parameters);
      count += Math.min(more, JumpTimes.LIMIT + 1L);
      if (more == 0) {
        return Optional.of(
            "the period of a jump is not positive, or its first time lies behind its last one");
      }
      if (count > JumpTimes.LIMIT) {
        return Optional.of("jumps take place more than " + JumpTimes.LIMIT + " times");
      }
      for (double time : jump.times().times(model.timeUnit(), parameters)) {
        if (!(time >= start && time <= end)) {
          return Optional.of(
              "a jump takes place at "
                  + model.timeName()
                  + " = "
                  + time
                  + ", outside of the interval");
        }
      }
    }
    return Optional.empty();
  }

  /** Returns the jumps by time; those at one time in the order of the text. */
  List<org.spanloom.numerics.Jump> jumps() {
    List<org.spanloom.numerics.Jump> all = new ArrayList<>();
    for (Jump jump : model.jumps()) {
      double[] times = jump.times().times(model.timeUnit(), parameters);
      TermGraph graph = terms.graph();
      CompiledTerms numbers = new CompiledTerms(graph, nodes(jump, graph));
      if (numbers.isConstant()) {
        org.spanloom.numerics.Jump first = jump(jump, times[0], numbers.at(times[0]));
        for (double time : times) {
          all.add(first.at(time));
        }
      } else {
        Breakpoints corners =
            new Breakpoints(
                coefficients(jump).toList(), model.timeUnit().factor(), parameters, range());
        corners.between(times[0], times[times.length - 1]);
        for (double time : times) {
          // Functions of time are taken from the left, but at the start of the interval.
          double at = time == model.interval().start() ? time : corners.beside(time, Side.BEFORE);
          all.add(jump(jump, time, numbers.at(at)));
        }
      }
    }
    all.sort(Comparator.comparingDouble(org.spanloom.numerics.Jump::time));
    return all;
  }

  private TimeRange range() {
    return new TimeRange(model.interval().start(), model.interval().end());
  }

  /** Returns the factors and the constant of each line, one line after the other. */
  private static int[] nodes(Jump jump, TermGraph graph) {
    return coefficients(jump).mapToInt(graph::add).toArray();
  }

  private static Stream<Term> coefficients(Jump jump) {
    return jump.changes().stream()
        .map(Jump.Change::value)
        .flatMap(v ->
            Stream.concat(
                v.samples().stream().map(AffineValue.Sample::coefficient),
                Stream.of(v.constant())));
  }

  private org.spanloom.numerics.Jump jump(Jump jump, double time, double[] numbers) {
    TreeMap<Integer, org.spanloom.numerics.Jump.Row> rows = new TreeMap<>();
    int from = 0;
    for (Jump.Change change : jump.changes()) {
      int to = from + change.value().samples().size() + 1;
      rows.put(change.component(), row(change, Arrays.copyOfRange(numbers, from, to)));
      from = to;
    }
    return org.spanloom.numerics.Jump.of(time, List.copyOf(rows.values()));
  }

  private org.spanloom.numerics.Jump.Row row(Jump.Change change, double[] values) {
    UnitOfMeasure own = unit(change.component());
    List<AffineValue.Sample> samples = change.value().samples();
    TreeMap<Integer, Double> factors = new TreeMap<>();
    // What stays of the own zero point is exactly none where the own factor is 1.
    double zero = -own.offset();
    for (int k = 0; k < samples.size(); k++) {
      int j = samples.get(k).component();
      UnitOfMeasure unit = unit(j);
      factors.merge(j, values[k] * (unit.factor() / own.factor()), Double::sum);
      zero =
          j == change.component()
              ? zero + own.offset() + (values[k] - 1) * own.offset()
              : zero + values[k] * unit.offset();
    }
    double shift = (zero + values[samples.size()]) / own.factor();
    return new org.spanloom.numerics.Jump.Row(
        change.component(),
        factors.keySet().stream().mapToInt(Integer::intValue).toArray(),
        factors.values().stream().mapToDouble(Double::doubleValue).toArray(),
        shift);
  }

  private UnitOfMeasure unit(int component) {
    return model.states().get(component).unit();
  }
}
