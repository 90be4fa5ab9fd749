/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import org.spanloom.analysis.settings.Settings;
import org.spanloom.language.model.Model;
import org.spanloom.numerics.Progress;

/** Checks a whole model: text, well-posedness, bases, requirements. */
public final class ModelCheck {

  private ModelCheck() {}

  /**
   * Checks.
   *
   * @param model the model as read
   * @param settings thresholds of the project
   * @param progress watched and asked while working
   * @return everything found; never throws for a model that is wrong
   */
  public static CheckReport check(Model model, Settings settings, Progress progress) {
    throw new IllegalStateException();
  }
}
