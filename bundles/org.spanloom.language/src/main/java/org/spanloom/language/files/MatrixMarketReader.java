/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Reads matrices in the Matrix Market format: coordinate and array, real and integer; general,
 * symmetric and skew-symmetric. Source: R. F. Boisvert, R. Pozo, K. A. Remington, The Matrix Market
 * Exchange Formats: Initial Design, NISTIR 5935 (1996).
 *
 * <p>The work is linear in the length of the text but for sorting the entries. The sizes in the
 * text are compared with the limits before anything is laid out for them.
 */
public final class MatrixMarketReader {

  /** Most rows, and most columns. */
  public static final int SIZE_LIMIT = 100_000;

  /** Most entries that are not 0, those that symmetry adds included. */
  public static final int ENTRY_LIMIT = 200_000;

  /** Most values of a file that lists them all. */
  public static final int ARRAY_LIMIT = 4_000_000;

  /** Bits that hold the number of an entry while entries are sorted. */
  private static final int NUMBER_BITS = 20;

  private static final int LONGEST_SHOWN = 40;

  private final MarketLines lines;
  private boolean coordinate;
  private boolean whole;
  private Symmetry symmetry = Symmetry.GENERAL;
  private int rows;
  private int columns;
  private int[] entryRows = new int[0];
  private int[] entryColumns = new int[0];
  private double[] values = new double[0];
  private int[] entryLines = new int[0];
  private int count;
  private Optional<Result> fault = Optional.empty();

  private enum Symmetry {
    GENERAL,
    SYMMETRIC,
    SKEW
  }

  /** What was found in a text. */
  public sealed interface Result {

    /** A matrix. */
    record Read(MarketMatrix matrix) implements Result {}

    /**
     * Something that breaks the rules.
     *
     * @param line the line of the text, from 1
     * @param message a sentence about it
     */
    record Malformed(int line, String message) implements Result {}

    /**
     * More than is read.
     *
     * @param message a sentence that names the limit
     */
    record TooLarge(int line, String message) implements Result {}
  }

  private MatrixMarketReader(String text) {
    this.lines = new MarketLines(text);
  }

  /** Returns the matrix in a text. */
  public static Result read(String text) {
    MatrixMarketReader reader = new MatrixMarketReader(text);
    Optional<MarketMatrix> matrix = reader.matrix();
    return reader.fault.orElseGet(() -> new Result.Read(matrix.orElseThrow()));
  }

  private Optional<MarketMatrix> matrix() {
    return header() && sizes() && (coordinate ? entries() : array()) && nothingBehind()
        ? sorted()
        : Optional.empty();
  }

  private boolean header() {
    List<String> words = lines.first();
    String first = words.isEmpty() ? "" : words.getFirst();
    if (!first.equalsIgnoreCase("%%MatrixMarket") || words.size() != 5) {
      return malformed(
          "a file in the Matrix Market format begins with a line such as"
              + " \"%%MatrixMarket matrix coordinate real general\"");
    }
    String format = lower(words.get(2));
    String field = lower(words.get(3));
    String kind = lower(words.get(4));
    coordinate = format.equals("coordinate");
    whole = field.equals("integer");
    symmetry =
        switch (kind) {
          case "symmetric" -> Symmetry.SYMMETRIC;
          case "skew-symmetric" -> Symmetry.SKEW;
          default -> Symmetry.GENERAL;
        };
    return (lower(words.get(1)).equals("matrix")
            || unread(words.get(1), "only \"matrix\" is read here"))
        && (coordinate
            || format.equals("array")
            || unread(words.get(2), "the entries are listed as \"coordinate\" or \"array\""))
        && (whole || field.equals("real") || unread(words.get(3), "entries are real or integer"))
        && (symmetry != Symmetry.GENERAL
            || kind.equals("general")
            || unread(
                words.get(4), "a matrix of real numbers is general, symmetric or skew-symmetric"));
  }

  private static String lower(String word) {
    return word.toLowerCase(Locale.ROOT);
  }

  private boolean unread(String word, String expected) {
    return malformed("\"" + shown(word) + "\" is not read: " + expected);
  }

  private boolean sizes() {
    String expected =
        coordinate
            ? "the numbers of rows, columns and entries belong here, as in \"4 4 10\""
            : "the numbers of rows and columns belong here, as in \"4 4\"";
    List<String> words = lines.next();
    if (words.size() != (coordinate ? 3 : 2)) {
      return missing(expected);
    }
    long[] sizes = new long[words.size()];
    for (int i = 0; i < sizes.length; i++) {
      Optional<Long> size = wholeNumber(words.get(i));
      if (size.isEmpty() || size.get() < 0) {
        return missing(expected);
      }
      sizes[i] = size.get();
    }
    if (sizes[0] > SIZE_LIMIT || sizes[1] > SIZE_LIMIT) {
      return tooLarge("a matrix has at most " + SIZE_LIMIT + " rows and columns");
    }
    if (sizes[0] < 1 || sizes[1] < 1) {
      return malformed("a matrix has at least one row and one column");
    }
    rows = (int) sizes[0];
    columns = (int) sizes[1];
    if (symmetry != Symmetry.GENERAL && rows != columns) {
      return malformed("a matrix that is symmetric has as many rows as columns");
    }
    if (coordinate && sizes[2] > (long) rows * columns) {
      return malformed("there are more entries than places in the matrix");
    }
    long listed = coordinate ? sizes[2] : 0;
    if (listed > ENTRY_LIMIT) {
      return tooLarge("a matrix has at most " + ENTRY_LIMIT + " entries that are not 0");
    }
    if (!coordinate && (long) rows * columns > ARRAY_LIMIT) {
      return tooLarge("at most " + ARRAY_LIMIT + " values are read: list those that are not 0");
    }
    count = (int) listed;
    return true;
  }

  private boolean entries() {
    String expected = "an entry belongs here as \"row column value\", with rows and columns from 1";
    int listed = count;
    count = 0;
    for (int i = 0; i < listed; i++) {
      List<String> words = lines.next();
      if (words.size() != 3) {
        return missing(expected);
      }
      int row = index(words.get(0), rows);
      int column = index(words.get(1), columns);
      if (row < 0 || column < 0) {
        return malformed(
            "\""
                + shown(words.get(0) + " " + words.get(1))
                + "\" is no place in a matrix of "
                + rows
                + " rows and "
                + columns
                + " columns");
      }
      boolean upper = row < column || symmetry == Symmetry.SKEW && row == column;
      if (symmetry != Symmetry.GENERAL && upper) {
        return malformed(
            "of a matrix that is symmetric only the entries below the diagonal"
                + (symmetry == Symmetry.SKEW ? "" : " and on it")
                + " are listed, and ("
                + (row + 1)
                + ", "
                + (column + 1)
                + ") is none of them");
      }
      if (!value(words.get(2), row, column)) {
        return false;
      }
    }
    return true;
  }

  private boolean array() {
    for (int column = 0; column < columns; column++) {
      int first =
          switch (symmetry) {
            case GENERAL -> 0;
            case SYMMETRIC -> column;
            case SKEW -> column + 1;
          };
      for (int row = first; row < rows; row++) {
        List<String> words = lines.next();
        if (words.size() != 1) {
          return missing(
              "the value of row " + (row + 1) + ", column " + (column + 1) + " belongs here");
        }
        if (!value(words.getFirst(), row, column)) {
          return false;
        }
      }
    }
    return true;
  }

  /** Takes a value with what symmetry adds. */
  private boolean value(String word, int row, int column) {
    Optional<Double> number = number(word);
    if (number.isEmpty()) {
      return malformed("\"" + shown(word) + "\" is not " + (whole ? "a whole number" : "a number"));
    }
    double value = number.get();
    if (!Double.isFinite(value)) {
      return malformed("\"" + shown(word) + "\" is too large to be stored");
    }
    boolean twin = symmetry != Symmetry.GENERAL && row != column;
    if (value == 0) {
      return true;
    }
    if (count + (twin ? 2 : 1) > ENTRY_LIMIT) {
      return tooLarge("a matrix has at most " + ENTRY_LIMIT + " entries that are not 0");
    }
    add(row, column, value);
    if (twin) {
      add(column, row, symmetry == Symmetry.SKEW ? -value : value);
    }
    return true;
  }

  private void add(int row, int column, double value) {
    if (count == values.length) {
      int room = Math.max(16, 2 * count);
      entryRows = Arrays.copyOf(entryRows, room);
      entryColumns = Arrays.copyOf(entryColumns, room);
      entryLines = Arrays.copyOf(entryLines, room);
      values = Arrays.copyOf(values, room);
    }
    entryRows[count] = row;
    entryColumns[count] = column;
    entryLines[count] = lines.number();
    values[count++] = value;
  }

  private boolean nothingBehind() {
    return lines.next().isEmpty() || malformed("nothing stands behind the last entry");
  }

  /** Sorts the entries by place; one place holds one entry. */
  private Optional<MarketMatrix> sorted() {
    long[] keys = new long[count];
    for (int i = 0; i < count; i++) {
      keys[i] = ((long) entryRows[i] * columns + entryColumns[i]) << NUMBER_BITS | i;
    }
    Arrays.sort(keys);
    int[] byRow = new int[count];
    int[] byColumn = new int[count];
    double[] sorted = new double[count];
    for (int i = 0; i < count; i++) {
      int from = (int) (keys[i] & (1L << NUMBER_BITS) - 1);
      if (i > 0 && keys[i] >> NUMBER_BITS == keys[i - 1] >> NUMBER_BITS) {
        fault =
            Optional.of(
                new Result.Malformed(
                    entryLines[from],
                    "the entry of row "
                        + (entryRows[from] + 1)
                        + ", column "
                        + (entryColumns[from] + 1)
                        + " stands in an earlier line already"));
        return Optional.empty();
      }
      byRow[i] = entryRows[from];
      byColumn[i] = entryColumns[from];
      sorted[i] = values[from];
    }
    return Optional.of(new MarketMatrix(rows, columns, byRow, byColumn, sorted));
  }

  private static int index(String word, int size) {
    long index = wholeNumber(word).orElse(0L);
    return index < 1 || index > size ? -1 : (int) index - 1;
  }

  private static Optional<Long> wholeNumber(String word) {
    boolean sign = word.startsWith("+") || word.startsWith("-");
    String digits = sign ? word.substring(1) : word;
    boolean valid =
        !digits.isEmpty()
            && digits.length() <= 18
            && digits.chars().allMatch(c -> c >= '0' && c <= '9');
    return valid ? Optional.of(Long.parseLong(word)) : Optional.empty();
  }

  private Optional<Double> number(String word) {
    if (whole) {
      return wholeNumber(word).map(Long::doubleValue);
    }
    boolean plain = word.chars().allMatch(c -> c >= '0' && c <= '9' || "+-.eE".indexOf(c) >= 0);
    if (!plain) {
      return Optional.empty();
    }
    try {
      return Optional.of(Double.parseDouble(word));
    } catch (NumberFormatException e) {
      return Optional.empty();
    }
  }

  private boolean missing(String expected) {
    return malformed(
        expected
            + (lines.atEnd()
                ? ", but the file ends"
                : ", but \"" + shown(lines.text()) + "\" stands"));
  }

  private static String shown(String text) {
    return text.length() <= LONGEST_SHOWN ? text : text.substring(0, LONGEST_SHOWN - 3) + "...";
  }

  private boolean malformed(String message) {
    fault = Optional.of(new Result.Malformed(lines.number(), message));
    return false;
  }

  private boolean tooLarge(String message) {
    fault = Optional.of(new Result.TooLarge(lines.number(), message));
    return false;
  }
}
