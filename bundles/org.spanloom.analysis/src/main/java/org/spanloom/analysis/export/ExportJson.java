/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.export;

import com.google.gson.stream.JsonWriter;
import java.io.IOException;
import java.io.Writer;
import java.util.List;

/**
 * Exported matrices as JSON (RFC 8259): {@code {"format": 1, "system", "what", "time": {"name",
 * "unit"}, "rows": [{"name", "unit"}], "columns": [name], "matrices": [{"time", "values": [[...]],
 * "errors": [[...]]}]}}; the errors are left out where they are zero.
 */
public final class ExportJson {

  private ExportJson() {}

  /**
   * Writes.
   *
   * @param exported the matrices
   * @param out receives the text; is flushed, not closed
   * @throws IOException if {@code out} fails
   */
  public static void write(Exported exported, Writer out) throws IOException {
    JsonWriter json = new JsonWriter(out);
    json.setIndent("  ");
    json.beginObject();
    json.name("format").value(1);
    json.name("system").value(exported.system());
    json.name("what").value(exported.what().word());
    json.name("time").beginObject();
    json.name("name").value(exported.timeName());
    json.name("unit").value(exported.timeUnit());
    json.endObject();
    json.name("rows").beginArray();
    for (int i = 0; i < exported.rows().size(); i++) {
      json.beginObject();
      json.name("name").value(exported.rows().get(i));
      json.name("unit").value(exported.rowUnits().get(i));
      json.endObject();
    }
    json.endArray();
    names(json, exported.columns());
    json.name("matrices").beginArray();
    for (Exported.Matrix matrix : exported.matrices()) {
      json.beginObject();
      json.name("time").value(matrix.time());
      rows(json, "values", matrix.values(), exported);
      boolean exact = exported.what() == Exported.What.A || exported.what() == Exported.What.B;
      if (!exact) {
        rows(json, "errors", matrix.errors(), exported);
      }
      json.endObject();
    }
    json.endArray();
    json.endObject();
    json.flush();
    out.write("\n");
    out.flush();
  }

  private static void names(JsonWriter json, List<String> columns) throws IOException {
    json.name("columns").beginArray();
    for (String column : columns) {
      json.value(column);
    }
    json.endArray();
  }

  private static void rows(JsonWriter json, String name, double[] values, Exported exported)
      throws IOException {
    int m = exported.columns().size();
    json.name(name).beginArray();
    for (int i = 0; i < exported.rows().size(); i++) {
      json.setIndent("");
      json.beginArray();
      for (int j = 0; j < m; j++) {
        json.value(values[i * m + j]);
      }
      json.endArray();
      json.setIndent("  ");
    }
    json.endArray();
  }
}
