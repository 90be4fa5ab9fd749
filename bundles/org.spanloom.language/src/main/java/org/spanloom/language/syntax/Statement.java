/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.text.Span;

/** A statement as written; spans reach from the first to the last token of the statement. */
public sealed interface Statement {

  /** Returns its place. */
  Span span();

  /** A statement that declares a name. */
  sealed interface Declaration extends Statement {
    /** Returns the name declared. */
    Name name();

    /** Returns the documentation comments, empty if none. */
    String documentation();
  }

  /**
   * {@code system ColdStore over t [h] from 0 to 48 { ... }}.
   *
   * @param over the independent variable and its interval; empty where it cannot be read
   * @param header the first line
   */
  record SystemStatement(
      Name name,
      Optional<OverClause> over,
      List<Statement> body,
      String documentation,
      Span header,
      Span span)
      implements Declaration {
    /** Copies the list. */
    public SystemStatement {
      body = List.copyOf(body);
    }
  }

  /** {@code import "materials.span"}: brings what another file declares. */
  record ImportStatement(QuotedText path, Span span) implements Statement {}

  /**
   * {@code part lower = Zone { g = 0.2 [kW/K]; T_side = upper.T }}: a system inside of this one.
   *
   * @param system the name of the system that it is a copy of
   * @param bindings what its parameters, inputs and initial values are here
   * @param allRead whether every line of the block could be read
   * @param header the first line
   */
  record PartStatement(
      Name name,
      Name system,
      List<Setting> bindings,
      boolean allRead,
      String documentation,
      Span header,
      Span span)
      implements Declaration {
    /** Copies the list. */
    public PartStatement {
      bindings = List.copyOf(bindings);
    }
  }

  /** {@code parameter g [kW/K] = 0.12 ± 5 %}. */
  record ParameterStatement(
      Name name,
      Optional<UnitText> unit,
      Expression value,
      Optional<Uncertainty> uncertainty,
      String documentation,
      Span span)
      implements Declaration {}

  /** {@code let w(t) [1/s] = 2*pi*f}. */
  record LetStatement(
      Name name,
      Optional<Name> argument,
      Optional<UnitText> unit,
      Expression value,
      String documentation,
      Span span)
      implements Declaration {}

  /**
   * {@code input cooling(t) [kW] = 1.2}: a function of the independent variable that comes from
   * without.
   *
   * @param value what it is where nothing replaces it
   */
  record InputStatement(
      Name name,
      Name argument,
      Optional<UnitText> unit,
      Expression value,
      String documentation,
      Span span)
      implements Declaration {}

  /**
   * {@code state T [K] = 277 scale 10}, {@code state x' [m/s] = 0}, {@code state c[1..400]
   * [mol/m3]}.
   *
   * @param ranges the ranges of the indices of a family; empty for a single state and for the
   *     derivative of a family
   */
  record StateStatement(
      Name name,
      List<IndexRange> ranges,
      int primes,
      Optional<UnitText> unit,
      Optional<Expression> initial,
      Optional<Expression> scale,
      String documentation,
      Span span)
      implements Declaration {
    /** Copies the list. */
    public StateStatement {
      ranges = List.copyOf(ranges);
    }

    /** Returns the offset behind the name, its range and its primes. */
    public int headEnd() {
      return isFamily() ? ranges.getLast().span().end() + 1 : name.span().end() + primes;
    }

    /** Tells whether it declares a family. */
    public boolean isFamily() {
      return !ranges.isEmpty();
    }

    /** Returns the name with its primes. */
    public String label() {
      return name.text() + "'".repeat(primes);
    }
  }

  /** {@code output q [kW] = g*(T_wall - T_air)}. */
  record OutputStatement(
      Name name, Optional<UnitText> unit, Expression value, String documentation, Span span)
      implements Declaration {}

  /** {@code C*T' = q}. */
  record EquationStatement(Expression left, Expression right, String documentation, Span span)
      implements Statement {}

  /**
   * {@code transfer gut -> blood = k_a*gut}: what leaves one amount enters the other.
   *
   * @param flow the amount over time
   */
  record TransferStatement(
      TransferEnd from, TransferEnd to, Expression flow, String documentation, Span span)
      implements Statement {}

  /**
   * {@code initial values warm at 2 { T = 293 }}.
   *
   * @param allRead whether every line of the block could be read
   */
  record InitialValuesStatement(
      Name name,
      Optional<Expression> time,
      List<BlockLine<Setting>> settings,
      boolean allRead,
      String documentation,
      Span span)
      implements Declaration {
    /** Copies the list. */
    public InitialValuesStatement {
      settings = List.copyOf(settings);
    }
  }

  /**
   * {@code basis p at 0}, {@code basis s at 0 =} with rows, {@code basis c(t) =} with rows.
   *
   * @param argument the independent variable of closed forms, if there is one
   * @param time the time after {@code at}, if there is one
   * @param hasRows whether an equals sign announces rows
   * @param allRead whether every row could be read
   */
  record BasisStatement(
      Name name,
      Optional<Name> argument,
      Optional<Expression> time,
      boolean hasRows,
      List<BlockLine<Row>> rows,
      boolean allRead,
      String documentation,
      Span span)
      implements Declaration {
    /** Copies the list. */
    public BasisStatement {
      rows = List.copyOf(rows);
    }
  }

  /** {@code for i from 2 to 399 { c[i]' = k*(c[i-1] - c[i]) }}. */
  record ForStatement(Turns turns, List<Statement> body, Span span) implements Statement {
    /** Copies the list. */
    public ForStatement {
      body = List.copyOf(body);
    }
  }

  /**
   * {@code jump at 6 { gut becomes gut + 250 [mg] }}, {@code jump every 8 from 0 to 40 { ... }}.
   *
   * @param header the first line
   * @param allRead whether every line of the block could be read
   */
  record JumpStatement(
      JumpTime time,
      List<BlockLine<Change>> changes,
      boolean allRead,
      String documentation,
      Span header,
      Span span)
      implements Statement {
    /** Copies the list. */
    public JumpStatement {
      changes = List.copyOf(changes);
    }
  }

  /**
   * {@code matrix K(t) [N/m] =} with rows, {@code matrix M [kg] = file "mass.mtx"}, {@code matrix D
   * [N.s/m] = a*M + b*K}.
   *
   * @param argument the independent variable of a matrix of functions of it, if there is one
   */
  record MatrixStatement(
      Name name,
      Optional<Name> argument,
      Optional<UnitText> unit,
      MatrixSource source,
      String documentation,
      Span span)
      implements Declaration {}

  /**
   * {@code table load(t) [kW] = linear} with rows, {@code table T_out(t) [K] = file "outside.csv"
   * time "hour" [h] column "air" hold extended}.
   *
   * @param extended whether the end values hold beyond the first and the last time
   */
  record TableStatement(
      Name name,
      Name argument,
      Optional<UnitText> unit,
      TableSource source,
      TableMethod method,
      boolean extended,
      String documentation,
      Span span)
      implements Declaration {}

  /**
   * {@code boundary soak { T_air(0) = 277; T_wall(48) = 280 }}.
   *
   * @param allRead whether every line of the block could be read
   */
  record BoundaryStatement(
      Name name,
      List<BlockLine<Condition>> conditions,
      boolean allRead,
      String documentation,
      Span span)
      implements Declaration {
    /** Copies the list. */
    public BoundaryStatement {
      conditions = List.copyOf(conditions);
    }
  }

  /** {@code require T < 300 [K] throughout}. */
  record RequireStatement(RequireClause clause, String documentation, Span span)
      implements Statement {}

  /** {@code accuracy 1e-9}. */
  record AccuracyStatement(Expression value, Span span) implements Statement {}

  /**
   * A statement that could not be read; the reason is among the problems of the file.
   *
   * @param word its first word if that is a reserved one, else empty
   * @param text what stands there
   * @param declares the name it would declare, if that much is known
   */
  record UnreadStatement(String word, String text, Optional<Name> declares, Span span)
      implements Statement {}

  /** {@code ± 5 %}; half the width of the interval of uncertainty. */
  record Uncertainty(Expression halfWidth, boolean percent, Span span) {}

  /**
   * One end of a transfer.
   *
   * @param state the state; empty for {@code outside}
   */
  record TransferEnd(Optional<NameExpression> state, Span span) {}

  /** {@code T_air = 293}. */
  record Setting(NameExpression target, Expression value, Span span) {}

  /** {@code row x' = 1, 0}. */
  record Row(NameExpression target, List<Expression> values, Span span) {
    /** Copies the list. */
    public Row {
      values = List.copyOf(values);
    }
  }

  /** When a jump takes place. */
  sealed interface JumpTime {
    /** Returns its place. */
    Span span();

    /** {@code at 6}. */
    record Once(Expression time, Span span) implements JumpTime {}

    /** {@code every 8 from 0 to 40}. */
    record Repeated(Expression period, Expression first, Expression last, Span span)
        implements JumpTime {}
  }

  /** {@code gut becomes gut + 250 [mg]}. */
  record Change(NameExpression target, Expression value, Span span) {}

  /** {@code T_wall(48) = 280}. */
  record Condition(Expression left, Expression right, Span span) {}
}
