/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.ResourcesPlugin;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IPath;
import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.ITextOperationTarget;
import org.eclipse.jface.text.source.Annotation;
import org.eclipse.jface.text.source.projection.ProjectionAnnotation;
import org.eclipse.jface.text.source.projection.ProjectionViewer;
import org.eclipse.swt.custom.StyledText;
import org.eclipse.ui.PlatformUI;
import org.eclipse.ui.handlers.IHandlerService;
import org.eclipse.ui.ide.IDE;
import org.eclipse.ui.texteditor.MarkerAnnotation;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.RegisterExtension;
import org.spanloom.language.formatting.Formatter;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.ui.editor.ProblemAnnotation;
import org.spanloom.workspace.Ids;

/** Typing a model, with its problems shown at once and its findings after saving. */
class EditorTests {

  @RegisterExtension final Workbench workbench = new Workbench();

  @Test
  void showsAProblemWhileTypingAndAMarkerAfterSavingAndForgetsBoth() throws Exception {
    IProject project = Workbench.project("station");
    IFile file = Workbench.file(project, "float.span", Models.DECAY);
    ModelEditor editor = Workbench.open(file);
    Workbench.waitForJobs();
    assertEquals(List.of(), problems(editor));
    assertEquals(List.of(), Workbench.markers(file, Ids.PROBLEM));

    Workbench.type(editor, Models.DECAY_WITH_FAULT);
    Workbench.waitUntil("a problem annotation", () -> !problems(editor).isEmpty());
    ProblemAnnotation unknown = problem(editor, "name-unknown");
    int offset = editor.annotations().getPosition(unknown).getOffset();
    assertEquals(Models.FAULT_LINE - 1, editor.document().getLineOfOffset(offset));
    assertEquals(List.of(), Workbench.markers(file, Ids.PROBLEM), "nothing is saved yet");

    Workbench.save(editor);
    List<IMarker> markers = Workbench.markers(file, Ids.PROBLEM);
    assertTrue(
        markers.stream().anyMatch(m -> m.getAttribute(IMarker.LINE_NUMBER, 0) == Models.FAULT_LINE),
        markers::toString);
    assertEquals(
        List.of(), savedProblemsShown(editor), "what is shown live must not be shown twice");

    Workbench.type(editor, Models.DECAY);
    Workbench.waitUntil("the annotations to go", () -> problems(editor).isEmpty());
    Workbench.save(editor);
    assertEquals(List.of(), Workbench.markers(file, Ids.PROBLEM));
  }

  @Test
  void worksWithoutTheNature() throws Exception {
    IProject project = plainProject();
    IFile file = Workbench.file(project, "float.span", Models.DECAY_WITH_FAULT);
    ModelEditor editor = Workbench.open(file);
    Workbench.waitUntil("a problem annotation", () -> !problems(editor).isEmpty());
    assertEquals(List.of(), Workbench.markers(file, Ids.PROBLEM));
  }

  private static IProject plainProject() throws CoreException {
    IProject project = ResourcesPlugin.getWorkspace().getRoot().getProject("plain");
    project.create(null);
    project.open(null);
    return project;
  }

  @Test
  void opensForFilesByContentType() throws Exception {
    IFile file = Workbench.file(Workbench.project("station"), "float.span", Models.DECAY);
    assertInstanceOf(ModelEditor.class, IDE.openEditor(Workbench.page(), file));
  }

  @Test
  void foldsBlocksAndKeepsWhatIsFolded() throws Exception {
    IFile file = Workbench.file(Workbench.project("station"), "float.span", Models.DECAY);
    ModelEditor editor = Workbench.open(file);
    ProjectionViewer viewer = (ProjectionViewer) editor.viewer();
    Workbench.waitUntil("a fold", () -> !folds(viewer).isEmpty());
    ProjectionAnnotation fold = folds(viewer).getFirst();
    viewer.getProjectionAnnotationModel().collapse(fold);
    int length = editor.document().getLength();
    editor.document().replace(length, 0, "# more\n");
    Workbench.waitForModel(editor);
    assertTrue(folds(viewer).getFirst().isCollapsed());
  }

  @Test
  void togglesComments() throws Exception {
    IFile file = Workbench.file(Workbench.project("station"), "float.span", Models.DECAY);
    ModelEditor editor = Workbench.open(file);
    int start = Models.DECAY.indexOf("  parameter");
    int end = Models.DECAY.indexOf("  output");
    editor.selectAndReveal(start, end - start);
    execute("org.spanloom.ui.toggleComment");
    assertEquals("  # parameter rate", line(editor, 2).substring(0, 18));
    assertEquals("  # state depth [m] = 2", line(editor, 3));
    assertEquals("  output", line(editor, 4).substring(0, 8));
    execute("org.spanloom.ui.toggleComment");
    assertEquals(Models.DECAY, editor.document().get());
  }

  @Test
  void formatsAsOneStepToUndo() throws Exception {
    String rough = Models.DECAY.replace("  parameter", "parameter").replace(" = ", "  =  ");
    String laid = Formatter.format(rough);
    IFile file = Workbench.file(Workbench.project("station"), "float.span", rough);
    ModelEditor editor = Workbench.open(file);
    execute("org.spanloom.ui.format");
    Workbench.waitUntil("the text is laid out", () -> editor.document().get().equals(laid));
    ((ITextOperationTarget) editor.viewer()).doOperation(ITextOperationTarget.UNDO);
    assertEquals(rough, editor.document().get());
  }

  @Test
  void goesToTheMatchingBracket() throws Exception {
    IFile file = Workbench.file(Workbench.project("station"), "float.span", Models.DECAY);
    ModelEditor editor = Workbench.open(file);
    int open = Models.DECAY.indexOf('{');
    editor.selectAndReveal(open + 1, 0);
    execute("org.spanloom.ui.goToMatchingBracket");
    int caret = editor.viewer().getSelectedRange().x;
    assertEquals(Models.DECAY.lastIndexOf('}') + 1, caret, 1);
  }

  @Test
  void indentsBehindAnOpeningBrace() throws Exception {
    IFile file = Workbench.file(Workbench.project("station"), "new.span", "system A over t {");
    ModelEditor editor = Workbench.open(file);
    StyledText text = editor.viewer().getTextWidget();
    text.setSelection(text.getCharCount());

    text.insert("\n");
    Workbench.drain();
    assertEquals("system A over t {\n  ", editor.document().get());
  }

  @Test
  void aFileThatGrowsOutsideIsReadAgain() throws Exception {
    IFile file = Workbench.file(Workbench.project("station"), "float.span", Models.DECAY);
    ModelEditor editor = Workbench.open(file);
    file.setContents(
        new ByteArrayInputStream(Models.DECAY_WITH_FAULT.getBytes(StandardCharsets.UTF_8)),
        true,
        false,
        null);
    Workbench.waitUntil("a problem annotation", () -> !problems(editor).isEmpty());
    assertFalse(editor.isDirty());
    assertEquals(IPath.fromOSString("/station/float.span"), file.getFullPath());
  }

  static List<ProblemAnnotation> problems(ModelEditor editor) {
    List<ProblemAnnotation> found = new ArrayList<>();
    for (Iterator<Annotation> i = editor.annotations().getAnnotationIterator(); i.hasNext(); ) {
      if (i.next() instanceof ProblemAnnotation problem) {
        found.add(problem);
      }
    }
    return found;
  }

  static ProblemAnnotation problem(ModelEditor editor, String id) {
    return problems(editor).stream()
        .filter(p -> p.problem().kind().id().equals(id))
        .findFirst()
        .orElseThrow(() -> new AssertionError(id + " is not among " + problems(editor)));
  }

  private static List<IMarker> savedProblemsShown(ModelEditor editor) throws CoreException {
    List<IMarker> found = new ArrayList<>();
    for (Iterator<Annotation> i = editor.annotations().getAnnotationIterator(); i.hasNext(); ) {
      if (i.next() instanceof MarkerAnnotation saved
          && saved.getMarker().isSubtypeOf(Ids.PROBLEM)) {
        found.add(saved.getMarker());
      }
    }
    return found;
  }

  private static List<ProjectionAnnotation> folds(ProjectionViewer viewer) {
    List<ProjectionAnnotation> found = new ArrayList<>();
    viewer
        .getProjectionAnnotationModel()
        .getAnnotationIterator()
        .forEachRemaining(a -> found.add((ProjectionAnnotation) a));
    return found;
  }

  private static String line(ModelEditor editor, int number) throws BadLocationException {
    IRegion region = editor.document().getLineInformation(number);
    return editor.document().get(region.getOffset(), region.getLength());
  }

  static void execute(String command) throws Exception {
    Workbench.drain();
    PlatformUI.getWorkbench().getService(IHandlerService.class).executeCommand(command, null);
    Workbench.drain();
  }
}
