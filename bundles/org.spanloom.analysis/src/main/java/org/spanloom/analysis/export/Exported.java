/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.export;

import java.util.List;

/**
 * Matrices of a system at times, in declared units.
 *
 * @param system name of the system
 * @param what what the matrices are
 * @param timeName name of the independent variable
 * @param timeUnit UCUM code of its unit
 * @param rows labels of the components, one for each row
 * @param rowUnits their units
 * @param columns labels of the columns: of the components for A, else numbers
 * @param matrices one for each time, in the order asked for
 */
public record Exported(
    String system,
    What what,
    String timeName,
    String timeUnit,
    List<String> rows,
    List<String> rowUnits,
    List<String> columns,
    List<Matrix> matrices) {

  /** Copies the lists. */
  public Exported {
    rows = List.copyOf(rows);
    rowUnits = List.copyOf(rowUnits);
    columns = List.copyOf(columns);
    matrices = List.copyOf(matrices);
  }

  /** What can be exported. */
  public enum What {
    /** The matrix of {@code x' = A x + b}. */
    A("A"),
    /** The forcing, one column. */
    B("b"),
    /** The principal fundamental matrix of the start of the interval. */
    PHI("Phi"),
    /** A declared basis. */
    BASIS("basis");

    private final String word;

    What(String word) {
      this.word = word;
    }

    /** Returns the word that asks for it. */
    public String word() {
      return word;
    }
  }

  /**
   * A matrix at a time.
   *
   * @param time the time
   * @param values row by row
   * @param errors estimated absolute error of each; zeros for coefficients
   */
  public record Matrix(double time, double[] values, double[] errors) {
    /** Copies the arrays. */
    public Matrix {
      values = values.clone();
      errors = errors.clone();
    }

    @Override
    public double[] values() {
      return values.clone();
    }

    @Override
    public double[] errors() {
      return errors.clone();
    }
  }
}
