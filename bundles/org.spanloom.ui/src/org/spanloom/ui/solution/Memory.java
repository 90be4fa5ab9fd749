/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.Map;
import java.util.Optional;
import java.util.SequencedSet;
import org.spanloom.analysis.solve.SolutionTable;

/** Remembers, while the view is open, what was chosen for each file and each of its systems. */
final class Memory {

  private static final int FIRST_SHOWN = 6;
  private static final int FIRST_UNITS = 2;

  private final Map<String, Choice> choices = new HashMap<>();
  private final Map<String, SequencedSet<String>> columns = new HashMap<>();
  private final Map<String, PlotAxes> axes = new HashMap<>();

  Optional<Choice> choice(String file) {
    return Optional.ofNullable(choices.get(file));
  }

  void remember(String file, Choice choice) {
    choices.put(file, choice);
  }

  /** Returns the columns to show; at first a few, in at most two units. */
  SequencedSet<String> columns(String file, SolutionTable table) {
    SequencedSet<String> known = columns.get(key(file, table));
    return known != null ? known : firstColumns(table);
  }

  private static SequencedSet<String> firstColumns(SolutionTable table) {
    SequencedSet<String> units = new LinkedHashSet<>();
    SequencedSet<String> names = new LinkedHashSet<>();
    for (SolutionTable.Column column : table.columns()) {
      boolean fits = units.contains(column.unit()) || units.size() < FIRST_UNITS;
      if (fits && names.size() < FIRST_SHOWN) {
        units.add(column.unit());
        names.add(column.name());
      }
    }
    return names;
  }

  void remember(String file, SolutionTable table, SequencedSet<String> chosen) {
    columns.put(key(file, table), chosen);
  }

  PlotAxes axes(String file, SolutionTable table) {
    return axes.getOrDefault(key(file, table), new PlotAxes("", Optional.empty()));
  }

  void remember(String file, SolutionTable table, PlotAxes chosen) {
    axes.put(key(file, table), chosen);
  }

  private static String key(String file, SolutionTable table) {
    return file + "\n" + table.system();
  }
}
