/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.workbench;

import org.eclipse.core.runtime.preferences.AbstractPreferenceInitializer;
import org.eclipse.core.runtime.preferences.InstanceScope;
import org.eclipse.jface.preference.IPreferenceStore;
import org.eclipse.jface.preference.PreferenceConverter;
import org.eclipse.swt.graphics.RGB;
import org.eclipse.ui.preferences.ScopedPreferenceStore;
import org.spanloom.ui.UiIds;

/**
 * Our preferences and their defaults. Colours of text and plots are colour definitions and not kept
 * here.
 */
public final class PreferenceDefaults extends AbstractPreferenceInitializer {

  /** Whether the bracket that belongs to the one at the caret is marked. */
  public static final String MATCHING_BRACKETS = "matchingBrackets";

  /** The colour of that mark. */
  public static final String MATCHING_BRACKETS_COLOUR = "matchingBracketsColour";

  /** Whether the Solution view solves by itself when the text changes. */
  public static final String SOLVE_WHILE_TYPING = "solveWhileTyping";

  private static final RGB GREY = new RGB(140, 140, 140);

  /** Returns the store of our preferences. */
  public static IPreferenceStore store() {
    return new ScopedPreferenceStore(InstanceScope.INSTANCE, UiIds.BUNDLE);
  }

  @Override
  public void initializeDefaultPreferences() {
    IPreferenceStore store = store();
    store.setDefault(MATCHING_BRACKETS, true);
    PreferenceConverter.setDefault(store, MATCHING_BRACKETS_COLOUR, GREY);
    store.setDefault(SOLVE_WHILE_TYPING, true);
  }
}
