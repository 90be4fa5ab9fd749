/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.List;
import java.util.Optional;
import java.util.SequencedSet;
import java.util.function.BiConsumer;
import org.eclipse.core.runtime.jobs.Job;
import org.eclipse.jface.action.Action;
import org.eclipse.jface.action.IAction;
import org.eclipse.jface.action.IToolBarManager;
import org.eclipse.jface.action.Separator;
import org.eclipse.swt.graphics.ImageData;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.swt.widgets.Display;
import org.eclipse.ui.PlatformUI;
import org.eclipse.ui.part.ViewPart;
import org.eclipse.ui.progress.IWorkbenchSiteProgressService;
import org.spanloom.analysis.solve.SolutionTable;
import org.spanloom.analysis.solve.SolveAnswer;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.Severity;
import org.spanloom.ui.Icon;
import org.spanloom.ui.UiIds;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.ui.editor.ModelSnapshot;
import org.spanloom.ui.theme.ThemeColours;
import org.spanloom.ui.workbench.PreferenceDefaults;

/** Shows the solution of a system of the active editor's model, and follows its edits. */
public final class SolutionView extends ViewPart {

  private static final long PAUSE_MS = 150;

  private final Memory memory = new Memory();
  private SolutionPage page;
  private EditorFollower follower;
  private Runnable endColours = () -> {};
  private Optional<ModelEditor> editor = Optional.empty();
  private Optional<Model> model = Optional.empty();
  private Optional<SolveJob> job = Optional.empty();
  private Optional<SolutionTable> shown = Optional.empty();
  private String shownFile = "";
  private List<IAction> resultActions = List.of();

  @Override
  public void createPartControl(Composite parent) {
    page = new SolutionPage(parent, this::choose, this::chooseAxes, this::chooseColumns);
    PlatformUI.getWorkbench().getHelpSystem().setHelp(page.control(), UiIds.SOLUTION_HELP);
    makeActions();
    endColours = ThemeColours.onChange(page::readColours);
    follower = new EditorFollower(getSite().getPage(), this::editorChanged, this::modelChanged);
    follower.start();
    IWorkbenchSiteProgressService progress =
        getSite().getService(IWorkbenchSiteProgressService.class);
    if (progress != null) {
      progress.showBusyForFamily(UiIds.JOB_FAMILY);
    }
  }

  private void makeActions() {
    IAction whole = action("Show All", Icon.WHOLE, page::showWhole);
    IAction back = action("Back to What Was Shown Before", Icon.BACK, page::back);
    IAction table =
        action(
            "Export Table...",
            Icon.EXPORT_TABLE,
            () -> shown.ifPresent(t -> SolutionExport.table(getSite().getShell(), t)));
    IAction picture =
        action(
            "Export Picture...",
            Icon.EXPORT_IMAGE,
            () ->
                shown.ifPresent(
                    t -> SolutionExport.picture(getSite().getShell(), t.system(), page.picture())));
    resultActions = List.of(whole, back, table, picture);
    resultActions.forEach(a -> a.setEnabled(false));
    IAction solve = action("Solve Again", Icon.SOLUTION, this::solve);
    IToolBarManager tools = getViewSite().getActionBars().getToolBarManager();
    tools.add(solve);
    tools.add(new Separator());
    resultActions.forEach(tools::add);
  }

  private static IAction action(String text, Icon icon, Runnable run) {
    Action action =
        new Action(text) {
          @Override
          public void run() {
            run.run();
          }
        };
    action.setToolTipText(text);
    action.setImageDescriptor(icon.descriptor());
    return action;
  }

  private void editorChanged(Optional<ModelEditor> followed) {
    editor = followed;
    model = Optional.empty();
    cancel();
    if (followed.isEmpty()) {
      forget();
      page.controls().setVisible(false);
      page.showMessage("Open a model file to see its solution.");
      setContentDescription("");
    } else {
      setContentDescription(followed.get().getTitle());
      if (!shownFile.equals(file())) {
        forget();
        page.showMessage("Reading the model ...");
      }
    }
  }

  private void forget() {
    shown = Optional.empty();
    shownFile = "";
    resultActions.forEach(a -> a.setEnabled(false));
  }

  private String file() {
    return editor.map(e -> e.getEditorInput().toString()).orElse("");
  }

  private void modelChanged(ModelSnapshot snapshot) {
    boolean first = model.isEmpty();
    model = Optional.of(snapshot.model());
    Optional<Choice> choice = Choice.in(snapshot.model(), memory.choice(file()));
    choice.ifPresent(c -> page.controls().show(snapshot.model(), c));
    page.controls().setVisible(choice.isPresent());
    if (first || PreferenceDefaults.store().getBoolean(PreferenceDefaults.SOLVE_WHILE_TYPING)) {
      solve();
    } else {
      page.showStale("The text has changed; press Solve Again.");
    }
  }

  private void choose(Choice choice) {
    memory.remember(file(), choice);
    model.ifPresent(
        m -> Choice.in(m, Optional.of(choice)).ifPresent(c -> page.controls().show(m, c)));
    solve();
  }

  private void solve() {
    cancel();
    if (model.isEmpty()) {
      return;
    }
    Optional<Choice> choice = Choice.in(model.get(), memory.choice(file()));
    Optional<String> obstacle = obstacle(model.get(), choice);
    if (obstacle.isPresent()) {
      cannotSolve(obstacle.get());
      return;
    }
    SolveJob next = new SolveJob(model.get(), choice.get(), answerTaker());
    job = Optional.of(next);
    IWorkbenchSiteProgressService progress =
        getSite().getService(IWorkbenchSiteProgressService.class);
    if (progress == null) {
      next.schedule(PAUSE_MS);
    } else {
      progress.schedule(next, PAUSE_MS, true);
    }
  }

  /** Returns why nothing can be solved, if there is a reason. */
  private static Optional<String> obstacle(Model model, Optional<Choice> choice) {
    Optional<SystemModel> system = choice.flatMap(c -> c.systemIn(model));
    if (system.isEmpty()) {
      return Optional.of("The file has no system yet.");
    }
    if (model.isSound(system.get())) {
      return Optional.empty();
    }
    Optional<Problem> first =
        model.problems().stream()
            .filter(p -> p.severity() == Severity.ERROR && system.get().span().contains(p.span()))
            .findFirst();
    return Optional.of(
        first
            .map(p -> "Line " + model.source().line(p.span().start()) + ": " + p.message())
            .orElse("The equations of " + system.get().name() + " are not complete yet."));
  }

  private void cannotSolve(String reason) {
    if (shown.isPresent()) {
      page.showStale("Not up to date. " + reason);
    } else {
      page.showMessage(reason);
    }
  }

  private BiConsumer<SolveJob, SolveAnswer> answerTaker() {
    Display display = page.control().getDisplay();
    return (from, answer) ->
        display.asyncExec(() -> {
          // A newer job has taken over, or the view is gone.
          if (job.filter(current -> current == from).isPresent() && !page.control().isDisposed()) {
            job = Optional.empty();
            take(answer);
          }
        });
  }

  private void take(SolveAnswer answer) {
    switch (answer) {
      case SolveAnswer.Solved solved -> showTable(solved.table());
      case SolveAnswer.Refused refused -> {
        forget();
        page.showMessage(refused.message());
      }
      case SolveAnswer.Cancelled cancelled -> cannotSolve("Solving was cancelled.");
    }
  }

  private void showTable(SolutionTable table) {
    boolean sameSystem =
        shownFile.equals(file())
            && shown.filter(s -> s.system().equals(table.system())).isPresent();
    boolean sameTime = sameSystem && sameRange(shown.get(), table);
    shown = Optional.of(table);
    shownFile = file();
    SequencedSet<String> columns = memory.columns(file(), table);
    page.showSolution(table, columns, memory.axes(file(), table), sameTime);
    resultActions.forEach(a -> a.setEnabled(true));
  }

  private static boolean sameRange(SolutionTable one, SolutionTable other) {
    double[] before = one.time().values();
    double[] after = other.time().values();
    return before.length > 0
        && after.length > 0
        && before[0] == after[0]
        && before[before.length - 1] == after[after.length - 1];
  }

  private void chooseColumns(SequencedSet<String> columns) {
    shown.ifPresent(table -> {
      memory.remember(file(), table, columns);
      page.showSolution(table, columns, memory.axes(file(), table), true);
    });
  }

  private void chooseAxes(PlotAxes axes) {
    shown.ifPresent(table -> {
      memory.remember(file(), table, axes);
      page.showSolution(table, memory.columns(file(), table), axes, false);
    });
  }

  /** Returns the solution shown as text, as the export writes it; empty while there is none. */
  public Optional<String> tableText() {
    return shown.map(SolutionCsv::of);
  }

  /** Returns the picture of the plot, as the export writes it; empty while there is none. */
  public Optional<ImageData> picture() {
    return shown.map(table -> page.picture());
  }

  private void cancel() {
    job.ifPresent(Job::cancel);
    job = Optional.empty();
  }

  @Override
  public void setFocus() {
    page.setFocus();
  }

  @Override
  public void dispose() {
    cancel();
    endColours.run();
    if (follower != null) {
      follower.stop();
    }
    super.dispose();
  }
}
