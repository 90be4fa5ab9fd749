/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import java.util.Set;

/** The words of the language. */
public final class Words {

  /**
   * Words that begin a statement; reserved, so that a broken statement never swallows the next one.
   */
  public static final List<String> STATEMENT =
      List.of(
          "system",
          "parameter",
          "let",
          "state",
          "output",
          "initial",
          "basis",
          "row",
          "require",
          "accuracy",
          "import",
          "table",
          "input",
          "matrix",
          "for",
          "part",
          "transfer",
          "jump",
          "boundary");

  /** Reserved words inside statements. */
  public static final List<String> CLAUSE =
      List.of(
          "over",
          "from",
          "to",
          "after",
          "before",
          "at",
          "throughout",
          "until",
          "under",
          "becomes",
          "if",
          "then",
          "else");

  /** Words that follow {@code require}; names everywhere else. */
  public static final List<String> REQUIREMENT =
      List.of("condition", "scaled", "stable", "invariant", "nonnegative", "period");

  private static final Set<String> STATEMENT_SET = Set.copyOf(STATEMENT);
  private static final Set<String> CLAUSE_SET = Set.copyOf(CLAUSE);
  private static final Set<String> REQUIREMENT_SET = Set.copyOf(REQUIREMENT);

  private Words() {}

  /** Tells whether a word cannot be a name. */
  public static boolean isReserved(String word) {
    return STATEMENT_SET.contains(word) || CLAUSE_SET.contains(word);
  }

  /**
   * Returns the kind of a word.
   *
   * @param word the word
   * @param first the word that begins the statement, empty if this one does
   * @param previous the word directly before, empty if something else stands there
   */
  static TokenKind kind(String word, String first, String previous) {
    if (STATEMENT_SET.contains(word)) {
      return TokenKind.STATEMENT_WORD;
    }
    if (CLAUSE_SET.contains(word)) {
      return TokenKind.CLAUSE_WORD;
    }
    boolean inContext =
        switch (word) {
          case "values" -> previous.equals("initial");
          case "every" -> previous.equals("jump");
          case "outside" -> first.equals("transfer");
          case "file" -> (first.equals("matrix") || first.equals("table")) && previous.isEmpty();
          case "time", "column", "hold", "linear", "monotone" ->
              first.equals("table") && previous.isEmpty();
          case "extended", "cubic" -> first.equals("table") && !previous.equals("table");
          case "scale" -> first.equals("state") && !previous.equals("state");
          case "condition" -> previous.equals("scaled") || previous.equals("require");
          default -> REQUIREMENT_SET.contains(word) && previous.equals("require");
        };
    return inContext ? TokenKind.CONTEXT_WORD : TokenKind.NAME;
  }
}
