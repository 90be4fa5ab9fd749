/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonElement;
import com.google.gson.JsonParser;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.spanloom.help.HelpPage;
import org.w3c.dom.Element;

/** What the help shows as printed by the command line is what the command line prints. */
class HelpPageRunsTests {

  private static final Pattern NUMBER = Pattern.compile("-?[0-9]+(\\.[0-9]+)?([eE][-+]?[0-9]+)?");

  private static final Pattern ERROR = Pattern.compile("estimated error of [-0-9.e]+");

  /** A page stays true where a method takes other steps and so looks at other times. */
  private static final double SAME = 0.02;

  /** Estimated errors are small, and move with every change of a method. */
  private static final double ROUNDING = 1e-6;

  @Test
  void everyRunOfThePagesPrintsWhatThePagesShow(@TempDir Path folder) throws IOException {
    Map<String, String> models = titledModels();
    int runs = 0;
    for (String name : HelpPage.names()) {
      Map<String, String> texts = new HashMap<>(models);
      Optional<String> command = Optional.empty();
      for (Element block : HelpPage.of(name).elements("pre")) {
        String content = block.getTextContent();
        switch (block.getAttribute("class")) {
          case "faulty" ->
              texts.compute(
                  block.getAttribute("title"),
                  (title, text) -> changed(text, content.strip().indent(2)));
          case "shown" -> command = Optional.of(content.strip());
          case "printed" -> {
            runs++;
            assertPrints(folder, texts, command.orElseThrow(), content);
          }
          default -> command = Optional.empty();
        }
      }
    }
    assertTrue(runs >= 5, runs + " runs");
  }

  /**
   * The README quotes runs in code blocks whose first line is the command; "..." stands for lines
   * left out.
   */
  @Test
  void everyRunOfTheReadmePrintsWhatTheReadmeShows() throws IOException {
    Path root = Path.of("..", "..");
    Matcher blocks =
        Pattern.compile("(?ms)^```\\n\\$ \\./releng/spanloom (.*?)\\n(.*?)^```$")
            .matcher(Files.readString(root.resolve("README.md")));
    int runs = 0;
    while (blocks.find()) {
      runs++;
      String examples = root.resolve("examples") + "/";
      String command = blocks.group(1).replace("examples/", examples);
      assertPrinted(command, printed(command, examples, "examples/"), blocks.group(2));
    }
    assertEquals(3, runs);
  }

  private static List<String> printed(String command, String path, String shownPath) {
    CommandRun run = CommandRun.of(command.split(" +"));
    return (run.out() + "\n" + run.err()).replace(path, shownPath).lines().toList();
  }

  private static Map<String, String> titledModels() throws IOException {
    Map<String, String> models = new HashMap<>();
    for (String name : HelpPage.names()) {
      for (Element block : HelpPage.of(name).elements("pre")) {
        if (block.getAttribute("class").equals("model") && !block.getAttribute("title").isEmpty()) {
          models.put(block.getAttribute("title"), block.getTextContent().stripLeading());
        }
      }
    }
    return models;
  }

  /** Replaces the line of a model that has the same left side as a line. */
  private static String changed(String text, String line) {
    String leftSide = leftSide(line);
    List<String> lines =
        text.lines().map(l -> leftSide(l).equals(leftSide) ? line.stripTrailing() : l).toList();
    assertFalse(lines.equals(text.lines().toList()), line);
    return String.join("\n", lines) + "\n";
  }

  private static String leftSide(String line) {
    int sign = line.indexOf('=');
    return (sign < 0 ? line : line.substring(0, sign)).strip();
  }

  private static void assertPrints(
      Path folder, Map<String, String> models, String command, String shown) throws IOException {
    List<String> words = new ArrayList<>(List.of(command.split(" +")));
    assertEquals("spanloom", words.removeFirst());
    String file = words.get(1);
    Path model = Files.writeString(folder.resolve(file), models.get(file));
    words.set(1, model.toString());
    String arguments = String.join(" ", words);
    assertPrinted(command, printed(arguments, model.toString(), file), shown);
  }

  private static void assertPrinted(String command, List<String> printed, String shown) {
    int from = 0;
    for (String line : shown.strip().lines().filter(l -> !l.equals("...")).toList()) {
      int at = from;
      while (at < printed.size() && !isSame(line, printed.get(at))) {
        at++;
      }
      assertTrue(at < printed.size(), command + " does not print\n" + line + "\nbut\n" + printed);
      from = at + 1;
    }
  }

  private static boolean isSame(String shownLine, String printedLine) {
    String shown = ERROR.matcher(shownLine).replaceAll("error");
    String printed = ERROR.matcher(printedLine).replaceAll("error");
    if (!withoutNumbers(shown).equals(withoutNumbers(printed))) {
      return false;
    }
    Matcher a = NUMBER.matcher(shown);
    Matcher b = NUMBER.matcher(printed);
    while (a.find() && b.find()) {
      double x = Double.parseDouble(a.group());
      double y = Double.parseDouble(b.group());
      double size = Math.max(Math.abs(x), Math.abs(y));
      if (size > ROUNDING && Math.abs(x - y) > SAME * size) {
        return false;
      }
    }
    return true;
  }

  private static String withoutNumbers(String line) {
    return NUMBER.matcher(line).replaceAll("0").replaceAll(" +", " ");
  }

  @ParameterizedTest
  @EnumSource(Command.class)
  void thePageOfTheCommandLineListsEveryOptionOfACommand(Command command) throws IOException {
    Set<String> listed = new TreeSet<>();
    HelpPage page = HelpPage.of("html/command-line.html");
    boolean within = false;
    for (Element element : page.elements("*")) {
      if (element.getTagName().equals("h2")) {
        within = element.getAttribute("id").equals(command.word());
      } else if (within && element.getTagName().equals("td")) {
        listed.addAll(options(element.getTextContent()));
      }
    }
    String help = CommandRun.of(command.word(), "--help").out();
    Set<String> known =
        help.lines()
            .filter(l -> l.matches("^ {2,6}(-\\w, )?--[a-z]+( .*|$)"))
            .flatMap(l -> options(l.strip().replaceFirst(" {2,}.*", "")).stream())
            .collect(Collectors.toCollection(TreeSet::new));
    known.remove("--help");
    assertFalse(known.isEmpty(), help);
    assertEquals(known, listed);
  }

  /** A reader of the JSON may rely on every name that the page lists, and meets no other. */
  @Test
  void thePageOfTheCommandLineListsTheNamesInTheJson() throws IOException {
    Set<String> written = new TreeSet<>();
    for (String project : List.of("marrow-skerry", "marrow-skerry-faults")) {
      Path folder = Path.of("..", "..", "examples", project);
      String json = CommandRun.of("check", "--format", "json", folder.toString()).out();
      names(JsonParser.parseString(json), written);
    }
    String block =
        HelpPage.of("html/command-line.html").blocks("shown").stream()
            .filter(b -> b.contains("\"format\""))
            .findFirst()
            .orElseThrow();
    Set<String> listed = new TreeSet<>();
    Matcher name = Pattern.compile("\"(\\w+)\"").matcher(block);
    while (name.find()) {
      listed.add(name.group(1));
    }
    assertEquals(listed, written);
  }

  private static void names(JsonElement element, Set<String> names) {
    if (element.isJsonArray()) {
      element.getAsJsonArray().forEach(e -> names(e, names));
    } else if (element.isJsonObject()) {
      for (Map.Entry<String, JsonElement> entry : element.getAsJsonObject().entrySet()) {
        names.add(entry.getKey());
        // The names of the numbers behind a finding are its own.
        if (!entry.getKey().equals("numbers")) {
          names(entry.getValue(), names);
        }
      }
    }
  }

  private static Set<String> options(String text) {
    Matcher option = Pattern.compile("--[a-z]+").matcher(text);
    Set<String> options = new TreeSet<>();
    while (option.find()) {
      options.add(option.group());
    }
    return options;
  }
}
