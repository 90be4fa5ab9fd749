/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.spanloom.language.files.MatrixMarketReader.Result;

class MatrixMarketReaderTests {

  private static String read(String text) {
    return switch (MatrixMarketReader.read(text.replace('|', '\n'))) {
      case Result.Read(MarketMatrix matrix) -> {
        StringBuilder list = new StringBuilder(matrix.rows() + "x" + matrix.columns());
        for (int i = 0; i < matrix.count(); i++) {
          list.append(" ").append(matrix.row(i)).append(",").append(matrix.column(i));
          list.append("=").append(matrix.value(i));
        }
        yield list.toString();
      }
      case Result.Malformed(int line, String message) -> line + ": " + message;
      case Result.TooLarge(int line, String message) -> line + " too large: " + message;
    };
  }

  /** The example of the report that defines the format (NISTIR 5935, section on coordinates). */
  @Test
  void theExampleOfTheReportIsRead() {
    assertEquals(
        "5x5 0,0=1.0 0,3=6.0 1,1=10.5 2,2=0.015 3,1=250.5 3,3=-280.0 3,4=33.32 4,4=12.0",
        read(
            """
            %%MatrixMarket matrix coordinate real general
            % A 5x5 sparse matrix with 8 nonzeros
            5 5 8
            1 1 1.0
            2 2 10.5
            4 2 250.5
            3 3 1.5e-2
            1 4 6.0
            4 4 -2.8e2
            4 5 33.32
            5 5 12.0
            """));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = ';',
      value = {
        "coordinate real symmetric|3 3 4|1 1 2|2 1 -1|2 2 2|3 3 5;"
            + " 3x3 0,0=2.0 0,1=-1.0 1,0=-1.0 1,1=2.0 2,2=5.0",
        "coordinate real skew-symmetric|2 2 1|2 1 3.5; 2x2 0,1=-3.5 1,0=3.5",
        "coordinate integer general|2 1 1|2 1 -7; 2x1 1,0=-7.0",
        "array real general|2 3|1|2|3|0|5|6; 2x3 0,0=1.0 0,1=3.0 0,2=5.0 1,0=2.0 1,2=6.0",
        "array real symmetric|2 2|1|2|3; 2x2 0,0=1.0 0,1=2.0 1,0=2.0 1,1=3.0",
        "array integer skew-symmetric|2 2|4; 2x2 0,1=-4.0 1,0=4.0",
        "COORDINATE Real General||% note|| 1  1 1 | 1\t1 +.5e0 |; 1x1 0,0=0.5",
        "coordinate real general|2 2 0; 2x2",
      })
  void formatsAndSymmetriesAreRead(String text, String expected) {
    assertEquals(expected, read("%%MatrixMarket matrix " + text));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = ';',
      value = {
        "matrix coordinate real general; 1: the numbers of rows, columns and entries belong here,"
            + " as in \"4 4 10\", but the file ends",
        "matrix coordinate complex general|1 1 1; 1: \"complex\" is not read: entries are real or"
            + " integer",
        "matrix coordinate pattern general|1 1 1; 1: \"pattern\" is not read: entries are real or"
            + " integer",
        "vector coordinate real general|1 1 1; 1: \"vector\" is not read: only \"matrix\" is read"
            + " here",
        "matrix table real general|1 1 1; 1: \"table\" is not read: the entries are listed as"
            + " \"coordinate\" or \"array\"",
        "matrix array real hermitian|1 1; 1: \"hermitian\" is not read: a matrix of real numbers is"
            + " general, symmetric or skew-symmetric",
        "matrix array real general|1 x; 2: the numbers of rows and columns belong here, as in \"4"
            + " 4\", but \"1 x\" stands",
        "matrix coordinate real general|%c|2 2 2|1 1 1|3 1 2; 5: \"3 1\" is no place in a matrix of"
            + " 2 rows and 2 columns",
        "matrix coordinate real general|2 2 1|0 1 2; 3: \"0 1\" is no place in a matrix of 2 rows"
            + " and 2 columns",
        "matrix coordinate real general|2 2 2|1 1 1; 3: an entry belongs here as \"row column"
            + " value\", with rows and columns from 1, but the file ends",
        "matrix coordinate real general|2 2 1|1 1; 3: an entry belongs here as \"row column"
            + " value\", with rows and columns from 1, but \"1 1\" stands",
        "matrix coordinate real general|2 2 1|1 1 NaN; 3: \"NaN\" is not a number",
        "matrix coordinate real general|2 2 1|1 1 1e999; 3: \"1e999\" is too large to be stored",
        "matrix coordinate integer general|2 2 1|1 1 1.5; 3: \"1.5\" is not a whole number",
        "matrix coordinate real general|2 2 2|1 1 1|1 1 2; 4: the entry of row 1, column 1 stands"
            + " in an earlier line already",
        "matrix coordinate real general|2 2 1|1 1 1|2 2 1; 4: nothing stands behind the last entry",
        "matrix coordinate real symmetric|2 2 1|1 2 1; 3: of a matrix that is symmetric only the"
            + " entries below the diagonal and on it are listed, and (1, 2) is none of them",
        "matrix coordinate real skew-symmetric|2 2 1|1 1 1; 3: of a matrix that is symmetric only"
            + " the entries below the diagonal are listed, and (1, 1) is none of them",
        "matrix coordinate real symmetric|2 3 0; 2: a matrix that is symmetric has as many rows as"
            + " columns",
        "matrix coordinate real general|0 2 0; 2: a matrix has at least one row and one column",
        "matrix coordinate real general|2 2 5; 2: there are more entries than places in the matrix",
        "matrix array real general|2 1|1; 3: the value of row 2, column 1 belongs here, but the"
            + " file ends",
        "matrix coordinate real general|1000000000 2 5; 2 too large: a matrix has at most 100000"
            + " rows and columns",
        "matrix coordinate real general|100000 100000 600000; 2 too large: a matrix has at most"
            + " 200000 entries that are not 0",
        "matrix array real general|100000 100000; 2 too large: at most 4000000 values are read:"
            + " list those that are not 0",
        "matrix array real general|999999999999999999999 1; 2: the numbers of rows and columns"
            + " belong here, as in \"4 4\", but \"999999999999999999999 1\" stands",
      })
  void whatIsWrongIsNamedWithItsLine(String text, String expected) {
    assertEquals(expected, read("%%MatrixMarket " + text));
  }

  @Test
  void otherFilesAreRecognised() {
    assertInstanceOf(Result.Malformed.class, MatrixMarketReader.read(""));
    assertInstanceOf(Result.Malformed.class, MatrixMarketReader.read("\n\n"));
    assertInstanceOf(Result.Malformed.class, MatrixMarketReader.read("time,air\n0,1\n"));
  }
}
