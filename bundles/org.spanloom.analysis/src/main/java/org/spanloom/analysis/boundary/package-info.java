/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Boundary-value problems of models: {@link org.spanloom.analysis.boundary.BoundaryCheck} for a
 * check, {@link org.spanloom.analysis.boundary.BoundarySolve} for a listing on request.
 */
package org.spanloom.analysis.boundary;
