/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Colours. They are colour definitions in plugin.xml, so that the page "Colors and Fonts" can
 * change them, and the dark theme replaces them by its stylesheet. {@link
 * org.spanloom.ui.theme.ThemeColours} reads them and tells of changes.
 */
package org.spanloom.ui.theme;
