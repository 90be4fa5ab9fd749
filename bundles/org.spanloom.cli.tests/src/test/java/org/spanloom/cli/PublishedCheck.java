/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;

/**
 * One line of {@code published/checks.txt}; the head of that file explains the fields.
 *
 * @param id the id
 * @param model name of the model file beside the table, without its ending
 * @param command command and options, without the file
 * @param quantity which number of the result is meant
 * @param value its published value
 * @param digits decimal digits that must agree
 * @param provenance how the value is known
 * @param source where it was published
 */
record PublishedCheck(
    String id,
    String model,
    List<String> command,
    String quantity,
    double value,
    int digits,
    String provenance,
    String source) {

  static final String FOLDER = "/org/spanloom/cli/published/";

  /** Reads the table. */
  static List<PublishedCheck> all() {
    return resource("checks.txt")
        .lines()
        .filter(line -> !line.isBlank() && !line.startsWith("#"))
        .map(PublishedCheck::of)
        .toList();
  }

  /** Returns the text of a file beside the table. */
  static String resource(String name) {
    try (InputStream in = PublishedCheck.class.getResourceAsStream(FOLDER + name)) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  private static PublishedCheck of(String line) {
    String[] f = line.split(" \\| ", -1);
    if (f.length != 8) {
      throw new AssertionError("eight fields expected: " + line);
    }
    return new PublishedCheck(
        f[0],
        f[1],
        List.of(f[2].split(" ", -1)),
        f[3],
        Double.parseDouble(f[4]),
        Integer.parseInt(f[5]),
        f[6],
        f[7]);
  }

  @Override
  public String toString() {
    return id + " " + quantity;
  }
}
