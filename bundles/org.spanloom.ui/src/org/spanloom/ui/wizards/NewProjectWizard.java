/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.wizards;

import java.io.ByteArrayInputStream;
import java.lang.reflect.InvocationTargetException;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IProjectDescription;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IConfigurationElement;
import org.eclipse.core.runtime.IExecutableExtension;
import org.eclipse.core.runtime.IPath;
import org.eclipse.core.runtime.IProgressMonitor;
import org.eclipse.core.runtime.SubMonitor;
import org.eclipse.jface.dialogs.ErrorDialog;
import org.eclipse.jface.viewers.IStructuredSelection;
import org.eclipse.jface.wizard.Wizard;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.ui.INewWizard;
import org.eclipse.ui.IWorkbench;
import org.eclipse.ui.PartInitException;
import org.eclipse.ui.actions.WorkspaceModifyOperation;
import org.eclipse.ui.dialogs.WizardNewProjectCreationPage;
import org.eclipse.ui.ide.IDE;
import org.eclipse.ui.wizards.newresource.BasicNewProjectResourceWizard;
import org.eclipse.ui.wizards.newresource.BasicNewResourceWizard;
import org.spanloom.ui.Icon;
import org.spanloom.ui.UiIds;
import org.spanloom.workspace.Ids;

/**
 * Makes a project whose models are checked, with settings, a README and a first model, and opens
 * the model.
 */
public final class NewProjectWizard extends Wizard implements INewWizard, IExecutableExtension {

  private IWorkbench workbench;
  private IConfigurationElement contribution;
  private WizardNewProjectCreationPage page;

  @Override
  public void init(IWorkbench currentWorkbench, IStructuredSelection selection) {
    workbench = currentWorkbench;
    setWindowTitle("New Spanloom Project");
    setDefaultPageImageDescriptor(Icon.NEW_PROJECT_BANNER.descriptor());
    setNeedsProgressMonitor(true);
  }

  @Override
  public void setInitializationData(IConfigurationElement element, String property, Object data) {
    contribution = element;
  }

  @Override
  public void addPages() {
    page = new WizardNewProjectCreationPage("project");
    page.setTitle("Spanloom Project");
    page.setDescription("A project whose models are checked, with settings and a first model.");
    addPage(page);
  }

  @Override
  public void createPageControls(Composite pageContainer) {
    super.createPageControls(pageContainer);
    workbench.getHelpSystem().setHelp(page.getControl(), UiIds.NEW_PROJECT_HELP);
  }

  @Override
  public boolean performFinish() {
    IProject project = page.getProjectHandle();
    URI location = page.useDefaults() ? null : page.getLocationURI();
    try {
      getContainer()
          .run(
              true,
              true,
              new WorkspaceModifyOperation() {
                @Override
                protected void execute(IProgressMonitor monitor) throws CoreException {
                  create(project, location, monitor);
                }
              });
    } catch (InvocationTargetException e) {
      if (e.getCause() instanceof CoreException failure) {
        ErrorDialog.openError(
            getShell(),
            "New Spanloom Project",
            "The project could not be made.",
            failure.getStatus());
        return false;
      }
      throw new IllegalStateException(e.getCause());
    } catch (InterruptedException e) {
      return false;
    }
    show(project.getFile(Templates.DRYING_ROOM.fileName()));
    return true;
  }

  private void show(IFile model) {
    if (contribution != null) {
      BasicNewProjectResourceWizard.updatePerspective(contribution);
    }
    BasicNewResourceWizard.selectAndReveal(model, workbench.getActiveWorkbenchWindow());
    try {
      IDE.openEditor(workbench.getActiveWorkbenchWindow().getActivePage(), model);
    } catch (PartInitException e) {
      ErrorDialog.openError(
          getShell(), "New Spanloom Project", "The model could not be opened.", e.getStatus());
    }
  }

  /**
   * Makes the project and its files; files that are there already stay as they are.
   *
   * @param location where; null for the workspace, as the platform has it
   */
  private static void create(IProject project, URI location, IProgressMonitor monitor)
      throws CoreException {
    SubMonitor progress = SubMonitor.convert(monitor, 5);
    IProjectDescription description =
        project.getWorkspace().newProjectDescription(project.getName());
    description.setLocationURI(location);
    project.create(description, progress.split(1));
    project.open(progress.split(1));
    project.setDefaultCharset(StandardCharsets.UTF_8.name(), progress.split(1));
    write(project, Templates.SETTINGS.fileName(), Templates.SETTINGS.text());
    write(
        project,
        Templates.README.fileName(),
        Templates.README.text().replace("PROJECT", project.getName()));
    write(project, Templates.DRYING_ROOM.fileName(), Templates.DRYING_ROOM.text());
    // With the files in place, the nature begins with one whole check.
    description = project.getDescription();
    description.setNatureIds(new String[] {Ids.NATURE});
    project.setDescription(description, progress.split(2));
  }

  private static void write(IProject project, String name, String text) throws CoreException {
    IFile file = project.getFile(IPath.fromOSString(name));
    if (!file.exists()) {
      file.create(new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8)), true, null);
    }
  }
}
