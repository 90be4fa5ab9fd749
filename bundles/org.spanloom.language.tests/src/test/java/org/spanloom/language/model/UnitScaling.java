/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.BlockLine;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Expression.ParenthesisedExpression;
import org.spanloom.language.syntax.Expression.PowerExpression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.syntax.Expression.SumExpression;
import org.spanloom.language.syntax.OverClause;
import org.spanloom.language.syntax.RequireClause;
import org.spanloom.language.syntax.RequireClause.Compares;
import org.spanloom.language.syntax.RequireClause.HasPeriod;
import org.spanloom.language.syntax.RequireClause.IsInvariant;
import org.spanloom.language.syntax.RequireClause.LimitsCondition;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.RequireStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.TransferStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.syntax.UnitText;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitReader;

/**
 * Writes a model in other units: what was in hours is in seconds, what was in metres in
 * millimetres, and so on, with the numbers changed to match.
 */
final class UnitScaling {

  private static final Map<String, String> OTHER =
      Map.of("h", "s", "m", "mm", "kg", "g", "g", "mg", "s", "ms", "d", "h", "min", "s");
  private static final Pattern SYMBOL = Pattern.compile("[A-Za-z_%]+");

  private final List<TextEdit> edits = new ArrayList<>();
  private final Map<String, Double> factors = new HashMap<>();
  private double timeFactor = 1;
  private boolean complete = true;

  private UnitScaling() {}

  /** Returns the text in other units; empty if it holds statements that are not rewritten here. */
  static Optional<String> of(SyntaxFile file) {
    UnitScaling scaling = new UnitScaling();
    file.statements().forEach(scaling::statement);
    scaling.edits.sort(Comparator.comparingInt(e -> e.span().start()));
    return scaling.complete
        ? Optional.of(TextEdit.apply(file.source().content(), scaling.edits))
        : Optional.empty();
  }

  private void statement(Statement statement) {
    switch (statement) {
      case SystemStatement system -> system(system);
      case ParameterStatement p -> {
        double factor = unit(p.unit());
        given(p.value(), factor);
        p.uncertainty().ifPresent(u -> given(u.halfWidth(), u.percent() ? 1 : factor));
      }
      case LetStatement let -> given(let.value(), unit(let.unit()));
      case InputStatement input -> given(input.value(), unit(input.unit()));
      case OutputStatement output -> given(output.value(), unit(output.unit()));
      case StateStatement state -> {
        double factor = unit(state.unit());
        factors.put(state.label(), factor);
        state.initial().ifPresent(e -> given(e, factor));
        state.scale().ifPresent(e -> given(e, factor));
      }
      case EquationStatement equation -> {
        expression(equation.left());
        expression(equation.right());
      }
      case TransferStatement transfer -> expression(transfer.flow());
      case InitialValuesStatement values -> {
        values.time().ifPresent(e -> given(e, timeFactor));
        BlockLine.each(values.settings(), s -> given(s.value(), factor(s.target())));
      }
      case RequireStatement require -> clause(require.clause());
      case Statement.AccuracyStatement accuracy -> {}
      default -> complete = false;
    }
  }

  private void system(SystemStatement system) {
    factors.clear();
    OverClause over = system.over().orElseThrow();
    timeFactor = unit(over.unit());
    over.start().ifPresent(b -> given(b.value(), timeFactor));
    over.end().ifPresent(b -> given(b.value(), timeFactor));
    system.body().stream().filter(StateStatement.class::isInstance).forEach(this::statement);
    system.body().stream().filter(s -> !(s instanceof StateStatement)).forEach(this::statement);
  }

  private void clause(RequireClause clause) {
    switch (clause) {
      case Compares compares -> {
        expression(compares.comparison().left());
        expression(compares.comparison().right());
        compares.until().ifPresent(e -> given(e, timeFactor));
      }
      case HasPeriod period -> given(period.period(), timeFactor);
      case IsInvariant invariant -> expression(invariant.value());
      case LimitsCondition limits -> limits.until().ifPresent(e -> given(e, timeFactor));
      default -> {}
    }
  }

  /** Returns by what the numbers of a component grow; a rate without declaration is over time. */
  private double factor(NameExpression component) {
    Double declared = factors.get(component.label());
    double state = factors.getOrDefault(component.name().text(), 1.0);
    return declared != null ? declared : state / Math.pow(timeFactor, component.primes());
  }

  /** Takes a value given to something with a unit, which a number alone takes. */
  private void given(Expression value, double factor) {
    switch (value) {
      case NumberExpression number when number.unit().isEmpty() ->
          number(number.span(), number.digits(), factor);
      case SignedExpression signed
          when signed.operand() instanceof NumberExpression number && number.unit().isEmpty() ->
          number(number.span(), number.digits(), factor);
      default -> expression(value);
    }
  }

  private void expression(Expression expression) {
    switch (expression) {
      case NumberExpression number when number.unit().isPresent() -> {
        double factor = unit(number.unit());
        int end = number.span().start() + number.digits().length();
        number(new Span(number.span().start(), end), number.digits(), factor);
      }
      case CallExpression call -> {
        boolean sampled =
            call.arguments().size() == 1 && Function.named(call.callee().name().text()).isEmpty();
        call.arguments().forEach(a -> given(a.value(), sampled ? timeFactor : 1));
      }
      case SignedExpression signed -> expression(signed.operand());
      case SumExpression sum -> sum.addends().forEach(a -> expression(a.value()));
      case ProductExpression product -> product.factors().forEach(f -> expression(f.value()));
      case PowerExpression power -> {
        expression(power.base());
        expression(power.exponent());
      }
      case ParenthesisedExpression inner -> expression(inner.inner());
      case NumberExpression number -> {}
      case NameExpression name -> {}
      default -> complete = false;
    }
  }

  private void number(Span span, String digits, double factor) {
    if (factor != 1) {
      edits.add(new TextEdit(span, String.valueOf(Double.parseDouble(digits) * factor)));
    }
  }

  /** Replaces a unit and returns by what the numbers in it grow. */
  private double unit(Optional<UnitText> unit) {
    if (unit.isEmpty() || !unit.get().code().matches("[A-Za-z_%0-9./()-]*")) {
      return 1;
    }
    String code = unit.get().code();
    Matcher symbol = SYMBOL.matcher(code);
    String other = symbol.replaceAll(s -> OTHER.getOrDefault(s.group(), s.group()));
    if (other.equals(code)) {
      return 1;
    }
    edits.add(new TextEdit(unit.get().span(), "[" + other + "]"));
    return factor(code) / factor(other);
  }

  private static double factor(String code) {
    return UnitReader.read(code) instanceof UnitReader.Known known ? known.unit().factor() : 1;
  }
}
