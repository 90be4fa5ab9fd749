/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.BiFunction;
import org.spanloom.language.problem.Nearest;

/**
 * The names that can be used at some place: those of a system, and around them those of the file.
 */
final class Scope {

  private final Optional<Scope> outer;
  private final Map<String, Entry> meanings = new LinkedHashMap<>();
  private String timeName = "";
  private boolean open;

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

  /** Notes that further names may belong here which could not be read. */
  void open() {
    open = true;
  }

  /** Tells whether a name that is not found may be one that could not be read. */
  boolean isOpen() {
    return open || outer.isPresent() && outer.get().isOpen();
  }

  /** Gives a name back the meaning it had before; none if there was none. */
  void restore(String name, Optional<Meaning> meaning) {
    if (meaning.isPresent()) {
      define(name, meaning.get());
    } else {
      meanings.remove(name);
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
    if (name.indexOf('.') > 0) {
      return inPart(name, Scope::useOwn);
    }
    return outer.flatMap(o -> o.use(name));
  }

  private Optional<Meaning> useOwn(String name) {
    return meanings.containsKey(name) || name.indexOf('.') > 0 ? use(name) : Optional.empty();
  }

  /**
   * Returns what a name of this very scope stands for, without using it. A dotted name is looked up
   * in the part that it begins with.
   */
  Optional<Meaning> own(String name) {
    Entry entry = meanings.get(name);
    if (entry != null) {
      return Optional.of(entry.meaning);
    }
    return name.indexOf('.') > 0 ? inPart(name, Scope::own) : Optional.empty();
  }

  /** Returns the frame of a part that this scope names. */
  Optional<Frame> part(String name) {
    Entry entry = meanings.get(name);
    return entry != null && entry.meaning instanceof Meaning.PartMeaning part
        ? Optional.of(part.frame())
        : Optional.empty();
  }

  /** Looks behind the first dot of a name, in the part before it; its time is nobody else's. */
  private Optional<Meaning> inPart(
      String name, BiFunction<Scope, String, Optional<Meaning>> lookUp) {
    int dot = name.indexOf('.');
    String head = name.substring(0, dot);
    Entry entry = meanings.get(head);
    if (entry != null && entry.meaning instanceof Meaning.BrokenMeaning) {
      return Optional.of(entry.meaning);
    }
    return part(head)
        .flatMap(frame -> lookUp.apply(frame.scope(), name.substring(dot + 1)))
        .filter(meaning -> !(meaning instanceof Meaning.TimeMeaning));
  }

  /** Tells whether a name is declared further out. */
  boolean isDeclaredOutside(String name) {
    return outer.isPresent() && (outer.get().meanings.containsKey(name));
  }

  /** Returns the first state declared. */
  Optional<String> firstState() {
    return meanings.entrySet().stream()
        .filter(entry -> entry.getValue().meaning instanceof Meaning.StateMeaning)
        .map(Map.Entry::getKey)
        .findFirst();
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
    int dot = word.indexOf('.');
    if (dot > 0) {
      String head = word.substring(0, dot);
      return part(head)
          .flatMap(part -> part.scope().nearestInPart(part, word.substring(dot + 1)))
          .map(name -> head + "." + name);
    }
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
    names.add(PulseTrain.NAME);
    return Nearest.of(word, names);
  }

  private Optional<String> nearestInPart(Frame part, String word) {
    if (word.indexOf('.') > 0) {
      return nearest(word);
    }
    Set<String> names = new LinkedHashSet<>(meanings.keySet());
    names.addAll(part.declarations().names());
    names.remove(timeName);
    return Nearest.of(word, names);
  }
}
