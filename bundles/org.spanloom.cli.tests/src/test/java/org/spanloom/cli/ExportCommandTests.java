/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ExportCommandTests {

  @TempDir Path folder;

  @Test
  void writesCoefficientsInDeclaredUnits() {
    CommandRun run = CommandRun.of("export", Models.drain(folder), "--what", "A", "--at", "0");
    assertEquals(0, run.code(), run.err());
    // The lower pool is in mL, the upper one in L.
    List<String> lines = run.out().lines().toList();
    assertEquals("t,row,column,value,error", lines.get(0));
    assertEquals("0,upper,upper,-0.5,0", lines.get(1));
    assertTrue(lines.get(2).startsWith("0,lower,upper,"), run.out());
    assertEquals(500, Double.parseDouble(lines.get(2).split(",")[3]), 1e-12);
  }

  @Test
  void writesForcing() {
    CommandRun run =
        CommandRun.of(
            "export", Models.twoSystems(folder), "--system", "Fall", "--what", "b", "--at", "0,7");
    assertEquals(
        "t,row,column,value,error\n0,v,1,9.8100000000000005,0\n7,v,1,9.8100000000000005,0\n",
        run.out());
  }

  @Test
  void writesTheFundamentalMatrixAsJson() {
    CommandRun run =
        CommandRun.of(
            "export",
            Models.twoSystems(folder),
            "--system",
            "Swing",
            "--what",
            "Phi",
            "--at",
            "1",
            "--format",
            "json");
    assertEquals(0, run.code(), run.err());
    JsonObject json = JsonParser.parseString(run.out()).getAsJsonObject();
    assertEquals("m/s", rows(json, "rows").get(1).getAsJsonObject().get("unit").getAsString());
    JsonArray values = rows(json, "matrices").get(0).getAsJsonObject().getAsJsonArray("values");
    assertEquals(Math.cos(2), entry(values, 0, 0), 1e-9);
    assertEquals(Math.sin(2) / 2, entry(values, 0, 1), 1e-9);
    assertEquals(-2 * Math.sin(2), entry(values, 1, 0), 1e-9);
    JsonArray errors = rows(json, "matrices").get(0).getAsJsonObject().getAsJsonArray("errors");
    assertTrue(entry(errors, 0, 0) > 0);
  }

  @Test
  void writesADeclaredBasis() {
    CommandRun run =
        CommandRun.of(
            "export",
            Models.twoSystems(folder),
            "--system",
            "Swing",
            "--what",
            "basis",
            "--basis",
            "pair",
            "--at",
            "0");
    assertEquals(
        "t,row,column,value,error\n0,x,1,1,0\n0,x,2,1,0\n0,\"x'\",1,1,0\n0,\"x'\",2,-1,0\n",
        run.out());
  }

  @Test
  void writesOneMatrixInTheExchangeFormat() throws IOException {
    Path file = folder.resolve("a.mtx");
    CommandRun run =
        CommandRun.of(
            "export",
            Models.drain(folder),
            "--what",
            "A",
            "--at",
            "0",
            "--format",
            "matrix-market",
            "--output",
            file.toString());
    assertEquals(0, run.code(), run.err());
    List<String> lines = Files.readAllLines(file);
    assertEquals("%%MatrixMarket matrix coordinate real general", lines.getFirst());
    assertTrue(lines.contains("%   2 lower [mL]"), lines.toString());
    assertEquals(List.of("2 2 2", "1 1 -0.5"), lines.subList(4, 6));
    assertTrue(lines.get(6).startsWith("2 1 "), lines.toString());
    assertEquals(500, Double.parseDouble(lines.get(6).substring(4)), 1e-12);
  }

  @Test
  void refusesWhatItCannotDo() {
    Path model = Models.drain(folder);
    refused(CommandRun.of("export", model, "--what", "C", "--at", "0"), "one of A, b, Phi, basis");
    refused(
        CommandRun.of("export", model, "--what", "A", "--at", "0", "--format", "xml"),
        "csv, json, matrix-market");
    refused(
        CommandRun.of("export", model, "--what", "A", "--at", "0,1", "--format", "matrix-market"),
        "one matrix");
    refused(
        CommandRun.of("export", model, "--what", "A", "--at", "0", "--basis", "p"),
        "belongs to --what basis");
    refused(CommandRun.of("export", model, "--what", "A", "--at", "11"), "outside the interval");
  }

  private static void refused(CommandRun run, String reason) {
    assertEquals(2, run.code());
    assertEquals("", run.out());
    assertTrue(run.err().contains(reason), run.err());
    assertFalse(run.err().contains("internal error"), run.err());
  }

  private static JsonArray rows(JsonObject json, String name) {
    return json.getAsJsonArray(name);
  }

  private static double entry(JsonArray rows, int i, int j) {
    return rows.get(i).getAsJsonArray().get(j).getAsDouble();
  }
}
