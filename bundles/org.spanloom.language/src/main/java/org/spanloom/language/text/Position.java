/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.text;

/**
 * A place as people read it.
 *
 * @param line line number, from 1
 * @param column character of the line, from 1
 */
public record Position(int line, int column) {}
