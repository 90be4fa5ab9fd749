/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.eclipse.core.resources.ICommand;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IProjectDescription;
import org.eclipse.core.resources.IProjectNature;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IProgressMonitor;

/** Makes the models of a project checked whenever they change. */
public final class ModelNature implements IProjectNature {

  private IProject project;

  @Override
  public void configure() throws CoreException {
    IProjectDescription description = project.getDescription();
    List<ICommand> commands = new ArrayList<>(Arrays.asList(description.getBuildSpec()));
    if (commands.stream().noneMatch(c -> c.getBuilderName().equals(Ids.BUILDER))) {
      ICommand command = description.newCommand();
      command.setBuilderName(Ids.BUILDER);
      commands.add(command);
      description.setBuildSpec(commands.toArray(ICommand[]::new));
      project.setDescription(description, null);
    }
  }

  @Override
  public void deconfigure() throws CoreException {
    IProjectDescription description = project.getDescription();
    description.setBuildSpec(
        Arrays.stream(description.getBuildSpec())
            .filter(c -> !c.getBuilderName().equals(Ids.BUILDER))
            .toArray(ICommand[]::new));
    project.setDescription(description, null);
    FindingMarkers.delete(project, IResource.DEPTH_INFINITE);
  }

  @Override
  public IProject getProject() {
    return project;
  }

  @Override
  public void setProject(IProject project) {
    this.project = project;
  }

  /** Tells whether the project has the nature and can be asked. */
  public static boolean isOn(IProject project) {
    try {
      return project.isAccessible() && project.hasNature(Ids.NATURE);
    } catch (CoreException e) {
      return false;
    }
  }

  /**
   * Gives a project the nature, if it lacks it.
   *
   * @throws CoreException if the description of the project cannot be written
   */
  public static void addTo(IProject project, IProgressMonitor monitor) throws CoreException {
    if (isOn(project)) {
      return;
    }
    IProjectDescription description = project.getDescription();
    List<String> natures = new ArrayList<>(Arrays.asList(description.getNatureIds()));
    natures.add(Ids.NATURE);
    description.setNatureIds(natures.toArray(String[]::new));
    project.setDescription(description, monitor);
  }
}
