/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;

/** Writes terms as readable text, in coherent SI units, for messages. */
public final class TermPrinter {

  private static final int LONGEST = 120;
  private static final int CHOICE = 0;
  private static final int SUM = 1;
  private static final int PRODUCT = 2;
  private static final int POWER = 3;
  private static final int ATOM = 4;

  private final String timeName;
  private final TermTape tape;
  private final String[] texts;
  private final int[] ranks;

  private TermPrinter(TermTape tape, String timeName) {
    this.tape = tape;
    this.timeName = timeName;
    this.texts = new String[tape.size()];
    this.ranks = new int[tape.size()];
  }

  /**
   * Returns a term as text; parts beyond some length are replaced by dots.
   *
   * @param term the term
   * @param timeName name of the independent variable
   */
  public static String text(Term term, String timeName) {
    return new TermPrinter(TermTape.of(term), timeName).last();
  }

  private String last() {
    for (int i = 0; i < texts.length; i++) {
      String text = write(i);
      texts[i] = text.length() <= LONGEST ? text : "(...)";
      ranks[i] = text.length() <= LONGEST ? rank(tape.node(i)) : ATOM;
    }
    return texts[texts.length - 1];
  }

  private String write(int i) {
    return switch (tape.node(i)) {
      case Term.Constant number -> number(number.value());
      case Term.Time t -> timeName;
      case Term.ParameterTerm parameter -> parameter.parameter().name();
      case Term.LetTerm let ->
          let.let().dependsOnTime() ? let.let().name() + "(" + timeName + ")" : let.let().name();
      case Term.Sum sum -> part(i, 0, SUM) + " + " + part(i, 1, PRODUCT);
      case Term.Difference difference -> part(i, 0, SUM) + " - " + part(i, 1, PRODUCT);
      case Term.Product product -> part(i, 0, PRODUCT) + "*" + part(i, 1, POWER);
      case Term.Quotient quotient -> part(i, 0, PRODUCT) + "/" + part(i, 1, POWER);
      case Term.Negation negation -> "-" + part(i, 0, PRODUCT);
      case Term.Power power -> part(i, 0, ATOM) + "^" + part(i, 1, ATOM);
      case Term.Switch choice -> choice(choice, i);
      case Term.CurveTerm curve -> curve.name() + "(" + part(i, 0, SUM) + ")";
      case Term.Pulse pulse ->
          "pulse("
              + part(i, 0, SUM)
              + ", period = "
              + part(i, 1, SUM)
              + ", width = "
              + part(i, 2, SUM)
              + ", start = "
              + part(i, 3, SUM)
              + ")";
      case Term.FunctionTerm(Function function, List<Term> arguments) ->
          arguments.size() == 1
              ? function.code() + "(" + part(i, 0, SUM) + ")"
              : function.code() + "(" + part(i, 0, SUM) + ", " + part(i, 1, SUM) + ")";
    };
  }

  private String choice(Term.Switch choice, int i) {
    int gap = tape.operand(i, 0);
    boolean difference = choice.gap() instanceof Term.Difference;
    String left = difference ? part(gap, 0, SUM) : part(i, 0, SUM);
    String right = difference ? part(gap, 1, SUM) : "0";
    return "if "
        + left
        + (choice.atZero() ? " <= " : " < ")
        + right
        + " then "
        + part(i, 1, CHOICE)
        + " else "
        + part(i, 2, CHOICE);
  }

  private String part(int i, int which, int lowest) {
    int operand = tape.operand(i, which);
    return ranks[operand] >= lowest ? texts[operand] : "(" + texts[operand] + ")";
  }

  private static int rank(Term term) {
    return switch (term) {
      case Term.Constant number -> number.value() < 0 ? SUM : ATOM;
      case Term.Sum sum -> SUM;
      case Term.Difference difference -> SUM;
      case Term.Negation negation -> SUM;
      case Term.Product product -> PRODUCT;
      case Term.Quotient quotient -> PRODUCT;
      case Term.Power power -> POWER;
      case Term.Switch choice -> CHOICE;
      case Term.Pulse pulse -> ATOM;
      case Term.CurveTerm curve -> ATOM;
      case Term.Time t -> ATOM;
      case Term.ParameterTerm parameter -> ATOM;
      case Term.LetTerm let -> ATOM;
      case Term.FunctionTerm call -> ATOM;
    };
  }

  /** Returns the shortest text of a number that reads back as the same. */
  static String number(double value) {
    if (value == Math.rint(value) && Math.abs(value) < 1e15) {
      return Long.toString((long) value);
    }
    String text = Double.toString(value).replace('E', 'e');
    return text.replace(".0e", "e");
  }
}
