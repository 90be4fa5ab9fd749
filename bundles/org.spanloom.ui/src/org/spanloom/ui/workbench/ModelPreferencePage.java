/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.workbench;

import org.eclipse.jface.preference.BooleanFieldEditor;
import org.eclipse.jface.preference.FieldEditorPreferencePage;
import org.eclipse.swt.SWT;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.swt.widgets.Link;
import org.eclipse.ui.IWorkbench;
import org.eclipse.ui.IWorkbenchPreferencePage;
import org.eclipse.ui.PlatformUI;
import org.eclipse.ui.dialogs.PreferencesUtil;
import org.spanloom.ui.UiIds;

/** General preferences, with the way to the colours. */
public final class ModelPreferencePage extends FieldEditorPreferencePage
    implements IWorkbenchPreferencePage {

  private static final String COLOURS_PAGE = "org.eclipse.ui.preferencePages.ColorsAndFonts";
  private static final String SHOW_CATEGORY = "selectCategory:org.spanloom.ui.colours";

  /** Called by the workbench. */
  public ModelPreferencePage() {
    super(GRID);
  }

  @Override
  public void init(IWorkbench workbench) {
    setPreferenceStore(PreferenceDefaults.store());
    setDescription(
        "Settings that change results belong to a project and stand in its file"
            + " spanloom.settings.");
  }

  @Override
  public void createControl(Composite parent) {
    super.createControl(parent);
    PlatformUI.getWorkbench().getHelpSystem().setHelp(getControl(), UiIds.PREFERENCES_HELP);
  }

  @Override
  protected void createFieldEditors() {
    Composite parent = getFieldEditorParent();
    addField(
        new BooleanFieldEditor(
            PreferenceDefaults.SOLVE_WHILE_TYPING,
            "&Solve again while a model is being typed",
            parent));
    addField(
        new BooleanFieldEditor(
            PreferenceDefaults.MATCHING_BRACKETS, "&Mark the matching bracket", parent));
    Link colours = new Link(parent, SWT.NONE);
    colours.setText("Colours of text and plots: see <a>Colors and Fonts</a>.");
    colours.addListener(
        SWT.Selection,
        e ->
            PreferencesUtil.createPreferenceDialogOn(
                getShell(), COLOURS_PAGE, null, SHOW_CATEGORY));
  }
}
