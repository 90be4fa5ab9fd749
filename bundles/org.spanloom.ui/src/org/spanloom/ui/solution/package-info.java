/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * The Solution view: curves and a table of values of one system of the active editor's model.
 *
 * <pre>
 *   ModelSnapshot --&gt; SolutionView -- SolveJob --&gt; SolutionTable --&gt; Curves --&gt; SolutionPlot, ValueTable
 * </pre>
 *
 * <p>{@link org.spanloom.ui.solution.SolutionView} follows the editor and keeps at most one {@link
 * org.spanloom.ui.solution.SolveJob}: a newer wish cancels the older, and what arrives too late is
 * dropped. The chart is plain; {@link org.spanloom.ui.solution.PlotController} gives it zoom, pan,
 * cursor and keys. All colours are ours ({@link org.spanloom.ui.solution.PlotPalette}), because the
 * chart's own ignore the theme.
 */
package org.spanloom.ui.solution;
