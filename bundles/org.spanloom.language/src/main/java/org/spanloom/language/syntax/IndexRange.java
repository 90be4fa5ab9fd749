/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import org.spanloom.language.text.Span;

/**
 * {@code 1..400} in the declaration of a family.
 *
 * @param from the smallest index
 * @param to the largest index
 * @param span its place, without brackets
 */
public record IndexRange(Expression from, Expression to, Span span) {}
