/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.wizards;

import java.io.ByteArrayInputStream;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import org.eclipse.jface.viewers.IStructuredSelection;
import org.eclipse.ui.dialogs.WizardNewFileCreationPage;

/** Asks for folder and name of a model file. */
final class NewModelPage extends WizardNewFileCreationPage {

  /** What stands before the name of the system in the template. */
  static final String BEFORE_NAME = "system ";

  private static final String EXTENSION = "span";
  private static final String PLACEHOLDER = "NAME";
  private static final String FALLBACK = "Model";

  NewModelPage(IStructuredSelection selection) {
    super("model", selection);
    setTitle("Spanloom Model");
    setDescription("A model file with one system to begin with.");
    setFileExtension(EXTENSION);
    setFileName("model." + EXTENSION);
  }

  /** Returns a name for the system, made from the name of the file. */
  String systemName() {
    String file = getFileName();
    int dot = file.lastIndexOf('.');
    StringBuilder name = new StringBuilder();
    boolean capital = true;
    for (char c : (dot > 0 ? file.substring(0, dot) : file).toCharArray()) {
      boolean letter = c >= 'a' && c <= 'z' || c >= 'A' && c <= 'Z';
      boolean digit = c >= '0' && c <= '9';
      if (letter || digit && !name.isEmpty()) {
        name.append(capital ? Character.toUpperCase(c) : c);
        capital = false;
      } else {
        capital = true;
      }
    }
    return name.isEmpty() ? FALLBACK : name.toString();
  }

  @Override
  protected InputStream getInitialContents() {
    String text = Templates.MODEL.text().replace(PLACEHOLDER, systemName());
    return new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8));
  }
}
