/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Tests of the command line by its own door: arguments go in; exit code, standard output and
 * standard error come out. {@code CommandRun} runs it inside the test's virtual machine, {@code
 * WholeProcessTests} in one of its own.
 */
package org.spanloom.cli;
