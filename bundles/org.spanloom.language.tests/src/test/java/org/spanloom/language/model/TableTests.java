/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.spanloom.language.files.TextFiles;
import org.spanloom.language.model.Corners.Corner;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.text.SourceText;

/** Tables from their text to their values. */
class TableTests {

  /** Fritsch and Carlson 1980, data set RPN 14 (from memory). */
  private static final double[] RPN_TIMES = {7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20};

  private static final double[] RPN_VALUES = {
    0, 2.76429e-5, 4.37498e-2, 0.169183, 0.469428, 0.943740, 0.998636, 0.999919, 0.999994
  };

  private static Model model(String file, String method) {
    String text =
        "system S over t [h] from 0 to 10 {\n"
            + "table f(t) [kW] = file \"data/f.csv\" time \"at, clock\" [min] column \"power\" "
            + method
            + "\nstate E [kJ] = 0\nE' = f(t)\n}";
    return ModelReader.read(
        new SourceText("m.span", text),
        new TextFiles("m.span", Map.of("data/f.csv", file)),
        () -> false);
  }

  private static PiecewiseCurve curve(String file, String method) {
    Model model = model(file, method);
    assertEquals(List.of(), model.problems());
    Term value = model.systems().getFirst().lets().getFirst().value();
    return ((Term.CurveTerm) value).curve();
  }

  private static String problem(String file) {
    List<Problem> problems = model(file, "linear").problems();
    assertEquals(1, problems.size(), problems.toString());
    return problems.getFirst().kind().id() + " " + problems.getFirst().message();
  }

  @Test
  void aFileIsReadWithQuotedFieldsAndAnyLineEnds() {
    PiecewiseCurve curve =
        curve(
            "power,\"at, clock\",\"say \"\"so\"\"\"\r\n1.5,0,\"a\nb\"\r\n2,60,\n\"4e0\", 600 ,x",
            "linear");
    assertEquals(1500, curve.at(0));
    assertEquals(1750, curve.at(1800));
    assertEquals(2000, curve.at(3600));
    assertEquals(4000, curve.at(36000));
  }

  @Test
  void minusZeroIsTheTimeZero() {
    PiecewiseCurve curve = curve("\"at, clock\",power\n0,1.5\n600,4\n", "linear");
    assertEquals(1500, curve.at(-0.0));
    Interval values = curve.over(new Interval(-0.0, -0.0));
    assertTrue(values.low() <= 1500 && 1500 <= values.high(), values.toString());
  }

  @Test
  void whatIsWrongInAFileHasItsLine() {
    String intro = "The file \"data/f.csv\" cannot be used, line ";
    String outro = ". Correct the file or the statement.";
    String heads = "\"at, clock\",power\n";
    assertEquals(
        "table-invalid "
            + intro
            + "1: no column is headed \"at, clock\"; the heads are hour, power"
            + outro,
        problem("hour,power\n0,1\n600,2"));
    assertEquals(
        "table-invalid " + intro + "3: the field in column \"power\" is empty" + outro,
        problem(heads + "0,1\n600,\n"));
    assertEquals(
        "table-invalid " + intro + "2: \"NaN\" in column \"power\" is not a number" + outro,
        problem(heads + "0,NaN\n600,1\n"));
    assertEquals(
        "table-invalid " + intro + "2: \"1,5\" in column \"power\" is not a number" + outro,
        problem(heads + "0,\"1,5\"\n600,1\n"));
    assertEquals(
        "table-invalid " + intro + "2: the row has 3 fields, but the first line has 2" + outro,
        problem(heads + "0,1,5\n600,1\n"));
    assertEquals(
        "table-invalid " + intro + "3: a quotation mark is not closed" + outro,
        problem(heads + "0,1\n600,\"1\n"));
    assertEquals(
        "table-invalid Line 3 of \"data/f.csv\" is not later than the row before it: the times of a"
            + " table increase from row to row.",
        problem(heads + "5,1\n5,1\n600,1"));
    assertEquals(
        "table-invalid The table f has no row: it needs at least two; a single value holds with"
            + " hold.",
        problem(heads));
  }

  @Test
  void aFileOfTooManyRowsIsRefused() {
    String rows = "\"at, clock\",power\n" + "1,1\n".repeat(1_000_001);
    assertTrue(problem(rows).contains("line 1000002: there are more than 1000000 rows"));
  }

  @Test
  void aHundredThousandRowsAreABreakpointEach() {
    StringBuilder rows = new StringBuilder("\"at, clock\",power\n");
    for (int k = 0; k <= 100_000; k++) {
      rows.append(k * 0.006).append(',').append(k % 7).append('\n');
    }
    PiecewiseCurve curve = curve(rows.toString(), "hold");
    CornerSearch search = new CornerSearch(0, 10, 3600, Map.of());
    search.add(new Term.CurveTerm("f", curve, new Term.Time()));
    List<Corner> corners = search.result().list();
    assertEquals(100_001, corners.size());
    for (int k = 1; k < corners.size(); k += 997) {
      assertEquals(k % 7 * 1000.0, curve.at(corners.get(k).after() * 3600));
      assertEquals((k - 1) % 7 * 1000.0, curve.at(corners.get(k).before() * 3600));
    }
  }

  @Test
  void monotoneCubicsRiseWhereTheRowsDo() {
    PiecewiseCurve curve = PiecewiseCurve.monotoneCubic(RPN_TIMES, RPN_VALUES);
    for (int k = 0; k < RPN_TIMES.length; k++) {
      assertEquals(RPN_VALUES[k], curve.at(RPN_TIMES[k]), 1e-15);
    }
    double before = 0;
    for (int k = 0; k <= 20_000; k++) {
      double value = curve.at(7.99 + 12.01 * k / 20_000);
      assertTrue(value >= before - 1e-15 && value <= 0.999994, "at sample " + k);
      before = value;
    }
  }

  @Test
  void monotoneCubicsHaveNoExtremesBetweenRowsAndSmoothSlopes() {
    double[] times = {0, 1, 2.5, 3, 5, 6};
    double[] values = {1, 3, 3, 2, 4, -1};
    PiecewiseCurve curve = PiecewiseCurve.monotoneCubic(times, values);
    PiecewiseCurve slope = curve.derivative();
    for (int k = 1; k < 5; k++) {
      assertEquals(slope.at(Math.nextDown(times[k])), slope.at(times[k]), 1e-9);
    }
    for (int k = 0; k < 5; k++) {
      double low = Math.min(values[k], values[k + 1]);
      double high = Math.max(values[k], values[k + 1]);
      for (double s = 0; s < 1; s += 0.01) {
        double value = curve.at(times[k] + s * (times[k + 1] - times[k]));
        assertTrue(value >= low - 1e-14 && value <= high + 1e-14);
      }
    }
  }

  @Test
  void aDerivativeIsTheSlopeOfTheCurve() {
    PiecewiseCurve curve = PiecewiseCurve.monotoneCubic(RPN_TIMES, RPN_VALUES);
    Term term = new Term.CurveTerm("f", curve, new Term.Time());
    TermEvaluator slope = TermEvaluator.of(TimeDerivative.of(term));
    for (double t : new double[] {8.01, 8.5, 9.99, 14}) {
      double h = 1e-6;
      assertEquals((curve.at(t + h) - curve.at(t - h)) / (2 * h), slope.at(t), 1e-6);
    }
    PiecewiseCurve line = PiecewiseCurve.linear(new double[] {0, 2, 3}, new double[] {1, 5, 4});
    assertEquals(2, line.derivative().at(1));
    assertEquals(-1, line.derivative().at(2));
    assertEquals(0, line.derivative().at(9));
  }

  @Test
  void enclosuresHoldEveryValue() {
    Random random = new Random(5);
    double[] times = new double[40];
    double[] values = new double[40];
    for (int k = 0; k < 40; k++) {
      times[k] = k + random.nextDouble() / 2;
      values[k] = random.nextGaussian();
    }
    List<PiecewiseCurve> curves =
        List.of(
            PiecewiseCurve.hold(times, values),
            PiecewiseCurve.linear(times, values),
            PiecewiseCurve.monotoneCubic(times, values),
            PiecewiseCurve.monotoneCubic(times, values).derivative(),
            PiecewiseCurve.hold(new double[] {3}, new double[] {2}));
    for (PiecewiseCurve curve : curves) {
      for (int round = 0; round < 500; round++) {
        double from = 44 * random.nextDouble() - 2;
        double to = from + (round % 2 == 0 ? 0.3 : 9) * random.nextDouble();
        Interval range = curve.over(new Interval(from, to));
        for (int sample = 0; sample < 30; sample++) {
          double value = curve.at(from + (to - from) * random.nextDouble());
          assertTrue(range.contains(value), value + " is not in " + range);
        }
      }
    }
  }

  @Test
  void rowsStandBelowTheTable() {
    Model model =
        ModelReader.read(
            new SourceText(
                "m.span",
                """
                system S over t [h] from 0 to 10 {
                  table f(t) [kW] = hold extended
                    row 30 [min], 1 [W]
                    row 2, -2e0
                  state E [kJ] = 0
                  E' = f(t)
                }
                """));
    assertEquals(List.of(), model.problems());
    Term value = model.systems().getFirst().lets().getFirst().value();
    TermEvaluator at = TermEvaluator.of(value);
    assertArrayEquals(
        new double[] {1, 1, 1, -2000, -2000},
        new double[] {at.at(0), at.at(1800), at.at(7199), at.at(7200), at.at(36000)});
  }
}
