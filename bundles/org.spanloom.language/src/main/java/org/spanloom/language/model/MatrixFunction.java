/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Optional;

/** The functions of matrices. */
public enum MatrixFunction {
  /** Rows and columns exchanged. */
  TRANSPOSE("transpose", "a matrix with its rows and columns exchanged");

  private final String code;
  private final String meaning;

  MatrixFunction(String code, String meaning) {
    this.code = code;
    this.meaning = meaning;
  }

  /** Returns the name in models. */
  public String code() {
    return code;
  }

  /** Returns what it gives, in a few words. */
  public String meaning() {
    return meaning;
  }

  /** Returns the function of a name. */
  public static Optional<MatrixFunction> named(String word) {
    return word.equals(TRANSPOSE.code) ? Optional.of(TRANSPOSE) : Optional.empty();
  }
}
