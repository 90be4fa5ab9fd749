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
import java.net.URI;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.w3c.dom.Element;

/** Every page is well-formed and in the table of contents, and every link leads somewhere. */
class HelpPagesTests {

  static List<String> pages() throws IOException {
    return HelpPage.names();
  }

  @ParameterizedTest
  @MethodSource("pages")
  void aPageIsWellFormedAndHasOneHeadingThatIsItsTitle(String name) throws IOException {
    HelpPage page = HelpPage.of(name);
    List<Element> headings = page.elements("h1");
    assertEquals(1, headings.size());
    assertEquals(
        page.elements("title").getFirst().getTextContent(), headings.getFirst().getTextContent());
  }

  @ParameterizedTest
  @MethodSource("pages")
  void aPageHasNoScriptAndNoPlaceholder(String name) throws IOException {
    HelpPage page = HelpPage.of(name);
    assertTrue(page.elements("script").isEmpty());
    assertFalse(page.source().contains("<!--"), "a comment in a page is a text that is missing");
  }

  @ParameterizedTest
  @MethodSource("pages")
  void linksOfAPageLeadSomewhere(String name) throws IOException {
    HelpPage page = HelpPage.of(name);
    List<String> dead = new ArrayList<>();
    for (Element link : page.elements("a")) {
      if (!leadsSomewhere(page.file(), link.getAttribute("href"))) {
        dead.add(link.getAttribute("href"));
      }
    }
    for (Element link : page.elements("link")) {
      if (!leadsSomewhere(page.file(), link.getAttribute("href"))) {
        dead.add(link.getAttribute("href"));
      }
    }
    assertEquals(List.of(), dead);
  }

  @ParameterizedTest
  @MethodSource("pages")
  void noIdStandsTwiceOnAPage(String name) throws IOException {
    Set<String> seen = new HashSet<>();
    for (Element element : HelpPage.of(name).elements("*")) {
      String id = element.getAttribute("id");
      assertTrue(id.isEmpty() || seen.add(id), id);
    }
  }

  @Test
  void theTableOfContentsListsEveryPageOnce() throws IOException {
    HelpPage contents = HelpPage.of("toc.xml");
    List<String> listed =
        new ArrayList<>(
            Stream.concat(
                    contents.elements("toc").stream().map(e -> e.getAttribute("topic")),
                    contents.elements("topic").stream().map(e -> e.getAttribute("href")))
                .filter(href -> !href.isEmpty())
                .sorted()
                .toList());
    assertEquals(HelpPage.names(), listed);
  }

  @Test
  void topicsAreCalledAsTheirPages() throws IOException {
    for (Element topic : HelpPage.of("toc.xml").elements("topic")) {
      String href = topic.getAttribute("href");
      if (!href.isEmpty()) {
        String title = HelpPage.of(href).elements("title").getFirst().getTextContent();
        assertEquals(title, topic.getAttribute("label"), href);
      }
    }
  }

  @Test
  void theIndexIsSortedAndLeadsSomewhere() throws IOException {
    HelpPage index = HelpPage.of("index.xml");
    Set<String> dead = new TreeSet<>();
    for (Element topic : index.elements("topic")) {
      if (!leadsSomewhere(index.file(), topic.getAttribute("href"))) {
        dead.add(topic.getAttribute("href"));
      }
    }
    assertEquals(Set.of(), dead);
    List<String> keywords =
        index.elements("entry").stream().map(e -> e.getAttribute("keyword")).toList();
    assertEquals(keywords.stream().sorted(String.CASE_INSENSITIVE_ORDER).toList(), keywords);
  }

  @Test
  void topicsOfContextsLeadSomewhere() throws IOException {
    HelpPage contexts = HelpPage.of("contexts.xml");
    List<String> dead = new ArrayList<>();
    for (Element topic : contexts.elements("topic")) {
      if (!leadsSomewhere(contexts.file(), topic.getAttribute("href"))) {
        dead.add(topic.getAttribute("href"));
      }
    }
    assertEquals(List.of(), dead);
  }

  /** The workbench names contexts by their ids, and each context is there for a part of it. */
  @Test
  void contextsAreThoseThatTheWorkbenchNames() throws IOException {
    Path ids = HelpPage.BUNDLE.resolveSibling("org.spanloom.ui/src/org/spanloom/ui/UiIds.java");
    Matcher named =
        Pattern.compile("\"org\\.spanloom\\.help\\.(\\w+)\"").matcher(Files.readString(ids));
    Set<String> expected = new TreeSet<>();
    while (named.find()) {
      expected.add(named.group(1));
    }
    Set<String> known = new TreeSet<>();
    HelpPage.of("contexts.xml").elements("context").forEach(e -> known.add(e.getAttribute("id")));
    assertEquals(expected, known);
  }

  @Test
  void thePluginNamesFilesThatAreThereAndPackaged() throws IOException {
    HelpPage plugin = HelpPage.of("plugin.xml");
    String packaged = Files.readString(HelpPage.BUNDLE.resolve("build.properties"));
    List<String> files =
        Stream.of("toc", "index", "contexts")
            .flatMap(tag -> plugin.elements(tag).stream())
            .map(e -> e.getAttribute("file"))
            .toList();
    assertFalse(files.isEmpty());
    for (String file : files) {
      assertTrue(Files.exists(HelpPage.BUNDLE.resolve(file)), file);
      assertTrue(packaged.contains(file), file + " is not in build.properties");
    }
  }

  private static boolean leadsSomewhere(Path from, String href) throws IOException {
    URI target = from.toUri().resolve(href);
    if (!target.getScheme().equals("file")) {
      return false;
    }
    String fragment = target.getFragment();
    Path file = Path.of(target.getPath());
    if (!Files.isRegularFile(file)) {
      return false;
    }
    return fragment == null
        || HelpPage.of(HelpPage.BUNDLE.relativize(file).toString()).withId(fragment).isPresent();
  }
}
