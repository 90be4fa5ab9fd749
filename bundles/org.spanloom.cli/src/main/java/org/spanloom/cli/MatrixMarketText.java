/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import org.spanloom.analysis.export.Exported;

/**
 * One matrix in the Matrix Market exchange format (Boisvert, Pozo &amp; Remington, NISTIR 5935,
 * 1996): coordinates for A, which is sparse, a full array for everything else.
 */
final class MatrixMarketText {

  private MatrixMarketText() {}

  static void write(Exported exported, ResultSink sink) throws CommandFailure {
    int n = exported.rows().size();
    int m = exported.columns().size();
    Exported.Matrix matrix = exported.matrices().getFirst();
    double[] values = matrix.values();
    boolean sparse = exported.what() == Exported.What.A;
    sink.write("%%MatrixMarket matrix " + (sparse ? "coordinate" : "array") + " real general\n");
    sink.write(
        "% "
            + exported.what().word()
            + " of system "
            + exported.system()
            + " at "
            + exported.timeName()
            + " = "
            + NumberText.exact(matrix.time())
            + " ["
            + exported.timeUnit()
            + "], in declared units; rows:\n");
    for (int i = 0; i < n; i++) {
      sink.write(
          "%   "
              + (i + 1)
              + " "
              + exported.rows().get(i)
              + " ["
              + exported.rowUnits().get(i)
              + "]\n");
    }
    if (sparse) {
      coordinates(values, n, m, sink);
    } else {
      sink.write(n + " " + m + "\n");
      for (int j = 0; j < m; j++) {
        for (int i = 0; i < n; i++) {
          sink.write(NumberText.exact(values[i * m + j]) + "\n");
        }
      }
    }
  }

  private static void coordinates(double[] values, int n, int m, ResultSink sink)
      throws CommandFailure {
    int count = 0;
    for (double value : values) {
      count += value != 0 ? 1 : 0;
    }
    sink.write(n + " " + m + " " + count + "\n");
    for (int j = 0; j < m; j++) {
      for (int i = 0; i < n; i++) {
        if (values[i * m + j] != 0) {
          sink.write((i + 1) + " " + (j + 1) + " " + NumberText.exact(values[i * m + j]) + "\n");
        }
      }
    }
  }
}
