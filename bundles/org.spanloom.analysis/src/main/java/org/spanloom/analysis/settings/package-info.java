/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * The thresholds of a project: {@link org.spanloom.analysis.settings.Settings} with the reasons for
 * their defaults, and {@link org.spanloom.analysis.settings.SettingsReader} for the file under
 * version control that may change them.
 */
package org.spanloom.analysis.settings;
