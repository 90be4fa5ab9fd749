/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.theme;

import java.util.Optional;
import org.eclipse.jface.util.IPropertyChangeListener;
import org.eclipse.swt.graphics.Color;
import org.eclipse.swt.widgets.Display;
import org.eclipse.ui.PlatformUI;
import org.eclipse.ui.themes.IThemeManager;

/** Reads the colours of the current theme. To be used on the user interface thread. */
public final class ThemeColours {

  private ThemeColours() {}

  /**
   * Returns a colour; it belongs to the theme and must not be disposed. Empty while the theme does
   * not know it.
   */
  public static Optional<Color> find(ThemeColour colour) {
    return Optional.ofNullable(themes().getCurrentTheme().getColorRegistry().get(colour.id()));
  }

  /** Returns a colour, black where the theme does not know it. */
  public static Color get(ThemeColour colour) {
    return find(colour).orElseGet(() -> new Color(0, 0, 0));
  }

  /**
   * Calls back after our colours changed: once for a burst of changes, such as a switch of the
   * theme makes.
   *
   * @param changed called on the user interface thread
   * @return ends the listening
   */
  public static Runnable onChange(Runnable changed) {
    Burst burst = new Burst(Display.getCurrent(), changed);
    IPropertyChangeListener listener =
        event -> {
          boolean themeSwitched = event.getProperty().equals(IThemeManager.CHANGE_CURRENT_THEME);
          if (themeSwitched || ThemeColour.isOurs(event.getProperty())) {
            burst.add();
          }
        };
    IThemeManager themes = themes();
    themes.addPropertyChangeListener(listener);
    return () -> {
      burst.end();
      themes.removePropertyChangeListener(listener);
    };
  }

  private static IThemeManager themes() {
    return PlatformUI.getWorkbench().getThemeManager();
  }

  /** Turns many changes in one turn of the event loop into one call. */
  private static final class Burst {

    private final Display display;
    private final Runnable changed;
    private boolean pending;
    private boolean ended;

    Burst(Display display, Runnable changed) {
      this.display = display;
      this.changed = changed;
    }

    void add() {
      if (!pending && !ended && !display.isDisposed()) {
        pending = true;
        display.asyncExec(() -> {
          pending = false;
          if (!ended) {
            changed.run();
          }
        });
      }
    }

    void end() {
      ended = true;
    }
  }
}
