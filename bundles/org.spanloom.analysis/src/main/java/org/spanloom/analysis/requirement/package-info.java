/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * Whether the stated requirements of a model hold, each with its margin and the error of that
 * margin: {@link org.spanloom.analysis.requirement.RequirementCheck} hands each form to the class
 * that judges it.
 */
package org.spanloom.analysis.requirement;
