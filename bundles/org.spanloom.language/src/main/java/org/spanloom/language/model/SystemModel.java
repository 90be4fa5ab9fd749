/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * One system of a model file, resolved and unit-checked.
 *
 * @param name its name
 * @param timeName name of the independent variable
 * @param timeUnit its unit
 * @param interval the interval, in the time unit
 * @param parameters parameters, in order of declaration
 * @param lets named expressions, in order of declaration
 * @param matrices matrices, in order of declaration
 * @param states the state vector
 * @param outputs outputs, in order of declaration
 * @param equations the linear form; empty when errors leave it unknown
 * @param jumps changes of the state vector at fixed times, in the order of the text
 * @param initialValues complete sets of initial values; the unnamed set of the declarations comes
 *     first if complete
 * @param boundaries complete sets of boundary conditions
 * @param bases candidate bases
 * @param requirements requirements
 * @param accuracy relative error asked for
 * @param accuracySpan where it is stated; the system's name where it is not
 * @param documentation documentation comments, empty if none
 * @param span the whole system
 * @param nameSpan its name
 */
public record SystemModel(
    String name,
    String timeName,
    UnitOfMeasure timeUnit,
    TimeInterval interval,
    List<Parameter> parameters,
    List<Let> lets,
    List<NamedMatrix> matrices,
    List<StateComponent> states,
    List<Output> outputs,
    Optional<LinearForm> equations,
    List<Jump> jumps,
    List<InitialValues> initialValues,
    List<Boundary> boundaries,
    List<Basis> bases,
    List<Requirement> requirements,
    double accuracy,
    Span accuracySpan,
    String documentation,
    Span span,
    Span nameSpan) {

  /** The relative error asked for where a system does not state one. */
  public static final double DEFAULT_ACCURACY = 1e-6;

  /** Copies the lists. */
  public SystemModel {
    parameters = List.copyOf(parameters);
    lets = List.copyOf(lets);
    matrices = List.copyOf(matrices);
    states = List.copyOf(states);
    outputs = List.copyOf(outputs);
    jumps = List.copyOf(jumps);
    initialValues = List.copyOf(initialValues);
    boundaries = List.copyOf(boundaries);
    bases = List.copyOf(bases);
    requirements = List.copyOf(requirements);
  }
}
