/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.report;

import com.google.gson.stream.JsonWriter;
import java.io.IOException;
import java.io.Writer;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.spanloom.analysis.CheckReport;
import org.spanloom.analysis.Finding;
import org.spanloom.analysis.SystemReport;
import org.spanloom.analysis.basis.BasisReport;
import org.spanloom.analysis.boundary.BoundaryReport;
import org.spanloom.analysis.requirement.RequirementResult;
import org.spanloom.language.text.Position;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * A check as JSON (RFC 8259) for machines.
 *
 * <p>Shape: {@code {"format": 1, "caution": text, "files": [{"file", "findings": [...], "systems":
 * [{"system", "states", "boundaries": [...], "bases": [...], "requirements": [...]}]}], "clean":
 * boolean}}. A number that is not finite is the text {@code "infinite"}, one that does not apply is
 * absent. Lines and columns count from 1.
 */
public final class JsonReport {

  private static final int FORMAT = 1;

  private JsonReport() {}

  /**
   * Writes the report of all files.
   *
   * @param reports the reports, in order
   * @param out receives the text; is flushed, not closed
   * @throws IOException if {@code out} fails
   */
  public static void write(List<CheckReport> reports, Writer out) throws IOException {
    JsonWriter json = new JsonWriter(out);
    json.setIndent("  ");
    json.beginObject();
    json.name("format").value(FORMAT);
    json.name("caution").value(TextReport.CAUTION.strip().replace('\n', ' '));
    json.name("clean").value(reports.stream().allMatch(CheckReport::isClean));
    json.name("files").beginArray();
    for (CheckReport report : reports) {
      file(json, report);
    }
    json.endArray();
    json.endObject();
    json.flush();
    out.write("\n");
    out.flush();
  }

  private static void file(JsonWriter json, CheckReport report) throws IOException {
    SourceText source = report.model().source();
    json.beginObject();
    json.name("file").value(source.name());
    if (report.cancelled()) {
      json.name("cancelled").value(true);
    }
    json.name("findings").beginArray();
    for (Finding finding : report.findings()) {
      finding(json, source, finding);
    }
    json.endArray();
    json.name("systems").beginArray();
    for (SystemReport system : report.systems()) {
      system(json, source, system);
    }
    json.endArray();
    json.endObject();
  }

  private static void finding(JsonWriter json, SourceText source, Finding finding)
      throws IOException {
    json.beginObject();
    json.name("id").value(finding.id());
    json.name("severity").value(finding.severity().name().toLowerCase(Locale.ROOT));
    place(json, source, finding.span());
    json.name("message").value(finding.message());
    if (!finding.numbers().isEmpty()) {
      json.name("numbers").beginObject();
      for (Map.Entry<String, Double> entry : finding.numbers().entrySet()) {
        number(json, entry.getKey(), entry.getValue());
      }
      json.endObject();
    }
    json.endObject();
  }

  private static void place(JsonWriter json, SourceText source, Span span) throws IOException {
    Position start = source.position(span.start());
    Position end = source.position(span.end());
    json.name("line").value(start.line());
    json.name("column").value(start.column());
    json.name("endLine").value(end.line());
    json.name("endColumn").value(end.column());
  }

  private static void system(JsonWriter json, SourceText source, SystemReport report)
      throws IOException {
    json.beginObject();
    json.name("system").value(report.system().name());
    json.name("states").value(report.system().states().size());
    json.name("timeUnit").value(report.system().timeUnit().code());
    json.name("boundaries").beginArray();
    for (BoundaryReport boundary : report.boundaries()) {
      boundary(json, source, boundary);
    }
    json.endArray();
    json.name("bases").beginArray();
    for (BasisReport basis : report.bases()) {
      basis(json, source, basis);
    }
    json.endArray();
    json.name("requirements").beginArray();
    for (RequirementResult result : report.requirements()) {
      requirement(json, source, result);
    }
    json.endArray();
    json.endObject();
  }

  private static void boundary(JsonWriter json, SourceText source, BoundaryReport boundary)
      throws IOException {
    json.beginObject();
    json.name("boundary").value(boundary.name());
    json.name("solutions").value(boundary.verdict().name().toLowerCase(Locale.ROOT));
    place(json, source, boundary.span());
    number(json, "toConditions", boundary.toConditions());
    number(json, "toForcing", boundary.toForcing());
    number(json, "digitsLeft", boundary.digitsLeft());
    json.name("detail").value(boundary.detail());
    json.endObject();
  }

  private static void basis(JsonWriter json, SourceText source, BasisReport basis)
      throws IOException {
    json.beginObject();
    json.name("basis").value(basis.name());
    json.name("declared").value(basis.declared());
    place(json, source, basis.span());
    number(json, "from", basis.range().start());
    number(json, "to", basis.range().end());
    number(json, "condition", basis.worstRaw());
    number(json, "conditionTime", basis.worstRawTime());
    number(json, "scaledCondition", basis.worstScaled());
    number(json, "scaledConditionTime", basis.worstScaledTime());
    number(json, "digitsLeft", basis.digitsLeft());
    number(json, "digitsWanted", basis.digitsWanted());
    if (basis.fewerFrom().isPresent()) {
      number(json, "fewerDigitsFrom", basis.fewerFrom().getAsDouble());
    }
    if (basis.windows().isPresent()) {
      json.name("windows").value(basis.windows().getAsInt());
    }
    number(json, "windowLimit", basis.windowLimit());
    json.endObject();
  }

  private static void requirement(JsonWriter json, SourceText source, RequirementResult result)
      throws IOException {
    json.beginObject();
    json.name("requirement").value(result.text());
    json.name("status").value(result.status().name().toLowerCase(Locale.ROOT));
    place(json, source, result.span());
    number(json, "value", result.value());
    number(json, "limit", result.limit());
    number(json, "margin", result.margin());
    number(json, "error", result.error());
    json.name("unit").value(result.unit());
    if (result.time().isPresent()) {
      number(json, "time", result.time().getAsDouble());
    }
    json.name("detail").value(result.detail());
    json.endObject();
  }

  private static void number(JsonWriter json, String name, double value) throws IOException {
    if (Double.isNaN(value)) {
      return;
    }
    if (Double.isInfinite(value)) {
      json.name(name).value(value > 0 ? "infinite" : "minus infinite");
    } else {
      json.name(name).value(value);
    }
  }
}
