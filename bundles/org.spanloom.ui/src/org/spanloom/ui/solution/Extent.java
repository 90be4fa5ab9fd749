/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

/**
 * What an axis shows: two finite ends, the lower one first, far enough apart to be told from each
 * other.
 *
 * @param lower lower end
 * @param upper upper end
 */
record Extent(double lower, double upper) {

  /** Narrower ranges, relative to the ends, are refused by the chart without a word. */
  private static final double NARROWEST = 1e-11;

  private static final double MARGIN = 0.05;
  private static final double LARGEST = 1e300;

  /**
   * Returns the extent of values with a margin; something sensible around them where they do not
   * differ.
   */
  static Extent around(double least, double most) {
    Extent bare = new Extent(least, most);
    if (!bare.isUsable()) {
      double reach = Math.max(Math.abs(least), Math.abs(most)) * MARGIN;
      return reach == 0 ? new Extent(-1, 1) : new Extent(least - reach, most + reach);
    }
    double margin = MARGIN * bare.span();
    return new Extent(least - margin, most + margin);
  }

  /** Returns an extent that shows just these values. */
  static Extent exactly(double least, double most) {
    Extent bare = new Extent(least, most);
    return bare.isUsable() ? bare : around(least, most);
  }

  double span() {
    return upper - lower;
  }

  /** Tells whether a chart can show it. */
  boolean isUsable() {
    double size = Math.max(Math.abs(lower), Math.abs(upper));
    return size < LARGEST && span() > NARROWEST * size;
  }

  /**
   * Returns the extent scaled about a point, or this one where the result could not be shown.
   *
   * @param about the point that stays where it is
   * @param factor below 1 shows less
   */
  Extent scaled(double about, double factor) {
    return usableOrThis(
        new Extent(about + (lower - about) * factor, about + (upper - about) * factor));
  }

  /**
   * Returns the extent moved by a part of its span, or this one where the result could not be
   * shown.
   */
  Extent moved(double part) {
    return usableOrThis(new Extent(lower + part * span(), upper + part * span()));
  }

  private Extent usableOrThis(Extent wanted) {
    return wanted.isUsable() ? wanted : this;
  }

  /** Returns the middle. */
  double middle() {
    return lower + span() / 2;
  }
}
