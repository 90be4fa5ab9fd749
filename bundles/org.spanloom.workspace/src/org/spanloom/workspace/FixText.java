/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * Fixes as the text of a marker's attribute. Each edit is kept with the characters it replaces, so
 * that it can be refused when the file has changed meanwhile.
 */
public final class FixText {

  /** A marker's attribute holds at most 65,535 bytes; a character takes at most three. */
  private static final int LONGEST = 20_000;

  private static final String FIX = "\u001e";
  private static final String FIELD = "\u001f";

  private FixText() {}

  /**
   * A fix that knows what it replaces.
   *
   * @param fix the fix
   * @param replaced for each edit the characters it replaces
   */
  public record Anchored(Fix fix, List<String> replaced) {
    /** Copies the list. */
    public Anchored {
      replaced = List.copyOf(replaced);
    }
  }

  /** Writes fixes; leaves out those that would make the text too long. */
  public static String write(List<Fix> fixes, SourceText source) {
    StringBuilder all = new StringBuilder();
    for (Fix fix : fixes) {
      StringBuilder one = new StringBuilder(fix.label());
      for (TextEdit edit : fix.edits()) {
        one.append(FIELD)
            .append(edit.span().start())
            .append(FIELD)
            .append(source.slice(edit.span()));
        one.append(FIELD).append(edit.replacement());
      }
      if (all.length() + one.length() >= LONGEST) {
        break;
      }
      all.append(all.isEmpty() ? "" : FIX).append(one);
    }
    return all.toString();
  }

  /** Reads fixes; a text that was not written here gives none. */
  public static List<Anchored> read(String text) {
    List<Anchored> fixes = new ArrayList<>();
    if (text.isEmpty()) {
      return fixes;
    }
    for (String one : text.split(FIX, -1)) {
      String[] fields = one.split(FIELD, -1);
      if (fields.length % 3 != 1) {
        return List.of();
      }
      List<TextEdit> edits = new ArrayList<>();
      List<String> replaced = new ArrayList<>();
      for (int i = 1; i < fields.length; i += 3) {
        int start;
        try {
          start = Integer.parseInt(fields[i]);
        } catch (NumberFormatException e) {
          return List.of();
        }
        edits.add(new TextEdit(new Span(start, start + fields[i + 1].length()), fields[i + 2]));
        replaced.add(fields[i + 1]);
      }
      fixes.add(new Anchored(new Fix(fields[0], edits), replaced));
    }
    return fixes;
  }
}
