/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/** What the workbench as a whole needs: perspective, start, project set-up, preferences. */
package org.spanloom.ui.workbench;
