/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.boundary;

import java.util.List;
import java.util.Optional;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.solve.Answer;
import org.spanloom.analysis.solve.Choice;
import org.spanloom.analysis.solve.Listing;
import org.spanloom.analysis.solve.Refusals;
import org.spanloom.analysis.solve.SolutionTable;
import org.spanloom.language.model.Boundary;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.boundary.BoundaryAnswer;
import org.spanloom.numerics.solution.Solution;

/** Solves a boundary-value problem of a model and lists the solution. */
public final class BoundarySolve {

  private BoundarySolve() {}

  /**
   * Solves.
   *
   * @param request what to solve
   * @param progress watched and asked while working
   * @return what is known of the problem, or why nothing is
   */
  public static Answer<BoundaryResult> solve(BoundaryRequest request, Progress progress) {
    try {
      return answer(request, progress);
    } catch (Choice.RefusedException refused) {
      return new Answer.Refused<>(refused.isUsage(), refused.getMessage());
    }
  }

  private static Answer<BoundaryResult> answer(BoundaryRequest request, Progress progress)
      throws Choice.RefusedException {
    CompiledSystem system = Choice.system(request.model(), request.system(), request.parameters());
    List<Boundary> declared = system.model().boundaries();
    if (declared.isEmpty()) {
      return new Answer.Refused<>(
          true,
          "system "
              + system.model().name()
              + " has no boundary conditions; declare them, as in 'boundary NAME { x(0) = 1 }'.");
    }
    Boundary boundary =
        Choice.pick(
            "boundary conditions",
            declared,
            Boundary::name,
            request.boundary(),
            "system " + system.model().name());
    double accuracy = Choice.accuracy(request.accuracy(), system);
    BoundaryProblem problem = BoundaryProblem.of(system, boundary);
    double[] times = Listing.times(system, request.sampling(), problem.range());
    Outcome<BoundaryAnswer> outcome = problem.solve(accuracy, progress);
    return switch (outcome) {
      case Outcome.Solved<BoundaryAnswer> s -> {
        Optional<SolutionTable> table =
            solution(s.value())
                .map(found -> Listing.table(system, boundary.name(), found, times, accuracy));
        yield new Answer.Solved<>(
            new BoundaryResult(BoundaryMessages.report(system, boundary, s.value()), table));
      }
      case Outcome.Cancelled<BoundaryAnswer> c -> new Answer.Cancelled<>();
      case Outcome.Unsolved<BoundaryAnswer> u ->
          new Answer.Refused<>(false, Refusals.text(system, u));
    };
  }

  private static Optional<Solution> solution(BoundaryAnswer answer) {
    return switch (answer) {
      case BoundaryAnswer.Unique unique -> Optional.of(unique.solution());
      case BoundaryAnswer.Family family -> Optional.of(family.particular());
      case BoundaryAnswer.None none -> Optional.empty();
    };
  }
}
