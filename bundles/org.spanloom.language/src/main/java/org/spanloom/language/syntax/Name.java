/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import org.spanloom.language.text.Span;

/**
 * A name in the text, without primes.
 *
 * @param text the name; with points between its parts where it reaches into a part
 * @param span its place
 */
public record Name(String text, Span span) {}
