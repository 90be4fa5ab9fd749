/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.export;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.spanloom.analysis.basis.BasisAnswer;
import org.spanloom.analysis.basis.BasisRequest;
import org.spanloom.analysis.basis.BasisSolve;
import org.spanloom.analysis.basis.BasisTable;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.solve.Answer;
import org.spanloom.analysis.solve.Choice;
import org.spanloom.language.model.StateComponent;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;

/** Takes the matrices of a system out of a model. */
public final class Export {

  private static final long MOST_NUMBERS = 25_000_000;

  private Export() {}

  /**
   * Computes.
   *
   * @param request what to export
   * @param progress watched and asked while working
   * @return the matrices, or why there are none
   */
  public static Answer<Exported> of(ExportRequest request, Progress progress) {
    try {
      return answer(request, progress);
    } catch (Choice.RefusedException refused) {
      return new Answer.Refused<>(refused.isUsage(), refused.getMessage());
    }
  }

  private static Answer<Exported> answer(ExportRequest request, Progress progress)
      throws Choice.RefusedException {
    CompiledSystem system = Choice.system(request.model(), request.system(), request.parameters());
    long n = system.dimension();
    if (request.times().isEmpty()) {
      return new Answer.Refused<>(true, "no time was given; name at least one.");
    }
    if (n * n * request.times().size() > MOST_NUMBERS) {
      return new Answer.Refused<>(
          true,
          "the matrices would hold %d numbers; the limit is %d. Ask for fewer times."
              .formatted(n * n * request.times().size(), MOST_NUMBERS));
    }
    for (double t : request.times()) {
      Choice.inside(system, t);
    }
    return switch (request.what()) {
      case A, B -> coefficients(request, system);
      case PHI -> basis(request, system, true, progress);
      case BASIS -> basis(request, system, false, progress);
    };
  }

  private static Answer<Exported> coefficients(ExportRequest request, CompiledSystem system) {
    int n = system.dimension();
    boolean matrix = request.what() == Exported.What.A;
    List<Exported.Matrix> matrices = new ArrayList<>();
    for (double t : request.times()) {
      double[] values = new double[matrix ? n * n : n];
      if (matrix) {
        system.linear().matrix(t, Side.AFTER, values);
      } else {
        system.linear().forcing(t, Side.AFTER, values);
      }
      for (double value : values) {
        if (!Double.isFinite(value)) {
          return new Answer.Refused<>(
              false,
              "an entry of %s is not a finite number at %s = %s; choose another time."
                  .formatted(request.what().word(), system.model().timeName(), Choice.number(t)));
        }
      }
      matrices.add(new Exported.Matrix(t, values, new double[values.length]));
    }
    List<String> columns = matrix ? labels(system) : List.of("1");
    return new Answer.Solved<>(exported(request, system, columns, matrices));
  }

  private static Answer<Exported> basis(
      ExportRequest request, CompiledSystem system, boolean principal, Progress progress) {
    BasisRequest basis =
        new BasisRequest(
            request.model(),
            request.system(),
            request.basis(),
            request.times(),
            request.parameters(),
            request.settings(),
            Optional.empty());
    BasisAnswer answer =
        principal ? BasisSolve.principal(basis, progress) : BasisSolve.solve(basis, progress);
    return switch (answer) {
      case BasisAnswer.Solved s -> new Answer.Solved<>(fromTable(request, system, s.table()));
      case BasisAnswer.Refused r -> new Answer.Refused<>(r.usage(), r.message());
      case BasisAnswer.Cancelled c -> new Answer.Cancelled<>();
    };
  }

  private static Exported fromTable(
      ExportRequest request, CompiledSystem system, BasisTable table) {
    int n = system.dimension();
    int m = table.columns();
    List<Exported.Matrix> matrices = new ArrayList<>();
    for (int k = 0; k < request.times().size(); k++) {
      double[] values = new double[n * m];
      double[] errors = new double[n * m];
      for (int j = 0; j < m; j++) {
        BasisTable.Row row = table.rows().get(k * m + j);
        double[] column = row.values();
        double[] error = row.errors();
        for (int i = 0; i < n; i++) {
          values[i * m + j] = column[i];
          errors[i * m + j] = error[i];
        }
      }
      matrices.add(new Exported.Matrix(request.times().get(k), values, errors));
    }
    List<String> columns = IntStream.rangeClosed(1, m).mapToObj(String::valueOf).toList();
    return exported(request, system, columns, matrices);
  }

  private static List<String> labels(CompiledSystem system) {
    return system.model().states().stream().map(StateComponent::label).toList();
  }

  private static Exported exported(
      ExportRequest request,
      CompiledSystem system,
      List<String> columns,
      List<Exported.Matrix> matrices) {
    return new Exported(
        system.model().name(),
        request.what(),
        system.model().timeName(),
        system.model().timeUnit().code(),
        labels(system),
        system.model().states().stream().map(s -> s.unit().code()).toList(),
        columns,
        matrices);
  }
}
