/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.spanloom.language.editing.Renaming.Changes;
import org.spanloom.language.editing.Renaming.Conflict;
import org.spanloom.language.editing.Renaming.NothingToRename;
import org.spanloom.language.editing.Renaming.Refused;
import org.spanloom.language.files.FileKey;
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

  private final ProjectNames project;
  private final FileKey file;
  private final Occurrence place;
  private final String newName;

  private Rename(ProjectNames project, FileKey file, Occurrence place, String newName) {
    this.project = project;
    this.file = file;
    this.place = place;
    this.newName = newName;
  }

  /** Returns what comes of giving a new name to what is named at an offset of a file by itself. */
  public static Renaming at(SyntaxFile file, int offset, String newName) {
    return at(ProjectNames.of(Map.of(FileKey.NONE, file)), FileKey.NONE, offset, newName);
  }

  /**
   * Returns what comes of giving a new name to what is named at an offset.
   *
   * @param project all files in which it may be named
   * @param file the file of the offset
   * @param offset where it is named
   * @param newName the name it shall have
   */
  public static Renaming at(ProjectNames project, FileKey file, int offset, String newName) {
    Optional<Occurrence> place = project.at(file, offset);
    if (place.isEmpty() || place.get().symbol().kind().isBuiltIn()) {
      return new NothingToRename();
    }
    return new Rename(project, file, place.get(), newName).rename();
  }

  private Renaming rename() {
    if (newName.equals(place.symbol().name())) {
      return new Changes(Map.of());
    }
    Optional<Conflict> unfit = unfit().or(this::taken);
    if (unfit.isPresent()) {
      return new Refused(List.of(unfit.get()));
    }
    Map<FileKey, List<TextEdit>> edits = new TreeMap<>();
    project
        .of(place.symbol())
        .forEach((key, places) ->
            edits.put(key, places.stream().map(o -> new TextEdit(o.span(), newName)).toList()));
    return changedMeaning(edits)
        .<Renaming>map(c -> new Refused(List.of(c)))
        .orElseGet(() -> new Changes(edits));
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
          file,
          place.span(),
          " is no name: a name is made of letters, digits and _, and does not begin with a digit.");
    }
    if (tokens.getFirst().kind() != TokenKind.NAME || Words.isReserved(newName)) {
      return conflict(
          file,
          place.span(),
          " is a word of the language and cannot name anything: choose another name.");
    }
    return NameScope.builtIn(newName)
        .flatMap(s ->
            conflict(
                file, place.span(), " is built in and cannot be declared: choose another name."));
  }

  private Optional<Conflict> conflict(FileKey in, Span span, String message) {
    return Optional.of(new Conflict(in, span, "\"" + newName + "\"" + message));
  }

  /** Finds a declaration of the new name that would be the same, hide this one or be hidden. */
  private Optional<Conflict> taken() {
    SymbolKind.Room room = place.symbol().kind().room();
    return project.names().values().stream()
        .flatMap(names -> names.sharingScope(place.symbol(), newName).stream())
        .findFirst()
        .flatMap(s ->
            conflict(
                s.file(),
                s.declarations().getFirst().name(),
                " is declared in "
                    + line(s.file(), s.declarations().getFirst().name())
                    + ": choose another name."));
  }

  /** Names a line, and its file if that is another one. */
  private String line(FileKey in, Span span) {
    String line = "line " + project.files().get(in).source().line(span.start());
    return in.equals(file) ? line : line + " of " + in.path();
  }

  /** A name with its place, the file of what it names, and the first name of the same thing. */
  private record Bound(Span span, int primes, FileKey declaredIn, int first) {}

  /**
   * Reads the changed texts and finds the first name in them that would stand for something else,
   * or could not be read.
   */
  private Optional<Conflict> changedMeaning(Map<FileKey, List<TextEdit>> edits) {
    Map<FileKey, SyntaxFile> changed = new TreeMap<>(project.files());
    edits.forEach((key, changes) -> {
      SourceText old = project.files().get(key).source();
      String text = TextEdit.apply(old.content(), changes);
      changed.put(key, Parser.parse(new SourceText(old.name(), text)));
    });
    ProjectNames after = ProjectNames.of(changed);
    for (FileKey key : project.files().keySet()) {
      Optional<Conflict> conflict = changedMeaning(key, after);
      if (conflict.isPresent()) {
        return conflict;
      }
    }
    return Optional.empty();
  }

  private Optional<Conflict> changedMeaning(FileKey key, ProjectNames after) {
    SyntaxFile old = project.files().get(key);
    List<Occurrence> before = project.names().get(key).occurrences();
    List<Bound> expected = bound(before, newName.length() - place.span().length());
    List<Bound> found = bound(after.names().get(key).occurrences(), 0);
    int same = 0;
    while (same < Math.min(expected.size(), found.size())
        && expected.get(same).equals(found.get(same))) {
      same++;
    }
    if (same == expected.size()
        && same == found.size()
        && after.files().get(key).problems().size() == old.problems().size()) {
      return Optional.empty();
    }
    if (same == before.size() && !key.equals(file)) {
      return conflict(
          key,
          new Span(0, 0),
          " would give names in " + key.path() + " a meaning: choose another name.");
    }
    Span first = same < before.size() ? before.get(same).span() : place.span();
    return conflict(
        key,
        first,
        " would change what \""
            + old.source().slice(first)
            + "\" in "
            + line(key, first)
            + " stands for: choose another name.");
  }

  /**
   * Numbers names by what they stand for.
   *
   * @param growth how much longer each name that is to change becomes
   */
  private List<Bound> bound(List<Occurrence> occurrences, int growth) {
    // Within one reading of a file, one symbol is one object.
    Map<Symbol, Integer> firsts = new IdentityHashMap<>();
    List<Bound> bound = new ArrayList<>();
    int shift = 0;
    for (Occurrence o : occurrences) {
      int longer = o.symbol().equals(place.symbol()) ? growth : 0;
      Span span = new Span(o.span().start() + shift, o.span().end() + shift + longer);
      firsts.putIfAbsent(o.symbol(), bound.size());
      bound.add(new Bound(span, o.primes(), o.symbol().file(), firsts.get(o.symbol())));
      shift += longer;
    }
    return bound;
  }
}
