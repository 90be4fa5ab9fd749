/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * Model and numerics together: what can be said about a model.
 *
 * <pre>
 *  Model --coefficients--> LinearSystem --numerics--> solutions, conditioning
 *    |                                                    |
 *    +------------- ModelCheck: basis, requirement -------+--> CheckReport --report--> text, JSON
 *    +------------- solve: TrajectorySolve, basis: BasisSolve --> tables
 * </pre>
 *
 * {@link org.spanloom.analysis.ModelCheck} is the entry for a check. Nothing here knows Eclipse or
 * a file system, the reader of the settings file apart.
 */
package org.spanloom.analysis;
