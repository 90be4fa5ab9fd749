/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * The workbench: an editor for model files, the Solution view, the Basis Findings view and wizards.
 *
 * <table>
 * <caption>Where to look</caption>
 * <tr><td>{@link org.spanloom.ui.editor}</td><td>the editor; it publishes what the text means while it is typed</td></tr>
 * <tr><td>{@link org.spanloom.ui.fixes}</td><td>ways to mend a finding, from the editor and from markers</td></tr>
 * <tr><td>{@link org.spanloom.ui.solution}</td><td>curves and a table of the solution of the active editor's model</td></tr>
 * <tr><td>{@link org.spanloom.ui.basis}</td><td>the list of bases and how far each can be trusted</td></tr>
 * <tr><td>{@link org.spanloom.ui.wizards}</td><td>new projects and model files</td></tr>
 * <tr><td>{@link org.spanloom.ui.theme}</td><td>colours of the current theme</td></tr>
 * <tr><td>{@link org.spanloom.ui.workbench}</td><td>perspective, start, preferences</td></tr>
 * </table>
 *
 * <p>Nothing here computes: models are read and solved by the plain bundles, in jobs, and the user
 * interface thread only shows results.
 */
package org.spanloom.ui;
