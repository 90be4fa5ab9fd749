/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * Initial value problems on request: {@link org.spanloom.analysis.solve.SolveRequest} says what,
 * {@link org.spanloom.analysis.solve.TrajectorySolve} does it, {@link
 * org.spanloom.analysis.solve.SolveAnswer} is the table or the reason why there is none. Times and
 * values are in declared units throughout.
 */
package org.spanloom.analysis.solve;
