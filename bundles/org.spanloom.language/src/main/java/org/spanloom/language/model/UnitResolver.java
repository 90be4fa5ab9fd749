/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Optional;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.UnitText;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;
import org.spanloom.language.units.UnitReader;

/** Turns unit texts into units. */
final class UnitResolver {

  private final Problems problems;

  UnitResolver(Problems problems) {
    this.problems = problems;
  }

  /** Returns the unit, or empty after a problem was reported. */
  Optional<UnitOfMeasure> read(UnitText text) {
    return switch (UnitReader.read(text.code())) {
      case UnitReader.Known known -> Optional.of(known.unit());
      case UnitReader.Unknown unknown -> {
        Span inner = new Span(text.span().start() + 1, text.span().end() - 1);
        problems.report(
            ProblemKind.UNIT_UNKNOWN,
            text.span(),
            sentence(unknown.message()),
            unknown.nearest().stream()
                .map(code -> Fix.replace("Write " + code, inner, code))
                .toArray(Fix[]::new));
        yield Optional.empty();
      }
    };
  }

  /** Returns the unit of a declaration: the number 1 where none is given, empty after a problem. */
  Optional<UnitOfMeasure> declared(Optional<UnitText> text) {
    return text.isEmpty() ? Optional.of(UnitOfMeasure.ONE) : read(text.get());
  }

  /** Returns the unit without reporting anything. */
  static Optional<UnitOfMeasure> known(UnitText text) {
    return UnitReader.read(text.code()) instanceof UnitReader.Known known
        ? Optional.of(known.unit())
        : Optional.empty();
  }

  /** Makes a sentence of a message that begins with a small letter and may end without a point. */
  private static String sentence(String message) {
    String end = message.endsWith("?") || message.endsWith(".") ? "" : ".";
    return Character.toUpperCase(message.charAt(0)) + message.substring(1) + end;
  }
}
