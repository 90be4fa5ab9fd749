/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.resources.IProject;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.ITextHover;
import org.eclipse.jface.text.ITextSelection;
import org.eclipse.jface.text.ITextViewer;
import org.eclipse.jface.text.Region;
import org.eclipse.jface.text.contentassist.ICompletionProposal;
import org.eclipse.jface.text.hyperlink.IHyperlink;
import org.eclipse.jface.text.quickassist.IQuickAssistInvocationContext;
import org.eclipse.jface.text.source.ISourceViewer;
import org.eclipse.swt.SWT;
import org.eclipse.swt.widgets.Event;
import org.eclipse.swt.widgets.Table;
import org.eclipse.swt.widgets.TableItem;
import org.eclipse.swt.widgets.Tree;
import org.eclipse.swt.widgets.TreeItem;
import org.eclipse.ui.IMarkerResolution;
import org.eclipse.ui.IPageLayout;
import org.eclipse.ui.ide.IDE;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.RegisterExtension;
import org.spanloom.ui.editor.DefinitionDetector;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.ui.fixes.FixAssistProcessor;
import org.spanloom.workspace.Ids;
import org.spanloom.workspace.MarkerAttributes;

/** Outline, hover, declarations, completion and fixes, through the workbench. */
class LanguageServicesTests {

  @RegisterExtension final Workbench workbench = new Workbench();

  private IProject project;
  private ModelEditor editor;

  @BeforeEach
  void openModel() throws Exception {
    project = Workbench.project("station");
    editor = Workbench.open(Workbench.file(project, "float.span", Models.DECAY));
  }

  private static List<Tree> trees() {
    return Workbench.find(Tree.class, Workbench.shell());
  }

  private static Tree outline() {
    return trees().stream()
        .filter(t -> t.getItemCount() > 0 && t.getItem(0).getText().startsWith("Float"))
        .findFirst()
        .orElse(null);
  }

  @Test
  void outlinesTheModelAndGoesToWhatIsSelected() throws Exception {
    Workbench.page().showView(IPageLayout.ID_OUTLINE);
    Workbench.waitUntil("the outline", () -> outline() != null);
    Tree tree = outline();
    TreeItem[] parts = tree.getItem(0).getItems();
    List<String> names = Arrays.stream(parts).map(i -> i.getText().split(" ")[0]).toList();
    assertTrue(names.containsAll(List.of("rate", "depth", "slope", "low", "Phi")), names::toString);
    TreeItem basis =
        Arrays.stream(parts).filter(i -> i.getText().startsWith("Phi")).findFirst().orElseThrow();
    assertNotNull(basis.getImage());
    tree.setSelection(basis);
    Workbench.send(tree, SWT.Selection, e -> e.item = basis);
    Workbench.waitUntil("the name in the text", () -> selected().equals("Phi"));
  }

  @Test
  void theOutlineStaysAsOpenAsItWas() throws Exception {
    Workbench.page().showView(IPageLayout.ID_OUTLINE);
    Workbench.waitUntil("the outline", () -> outline() != null);
    outline().getItem(0).setExpanded(false);
    Workbench.type(editor, Models.DECAY.replace("rate", "speed"));
    Workbench.drain();
    assertTrue(!outline().getItem(0).getExpanded());
  }

  private String selected() {
    return ((ITextSelection) editor.getSelectionProvider().getSelection()).getText();
  }

  @Test
  void tellsWhatANameMeans() {
    String text = hover(Models.DECAY.indexOf("rate*depth") + 1);
    assertTrue(text.contains("rate"), text);
    assertTrue(text.contains("1/s"), text);
    assertTrue(text.contains("how fast it settles"), text);
  }

  @Test
  void tellsTheProblemUnderThePointer() {
    Workbench.type(editor, Models.DECAY_WITH_FAULT);
    Workbench.waitUntil("the problem", () -> !EditorTests.problems(editor).isEmpty());
    String text = hover(Models.DECAY_WITH_FAULT.indexOf("rote") + 1);
    assertEquals(EditorTests.problem(editor, "name-unknown").problem().message(), text);
  }

  @Test
  void tellsWhatTheCheckSaidOfARequirement() throws Exception {
    Workbench.type(
        editor, Models.DECAY.replace("basis Phi at 0", "require depth < 3 [m] throughout"));
    Workbench.save(editor);
    int offset = editor.document().get().indexOf("throughout");
    Workbench.waitUntil(
        "the result of the requirement",
        () -> hover(offset).contains("2 m at t = 0 s"),
        () -> hover(offset));
  }

  @SuppressWarnings("deprecation") // The text of a hover is asked for by this method.
  private String hover(int offset) {
    ITextHover hover = editor.hover();
    IRegion region = hover.getHoverRegion((ITextViewer) editor.viewer(), offset);
    String text = hover.getHoverInfo((ITextViewer) editor.viewer(), region);
    return text == null ? "" : text;
  }

  @Test
  void goesToTheDeclaration() {
    DefinitionDetector detector = new DefinitionDetector();
    detector.setContext(editor);
    int use = Models.DECAY.indexOf("-rate*depth\n  depth'") + 1;
    IHyperlink[] links =
        detector.detectHyperlinks((ITextViewer) editor.viewer(), new Region(use + 1, 0), false);
    assertNotNull(links);
    assertEquals(use, links[0].getHyperlinkRegion().getOffset());
    assertEquals("rate".length(), links[0].getHyperlinkRegion().getLength());
    links[0].open();
    assertEquals("rate", selected());
    int offset = ((ITextSelection) editor.getSelectionProvider().getSelection()).getOffset();
    assertEquals(Models.DECAY.indexOf("rate [1/s]"), offset);
    int comment = Models.DECAY.indexOf("Invented");
    assertNull(
        detector.detectHyperlinks((ITextViewer) editor.viewer(), new Region(comment, 0), false));
  }

  @Test
  void f3GoesToTheDeclaration() throws Exception {
    int use = Models.DECAY.lastIndexOf("rate*depth") + 1;
    editor.selectAndReveal(use, 0);
    EditorTests.execute("org.eclipse.ui.edit.text.open.hyperlink");
    assertEquals("rate", selected());
  }

  @Test
  void proposesNamesAsTheyAreTyped() throws Exception {
    int use = Models.DECAY.lastIndexOf("rate*depth");
    editor.document().replace(use, "rate".length(), "ra");
    Workbench.waitForModel(editor);
    editor.selectAndReveal(use + 2, 0);
    editor.setFocus();
    editor.getAction("ContentAssistProposal").run();
    // The only proposal is inserted at once, unless the list was open before it was known.
    Workbench.waitUntil(
        "the name proposed or inserted",
        () -> inserted() || proposals().stream().anyMatch(p -> p.startsWith("rate")),
        () -> proposals().toString());
    if (!inserted()) {
      Table list = lists().getFirst();
      list.setSelection(0);
      Workbench.send(list, SWT.DefaultSelection, e -> e.item = list.getItem(0));
    }
    Workbench.waitUntil("the name inserted", this::inserted, () -> editor.document().get());
  }

  @Test
  void listsUnitsInBrackets() throws Exception {
    int unit = Models.DECAY.indexOf("[m] = 2") + 1;
    editor.document().replace(unit, 1, "k");
    Workbench.waitForModel(editor);
    editor.selectAndReveal(unit + 1, 0);
    editor.setFocus();
    editor.getAction("ContentAssistProposal").run();
    Workbench.waitUntil(
        "the list of units",
        () -> proposals().stream().anyMatch(p -> p.startsWith("kat")),
        () -> proposals().toString());
    editor.getSite().getShell().forceFocus();
    editor.selectAndReveal(0, 0);
    editor.viewer().getTextWidget().notifyListeners(SWT.FocusOut, new Event());
    Workbench.drain();
  }

  private boolean inserted() {
    return editor.document().get().equals(Models.DECAY);
  }

  private static List<Table> lists() {
    return Arrays.stream(Workbench.display().getShells())
        .filter(s -> s != Workbench.shell() && s.isVisible())
        .flatMap(s -> Workbench.find(Table.class, s).stream())
        .toList();
  }

  private static List<String> proposals() {
    return lists().stream()
        .flatMap(list -> Arrays.stream(list.getItems()))
        .map(TableItem::getText)
        .toList();
  }

  @Test
  void mendsAnUnknownNameAtTheCaret() {
    Workbench.type(editor, Models.DECAY_WITH_FAULT);
    Workbench.waitUntil("the problem", () -> !EditorTests.problems(editor).isEmpty());
    int offset = Models.DECAY_WITH_FAULT.indexOf("rote");
    ICompletionProposal[] fixes =
        new FixAssistProcessor().computeQuickAssistProposals(new At(editor.viewer(), offset));
    assertTrue(fixes.length > 0, "there must be a fix");
    fixes[0].apply(editor.document());
    assertEquals(Models.DECAY, editor.document().get());
  }

  @Test
  void mendsASavedFileByItsMarkerAndRefusesAChangedText() throws Exception {
    IFile file = Workbench.file(project, "other.span", Models.DECAY_WITH_FAULT);
    Workbench.build(project);
    IMarker marker =
        Workbench.markers(file, Ids.PROBLEM).stream()
            .filter(m -> m.getAttribute(MarkerAttributes.CODE, "").equals("name-unknown"))
            .findFirst()
            .orElseThrow();
    IMarkerResolution[] fixes = IDE.getMarkerHelpRegistry().getResolutions(marker);
    assertTrue(fixes.length > 0, "there must be a fix");

    ModelEditor other = Workbench.open(file);
    other.document().replace(0, 0, "# shifted\n");
    String shifted = other.document().get();
    fixes[0].run(marker);
    assertEquals(shifted, other.document().get(), "a fix for another text must do nothing");
    Workbench.page().closeEditor(other, false);

    fixes[0].run(marker);
    assertEquals(
        Models.DECAY, new String(file.getContents().readAllBytes(), StandardCharsets.UTF_8));
  }

  /** A place in a viewer. */
  private record At(ISourceViewer viewer, int offset) implements IQuickAssistInvocationContext {

    @Override
    public int getOffset() {
      return offset;
    }

    @Override
    public int getLength() {
      return 0;
    }

    @Override
    public ISourceViewer getSourceViewer() {
      return viewer;
    }
  }
}
