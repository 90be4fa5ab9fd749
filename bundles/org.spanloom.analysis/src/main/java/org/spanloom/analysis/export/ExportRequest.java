/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.export;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.SequencedMap;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.language.model.Model;

/**
 * What to export. Times are in the time unit of the system.
 *
 * @param model the model
 * @param system name of the system; empty takes the only one
 * @param what which matrices
 * @param basis name of the basis; empty takes the only one
 * @param times the times, in the order wanted
 * @param parameters values that replace those of parameters, by name, in their declared units
 * @param settings thresholds of the project
 */
public record ExportRequest(
    Model model,
    Optional<String> system,
    Exported.What what,
    Optional<String> basis,
    List<Double> times,
    SequencedMap<String, Double> parameters,
    Settings settings) {

  /** Copies the collections. */
  public ExportRequest {
    times = List.copyOf(times);
    parameters = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(parameters));
  }
}
