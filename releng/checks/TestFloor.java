/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
import java.io.IOException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.w3c.dom.Element;
import org.xml.sax.SAXException;

/**
 * Counts the tests that really ran and fails where they are fewer than the recorded floor: a test
 * engine that finds nothing passes, and nobody sees it.
 *
 * <pre>
 * java releng/checks/TestFloor.java ROOT [--without MODULE]... [--raise]
 * </pre>
 *
 * <p>Every module {@code bundles/*.tests} needs a line {@code MODULE COUNT} in {@code
 * releng/test-floor.txt}. {@code --raise} writes the counts of this run there where they are
 * higher. The last line of the output reads {@code N passed, N failed, N skipped}. The status is 0
 * when the floor holds and no test failed, 1 when not, 2 when the reports or the floor cannot be
 * read.
 */
final class TestFloor {

  private record Count(int passed, int failed, int skipped) {
    Count plus(Count other) {
      return new Count(passed + other.passed, failed + other.failed, skipped + other.skipped);
    }

    int executed() {
      return passed + failed;
    }
  }

  private TestFloor() {}

  public static void main(String[] arguments) {
    try {
      System.exit(run(List.of(arguments)));
    } catch (IOException
        | SAXException
        | ParserConfigurationException
        | IllegalArgumentException e) {
      System.err.println("test floor: " + e.getMessage());
      System.exit(2);
    }
  }

  private static int run(List<String> arguments)
      throws IOException, SAXException, ParserConfigurationException {
    if (arguments.isEmpty()) {
      throw new IllegalArgumentException("the root of the repository is missing");
    }
    Path root = Path.of(arguments.get(0));
    List<String> without = new ArrayList<>();
    boolean raise = false;
    for (int i = 1; i < arguments.size(); i++) {
      if (arguments.get(i).equals("--raise")) {
        raise = true;
      } else if (arguments.get(i).equals("--without") && i + 1 < arguments.size()) {
        without.add(arguments.get(++i));
      } else {
        throw new IllegalArgumentException("unknown argument " + arguments.get(i));
      }
    }
    Path floorFile = root.resolve("releng/test-floor.txt");
    Map<String, Integer> floor = readFloor(floorFile);
    List<String> problems = new ArrayList<>();
    Count total = new Count(0, 0, 0);
    for (String module : testModules(root)) {
      if (without.contains(module)) {
        System.out.printf("%-32s left out%n", module);
        continue;
      }
      Count count =
          count(root.resolve("bundles").resolve(module).resolve("target/surefire-reports"));
      total = total.plus(count);
      int least = floor.getOrDefault(module, 0);
      System.out.printf("%-32s %4d executed, floor %d%n", module, count.executed(), least);
      if (!floor.containsKey(module) && !raise) {
        problems.add(module + " has no line in releng/test-floor.txt");
      }
      if (count.executed() == 0) {
        problems.add(module + " executed no test at all");
      } else if (count.executed() < least) {
        problems.add(module + " executed " + count.executed() + " tests, the floor is " + least);
      }
      if (raise) {
        floor.merge(module, count.executed(), Math::max);
      }
    }
    for (String module : floor.keySet()) {
      if (!Files.isDirectory(root.resolve("bundles").resolve(module))) {
        problems.add("releng/test-floor.txt names " + module + ", which is not there");
      }
    }
    if (raise) {
      writeFloor(floorFile, floor);
    }
    problems.forEach(problem -> System.out.println("test floor: " + problem));
    System.out.printf(
        "%d passed, %d failed, %d skipped%n", total.passed, total.failed, total.skipped);
    return problems.isEmpty() && total.failed == 0 ? 0 : 1;
  }

  private static List<String> testModules(Path root) throws IOException {
    try (Stream<Path> bundles = Files.list(root.resolve("bundles"))) {
      return bundles
          .filter(bundle -> Files.exists(bundle.resolve("pom.xml")))
          .map(bundle -> bundle.getFileName().toString())
          .filter(name -> name.endsWith(".tests"))
          .sorted()
          .toList();
    }
  }

  private static Count count(Path reports)
      throws IOException, SAXException, ParserConfigurationException {
    Count sum = new Count(0, 0, 0);
    if (!Files.isDirectory(reports)) {
      return sum;
    }
    try (DirectoryStream<Path> files = Files.newDirectoryStream(reports, "TEST-*.xml")) {
      for (Path file : files) {
        Element suite =
            DocumentBuilderFactory.newInstance()
                .newDocumentBuilder()
                .parse(file.toFile())
                .getDocumentElement();
        int failed = number(suite, "failures") + number(suite, "errors");
        int skipped = number(suite, "skipped");
        sum = sum.plus(new Count(number(suite, "tests") - failed - skipped, failed, skipped));
      }
    }
    return sum;
  }

  private static int number(Element suite, String attribute) {
    String text = suite.getAttribute(attribute);
    return text.isEmpty() ? 0 : Integer.parseInt(text);
  }

  private static Map<String, Integer> readFloor(Path file) throws IOException {
    Map<String, Integer> floor = new TreeMap<>();
    for (String line : Files.readAllLines(file)) {
      String text = line.strip();
      if (text.isEmpty() || text.startsWith("#")) {
        continue;
      }
      String[] words = text.split("\\s+");
      if (words.length != 2 || !words[1].matches("[0-9]{1,6}")) {
        throw new IllegalArgumentException(file + ": expected MODULE COUNT, found '" + text + "'");
      }
      floor.put(words[0], Integer.parseInt(words[1]));
    }
    return floor;
  }

  private static void writeFloor(Path file, Map<String, Integer> floor) throws IOException {
    List<String> lines = new ArrayList<>();
    for (String line : Files.readAllLines(file)) {
      if (line.isBlank() || line.startsWith("#")) {
        lines.add(line);
      }
    }
    floor.forEach((module, count) -> lines.add(module + " " + count));
    Files.write(file, lines);
  }
}
