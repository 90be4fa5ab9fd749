/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import org.spanloom.language.text.Span;

/**
 * The equations as {@code M(t) x' = K(t) x + f(t)} in coherent SI units. Row i is the equation that
 * governs component i; entries that are zero by structure are absent, and each place occurs once.
 *
 * @param dimension n
 * @param mass entries of M by row, then column; the identity for rows of plain first-order
 *     equations
 * @param matrix entries of K by row, then column
 * @param forcing entries of f by row
 */
public record LinearForm(
    int dimension, List<MatrixEntry> mass, List<MatrixEntry> matrix, List<VectorEntry> forcing) {

  /** Copies the lists. */
  public LinearForm {
    mass = List.copyOf(mass);
    matrix = List.copyOf(matrix);
    forcing = List.copyOf(forcing);
  }

  /** Tells whether M is diagonal, so that A = M^-1 K entry by entry. */
  public boolean hasDiagonalMass() {
    return mass.stream().allMatch(e -> e.row() == e.column());
  }

  /**
   * One entry of a matrix.
   *
   * @param row row, from 0
   * @param column column, from 0
   * @param term its value in coherent SI units
   * @param sources the places in the text it comes from
   */
  public record MatrixEntry(int row, int column, Term term, List<Span> sources) {
    /** Copies the list. */
    public MatrixEntry {
      sources = List.copyOf(sources);
    }
  }

  /**
   * One entry of a vector.
   *
   * @param row row, from 0
   * @param term its value in coherent SI units
   * @param sources the places in the text it comes from
   */
  public record VectorEntry(int row, Term term, List<Span> sources) {
    /** Copies the list. */
    public VectorEntry {
      sources = List.copyOf(sources);
    }
  }
}
