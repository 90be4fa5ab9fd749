/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.settings;

import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalDouble;

/** The keys of the settings file. */
enum SettingKey {
  DIGITS_WANTED("digits.wanted", 1, 15) {
    @Override
    Settings put(Settings s, double value) {
      return new Settings(
          OptionalDouble.of(value),
          s.digitsLeast(),
          s.windowCondition(),
          s.basisAccuracy(),
          s.residualLimit());
    }
  },
  DIGITS_LEAST("digits.least", 0, 15) {
    @Override
    Settings put(Settings s, double value) {
      return new Settings(
          s.digitsWanted(), value, s.windowCondition(), s.basisAccuracy(), s.residualLimit());
    }
  },
  WINDOW_CONDITION("window.condition", 10, 1e15) {
    @Override
    Settings put(Settings s, double value) {
      return new Settings(
          s.digitsWanted(), s.digitsLeast(), value, s.basisAccuracy(), s.residualLimit());
    }
  },
  BASIS_ACCURACY("basis.accuracy", 1e-13, 1e-3) {
    @Override
    Settings put(Settings s, double value) {
      return new Settings(
          s.digitsWanted(), s.digitsLeast(), s.windowCondition(), value, s.residualLimit());
    }
  },
  RESIDUAL_LIMIT("residual.limit", 1e-14, 1e-2) {
    @Override
    Settings put(Settings s, double value) {
      return new Settings(
          s.digitsWanted(), s.digitsLeast(), s.windowCondition(), s.basisAccuracy(), value);
    }
  };

  private final String key;
  private final double least;
  private final double most;

  SettingKey(String key, double least, double most) {
    this.key = key;
    this.least = least;
    this.most = most;
  }

  String key() {
    return key;
  }

  double least() {
    return least;
  }

  double most() {
    return most;
  }

  /** Returns the settings with this key at a value. */
  abstract Settings put(Settings settings, double value);

  static Optional<SettingKey> named(String name) {
    return Arrays.stream(values()).filter(k -> k.key.equals(name)).findFirst();
  }
}
