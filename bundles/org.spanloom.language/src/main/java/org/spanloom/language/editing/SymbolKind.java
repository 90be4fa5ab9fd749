/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

/** What a name can stand for. */
public enum SymbolKind {
  /** A system. */
  SYSTEM("system", Room.SYSTEMS),
  /** The independent variable of a system. */
  TIME("independent variable", Room.VALUES),
  /** A parameter. */
  PARAMETER("parameter", Room.VALUES),
  /** A named expression. */
  LET("named expression", Room.VALUES),
  /** An input. */
  INPUT("input", Room.VALUES),
  /** A state. */
  STATE("state", Room.VALUES),
  /** The index of a loop or sum. */
  INDEX("index", Room.VALUES),
  /** An output. */
  OUTPUT("output", Room.VALUES),
  /** A set of initial values. */
  INITIAL_VALUES("set of initial values", Room.CONDITIONS),
  /** A set of boundary conditions. */
  BOUNDARY("set of boundary conditions", Room.CONDITIONS),
  /** A matrix. */
  MATRIX("matrix", Room.VALUES),
  /** A part. */
  PART("part", Room.VALUES),
  /** A table. */
  TABLE("table", Room.VALUES),
  /** A candidate basis. */
  BASIS("basis", Room.BASES),
  /** A declaration that could not be read. */
  UNREAD("declaration that could not be read", Room.VALUES),
  /** A built-in function. */
  FUNCTION("built-in function", Room.VALUES),
  /** A built-in constant. */
  CONSTANT("built-in constant", Room.VALUES);

  /** Where a name is looked for: names of different rooms never meet. */
  enum Room {
    VALUES,
    SYSTEMS,
    CONDITIONS,
    BASES
  }

  private final String words;
  private final Room room;

  SymbolKind(String words, Room room) {
    this.words = words;
    this.room = room;
  }

  /** Returns what it is, in a few words. */
  public String words() {
    return words;
  }

  Room room() {
    return room;
  }

  /** Tells whether it belongs to the language and has no declaration. */
  public boolean isBuiltIn() {
    return this == FUNCTION || this == CONSTANT;
  }
}
