/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import org.eclipse.swt.widgets.Composite;
import org.eclipse.ui.PlatformUI;
import org.eclipse.ui.views.markers.MarkerSupportView;
import org.spanloom.ui.UiIds;

/** Lists the bases; plugin.xml names the columns. A double click goes to the source line. */
public final class BasisFindingsView extends MarkerSupportView {

  private static final String GENERATOR = "org.spanloom.ui.basisGenerator";

  /** Called by the workbench. */
  public BasisFindingsView() {
    super(GENERATOR);
  }

  @Override
  public void createPartControl(Composite parent) {
    super.createPartControl(parent);
    PlatformUI.getWorkbench().getHelpSystem().setHelp(parent, UiIds.BASIS_FINDINGS_HELP);
  }
}
