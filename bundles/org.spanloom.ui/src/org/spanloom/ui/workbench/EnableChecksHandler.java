/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.workbench;

import java.util.LinkedHashSet;
import java.util.Set;
import org.eclipse.core.commands.AbstractHandler;
import org.eclipse.core.commands.ExecutionEvent;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.WorkspaceJob;
import org.eclipse.core.runtime.Adapters;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IProgressMonitor;
import org.eclipse.core.runtime.IStatus;
import org.eclipse.core.runtime.Status;
import org.eclipse.core.runtime.SubMonitor;
import org.eclipse.jface.viewers.IStructuredSelection;
import org.eclipse.ui.handlers.HandlerUtil;
import org.spanloom.workspace.ModelNature;

/** Gives the selected projects the nature, so that their models are checked. */
public final class EnableChecksHandler extends AbstractHandler {

  @Override
  public Object execute(ExecutionEvent event) {
    Set<IProject> projects = new LinkedHashSet<>();
    if (HandlerUtil.getCurrentSelection(event) instanceof IStructuredSelection selection) {
      for (Object element : selection) {
        IProject project = Adapters.adapt(element, IProject.class);
        if (project != null) {
          projects.add(project);
        }
      }
    }
    if (!projects.isEmpty()) {
      new Enable(projects).schedule();
    }
    return null;
  }

  private static final class Enable extends WorkspaceJob {

    private final Set<IProject> projects;

    Enable(Set<IProject> projects) {
      super("Enabling Spanloom checks");
      this.projects = projects;
      setUser(true);
      setRule(projects.iterator().next().getWorkspace().getRoot());
    }

    @Override
    public IStatus runInWorkspace(IProgressMonitor monitor) throws CoreException {
      SubMonitor progress = SubMonitor.convert(monitor, projects.size());
      for (IProject project : projects) {
        ModelNature.addTo(project, progress.split(1));
      }
      return Status.OK_STATUS;
    }
  }
}
