/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.problem.Nearest;

/**
 * The names that can be used at some place: those of a system, and around them those of the file.
 */
final class Scope {

  private final Optional<Scope> outer;
  private final Map<String, Entry> meanings = new LinkedHashMap<>();
  private String timeName = "";

  /** What a name stands for, and whether it is used. */
  private static final class Entry {
    private Meaning meaning;
    private boolean used;
  }

  Scope(Optional<Scope> outer) {
    this.outer = outer;
  }

  void define(String name, Meaning meaning) {
    meanings.computeIfAbsent(name, n -> new Entry()).meaning = meaning;
    if (meaning instanceof Meaning.TimeMeaning) {
      timeName = name;
    }
  }

  /** Returns the name of the independent variable; empty outside of systems. */
  String timeName() {
    return timeName;
  }

  /** Returns what a name stands for and notes that it is used. */
  Optional<Meaning> use(String name) {
    Entry entry = meanings.get(name);
    if (entry != null) {
      entry.used = true;
      return Optional.of(entry.meaning);
    }
    return outer.flatMap(o -> o.use(name));
  }

  /** Returns what a name of this very scope stands for, without using it. */
  Optional<Meaning> own(String name) {
    return Optional.ofNullable(meanings.get(name)).map(entry -> entry.meaning);
  }

  /** Tells whether a name is declared further out. */
  boolean isDeclaredOutside(String name) {
    return outer.isPresent() && (outer.get().meanings.containsKey(name));
  }

  void markUsed(String name) {
    Entry entry = meanings.get(name);
    if (entry != null) {
      entry.used = true;
    } else {
      outer.ifPresent(o -> o.markUsed(name));
    }
  }

  boolean isUsed(String name) {
    Entry entry = meanings.get(name);
    return entry != null && entry.used;
  }

  /** Returns the declared name, function or constant nearest to a word. */
  Optional<String> nearest(String word) {
    List<String> names = new ArrayList<>(meanings.keySet());
    outer.ifPresent(o -> names.addAll(o.meanings.keySet()));
    for (Function function : Function.values()) {
      names.add(function.code());
    }
    for (NamedConstant constant : NamedConstant.values()) {
      names.add(constant.code());
    }
    for (MatrixFunction function : MatrixFunction.values()) {
      names.add(function.code());
    }
    return Nearest.of(word, names);
  }
}
