/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/** Eigenvalues with the errors they may have: {@link org.spanloom.numerics.spectrum.Spectrum}. */
package org.spanloom.numerics.spectrum;
