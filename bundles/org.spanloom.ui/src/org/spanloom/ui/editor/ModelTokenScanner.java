/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.TextAttribute;
import org.eclipse.jface.text.rules.IToken;
import org.eclipse.jface.text.rules.ITokenScanner;
import org.eclipse.jface.text.rules.Token;
import org.eclipse.swt.SWT;
import org.spanloom.language.syntax.Category;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.ui.theme.ThemeColour;
import org.spanloom.ui.theme.ThemeColours;

/**
 * Gives the viewer the tokens of the language's own lexer. No token crosses a line, so a range that
 * is widened to whole lines is all that a repair needs.
 */
final class ModelTokenScanner implements ITokenScanner {

  private static final IToken PLAIN = new Token(null);

  private final Map<Category, IToken> styles = new EnumMap<>(Category.class);
  private List<Piece> pieces = List.of();
  private int next;

  /** A range of the document in one style. */
  private record Piece(int start, int end, IToken style) {}

  ModelTokenScanner() {
    readColours();
  }

  /** Takes the colours of the current theme. */
  void readColours() {
    styles.clear();
    for (Category category : Category.values()) {
      styles.put(category, style(category));
    }
  }

  private static IToken style(Category category) {
    return switch (category) {
      case KEYWORD -> style(ThemeColour.KEYWORD, SWT.BOLD);
      case NUMBER -> style(ThemeColour.NUMBER, SWT.NORMAL);
      case UNIT -> style(ThemeColour.UNIT, SWT.NORMAL);
      case OPERATOR -> style(ThemeColour.OPERATOR, SWT.NORMAL);
      case COMMENT -> style(ThemeColour.COMMENT, SWT.NORMAL);
      case DOCUMENTATION -> style(ThemeColour.DOCUMENTATION, SWT.NORMAL);
      case STRING -> style(ThemeColour.TEXT, SWT.NORMAL);
      case BAD -> style(ThemeColour.BAD, SWT.NORMAL);
      case NAME, BRACKET, LINE_END -> PLAIN;
    };
  }

  private static IToken style(ThemeColour colour, int font) {
    return new Token(new TextAttribute(ThemeColours.get(colour), null, font));
  }

  @Override
  public void setRange(IDocument document, int offset, int length) {
    next = 0;
    try {
      IRegion firstLine = document.getLineInformationOfOffset(offset);
      int start = firstLine.getOffset();
      String text = document.get(start, offset + length - start);
      pieces = pieces(Lexer.lex(text), start, offset, offset + length);
    } catch (BadLocationException e) {
      // The document changed under the viewer, which asks again.
      pieces = List.of();
    }
  }

  /** The viewer wants the pieces without gaps. */
  private List<Piece> pieces(
      List<org.spanloom.language.syntax.Token> tokens, int shift, int from, int to) {
    List<Piece> all = new ArrayList<>();
    int at = from;
    for (org.spanloom.language.syntax.Token token : tokens) {
      int start = Math.max(token.start() + shift, from);
      int end = Math.min(token.end() + shift, to);
      if (end <= at) {
        continue;
      }
      if (start > at) {
        all.add(new Piece(at, start, PLAIN));
      }
      all.add(new Piece(Math.max(start, at), end, styles.get(token.kind().category())));
      at = end;
    }
    if (at < to) {
      all.add(new Piece(at, to, PLAIN));
    }
    return all;
  }

  @Override
  public IToken nextToken() {
    next++;
    return next <= pieces.size() ? pieces.get(next - 1).style() : Token.EOF;
  }

  @Override
  public int getTokenOffset() {
    return pieces.get(next - 1).start();
  }

  @Override
  public int getTokenLength() {
    Piece piece = pieces.get(next - 1);
    return piece.end() - piece.start();
  }
}
