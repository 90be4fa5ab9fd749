/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.settings;

import java.io.IOException;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * Reads the settings file of a project: lines {@code key = value}, {@code #} starts a comment.
 *
 * <p>The command line and the workbench find the file by the same rule: the nearest folder, from
 * the model's own upwards, that holds one.
 */
public final class SettingsReader {

  private static final long LARGEST = 1 << 20;

  private SettingsReader() {}

  /**
   * What was read.
   *
   * @param settings the settings; a line that could not be read leaves the default
   * @param problems one message for each such line, with the line number
   */
  public record Result(Settings settings, List<String> problems) {
    /** Copies the list. */
    public Result {
      problems = List.copyOf(problems);
    }
  }

  /**
   * Finds the settings file that holds for a model file.
   *
   * @param model a model file
   * @return the file, if any folder above holds one
   */
  public static Optional<Path> find(Path model) {
    for (Path folder = model.toAbsolutePath().normalize().getParent();
        folder != null;
        folder = folder.getParent()) {
      Path file = folder.resolve(Settings.FILE_NAME);
      if (Files.isRegularFile(file)) {
        return Optional.of(file);
      }
    }
    return Optional.empty();
  }

  /**
   * Reads a settings file.
   *
   * @param file the file
   * @return what it says; a file that cannot be read gives the defaults and a problem
   */
  public static Result read(Path file) {
    try {
      if (Files.size(file) > LARGEST) {
        return new Result(Settings.DEFAULTS, List.of(file + ": larger than 1 MiB, not read"));
      }
      return parse(file.toString(), Files.readString(file, StandardCharsets.UTF_8));
    } catch (CharacterCodingException e) {
      return new Result(Settings.DEFAULTS, List.of(file + ": not UTF-8 text, not read"));
    } catch (IOException e) {
      return new Result(Settings.DEFAULTS, List.of(file + ": cannot be read"));
    }
  }

  /**
   * Reads the text of a settings file.
   *
   * @param name name of the file for messages
   * @param text its text
   */
  public static Result parse(String name, String text) {
    Settings settings = Settings.DEFAULTS;
    List<String> problems = new ArrayList<>();
    List<String> lines = text.lines().toList();
    for (int i = 0; i < lines.size(); i++) {
      String line = lines.get(i).replaceFirst("#.*", "").strip();
      if (line.isEmpty()) {
        continue;
      }
      String place = name + ":" + (i + 1) + ": ";
      int sign = line.indexOf('=');
      Optional<SettingKey> key =
          SettingKey.named(sign < 0 ? line : line.substring(0, sign).strip());
      if (sign < 0 || key.isEmpty()) {
        problems.add(
            place
                + "'"
                + line
                + "' is not a setting; write one of "
                + Arrays.stream(SettingKey.values())
                    .map(k -> k.key() + " = NUMBER")
                    .collect(Collectors.joining(", ")));
        continue;
      }
      double value = number(line.substring(sign + 1).strip());
      if (!(key.get().least() <= value && value <= key.get().most())) {
        problems.add(
            String.format(
                Locale.ROOT,
                "%s%s must be a number from %s to %s",
                place,
                key.get().key(),
                key.get().least(),
                key.get().most()));
        continue;
      }
      settings = key.get().put(settings, value);
    }
    return new Result(settings, problems);
  }

  private static double number(String text) {
    try {
      return Double.parseDouble(text);
    } catch (NumberFormatException e) {
      return Double.NaN;
    }
  }
}
