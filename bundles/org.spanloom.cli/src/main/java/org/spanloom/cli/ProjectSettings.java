/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.analysis.settings.SettingsReader;

/**
 * The settings that hold for model files; each settings file is read, and its mistakes told, once.
 */
final class ProjectSettings {

  private final Optional<Path> named;
  private final Map<Path, Settings> known = new HashMap<>();
  private final List<String> problems = new ArrayList<>();

  /**
   * Starts.
   *
   * @param named the file that holds for all models; if empty, each model's project decides
   */
  ProjectSettings(Optional<Path> named) {
    this.named = named;
  }

  /** Returns the settings that hold for a model file. */
  Settings of(Path model) {
    return named
        .or(() -> SettingsReader.find(model))
        .map(file -> known.computeIfAbsent(file, this::read))
        .orElse(Settings.DEFAULTS);
  }

  /**
   * Returns the settings that hold for one model file.
   *
   * @throws CommandFailure if there is a mistake in them
   */
  static Settings required(Path model) throws CommandFailure {
    ProjectSettings settings = new ProjectSettings(Optional.empty());
    Settings found = settings.of(model);
    if (!settings.problems().isEmpty()) {
      throw CommandFailure.refused(settings.problems().getFirst());
    }
    return found;
  }

  /** Returns a message for each mistake in the files read so far. */
  List<String> problems() {
    return List.copyOf(problems);
  }

  private Settings read(Path file) {
    SettingsReader.Result result = SettingsReader.read(file);
    problems.addAll(result.problems());
    return result.settings();
  }
}
