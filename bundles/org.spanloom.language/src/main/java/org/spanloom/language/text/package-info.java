/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * Texts, places in them and ranges of them.
 *
 * <p>A {@link org.spanloom.language.text.SourceText} is a file's text with its lines. Everything
 * read from it keeps a {@link org.spanloom.language.text.Span}; line and column are worked out
 * late, when a person asks.
 */
package org.spanloom.language.text;
