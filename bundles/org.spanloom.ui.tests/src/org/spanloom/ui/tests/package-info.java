/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Tests in a running workbench. {@link org.spanloom.ui.tests.Workbench} pumps events until a wanted
 * result is there; nothing here waits for time to pass. Each test begins with an empty workspace
 * and fails on new errors in the log.
 */
package org.spanloom.ui.tests;
