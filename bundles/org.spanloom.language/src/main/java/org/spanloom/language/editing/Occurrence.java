/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import org.spanloom.language.text.Span;

/**
 * A name where it stands in the text.
 *
 * @param symbol what it names
 * @param role what is done with it there
 * @param span its place, without primes
 * @param primes how many primes stand behind it
 */
public record Occurrence(Symbol symbol, Role role, Span span, int primes) {

  /** What is done with a name. */
  public enum Role {
    /** The name is declared. */
    DECLARED,
    /** Its value is used. */
    READ,
    /** It is given a value: by an equation, a transfer, a set of initial values, a row. */
    WRITTEN
  }

  Occurrence as(Role other) {
    return new Occurrence(symbol, other, span, primes);
  }

  /** Returns the place with the primes. */
  public Span label() {
    return new Span(span.start(), span.end() + primes);
  }
}
