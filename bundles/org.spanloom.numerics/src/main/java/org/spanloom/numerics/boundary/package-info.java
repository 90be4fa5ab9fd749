/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Boundary-value problems: n conditions at two or more times instead of n initial values.
 *
 * <pre>
 * LinearSystem, conditions --> MeshRefinement --> BoundaryAnswer: one solution, none, or a family
 *                                  |  each mesh
 *                                  v
 *              StepPropagator per step --> Chain between conditions --> singular values
 * </pre>
 *
 * <p>{@link org.spanloom.numerics.boundary.BoundarySolver} is the door.
 */
package org.spanloom.numerics.boundary;
