/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/** Benchmarks: the models they run on, and what is measured beside what. */
package org.spanloom.benchmarks;
