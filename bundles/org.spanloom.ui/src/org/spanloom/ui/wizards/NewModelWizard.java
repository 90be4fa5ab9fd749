/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.wizards;

import org.eclipse.core.resources.IFile;
import org.eclipse.jface.dialogs.ErrorDialog;
import org.eclipse.jface.viewers.IStructuredSelection;
import org.eclipse.jface.wizard.Wizard;
import org.eclipse.ui.IEditorPart;
import org.eclipse.ui.INewWizard;
import org.eclipse.ui.IWorkbench;
import org.eclipse.ui.PartInitException;
import org.eclipse.ui.ide.IDE;
import org.eclipse.ui.wizards.newresource.BasicNewResourceWizard;
import org.spanloom.language.text.Span;
import org.spanloom.ui.Icon;
import org.spanloom.ui.editor.ModelEditor;

/** Makes a model file and opens it with the name of its system selected, ready to be typed over. */
public final class NewModelWizard extends Wizard implements INewWizard {

  private IWorkbench workbench;
  private IStructuredSelection selection;
  private NewModelPage page;

  @Override
  public void init(IWorkbench currentWorkbench, IStructuredSelection currentSelection) {
    workbench = currentWorkbench;
    selection = currentSelection;
    setWindowTitle("New Spanloom Model");
    setDefaultPageImageDescriptor(Icon.NEW_MODEL_BANNER.descriptor());
  }

  @Override
  public void addPages() {
    page = new NewModelPage(selection);
    addPage(page);
  }

  @Override
  public boolean performFinish() {
    IFile file = page.createNewFile();
    if (file == null) {
      return false;
    }
    BasicNewResourceWizard.selectAndReveal(file, workbench.getActiveWorkbenchWindow());
    try {
      IEditorPart part = IDE.openEditor(workbench.getActiveWorkbenchWindow().getActivePage(), file);
      if (part instanceof ModelEditor editor) {
        selectName(editor);
      }
    } catch (PartInitException e) {
      ErrorDialog.openError(
          getShell(), "New Spanloom Model", "The model could not be opened.", e.getStatus());
    }
    return true;
  }

  private void selectName(ModelEditor editor) {
    String name = page.systemName();
    int start = editor.document().get().indexOf(NewModelPage.BEFORE_NAME + name);
    if (start >= 0) {
      start += NewModelPage.BEFORE_NAME.length();
      editor.reveal(new Span(start, start + name.length()));
    }
  }
}
