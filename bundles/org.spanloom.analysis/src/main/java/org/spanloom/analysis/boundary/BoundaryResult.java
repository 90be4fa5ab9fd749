/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.boundary;

import java.util.Optional;
import org.spanloom.analysis.solve.SolutionTable;

/**
 * A boundary-value problem, decided.
 *
 * @param report what was found
 * @param table the solution, or the smallest one where there are many; empty where there is none
 */
public record BoundaryResult(BoundaryReport report, Optional<SolutionTable> table) {}
