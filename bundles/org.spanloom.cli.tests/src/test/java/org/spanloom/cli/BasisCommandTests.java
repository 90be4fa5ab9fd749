/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class BasisCommandTests {

  @TempDir Path folder;

  @Test
  void listsOneLineForEachTimeAndColumn() {
    CommandRun run =
        CommandRun.of(
            "basis",
            Models.twoSystems(folder),
            "--system",
            "Swing",
            "--basis",
            "start",
            "--at",
            "0,1");
    assertEquals(0, run.code(), run.err());
    assertTrue(run.out().startsWith("t,column,x,\"x'\"\n0,1,1,0\n0,2,0,1\n"), run.out());
    List<double[]> rows = new PrintedResult(run).rows();
    assertEquals(4, rows.size());
    assertEquals(Math.cos(2), rows.get(2)[2], 1e-9);
    assertEquals(-2 * Math.sin(2), rows.get(2)[3], 1e-9);
    assertEquals(Math.sin(2) / 2, rows.get(3)[2], 1e-9);
  }

  @Test
  void takesTheMethodAskedFor() {
    CommandRun run =
        CommandRun.of("basis", Models.drain(folder), "--at", "2", "--method", "gauss10");
    assertEquals(0, run.code(), run.err());
    assertTrue(run.err().contains("method: Gauss collocation, order 10"), run.err());
  }

  @Test
  void takesTheDeclaredVectors() {
    CommandRun run =
        CommandRun.of(
            "basis",
            Models.twoSystems(folder),
            "--system",
            "Swing",
            "--basis",
            "pair",
            "--at",
            "0");
    assertEquals("t,column,x,\"x'\"\n0,1,1,1\n0,2,1,-1\n", run.out());
  }

  @Test
  void withoutADeclaredBasisItIsThePrincipalOne() {
    CommandRun run = CommandRun.of("basis", Models.drain(folder), "--at", "2");
    assertEquals(0, run.code(), run.err());
    List<double[]> rows = new PrintedResult(run).rows();
    assertEquals(Math.exp(-1), rows.get(0)[2], 1e-10);
    // A litre above gives millilitres below: the entries are in declared units.
    assertEquals(1e-3 * (1 - Math.exp(-1)) * 1e6 / 1e3 * 1e3 / 1e3, rows.get(0)[3] / 1e3, 1e-6);
    assertEquals(1, rows.get(1)[3], 1e-10);
  }

  @Test
  void tellsTheConditionAtEachTime() {
    CommandRun run =
        CommandRun.of(
            "basis",
            Models.twoSystems(folder),
            "--system",
            "Swing",
            "--basis",
            "pair",
            "--at",
            "0,0.39269908169872414");
    List<String> lines = run.err().lines().toList();
    String[] cells = lines.get(lines.size() - 2).strip().split(" +", -1);
    assertEquals("0", cells[0]);
    assertEquals(1, Double.parseDouble(cells[1]), 1e-6);
    assertEquals(1, Double.parseDouble(cells[2]), 1e-6);
  }

  @Test
  void writesAFile() throws Exception {
    Path target = folder.resolve("basis.csv");
    CommandRun run = CommandRun.of("basis", Models.drain(folder), "--at", "0", "--output", target);
    assertEquals("", run.out());
    assertEquals("t,column,upper,lower\n0,1,1,0\n0,2,0,1\n", Files.readString(target));
  }
}
