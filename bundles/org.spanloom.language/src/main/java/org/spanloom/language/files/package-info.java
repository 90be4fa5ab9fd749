/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * How a model reaches the other files of its project, without knowing where they are kept.
 *
 * <p>Names of files are resolved by {@link org.spanloom.language.files.FileKey}; what lies there is
 * asked of {@link org.spanloom.language.files.ProjectFiles}, which the command line answers from
 * disk and the workbench from its resources.
 */
package org.spanloom.language.files;
