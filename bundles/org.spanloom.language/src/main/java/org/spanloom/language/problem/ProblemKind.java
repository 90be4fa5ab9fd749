/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.problem;

import java.util.Locale;

/**
 * The kinds of problems. The id is the constant's name in small letters with hyphens, and stays as
 * it is.
 */
public enum ProblemKind {
  /** Characters that the language does not know. */
  CHARACTER_UNKNOWN("Characters that mean nothing in a model."),
  /** A number that breaks the rules. */
  NUMBER_MALFORMED("A number that is not written by the rules."),
  /** A number too large or too small for a double. */
  NUMBER_OUT_OF_RANGE("A number too large or too close to 0 to be stored."),
  /** A unit without its closing bracket. */
  UNIT_NOT_CLOSED("A unit whose closing bracket is missing."),
  /** A text without its closing quotation mark. */
  TEXT_NOT_CLOSED("A text whose closing quotation mark is missing."),
  /** Nothing where an expression belongs. */
  EXPRESSION_MISSING("An expression is missing."),
  /** Two operands side by side. */
  OPERATOR_MISSING("Two values stand side by side without a sign between them."),
  /** A parenthesis or index bracket that is not closed. */
  PARENTHESIS_NOT_CLOSED("A parenthesis or bracket is not closed."),
  /** A closing parenthesis or bracket without an opening one. */
  PARENTHESIS_NOT_OPEN("A parenthesis or bracket is closed that was not opened."),
  /** A block that is not opened or not closed. */
  BRACE_MISSING("A brace is missing."),
  /** A closing brace without an opening one. */
  BRACE_NOT_OPEN("A brace is closed that was not opened."),
  /** A name is missing. */
  NAME_MISSING("A name is missing."),
  /** A word of the language used as a name. */
  NAME_RESERVED("A word of the language cannot be a name."),
  /** Something else than what belongs here. */
  WORD_UNEXPECTED("Something stands where it has no meaning."),
  /** A line that is neither a statement nor an equation. */
  STATEMENT_UNKNOWN("A line that is neither a statement nor an equation."),
  /** A statement in a place where it cannot stand. */
  STATEMENT_MISPLACED("A statement stands where it cannot stand."),
  /** Parentheses in parentheses beyond the limit. */
  NESTING_TOO_DEEP("Expressions or loops are nested deeper than the limit."),
  /** A statement with more words, numbers and signs than the limit. */
  STATEMENT_TOO_LONG("A statement is longer than the limit."),
  /** More problems than the limit. */
  TOO_MANY_PROBLEMS("There are more problems than are listed."),
  /** A name declared twice. */
  NAME_DUPLICATE("A name is declared twice."),
  /** A name nobody declared. */
  NAME_UNKNOWN("A name is not declared."),
  /** A declaration that hides one further out. */
  NAME_SHADOWED(Severity.WARNING, "A declaration hides one outside of the system."),
  /** A parameter or named expression that nothing uses. */
  NAME_UNUSED(Severity.WARNING, "A parameter or named expression is used nowhere."),
  /** Declarations that need each other. */
  NAME_CYCLE("Declarations need each other in a circle."),
  /** A name used as what it is not. */
  NAME_MISUSED("A name is used as something it is not."),
  /** An index that is no whole constant, or the wrong number of indices. */
  INDEX_INVALID("An index is not a whole constant, or there are too few or too many indices."),
  /** An index that no member of the family has. */
  INDEX_OUT_OF_RANGE("An index lies outside of the range of the family."),
  /** A loop or sum without a turn. */
  LOOP_EMPTY(Severity.WARNING, "A loop or sum has no turn."),
  /** Families, loops or sums beyond the limit. */
  EXPANSION_TOO_LARGE("Families, loops or sums are larger than the limit."),
  /** A function with the wrong number of arguments. */
  ARGUMENT_COUNT("A function has too few or too many arguments."),
  /** Files that import each other. */
  IMPORT_CYCLE("Files import each other in a circle."),
  /** An import behind too many others. */
  IMPORT_TOO_DEEP("Files import each other in too long a chain."),
  /** A file with errors of its own that another one imports. */
  IMPORT_BROKEN("An imported file has errors."),
  /** A system that would hold itself. */
  PART_OF_ITSELF("A system would be a part of itself."),
  /** More parts than the limit. */
  PARTS_TOO_MANY("The parts of a file hold more than the limit."),
  /** Something that a part cannot set. */
  BINDING_INVALID("A part sets something that it cannot set."),
  /** A path that is none. */
  FILE_PATH_MALFORMED("The path of a file is not written by the rules."),
  /** A file that is not there. */
  FILE_MISSING("A file is not there."),
  /** A path that leads out of the project. */
  FILE_OUTSIDE_PROJECT("A path leads out of the project."),
  /** A file with more in it than is read. */
  FILE_TOO_LARGE("A file is too large, or there are too many."),
  /** A file that breaks the rules of its format. */
  FILE_MALFORMED("A file breaks the rules of its format."),
  /** A file that is no text. */
  FILE_UNREADABLE("A file cannot be read as text."),
  /** A unit code that UCUM does not have. */
  UNIT_UNKNOWN("A unit code that cannot be read."),
  /** Quantities of different dimensions where equal ones belong. */
  UNIT_MISMATCH("Quantities of different dimensions stand where equal ones belong."),
  /** A unit with a zero point of its own used for something else than an absolute value. */
  UNIT_OFFSET(
      "A unit with a zero point of its own stands for something else than an absolute value."),
  /** An exponent that is not a plain number where one is needed. */
  EXPONENT_NOT_CONSTANT("An exponent must be a plain number here."),
  /** Matrices, or a matrix and a single value, whose shapes do not fit together. */
  SHAPE_MISMATCH("Matrices stand together whose shapes do not fit."),
  /** Rows of a matrix that differ in length. */
  MATRIX_ROW_LENGTH("Rows of a matrix differ in length."),
  /** A matrix, or work with matrices, beyond the limits. */
  MATRIX_TOO_LARGE("Matrices are larger than the limits."),
  /** A product, quotient, power or function of states. */
  NOT_LINEAR("An expression is not linear in the states."),
  /** A state where only parameters and time may stand. */
  STATE_MISPLACED("A state stands where only parameters, numbers and functions of time may stand."),
  /** The running time where only constants may stand. */
  TIME_MISPLACED("The independent variable stands where only constants may stand."),
  /** A state at an earlier time. */
  STATE_DELAYED("A state at an earlier time: not an ordinary differential equation."),
  /** A derivative that is no component of the state vector. */
  DERIVATIVE_MISPLACED("A derivative stands where it is not known."),
  /** A state whose derivative no equation gives. */
  STATE_WITHOUT_EQUATION("A state has no equation."),
  /** An equation that gives no derivative. */
  EQUATION_WITHOUT_STATE("An equation gives no derivative of a state."),
  /** More equations than states for the derivatives in them. */
  TOO_MANY_EQUATIONS("There are more equations than derivatives to be found."),
  /** A transfer that leads from nowhere to nowhere or back to where it began. */
  TRANSFER_INVALID("A transfer does not lead from one place to another."),
  /** A transfer whose flow has a minus in front. */
  TRANSFER_REVERSED(Severity.NOTE, "The flow of a transfer is written with a minus in front."),
  /** A jump that cannot take place as written. */
  JUMP_INVALID("A jump cannot take place as written."),
  /** A boundary condition that says nothing about values at named times. */
  BOUNDARY_INVALID("A boundary condition does not hold values of states at named times."),
  /** Too few or too many boundary conditions. */
  BOUNDARY_COUNT("There are too few or too many boundary conditions."),
  /** Highest derivatives that the equations cannot give. */
  SINGULAR_MASS_MATRIX("The equations cannot be solved for the highest derivatives."),
  /** A system without a state. */
  SYSTEM_WITHOUT_STATES("A system has no state."),
  /** A component without an initial value in a set that needs one. */
  INITIAL_VALUE_MISSING("An initial value is missing."),
  /** A component with two initial values in a set. */
  INITIAL_VALUE_DUPLICATE("An initial value is given twice."),
  /** Initial values whose time is not known. */
  INITIAL_TIME_MISSING("The time of initial values is not known."),
  /** A time outside of the interval. */
  TIME_OUTSIDE_INTERVAL("A time lies outside of the interval."),
  /** An interval without a point in it. */
  INTERVAL_EMPTY("The interval is empty."),
  /** An end of the interval that is no plain number. */
  INTERVAL_NOT_CONSTANT("The ends of the interval must be plain numbers."),
  /** A basis whose number of columns is not the dimension. */
  BASIS_SIZE("A basis has too few or too many columns."),
  /** A basis without the row of a component. */
  BASIS_ROW_MISSING("A basis lacks the row of a component."),
  /** A basis with two rows for a component. */
  BASIS_ROW_DUPLICATE("A basis has two rows for one component."),
  /** Rows of different length. */
  BASIS_ROW_LENGTH("Rows of a basis differ in length."),
  /** A pulse that cannot be. */
  PULSE_INVALID("The period or the width of a pulse is not possible."),
  /** A table whose rows cannot be used. */
  TABLE_INVALID("The rows of a table cannot be used."),
  /** A table that ends before the interval does. */
  TABLE_RANGE("A table does not cover the interval."),
  /** An accuracy that cannot be asked for. */
  ACCURACY_OUT_OF_RANGE("The accuracy asked for is out of range."),
  /** A scale that is not positive. */
  SCALE_NOT_POSITIVE("A scale must be positive."),
  /** An uncertainty that means nothing. */
  UNCERTAINTY_INVALID("An uncertainty must be a number that is not negative."),
  /** A requirement that cannot be decided as written. */
  REQUIREMENT_INCOMPLETE("A requirement lacks something."),
  /** A coefficient that has no finite value somewhere inside the interval. */
  COEFFICIENT_UNDEFINED("A coefficient has no finite value somewhere inside the interval."),
  /** A coefficient of which it could not be shown that it is finite everywhere. */
  COEFFICIENT_UNDECIDED(
      Severity.NOTE, "It could not be shown that a coefficient is finite everywhere.");

  private final Severity severity;
  private final String meaning;

  ProblemKind(String meaning) {
    this(Severity.ERROR, meaning);
  }

  ProblemKind(Severity severity, String meaning) {
    this.severity = severity;
    this.meaning = meaning;
  }

  /** Returns the stable id, for example {@code name-unknown}. */
  public String id() {
    return name().toLowerCase(Locale.ROOT).replace('_', '-');
  }

  /** Returns how bad it is. */
  public Severity severity() {
    return severity;
  }

  /** Returns one line that says what kind of thing this is. */
  public String meaning() {
    return meaning;
  }
}
