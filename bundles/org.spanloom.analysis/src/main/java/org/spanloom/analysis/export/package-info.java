/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Coefficients and fundamental matrices for other programs: {@link
 * org.spanloom.analysis.export.Export} takes them out of a model.
 */
package org.spanloom.analysis.export;
