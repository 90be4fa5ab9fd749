/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/** Tests of paths inside of a project. */
package org.spanloom.language.files;
