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
import org.spanloom.language.editing.Symbol.Declared;
import org.spanloom.language.model.Function;
import org.spanloom.language.model.Jump;
import org.spanloom.language.model.Let;
import org.spanloom.language.model.MatrixFunction;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.NamedConstant;
import org.spanloom.language.model.NamedMatrix;
import org.spanloom.language.model.Parameter;
import org.spanloom.language.model.PulseTrain;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.model.TermEvaluator;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitNames;
import org.spanloom.language.units.UnitOfMeasure;
import org.spanloom.language.units.UnitReader;

/** Says what a word of a model means. */
public final class Hover {

  private static final int LONGEST_LINE = 160;

  private final Model model;
  private final List<String> lines = new ArrayList<>();

  private Hover(Model model) {
    this.model = model;
  }

  /** Returns what to say about the name or unit at an offset. */
  public static Optional<HoverText> at(Model model, int offset) {
    Optional<Occurrence> name = Names.of(model.syntax()).at(offset);
    if (name.isEmpty()) {
      Optional<PartNames.Found> imported = new PartNames(model).importedAt(offset);
      if (imported.isPresent()) {
        return new Hover(model).imported(imported.get(), offset);
      }
    }
    return name.isPresent()
        ? new Hover(model).name(name.get())
        : unitAt(model.source(), offset).flatMap(unit -> new Hover(model).unit(unit));
  }

  private static Optional<Span> unitAt(SourceText source, int offset) {
    if (offset < 0 || offset > source.content().length()) {
      return Optional.empty();
    }
    int lineStart = source.lineSpan(source.line(offset)).start();
    return Lexer.lexLine(source.content(), lineStart).stream()
        .filter(t -> t.kind() == TokenKind.UNIT && t.span().touches(offset))
        .map(Token::span)
        .findFirst();
  }

  private Optional<HoverText> imported(PartNames.Found found, int offset) {
    SourceText source = found.syntax().source();
    Declaration declaration = found.declaration();
    lines.add(line(source, declaration.span()));
    List<Token> path = PartNames.path(model.source(), offset);
    Span word = path.getLast().span();
    systemAt(offset)
        .ifPresent(s -> inPart(s, model.source().slice(path.getFirst().span().join(word))));
    lines.addAll(declaration.documentation().lines().toList());
    lines.add(found.file().path() + ", line " + source.line(declaration.span().start()));
    return result(word);
  }

  private Optional<SystemModel> systemAt(int offset) {
    return model.systems().stream().filter(s -> s.span().touches(offset)).findFirst();
  }

  /** Says what something is whose name the whole system knows. */
  private void inPart(SystemModel system, String name) {
    system.states().stream()
        .filter(c -> c.name().equals(name))
        .forEach(c -> component(system, c, 0));
    system.parameters().stream().filter(p -> p.name().equals(name)).forEach(this::parameter);
    system.lets().stream().filter(l -> l.name().equals(name)).forEach(this::let);
    system.outputs().stream()
        .filter(o -> o.name().equals(name))
        .forEach(o -> lines.add("output" + in(o.unit())));
  }

  private Optional<HoverText> name(Occurrence name) {
    Optional<Declared> declared = name.symbol().declaration(name.primes());
    if (declared.isEmpty()) {
      builtIn(name.symbol().name());
    } else if (name.symbol().kind() == SymbolKind.TIME) {
      lines.add("independent variable: " + line(declared.get().statement()));
    } else if (name.symbol().kind() == SymbolKind.INDEX) {
      lines.add("index: " + line(declared.get().statement()));
    } else {
      declaration(name, declared.get());
    }
    return result(name.label());
  }

  private Optional<HoverText> result(Span span) {
    return lines.isEmpty() ? Optional.empty() : Optional.of(new HoverText(span, lines));
  }

  private Optional<HoverText> unit(Span place) {
    String text = model.source().slice(place);
    String code = text.substring(1, text.length() - 1).strip();
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
    return result(place);
  }

  private void declaration(Occurrence name, Declared declared) {
    lines.add(line(declared.statement()));
    List<Token> path = PartNames.path(model.source(), name.span().end());
    boolean dotted = path.size() > 1;
    systemAt(name.span().start())
        .ifPresent(s -> {
          if (dotted) {
            inPart(s, model.source().slice(path.getFirst().span().join(path.getLast().span())));
          } else {
            meaning(s, name, declared);
          }
        });
    lines.addAll(declared.documentation().lines().toList());
    lines.add("line " + model.source().line(declared.statement().start()));
  }

  private void meaning(SystemModel system, Occurrence name, Declared declared) {
    if (name.symbol().kind() == SymbolKind.STATE) {
      String family = name.symbol().name();
      List<StateComponent> own =
          system.states().stream().filter(c -> c.name().equals(family)).toList();
      if (!own.isEmpty() && own.getFirst().label().startsWith(family + "[")) {
        family(system, own, name.primes());
      } else {
        own.forEach(c -> component(system, c, name.primes()));
      }
      return;
    }
    system.parameters().stream()
        .filter(p -> p.nameSpan().equals(declared.name()))
        .forEach(this::parameter);
    system.lets().stream().filter(l -> l.nameSpan().equals(declared.name())).forEach(this::let);
    system.matrices().stream()
        .filter(m -> m.nameSpan().equals(declared.name()))
        .forEach(this::matrix);
    system.outputs().stream()
        .filter(o -> o.nameSpan().equals(declared.name()))
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

  private void matrix(NamedMatrix matrix) {
    long places = (long) matrix.rows() * matrix.columns();
    lines.add(
        (matrix.dependsOnTime() ? "matrix, a function of time: " : "matrix: ")
            + matrix.rows()
            + " x "
            + matrix.columns()
            + in(matrix.unit())
            + (matrix.entries() < places
                ? ", " + matrix.entries() + " entries that are not 0"
                : ""));
  }

  /** Says what the members of a family are, or their derivatives. */
  private void family(SystemModel system, List<StateComponent> components, int primes) {
    List<StateComponent> named = components.stream().filter(c -> c.order() == primes).toList();
    long members = components.stream().filter(c -> c.order() == 0).count();
    if (named.isEmpty()) {
      lines.add("family of " + members + " states");
      return;
    }
    lines.add(
        "family of "
            + members
            + " states, components "
            + named.getFirst().label()
            + " to "
            + named.getLast().label()
            + in(named.getFirst().unit()));
    StateComponent middle = named.get(named.size() / 2);
    if (isLast(system, middle) && !middle.equation().equals(middle.declaration())) {
      lines.add(middle.label() + " governed by: " + line(middle.equation()));
    }
  }

  private void component(SystemModel system, StateComponent component, int primes) {
    if (component.order() != primes && !isLast(system, component)) {
      return;
    }
    if (component.order() == primes) {
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
    if (component.order() == primes) {
      for (Jump jump : system.jumps()) {
        boolean changed = jump.changes().stream().anyMatch(c -> c.component() == component.index());
        if (changed) {
          lines.add("changed by: jump " + line(jump.timesSpan()));
        }
      }
    }
  }

  private static boolean isLast(SystemModel system, StateComponent component) {
    int next = component.index() + 1;
    return next == system.states().size()
        || !system.states().get(next).name().equals(component.name())
        || system.states().get(next).order() == 0;
  }

  private void builtIn(String name) {
    Optional<Function> function = Function.named(name);
    function.ifPresent(f -> lines.add(f.code() + ": " + f.meaning()));
    MatrixFunction.named(name).ifPresent(f -> lines.add(f.code() + ": " + f.meaning()));
    if (name.equals(PulseTrain.NAME)) {
      lines.add(name + ": " + PulseTrain.MEANING);
    }
    NamedConstant.named(name)
        .ifPresent(c -> lines.add(c.code() + " = " + c.value() + ": " + c.meaning()));
  }

  private static String in(UnitOfMeasure unit) {
    return unit.code().equals(UnitOfMeasure.ONE.code()) ? "" : " [" + unit.code() + "]";
  }

  private String line(Span span) {
    return line(model.source(), span);
  }

  private static String line(SourceText source, Span span) {
    String text =
        source.slice(new Span(span.start(), Math.min(span.end(), span.start() + 4 * LONGEST_LINE)));
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
