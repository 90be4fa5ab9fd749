/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.workbench;

import org.eclipse.ui.IFolderLayout;
import org.eclipse.ui.IPageLayout;
import org.eclipse.ui.IPerspectiveFactory;
import org.spanloom.ui.UiIds;

/**
 * Projects and outline at the left, the editor in the middle, the solution at the right, findings
 * below.
 */
public final class ModelPerspective implements IPerspectiveFactory {

  private static final String PROJECT_EXPLORER = "org.eclipse.ui.navigator.ProjectExplorer";
  private static final String PROGRESS = "org.eclipse.ui.views.ProgressView";
  private static final String SEARCH = "org.eclipse.search.ui.views.SearchView";
  private static final String ERROR_LOG = "org.eclipse.pde.runtime.LogView";

  @Override
  public void createInitialLayout(IPageLayout layout) {
    String editors = layout.getEditorArea();
    IFolderLayout projects = layout.createFolder("projects", IPageLayout.LEFT, 0.18f, editors);
    projects.addView(PROJECT_EXPLORER);
    IFolderLayout outline = layout.createFolder("outline", IPageLayout.BOTTOM, 0.55f, "projects");
    outline.addView(IPageLayout.ID_OUTLINE);
    IFolderLayout findings = layout.createFolder("findings", IPageLayout.BOTTOM, 0.72f, editors);
    findings.addView(UiIds.BASIS_FINDINGS_VIEW);
    findings.addView(IPageLayout.ID_PROBLEM_VIEW);
    findings.addPlaceholder(PROGRESS);
    findings.addPlaceholder(SEARCH);
    findings.addPlaceholder(ERROR_LOG);
    IFolderLayout solution = layout.createFolder("solution", IPageLayout.RIGHT, 0.5f, editors);
    solution.addView(UiIds.SOLUTION_VIEW);

    layout.addNewWizardShortcut(UiIds.NEW_PROJECT_WIZARD);
    layout.addNewWizardShortcut(UiIds.NEW_MODEL_WIZARD);
    layout.addNewWizardShortcut("org.eclipse.ui.wizards.new.folder");
    layout.addShowViewShortcut(UiIds.SOLUTION_VIEW);
    layout.addShowViewShortcut(UiIds.BASIS_FINDINGS_VIEW);
    layout.addShowViewShortcut(IPageLayout.ID_PROBLEM_VIEW);
    layout.addShowViewShortcut(IPageLayout.ID_OUTLINE);
    layout.addShowViewShortcut(PROJECT_EXPLORER);
    layout.addShowViewShortcut(PROGRESS);
  }
}
