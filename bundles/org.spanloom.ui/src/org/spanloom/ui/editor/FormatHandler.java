/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.eclipse.core.commands.AbstractHandler;
import org.eclipse.core.commands.ExecutionEvent;
import org.eclipse.ui.handlers.HandlerUtil;

/** Lays out the text of the editor in the canonical way. */
public final class FormatHandler extends AbstractHandler {

  @Override
  public Object execute(ExecutionEvent event) {
    if (HandlerUtil.getActiveEditor(event) instanceof ModelEditor editor
        && editor.validateEditorInputState()) {
      new FormatJob(editor).schedule();
    }
    return null;
  }
}
