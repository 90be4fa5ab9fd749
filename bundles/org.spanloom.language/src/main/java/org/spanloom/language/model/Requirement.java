/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Optional;
import org.spanloom.language.text.Span;

/** Something that must hold for the model to be accepted. */
public sealed interface Requirement {

  /** Returns the statement. */
  Span span();

  /** Returns the text of the requirement as written, without the word {@code require}. */
  String text();

  /**
   * {@code require T(12 [h]) < 278 [K] under warm}: every state in it stands at a named time.
   *
   * @param under the initial values meant; empty picks the set of the declarations
   */
  record AtTime(
      AffineValue left, Relation relation, AffineValue right, String under, Span span, String text)
      implements Requirement {}

  /**
   * {@code require T < 300 [K] throughout until 10 [h] under warm}.
   *
   * @param until the last time, in coherent SI units; empty for the end of the interval
   */
  record Throughout(
      AffineValue left,
      Relation relation,
      AffineValue right,
      Optional<Term> until,
      String under,
      Span span,
      String text)
      implements Requirement {}

  /**
   * {@code require condition(p) < 1e6 until 1 [h]}, or {@code scaled condition(p)}.
   *
   * @param basis name of the basis
   * @param scaled whether columns are scaled first
   * @param limit the limit, a pure number
   * @param until the last time, in coherent SI units; empty for the end of the interval
   */
  record Condition(
      String basis,
      boolean scaled,
      Relation relation,
      Term limit,
      Optional<Term> until,
      Span span,
      String text)
      implements Requirement {}

  /** {@code require stable}. */
  record Stable(Span span, String text) implements Requirement {}

  /** {@code require invariant x + y}: the value keeps its initial value on every solution. */
  record Invariant(AffineValue value, Span span, String text) implements Requirement {}

  /** {@code require nonnegative}: no state falls below 0 on the solution of the initial values. */
  record Nonnegative(String under, Span span, String text) implements Requirement {}

  /** {@code require period P}: the coefficients repeat after P, in coherent SI units. */
  record Period(Term period, Span span, String text) implements Requirement {}
}
