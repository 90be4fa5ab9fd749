/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/**
 * Reads units written in UCUM code, an open standard: {@code kJ/K}, {@code W/(m2.K)}, {@code
 * [in_i]}, {@code /h}.
 *
 * <p>The code is case-sensitive. Factors are computed as exact fractions and rounded once.
 * Temperature scales ({@code Cel}, {@code [degF]}, {@code [degRe]}) are read where they stand
 * alone; logarithmic units are not read. Safe for use by several threads; work is bounded whatever
 * the text.
 */
public final class UnitReader {

  /** Longest code that is read, in characters. */
  public static final int LONGEST = 200;

  /** Largest size of an exponent of a base dimension. */
  private static final int LARGEST_DIMENSION = 99;

  private static final double SMALLEST_FACTOR = 1e-290;
  private static final double LARGEST_FACTOR = 1e290;
  private static final int MOST_REMEMBERED = 2000;
  private static final int MOST_SHOWN = 40;

  private static final Map<String, Result> REMEMBERED = new ConcurrentHashMap<>();

  private UnitReader() {}

  /** What a code turned out to be. */
  public sealed interface Result {}

  /**
   * A unit.
   *
   * @param unit the unit, with the code as it was written
   */
  public record Known(UnitOfMeasure unit) implements Result {}

  /**
   * No unit.
   *
   * @param message what is wrong and what to do, without place; begins with a small letter
   * @param nearest codes that can be read and may be meant, the likeliest first; often empty
   */
  public record Unknown(String message, List<String> nearest) implements Result {
    /** Copies the list. */
    public Unknown {
      nearest = List.copyOf(nearest);
    }
  }

  /**
   * Reads a unit.
   *
   * @param code the text between the brackets
   * @return the unit, or why there is none; never an exception
   */
  public static Result read(String code) {
    if (code.length() > LONGEST) {
      return new Unknown(
          "a unit has at most " + LONGEST + " characters, this one " + code.length(), List.of());
    }
    Result known = REMEMBERED.get(code);
    if (known != null) {
      return known;
    }
    Result result = compute(code);
    if (REMEMBERED.size() < MOST_REMEMBERED) {
      REMEMBERED.put(code, result);
    }
    return result;
  }

  /**
   * A unit symbol that can be read.
   *
   * @param code its code, without prefix
   * @param name its name in English
   * @param dimension its dimension
   * @param takesPrefix whether prefixes such as {@code k} may stand before it
   */
  public record Symbol(String code, String name, Dimension dimension, boolean takesPrefix) {}

  /**
   * Returns all unit symbols, for completion and for the language reference, in the order of UCUM's
   * tables.
   */
  public static List<Symbol> known() {
    List<Symbol> symbols = new ArrayList<>();
    for (UcumAtom atom : UcumAtoms.all()) {
      if (atom.kind() != UcumAtom.Kind.LOGARITHM) {
        Dimension dimension = UcumSymbols.size(new UcumSymbols.Split(List.of(), atom)).dimension();
        boolean metric = atom.kind() == UcumAtom.Kind.METRIC;
        symbols.add(new Symbol(atom.code(), atom.name(), dimension, metric));
      }
    }
    return List.copyOf(symbols);
  }

  private static Result compute(String code) {
    if (code.isBlank()) {
      return new Unknown(
          "a unit is missing between the brackets; write [1] for a pure number", List.of("1"));
    }
    return switch (new UcumParser(code).parse()) {
      case UcumParser.Read read -> plain(code, read.size());
      case UcumParser.Scale scale -> scale(code, scale.symbol());
      case UcumParser.Fault fault -> unknown(code, fault);
    };
  }

  private static Result plain(String code, ExactUnit size) {
    for (int exponent : size.dimension().exponents()) {
      if (Math.abs(exponent) > LARGEST_DIMENSION) {
        return new Unknown(
            "exponents of a unit add up to more than "
                + LARGEST_DIMENSION
                + " in '"
                + shown(code)
                + "'",
            List.of());
      }
    }
    double factor = size.factor().value();
    if (!(factor >= SMALLEST_FACTOR && factor <= LARGEST_FACTOR)) {
      return new Unknown(
          "the unit '" + shown(code) + "' is too large or too small to compute with", List.of());
    }
    return new Known(new UnitOfMeasure(code, size.dimension(), factor, 0));
  }

  private static Result scale(String code, UcumSymbols.Split symbol) {
    ExactUnit degree = UcumSymbols.size(symbol);
    double zero = UcumAtoms.zero(symbol.atom()).value();
    return new Known(new UnitOfMeasure(code, degree.dimension(), degree.factor().value(), zero));
  }

  private static Result unknown(String code, UcumParser.Fault fault) {
    List<String> nearest = UnitSuggestions.near(code);
    StringBuilder message = new StringBuilder(shortened(fault.message()));
    if (fault.end() - fault.start() < code.length()) {
      message.append(" in '").append(shown(code)).append("'");
    }
    if (!nearest.isEmpty()) {
      message.append("; did you mean ").append(String.join(" or ", nearest)).append("?");
    } else if (fault.unknownSymbol()) {
      message.append("; units are written in UCUM code, for example kJ/K, m/s2 or h");
    }
    return new Unknown(message.toString(), nearest);
  }

  private static String shown(String code) {
    return code.length() <= MOST_SHOWN ? code : code.substring(0, MOST_SHOWN) + "...";
  }

  private static String shortened(String message) {
    return message.length() <= 2 * LONGEST ? message : message.substring(0, 2 * LONGEST) + "...";
  }
}
