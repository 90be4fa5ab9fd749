/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import org.spanloom.language.text.Span;

/**
 * A unit as written.
 *
 * @param code what stands between the brackets
 * @param span its place, with the brackets
 */
public record UnitText(String code, Span span) {}
