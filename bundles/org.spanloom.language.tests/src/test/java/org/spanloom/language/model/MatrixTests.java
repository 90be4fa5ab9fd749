/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import org.hipparchus.linear.MatrixUtils;
import org.hipparchus.linear.RealMatrix;
import org.junit.jupiter.api.Test;
import org.spanloom.language.problem.ProblemKind;

class MatrixTests {

  /** A system that is sound and has the declarations given. */
  private static SystemModel system(String declarations) {
    return ModelListing.system(
        "system S over t [s] from 0 to 10 {\nstate x [m] = 1\nx' = -x/2 [s]\n"
            + declarations
            + "\n}\n");
  }

  private static String declared(String name, RealMatrix matrix) {
    StringBuilder text = new StringBuilder("matrix " + name + " =\n");
    for (int i = 0; i < matrix.getRowDimension(); i++) {
      text.append("  row ");
      for (int j = 0; j < matrix.getColumnDimension(); j++) {
        text.append(j == 0 ? "" : ", ").append((int) matrix.getEntry(i, j));
      }
      text.append('\n');
    }
    return text.toString();
  }

  private static RealMatrix random(Random random, int rows, int columns) {
    RealMatrix matrix = MatrixUtils.createRealMatrix(rows, columns);
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        matrix.setEntry(i, j, random.nextInt(3) == 0 ? 0 : random.nextInt(19) - 9);
      }
    }
    return matrix;
  }

  /** Unit vectors in front and behind pick each entry; whole numbers leave no rounding. */
  @Test
  void productsSumsAndTranspositionsAgreeWithALibrary() {
    Random random = new Random(12);
    RealMatrix a = random(random, 3, 4);
    RealMatrix b = random(random, 4, 2);
    RealMatrix c = random(random, 2, 3);
    RealMatrix expected =
        a.multiply(b)
            .scalarMultiply(3)
            .subtract(c.transpose())
            .add(a.multiply(b))
            .scalarMultiply(0.25);
    StringBuilder text = new StringBuilder();
    text.append(declared("A", a)).append(declared("B", b)).append(declared("C", c));
    text.append("matrix D = (A*3*B - transpose(C) - (-A)*B)/4\n");
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 2; j++) {
        text.append(declared("l" + i + j, unit(i, 3)));
        text.append(declared("r" + i + j, unit(j, 2)));
        text.append("let d" + i + j + " = transpose(l" + i + j + ")*D*r" + i + j + "\n");
        text.append("output o" + i + j + " = d" + i + j + "\n");
      }
    }
    List<Let> lets = system(text.toString()).lets();
    for (Let let : lets) {
      int i = let.name().charAt(1) - '0';
      int j = let.name().charAt(2) - '0';
      assertEquals(expected.getEntry(i, j), TermEvaluator.constant(let.value()), let.name());
    }
    assertEquals(6, lets.size());
  }

  private static RealMatrix unit(int one, int size) {
    RealMatrix column = MatrixUtils.createRealMatrix(size, 1);
    column.setEntry(one, 0, 1);
    return column;
  }

  @Test
  void entriesTakeTheUnitAndKeepTheirDimensionInProducts() {
    SystemModel system =
        system(
            """
            matrix K [kN/m] =
              row 3, -1 [N/m]
              row 0.5, 2
            matrix shape =
              row 1
              row 10
            let k = transpose(shape)*K*shape
            matrix M [t] =
              row 2, 0
              row 0, 3
            let rate [/s2] = k/(transpose(shape)*M*shape)
            output y = rate*1 [s2]
            """);
    // 3000 - 10 + 5000 + 200000 N/m over 2000 + 300000 kg
    Let k = system.lets().getFirst();
    assertEquals(207_990, TermEvaluator.constant(k.value()), 1e-9);
    assertEquals("N/m", k.unit().code());
    assertEquals(207_990.0 / 302_000, TermEvaluator.constant(system.lets().get(1).value()), 1e-15);
  }

  @Test
  void aMatrixOfTimeIsAFunctionInEquationsAndOutputs() {
    SystemModel system =
        system(
            """
            matrix K(t) =
              row sin(t/1 [s]), 0
              row 2, t/4 [s]
            matrix l =
              row 1, 1
            output y [m] = l*K(t)*transpose(l)*x
            """);
    assertEquals(
        "(sin(t) + 2 + t/4) x + 0",
        ModelListing.affine(system, system.outputs().getFirst().value()));
  }

  @Test
  void theModelListsItsMatrices() {
    SystemModel system =
        ModelListing.system(
            """
            matrix load =
              row 1
              row 0
              row 2
            system S over t [s] from 0 to 10 {
              matrix K(t) [kN/m] =                     ## springs
                row t*1 [N/m/s], 0, 3
              matrix D(t) = 0.5 [s]*K(t)
              state x [m] = 1
              x' = -x/2 [s]
              output y = (K(t) + D(t)/1 [s])*load*x
            }
            """);
    assertEquals(
        List.of("load 3 x 1, 2 in 1", "K 1 x 3, 2 in kN/m of t", "D 1 x 3, 2 in kg/s of t"),
        system.matrices().stream()
            .map(m ->
                m.name()
                    + " "
                    + m.rows()
                    + " x "
                    + m.columns()
                    + ", "
                    + m.entries()
                    + " in "
                    + m.unit().code()
                    + (m.dependsOnTime() ? " of t" : ""))
            .toList());
    assertEquals("springs", system.matrices().get(1).documentation());
  }

  @Test
  void workIsBounded() {
    // 300 x 300 entries, multiplied over and over, would take 27 million products each.
    StringBuilder row = new StringBuilder("  row 1");
    row.append(", 2".repeat(299));
    String text =
        "system S over t from 0 to 1 {\nstate x = 1\nx' = -x\nmatrix A =\n"
            + (row + "\n").repeat(300)
            + "matrix B = A*A*A*A*A\noutput y = B\n}\n";
    assertEquals(
        List.of(ProblemKind.MATRIX_TOO_LARGE),
        ModelListing.read(text).problems().stream().map(p -> p.kind()).toList());
  }

  @Test
  void partsShareTheBound() {
    StringBuilder row = new StringBuilder("  row 1");
    row.append(", 2".repeat(99));
    StringBuilder text = new StringBuilder("matrix A =\n" + (row + "\n").repeat(100));
    text.append("system Cell over t from 0 to 1 {\n  state x = 1\n  matrix B = A*A\n");
    text.append("  x' = -x\n}\nsystem All over t from 0 to 1 {\n");
    for (int i = 0; i < 200; i++) {
      text.append("  part c" + i + " = Cell\n");
    }
    text.append("}\n");
    assertTrue(
        ModelListing.read(text.toString()).problems().stream()
            .anyMatch(p -> p.kind() == ProblemKind.MATRIX_TOO_LARGE));
  }
}
