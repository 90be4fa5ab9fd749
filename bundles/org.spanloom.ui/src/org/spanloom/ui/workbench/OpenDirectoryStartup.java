/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.workbench;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.ICoreRunnable;
import org.eclipse.core.runtime.IStatus;
import org.eclipse.core.runtime.Status;
import org.eclipse.core.runtime.jobs.Job;
import org.eclipse.ui.IStartup;
import org.spanloom.ui.UiIds;
import org.spanloom.workspace.ProjectImport;

/**
 * Opens the projects of the directory that the system property {@value #PROPERTY} names, if it
 * names one.
 */
public final class OpenDirectoryStartup implements IStartup {

  /** The property. */
  public static final String PROPERTY = "spanloom.open";

  @Override
  public void earlyStartup() {
    String directory = System.getProperty(PROPERTY, "");
    if (directory.isBlank()) {
      return;
    }
    ICoreRunnable open =
        monitor -> {
          try {
            ProjectImport.open(Path.of(directory), monitor);
          } catch (InvalidPathException e) {
            IStatus status =
                new Status(IStatus.ERROR, UiIds.BUNDLE, "'" + directory + "' is not a path.", e);
            throw new CoreException(status);
          }
        };
    Job job = Job.create("Opening " + directory, open);
    job.setUser(false);
    job.schedule();
  }
}
