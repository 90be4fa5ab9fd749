/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;

/** Guesses what a unit that cannot be read was meant to be. */
final class UnitSuggestions {

  private static final int MOST = 3;
  private static final int MOST_REPLACEMENTS = 4;
  private static final int LONGEST_SYMBOL = 20;

  /** Spellings that people use elsewhere, in lower case. */
  private static final Map<String, String> ELSEWHERE =
      Map.ofEntries(
          Map.entry("sec", "s"),
          Map.entry("secs", "s"),
          Map.entry("second", "s"),
          Map.entry("seconds", "s"),
          Map.entry("msec", "ms"),
          Map.entry("usec", "us"),
          Map.entry("hr", "h"),
          Map.entry("hrs", "h"),
          Map.entry("hour", "h"),
          Map.entry("hours", "h"),
          Map.entry("mins", "min"),
          Map.entry("minute", "min"),
          Map.entry("minutes", "min"),
          Map.entry("day", "d"),
          Map.entry("days", "d"),
          Map.entry("week", "wk"),
          Map.entry("weeks", "wk"),
          Map.entry("month", "mo"),
          Map.entry("months", "mo"),
          Map.entry("y", "a"),
          Map.entry("yr", "a"),
          Map.entry("yrs", "a"),
          Map.entry("year", "a"),
          Map.entry("years", "a"),
          Map.entry("degc", "Cel"),
          Map.entry("celsius", "Cel"),
          Map.entry("cel", "Cel"),
          Map.entry("degf", "[degF]"),
          Map.entry("fahrenheit", "[degF]"),
          Map.entry("degk", "K"),
          Map.entry("kelvin", "K"),
          Map.entry("ohms", "Ohm"),
          Map.entry("percent", "%"),
          Map.entry("pct", "%"),
          Map.entry("ppm", "[ppm]"),
          Map.entry("ppb", "[ppb]"),
          Map.entry("psi", "[psi]"),
          Map.entry("ft", "[ft_i]"),
          Map.entry("foot", "[ft_i]"),
          Map.entry("feet", "[ft_i]"),
          Map.entry("in", "[in_i]"),
          Map.entry("inch", "[in_i]"),
          Map.entry("inches", "[in_i]"),
          Map.entry("yd", "[yd_i]"),
          Map.entry("mi", "[mi_i]"),
          Map.entry("mile", "[mi_i]"),
          Map.entry("miles", "[mi_i]"),
          Map.entry("nmi", "[nmi_i]"),
          Map.entry("kn", "[kn_i]"),
          Map.entry("knots", "[kn_i]"),
          Map.entry("lb", "[lb_av]"),
          Map.entry("lbs", "[lb_av]"),
          Map.entry("lbm", "[lb_av]"),
          Map.entry("lbf", "[lbf_av]"),
          Map.entry("oz", "[oz_av]"),
          Map.entry("gal", "[gal_us]"),
          Map.entry("btu", "[Btu]"),
          Map.entry("hp", "[HP]"),
          Map.entry("mmhg", "mm[Hg]"),
          Map.entry("ton", "t"),
          Map.entry("tons", "t"),
          Map.entry("tonne", "t"),
          Map.entry("tonnes", "t"),
          Map.entry("liter", "L"),
          Map.entry("litre", "L"),
          Map.entry("liters", "L"),
          Map.entry("litres", "L"),
          Map.entry("cc", "cm3"),
          Map.entry("micron", "um"),
          Map.entry("meter", "m"),
          Map.entry("metre", "m"),
          Map.entry("meters", "m"),
          Map.entry("metres", "m"),
          Map.entry("gram", "g"),
          Map.entry("grams", "g"),
          Map.entry("gm", "g"),
          Map.entry("kgs", "kg"),
          Map.entry("kilogram", "kg"),
          Map.entry("mole", "mol"),
          Map.entry("moles", "mol"),
          Map.entry("watt", "W"),
          Map.entry("watts", "W"),
          Map.entry("joule", "J"),
          Map.entry("joules", "J"),
          Map.entry("newton", "N"),
          Map.entry("volt", "V"),
          Map.entry("volts", "V"),
          Map.entry("amp", "A"),
          Map.entry("amps", "A"),
          Map.entry("ampere", "A"),
          Map.entry("farad", "F"),
          Map.entry("henry", "H"),
          Map.entry("pascal", "Pa"),
          Map.entry("hertz", "Hz"),
          Map.entry("radian", "rad"),
          Map.entry("radians", "rad"),
          Map.entry("degree", "deg"),
          Map.entry("degrees", "deg"),
          Map.entry("rev", "circ"),
          Map.entry("rpm", "circ/min"),
          Map.entry("angstrom", "Ao"),
          Map.entry("iu", "[IU]"),
          Map.entry("molar", "mol/L"),
          Map.entry("mcg", "ug"),
          Map.entry("wh", "W.h"),
          Map.entry("kwh", "kW.h"),
          Map.entry("mwh", "MW.h"),
          Map.entry("ah", "A.h"),
          Map.entry("mah", "mA.h"),
          Map.entry("nm", "N.m"));

  private UnitSuggestions() {}

  /** Returns up to three codes that can be read and resemble {@code code}, the likeliest first. */
  static List<String> near(String code) {
    String cleaned = cleaned(code);
    Set<String> found = new LinkedHashSet<>();
    if (!cleaned.equals(code) && reads(cleaned)) {
      found.add(cleaned);
    }
    if (new UcumParser(cleaned).parse() instanceof UcumParser.Fault fault) {
      if (fault.unknownSymbol()) {
        for (String symbol : symbolsNear(cleaned.substring(fault.start(), fault.end()))) {
          String mended = mended(replaced(cleaned, fault, symbol));
          if (reads(mended)) {
            found.add(mended);
          }
        }
      } else if (isScaleInProduct(cleaned, fault)) {
        String mended = replaced(cleaned, fault, "K");
        if (reads(mended)) {
          found.add(mended);
        }
      }
    }
    return found.stream().limit(MOST).toList();
  }

  /** Replaces further unknown symbols by what is nearest to each. */
  private static String mended(String code) {
    String text = code;
    for (int i = 0; i < MOST_REPLACEMENTS; i++) {
      if (!(new UcumParser(text).parse() instanceof UcumParser.Fault fault)
          || !fault.unknownSymbol()) {
        return text;
      }
      List<String> near = symbolsNear(text.substring(fault.start(), fault.end()));
      if (near.isEmpty()) {
        return text;
      }
      text = replaced(text, fault, near.getFirst());
    }
    return text;
  }

  private static boolean isScaleInProduct(String code, UcumParser.Fault fault) {
    return UcumSymbols.split(code.substring(fault.start(), fault.end()))
        .filter(split -> split.atom().kind() == UcumAtom.Kind.SCALE && split.prefixes().isEmpty())
        .isPresent();
  }

  private static String replaced(String code, UcumParser.Fault fault, String symbol) {
    boolean compound =
        symbol.indexOf('/') >= 0
            || symbol.indexOf('.') >= 0
            || Character.isDigit(symbol.charAt(symbol.length() - 1));
    boolean alone = fault.start() == 0 && fault.end() == code.length();
    return code.substring(0, fault.start())
        + (compound && !alone ? "(" + symbol + ")" : symbol)
        + code.substring(fault.end());
  }

  private static boolean reads(String code) {
    return code.length() <= UnitReader.LONGEST
        && !(new UcumParser(code).parse() instanceof UcumParser.Fault);
  }

  /** Turns signs of other notations into UCUM's. */
  private static String cleaned(String code) {
    return code.strip()
        .replace("\u00b0C", "Cel")
        .replace("\u2103", "Cel")
        .replace("\u00b0F", "[degF]")
        .replace("\u00b0", "deg")
        .replace('\u00b5', 'u')
        .replace('\u03bc', 'u')
        .replace("\u03a9", "Ohm")
        .replace("\u2126", "Ohm")
        .replace("\u00b2", "2")
        .replace("\u00b3", "3")
        .replace('\u2212', '-')
        .replaceAll("\\s*([./*])\\s*", "$1")
        .replaceAll("\\s+", ".")
        .replaceAll("[\u00b7\u22c5\u00d7]", ".")
        .replaceAll("(?<!10)(\\*\\*|\\^)", "")
        .replaceAll("(?<!10)\\*", ".");
  }

  private static List<String> symbolsNear(String symbol) {
    List<String> near = new ArrayList<>();
    if (symbol.length() > LONGEST_SYMBOL) {
      return near;
    }
    String elsewhere = ELSEWHERE.get(symbol.toLowerCase(Locale.ROOT));
    if (elsewhere != null) {
      near.add(elsewhere);
    }
    List<String> candidates = Candidates.ALL;
    candidates.stream().filter(c -> c.equalsIgnoreCase(symbol)).forEach(near::add);
    if (near.isEmpty()) {
      candidates.stream()
          .filter(c -> c.length() > 1 && isOneEditAway(c, symbol))
          .limit(MOST)
          .forEach(near::add);
    }
    return near;
  }

  /** Listed when the first unit is misspelt, which most models never do. */
  private static final class Candidates {
    private static final List<String> ALL = likelySymbols();
  }

  /** All symbols that are likely: atoms as they are, and with the usual prefixes. */
  private static List<String> likelySymbols() {
    List<String> symbols = new ArrayList<>();
    for (String prefix : List.of("", "k", "m", "u", "c", "M", "G", "n", "p", "h", "d")) {
      for (UcumAtom atom : UcumAtoms.all()) {
        boolean fits =
            switch (atom.kind()) {
              case METRIC -> true;
              case PLAIN, SCALE -> prefix.isEmpty();
              case LOGARITHM -> false;
            };
        if (fits) {
          symbols.add(prefix + atom.code());
        }
      }
    }
    return symbols;
  }

  /**
   * Tells whether one letter inserted, left out, changed or swapped with its neighbour makes the
   * two the same.
   */
  static boolean isOneEditAway(String a, String b) {
    if (a.length() < b.length()) {
      return isOneEditAway(b, a);
    }
    if (a.length() - b.length() > 1) {
      return false;
    }
    int head = 0;
    while (head < b.length() && a.charAt(head) == b.charAt(head)) {
      head++;
    }
    String restA = a.substring(head);
    String restB = b.substring(head);
    if (a.length() > b.length()) {
      return restA.substring(1).equals(restB);
    }
    if (restA.length() < 2) {
      return restA.length() == 1;
    }
    boolean changed = restA.substring(1).equals(restB.substring(1));
    boolean swapped =
        restA.charAt(0) == restB.charAt(1)
            && restA.charAt(1) == restB.charAt(0)
            && restA.substring(2).equals(restB.substring(2));
    return changed || swapped;
  }
}
