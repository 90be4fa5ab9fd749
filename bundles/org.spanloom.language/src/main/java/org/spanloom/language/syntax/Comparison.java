/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import org.spanloom.language.text.Span;

/**
 * Two expressions with a sign such as {@code <} between them.
 *
 * @param left the left side
 * @param sign one of the four signs of comparison
 * @param right the right side
 * @param span its place
 */
public record Comparison(Expression left, TokenKind sign, Expression right, Span span) {}
