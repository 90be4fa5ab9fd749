/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import org.spanloom.language.text.Span;

/**
 * A text in quotation marks, such as the path of a file.
 *
 * @param text what stands between the marks
 * @param span its place, with the marks
 */
public record QuotedText(String text, Span span) {}
