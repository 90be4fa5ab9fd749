/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.problem;

import org.spanloom.language.text.Span;

/**
 * A change of text.
 *
 * @param span what is replaced; empty for an insertion
 * @param replacement the new text
 */
public record TextEdit(Span span, String replacement) {}
