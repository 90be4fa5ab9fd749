/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.spi.ToolProvider;
import java.util.stream.Stream;

/**
 * Holds the arrows between the bundles, and between the rooms inside the language, in the compiled
 * classes; and that every package has its {@code package-info.java}.
 *
 * <pre>
 * java releng/checks/Architecture.java ROOT
 * </pre>
 *
 * <p>Runs on the class files of a finished build ({@code bundles/&#42;/target/classes}). The status
 * is 0 when all holds, 1 with one line for each arrow that should not be there, 2 when there is
 * nothing to look at.
 */
final class Architecture {

  /** Packages below {@code from} may refer only to {@code allowed} and never to {@code barred}. */
  private record Rule(String from, List<String> allowed, List<String> barred) {}

  private record Arrow(String from, String to) {}

  private static final List<String> UNITS =
      List.of("javax.measure", "tech.units", "tech.uom", "si.uom", "systems.uom");
  private static final List<String> ALGEBRA = List.of("org.ejml", "pabeles", "org.hipparchus");
  private static final String SPANLOOM = "org.spanloom.";

  private static final List<Rule> RULES =
      List.of(
          rule("language", join(UNITS, "language")),
          rule("numerics", join(ALGEBRA, "numerics")),
          rule(
              "analysis",
              join(
                  join(join(UNITS, "language"), ALGEBRA),
                  "numerics",
                  "analysis",
                  "=org.objectweb.asm",
                  "=com.google.gson")),
          rule("cli", join(List.of("picocli"), "language", "numerics", "analysis", "cli")),
          rule(
              "workspace",
              join(
                  List.of("org.eclipse", "org.osgi"),
                  "language",
                  "numerics",
                  "analysis",
                  "workspace"),
              "org.eclipse.ui",
              "org.eclipse.swt",
              "org.eclipse.jface"),
          rule(
              "ui",
              join(
                  List.of("org.eclipse", "org.osgi"),
                  "language",
                  "numerics",
                  "analysis",
                  "workspace",
                  "ui"),
              "org.eclipse.e4.ui.css"),
          // Inside the language the rooms build on each other in one direction.
          rule("language.text", List.of("org.spanloom.language.text")),
          rule(
              "language.syntax",
              join(UNITS, "language"),
              "org.spanloom.language.model",
              "org.spanloom.language.editing"),
          rule("language.model", join(UNITS, "language"), "org.spanloom.language.editing"));

  private Architecture() {}

  public static void main(String[] arguments) {
    if (arguments.length != 1) {
      System.err.println("architecture: give the root of the repository as the only argument");
      System.exit(2);
    }
    try {
      System.exit(run(Path.of(arguments[0])));
    } catch (IOException | IllegalStateException e) {
      System.err.println("architecture: " + e.getMessage());
      System.exit(2);
    }
  }

  private static int run(Path root) throws IOException {
    List<String> problems = new ArrayList<>();
    int arrows = 0;
    for (String bundle : List.of("language", "numerics", "analysis", "cli", "workspace", "ui")) {
      Path folder = root.resolve("bundles").resolve(SPANLOOM + bundle);
      Path classes = folder.resolve("target/classes");
      if (!Files.isDirectory(classes)) {
        throw new IllegalStateException(
            classes + " is missing; build first with releng/build verify");
      }
      Set<String> found = new TreeSet<>();
      for (Arrow arrow : arrows(classes)) {
        arrows++;
        RULES.stream()
            .filter(rule -> within(arrow.from, rule.from))
            .filter(rule -> !permits(rule, arrow.to))
            .forEach(rule -> found.add(arrow.from + " must not use " + arrow.to));
      }
      problems.addAll(found);
      problems.addAll(packagesWithoutTour(folder));
    }
    problems.forEach(problem -> System.out.println("architecture: " + problem));
    System.out.printf("architecture: %d arrows looked at, %d wrong%n", arrows, problems.size());
    return problems.isEmpty() ? 0 : 1;
  }

  private static Rule rule(String from, List<String> allowed, String... barred) {
    return new Rule(SPANLOOM + from, allowed, List.of(barred));
  }

  private static List<String> join(List<String> first, String... bundles) {
    List<String> all = new ArrayList<>(first);
    for (String bundle : bundles) {
      all.add(bundle.startsWith("=") ? bundle.substring(1) : SPANLOOM + bundle);
    }
    return List.copyOf(all);
  }

  private static List<String> join(List<String> first, List<String> second) {
    return Stream.concat(first.stream(), second.stream()).toList();
  }

  private static boolean permits(Rule rule, String target) {
    if (rule.barred.stream().anyMatch(barred -> within(target, barred))) {
      return false;
    }
    return target.startsWith("java.")
        || target.startsWith("javax.xml.")
        || rule.allowed.stream().anyMatch(allowed -> within(target, allowed));
  }

  private static boolean within(String name, String parent) {
    return name.equals(parent) || name.startsWith(parent + ".");
  }

  /** The arrows between packages, as the JDK's own tool reads them from the class files. */
  private static List<Arrow> arrows(Path classes) throws IOException {
    ToolProvider jdeps =
        ToolProvider.findFirst("jdeps")
            .orElseThrow(() -> new IllegalStateException("this Java has no jdeps; use a JDK"));
    StringWriter out = new StringWriter();
    StringWriter err = new StringWriter();
    int status =
        jdeps.run(
            new PrintWriter(out),
            new PrintWriter(err),
            "-verbose:package",
            "-filter:none",
            classes.toString());
    if (status != 0) {
      throw new IllegalStateException("jdeps failed on " + classes + ": " + err.toString().strip());
    }
    Pattern line = Pattern.compile("^ +(?<from>\\S+)? *-> (?<to>\\S+)");
    List<Arrow> arrows = new ArrayList<>();
    String from = "";
    for (String text : out.toString().lines().toList()) {
      Matcher matcher = line.matcher(text);
      if (!matcher.find()) {
        continue;
      }
      if (matcher.group("from") != null) {
        from = matcher.group("from");
      }
      if (from.startsWith(SPANLOOM)) {
        arrows.add(new Arrow(from, matcher.group("to")));
      }
    }
    return arrows;
  }

  private static List<String> packagesWithoutTour(Path bundle) throws IOException {
    try (Stream<Path> sources = Files.walk(bundle.resolve("src"))) {
      return sources
          .filter(file -> file.toString().endsWith(".java"))
          .map(Path::getParent)
          .distinct()
          .filter(folder -> !Files.exists(folder.resolve("package-info.java")))
          .sorted()
          .map(folder -> bundle.getParent().relativize(folder) + " has no package-info.java")
          .toList();
    }
  }
}
