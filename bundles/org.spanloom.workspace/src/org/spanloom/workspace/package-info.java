/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Model files in an Eclipse workspace, without a screen.
 *
 * <p>A project with the {@linkplain org.spanloom.workspace.ModelNature nature} is watched by the
 * {@linkplain org.spanloom.workspace.ModelBuilder builder}. Whenever a model file or the settings
 * change, the file is read ({@link org.spanloom.workspace.ModelFile}), checked, and its findings
 * are written as markers ({@link org.spanloom.workspace.FindingMarkers}):
 *
 * <pre>
 *   file -- ModelFile --&gt; SourceText -- ModelReader, ModelCheck --&gt; CheckReport -- FindingMarkers --&gt; markers
 * </pre>
 *
 * <p>{@link org.spanloom.workspace.HeadlessCheck} does the same for one directory and ends; {@link
 * org.spanloom.workspace.ProjectImport} takes directories into the workspace where they stand.
 */
package org.spanloom.workspace;
