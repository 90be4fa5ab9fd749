/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.workbench;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.List;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.ICoreRunnable;
import org.eclipse.core.runtime.IStatus;
import org.eclipse.core.runtime.Platform;
import org.eclipse.core.runtime.Status;
import org.eclipse.core.runtime.jobs.Job;
import org.eclipse.ui.IStartup;
import org.spanloom.ui.UiIds;
import org.spanloom.workspace.ProjectImport;

/**
 * Opens the projects of the directory that the argument {@value #ARGUMENT} names, if it is given.
 */
public final class OpenDirectoryStartup implements IStartup {

  /** The argument; the directory follows it. */
  public static final String ARGUMENT = "-openProjects";

  @Override
  public void earlyStartup() {
    List<String> arguments = List.of(Platform.getApplicationArgs());
    int at = arguments.indexOf(ARGUMENT);
    if (at >= 0 && at + 1 < arguments.size()) {
      open(arguments.get(at + 1));
    }
  }

  private static void open(String directory) {
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
