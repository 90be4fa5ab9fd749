/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/**
 * Where an expression stands, which decides what may stand in it.
 *
 * @param what the place in words that fit behind "in" and "of"
 * @param time whether the independent variable may stand in it
 * @param states whether states may stand in it
 * @param samples whether states may stand in it at times named, as in {@code x(12 [h])}
 */
record Place(String what, boolean time, boolean states, boolean samples) {

  static final Place PARAMETER = new Place("a parameter", false, false, false);
  static final Place LET = new Place("a named expression", false, false, false);
  static final Place LET_OF_TIME = new Place("a named expression", true, false, false);
  static final Place MATRIX = new Place("a matrix", false, true, false);
  static final Place MATRIX_OF_TIME = new Place("a matrix", true, true, false);
  static final Place INPUT = new Place("an input", true, false, false);
  static final Place BOUND_INPUT = new Place("an input of a part", true, true, false);
  static final Place OUTPUT = new Place("an output", true, true, false);
  static final Place EQUATION = new Place("an equation", true, true, false);
  static final Place TRANSFER = new Place("a transfer", true, true, false);
  static final Place JUMP = new Place("a jump", true, true, false);
  static final Place BOUNDARY = new Place("a boundary condition", false, true, true);
  static final Place INTERVAL = new Place("an end of the interval", false, false, false);
  static final Place NAMED_TIME = new Place("a named time", false, false, false);
  static final Place INITIAL = new Place("an initial value", false, false, false);
  static final Place SCALE = new Place("a scale", false, false, false);
  static final Place UNCERTAINTY = new Place("an uncertainty", false, false, false);
  static final Place ACCURACY = new Place("an accuracy", false, false, false);
  static final Place GIVEN_BASIS = new Place("a basis at one time", false, false, false);
  static final Place CLOSED_FORM = new Place("a closed form", true, false, false);
  static final Place LIMIT = new Place("a limit", false, false, false);
  static final Place PERIOD = new Place("a period", false, false, false);
  static final Place INVARIANT = new Place("an invariant", true, true, false);
  static final Place TABLE = new Place("a row of a table", false, false, false);
  static final Place PULSE = new Place("the shape of a pulse", false, false, false);
  static final Place COMPARISON = new Place("a requirement", true, true, true);

  /** A condition in a place: states are read in it only to be reported. */
  Place condition() {
    return new Place("a condition", time, true, false);
  }
}
