/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.SequencedMap;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.language.model.Model;

/**
 * What basis to list. Times are in the time unit of the system.
 *
 * @param model the model
 * @param system name of the system; empty takes the only one
 * @param basis name of the basis; empty takes the only one, or the principal one where none is
 *     declared
 * @param times times to list it at, in the order given
 * @param parameters values that replace those of parameters, by name, in their declared units
 * @param settings thresholds of the project
 * @param method name of the method, one of {@link org.spanloom.analysis.solve.MethodNames#all()};
 *     chosen by the system if empty
 */
public record BasisRequest(
    Model model,
    Optional<String> system,
    Optional<String> basis,
    List<Double> times,
    SequencedMap<String, Double> parameters,
    Settings settings,
    Optional<String> method) {

  /** Copies the collections. */
  public BasisRequest {
    times = List.copyOf(times);
    parameters = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(parameters));
  }
}
