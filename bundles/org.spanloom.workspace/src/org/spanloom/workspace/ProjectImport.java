/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.io.IOException;
import java.nio.file.FileVisitResult;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.SimpleFileVisitor;
import java.nio.file.attribute.BasicFileAttributes;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IProjectDescription;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.resources.IWorkspace;
import org.eclipse.core.resources.ResourcesPlugin;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IPath;
import org.eclipse.core.runtime.IProgressMonitor;
import org.eclipse.core.runtime.IStatus;
import org.eclipse.core.runtime.Status;
import org.eclipse.core.runtime.SubMonitor;

/** Takes directories into the workspace as projects, where they stand, without copying. */
public final class ProjectImport {

  private static final String DESCRIPTION = ".project";
  private static final int DEEPEST = 6;

  private ProjectImport() {}

  /**
   * Opens the projects of a directory: each directory in it, itself included, that holds a project
   * description; the directory itself, with our nature, where there is none.
   *
   * @param directory where to look; links out of it are not followed
   * @return the projects, open, in the order of their paths
   * @throws CoreException if a project cannot be made, with a message for people
   */
  public static List<IProject> open(Path directory, IProgressMonitor monitor) throws CoreException {
    if (!Files.isDirectory(directory)) {
      throw failure(directory + " is not a directory that can be read.", null);
    }
    Path root = directory.toAbsolutePath().normalize();
    List<Path> found = described(root);
    SubMonitor progress = SubMonitor.convert(monitor, "Opening " + root, Math.max(1, found.size()));
    List<IProject> projects = new ArrayList<>();
    if (found.isEmpty()) {
      projects.add(adopt(root, progress.split(1)));
    } else {
      for (Path place : found) {
        projects.add(openDescribed(place, progress.split(1)));
      }
    }
    return projects;
  }

  private static List<Path> described(Path root) throws CoreException {
    List<Path> found = new ArrayList<>();
    try {
      Files.walkFileTree(
          root,
          Set.of(),
          DEEPEST,
          new SimpleFileVisitor<>() {
            @Override
            public FileVisitResult preVisitDirectory(Path dir, BasicFileAttributes attributes) {
              boolean hidden = !dir.equals(root) && dir.getFileName().toString().startsWith(".");
              if (hidden) {
                return FileVisitResult.SKIP_SUBTREE;
              }
              if (Files.isRegularFile(dir.resolve(DESCRIPTION))) {
                found.add(dir);
              }
              return FileVisitResult.CONTINUE;
            }

            @Override
            public FileVisitResult visitFileFailed(Path file, IOException e) {
              return FileVisitResult.CONTINUE;
            }
          });
    } catch (IOException e) {
      throw failure(root + " cannot be read: " + e.getMessage(), e);
    }
    found.sort(null);
    return found;
  }

  private static IProject openDescribed(Path place, IProgressMonitor monitor) throws CoreException {
    IWorkspace workspace = ResourcesPlugin.getWorkspace();
    IProjectDescription description =
        workspace.loadProjectDescription(path(place.resolve(DESCRIPTION)));
    IProject known = workspace.getRoot().getProject(description.getName());
    if (known.exists() && !path(place).equals(known.getLocation())) {
      throw failure(
          "A project named "
              + description.getName()
              + " is already open from "
              + known.getLocation()
              + ". Close it there, or choose another workspace, to open "
              + place
              + ".",
          null);
    }
    description.setLocation(outsideOnly(place, description.getName()));
    return create(known, description, monitor);
  }

  private static IProject adopt(Path place, IProgressMonitor monitor) throws CoreException {
    IWorkspace workspace = ResourcesPlugin.getWorkspace();
    Path last = place.getFileName();
    String name = last == null ? "models" : last.toString();
    IProject project = workspace.getRoot().getProject(name);
    for (int i = 2; project.exists() && !path(place).equals(project.getLocation()); i++) {
      project = workspace.getRoot().getProject(name + "-" + i);
    }
    IProjectDescription description = workspace.newProjectDescription(project.getName());
    description.setLocation(outsideOnly(place, project.getName()));
    create(project, description, monitor);
    // A nature named at the creation would not be configured.
    ModelNature.addTo(project, monitor);
    return project;
  }

  private static IProject create(
      IProject project, IProjectDescription description, IProgressMonitor monitor)
      throws CoreException {
    SubMonitor progress = SubMonitor.convert(monitor, 3);
    if (!project.exists()) {
      project.create(description, progress.split(1));
    }
    project.open(IResource.BACKGROUND_REFRESH, progress.setWorkRemaining(2).split(1));
    project.refreshLocal(IResource.DEPTH_INFINITE, progress.split(1));
    return project;
  }

  /** The platform refuses the default location when it is named. */
  private static IPath outsideOnly(Path place, String name) {
    IPath workspace = ResourcesPlugin.getWorkspace().getRoot().getLocation();
    return workspace.append(name).equals(path(place)) ? null : path(place);
  }

  private static IPath path(Path place) {
    return IPath.fromOSString(place.toString());
  }

  private static CoreException failure(String message, Throwable cause) {
    IStatus status = new Status(IStatus.ERROR, "org.spanloom.workspace", message, cause);
    return new CoreException(status);
  }
}
