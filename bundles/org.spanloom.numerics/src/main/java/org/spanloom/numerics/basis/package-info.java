/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * How far a basis of the solutions can be trusted.
 *
 * <ul>
 *   <li>Is it one at all? {@link org.spanloom.numerics.basis.Dependence} looks at the columns at
 *       one time, {@link org.spanloom.numerics.basis.ClosedFormResidual} holds closed forms against
 *       the equations.
 *   <li>How well does it span? {@link org.spanloom.numerics.basis.ConditionProfile} follows
 *       singular values, condition numbers and the determinant along a range.
 *   <li>How often must it start anew? {@link org.spanloom.numerics.basis.Windows} counts.
 * </ul>
 */
package org.spanloom.numerics.basis;
