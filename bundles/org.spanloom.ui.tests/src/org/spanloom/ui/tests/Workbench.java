/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.BooleanSupplier;
import java.util.function.Consumer;
import java.util.function.Supplier;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.resources.IncrementalProjectBuilder;
import org.eclipse.core.resources.ResourcesPlugin;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.ILogListener;
import org.eclipse.core.runtime.IPath;
import org.eclipse.core.runtime.IStatus;
import org.eclipse.core.runtime.Platform;
import org.eclipse.core.runtime.jobs.Job;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.swt.widgets.Control;
import org.eclipse.swt.widgets.Display;
import org.eclipse.swt.widgets.Event;
import org.eclipse.swt.widgets.Shell;
import org.eclipse.ui.IWorkbenchPage;
import org.eclipse.ui.PartInitException;
import org.eclipse.ui.PlatformUI;
import org.eclipse.ui.ide.IDE;
import org.junit.jupiter.api.extension.AfterEachCallback;
import org.junit.jupiter.api.extension.BeforeEachCallback;
import org.junit.jupiter.api.extension.ExtensionContext;
import org.spanloom.ui.UiIds;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.workspace.ModelNature;

/** The workbench under test: opens things, pumps events, and cleans up behind each test. */
final class Workbench implements BeforeEachCallback, AfterEachCallback {

  static final Duration PATIENCE = Duration.ofSeconds(30);

  private final List<IStatus> errors = new ArrayList<>();
  private final ILogListener log =
      (status, plugin) -> {
        if (status.getSeverity() == IStatus.ERROR) {
          synchronized (errors) {
            errors.add(status);
          }
        }
      };

  @Override
  public void beforeEach(ExtensionContext context) throws Exception {
    Platform.addLogListener(log);
    PlatformUI.getWorkbench().showPerspective(UiIds.PERSPECTIVE, page().getWorkbenchWindow());
    page().getWorkbenchWindow().getShell().setSize(1400, 900);
    page().getWorkbenchWindow().getShell().forceActive();
  }

  @Override
  public void afterEach(ExtensionContext context) throws Exception {
    page().closeAllEditors(false);
    // A view remembers what was chosen for a file; the next test has a file of the same name.
    page().hideView(page().findView(UiIds.SOLUTION_VIEW));
    waitForJobs();
    for (IProject project : ResourcesPlugin.getWorkspace().getRoot().getProjects()) {
      project.delete(true, true, null);
    }
    waitForJobs();
    drain();
    Platform.removeLogListener(log);
    synchronized (errors) {
      if (!errors.isEmpty()) {
        IStatus first = errors.getFirst();
        AssertionError failure = new AssertionError("errors in the log: " + errors);
        failure.initCause(first.getException());
        errors.clear();
        throw failure;
      }
    }
  }

  static Display display() {
    return Display.getCurrent();
  }

  static IWorkbenchPage page() {
    return PlatformUI.getWorkbench().getActiveWorkbenchWindow().getActivePage();
  }

  /** Lets the events that are there happen. */
  static void drain() {
    while (display().readAndDispatch()) {
      // Each call handles one.
    }
  }

  /** Pumps events until a condition holds; fails with what was waited for. */
  static void waitUntil(String what, BooleanSupplier done) {
    waitUntil(what, done, () -> "");
  }

  /**
   * Pumps events until a condition holds; fails with what was waited for and what is there instead.
   */
  static void waitUntil(String what, BooleanSupplier done, Supplier<String> instead) {
    long end = System.nanoTime() + PATIENCE.toNanos();
    while (true) {
      drain();
      if (done.getAsBoolean()) {
        return;
      }
      if (System.nanoTime() > end) {
        throw new AssertionError(
            "waited in vain for: " + what + "\n" + instead.get() + "\n" + diagnostics());
      }
      display().timerExec(20, () -> {});
      display().sleep();
    }
  }

  private static String diagnostics() {
    String shells = Arrays.stream(display().getShells()).map(Shell::getText).toList().toString();
    return "shells " + shells + ", focus in " + display().getFocusControl();
  }

  /** Waits until builds and our own jobs have ended. */
  static void waitForJobs() {
    for (Object family :
        new Object[] {
          ResourcesPlugin.FAMILY_AUTO_BUILD, ResourcesPlugin.FAMILY_MANUAL_BUILD, UiIds.JOB_FAMILY
        }) {
      waitUntil("the end of jobs of " + family, () -> Job.getJobManager().find(family).length == 0);
    }
  }

  static IProject project(String name) throws CoreException {
    IProject project = ResourcesPlugin.getWorkspace().getRoot().getProject(name);
    project.create(null);
    project.open(null);
    project.setDefaultCharset(StandardCharsets.UTF_8.name(), null);
    ModelNature.addTo(project, null);
    return project;
  }

  static IFile file(IProject project, String name, String text) throws CoreException {
    IFile file = project.getFile(IPath.fromOSString(name));
    file.create(new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8)), true, null);
    return file;
  }

  static void build(IProject project) throws CoreException {
    project.build(IncrementalProjectBuilder.FULL_BUILD, null);
    waitForJobs();
  }

  /** Opens a file and waits until its text has been read. */
  static ModelEditor open(IFile file) throws PartInitException {
    ModelEditor editor = (ModelEditor) IDE.openEditor(page(), file);
    waitForModel(editor);
    return editor;
  }

  /** Waits until the editor's text, as it stands now, has been read. */
  static void waitForModel(ModelEditor editor) {
    waitUntil(
        "the model of the text",
        () ->
            editor
                .snapshots()
                .latest()
                .filter(s -> s.model().source().content().equals(editor.document().get()))
                .isPresent());
    drain();
  }

  /** Replaces the whole text, as if typed. */
  static void type(ModelEditor editor, String text) {
    editor.document().set(text);
    waitForModel(editor);
  }

  static void save(ModelEditor editor) {
    editor.doSave(null);
    waitUntil("the text to be saved", () -> !editor.isDirty());
    waitForJobs();
  }

  /** Returns all controls of a kind below another that can be seen. */
  static <C extends Control> List<C> find(Class<C> kind, Control root) {
    List<C> found = new ArrayList<>();
    walk(
        root,
        c -> {
          if (kind.isInstance(c) && c.isVisible()) {
            found.add(kind.cast(c));
          }
        });
    return found;
  }

  static List<Control> everything() {
    List<Control> found = new ArrayList<>();
    walk(page().getWorkbenchWindow().getShell(), found::add);
    return found;
  }

  private static void walk(Control control, Consumer<Control> visitor) {
    visitor.accept(control);
    if (control instanceof Composite composite) {
      for (Control child : composite.getChildren()) {
        walk(child, visitor);
      }
    }
  }

  static Shell shell() {
    return page().getWorkbenchWindow().getShell();
  }

  /** Sends an event to a control. */
  static void send(Control control, int type, Consumer<Event> fill) {
    Event event = new Event();
    fill.accept(event);
    event.type = type;
    control.notifyListeners(type, event);
    drain();
  }

  static List<IMarker> markers(IResource resource, String type) throws CoreException {
    return List.of(resource.findMarkers(type, true, IResource.DEPTH_INFINITE));
  }
}
