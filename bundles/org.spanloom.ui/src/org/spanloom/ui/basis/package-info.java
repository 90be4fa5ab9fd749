/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * The Basis Findings view: one line for each basis of the workspace's models, with the numbers that
 * say how far it can be trusted. The numbers are attributes of the builder's markers; here they are
 * parsed, sorted as numbers and shown.
 */
package org.spanloom.ui.basis;
