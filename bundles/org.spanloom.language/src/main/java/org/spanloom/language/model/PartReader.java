/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Nearest;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.Setting;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.text.Span;

/** Opens the frames of parts. */
final class PartReader {

  private final SystemStatement system;
  private final PartBudget budget;
  private final List<PartProblems> opened = new ArrayList<>();

  /**
   * A part and where its problems gather until it is known which of them are its own.
   *
   * @param part its name as the whole system uses it
   * @param place its statement in the text of the file being read
   */
  record PartProblems(String part, Span place, SystemType type, Problems found) {}

  /** A part that can be read. */
  record Part(Frame frame, SystemType type) {}

  PartReader(SystemStatement system, PartBudget budget) {
    this.system = system;
    this.budget = budget;
  }

  /** Returns the parts opened so far with what is wrong in them. */
  List<PartProblems> opened() {
    return opened;
  }

  /**
   * Opens the frame of a part.
   *
   * @param around the frame that its statement stands in
   * @param types the systems that this frame is part of, the innermost last
   */
  Optional<Part> open(Frame around, List<SystemStatement> types, PartStatement statement) {
    Name named = statement.system();
    SystemType type = around.file().systems().get(named.text());
    if (type == null) {
      reportUnknown(around, named);
      return Optional.empty();
    }
    Span place = around.placed(statement.header());
    if (types.contains(type.statement())) {
      reportCircle(around, types, type, named);
      return Optional.empty();
    }
    if (!budget.allows(type.statement(), types.size())) {
      if (budget.isFirstRefusal()) {
        report(
            around,
            ProblemKind.PARTS_TOO_MANY,
            named.span(),
            "Parts stand in parts at most "
                + PartBudget.DEPTH_LIMIT
                + " deep, and all parts of a file hold at most "
                + PartBudget.STATEMENT_LIMIT
                + " statements together: this one would be beyond. Make the model smaller.");
      }
      return Optional.empty();
    }
    String label = around.label(statement.name().text());
    Problems problems = new Problems();
    opened.add(new PartProblems(label, place, type, problems));
    Frame frame =
        new Frame(
            type.file().file(),
            type.statement().body(),
            new Scope(Optional.of(type.file().scope())),
            problems,
            label + ".",
            Optional.of(place),
            bindings(around, statement, type));
    return Optional.of(new Part(frame, type));
  }

  private static void report(
      Frame frame, ProblemKind kind, Span span, String message, Fix... fixes) {
    frame.problems().report(kind, span, message, fixes);
  }

  private static void reportUnknown(Frame around, Name named) {
    if (around.scope().isOpen()) {
      return;
    }
    Optional<String> nearest =
        around.problems().maySuggest()
            ? Nearest.of(named.text(), around.file().systems().keySet())
            : Optional.empty();
    report(
        around,
        ProblemKind.NAME_UNKNOWN,
        named.span(),
        "There is no system \""
            + Quotes.shortened(named.text())
            + "\" in this file or in one that it imports: "
            + nearest
                .map(n -> "did you mean " + n + "?")
                .orElse("write it, or import the file that it stands in."),
        nearest.stream().map(n -> Fix.replace("Write " + n, named.span(), n)).toArray(Fix[]::new));
  }

  /** A circle is reported by each system on it, and by no other. */
  private void reportCircle(
      Frame around, List<SystemStatement> types, SystemType type, Name named) {
    if (!type.statement().equals(system)) {
      return;
    }
    List<String> names = new ArrayList<>();
    types.forEach(t -> names.add(t.name().text()));
    names.add(type.statement().name().text());
    report(
        around,
        ProblemKind.PART_OF_ITSELF,
        named.span(),
        "The system "
            + system.name().text()
            + " would be a part of itself: "
            + String.join(" -> ", names)
            + ". Break the circle.");
  }

  /** Returns what the lines of a part set; reports those that set nothing that can be set. */
  private static Map<String, Binding> bindings(
      Frame around, PartStatement statement, SystemType type) {
    Map<String, Declaration> declared = new HashMap<>();
    for (Statement s : type.statement().body()) {
      if (s instanceof Declaration declaration) {
        declared.putIfAbsent(declaration.name().text(), declaration);
      }
    }
    Map<String, Binding> bindings = new HashMap<>();
    Set<String> seen = new HashSet<>();
    for (Setting setting : statement.bindings()) {
      NameExpression target = setting.target();
      Declaration declaration = declared.get(target.name().text());
      if (declaration == null) {
        reportUnknownTarget(around, type, target, declared.keySet());
      } else if (target.isIndexed()) {
        reportIndexed(around, statement, target, declaration);
      } else if (!canBeBound(declaration, target)) {
        reportFixed(around, type, target, declaration);
      } else if (!seen.add(target.label())) {
        report(
            around,
            ProblemKind.NAME_DUPLICATE,
            target.span(),
            "\"" + target.label() + "\" is given twice in this part: remove one of the two lines.");
      } else {
        bindings.put(target.label(), new Binding(around, setting.value()));
      }
    }
    return bindings;
  }

  private static boolean canBeBound(Declaration declaration, NameExpression target) {
    return declaration instanceof StateStatement
        || target.primes() == 0
            && (declaration instanceof ParameterStatement || declaration instanceof InputStatement);
  }

  private static void reportUnknownTarget(
      Frame around, SystemType type, NameExpression target, Set<String> names) {
    Optional<String> nearest =
        around.problems().maySuggest() ? Nearest.of(target.name().text(), names) : Optional.empty();
    report(
        around,
        ProblemKind.NAME_UNKNOWN,
        target.name().span(),
        "\""
            + Quotes.shortened(target.name().text())
            + "\" is not declared in the system "
            + type.statement().name().text()
            + ": "
            + nearest
                .map(n -> "did you mean " + n + "?")
                .orElse("name a parameter, an input or a state of it."),
        nearest.stream()
            .map(n -> Fix.replace("Write " + n, target.name().span(), n))
            .toArray(Fix[]::new));
  }

  private static void reportIndexed(
      Frame around, PartStatement statement, NameExpression target, Declaration declaration) {
    boolean family = declaration instanceof StateStatement state && state.isFamily();
    String shown = Quotes.shortened(around.slice(target.span()));
    Span index = new Span(target.name().span().end(), target.span().end() - target.primes());
    report(
        around,
        ProblemKind.BINDING_INVALID,
        target.span(),
        family
            ? "A part gives a family one value for all of its members: write \""
                + target.label()
                + "\" without an index, or give \""
                + statement.name().text()
                + "."
                + shown
                + "\" in a set of initial values."
            : "\"" + shown + "\" has an index, but only a family of states has: remove it.",
        Fix.replace("Remove the index", index, ""));
  }

  private static void reportFixed(
      Frame around, SystemType type, NameExpression target, Declaration declaration) {
    boolean bindable =
        declaration instanceof ParameterStatement || declaration instanceof InputStatement;
    report(
        around,
        ProblemKind.BINDING_INVALID,
        target.span(),
        bindable
            ? "\"" + target.label() + "\" has primes, but only a state has: remove them."
            : "\""
                + target.label()
                + "\" of the system "
                + type.statement().name().text()
                + " is fixed there: a part sets parameters, inputs and initial values of states"
                + " only.");
  }
}
