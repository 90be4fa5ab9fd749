/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * What the coefficients tell without solving: eigenvalues with the errors they may have ({@link
 * org.spanloom.numerics.spectrum.Spectrum}), modes with their conditions and the states in them
 * ({@link org.spanloom.numerics.spectrum.Modes}), equilibria ({@link
 * org.spanloom.numerics.spectrum.Equilibrium}), logarithmic norms, and for periodic coefficients
 * the multipliers ({@link org.spanloom.numerics.spectrum.FloquetMultipliers}).
 */
package org.spanloom.numerics.spectrum;
