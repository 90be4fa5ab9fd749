/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.boundary;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import org.spanloom.analysis.solve.Sampling;
import org.spanloom.language.model.Model;

/**
 * Which boundary-value problem to solve. Times are in the time unit of the system.
 *
 * @param model the model
 * @param system name of the system; empty takes the only one
 * @param boundary name of the conditions; empty takes the only ones
 * @param sampling at which times to list the solution
 * @param parameters values that replace those of parameters, by name, in their declared units
 * @param accuracy relative error asked for; the system's own if empty
 */
public record BoundaryRequest(
    Model model,
    Optional<String> system,
    Optional<String> boundary,
    Sampling sampling,
    SequencedMap<String, Double> parameters,
    OptionalDouble accuracy) {

  /** Copies the map. */
  public BoundaryRequest {
    parameters = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(parameters));
  }
}
