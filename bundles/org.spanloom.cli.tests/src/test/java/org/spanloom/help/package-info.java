/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * The help pages against the program: {@link org.spanloom.help.HelpPagesTests} holds that the pages
 * are whole, {@link org.spanloom.help.HelpTruthTests} that they say what the program does.
 */
package org.spanloom.help;
