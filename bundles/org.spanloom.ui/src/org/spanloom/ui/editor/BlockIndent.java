/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.DocumentCommand;
import org.eclipse.jface.text.IAutoEditStrategy;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.TextUtilities;

/**
 * Indents the line begun behind an opening brace by one step more than its predecessor. Runs after
 * the strategy that copies the indent, so the command already holds a line end and the old indent.
 */
final class BlockIndent implements IAutoEditStrategy {

  private static final String STEP = "  ";

  @Override
  public void customizeDocumentCommand(IDocument document, DocumentCommand command) {
    String[] lineEnds = document.getLegalLineDelimiters();
    boolean newLine =
        command.length == 0
            && command.text != null
            && TextUtilities.startsWith(lineEnds, command.text) >= 0
            && command.text.isBlank();
    if (newLine && opensBlock(document, command.offset)) {
      command.text += STEP;
    }
  }

  private static boolean opensBlock(IDocument document, int offset) {
    try {
      IRegion line = document.getLineInformationOfOffset(offset);
      return document
          .get(line.getOffset(), offset - line.getOffset())
          .stripTrailing()
          .endsWith("{");
    } catch (BadLocationException e) {
      return false;
    }
  }
}
