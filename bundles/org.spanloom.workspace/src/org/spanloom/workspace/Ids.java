/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

/** Identifiers that plugin.xml gives and other bundles use. */
public final class Ids {

  /** The content type of model files. */
  public static final String MODEL_CONTENT_TYPE = "org.spanloom.model";

  /** The nature of projects whose models are checked. */
  public static final String NATURE = "org.spanloom.workspace.nature";

  /** The builder that checks them. */
  public static final String BUILDER = "org.spanloom.workspace.builder";

  /** Markers of findings; the sub-type for bases is {@link #BASIS_FINDING}. */
  public static final String PROBLEM = "org.spanloom.workspace.problem";

  /** Markers that tell about a basis, sound or not. */
  public static final String BASIS = "org.spanloom.workspace.basis";

  /** Markers of a basis that deserves attention; both a {@link #BASIS} and a {@link #PROBLEM}. */
  public static final String BASIS_FINDING = "org.spanloom.workspace.basisFinding";

  /** Markers of requirements with their results. */
  public static final String REQUIREMENT = "org.spanloom.workspace.requirement";

  private Ids() {}
}
