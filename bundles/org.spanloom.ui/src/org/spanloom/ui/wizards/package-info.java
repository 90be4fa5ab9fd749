/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * New projects and model files. What they start with stands as text files in the folder {@code
 * templates}; a test checks every one of them.
 */
package org.spanloom.ui.wizards;
