/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/** Tests of files on disk. */
package org.spanloom.analysis.files;
