/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.eclipse.core.resources.IContainer;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IWorkspaceRoot;
import org.eclipse.core.runtime.IPath;
import org.spanloom.analysis.Finding;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.analysis.settings.SettingsReader;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/** Finds the settings that hold for a model file by the same rule as the command line. */
public final class ProjectSettings {

  private static final Pattern PLACED = Pattern.compile(":(\\d+): (.*)", Pattern.DOTALL);
  private static final String ID = "settings-not-read";

  private ProjectSettings() {}

  /**
   * Returns the settings for a model file: those of the nearest folder, from its own upwards, that
   * holds a settings file; the defaults where there is none or it cannot be read.
   */
  public static Settings of(IFile model) {
    Optional<IFile> inside = find(model);
    if (inside.isPresent()) {
      return switch (ModelFile.read(inside.get())) {
        case ModelFile.Content.Readable r ->
            SettingsReader.parse(r.text().name(), r.text().content()).settings();
        case ModelFile.Content.Unreadable u -> Settings.DEFAULTS;
      };
    }
    // A project may lie below the folder that holds the settings of a whole repository.
    IPath location = model.getProject().getLocation();
    return location == null
        ? Settings.DEFAULTS
        : SettingsReader.find(Path.of(location.toOSString()))
            .map(file -> SettingsReader.read(file).settings())
            .orElse(Settings.DEFAULTS);
  }

  /** Returns the lines of a settings file that could not be read, as findings. */
  public static List<Finding> findings(SourceText source) {
    List<Finding> findings = new ArrayList<>();
    for (String problem : SettingsReader.parse("", source.content()).problems()) {
      Matcher placed = PLACED.matcher(problem);
      int line = placed.matches() ? Integer.parseInt(placed.group(1)) : 1;
      String message = placed.matches() ? placed.group(2) : problem;
      Span span = source.lineSpan(Math.clamp(line, 1, source.lineCount()));
      findings.add(
          new Finding(ID, Severity.ERROR, span, message, new LinkedHashMap<>(), List.of()));
    }
    return findings;
  }

  private static Optional<IFile> find(IFile model) {
    for (IContainer folder = model.getParent();
        folder != null && !(folder instanceof IWorkspaceRoot);
        folder = folder.getParent()) {
      IFile file = folder.getFile(IPath.fromOSString(Settings.FILE_NAME));
      if (file.exists()) {
        return Optional.of(file);
      }
    }
    return Optional.empty();
  }
}
