/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.eclipse.jface.text.BadLocationException;
import org.eclipse.swt.widgets.Display;
import org.eclipse.ui.IPageLayout;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.RegisterExtension;
import org.spanloom.ui.editor.ModelEditor;

/** A model of 20,000 lines can be edited. */
class LargeModelTests {

  private static final int LINES = 20_000;

  /** Far above what is aimed at, so that a busy machine does not fail the test. */
  private static final double LONGEST_TURN_SECONDS = 1.5;

  @RegisterExtension final Workbench workbench = new Workbench();

  private static String text() {
    StringBuilder text = new StringBuilder("system Large over t [s] from 0 to 1 {\n");
    for (int i = 0; i < LINES / 2; i++) {
      text.append("  parameter k").append(i).append(" [1/s] = ").append(i % 7 + 1).append("\n");
    }
    text.append("  state x = 1\n  x' = -k0*x");
    for (int i = 1; i < LINES / 2; i++) {
      text.append("\n     + 1e-9*k").append(i).append("*x");
    }
    return text.append("\n}\n").toString().replace("\n     +", " +\n    ");
  }

  @Test
  void typingStaysQuick() throws Exception {
    Workbench.page().showView(IPageLayout.ID_OUTLINE);
    ModelEditor editor =
        Workbench.open(Workbench.file(Workbench.project("station"), "large.span", text()));
    assertTrue(editor.document().getNumberOfLines() > LINES - 10);
    double longest = 0;
    for (int i = 0; i < 5; i++) {
      int offset = editor.document().getLineOffset(100 + 1000 * i);
      longest = Math.max(longest, seconds(() -> replace(editor, offset)));
      longest = Math.max(longest, longestTurnUntilRead(editor));
    }
    System.out.printf("20,000 lines: longest turn of the event loop %.0f ms%n", 1e3 * longest);
    assertTrue(longest < LONGEST_TURN_SECONDS, "the event loop was held up for " + longest + " s");
    assertEquals(1, editor.snapshots().latest().orElseThrow().model().systems().size());
  }

  private static void replace(ModelEditor editor, int offset) {
    try {
      editor.document().replace(offset, 0, "# a line more\n");
    } catch (BadLocationException e) {
      throw new AssertionError(e);
    }
  }

  private static double seconds(Runnable work) {
    long start = System.nanoTime();
    work.run();
    return 1e-9 * (System.nanoTime() - start);
  }

  private static double longestTurnUntilRead(ModelEditor editor) {
    double[] longest = new double[1];
    Workbench.waitUntil(
        "the model",
        () -> {
          Display display = Workbench.display();
          boolean[] more = {true};
          while (more[0]) {
            longest[0] = Math.max(longest[0], seconds(() -> more[0] = display.readAndDispatch()));
          }
          return editor
              .snapshots()
              .latest()
              .filter(s -> s.model().source().content().length() == editor.document().getLength())
              .isPresent();
        });
    return longest[0];
  }
}
