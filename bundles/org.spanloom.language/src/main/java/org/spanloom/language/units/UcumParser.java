/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import java.util.Optional;

/**
 * Reads one code by the grammar of UCUM: terms of components joined by {@code .} and {@code /},
 * from left to right; a component is a symbol with an exponent, a whole number, an annotation in
 * braces, or a term in parentheses.
 *
 * <p>Source: Schadow and McDonald, The Unified Code for Units of Measure, section 2.
 */
final class UcumParser {

  /** Deepest nesting of parentheses. */
  static final int DEEPEST = 20;

  /** Largest exponent. */
  static final int LARGEST_EXPONENT = 300;

  private static final int MOST_DIGITS = 15;

  private final String code;
  private int at;
  private int depth;
  private boolean lone = true;

  UcumParser(String code) {
    this.code = code;
  }

  /** What came out. */
  sealed interface Outcome {}

  /** A unit without a zero of its own. */
  record Read(ExactUnit size) implements Outcome {}

  /** A scale such as Cel that stands alone. */
  record Scale(UcumSymbols.Split symbol) implements Outcome {}

  /**
   * Nothing that can be read.
   *
   * @param message what was found and what to do
   * @param start where the part at fault begins
   * @param end where it ends
   * @param unknownSymbol whether that part is a symbol that may be misspelt
   */
  record Fault(String message, int start, int end, boolean unknownSymbol) implements Outcome {}

  /** Carries a fault out of the descent; never leaves this class. */
  private static final class FaultFound extends Exception {
    private static final long serialVersionUID = 1;
    private final transient Fault fault;

    FaultFound(Fault fault) {
      super(fault.message(), null, false, false);
      this.fault = fault;
    }
  }

  Outcome parse() {
    try {
      Optional<UcumSymbols.Split> scale = loneScale();
      if (scale.isPresent()) {
        return new Scale(scale.get());
      }
      ExactUnit size = term();
      if (at < code.length()) {
        throw fault("')' without '('", at, at + 1);
      }
      return new Read(size);
    } catch (FaultFound found) {
      return found.fault;
    } catch (ArithmeticException tooLarge) {
      return new Fault(
          "the unit is too large or too small to compute with", 0, code.length(), false);
    }
  }

  /** A scale with nothing around it but an annotation. */
  private Optional<UcumSymbols.Split> loneScale() throws FaultFound {
    int end = symbolEnd(0);
    if (end == code.length()
        || (code.charAt(end) == '{' && code.indexOf('}') == code.length() - 1)) {
      return UcumSymbols.split(code.substring(0, end))
          .filter(split -> split.atom().kind() == UcumAtom.Kind.SCALE)
          .filter(split -> split.prefixes().isEmpty());
    }
    lone = false;
    return Optional.empty();
  }

  private ExactUnit term() throws FaultFound {
    ExactUnit size;
    if (peek('/')) {
      at++;
      size = ExactUnit.ONE.over(component());
    } else {
      size = component();
    }
    while (at < code.length() && code.charAt(at) != ')') {
      char operator = code.charAt(at);
      if (operator != '.' && operator != '/') {
        throw fault("expected '.' or '/' before '" + code.substring(at) + "'", at, code.length());
      }
      at++;
      ExactUnit next = component();
      size = operator == '.' ? size.times(next) : size.over(next);
    }
    return size;
  }

  private ExactUnit component() throws FaultFound {
    if (at == code.length()) {
      throw fault("a unit is missing at the end", at, at);
    }
    char first = code.charAt(at);
    if (first == '(') {
      return parenthesised();
    }
    if (first == '{') {
      annotation();
      return ExactUnit.ONE;
    }
    if (isDigit(first) && !code.startsWith("10*", at) && !code.startsWith("10^", at)) {
      return number();
    }
    int start = at;
    int end = symbolEnd(at);
    if (end == start) {
      throw fault("a unit is missing before '" + first + "'", start, start + 1);
    }
    at = end;
    ExactUnit size = symbol(start, end);
    if (at < code.length() && "+-0123456789".indexOf(code.charAt(at)) >= 0) {
      size = size.power(exponent());
    }
    if (peek('{')) {
      annotation();
    }
    return size;
  }

  private ExactUnit parenthesised() throws FaultFound {
    int start = at;
    if (++depth > DEEPEST) {
      throw fault("parentheses are nested deeper than " + DEEPEST, start, start + 1);
    }
    at++;
    ExactUnit size = term();
    if (!peek(')')) {
      throw fault("a ')' is missing", start, code.length());
    }
    at++;
    depth--;
    if (at < code.length() && isDigit(code.charAt(at))) {
      throw fault("an exponent stands on a single unit, not on parentheses", at, at + 1);
    }
    return size;
  }

  private void annotation() throws FaultFound {
    int end = code.indexOf('}', at);
    if (end < 0) {
      throw fault("a '}' is missing", at, code.length());
    }
    at = end + 1;
  }

  private ExactUnit number() throws FaultFound {
    int start = at;
    while (at < code.length() && isDigit(code.charAt(at))) {
      at++;
    }
    if (at + 1 < code.length() && code.charAt(at) == '.' && isDigit(code.charAt(at + 1))) {
      throw fault(
          "a number in a unit is whole; put '"
              + code.substring(start, at + 2)
              + "' before the unit",
          start,
          at);
    }
    String digits = code.substring(start, at);
    if (digits.length() > MOST_DIGITS) {
      throw fault("a number in a unit has at most " + MOST_DIGITS + " digits", start, at);
    }
    if (Long.parseLong(digits) == 0) {
      throw fault("a unit cannot be zero", start, at);
    }
    return ExactUnit.number(ExactFactor.of(digits));
  }

  private int exponent() throws FaultFound {
    int start = at;
    int sign = peek('-') ? -1 : 1;
    if (peek('-') || peek('+')) {
      at++;
    }
    int digits = at;
    while (at < code.length() && isDigit(code.charAt(at))) {
      at++;
    }
    if (at == digits) {
      throw fault("an exponent is missing after '" + code.charAt(start) + "'", start, at);
    }
    if (at - digits > 3 || Integer.parseInt(code.substring(digits, at)) > LARGEST_EXPONENT) {
      throw fault("an exponent in a unit is at most " + LARGEST_EXPONENT, start, at);
    }
    return sign * Integer.parseInt(code.substring(digits, at));
  }

  private ExactUnit symbol(int start, int end) throws FaultFound {
    String symbol = code.substring(start, end);
    Optional<UcumSymbols.Split> split = UcumSymbols.split(symbol);
    if (split.isEmpty()) {
      throw new FaultFound(new Fault("unknown unit '" + symbol + "'", start, end, true));
    }
    UcumAtom atom = split.get().atom();
    boolean prefixed = !split.get().prefixes().isEmpty();
    return switch (atom.kind()) {
      case METRIC -> UcumSymbols.size(split.get());
      case PLAIN -> {
        if (prefixed) {
          throw fault("'" + atom.code() + "' (" + atom.name() + ") takes no prefix", start, end);
        }
        yield UcumSymbols.size(split.get());
      }
      case SCALE ->
          throw fault(
              lone || prefixed
                  ? "'"
                      + symbol
                      + "' is a scale with a zero of its own and takes no prefix or exponent"
                  : "'"
                      + atom.code()
                      + "' is a scale with a zero of its own and stands alone; use K in products"
                      + " and quotients",
              start,
              end);
      case LOGARITHM ->
          throw fault(
              "'"
                  + symbol
                  + "' is a logarithmic unit, which is not read; write the ratio or the quantity itself",
              start,
              end);
    };
  }

  /**
   * Where the symbol that begins at {@code start} ends; digits and signs end it except in brackets.
   */
  private int symbolEnd(int start) throws FaultFound {
    if (code.startsWith("10*", start) || code.startsWith("10^", start)) {
      return start + 3;
    }
    int end = start;
    while (end < code.length()) {
      char c = code.charAt(end);
      if (c == '[') {
        end = code.indexOf(']', end);
        if (end < 0) {
          throw fault("a ']' is missing", start, code.length());
        }
      } else if (isDigit(c) || "./(){}+-".indexOf(c) >= 0) {
        break;
      }
      end++;
    }
    return end;
  }

  private boolean peek(char c) {
    return at < code.length() && code.charAt(at) == c;
  }

  private static boolean isDigit(char c) {
    return c >= '0' && c <= '9';
  }

  private static FaultFound fault(String message, int start, int end) {
    return new FaultFound(new Fault(message, start, end, false));
  }
}
