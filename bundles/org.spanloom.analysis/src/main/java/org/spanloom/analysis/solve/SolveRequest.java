/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import org.spanloom.language.model.Model;

/**
 * What trajectory to compute. Times are in the time unit of the system.
 *
 * @param model the model
 * @param system name of the system; empty takes the only one
 * @param initial name of the initial values; empty takes the only set
 * @param from first time wanted; the start of the interval if empty
 * @param until last time wanted; the end of the interval if empty
 * @param sampling at which times
 * @param parameters values that replace those of parameters, by name, in their declared units
 * @param accuracy relative error asked for; the system's own if empty
 * @param method name of the method, one of {@link MethodNames#all()}; chosen by the system if empty
 */
public record SolveRequest(
    Model model,
    Optional<String> system,
    Optional<String> initial,
    OptionalDouble from,
    OptionalDouble until,
    Sampling sampling,
    SequencedMap<String, Double> parameters,
    OptionalDouble accuracy,
    Optional<String> method) {

  /** Copies the map. */
  public SolveRequest {
    parameters = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(parameters));
  }

  /** Returns the request that takes everything from the model. */
  public static SolveRequest of(Model model, Sampling sampling) {
    return new SolveRequest(
        model,
        Optional.empty(),
        Optional.empty(),
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        sampling,
        new LinkedHashMap<>(),
        OptionalDouble.empty(),
        Optional.empty());
  }
}
