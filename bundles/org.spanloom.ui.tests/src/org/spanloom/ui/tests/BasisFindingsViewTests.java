/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.resources.IProject;
import org.eclipse.jface.text.ITextSelection;
import org.eclipse.swt.SWT;
import org.eclipse.swt.widgets.Event;
import org.eclipse.swt.widgets.Tree;
import org.eclipse.swt.widgets.TreeColumn;
import org.eclipse.swt.widgets.TreeItem;
import org.eclipse.ui.IEditorPart;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.RegisterExtension;
import org.spanloom.ui.UiIds;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.workspace.Ids;
import org.spanloom.workspace.MarkerAttributes;

/** The list of bases. */
class BasisFindingsViewTests {

  @RegisterExtension final Workbench workbench = new Workbench();

  private static Tree tree() {
    return Workbench.find(Tree.class, Workbench.shell()).stream()
        .filter(t -> titles(t).contains("Digits left"))
        .findFirst()
        .orElseThrow(() -> new AssertionError("the list of bases cannot be seen"));
  }

  private static List<String> titles(Tree tree) {
    return Arrays.stream(tree.getColumns()).map(TreeColumn::getText).toList();
  }

  private static int column(String title) {
    return titles(tree()).indexOf(title);
  }

  private static List<String> values(String title) {
    int column = column(title);
    return Arrays.stream(tree().getItems()).map(i -> i.getText(column)).toList();
  }

  /**
   * Makes markers as the builder does, with condition numbers that text order would sort wrongly.
   */
  private static IFile threeBases(IProject project) throws Exception {
    IFile file = Workbench.file(project, "three.txt", "one\ntwo\nthree\n");
    marker(file, 1, "first", 9.5);
    marker(file, 2, "second", 1.25e10);
    marker(file, 3, "third", 120);
    return file;
  }

  private static void marker(IFile file, int line, String basis, double raw) throws Exception {
    Map<String, Object> attributes = new HashMap<>();
    attributes.put(IMarker.SEVERITY, IMarker.SEVERITY_INFO);
    attributes.put(IMarker.MESSAGE, "basis " + basis);
    attributes.put(IMarker.LINE_NUMBER, line);
    attributes.put(MarkerAttributes.BASIS, basis);
    attributes.put(MarkerAttributes.SYSTEM, "Float");
    attributes.put(MarkerAttributes.RAW, Double.toString(raw));
    attributes.put(MarkerAttributes.DIGITS_LEFT, Double.toString(15 - Math.log10(raw)));
    file.createMarker(Ids.BASIS, attributes);
  }

  @Test
  void sortsConditionsAsNumbers() throws Exception {
    Workbench.page().showView(UiIds.BASIS_FINDINGS_VIEW);
    threeBases(Workbench.project("station"));
    Workbench.waitUntil("three bases", () -> tree().getItemCount() == 3);
    clickHeader("Condition");
    Workbench.waitUntil(
        "the order of numbers",
        () -> values("Basis").equals(List.of("first", "third", "second")),
        () -> values("Basis").toString());
    assertEquals(List.of("9.500", "120.0", "1.25e+10"), values("Condition"));
    clickHeader("Condition");
    Workbench.waitUntil(
        "the reversed order",
        () -> values("Basis").equals(List.of("second", "third", "first")),
        () -> values("Basis").toString());
    clickHeader("Digits left");
    Workbench.waitUntil(
        "the order of digits",
        () -> values("Basis").equals(List.of("second", "third", "first")),
        () -> values("Basis").toString());
  }

  private static void clickHeader(String title) {
    TreeColumn header = tree().getColumn(column(title));
    header.notifyListeners(SWT.Selection, new Event());
    Workbench.drain();
  }

  @Test
  void listsTheBasisOfAModelAndGoesToItsLine() throws Exception {
    Workbench.page().showView(UiIds.BASIS_FINDINGS_VIEW);
    IProject project = Workbench.project("station");
    Workbench.file(project, "float.span", Models.DECAY);
    Workbench.build(project);
    Workbench.waitUntil(
        "the basis Phi",
        () -> tree().getItemCount() == 1 && values("Basis").equals(List.of("Phi")),
        () -> rows().toString());
    assertEquals(List.of("Float"), values("System"));
    // A basis of one function has condition 1 at every time.
    assertEquals(List.of("1.000"), values("Condition"));
    TreeItem item = tree().getItem(0);
    tree().setSelection(item);
    Workbench.send(tree(), SWT.Selection, e -> e.item = item);
    Workbench.send(tree(), SWT.MouseDoubleClick, e -> e.item = item);
    Workbench.send(tree(), SWT.DefaultSelection, e -> e.item = item);
    Workbench.waitUntil(
        "the editor", () -> Workbench.page().getActiveEditor() instanceof ModelEditor);
    IEditorPart editor = Workbench.page().getActiveEditor();
    ModelEditor model = assertInstanceOf(ModelEditor.class, editor);
    Workbench.waitUntil(
        "the line of the basis",
        () ->
            model.getSelectionProvider().getSelection() instanceof ITextSelection text
                && text.getStartLine() == basisLine());
  }

  private static int basisLine() {
    List<String> lines = Models.DECAY.lines().toList();
    return lines.indexOf("  basis Phi at 0");
  }

  private static List<String> rows() {
    List<String> rows = new ArrayList<>();
    for (TreeItem item : tree().getItems()) {
      rows.add(item.getText(0));
    }
    rows.sort(Comparator.naturalOrder());
    return rows;
  }
}
