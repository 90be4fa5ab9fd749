/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.LinkedHashMap;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.BiConsumer;
import org.eclipse.core.runtime.ILog;
import org.eclipse.core.runtime.IProgressMonitor;
import org.eclipse.core.runtime.IStatus;
import org.eclipse.core.runtime.Status;
import org.eclipse.core.runtime.jobs.Job;
import org.spanloom.analysis.solve.Sampling;
import org.spanloom.analysis.solve.SolveAnswer;
import org.spanloom.analysis.solve.SolveRequest;
import org.spanloom.analysis.solve.TrajectorySolve;
import org.spanloom.language.model.Model;
import org.spanloom.ui.UiIds;
import org.spanloom.workspace.MonitorProgress;

/** Solves one system of one snapshot in the background. */
final class SolveJob extends Job {

  private static final int EVEN_STEPS = 400;
  private static final int MOST_TIMES = 5000;

  private final Model model;
  private final Choice choice;
  private final BiConsumer<SolveJob, SolveAnswer> done;

  /**
   * Makes a job.
   *
   * @param done told the answer, in the thread of the job
   */
  SolveJob(Model model, Choice choice, BiConsumer<SolveJob, SolveAnswer> done) {
    super("Solving " + choice.system());
    this.model = model;
    this.choice = choice;
    this.done = done;
  }

  Choice choice() {
    return choice;
  }

  @Override
  public boolean belongsTo(Object family) {
    return UiIds.JOB_FAMILY.equals(family);
  }

  @Override
  protected IStatus run(IProgressMonitor monitor) {
    SolveRequest request =
        new SolveRequest(
            model,
            Optional.of(choice.system()),
            Optional.of(choice.initial()),
            OptionalDouble.empty(),
            choice.until(),
            new Sampling.Curve(EVEN_STEPS, MOST_TIMES),
            new LinkedHashMap<>(),
            OptionalDouble.empty(),
            Optional.empty());
    SolveAnswer answer;
    try {
      answer = TrajectorySolve.solve(request, new MonitorProgress(monitor, () -> false));
    } catch (RuntimeException e) {
      ILog.of(SolveJob.class).error("Solving " + choice.system() + " failed.", e);
      answer =
          new SolveAnswer.Refused(
              false,
              "Solving failed for a reason that is a fault of this program; see the error log.");
    }
    done.accept(this, answer);
    return answer instanceof SolveAnswer.Cancelled ? Status.CANCEL_STATUS : Status.OK_STATUS;
  }
}
