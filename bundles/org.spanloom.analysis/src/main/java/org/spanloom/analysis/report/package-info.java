/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * A check as a document: {@link org.spanloom.analysis.report.TextReport} for people and {@link
 * org.spanloom.analysis.report.JsonReport} for machines. Both state the cautions.
 */
package org.spanloom.analysis.report;
