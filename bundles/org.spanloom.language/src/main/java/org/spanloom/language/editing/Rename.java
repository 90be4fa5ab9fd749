/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.editing.Renaming.Changes;
import org.spanloom.language.editing.Renaming.Conflict;
import org.spanloom.language.editing.Renaming.NothingToRename;
import org.spanloom.language.editing.Renaming.Refused;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.syntax.Words;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * Gives something another name wherever it is named. Nothing but names changes: primes, units,
 * comments and quoted texts stay. A new name that would change what any name in the text stands for
 * is refused, which is found out by reading the changed text.
 */
public final class Rename {

  private final SyntaxFile file;
  private final Names names;
  private final Occurrence place;
  private final String newName;

  private Rename(Names names, Occurrence place, String newName) {
    this.file = names.file();
    this.names = names;
    this.place = place;
    this.newName = newName;
  }

  /** Returns what comes of giving a new name to what is named at an offset. */
  public static Renaming at(SyntaxFile file, int offset, String newName) {
    Names names = Names.of(file);
    Optional<Occurrence> place = names.at(offset);
    if (place.isEmpty() || place.get().symbol().kind().isBuiltIn()) {
      return new NothingToRename();
    }
    return new Rename(names, place.get(), newName).rename();
  }

  private Renaming rename() {
    if (newName.equals(place.symbol().name())) {
      return new Changes(Map.of());
    }
    Optional<Conflict> unfit = unfit().or(this::taken);
    if (unfit.isPresent()) {
      return new Refused(List.of(unfit.get()));
    }
    List<Occurrence> before = names.occurrences();
    List<TextEdit> edits =
        before.stream()
            .filter(o -> o.symbol().equals(place.symbol()))
            .map(o -> new TextEdit(o.span(), newName))
            .toList();
    return changedMeaning(before, edits)
        .<Renaming>map(c -> new Refused(List.of(c)))
        .orElseGet(() -> new Changes(Map.of(file.source().name(), edits)));
  }

  /** Tells why a text cannot name anything. */
  private Optional<Conflict> unfit() {
    List<Token> tokens = Lexer.lex(newName);
    boolean word =
        tokens.size() == 1
            && tokens.getFirst().kind().isWord()
            && tokens.getFirst().span().length() == newName.length();
    if (!word) {
      return conflict(
          place.span(),
          " is no name: a name is made of letters, digits and _, and does not begin with a digit.");
    }
    if (tokens.getFirst().kind() != TokenKind.NAME || Words.isReserved(newName)) {
      return conflict(
          place.span(),
          " is a word of the language and cannot name anything: choose another name.");
    }
    return NameScope.builtIn(newName)
        .flatMap(s ->
            conflict(place.span(), " is built in and cannot be declared: choose another name."));
  }

  private Optional<Conflict> conflict(Span span, String message) {
    return Optional.of(new Conflict(span, "\"" + newName + "\"" + message));
  }

  /** Finds a declaration of the new name that would be the same, hide this one or be hidden. */
  private Optional<Conflict> taken() {
    SymbolKind.Room room = place.symbol().kind().room();
    return names.sharingScope(place.symbol(), newName).stream()
        .flatMap(s -> s.declarations().stream())
        .findFirst()
        .flatMap(d ->
            conflict(
                d.name(),
                " is declared in line "
                    + file.source().line(d.name().start())
                    + ": choose another name."));
  }

  /** A name with its place and the number of the first name that stands for the same. */
  private record Bound(Span span, int primes, int first) {}

  /**
   * Reads the changed text and finds the first name in it that would stand for something else, or
   * could not be read.
   */
  private Optional<Conflict> changedMeaning(List<Occurrence> before, List<TextEdit> edits) {
    SourceText source = file.source();
    SyntaxFile read =
        Parser.parse(new SourceText(source.name(), TextEdit.apply(source.content(), edits)));
    List<Bound> expected = bound(before, newName.length() - place.span().length());
    List<Bound> found = bound(Names.of(read).occurrences(), 0);
    int same = 0;
    while (same < Math.min(expected.size(), found.size())
        && expected.get(same).equals(found.get(same))) {
      same++;
    }
    if (same == expected.size()
        && same == found.size()
        && read.problems().size() == file.problems().size()) {
      return Optional.empty();
    }
    Span first = same < before.size() ? before.get(same).span() : place.span();
    return conflict(
        first,
        " would change what \""
            + source.slice(first)
            + "\" in line "
            + source.line(first.start())
            + " stands for: choose another name.");
  }

  /**
   * Numbers names by what they stand for.
   *
   * @param growth how much longer each name that is to change becomes
   */
  private List<Bound> bound(List<Occurrence> occurrences, int growth) {
    Map<Symbol, Integer> firsts = new HashMap<>();
    List<Bound> bound = new ArrayList<>();
    int shift = 0;
    for (Occurrence o : occurrences) {
      int longer = o.symbol().equals(place.symbol()) ? growth : 0;
      Span span = new Span(o.span().start() + shift, o.span().end() + shift + longer);
      firsts.putIfAbsent(o.symbol(), bound.size());
      bound.add(new Bound(span, o.primes(), firsts.get(o.symbol())));
      shift += longer;
    }
    return bound;
  }
}
