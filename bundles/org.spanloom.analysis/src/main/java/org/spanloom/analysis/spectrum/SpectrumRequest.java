/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.spectrum;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.language.model.Model;

/**
 * Whose spectrum to list. Times are in the time unit of the system.
 *
 * @param model the model
 * @param system name of the system; empty takes the only one
 * @param at the time at which to freeze A; empty where A is constant or has a stated period
 * @param parameters values that replace those of parameters, by name, in their declared units
 * @param settings thresholds of the project
 */
public record SpectrumRequest(
    Model model,
    Optional<String> system,
    OptionalDouble at,
    SequencedMap<String, Double> parameters,
    Settings settings) {

  /** Copies the map. */
  public SpectrumRequest {
    parameters = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(parameters));
  }
}
