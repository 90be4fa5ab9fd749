/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.spanloom.language.model.Function;
import org.spanloom.language.model.Let;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.NamedConstant;
import org.spanloom.language.model.Parameter;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.model.TermEvaluator;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitNames;
import org.spanloom.language.units.UnitOfMeasure;
import org.spanloom.language.units.UnitReader;

/** Says what a word of a model means. */
public final class Hover {

  private static final int LONGEST_LINE = 160;

  private final Model model;
  private final Word word;
  private final List<String> lines = new ArrayList<>();

  private Hover(Model model, Word word) {
    this.model = model;
    this.word = word;
  }

  /** Returns what to say about the name or unit at an offset. */
  public static Optional<HoverText> at(Model model, int offset) {
    return Word.at(model.source(), offset).flatMap(word -> new Hover(model, word).text());
  }

  private Optional<HoverText> text() {
    if (word.token().kind() == TokenKind.UNIT) {
      unit();
      return result(word.token().span());
    }
    Optional<Declaration> declaration = word.declaration(model.syntax());
    if (declaration.isPresent()) {
      declaration(declaration.get());
    } else if (word.time(model.syntax()).isPresent()) {
      Span over = word.time(model.syntax()).get().span();
      lines.add("independent variable: " + line(over));
    } else if (word.token().kind().isName()) {
      builtIn();
    }
    return result(word.span());
  }

  private Optional<HoverText> result(Span span) {
    return lines.isEmpty() ? Optional.empty() : Optional.of(new HoverText(span, lines));
  }

  private void unit() {
    String code = word.text().substring(1, word.text().length() - 1).strip();
    switch (UnitReader.read(code)) {
      case UnitReader.Unknown unknown -> lines.add(unknown.message());
      case UnitReader.Known known -> {
        UnitOfMeasure unit = known.unit();
        String base = UnitNames.describe(unit.dimension());
        lines.add(
            UnitNames.quantity(unit.dimension())
                .map(quantity -> "[" + code + "]: " + quantity)
                .orElse("[" + code + "]"));
        lines.add(
            unit.offset() == 0
                ? "1 [" + code + "] = " + number(unit.factor()) + " [" + base + "]"
                : "0 [" + code + "] = " + number(unit.offset()) + " [" + base + "]");
      }
    }
  }

  private void declaration(Declaration declaration) {
    lines.add(line(declaration.span()));
    Optional<SystemModel> system =
        model.systems().stream().filter(s -> s.span().touches(word.token().start())).findFirst();
    system.ifPresent(s -> meaning(s, declaration));
    if (!declaration.documentation().isEmpty()) {
      lines.addAll(declaration.documentation().lines().toList());
    }
    lines.add("line " + model.source().line(declaration.span().start()));
  }

  private void meaning(SystemModel system, Declaration declaration) {
    String name = declaration.name().text();
    if (declaration instanceof StateStatement) {
      system.states().stream()
          .filter(c -> c.name().equals(name))
          .forEach(c -> component(system, c));
      return;
    }
    for (Parameter parameter : system.parameters()) {
      if (parameter.nameSpan().equals(declaration.name().span())) {
        parameter(parameter);
      }
    }
    for (Let let : system.lets()) {
      if (let.nameSpan().equals(declaration.name().span())) {
        let(let);
      }
    }
    system.outputs().stream()
        .filter(o -> o.nameSpan().equals(declaration.name().span()))
        .forEach(o ->
            lines.add(
                "output"
                    + in(o.unit())
                    + ", linear in "
                    + states(system, o.value().samples().size())));
  }

  private static String states(SystemModel system, int count) {
    return count + " of " + system.states().size() + " components";
  }

  private void parameter(Parameter parameter) {
    double value = parameter.unit().fromBase(TermEvaluator.constant(parameter.value()));
    StringBuilder text = new StringBuilder("parameter: " + number(value));
    if (parameter.uncertainty().isPresent()) {
      double half =
          TermEvaluator.constant(parameter.uncertainty().get()) / parameter.unit().factor();
      text.append(" (")
          .append(number(value - half))
          .append(" to ")
          .append(number(value + half))
          .append(')');
    }
    lines.add(text + in(parameter.unit()));
  }

  private void let(Let let) {
    lines.add(
        let.dependsOnTime()
            ? (let.isInput() ? "input, a function of time" : "function of time") + in(let.unit())
            : "value: "
                + number(let.unit().fromBase(TermEvaluator.constant(let.value())))
                + in(let.unit()));
  }

  private void component(SystemModel system, StateComponent component) {
    if (component.order() != word.primes() && !isLast(system, component)) {
      return;
    }
    if (component.order() == word.primes()) {
      lines.add(
          "component "
              + (component.index() + 1)
              + " of "
              + system.states().size()
              + in(component.unit()));
    }
    if (isLast(system, component) && !component.equation().equals(component.declaration())) {
      lines.add("governed by: " + line(component.equation()));
    }
  }

  private static boolean isLast(SystemModel system, StateComponent component) {
    int next = component.index() + 1;
    return next == system.states().size()
        || !system.states().get(next).name().equals(component.name());
  }

  private void builtIn() {
    Optional<Function> function = Function.named(word.text());
    function.ifPresent(f -> lines.add(f.code() + ": " + f.meaning()));
    NamedConstant.named(word.text())
        .ifPresent(c -> lines.add(c.code() + " = " + c.value() + ": " + c.meaning()));
  }

  private static String in(UnitOfMeasure unit) {
    return unit.code().equals(UnitOfMeasure.ONE.code()) ? "" : " [" + unit.code() + "]";
  }

  private String line(Span span) {
    String text =
        model
            .source()
            .slice(new Span(span.start(), Math.min(span.end(), span.start() + 4 * LONGEST_LINE)));
    String first = text.lines().findFirst().orElse("").strip();
    return first.length() <= LONGEST_LINE ? first : first.substring(0, LONGEST_LINE - 3) + "...";
  }

  /** Returns at most 10 significant digits. */
  private static String number(double value) {
    if (value == Math.rint(value) && Math.abs(value) < 1e10) {
      return String.valueOf((long) value);
    }
    String text = String.format(Locale.ROOT, "%.10g", value);
    return text.contains("e") ? text : text.replaceAll("0+$", "").replaceAll("\\.$", "");
  }
}
