/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.help;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import javax.xml.parsers.DocumentBuilder;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.SAXException;

/**
 * A page of the help, or another XML file of it.
 *
 * @param file the file
 * @param document its tree
 */
public record HelpPage(Path file, Document document) {

  /** The folder of the help bundle; tests run in their own module's folder. */
  static final Path BUNDLE = Path.of("..", "org.spanloom.help").toAbsolutePath().normalize();

  public static HelpPage of(String name) throws IOException {
    Path file = BUNDLE.resolve(name);
    try {
      DocumentBuilder builder = DocumentBuilderFactory.newInstance().newDocumentBuilder();
      builder.setErrorHandler(null);
      return new HelpPage(file, builder.parse(new ByteArrayInputStream(Files.readAllBytes(file))));
    } catch (SAXException | ParserConfigurationException e) {
      throw new IOException(file + " is not well-formed: " + e.getMessage(), e);
    }
  }

  /** Returns the names of all pages, such as {@code html/findings.html}. */
  public static List<String> names() throws IOException {
    try (Stream<Path> files = Files.list(BUNDLE.resolve("html"))) {
      return files
          .map(f -> "html/" + f.getFileName())
          .filter(f -> f.endsWith(".html"))
          .sorted()
          .toList();
    }
  }

  String name() {
    return BUNDLE.relativize(file).toString().replace('\\', '/');
  }

  public List<Element> elements(String tag) {
    NodeList nodes = document.getElementsByTagName(tag);
    List<Element> elements = new ArrayList<>();
    for (int i = 0; i < nodes.getLength(); i++) {
      elements.add((Element) nodes.item(i));
    }
    return elements;
  }

  Optional<Element> withId(String id) {
    return elements("*").stream().filter(e -> e.getAttribute("id").equals(id)).findFirst();
  }

  /** Returns the texts of all preformatted blocks of a class. */
  public List<String> blocks(String styleClass) {
    return elements("pre").stream()
        .filter(e -> e.getAttribute("class").equals(styleClass))
        .map(Element::getTextContent)
        .toList();
  }

  /** Returns the texts of the cells of a table row. */
  static List<String> cells(Element row) {
    NodeList nodes = row.getElementsByTagName("td");
    List<String> cells = new ArrayList<>();
    for (int i = 0; i < nodes.getLength(); i++) {
      cells.add(nodes.item(i).getTextContent());
    }
    return cells;
  }

  String source() throws IOException {
    return Files.readString(file, StandardCharsets.UTF_8);
  }
}
