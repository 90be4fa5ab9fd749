/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.Map;
import java.util.SequencedSet;
import java.util.Set;
import java.util.TreeSet;
import java.util.concurrent.CancellationException;
import java.util.function.BooleanSupplier;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.resources.IResourceDelta;
import org.eclipse.core.resources.IncrementalProjectBuilder;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IProgressMonitor;
import org.eclipse.core.runtime.OperationCanceledException;
import org.eclipse.core.runtime.SubMonitor;
import org.eclipse.core.runtime.jobs.ISchedulingRule;
import org.spanloom.analysis.CheckReport;
import org.spanloom.analysis.ModelCheck;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.numerics.Progress;

/**
 * Checks the models of a project that changed since the last build or that use a file which did;
 * all of them when settings changed. The work can be cancelled, and an automatic build gives way to
 * whoever wants to change the project; in both cases the next build begins again from the same
 * state.
 */
public final class ModelBuilder extends IncrementalProjectBuilder {

  private static final int CONTENT_CHANGES =
      IResourceDelta.CONTENT | IResourceDelta.REPLACED | IResourceDelta.ENCODING;

  private static final Comparator<IFile> BY_PATH =
      Comparator.comparing(f -> f.getFullPath().toString());

  private final FileUses uses = new FileUses();

  @Override
  public ISchedulingRule getRule(int kind, Map<String, String> args) {
    // Saving elsewhere need not wait for a check here.
    return getProject();
  }

  @Override
  protected IProject[] build(int kind, Map<String, String> args, IProgressMonitor monitor)
      throws CoreException {
    Work work = new Work();
    IResourceDelta delta = kind == FULL_BUILD ? null : getDelta(getProject());
    if (delta == null) {
      work.collectAll(getProject());
    } else {
      delta.accept(work::collect);
      if (work.settingsChanged) {
        work.collectAll(getProject());
      }
    }
    BooleanSupplier interrupted = () -> kind == AUTO_BUILD && isInterrupted();
    try {
      if (!work.changed.isEmpty()) {
        addUsers(work, () -> interrupted.getAsBoolean() || monitor.isCanceled());
      }
      checkAll(work, interrupted, monitor);
    } catch (OperationCanceledException e) {
      rememberLastBuiltState();
      throw e;
    }
    return new IProject[0];
  }

  @Override
  protected void clean(IProgressMonitor monitor) throws CoreException {
    FindingMarkers.delete(getProject(), IResource.DEPTH_INFINITE);
  }

  /** Adds the models that use a file which changed, came or went. */
  private void addUsers(Work work, BooleanSupplier cancelled) throws CoreException {
    Work all = new Work();
    all.collectAll(getProject());
    work.removed.forEach(uses::forget);
    try {
      for (IFile model : all.models) {
        if (!work.models.contains(model) && uses.usesAny(model, work.changed, cancelled)) {
          work.models.add(model);
        }
      }
    } catch (CancellationException e) {
      throw new OperationCanceledException();
    }
  }

  private void checkAll(Work work, BooleanSupplier interrupted, IProgressMonitor monitor)
      throws CoreException {
    SequencedSet<IFile> models = new TreeSet<>(BY_PATH);
    models.addAll(work.models);
    SubMonitor progress = SubMonitor.convert(monitor, work.settings.size() + 10 * models.size());
    for (IFile file : work.settings) {
      checkSettings(file, progress.split(1));
    }
    for (IFile file : models) {
      progress.subTask("Checking " + file.getProjectRelativePath());
      check(file, new MonitorProgress(progress.split(10), interrupted));
    }
  }

  private static void checkSettings(IFile file, IProgressMonitor monitor) throws CoreException {
    switch (ModelFile.read(file)) {
      case ModelFile.Content.Readable r ->
          FindingMarkers.write(file, r.text(), ProjectSettings.findings(r.text()), monitor);
      case ModelFile.Content.Unreadable u -> FindingMarkers.write(file, u, monitor);
    }
  }

  private void check(IFile file, Progress progress) throws CoreException {
    if (progress.isCancelled()) {
      throw new OperationCanceledException();
    }
    switch (ModelFile.read(file)) {
      case ModelFile.Content.Readable r -> {
        WorkspaceFiles files = WorkspaceFiles.of(file);
        Model model = ModelReader.read(r.text(), files, progress::isCancelled);
        uses.note(file, files, model);
        if (progress.isCancelled()) {
          throw new OperationCanceledException();
        }
        CheckReport report = ModelCheck.check(model, ProjectSettings.of(file), progress);
        if (report.cancelled()) {
          throw new OperationCanceledException();
        }
        FindingMarkers.write(file, report, null);
      }
      case ModelFile.Content.Unreadable u -> FindingMarkers.write(file, u, null);
    }
  }

  /** What a build has to look at. */
  private static final class Work {

    private final SequencedSet<IFile> models = new LinkedHashSet<>();
    private final SequencedSet<IFile> settings = new LinkedHashSet<>();
    private final Set<IFile> changed = new LinkedHashSet<>();
    private final Set<IFile> removed = new LinkedHashSet<>();
    private boolean settingsChanged;

    private void collectAll(IProject project) throws CoreException {
      project.accept(resource -> {
        if (resource.isDerived()) {
          return false;
        }
        add(resource);
        return true;
      });
    }

    private boolean collect(IResourceDelta delta) throws CoreException {
      IResource resource = delta.getResource();
      if (resource.isDerived()) {
        return false;
      }
      if (!(resource instanceof IFile file)) {
        return true;
      }
      switch (delta.getKind()) {
        case IResourceDelta.ADDED -> {
          add(file);
          changed.add(file);
          dropStrayMarkers(file);
        }
        case IResourceDelta.CHANGED -> {
          if ((delta.getFlags() & CONTENT_CHANGES) != 0) {
            add(file);
            changed.add(file);
          }
        }
        case IResourceDelta.REMOVED -> {
          changed.add(file);
          removed.add(file);
          settingsChanged |= ModelFile.isSettings(file);
        }
        default -> {
          // Phantoms and markers are no business of a build.
        }
      }
      return true;
    }

    private void add(IResource resource) {
      if (resource instanceof IFile file) {
        if (ModelFile.isSettings(file)) {
          settings.add(file);
          settingsChanged = true;
        } else if (ModelFile.isModel(file)) {
          models.add(file);
        }
      }
    }

    /** A renamed file keeps its markers, although it may be no model any more. */
    private static void dropStrayMarkers(IFile file) throws CoreException {
      if (!ModelFile.isModel(file) && !ModelFile.isSettings(file)) {
        FindingMarkers.delete(file, IResource.DEPTH_ZERO);
      }
    }
  }
}
