/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.ResourcesPlugin;
import org.eclipse.jface.preference.PreferenceDialog;
import org.eclipse.jface.viewers.StructuredSelection;
import org.eclipse.swt.widgets.Button;
import org.eclipse.swt.widgets.Link;
import org.eclipse.ui.IWorkbenchPart;
import org.eclipse.ui.dialogs.PreferencesUtil;
import org.eclipse.ui.part.ISetSelectionTarget;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.RegisterExtension;
import org.spanloom.workspace.ModelNature;

/** The preference page, and checks for a project that has none yet. */
class PreferencesTests {

  @RegisterExtension final Workbench workbench = new Workbench();

  @Test
  void thePageOpens() {
    PreferenceDialog dialog =
        PreferencesUtil.createPreferenceDialogOn(
            Workbench.shell(), "org.spanloom.ui.preferences", null, null);
    dialog.setBlockOnOpen(false);
    dialog.open();
    Workbench.drain();
    try {
      List<String> buttons =
          Workbench.find(Button.class, dialog.getShell()).stream().map(Button::getText).toList();
      assertTrue(buttons.contains("&Solve again while a model is being typed"), buttons::toString);
      List<String> links =
          Workbench.find(Link.class, dialog.getShell()).stream().map(Link::getText).toList();
      assertTrue(links.stream().anyMatch(l -> l.contains("Colors and Fonts")), links::toString);
    } finally {
      dialog.close();
    }
  }

  @Test
  void checksCanBeEnabledForAnyProject() throws Exception {
    IProject project = ResourcesPlugin.getWorkspace().getRoot().getProject("plain");
    project.create(null);
    project.open(null);
    IWorkbenchPart explorer = Workbench.page().showView("org.eclipse.ui.navigator.ProjectExplorer");
    ((ISetSelectionTarget) explorer).selectReveal(new StructuredSelection(project));
    Workbench.drain();
    EditorTests.execute("org.spanloom.ui.enableChecks");
    Workbench.waitUntil("the nature", () -> ModelNature.isOn(project));
    assertEquals(1, project.getDescription().getBuildSpec().length);
  }
}
