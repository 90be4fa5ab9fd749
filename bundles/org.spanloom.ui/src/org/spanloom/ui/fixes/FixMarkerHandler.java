/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.fixes;

import org.eclipse.core.commands.AbstractHandler;
import org.eclipse.core.commands.ExecutionEvent;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.runtime.Adapters;
import org.eclipse.jface.viewers.IStructuredSelection;
import org.eclipse.swt.SWT;
import org.eclipse.swt.widgets.Menu;
import org.eclipse.swt.widgets.MenuItem;
import org.eclipse.swt.widgets.Shell;
import org.eclipse.ui.IMarkerResolution;
import org.eclipse.ui.handlers.HandlerUtil;
import org.eclipse.ui.ide.IDE;

/**
 * Offers the fixes of the selected finding as a menu, in views where the platform's own command
 * does not.
 */
public final class FixMarkerHandler extends AbstractHandler {

  @Override
  public Object execute(ExecutionEvent event) {
    Shell shell = HandlerUtil.getActiveShell(event);
    IMarker marker =
        HandlerUtil.getCurrentSelection(event) instanceof IStructuredSelection selection
            ? Adapters.adapt(selection.getFirstElement(), IMarker.class)
            : null;
    if (marker == null || shell == null) {
      return null;
    }
    Menu menu = new Menu(shell, SWT.POP_UP);
    for (IMarkerResolution fix : IDE.getMarkerHelpRegistry().getResolutions(marker)) {
      MenuItem item = new MenuItem(menu, SWT.PUSH);
      item.setText(fix.getLabel());
      item.addListener(SWT.Selection, e -> fix.run(marker));
    }
    if (menu.getItemCount() == 0) {
      MenuItem none = new MenuItem(menu, SWT.PUSH);
      none.setText("No fix is known for this finding");
      none.setEnabled(false);
    }
    menu.addListener(SWT.Hide, e -> shell.getDisplay().asyncExec(menu::dispose));
    menu.setVisible(true);
    return null;
  }
}
