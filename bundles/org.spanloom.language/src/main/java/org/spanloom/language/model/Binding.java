/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.syntax.Expression;

/**
 * An expression with the frame whose names it uses: of a parameter, an input or an initial value of
 * a part it may stand in the surrounding system.
 */
record Binding(Frame frame, Expression value) {}
