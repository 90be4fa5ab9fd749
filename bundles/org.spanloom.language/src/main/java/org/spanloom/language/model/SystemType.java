/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.syntax.Statement.SystemStatement;

/**
 * A system as something that parts can be copies of.
 *
 * @param statement its text
 * @param file the frame of the file that it stands in
 */
record SystemType(SystemStatement statement, Frame file) {}
