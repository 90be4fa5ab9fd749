/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * What can be wrong with a model's text, as data.
 *
 * <p>A {@link org.spanloom.language.problem.Problem} has a {@link
 * org.spanloom.language.problem.ProblemKind kind} with a stable id, a place, a message that says
 * what was found, what was expected and what to do, and, where there is an obvious one, a {@link
 * org.spanloom.language.problem.Fix}.
 */
package org.spanloom.language.problem;
