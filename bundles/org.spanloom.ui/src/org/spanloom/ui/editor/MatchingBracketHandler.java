/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.eclipse.core.commands.AbstractHandler;
import org.eclipse.core.commands.ExecutionEvent;
import org.eclipse.ui.handlers.HandlerUtil;

/** Moves the caret to the matching bracket. */
public final class MatchingBracketHandler extends AbstractHandler {

  @Override
  public Object execute(ExecutionEvent event) {
    if (HandlerUtil.getActiveEditor(event) instanceof ModelEditor editor) {
      editor.goToMatchingBracket();
    }
    return null;
  }
}
