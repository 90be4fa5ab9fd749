/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.stream.Collectors;
import org.spanloom.language.text.SourceText;

/** Reads a model without problems and writes parts of it as text. */
final class ModelListing {

  private ModelListing() {}

  static Model read(String text) {
    return ModelReader.read(new SourceText("test.span", text));
  }

  /** Reads the only system of a text in which nothing is wrong. */
  static SystemModel system(String text) {
    Model model = read(text);
    assertEquals(
        List.of(), model.problems().stream().map(p -> p.kind().id() + " " + p.message()).toList());
    return model.systems().getFirst();
  }

  /** Writes M, K and f, an entry a line, with the labels of the components. */
  static String equations(SystemModel system) {
    LinearForm form = system.equations().orElseThrow();
    StringBuilder list = new StringBuilder();
    form.mass().forEach(e -> list.append(entry(system, "M", e)));
    form.matrix().forEach(e -> list.append(entry(system, "K", e)));
    form.forcing()
        .forEach(e ->
            list.append("f[" + label(system, e.row()) + "] = " + text(system, e.term()) + "\n"));
    return list.toString();
  }

  private static String entry(SystemModel system, String name, LinearForm.MatrixEntry entry) {
    return name
        + "["
        + label(system, entry.row())
        + ", "
        + label(system, entry.column())
        + "] = "
        + text(system, entry.term())
        + "\n";
  }

  static String label(SystemModel system, int index) {
    return system.states().get(index).label();
  }

  static String text(SystemModel system, Term term) {
    return TermPrinter.text(term, system.timeName());
  }

  static String texts(SystemModel system, List<Term> terms) {
    return terms.stream().map(t -> text(system, t)).collect(Collectors.joining(", "));
  }

  /** Writes a value that is affine in the states. */
  static String affine(SystemModel system, AffineValue value) {
    StringBuilder list = new StringBuilder();
    for (AffineValue.Sample sample : value.samples()) {
      String at =
          sample
              .at()
              .map(t -> "(" + (sample.before() ? "before " : "") + text(system, t) + ")")
              .orElse("");
      list.append("(" + text(system, sample.coefficient()) + ") ");
      list.append(label(system, sample.component()) + at + " + ");
    }
    return list + text(system, value.constant());
  }
}
