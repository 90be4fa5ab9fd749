/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.lang.reflect.RecordComponent;
import java.util.Arrays;
import java.util.Collection;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.text.Span;

/**
 * Writes trees and models as text without the places in them, so that two of them can be compared
 * and the difference can be read.
 */
public final class RecordText {

  private final StringBuilder text = new StringBuilder();

  private RecordText() {}

  /** Returns a record and all it holds, one part a line; places are left out. */
  public static String of(Object value) {
    RecordText written = new RecordText();
    written.write(value, "");
    return written.text.toString();
  }

  /** Fails if two texts differ, and shows the lines around the first difference only. */
  public static void assertSame(String expected, String found, String about) {
    if (!expected.equals(found)) {
      int same = 0;
      while (same < Math.min(expected.length(), found.length())
          && expected.charAt(same) == found.charAt(same)) {
        same++;
      }
      int from = Math.max(0, same - 200);
      assertEquals(part(expected, from), part(found, from), about);
    }
  }

  private static String part(String text, int from) {
    return text.substring(from, Math.min(text.length(), from + 500));
  }

  private void write(Object value, String indent) {
    switch (value) {
      case Span span -> {}
      case Optional<?> optional ->
          optional.ifPresentOrElse(v -> write(v, indent), () -> line(indent, "none"));
      case Collection<?> list -> {
        line(indent, "list of " + list.size());
        list.forEach(v -> write(v, indent + " "));
      }
      case Map<?, ?> map -> write(map.entrySet(), indent);
      case Record record -> record(record, indent);
      case double[] numbers -> line(indent, Arrays.toString(numbers));
      case int[] numbers -> line(indent, Arrays.toString(numbers));
      default -> line(indent, value.toString());
    }
  }

  private void record(Record record, String indent) {
    line(indent, record.getClass().getSimpleName());
    for (RecordComponent component : record.getClass().getRecordComponents()) {
      try {
        component.getAccessor().setAccessible(true);
        write(component.getAccessor().invoke(record), indent + " ");
      } catch (ReflectiveOperationException e) {
        throw new IllegalStateException(e);
      }
    }
  }

  private void line(String indent, String content) {
    text.append(indent).append(content).append('\n');
  }
}
