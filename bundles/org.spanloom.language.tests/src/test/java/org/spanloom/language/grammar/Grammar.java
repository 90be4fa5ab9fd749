/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.grammar;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A grammar in EBNF (ISO/IEC 14977:1996), as far as the one of the model files needs it. Rules
 * behind the comment {@code (* Words and signs *)} describe single signs: no blanks stand in them.
 */
final class Grammar {

  private static final Path FILE = Path.of("..", "org.spanloom.help", "grammar.ebnf");
  private static final Pattern SIGN =
      Pattern.compile(
          "\\s+|\\(\\*(?<comment>.*?)\\*\\)|\"(?<terminal>[^\"]*)\"|'(?<quoted>[^']*)'"
              + "|\\?(?<special>.*?)\\?|(?<name>[a-z][a-z ]*[a-z]|[a-z])|(?<mark>[=;,|()\\[\\]{}])",
          Pattern.DOTALL);

  /** What a rule can be made of. Each occurrence in the file is one object. */
  sealed interface Part {}

  /** A text as it is. */
  record Terminal(String text) implements Part {}

  /** The name of a rule. */
  record Reference(String rule) implements Part {}

  /** Something said in words. */
  record Special(String words) implements Part {}

  /** One after the other. */
  record Sequence(List<Part> parts) implements Part {}

  /** One of several. */
  record Choice(List<Part> parts) implements Part {}

  /** One or none. */
  record Maybe(Part part) implements Part {}

  /** None, one or more. */
  record Repeated(Part part) implements Part {}

  private final List<String> signs = new ArrayList<>();
  private final List<Part> leaves = new ArrayList<>();
  private final Map<String, Part> rules = new LinkedHashMap<>();
  private final Set<String> lexical = new LinkedHashSet<>();
  private int at;

  private Grammar(String text) {
    read(text);
  }

  /** Reads the grammar of the help. */
  static Grammar ofTheHelp() {
    try {
      return new Grammar(Files.readString(FILE));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static Grammar of(String text) {
    return new Grammar(text);
  }

  Map<String, Part> rules() {
    return rules;
  }

  Part rule(String name) {
    Part rule = rules.get(name);
    if (rule == null) {
      throw new IllegalStateException("no rule for " + name);
    }
    return rule;
  }

  /** Tells whether a rule describes a single sign. */
  boolean isLexical(String rule) {
    return lexical.contains(rule);
  }

  private void read(String text) {
    Matcher sign = SIGN.matcher(text);
    int end = 0;
    int lexicalFrom = Integer.MAX_VALUE;
    while (end < text.length()) {
      if (!sign.find() || sign.start() != end) {
        throw new IllegalStateException("cannot read the grammar at: " + text.substring(end));
      }
      end = sign.end();
      if (sign.group("comment") != null) {
        boolean words = sign.group("comment").strip().equals("Words and signs");
        lexicalFrom = words ? signs.size() : lexicalFrom;
      } else if (sign.group("terminal") != null) {
        add("leaf", new Terminal(sign.group("terminal")));
      } else if (sign.group("quoted") != null) {
        add("leaf", new Terminal(sign.group("quoted")));
      } else if (sign.group("special") != null) {
        add("leaf", new Special(sign.group("special").strip().replaceAll("\\s+", " ")));
      } else if (sign.group("name") != null) {
        add("leaf", new Reference(sign.group("name")));
      } else if (sign.group("mark") != null) {
        add(sign.group("mark"), new Terminal(""));
      }
    }
    while (at < signs.size()) {
      boolean isLexical = at >= lexicalFrom;
      String name = ((Reference) leaves.get(at++)).rule();
      expect("=");
      if (rules.put(name, choice()) != null) {
        throw new IllegalStateException(name + " has two rules");
      }
      expect(";");
      if (isLexical) {
        lexical.add(name);
      }
    }
  }

  private void add(String sign, Part leaf) {
    signs.add(sign);
    leaves.add(leaf);
  }

  private boolean accept(String sign) {
    boolean found = at < signs.size() && signs.get(at).equals(sign);
    at += found ? 1 : 0;
    return found;
  }

  private void expect(String sign) {
    if (!accept(sign)) {
      throw new IllegalStateException(sign + " expected behind " + leaves.get(at - 1));
    }
  }

  private Part choice() {
    List<Part> parts = new ArrayList<>(List.of(sequence()));
    while (accept("|")) {
      parts.add(sequence());
    }
    return parts.size() == 1 ? parts.getFirst() : new Choice(parts);
  }

  private Part sequence() {
    List<Part> parts = new ArrayList<>(List.of(part()));
    while (accept(",")) {
      parts.add(part());
    }
    return parts.size() == 1 ? parts.getFirst() : new Sequence(parts);
  }

  private Part part() {
    Part part;
    if (accept("(")) {
      part = choice();
      expect(")");
    } else if (accept("[")) {
      part = new Maybe(choice());
      expect("]");
    } else if (accept("{")) {
      part = new Repeated(choice());
      expect("}");
    } else {
      expect("leaf");
      part = leaves.get(at - 1);
    }
    return part;
  }
}
