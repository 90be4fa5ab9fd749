/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Spectra of models: {@link org.spanloom.analysis.spectrum.SpectrumSolve} takes a request and gives
 * eigenvalues with their modes, or the multipliers of a periodic system.
 */
package org.spanloom.analysis.spectrum;
