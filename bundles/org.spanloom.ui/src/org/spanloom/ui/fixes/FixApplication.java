/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.fixes;

import java.util.List;
import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.IDocument;
import org.eclipse.text.edits.MalformedTreeException;
import org.eclipse.text.edits.MultiTextEdit;
import org.eclipse.text.edits.ReplaceEdit;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.workspace.FixText;

/** Applies edits to a document, all of them or none. */
public final class FixApplication {

  private FixApplication() {}

  /** Whether a fix could be applied. */
  public enum Result {
    /** The text is changed. */
    DONE,
    /** The text is no longer the one that the fix was made for. */
    STALE
  }

  /** Applies edits whose places are known to be right. */
  public static Result apply(IDocument document, List<TextEdit> edits) {
    MultiTextEdit all = new MultiTextEdit();
    try {
      for (TextEdit edit : edits) {
        all.addChild(
            new ReplaceEdit(edit.span().start(), edit.span().length(), edit.replacement()));
      }
      all.apply(document);
      return Result.DONE;
    } catch (BadLocationException | MalformedTreeException e) {
      return Result.STALE;
    }
  }

  /** Applies a fix kept with a marker, if what it replaces is still there. */
  static Result apply(IDocument document, FixText.Anchored anchored) {
    List<TextEdit> edits = anchored.fix().edits();
    for (int i = 0; i < edits.size(); i++) {
      if (!stands(document, edits.get(i), anchored.replaced().get(i))) {
        return Result.STALE;
      }
    }
    return apply(document, edits);
  }

  private static boolean stands(IDocument document, TextEdit edit, String replaced) {
    try {
      return document.get(edit.span().start(), edit.span().length()).equals(replaced);
    } catch (BadLocationException e) {
      return false;
    }
  }
}
