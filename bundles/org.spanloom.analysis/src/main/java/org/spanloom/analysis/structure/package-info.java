/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/** Which state depends on which, by the pattern of A alone: no number is computed. */
package org.spanloom.analysis.structure;
