/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.architecture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.spi.ToolProvider;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The arrows between the bundles point one way: ui to workspace to analysis to language and
 * numerics, and cli to analysis. Language and numerics do not know each other, and nothing below
 * workspace knows Eclipse.
 */
class ArchitectureTests {

  private static final Path BUNDLES = Path.of("..").toAbsolutePath().normalize();

  /** What each bundle may use of the others. */
  private static final Map<String, Set<String>> MAY_USE =
      Map.of(
          "language", Set.of(),
          "numerics", Set.of(),
          "analysis", Set.of("language", "numerics"),
          "cli", Set.of("analysis", "language", "numerics"),
          "workspace", Set.of("analysis", "language", "numerics"),
          "ui", Set.of("workspace", "analysis", "language", "numerics"));

  private static final Pattern ARROW =
      Pattern.compile("^\\s+(\\S+)\\s+-> (\\S+)", Pattern.MULTILINE);
  private static final Pattern IMPORT =
      Pattern.compile("^import (?:static )?([\\w.]+)", Pattern.MULTILINE);
  private static final Pattern OURS = Pattern.compile("org\\.spanloom\\.(\\w+)(?:\\..*)?");

  /** Packages that the class files of a bundle use, as jdeps of the JDK sees them. */
  private static Set<String> used(String bundle) {
    StringWriter out = new StringWriter();
    ToolProvider jdeps = ToolProvider.findFirst("jdeps").orElseThrow();
    PrintWriter writer = new PrintWriter(out);
    String classes = BUNDLES.resolve("org.spanloom." + bundle + "/target/classes").toString();
    jdeps.run(writer, writer, "--ignore-missing-deps", "-verbose:package", classes);
    Set<String> used = new TreeSet<>();
    Matcher arrows = ARROW.matcher(out.toString());
    while (arrows.find()) {
      if (arrows.group(1).startsWith("org.spanloom.")) {
        used.add(arrows.group(2));
      }
    }
    assertFalse(used.isEmpty(), "no class of " + bundle + " was seen:\n" + out);
    return used;
  }

  private static Set<String> imported(String bundle) throws IOException {
    Set<String> imported = new TreeSet<>();
    for (Path file : sources(bundle)) {
      Matcher imports = IMPORT.matcher(Files.readString(file));
      while (imports.find()) {
        imported.add(imports.group(1));
      }
    }
    return imported;
  }

  private static List<Path> sources(String bundle) throws IOException {
    try (Stream<Path> files =
        Files.walk(BUNDLES.resolve("org.spanloom." + bundle).resolve("src"))) {
      return files.filter(f -> f.toString().endsWith(".java")).sorted().toList();
    }
  }

  private static void assertArrows(String bundle, Set<String> names) {
    Set<String> wrong = new TreeSet<>();
    for (String name : names) {
      Matcher ours = OURS.matcher(name);
      if (ours.matches()
          && !ours.group(1).equals(bundle)
          && !MAY_USE.get(bundle).contains(ours.group(1))) {
        wrong.add(name);
      }
    }
    assertEquals(Set.of(), wrong, bundle + " uses what it must not know");
  }

  @ParameterizedTest
  @ValueSource(strings = {"language", "numerics", "analysis", "cli"})
  void plainBundlesKnowOnlyWhatIsBelowThemAndNoEclipse(String bundle) {
    Set<String> used = used(bundle);
    assertArrows(bundle, used);
    assertEquals(
        List.of(),
        used.stream()
            .filter(p -> p.startsWith("org.eclipse.") || p.startsWith("org.osgi."))
            .toList(),
        bundle + " must run without Eclipse");
  }

  @ParameterizedTest
  @ValueSource(strings = {"workspace", "ui"})
  void workbenchBundlesKnowOnlyWhatIsBelowThem(String bundle) throws IOException {
    assertArrows(bundle, imported(bundle));
  }

  @Test
  void theWorkspaceHasNoScreen() throws IOException {
    assertEquals(
        List.of(),
        imported("workspace").stream()
            .filter(p ->
                p.startsWith("org.eclipse.swt")
                    || p.startsWith("org.eclipse.jface")
                    || p.startsWith("org.eclipse.ui"))
            .toList());
  }

  @Test
  void languageRoomsPointOneWay() throws IOException {
    Map<String, Set<String>> mayUse =
        Map.of(
            "text", Set.of(),
            "files", Set.of(),
            "problem", Set.of("text"),
            "units", Set.of("text", "problem"),
            "syntax", Set.of("text", "problem"),
            "formatting", Set.of("text", "problem", "syntax"),
            "model", Set.of("text", "files", "problem", "units", "syntax"),
            "editing", Set.of("text", "files", "problem", "units", "syntax", "model"));
    Map<String, Set<String>> wrong = new TreeMap<>();
    for (Path file : sources("language")) {
      String room = room(file);
      Matcher imports = IMPORT.matcher(Files.readString(file));
      while (imports.find()) {
        Matcher language =
            Pattern.compile("org\\.spanloom\\.language\\.(\\w+)\\..*").matcher(imports.group(1));
        if (language.matches()
            && !language.group(1).equals(room)
            && !mayUse.getOrDefault(room, Set.of()).contains(language.group(1))) {
          wrong
              .computeIfAbsent(file.getFileName().toString(), k -> new TreeSet<>())
              .add(imports.group(1));
        }
      }
    }
    assertEquals(Map.of(), wrong);
  }

  private static String room(Path file) {
    List<String> names = new ArrayList<>();
    file.forEach(name -> names.add(name.toString()));
    return names.get(names.lastIndexOf("language") + 1);
  }

  @Test
  void everyPackageSaysWhatItIs() throws IOException {
    Set<Path> silent = new TreeSet<>();
    for (String bundle : MAY_USE.keySet()) {
      for (Path file : sources(bundle)) {
        if (!Files.exists(file.resolveSibling("package-info.java"))) {
          silent.add(BUNDLES.relativize(file.getParent()));
        }
      }
    }
    assertEquals(Set.of(), silent, "packages without package-info.java");
  }
}
