/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Reads two columns of numbers from comma-separated values (RFC 4180): a first line of heads,
 * commas between fields, quotation marks around a field that holds commas, line ends or, doubled,
 * quotation marks; line ends of any kind. Numbers have a decimal point.
 */
public final class CsvColumns {

  /** Most rows that are read. */
  public static final int ROW_LIMIT = 1_000_000;

  private static final int SHOWN = 40;

  private final String text;
  private int at;
  private int line = 1;

  private CsvColumns(String text) {
    this.text = text;
  }

  /** What was read. */
  public sealed interface Answer {}

  /**
   * The two columns.
   *
   * @param first numbers of the first one
   * @param second numbers of the second one, as many
   * @param lines for each row the line of the text that it begins in, from 1
   */
  public record Columns(double[] first, double[] second, int[] lines) implements Answer {}

  /**
   * Something that keeps the columns from being read.
   *
   * @param line the line of the text, from 1
   * @param reason a sentence without its full stop that begins with a small letter
   */
  public record Fault(int line, String reason) implements Answer {}

  /** A fault on its way out. */
  private static final class FaultException extends Exception {
    private static final long serialVersionUID = 1L;
    private final int line;

    FaultException(int line, String reason) {
      super(reason);
      this.line = line;
    }
  }

  /**
   * Reads.
   *
   * @param text the whole text
   * @param first head of the one column
   * @param second head of the other
   */
  public static Answer read(String text, String first, String second) {
    try {
      return new CsvColumns(text).columns(first, second);
    } catch (FaultException fault) {
      return new Fault(fault.line, fault.getMessage());
    }
  }

  private Columns columns(String first, String second) throws FaultException {
    List<String> heads = record();
    int[] places = {place(heads, first), place(heads, second)};
    double[][] numbers = new double[2][16];
    int[] lines = new int[16];
    int count = 0;
    while (at < text.length()) {
      int begin = line;
      List<String> fields = record();
      if (fields.size() == 1 && fields.getFirst().isBlank()) {
        continue;
      }
      if (fields.size() != heads.size()) {
        throw new FaultException(
            begin,
            "the row has "
                + fields.size()
                + (fields.size() == 1 ? " field" : " fields")
                + ", but the first line has "
                + heads.size());
      }
      if (count == ROW_LIMIT) {
        throw new FaultException(begin, "there are more than " + ROW_LIMIT + " rows");
      }
      if (count == lines.length) {
        lines = Arrays.copyOf(lines, 2 * count);
        numbers[0] = Arrays.copyOf(numbers[0], 2 * count);
        numbers[1] = Arrays.copyOf(numbers[1], 2 * count);
      }
      lines[count] = begin;
      for (int k = 0; k < 2; k++) {
        numbers[k][count] = number(fields.get(places[k]), heads.get(places[k]), begin);
      }
      count++;
    }
    return new Columns(
        Arrays.copyOf(numbers[0], count),
        Arrays.copyOf(numbers[1], count),
        Arrays.copyOf(lines, count));
  }

  private static int place(List<String> heads, String wanted) throws FaultException {
    int found = -1;
    for (int k = 0; k < heads.size(); k++) {
      if (heads.get(k).strip().equals(wanted.strip())) {
        if (found >= 0) {
          throw new FaultException(1, "two columns are headed \"" + shown(wanted) + "\"");
        }
        found = k;
      }
    }
    if (found < 0) {
      throw new FaultException(
          1,
          "no column is headed \""
              + shown(wanted)
              + "\"; the heads are "
              + shown(String.join(", ", heads)));
    }
    return found;
  }

  private static double number(String field, String head, int line) throws FaultException {
    String digits = field.strip();
    boolean plain =
        !digits.isEmpty() && digits.chars().allMatch(c -> "0123456789+-.eE".indexOf(c) >= 0);
    double value = Double.NaN;
    if (plain) {
      try {
        value = Double.parseDouble(digits);
      } catch (NumberFormatException notANumber) {
        value = Double.NaN;
      }
    }
    if (!Double.isFinite(value)) {
      throw new FaultException(
          line,
          digits.isEmpty()
              ? "the field in column \"" + shown(head) + "\" is empty"
              : "\"" + shown(digits) + "\" in column \"" + shown(head) + "\" is not a number");
    }
    return value;
  }

  /** Takes one record with the line end behind it. */
  private List<String> record() throws FaultException {
    List<String> fields = new ArrayList<>();
    do {
      fields.add(field());
    } while (take(','));
    if (at < text.length()) {
      boolean both =
          text.charAt(at) == '\r' && at + 1 < text.length() && text.charAt(at + 1) == '\n';
      at += both ? 2 : 1;
      line++;
    }
    return fields;
  }

  private boolean take(char sign) {
    boolean found = at < text.length() && text.charAt(at) == sign;
    at += found ? 1 : 0;
    return found;
  }

  private String field() throws FaultException {
    if (!take('"')) {
      int start = at;
      while (at < text.length() && ",\r\n".indexOf(text.charAt(at)) < 0) {
        at++;
      }
      return text.substring(start, at);
    }
    int begin = line;
    StringBuilder field = new StringBuilder();
    while (true) {
      if (at == text.length()) {
        throw new FaultException(begin, "a quotation mark is not closed");
      }
      char c = text.charAt(at++);
      if (c == '"' && !take('"')) {
        break;
      }
      line += c == '\n' ? 1 : 0;
      field.append(c);
    }
    if (at < text.length() && ",\r\n".indexOf(text.charAt(at)) < 0) {
      throw new FaultException(line, "something stands behind a closing quotation mark");
    }
    return field.toString();
  }

  private static String shown(String text) {
    return text.length() <= SHOWN ? text : text.substring(0, SHOWN - 3) + "...";
  }
}
