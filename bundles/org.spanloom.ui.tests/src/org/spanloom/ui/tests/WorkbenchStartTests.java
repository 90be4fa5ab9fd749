/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;

import java.util.ArrayList;
import java.util.List;
import org.eclipse.core.runtime.ILogListener;
import org.eclipse.core.runtime.IStatus;
import org.eclipse.core.runtime.Platform;
import org.eclipse.ui.IViewPart;
import org.eclipse.ui.IWorkbenchPage;
import org.eclipse.ui.PlatformUI;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The platform's own views, which every project relies on, open without an error in the log. */
class WorkbenchStartTests {

  @ParameterizedTest
  @ValueSource(
      strings = {
        "org.eclipse.ui.navigator.ProjectExplorer",
        "org.eclipse.ui.views.ProblemView",
        "org.eclipse.ui.views.ContentOutline",
        "org.eclipse.ui.views.ProgressView",
        "org.eclipse.pde.runtime.LogView"
      })
  void opensThePlatformView(String id) throws Exception {
    List<IStatus> errors = new ArrayList<>();
    ILogListener listener =
        (status, plugin) -> {
          if (status.getSeverity() == IStatus.ERROR) {
            errors.add(status);
          }
        };
    Platform.addLogListener(listener);
    try {
      IWorkbenchPage page = PlatformUI.getWorkbench().getActiveWorkbenchWindow().getActivePage();
      IViewPart view = page.showView(id);
      assertNotNull(view);
      page.hideView(view);
    } finally {
      Platform.removeLogListener(listener);
    }
    assertEquals(List.of(), errors);
  }
}
