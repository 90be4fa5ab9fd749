/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * How far the bases of a system can be trusted: {@link org.spanloom.analysis.basis.BasisCheck} for
 * a check, {@link org.spanloom.analysis.basis.BasisSolve} for a listing on request.
 */
package org.spanloom.analysis.basis;
