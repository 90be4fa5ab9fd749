/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.io.PrintStream;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.resources.IncrementalProjectBuilder;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.NullProgressMonitor;
import org.eclipse.equinox.app.IApplication;
import org.eclipse.equinox.app.IApplicationContext;

/**
 * Checks the models of a directory through the workspace, without a screen: the proof that an
 * installed workbench works. Prints one line for each marker; returns 0 when there is no error
 * among them, 1 when there is, and 2 when the directory cannot be opened.
 */
public final class HeadlessCheck implements IApplication {

  private static final Comparator<IMarker> IN_ORDER =
      Comparator.comparing((IMarker m) -> m.getResource().getFullPath().toString())
          .thenComparingInt(m -> m.getAttribute(IMarker.CHAR_START, 0))
          .thenComparing(m -> m.getAttribute(MarkerAttributes.CODE, ""));

  @Override
  public Object start(IApplicationContext context) throws CoreException {
    String[] arguments =
        (String[]) context.getArguments().get(IApplicationContext.APPLICATION_ARGS);
    List<String> directories = Arrays.stream(arguments).filter(a -> !a.startsWith("-")).toList();
    if (directories.size() != 1) {
      System.err.println("Name one directory to check.");
      return 2;
    }
    return run(Path.of(directories.getFirst()), System.out, System.err);
  }

  @Override
  public void stop() {
    // The check ends by itself.
  }

  /**
   * Opens, builds and prints.
   *
   * @param directory what to check
   * @param out for the markers
   * @param err for what went wrong
   * @return the exit code
   */
  public static int run(Path directory, PrintStream out, PrintStream err) {
    try {
      List<IProject> projects = ProjectImport.open(directory, new NullProgressMonitor());
      long errors = 0;
      for (IProject project : projects) {
        project.build(IncrementalProjectBuilder.FULL_BUILD, new NullProgressMonitor());
        errors += print(project, out);
      }
      out.printf(Locale.ROOT, "%d project(s), %d error(s)%n", projects.size(), errors);
      return errors == 0 ? 0 : 1;
    } catch (CoreException e) {
      err.println(e.getStatus().getMessage());
      return 2;
    }
  }

  private static long print(IProject project, PrintStream out) throws CoreException {
    IMarker[] markers = project.findMarkers(null, true, IResource.DEPTH_INFINITE);
    Arrays.sort(markers, IN_ORDER);
    long errors = 0;
    for (IMarker marker : markers) {
      if (FindingMarkers.SOURCE.equals(marker.getAttribute(IMarker.SOURCE_ID, ""))) {
        out.println(line(marker));
        boolean error =
            marker.isSubtypeOf(Ids.PROBLEM) && severity(marker) == IMarker.SEVERITY_ERROR;
        errors += error ? 1 : 0;
      }
    }
    return errors;
  }

  private static String line(IMarker marker) throws CoreException {
    String kind =
        marker.getType().equals(Ids.REQUIREMENT)
            ? "requirement "
                + marker.getAttribute(MarkerAttributes.STATUS, "").toLowerCase(Locale.ROOT)
            : switch (severity(marker)) {
              case IMarker.SEVERITY_ERROR -> "error";
              case IMarker.SEVERITY_WARNING -> "warning";
              default -> "note";
            };
    String code = marker.getAttribute(MarkerAttributes.CODE, "");
    return "%s:%d: %s%s: %s"
        .formatted(
            marker.getResource().getFullPath().makeRelative(),
            marker.getAttribute(IMarker.LINE_NUMBER, 1),
            kind,
            code.isEmpty() ? "" : " " + code,
            marker.getAttribute(IMarker.MESSAGE, ""));
  }

  private static int severity(IMarker marker) {
    return marker.getAttribute(IMarker.SEVERITY, IMarker.SEVERITY_INFO);
  }
}
