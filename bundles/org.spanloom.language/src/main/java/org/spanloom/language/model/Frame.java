/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.model.Meaning.BrokenMeaning;
import org.spanloom.language.model.Meaning.FamilyMeaning;
import org.spanloom.language.model.Meaning.StateMeaning;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.QuotedText;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * One reading of a body of statements: that of a file, of a system, or of something inside a system
 * that is read once for each time it occurs. The same statements read in two frames may mean
 * different things, since names are looked up in the frame's scope.
 *
 * <p>Spans of statements belong to the frame's own text. What ends up in the model is placed in the
 * text of the file being read: see {@link #placed}.
 */
final class Frame {

  private final SourceFile file;
  private final List<Statement> body;
  private final Scope scope;
  private final Problems problems;
  private final String prefix;
  private final UnitResolver units;
  private final Resolver resolver;
  private final Declarations declarations;
  private final Optional<Span> place;
  private final Map<String, Binding> bindings;
  private UnitOfMeasure timeUnit = UnitOfMeasure.ONE;

  /**
   * Opens a frame.
   *
   * @param file where the statements stand
   * @param body the statements
   * @param scope the names they can use
   * @param problems takes what is wrong with them
   * @param prefix what stands before the names declared in it when they are named from without
   */
  Frame(SourceFile file, List<Statement> body, Scope scope, Problems problems, String prefix) {
    this(file, body, scope, problems, prefix, Optional.empty(), Map.of());
  }

  /**
   * Opens a frame whose statements stand somewhere else than where they take effect.
   *
   * @param place what stands for every place of the frame in the text of the file being read
   * @param bindings what parameters, inputs and initial values have other values than declared
   */
  Frame(
      SourceFile file,
      List<Statement> body,
      Scope scope,
      Problems problems,
      String prefix,
      Optional<Span> place,
      Map<String, Binding> bindings) {
    this.file = file;
    this.body = body;
    this.scope = scope;
    this.problems = problems;
    this.prefix = prefix;
    this.place = place;
    this.bindings = bindings;
    this.units = new UnitResolver(problems);
    this.resolver = new Resolver(this);
    this.declarations = new Declarations(this);
  }

  List<Statement> body() {
    return body;
  }

  Scope scope() {
    return scope;
  }

  Problems problems() {
    return problems;
  }

  UnitResolver units() {
    return units;
  }

  Resolver resolver() {
    return resolver;
  }

  /** Returns the parameters, named expressions and outputs of the frame. */
  Declarations declarations() {
    return declarations;
  }

  /** Returns the unit of time; the number 1 where it could not be read. */
  UnitOfMeasure timeUnit() {
    return timeUnit;
  }

  void setTimeUnit(UnitOfMeasure unit) {
    this.timeUnit = unit;
  }

  /** Returns how something declared in this frame is named by the whole system. */
  String label(String name) {
    return prefix.isEmpty() ? name : prefix + name;
  }

  /**
   * Returns the place in the text of the file being read that stands for a place of the frame's own
   * text.
   */
  Span placed(Span own) {
    return place.orElse(own);
  }

  /** Tells whether the statements stand in another place than the one they are shown at. */
  boolean isElsewhere() {
    return place.isPresent();
  }

  /** Returns what something declared in the frame is instead of what its declaration says. */
  Optional<Binding> binding(String label) {
    return Optional.ofNullable(bindings.get(label));
  }

  BrokenMeaning broken(Name name) {
    return new BrokenMeaning(placed(name.span()));
  }

  /** Returns the characters of a place of the frame's own text. */
  String slice(Span own) {
    return file.text().slice(own);
  }

  /** Returns the file that the statements stand in. */
  SourceFile file() {
    return file;
  }

  /**
   * Returns the text of a file of the project that a statement of this frame names; reports it if
   * there is none.
   */
  Optional<FileAccess.Found> text(QuotedText path) {
    return file.files().text(file.key(), path, problems);
  }

  /** Returns a state that the frame declares or can name. */
  Optional<StateMeaning> state(String name) {
    return scope.own(name).filter(StateMeaning.class::isInstance).map(StateMeaning.class::cast);
  }

  /** Returns the state of a name, or the members of the family; nothing if it is neither. */
  List<StateMeaning> states(String name) {
    Optional<Meaning> meaning = scope.own(name);
    if (meaning.isEmpty()) {
      return List.of();
    }
    return switch (meaning.get()) {
      case StateMeaning state -> List.of(state);
      case FamilyMeaning family -> family.members();
      default -> List.of();
    };
  }

  boolean isBroken(String name) {
    return scope.own(name).filter(BrokenMeaning.class::isInstance).isPresent();
  }

  /**
   * Returns the unit of a derivative that is not declared: the state's over that of time for each
   * prime.
   */
  UnitOfMeasure derivativeUnit(UnitOfMeasure unit, int primes) {
    if (primes == 0) {
      return unit;
    }
    String code = unit.offset() == 0 ? unit.code() : "K";
    String time = timeUnit.code();
    boolean single = time.chars().allMatch(Character::isLetter);
    boolean plain = time.equals(UnitOfMeasure.ONE.code());
    StringBuilder text = new StringBuilder(code.equals("1") && !plain ? "" : code);
    for (int i = 0; i < primes && !plain; i++) {
      text.append('/').append(single ? time : "(" + time + ")");
    }
    double factor = unit.offset() == 0 ? unit.factor() : 1;
    Dimension dimension = unit.dimension();
    for (int i = 0; i < primes; i++) {
      factor /= timeUnit.factor();
      dimension = dimension.over(timeUnit.dimension());
    }
    return new UnitOfMeasure(text.toString(), dimension, factor, 0);
  }

  /** Returns the offset behind the last statement, or another one where there is none. */
  int lastStatementEnd(int otherwise) {
    return body.isEmpty() ? otherwise : body.getLast().span().end();
  }

  /** Returns the blanks before the line that a statement begins in. */
  String indent(Span own) {
    SourceText source = file.text();
    String text = source.slice(source.lineSpan(source.line(own.start())));
    int blanks = 0;
    while (blanks < text.length() && (text.charAt(blanks) == ' ' || text.charAt(blanks) == '\t')) {
      blanks++;
    }
    return text.substring(0, blanks);
  }
}
