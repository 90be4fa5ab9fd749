/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * Texts on disk: {@link org.spanloom.analysis.files.DiskFiles} for the files that a model of a
 * project may read, {@link org.spanloom.analysis.files.TextBytes} for what bytes say.
 */
package org.spanloom.analysis.files;
