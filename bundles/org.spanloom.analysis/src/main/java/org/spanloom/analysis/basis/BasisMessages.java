/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

import java.util.Optional;
import org.spanloom.analysis.Figures;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.basis.ClosedFormResidual;
import org.spanloom.numerics.basis.ConditionSample;
import org.spanloom.numerics.basis.Dependence;

/** What is said about bases. Every message says what was found, what it means and what to do. */
final class BasisMessages {

  private final CompiledSystem system;
  private final Settings settings;

  BasisMessages(CompiledSystem system, Settings settings) {
    this.system = system;
    this.settings = settings;
  }

  String unbounded() {
    return "the interval has no bounded range to judge a basis on; bound it, or add 'until TIME' to"
        + " a requirement";
  }

  String notFollowed(int limit) {
    return "the system has %d states; above %d no basis is followed unless one is declared ('basis NAME at TIME')"
        .formatted(system.dimension(), limit);
  }

  String dependent(String name, Dependence dependence, double time) {
    return "the columns of basis %s are linearly dependent: column %d is %s at %s, and so at all times; replace one of them"
        .formatted(name, dependence.column() + 1, combination(dependence.factors()), at(time));
  }

  private static String combination(double[] factors) {
    StringBuilder text = new StringBuilder();
    for (int k = 0; k < factors.length; k++) {
      if (factors[k] != 0) {
        text.append(sign(factors[k], text.isEmpty()));
        String size = Figures.text(Math.abs(factors[k]), 6);
        text.append(size.equals("1") ? "" : size + " times ").append("column ").append(k + 1);
      }
    }
    return text.isEmpty() ? "zero" : text.toString();
  }

  private static String sign(double factor, boolean first) {
    if (first) {
      return factor < 0 ? "minus " : "";
    }
    return factor < 0 ? " - " : " + ";
  }

  String withoutDigits(BasisReport report, Digits digits) {
    return "basis %s has no digits left at %s (scaled condition %s), so nothing can be built on it there; %s"
        .formatted(
            report.name(), at(digits.time()), Figures.condition(digits.scaled()), remedy(report));
  }

  String illConditioned(BasisReport report, Digits digits, double wanted) {
    return "basis %s is ill-conditioned: it leaves %s digits at %s where %s are wanted (scaled condition %s); %s"
        .formatted(
            report.name(),
            Figures.text(digits.fewest(), 2),
            at(digits.time()),
            Figures.text(wanted, 2),
            Figures.condition(digits.scaled()),
            remedy(report));
  }

  String degenerates(BasisReport report, double from, double wanted) {
    return "%s degenerates, as fast directions die first: from %s on it leaves fewer than %s digits%s"
        .formatted(
            report.declared() ? "basis " + report.name() : "the principal basis",
            at(from),
            Figures.text(wanted, 2),
            report.windows().isPresent()
                ? "; %s keep its scaled condition below %s"
                    .formatted(windows(report), limit(report))
                : "");
  }

  String liouville(String name, ConditionSample sample) {
    return "the determinant of basis %s at %s is off Liouville's formula, det X(t) = det X(t0) exp(integral of trace A), by a relative %s; do not trust its last digits, and ask for a smaller basis.accuracy in %s"
        .formatted(
            name,
            at(sample.time()),
            Figures.text(sample.liouvilleMismatch(), 2),
            Settings.FILE_NAME);
  }

  String notASolution(String name, ClosedFormResidual residual) {
    return "column %d of basis %s does not solve the system: the equation of %s is off by a relative %s at %s (%s is allowed); correct the closed form or the equation"
        .formatted(
            residual.column() + 1,
            name,
            system.model().states().get(residual.component()).label(),
            Figures.text(residual.relative(), 3),
            at(residual.time()),
            Figures.text(settings.residualLimit(), 2));
  }

  /** Says what a jump that cannot be undone loses. */
  String lost(Jump jump) {
    int k = jump.rows().size();
    Optional<Dependence> dependence = Dependence.among(jump.block(), k, k);
    return "the jump at %s cannot be undone%s, so every basis is singular from there on; nothing to do unless something relies on one behind it"
        .formatted(
            at(jump.time()),
            dependence
                .map(d ->
                    ": solutions that differ by %s just before it are one behind it"
                        .formatted(difference(jump, d)))
                .orElse(""));
  }

  private String difference(Jump jump, Dependence dependence) {
    StringBuilder text = new StringBuilder(label(jump, dependence.column()));
    double[] factors = dependence.factors();
    for (int k = 0; k < factors.length; k++) {
      if (factors[k] != 0) {
        String size = Figures.text(Math.abs(factors[k]), 6);
        text.append(sign(-factors[k], false))
            .append(size.equals("1") ? "" : size + " times ")
            .append(label(jump, k));
      }
    }
    return text.toString();
  }

  private String label(Jump jump, int row) {
    return system.model().states().get(jump.rows().get(row).row()).label();
  }

  private String remedy(BasisReport report) {
    String split =
        report.windows().isPresent() && report.windows().getAsInt() > 1
            ? "split the range into %s, which keep it below %s, or "
                .formatted(windows(report), limit(report))
            : "choose initial vectors that stay apart, or ";
    return split
        + "rely on it up to an earlier time ('require condition(%s) < LIMIT until TIME')"
            .formatted(report.name());
  }

  private static String windows(BasisReport report) {
    int count = report.windows().orElse(0);
    return count + (count == 1 ? " window" : " windows");
  }

  private static String limit(BasisReport report) {
    return Figures.text(report.windowLimit(), 2);
  }

  private String at(double time) {
    return Figures.at(system.model(), time);
  }
}
