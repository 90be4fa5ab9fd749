/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import org.spanloom.language.text.Span;

/** A candidate basis of the solutions of the homogeneous system. */
public sealed interface Basis {

  /** Returns its name. */
  String name();

  /** Returns the statement. */
  Span span();

  /** Returns the name in the statement. */
  Span nameSpan();

  /** {@code basis p at 0}: the columns of the identity at a time given in coherent SI units. */
  record Principal(String name, Term time, Span span, Span nameSpan) implements Basis {}

  /**
   * {@code basis s at 0 =} with rows: initial vectors in columns.
   *
   * @param rows one row for each component, each of equal length, in the declared units of the
   *     component
   * @param rowSpans where the row of each component stands
   */
  record Given(
      String name,
      Term time,
      int columns,
      List<List<Term>> rows,
      List<Span> rowSpans,
      Span span,
      Span nameSpan)
      implements Basis {
    /** Copies the lists. */
    public Given {
      rows = rows.stream().map(List::copyOf).toList();
      rowSpans = List.copyOf(rowSpans);
    }
  }

  /**
   * {@code basis c(t) =} with rows: closed forms offered as solutions.
   *
   * @param rows one row for each component, each of equal length, functions of time, in the
   *     declared units of the component
   * @param rowSpans where the row of each component stands
   */
  record ClosedForm(
      String name,
      int columns,
      List<List<Term>> rows,
      List<Span> rowSpans,
      Span span,
      Span nameSpan)
      implements Basis {
    /** Copies the lists. */
    public ClosedForm {
      rows = rows.stream().map(List::copyOf).toList();
      rowSpans = List.copyOf(rowSpans);
    }
  }
}
