/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Ways to mend a finding. One plain {@link org.spanloom.language.problem.Fix} serves the light bulb
 * of the editor, the marker views and Ctrl+1; {@link org.spanloom.ui.fixes.FixApplication} is the
 * only place that applies one.
 */
package org.spanloom.ui.fixes;
