/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;

/** Finds what a symbol such as {@code kJ} is: prefix and atom, resolved down to the base units. */
final class UcumSymbols {

  private static final Map<String, ExactUnit> RESOLVED = new ConcurrentHashMap<>();

  private UcumSymbols() {}

  /**
   * A symbol taken apart.
   *
   * @param prefixes the prefix, if there is one
   * @param atom the unit symbol proper
   */
  record Split(List<UcumPrefix> prefixes, UcumAtom atom) {}

  /** Returns the parts of a symbol; a symbol that is an atom itself has no prefix. */
  static Optional<Split> split(String symbol) {
    Optional<UcumAtom> whole = UcumAtoms.named(symbol);
    if (whole.isPresent()) {
      return Optional.of(new Split(List.of(), whole.get()));
    }
    for (UcumPrefix prefix : UcumPrefix.values()) {
      if (symbol.startsWith(prefix.code())) {
        Optional<UcumAtom> rest = UcumAtoms.named(symbol.substring(prefix.code().length()));
        if (rest.isPresent()) {
          return Optional.of(new Split(List.of(prefix), rest.get()));
        }
      }
    }
    return Optional.empty();
  }

  /**
   * Returns the size of a symbol that is neither a scale nor a logarithm; of a scale, the size of
   * its degree.
   */
  static ExactUnit size(Split split) {
    ExactUnit atom = size(split.atom());
    for (UcumPrefix prefix : split.prefixes()) {
      atom = ExactUnit.number(prefix.factor()).times(atom);
    }
    return atom;
  }

  private static ExactUnit size(UcumAtom atom) {
    ExactUnit known = RESOLVED.get(atom.code());
    if (known != null) {
      return known;
    }
    int base = UcumAtoms.BASES.indexOf(atom.code());
    ExactUnit size = base < 0 ? defined(atom) : base(base);
    RESOLVED.put(atom.code(), size);
    return size;
  }

  private static ExactUnit base(int index) {
    int[] exponents = new int[7];
    exponents[index] = 1;
    // The gram is UCUM's base unit of mass, the kilogram that of the SI.
    ExactFactor factor = index == 1 ? ExactFactor.of("1e-3") : ExactFactor.ONE;
    return new ExactUnit(factor, new Dimension(exponents));
  }

  private static ExactUnit defined(UcumAtom atom) {
    return switch (new UcumParser(atom.definition()).parse()) {
      case UcumParser.Read read ->
          ExactUnit.number(ExactFactor.of(atom.value())).times(read.size());
      case UcumParser.Scale scale -> throw new IllegalStateException(atom + " rests on " + scale);
      case UcumParser.Fault fault -> throw new IllegalStateException(atom + ": " + fault);
    };
  }
}
