/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.grammar;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.Set;
import java.util.TreeSet;
import org.spanloom.language.grammar.Grammar.Choice;
import org.spanloom.language.grammar.Grammar.Maybe;
import org.spanloom.language.grammar.Grammar.Part;
import org.spanloom.language.grammar.Grammar.Reference;
import org.spanloom.language.grammar.Grammar.Repeated;
import org.spanloom.language.grammar.Grammar.Sequence;
import org.spanloom.language.grammar.Grammar.Special;
import org.spanloom.language.grammar.Grammar.Terminal;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.StatementLine;
import org.spanloom.language.syntax.StatementLines;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;

/**
 * Reads a text by a grammar, with all ways kept, and notes which of its choices the text takes. The
 * tokens and the ends of statements are those of the lexer; line ends inside of statements are left
 * out.
 */
final class Recogniser {

  /** Rules of single signs, by the kinds of tokens that they describe. */
  private static final Map<String, Set<TokenKind>> SIGNS =
      Map.of(
          "name", Set.of(TokenKind.NAME, TokenKind.CONTEXT_WORD),
          "dotted name", Set.of(TokenKind.NAME, TokenKind.CONTEXT_WORD),
          "number", Set.of(TokenKind.NUMBER),
          "unit", Set.of(TokenKind.UNIT),
          "primes", Set.of(TokenKind.PRIMES),
          "text", Set.of(TokenKind.STRING),
          "line end", Set.of(TokenKind.NEWLINE));

  private final Grammar grammar;
  private final String text;
  private final List<Token> tokens = new ArrayList<>();
  private final Map<Part, Map<Integer, NavigableSet<Integer>>> ends = new IdentityHashMap<>();
  private final Map<Part, String> names;
  private final Set<String> taken = new TreeSet<>();
  private final Map<Part, Set<Long>> walked = new IdentityHashMap<>();

  Recogniser(Grammar grammar, String text) {
    this.grammar = grammar;
    this.text = text;
    this.names = names(grammar);
    for (StatementLine line : StatementLines.of(text)) {
      line.tokens().forEach(this::add);
      if (line.end().span().length() > 0) {
        tokens.add(line.end());
      }
    }
  }

  /**
   * Takes a token; a name and the point and the name behind it are one sign, and an index range is
   * several.
   */
  private void add(Token token) {
    int last = tokens.size() - 1;
    boolean joins =
        last > 0
            && token.kind().isName()
            && tokens.get(last).kind() == TokenKind.DOT
            && tokens.get(last - 1).kind().isName();
    if (joins) {
      tokens.removeLast();
      Token name = tokens.removeLast();
      tokens.add(new Token(TokenKind.NAME, name.start(), token.end()));
    } else if (token.kind() == TokenKind.INDEX_RANGE) {
      tokens.add(new Token(TokenKind.OPEN_BRACKET, token.start(), token.start() + 1));
      int inner = token.start() + 1;
      for (Token part : Lexer.lex(text.substring(inner, token.end() - 1))) {
        tokens.add(new Token(part.kind(), inner + part.start(), inner + part.end(), part.word()));
      }
      tokens.add(new Token(TokenKind.CLOSE_BRACKET, token.end() - 1, token.end()));
    } else {
      tokens.add(token);
    }
  }

  /** Returns what can be chosen in the rules that are not of single signs. */
  static Set<String> choices(Grammar grammar) {
    return new TreeSet<>(names(grammar).values());
  }

  private static Map<Part, String> names(Grammar grammar) {
    Map<Part, String> names = new IdentityHashMap<>();
    grammar
        .rules()
        .forEach((rule, part) -> {
          if (!grammar.isLexical(rule)) {
            names.put(part, rule);
            name(part, rule, names);
          }
        });
    return names;
  }

  private static void name(Part part, String rule, Map<Part, String> names) {
    switch (part) {
      case Terminal terminal -> {}
      case Reference reference -> {}
      case Special special -> {}
      case Sequence sequence -> sequence.parts().forEach(p -> name(p, rule, names));
      case Choice choice -> {
        for (Part alternative : choice.parts()) {
          names.put(alternative, rule + ": " + shown(alternative));
          name(alternative, rule, names);
        }
      }
      case Maybe maybe -> {
        names.put(maybe.part(), rule + ": " + shown(maybe.part()));
        name(maybe.part(), rule, names);
      }
      case Repeated repeated -> {
        names.put(repeated.part(), rule + ": " + shown(repeated.part()));
        name(repeated.part(), rule, names);
      }
    }
  }

  private static String shown(Part part) {
    return switch (part) {
      case Terminal terminal -> "\"" + terminal.text() + "\"";
      case Reference reference -> reference.rule();
      case Special special -> "?" + special.words() + "?";
      case Sequence sequence ->
          String.join(", ", sequence.parts().stream().map(Recogniser::shown).toList());
      case Choice choice ->
          "(" + String.join(" | ", choice.parts().stream().map(Recogniser::shown).toList()) + ")";
      case Maybe maybe -> "[" + shown(maybe.part()) + "]";
      case Repeated repeated -> "{" + shown(repeated.part()) + "}";
    };
  }

  /** Tells whether the whole text follows a rule. */
  boolean matches(String rule) {
    Part part = grammar.rule(rule);
    boolean matches = ends(part, 0).contains(tokens.size());
    if (matches) {
      walk(part, 0, tokens.size());
    }
    return matches;
  }

  /** Returns the choices that the text takes, on any way through the grammar. */
  Set<String> taken() {
    return taken;
  }

  /** Returns where a part that begins at a token can end. */
  private NavigableSet<Integer> ends(Part part, int from) {
    Map<Integer, NavigableSet<Integer>> known = ends.computeIfAbsent(part, p -> new HashMap<>());
    NavigableSet<Integer> found = known.get(from);
    if (found == null) {
      found = find(part, from);
      known.put(from, found);
    }
    return found;
  }

  private NavigableSet<Integer> find(Part part, int from) {
    NavigableSet<Integer> found = new TreeSet<>();
    switch (part) {
      case Terminal terminal -> {
        if (from < tokens.size() && text(from).equals(terminal.text())) {
          found.add(from + 1);
        }
      }
      case Special special -> {
        boolean end = from == tokens.size() || tokens.get(from).kind() == TokenKind.CLOSE_BRACE;
        if (special.words().startsWith("the end of the text") && end) {
          found.add(from);
        }
      }
      case Reference reference -> {
        if (!grammar.isLexical(reference.rule())) {
          return ends(grammar.rule(reference.rule()), from);
        }
        Set<TokenKind> kinds = SIGNS.get(reference.rule());
        if (kinds == null) {
          throw new IllegalStateException("no token is known for the rule " + reference.rule());
        }
        if (from < tokens.size() && kinds.contains(tokens.get(from).kind())) {
          found.add(from + 1);
        }
      }
      case Sequence sequence -> {
        found.add(from);
        for (Part next : sequence.parts()) {
          NavigableSet<Integer> further = new TreeSet<>();
          found.forEach(f -> further.addAll(ends(next, f)));
          found = further;
        }
      }
      case Choice choice -> {
        for (Part alternative : choice.parts()) {
          found.addAll(ends(alternative, from));
        }
      }
      case Maybe maybe -> {
        found.addAll(ends(maybe.part(), from));
        found.add(from);
      }
      case Repeated repeated -> {
        found.add(from);
        Integer next = from;
        while (next != null) {
          found.addAll(ends(repeated.part(), next));
          next = found.higher(next);
        }
      }
    }
    return found;
  }

  private String text(int token) {
    return text.substring(tokens.get(token).start(), tokens.get(token).end());
  }

  /** Notes the choices on the ways of a part from one token to another. */
  private void walk(Part part, int from, int to) {
    if (!ends(part, from).contains(to)
        || !walked.computeIfAbsent(part, p -> new TreeSet<>()).add(((long) from << 32) + to)) {
      return;
    }
    if (names.containsKey(part) && to > from) {
      taken.add(names.get(part));
    }
    switch (part) {
      case Terminal terminal -> {}
      case Special special -> taken.add(names.getOrDefault(part, ""));
      case Reference reference -> {
        if (!grammar.isLexical(reference.rule())) {
          walk(grammar.rule(reference.rule()), from, to);
        }
      }
      case Sequence sequence -> sequence(sequence.parts(), 0, from, to);
      case Choice choice -> choice.parts().forEach(p -> walk(p, from, to));
      case Maybe maybe -> walk(maybe.part(), from, to);
      case Repeated repeated -> {
        for (int middle : ends(repeated.part(), from)) {
          if (middle > from && middle <= to && ends(repeated, middle).contains(to)) {
            walk(repeated.part(), from, middle);
            walk(repeated, middle, to);
          }
        }
      }
    }
  }

  /** Walks the parts of a sequence between all pairs of places on a way to its end. */
  private void sequence(List<Part> parts, int number, int from, int to) {
    List<NavigableSet<Integer>> reached = new ArrayList<>(List.of(new TreeSet<>(Set.of(from))));
    for (Part part : parts) {
      NavigableSet<Integer> further = new TreeSet<>();
      reached.getLast().forEach(f -> further.addAll(ends(part, f)));
      reached.add(further);
    }
    NavigableSet<Integer> wanted = new TreeSet<>(Set.of(to));
    for (int i = parts.size() - 1; i >= number; i--) {
      NavigableSet<Integer> starts = new TreeSet<>();
      for (int start : reached.get(i)) {
        for (int end : wanted) {
          if (ends(parts.get(i), start).contains(end)) {
            starts.add(start);
            walk(parts.get(i), start, end);
          }
        }
      }
      wanted = starts;
    }
  }
}
