/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.Set;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.swt.SWT;
import org.eclipse.swt.graphics.GC;
import org.eclipse.swt.graphics.Image;
import org.eclipse.swt.graphics.ImageData;
import org.eclipse.swt.graphics.ImageLoader;
import org.eclipse.swt.widgets.Control;
import org.eclipse.swt.widgets.Shell;
import org.eclipse.ui.IPageLayout;
import org.eclipse.ui.navigator.CommonNavigator;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.RegisterExtension;
import org.spanloom.ui.UiIds;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.ui.wizards.Templates;
import org.spanloom.workspace.Ids;

/** Takes the pictures of the README: editor, solution and bases in both themes. */
class PicturesTests {

  private static final Path FOLDER =
      Path.of(System.getProperty("spanloom.pictures", "target/screenshots"));
  private static final int LEAST_COLOURS = 60;

  @RegisterExtension final Workbench workbench = new Workbench();

  @AfterEach
  void backToLight() {
    ThemeTests.setTheme(ThemeTests.LIGHT);
  }

  @Test
  void workbenchInBothThemes() throws Exception {
    IProject project = Workbench.project("marrow-skerry");
    IFile model = Workbench.file(project, "drying-room.span", Templates.DRYING_ROOM.text());
    Workbench.file(
        project,
        "gauge.span",
        """
        ## Float of the tide gauge. Invented data.
        system Gauge over t [s] from 0 to 20 {
          parameter m [kg] = 4
          parameter c [N.s/m] = 1.2
          parameter k [N/m] = 9
          state x [m] = 0.3
          state x' [m/s] = 0
          m*x'' + c*x' + k*x = 0
          basis Phi at 0
        }
        """);
    Workbench.build(project);
    Workbench.page().showView(IPageLayout.ID_OUTLINE);
    Workbench.page().showView(UiIds.SOLUTION_VIEW);
    Workbench.page().showView(UiIds.BASIS_FINDINGS_VIEW);
    ModelEditor editor = Workbench.open(model);
    expandProjects();
    Workbench.waitUntil("markers", () -> project.exists() && markers(project) >= 2);
    SolutionViewTests.waitForCurve("T_air");
    Control area = SolutionViewTests.chart().getPlotArea().getControl();
    Workbench.send(
        area,
        SWT.MouseMove,
        e -> {
          e.x = area.getSize().x / 2;
          e.y = area.getSize().y / 2;
        });
    editor.setFocus();
    picture("workbench-light.png");
    ThemeTests.setTheme(ThemeTests.DARK);
    Workbench.drain();
    picture("workbench-dark.png");
  }

  private static int markers(IProject project) {
    try {
      return Workbench.markers(project, Ids.BASIS).size();
    } catch (CoreException e) {
      throw new AssertionError(e);
    }
  }

  private static void expandProjects() {
    if (Workbench.page().findView("org.eclipse.ui.navigator.ProjectExplorer")
        instanceof CommonNavigator explorer) {
      explorer.getCommonViewer().expandAll();
    }
  }

  private static void picture(String name) throws Exception {
    Shell shell = Workbench.shell();
    Workbench.waitUntil("a picture with colours", () -> colours(capture(shell)) >= LEAST_COLOURS);
    ImageData data = capture(shell);
    Files.createDirectories(FOLDER);
    ImageLoader loader = new ImageLoader();
    loader.data = new ImageData[] {data};
    loader.save(FOLDER.resolve(name).toString(), SWT.IMAGE_PNG);
    assertTrue(Files.size(FOLDER.resolve(name)) > 10_000);
  }

  private static ImageData capture(Shell shell) {
    shell.redraw();
    shell.update();
    Workbench.drain();
    Image image =
        new Image(
            shell.getDisplay(),
            (gc, w, h) -> {},
            shell.getClientArea().width,
            shell.getClientArea().height);
    GC gc = new GC(shell);
    try {
      gc.copyArea(image, 0, 0);
      return image.getImageData();
    } finally {
      gc.dispose();
      image.dispose();
    }
  }

  private static int colours(ImageData data) {
    Set<Integer> colours = new HashSet<>();
    for (int y = 0; y < data.height; y += 3) {
      for (int x = 0; x < data.width; x += 3) {
        colours.add(data.getPixel(x, y));
      }
    }
    return colours.size();
  }
}
