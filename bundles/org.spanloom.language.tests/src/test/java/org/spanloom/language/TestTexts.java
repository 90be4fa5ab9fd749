/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/** The model texts of the repository, for properties that hold for every text. */
public final class TestTexts {

  private static final Path BUNDLES = Path.of("..");
  private static final Path EXAMPLES = Path.of("..", "..", "examples");
  private static final Path PROBLEMS =
      BUNDLES.resolve(
          "org.spanloom.language.tests/src/test/resources/org/spanloom/language/problems");
  private static final Path LAYOUTS = PROBLEMS.resolveSibling("layouts");
  private static final Pattern HELP_MODEL =
      Pattern.compile("(?s)<pre class=\"model\"[^>]*>(.*?)</pre>");

  private TestTexts() {}

  /** Returns the example files and the models of the help pages, by where they come from. */
  public static Map<String, String> models() {
    Map<String, String> texts = new LinkedHashMap<>();
    files(EXAMPLES, ".span").forEach(f -> texts.put(f.toString(), read(f)));
    for (Path page : files(BUNDLES.resolve("org.spanloom.help"), ".html")) {
      Matcher model = HELP_MODEL.matcher(read(page));
      for (int i = 1; model.find(); i++) {
        texts.put(page.getFileName() + " " + i, plain(model.group(1)));
      }
    }
    return texts;
  }

  /** Returns texts with mistakes: the problem cases and the texts of the layout tests. */
  public static Map<String, String> mistakes() {
    Map<String, String> texts = new LinkedHashMap<>();
    for (Path file : files(PROBLEMS, ".cases")) {
      for (String section : read(file).split("(?m)^== ")) {
        int title = section.indexOf('\n');
        int middle = section.indexOf("\n--\n");
        if (middle > title && title > 0) {
          String input = section.substring(title + 1, middle);
          boolean whole =
              file.getFileName().toString().equals("system.cases") || input.contains("system ");
          texts.put(
              file.getFileName() + ": " + section.substring(0, title),
              whole
                  ? input
                  : "system S over t [s] from 0 to 10 { state x [m] = 1; x' = -x/2 [s]\n"
                      + input
                      + "\n}");
        }
      }
    }
    files(LAYOUTS, ".input").forEach(f -> texts.put(f.getFileName().toString(), read(f)));
    return texts;
  }

  /** Returns all of them. */
  public static Map<String, String> all() {
    Map<String, String> texts = new LinkedHashMap<>(models());
    texts.putAll(mistakes());
    return texts;
  }

  private static String plain(String html) {
    return html.replaceAll("<[^>]*>", "")
        .replace("&lt;", "<")
        .replace("&gt;", ">")
        .replace("&quot;", "\"")
        .replace("&amp;", "&");
  }

  private static List<Path> files(Path folder, String ending) {
    try (Stream<Path> files = Files.walk(folder)) {
      return List.copyOf(
          new TreeSet<>(
              files
                  .filter(f -> f.toString().endsWith(ending) && !f.toString().contains("target"))
                  .toList()));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static String read(Path file) {
    try {
      return Files.readString(file);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
