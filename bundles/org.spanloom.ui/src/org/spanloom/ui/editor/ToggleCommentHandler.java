/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.ArrayList;
import java.util.List;
import org.eclipse.core.commands.AbstractHandler;
import org.eclipse.core.commands.ExecutionEvent;
import org.eclipse.core.commands.ExecutionException;
import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.ITextSelection;
import org.eclipse.ui.handlers.HandlerUtil;

/** Toggles the comments of the selected lines, as one step to undo. */
public final class ToggleCommentHandler extends AbstractHandler {

  @Override
  public Object execute(ExecutionEvent event) throws ExecutionException {
    if (HandlerUtil.getActiveEditor(event) instanceof ModelEditor editor
        && editor.getSelectionProvider().getSelection() instanceof ITextSelection selection
        && editor.validateEditorInputState()) {
      try {
        toggle(editor, selection);
      } catch (BadLocationException e) {
        throw new ExecutionException("The selection lies outside the text.", e);
      }
    }
    return null;
  }

  private static void toggle(ModelEditor editor, ITextSelection selection)
      throws BadLocationException {
    IDocument document = editor.document();
    int first = selection.getStartLine();
    int last = lastLine(document, selection);
    List<String> lines = new ArrayList<>();
    for (int line = first; line <= last; line++) {
      IRegion region = document.getLineInformation(line);
      lines.add(document.get(region.getOffset(), region.getLength()));
    }
    StringBuilder text = new StringBuilder();
    List<String> toggled = LineComments.toggle(lines);
    for (int i = 0; i < toggled.size(); i++) {
      text.append(toggled.get(i));
      String end = i + 1 < toggled.size() ? document.getLineDelimiter(first + i) : null;
      text.append(end == null ? "" : end);
    }
    int start = document.getLineOffset(first);
    IRegion lastRegion = document.getLineInformation(last);
    document.replace(
        start, lastRegion.getOffset() + lastRegion.getLength() - start, text.toString());
    if (selection.getLength() > 0) {
      editor.selectAndReveal(start, text.length());
    }
  }

  /** A selection that ends at the start of a line does not mean that line. */
  private static int lastLine(IDocument document, ITextSelection selection)
      throws BadLocationException {
    int end = selection.getOffset() + selection.getLength();
    int line = document.getLineOfOffset(end);
    boolean onlyTouched = selection.getLength() > 0 && document.getLineOffset(line) == end;
    return onlyTouched && line > selection.getStartLine() ? line - 1 : line;
  }
}
