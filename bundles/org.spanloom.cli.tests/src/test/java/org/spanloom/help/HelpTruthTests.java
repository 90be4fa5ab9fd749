/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.help;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.spanloom.analysis.CheckReport;
import org.spanloom.analysis.FindingKind;
import org.spanloom.analysis.ModelCheck;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.analysis.settings.SettingsReader;
import org.spanloom.language.model.Function;
import org.spanloom.language.model.MatrixFunction;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.model.NamedConstant;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.syntax.Words;
import org.spanloom.language.text.SourceText;
import org.spanloom.numerics.Progress;
import org.w3c.dom.Element;

/** What the pages say is what the program does. */
class HelpTruthTests {

  private static final Pattern RULE = Pattern.compile("(?m)^([a-z][a-z ]*?) +=");

  static Stream<Arguments> models() throws IOException {
    List<Arguments> models = new ArrayList<>();
    for (String name : HelpPage.names()) {
      List<String> blocks = HelpPage.of(name).blocks("model");
      for (int i = 0; i < blocks.size(); i++) {
        models.add(Arguments.of(name + " " + (i + 1), blocks.get(i)));
      }
    }
    return models.stream();
  }

  /** The first model of a page is promised to be clean in every respect, and so are all others. */
  @ParameterizedTest(name = "{0}")
  @MethodSource("models")
  void anExampleIsReadAndCheckedWithoutErrorsAndWarnings(String name, String text) {
    Model model = ModelReader.read(new SourceText(name, text));
    assertFalse(model.systems().isEmpty(), name);
    CheckReport report = ModelCheck.check(model, Settings.DEFAULTS, Progress.NONE);
    assertEquals(
        List.of(),
        report.findings().stream().filter(f -> f.severity() != Severity.NOTE).toList(),
        name);
  }

  @Test
  void theFindingsPageListsEveryKindWithItsSeverityAndNoOther() throws IOException {
    Map<String, String> expected = new TreeMap<>();
    for (ProblemKind kind : ProblemKind.values()) {
      expected.put(kind.id(), word(kind.severity()));
    }
    for (FindingKind kind : FindingKind.values()) {
      expected.put(kind.id(), word(kind.severity()));
    }
    Map<String, String> listed = new TreeMap<>();
    for (Element row : HelpPage.of("html/findings.html").elements("tr")) {
      if (!row.getAttribute("id").isEmpty()) {
        List<String> cells = HelpPage.cells(row);
        assertEquals(row.getAttribute("id"), cells.get(0));
        assertTrue(cells.get(2).length() > 10 && cells.get(3).length() > 6, cells.get(0));
        listed.put(cells.get(0), cells.get(1));
      }
    }
    assertEquals(expected, listed);
  }

  private static String word(Severity severity) {
    return severity.name().toLowerCase(Locale.ROOT);
  }

  /** Each key on the page is read, the ends of its range included, and nothing beyond them. */
  @Test
  void theThresholdsPageListsTheKeysWithTheirRanges() throws IOException {
    Set<String> keys = new TreeSet<>();
    for (Element row : HelpPage.of("html/thresholds.html").elements("tr")) {
      String key = row.getAttribute("id");
      if (key.isEmpty()) {
        continue;
      }
      keys.add(key);
      List<String> cells = HelpPage.cells(row);
      double least = Double.parseDouble(cells.get(2));
      double most = Double.parseDouble(cells.get(3));
      assertEquals(List.of(), problems(key + " = " + least), key);
      assertEquals(List.of(), problems(key + " = " + most), key);
      assertEquals(1, problems(key + " = " + (least - Math.max(1e-15, least / 1e3))).size(), key);
      assertEquals(1, problems(key + " = " + most * 1.001).size(), key);
    }
    String known = problems("unknown = 1").getFirst();
    Matcher named = Pattern.compile("([a-z.]+) = NUMBER").matcher(known);
    Set<String> expected = new TreeSet<>();
    while (named.find()) {
      expected.add(named.group(1));
    }
    assertEquals(expected, keys);
  }

  private static List<String> problems(String line) {
    return SettingsReader.parse(Settings.FILE_NAME, line).problems();
  }

  /** Setting a key to the default that the page gives changes nothing. */
  @Test
  void theThresholdsPageGivesTheDefaults() throws IOException {
    for (Element row : HelpPage.of("html/thresholds.html").elements("tr")) {
      String key = row.getAttribute("id");
      if (!key.isEmpty() && !key.equals("digits.wanted")) {
        String line = key + " = " + HelpPage.cells(row).get(1);
        assertEquals(
            Settings.DEFAULTS, SettingsReader.parse(Settings.FILE_NAME, line).settings(), line);
      }
    }
    assertEquals(6, Settings.DEFAULTS.digitsWanted(1e-6), 1e-12);
  }

  @Test
  void theExampleOfASettingsFileIsRead() throws IOException {
    String example = HelpPage.of("html/thresholds.html").blocks("shown").getFirst();
    SettingsReader.Result result = SettingsReader.parse(Settings.FILE_NAME, example);
    assertEquals(List.of(), result.problems());
    assertFalse(result.settings().equals(Settings.DEFAULTS));
  }

  @Test
  void theGrammarPageShowsTheGrammarFile() throws IOException {
    String file = Files.readString(HelpPage.BUNDLE.resolve("grammar.ebnf"));
    assertEquals(
        file.strip(), HelpPage.of("html/grammar.html").blocks("grammar").getFirst().strip());
  }

  @Test
  void everyWordOfTheGrammarIsOneOfTheLanguage() throws IOException {
    Set<String> words = new TreeSet<>();
    Matcher quoted = Pattern.compile("\"([a-z]{2,})\"").matcher(grammar());
    while (quoted.find()) {
      words.add(quoted.group(1));
    }
    Set<String> expected = new TreeSet<>(Words.STATEMENT);
    expected.addAll(Words.CLAUSE);
    expected.addAll(Words.REQUIREMENT);
    expected.addAll(List.of("values", "scale", "outside", "every", "file", "sum", "of"));
    expected.addAll(List.of("time", "column", "hold", "linear", "monotone", "cubic", "extended"));
    assertEquals(expected, words);
  }

  @Test
  void everyNameUsedInTheGrammarHasARule() throws IOException {
    String rules = grammar();
    Set<String> defined = new TreeSet<>();
    Matcher rule = RULE.matcher(rules);
    while (rule.find()) {
      assertTrue(defined.add(rule.group(1)), rule.group(1) + " has two rules");
    }
    String names =
        rules.replaceAll("\"[^\"]*\"", " ").replaceAll("(?s)\\?.*?\\?", " ").replaceAll("'", " ");
    Set<String> used = new TreeSet<>();
    Matcher name = Pattern.compile("[a-z][a-z ]*").matcher(names);
    while (name.find()) {
      used.add(name.group().strip());
    }
    used.remove("file");
    defined.remove("file");
    // Comments stand between any two signs, so no rule uses theirs.
    defined.remove("comment");
    used.remove("comment");
    assertEquals(defined, used);
  }

  private static String grammar() throws IOException {
    String file = Files.readString(HelpPage.BUNDLE.resolve("grammar.ebnf"));
    return file.replaceAll("(?s)\\(\\*.*?\\*\\)", "");
  }

  @Test
  void theLanguagePageListsTheReservedWordsAndEveryStatement() throws IOException {
    HelpPage page = HelpPage.of("html/language.html");
    Set<String> codes =
        page.elements("code").stream().map(Element::getTextContent).collect(Collectors.toSet());
    Stream.concat(Words.STATEMENT.stream(), Words.CLAUSE.stream())
        .forEach(word -> assertTrue(codes.contains(word), word));
    for (String word : Words.STATEMENT) {
      if (!word.equals("row")) {
        assertTrue(page.withId(word).isPresent(), word + " has no section");
      }
    }
  }

  @Test
  void theNumbersPageListsEveryFunctionAndConstant() throws IOException {
    Set<String> codes =
        HelpPage.of("html/numbers.html").elements("td").stream()
            .map(Element::getTextContent)
            .collect(Collectors.toSet());
    for (Function function : Function.values()) {
      assertTrue(codes.contains(function.code()), function.code());
      assertTrue(codes.contains(function.meaning()), function.meaning());
    }
    for (MatrixFunction function : MatrixFunction.values()) {
      assertTrue(codes.contains(function.code()), function.code());
      assertTrue(codes.contains(function.meaning()), function.meaning());
    }
    for (NamedConstant constant : NamedConstant.values()) {
      assertTrue(codes.contains(constant.code()), constant.code());
    }
  }
}
