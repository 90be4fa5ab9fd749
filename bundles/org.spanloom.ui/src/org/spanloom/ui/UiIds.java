/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui;

/** Identifiers that plugin.xml gives. */
public final class UiIds {

  /** This bundle. */
  public static final String BUNDLE = "org.spanloom.ui";

  /** The product. */
  public static final String PRODUCT = "org.spanloom.ui.product";

  /** The perspective. */
  public static final String PERSPECTIVE = "org.spanloom.ui.perspective";

  /** The editor of model files. */
  public static final String EDITOR = "org.spanloom.ui.editor";

  /** The key context of the editor. */
  public static final String EDITOR_SCOPE = "org.spanloom.ui.editorScope";

  /** The Solution view. */
  public static final String SOLUTION_VIEW = "org.spanloom.ui.solution";

  /** The Basis Findings view. */
  public static final String BASIS_FINDINGS_VIEW = "org.spanloom.ui.basisFindings";

  /** The wizard that makes a project. */
  public static final String NEW_PROJECT_WIZARD = "org.spanloom.ui.newProject";

  /** The wizard that makes a model file. */
  public static final String NEW_MODEL_WIZARD = "org.spanloom.ui.newModel";

  /** What F1 tells about the editor; see contexts.xml of the help. */
  public static final String EDITOR_HELP = "org.spanloom.help.editor";

  /** What F1 tells about the Solution view. */
  public static final String SOLUTION_HELP = "org.spanloom.help.solution";

  /** What F1 tells about the Basis Findings view. */
  public static final String BASIS_FINDINGS_HELP = "org.spanloom.help.basis_findings";

  /** What F1 tells about the wizard that makes a project. */
  public static final String NEW_PROJECT_HELP = "org.spanloom.help.new_project";

  /** What F1 tells about the preferences. */
  public static final String PREFERENCES_HELP = "org.spanloom.help.preferences";

  /** The family of our jobs, for {@code Job.belongsTo}. */
  public static final Object JOB_FAMILY = "org.spanloom";

  private UiIds() {}
}
