/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import org.spanloom.language.text.Span;

/**
 * Cuts a text into tokens. Every character belongs to a token or is white space; nothing makes it
 * fail. The work is linear in the length, and no token crosses the end of a line, so that an editor
 * can start anew at any line.
 *
 * <p>An opening bracket is a unit behind a number, a text or another unit; in a declaration, before
 * its first {@code =}, too, unless {@code ..} stands in it; everywhere else it opens an index.
 */
public final class Lexer {

  /** How far behind a blank the closing bracket of a unit is looked for; keeps the work linear. */
  private static final int UNIT_LOOK_AHEAD = 200;

  /** First words of statements in which a bracket before the first equals sign holds a unit. */
  private static final Set<String> DECLARATIONS =
      Set.of("system", "parameter", "let", "state", "output", "table", "input", "matrix");

  private final String text;
  private final int end;
  private final boolean oneLine;
  private final List<Token> tokens = new ArrayList<>();
  private final Spellings spellings;
  private Token last = new Token(TokenKind.NEWLINE, 0, 0);
  private int at;
  private String first = "";
  private String previousWord = "";
  private String wordBeforeName = "";
  private boolean beforeEquals = true;
  private int openSums;

  private Lexer(String text, int from, int end, boolean oneLine) {
    this.text = text;
    this.at = from;
    this.end = end;
    this.oneLine = oneLine;
    this.spellings = new Spellings(text);
  }

  /** Returns the tokens of a whole text, line ends included. */
  public static List<Token> lex(String text) {
    return new Lexer(text, 0, text.length(), false).run();
  }

  /**
   * Returns the tokens of one line, its line end included, exactly as {@link #lex} would find them.
   *
   * @param text the whole text
   * @param lineStart offset at which the line begins
   */
  public static List<Token> lexLine(String text, int lineStart) {
    return new Lexer(text, lineStart, text.length(), true).run();
  }

  /** Returns the tokens of a part of a text, for example of what stands in an index range. */
  static List<Token> lexPart(String text, Span part) {
    return new Lexer(text, part.start(), part.end(), false).run();
  }

  private List<Token> run() {
    while (at < end) {
      char c = text.charAt(at);
      if (c == '\n' || c == '\r') {
        lineEnd(c);
        if (oneLine) {
          break;
        }
      } else if (isBlank(c)) {
        at++;
      } else {
        token(c);
      }
    }
    return tokens;
  }

  private void lineEnd(char c) {
    add(TokenKind.NEWLINE, c == '\r' && next(1) == '\n' ? 2 : 1);
    beginStatement();
  }

  private void beginStatement() {
    first = "";
    previousWord = "";
    beforeEquals = true;
    openSums = 0;
  }

  private void token(char c) {
    if (c == '#') {
      comment();
    } else if (isDigit(c) || c == '.' && isDigit(next(1)) && !joinsNames()) {
      number();
    } else if (c < 128 ? isPlainLetter(c) : isNameStart(text.codePointAt(at))) {
      word();
    } else {
      if (c == '[') {
        bracket();
      } else if (c == '"') {
        string();
      } else {
        sign(c);
      }
      previousWord = "";
    }
  }

  private void comment() {
    int stop = lineStop();
    TokenKind kind = next(1) == '#' ? TokenKind.DOCUMENTATION : TokenKind.COMMENT;
    while (stop > at + 1 && isBlank(text.charAt(stop - 1))) {
      stop--;
    }
    add(kind, stop - at);
  }

  /** A number: digits, with a decimal point digits on both sides of it, and a power of ten. */
  private void number() {
    int start = at;
    boolean good = isDigit(text.charAt(at));
    int i = digits(at);
    if (charAt(i) == '.' && charAt(i + 1) != '.') {
      int fraction = digits(i + 1);
      good &= fraction > i + 1;
      i = fraction;
      while (charAt(i) == '.' && isDigit(charAt(i + 1))) {
        good = false;
        i = digits(i + 1);
      }
    }
    if (charAt(i) == 'e' || charAt(i) == 'E') {
      int sign = charAt(i + 1) == '+' || charAt(i + 1) == '-' ? 1 : 0;
      int exponent = digits(i + 1 + sign);
      if (exponent > i + 1 + sign) {
        i = exponent;
      } else if (!isNamePart(codePointAt(i + 1))) {
        good = false;
        i = i + 1 + sign;
      }
    }
    add(good ? TokenKind.NUMBER : TokenKind.BAD_NUMBER, text.substring(start, i));
    noteFirst("0");
    previousWord = "";
  }

  /** Words of the language have lower-case letters only; most names are told apart by that. */
  private void word() {
    int i = at;
    int hash = 0;
    boolean lowerCase = true;
    while (i < end) {
      char c = text.charAt(i);
      if (c < 128 ? isPlainLetter(c) || isDigit(c) : isNamePart(text.codePointAt(i))) {
        lowerCase &= c >= 'a' && c <= 'z';
        hash = 31 * hash + c;
        i++;
        if (Character.isHighSurrogate(c)) {
          hash = 31 * hash + text.charAt(i);
          i++;
        }
      } else {
        break;
      }
    }
    String word = spellings.of(at, i, hash);
    boolean name = !lowerCase || joinsNames();
    TokenKind kind = name ? TokenKind.NAME : Words.kind(word, first, previousWord);
    boolean ofSum = !name && kind == TokenKind.NAME && isWordOfSum(word, i);
    add(ofSum ? TokenKind.CONTEXT_WORD : kind, word);
    // Behind the scale of a state stand expressions, as behind an equals sign.
    beforeEquals &= kind != TokenKind.CONTEXT_WORD || !word.equals("scale");
    noteFirst(word);
    wordBeforeName = previousWord;
    previousWord = word;
  }

  /**
   * Tells whether a word is {@code sum} before {@code over}, or the {@code of} of such a sum on the
   * same line; both are names everywhere else.
   */
  private boolean isWordOfSum(String word, int behind) {
    if (word.equals("of") && openSums > 0) {
      openSums--;
      return true;
    }
    int i = behind;
    while (i < end && isBlank(text.charAt(i))) {
      i++;
    }
    boolean begins =
        i > behind
            && word.equals("sum")
            && text.startsWith("over", i)
            && !isNamePart(codePointAt(i + 4));
    openSums += begins ? 1 : 0;
    return begins;
  }

  private void noteFirst(String word) {
    if (first.isEmpty()) {
      first = word;
    }
  }

  private void string() {
    int i = at + 1;
    while (i < end && text.charAt(i) != '"' && text.charAt(i) != '\n' && text.charAt(i) != '\r') {
      i++;
    }
    boolean closed = charAt(i) == '"';
    add(closed ? TokenKind.STRING : TokenKind.OPEN_STRING, (closed ? i + 1 : i) - at);
  }

  private void bracket() {
    TokenKind before = previous();
    boolean afterQuantity =
        before == TokenKind.NUMBER || before == TokenKind.BAD_NUMBER || before == TokenKind.STRING;
    boolean declares =
        beforeEquals
            && DECLARATIONS.contains(first)
            && (!first.equals("system") || wordBeforeName.equals("over"));
    if (!afterQuantity && !declares) {
      add(TokenKind.OPEN_BRACKET, 1);
      return;
    }
    int depth = 0;
    int blank = -1;
    boolean range = false;
    int i = at;
    while (i < end && (blank < 0 || i < blank + UNIT_LOOK_AHEAD)) {
      char c = text.charAt(i);
      if (c == '\n' || c == '\r') {
        break;
      }
      if (blank < 0 && isBlank(c)) {
        blank = i;
      }
      range |= c == '.' && charAt(i + 1) == '.';
      depth += c == '[' ? 1 : c == ']' ? -1 : 0;
      i++;
      if (depth == 0) {
        add(declares && range ? TokenKind.INDEX_RANGE : TokenKind.UNIT, i - at);
        return;
      }
    }
    add(TokenKind.OPEN_UNIT, (blank < 0 ? i : blank) - at);
  }

  private void sign(char c) {
    char following = next(1);
    switch (c) {
      case '+' -> {
        if (following == '/' && next(2) == '-') {
          add(TokenKind.PLUS_MINUS, 3);
        } else {
          add(TokenKind.PLUS, 1);
        }
      }
      case '-' -> pair(following == '>', TokenKind.ARROW, TokenKind.MINUS);
      case '*' -> add(TokenKind.TIMES, 1);
      case '/' -> add(TokenKind.DIVIDE, 1);
      case '^' -> add(TokenKind.POWER, 1);
      case '=' -> {
        beforeEquals = false;
        add(TokenKind.EQUALS, 1);
      }
      case '<' -> pair(following == '=', TokenKind.AT_MOST, TokenKind.LESS);
      case '>' -> pair(following == '=', TokenKind.AT_LEAST, TokenKind.GREATER);
      case '±' -> add(TokenKind.PLUS_MINUS, 1);
      case '%' -> add(TokenKind.PERCENT, 1);
      case '\'' -> {
        int i = at;
        while (charAt(i) == '\'') {
          i++;
        }
        add(TokenKind.PRIMES, i - at);
      }
      case ',' -> add(TokenKind.COMMA, 1);
      case ';' -> {
        add(TokenKind.SEMICOLON, 1);
        beginStatement();
      }
      case '.' -> pair(following == '.', TokenKind.RANGE, TokenKind.DOT);
      case '(' -> add(TokenKind.OPEN_PARENTHESIS, 1);
      case ')' -> add(TokenKind.CLOSE_PARENTHESIS, 1);
      case ']' -> add(TokenKind.CLOSE_BRACKET, 1);
      case '{' -> {
        add(TokenKind.OPEN_BRACE, 1);
        beginStatement();
      }
      case '}' -> {
        add(TokenKind.CLOSE_BRACE, 1);
        beginStatement();
      }
      default -> bad();
    }
  }

  private void pair(boolean both, TokenKind two, TokenKind one) {
    add(both ? two : one, both ? 2 : 1);
  }

  /** Takes all characters up to one that can begin a token, so that a run of them is one token. */
  private void bad() {
    int i = at;
    do {
      i += Character.charCount(text.codePointAt(i));
    } while (i < end && isForeign(text.codePointAt(i)));
    add(TokenKind.BAD, i - at);
  }

  private static boolean isForeign(int c) {
    boolean plain =
        c < Character.MIN_SUPPLEMENTARY_CODE_POINT && (isBlank((char) c) || isDigit((char) c));
    return c > ' ' && !plain && !isNameStart(c) && !isSign(c);
  }

  private static boolean isSign(int c) {
    return "#[]\"+-*/^=<>±%',;.(){}".indexOf(c) >= 0;
  }

  /**
   * Tells whether a point directly before joins the coming word to a name, as in {@code lower.T}.
   */
  private boolean joinsNames() {
    return last.end() == at
        && (last.kind() == TokenKind.DOT || text.charAt(at) == '.' && last.kind().isName());
  }

  private TokenKind previous() {
    return last.kind();
  }

  private int lineStop() {
    int i = at;
    while (i < end && text.charAt(i) != '\n' && text.charAt(i) != '\r') {
      i++;
    }
    return i;
  }

  private int digits(int from) {
    int i = from;
    while (isDigit(charAt(i))) {
      i++;
    }
    return i;
  }

  private char next(int distance) {
    return charAt(at + distance);
  }

  private char charAt(int index) {
    return index < end ? text.charAt(index) : '\0';
  }

  private int codePointAt(int index) {
    return index < end ? text.codePointAt(index) : 0;
  }

  private void add(TokenKind kind, int length) {
    last = new Token(kind, at, at + length);
    tokens.add(last);
    at += length;
  }

  private void add(TokenKind kind, String word) {
    last = new Token(kind, at, at + word.length(), word);
    tokens.add(last);
    at += word.length();
  }

  /** A blank that is no line end; the no-break space and the byte order mark are blanks, too. */
  private static boolean isBlank(char c) {
    return c == ' ' || c == '\t' || c == '\f' || c == '\u000B' || c == '\u00A0' || c == '\uFEFF';
  }

  private static boolean isDigit(char c) {
    return c >= '0' && c <= '9';
  }

  private static boolean isPlainLetter(char c) {
    return c >= 'a' && c <= 'z' || c >= 'A' && c <= 'Z' || c == '_';
  }

  private static boolean isNameStart(int c) {
    return c < 128 ? isPlainLetter((char) c) : Character.isLetter(c);
  }

  private static boolean isNamePart(int c) {
    return isNameStart(c) || c >= '0' && c <= '9';
  }
}
