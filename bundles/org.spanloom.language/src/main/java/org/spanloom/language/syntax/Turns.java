/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import org.spanloom.language.text.Span;

/**
 * {@code i from 2 to 399}: an index and the whole numbers it runs through, ends included. There is
 * one turn for each.
 *
 * @param index the name of the index
 * @param from the first number
 * @param to the last number; there are no turns if it is smaller than the first
 * @param span its place
 */
public record Turns(Name index, Expression from, Expression to, Span span) {}
