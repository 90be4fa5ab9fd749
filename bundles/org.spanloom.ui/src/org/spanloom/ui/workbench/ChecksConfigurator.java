/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.workbench;

import java.io.File;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.Set;
import java.util.stream.Stream;
import org.eclipse.core.resources.IContainer;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IFolder;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.ILog;
import org.eclipse.core.runtime.IPath;
import org.eclipse.core.runtime.IProgressMonitor;
import org.eclipse.ui.wizards.datatransfer.ProjectConfigurator;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.workspace.ModelFile;
import org.spanloom.workspace.ModelNature;

/**
 * Lets the platform's import of folders find and set up model projects: folders with settings are
 * projects.
 */
public final class ChecksConfigurator implements ProjectConfigurator {

  private static final int DEEPEST = 6;

  @Override
  public Set<File> findConfigurableLocations(File root, IProgressMonitor monitor) {
    Set<File> found = new HashSet<>();
    try (Stream<Path> paths = Files.walk(root.toPath(), DEEPEST)) {
      paths
          .filter(p -> p.endsWith(Settings.FILE_NAME))
          .forEach(p -> found.add(p.getParent().toFile()));
    } catch (IOException | UncheckedIOException e) {
      ILog.of(ChecksConfigurator.class)
          .warn("The folder " + root + " could not be read to its end.", e);
    }
    return found;
  }

  @Override
  public boolean shouldBeAnEclipseProject(IContainer container, IProgressMonitor monitor) {
    return container.getFile(IPath.fromOSString(Settings.FILE_NAME)).exists();
  }

  @Override
  public Set<IFolder> getFoldersToIgnore(IProject project, IProgressMonitor monitor) {
    return Set.of();
  }

  @Override
  public boolean canConfigure(IProject project, Set<IPath> ignored, IProgressMonitor monitor) {
    return !ModelNature.isOn(project) && holdsModel(project);
  }

  private static boolean holdsModel(IProject project) {
    boolean[] found = new boolean[1];
    try {
      project.accept((IResource resource) -> {
        found[0] |= resource instanceof IFile file && ModelFile.isModel(file);
        return !found[0];
      });
    } catch (CoreException e) {
      ILog.of(ChecksConfigurator.class).warn("The project could not be searched for models.", e);
    }
    return found[0];
  }

  @Override
  public void configure(IProject project, Set<IPath> ignored, IProgressMonitor monitor) {
    try {
      ModelNature.addTo(project, monitor);
    } catch (CoreException e) {
      ILog.of(ChecksConfigurator.class).error("Spanloom checks could not be enabled.", e);
    }
  }
}
