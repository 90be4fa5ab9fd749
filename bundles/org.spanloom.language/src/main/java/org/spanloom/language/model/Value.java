/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.units.Dimension;

/** The value of an expression: a single one or a matrix of them, in coherent SI units. */
sealed interface Value permits Quantity, MatrixValue {

  /** Returns the dimension of it or of all its entries. */
  Dimension dimension();

  /** Tells whether states stand in it. */
  boolean holdsStates();

  /** Returns a bound on the depth of the terms in it. */
  int depth();

  /** Tells whether it is the number 0 as written, which fits every dimension and every shape. */
  boolean zero();
}
