/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** What a run printed, read back as numbers. */
final class PrintedResult {

  private final List<String> names;
  private final List<double[]> rows = new ArrayList<>();
  private final String conditioning;

  PrintedResult(CommandRun run) {
    List<String> lines = run.out().lines().toList();
    names = Arrays.stream(lines.getFirst().split(",", -1)).map(n -> n.replace("\"", "")).toList();
    for (String line : lines.subList(1, lines.size())) {
      rows.add(Arrays.stream(line.split(",", -1)).mapToDouble(Double::parseDouble).toArray());
    }
    conditioning = run.err();
  }

  List<String> names() {
    return names;
  }

  List<double[]> rows() {
    return rows;
  }

  /** Returns the value of a column in the last row. */
  double last(String column) {
    return rows.getLast()[index(column)];
  }

  private int index(String column) {
    int index = names.indexOf(column);
    if (index < 0) {
      throw new AssertionError("no column " + column + " in " + names);
    }
    return index;
  }

  /** Returns a number of the result, named as the head of {@code checks.txt} explains. */
  double quantity(String name) {
    String[] words = name.split(" ", -1);
    return switch (name) {
      case "determinant" -> determinant(matrix());
      case "trace" -> trace(matrix());
      case "largest multiplier" -> multiplier(matrix(), true);
      case "smallest multiplier" -> multiplier(matrix(), false);
      case "growth exponent" -> arcosh(Math.abs(trace(matrix())) / 2) / Math.PI;
      case "condition" -> conditionColumn(1);
      case "scaled condition" -> conditionColumn(2);
      default ->
          switch (words[0]) {
            case "entry" -> matrix()[index(words[1]) - 2][Integer.parseInt(words[2]) - 1];
            case "quotient" -> last(words[1]) / last(words[2]);
            case "logarithm" -> -Math.log(last(words[1]));
            default -> last(name);
          };
    };
  }

  /** Returns the basis matrix at the last time: row i is state i, column j is solution j. */
  private double[][] matrix() {
    int n = names.size() - 2;
    List<double[]> columns = rows.subList(rows.size() - n, rows.size());
    double[][] matrix = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        matrix[i][j] = columns.get(j)[2 + i];
      }
    }
    return matrix;
  }

  private static double trace(double[][] m) {
    return m[0][0] + m[1][1];
  }

  private static double determinant(double[][] m) {
    return m[0][0] * m[1][1] - m[0][1] * m[1][0];
  }

  /**
   * Returns an eigenvalue of a 2 by 2 matrix whose eigenvalues are real; the smaller one by the
   * determinant.
   */
  private static double multiplier(double[][] m, boolean largest) {
    double half = trace(m) / 2;
    double det = determinant(m);
    double root = Math.sqrt(half * half - det);
    double big = half + Math.copySign(root, half);
    return largest ? big : det / big;
  }

  private static double arcosh(double x) {
    return Math.log(x + Math.sqrt((x - 1) * (x + 1)));
  }

  private double conditionColumn(int column) {
    String line = conditioning.lines().reduce((first, second) -> second).orElseThrow();
    return Double.parseDouble(line.strip().split(" +", -1)[column]);
  }
}
