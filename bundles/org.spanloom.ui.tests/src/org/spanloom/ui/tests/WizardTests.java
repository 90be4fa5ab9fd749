/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.resources.ResourcesPlugin;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IPath;
import org.eclipse.jface.text.ITextSelection;
import org.eclipse.jface.viewers.IStructuredSelection;
import org.eclipse.jface.viewers.StructuredSelection;
import org.eclipse.jface.wizard.IWizardPage;
import org.eclipse.jface.wizard.WizardDialog;
import org.eclipse.swt.widgets.Text;
import org.eclipse.ui.INewWizard;
import org.eclipse.ui.PlatformUI;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.RegisterExtension;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.spanloom.analysis.CheckReport;
import org.spanloom.analysis.ModelCheck;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.analysis.settings.SettingsReader;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.text.SourceText;
import org.spanloom.numerics.Progress;
import org.spanloom.ui.UiIds;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.ui.wizards.Templates;
import org.spanloom.workspace.Ids;
import org.spanloom.workspace.ModelNature;

/** New projects and files, and what they start with. */
class WizardTests {

  @RegisterExtension final Workbench workbench = new Workbench();

  private static WizardDialog open(String id, IStructuredSelection selection) throws Exception {
    INewWizard wizard =
        (INewWizard) PlatformUI.getWorkbench().getNewWizardRegistry().findWizard(id).createWizard();
    wizard.init(PlatformUI.getWorkbench(), selection);
    WizardDialog dialog = new WizardDialog(Workbench.shell(), wizard);
    dialog.setBlockOnOpen(false);
    dialog.create();
    dialog.open();
    Workbench.drain();
    return dialog;
  }

  private static void enter(IWizardPage page, String old, String text) {
    Text field =
        Workbench.find(Text.class, page.getControl()).stream()
            .filter(t -> t.getText().equals(old) && t.isEnabled())
            .findFirst()
            .orElseThrow(() -> new AssertionError("no field holds '" + old + "'"));
    field.setText(text);
    Workbench.drain();
  }

  private static void finish(WizardDialog dialog) {
    IWizardPage page = dialog.getCurrentPage();
    assertTrue(page.isPageComplete(), () -> "the page says: " + page.getErrorMessage());
    assertTrue(page.getWizard().performFinish());
    dialog.close();
    Workbench.drain();
  }

  @Test
  void makesAProjectThatIsCheckedAndOpensItsModel() throws Exception {
    WizardDialog dialog = open(UiIds.NEW_PROJECT_WIZARD, StructuredSelection.EMPTY);
    assertFalse(dialog.getCurrentPage().isPageComplete(), "a project needs a name");
    enter(dialog.getCurrentPage(), "", "skerry");
    finish(dialog);
    Workbench.waitForJobs();
    IProject project = ResourcesPlugin.getWorkspace().getRoot().getProject("skerry");
    assertTrue(ModelNature.isOn(project));
    for (String name : List.of("spanloom.settings", "README.md", "drying-room.span")) {
      assertTrue(project.getFile(IPath.fromOSString(name)).exists(), name);
    }
    ModelEditor editor = assertInstanceOf(ModelEditor.class, Workbench.page().getActiveEditor());
    assertEquals("drying-room.span", editor.getTitle());
    Workbench.waitUntil("the basis of the first model", () -> markerCount(project, Ids.BASIS) == 1);
    assertEquals(List.of(), Workbench.markers(project, Ids.PROBLEM));
    assertEquals(UiIds.PERSPECTIVE, Workbench.page().getPerspective().getId());
  }

  private static int markerCount(IResource resource, String type) {
    try {
      return Workbench.markers(resource, type).size();
    } catch (CoreException e) {
      throw new AssertionError(e);
    }
  }

  @Test
  void makesAModelFileWithItsNameSelected() throws Exception {
    IProject project = Workbench.project("station");
    WizardDialog dialog = open(UiIds.NEW_MODEL_WIZARD, new StructuredSelection(project));
    enter(dialog.getCurrentPage(), "model.span", "tide-gauge 2.span");
    finish(dialog);
    IFile file = project.getFile(IPath.fromOSString("tide-gauge 2.span"));
    assertTrue(file.exists());
    ModelEditor editor = assertInstanceOf(ModelEditor.class, Workbench.page().getActiveEditor());
    ITextSelection selection = (ITextSelection) editor.getSelectionProvider().getSelection();
    assertEquals("TideGauge2", selection.getText());
    Workbench.waitForModel(editor);
    assertEquals(List.of(), EditorTests.problems(editor));
  }

  @ParameterizedTest
  @EnumSource(
      value = Templates.class,
      names = {"DRYING_ROOM", "MODEL"})
  void modelsToStartWithAreClean(Templates template) {
    CheckReport report =
        ModelCheck.check(
            ModelReader.read(new SourceText(template.name(), template.text())),
            Settings.DEFAULTS,
            Progress.NONE);
    assertEquals(
        List.of(), report.findings().stream().filter(f -> f.severity() != Severity.NOTE).toList());
  }

  @Test
  void settingsToStartWithNameEveryDefault() {
    String commented = Templates.SETTINGS.text();
    assertEquals(Settings.DEFAULTS, SettingsReader.parse("", commented).settings());
    StringBuilder active = new StringBuilder();
    commented
        .lines()
        .filter(l -> l.matches("# [a-z.]+ = .*"))
        .forEach(l -> active.append(l.substring(2)).append('\n'));
    SettingsReader.Result read = SettingsReader.parse("", active.toString());
    assertEquals(List.of(), read.problems());
    Settings defaults = Settings.DEFAULTS;
    assertEquals(defaults.digitsLeast(), read.settings().digitsLeast());
    assertEquals(defaults.windowCondition(), read.settings().windowCondition());
    assertEquals(defaults.basisAccuracy(), read.settings().basisAccuracy());
    assertEquals(defaults.residualLimit(), read.settings().residualLimit());
  }
}
