/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.eclipse.core.runtime.CoreException;
import org.eclipse.jface.preference.IPreferenceStore;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.ITextHover;
import org.eclipse.jface.text.ITextViewerExtension5;
import org.eclipse.jface.text.Region;
import org.eclipse.jface.text.source.DefaultCharacterPairMatcher;
import org.eclipse.jface.text.source.IAnnotationModel;
import org.eclipse.jface.text.source.ICharacterPairMatcher;
import org.eclipse.jface.text.source.ISourceViewer;
import org.eclipse.jface.text.source.IVerticalRuler;
import org.eclipse.jface.text.source.projection.ProjectionSupport;
import org.eclipse.jface.text.source.projection.ProjectionViewer;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.ui.IEditorInput;
import org.eclipse.ui.editors.text.EditorsUI;
import org.eclipse.ui.editors.text.TextEditor;
import org.eclipse.ui.texteditor.ChainedPreferenceStore;
import org.eclipse.ui.texteditor.SourceViewerDecorationSupport;
import org.eclipse.ui.views.contentoutline.IContentOutlinePage;
import org.spanloom.language.text.Span;
import org.spanloom.ui.UiIds;
import org.spanloom.ui.theme.ThemeColours;
import org.spanloom.ui.workbench.PreferenceDefaults;

/** The editor of model files. */
public final class ModelEditor extends TextEditor {

  private static final char[] BRACKETS = {'(', ')', '[', ']', '{', '}'};

  private final ModelSnapshots snapshots = new ModelSnapshots();
  private final LiveProblems problems = new LiveProblems(this::getSourceViewer);
  private final DefaultCharacterPairMatcher brackets = new DefaultCharacterPairMatcher(BRACKETS);
  private final ModelFolding folding = new ModelFolding();
  private final ModelViewerConfiguration configuration;
  private ProjectionSupport projection;
  private ModelOutlinePage outline;
  private Runnable endColours = () -> {};

  /** Called by the workbench. The platform's own hook for this runs before the fields are set. */
  public ModelEditor() {
    IPreferenceStore store =
        new ChainedPreferenceStore(
            new IPreferenceStore[] {PreferenceDefaults.store(), EditorsUI.getPreferenceStore()});
    setPreferenceStore(store);
    configuration = new ModelViewerConfiguration(this, store);
    setSourceViewerConfiguration(configuration);
    setEditorContextMenuId(UiIds.EDITOR + ".menu");
    setRulerContextMenuId(UiIds.EDITOR + ".ruler");
    setHelpContextId(UiIds.EDITOR_HELP);
    snapshots.listen(problems);
    snapshots.listen(folding);
  }

  @Override
  protected void initializeKeyBindingScopes() {
    setKeyBindingScopes(new String[] {UiIds.EDITOR_SCOPE});
  }

  @Override
  protected ISourceViewer createSourceViewer(Composite parent, IVerticalRuler ruler, int styles) {
    ProjectionViewer viewer =
        new ProjectionViewer(parent, ruler, getOverviewRuler(), isOverviewRulerVisible(), styles);
    getSourceViewerDecorationSupport(viewer);
    return viewer;
  }

  @Override
  public void createPartControl(Composite parent) {
    super.createPartControl(parent);
    ProjectionViewer viewer = (ProjectionViewer) getSourceViewer();
    projection = new ProjectionSupport(viewer, getAnnotationAccess(), getSharedColors());
    projection.install();
    viewer.doOperation(ProjectionViewer.TOGGLE);
    folding.install(viewer);
    endColours =
        ThemeColours.onChange(() -> {
          configuration.readColours();
          viewer.invalidateTextPresentation();
        });
  }

  @Override
  protected void configureSourceViewerDecorationSupport(SourceViewerDecorationSupport support) {
    super.configureSourceViewerDecorationSupport(support);
    support.setCharacterPairMatcher(brackets);
    support.setMatchingCharacterPainterPreferenceKeys(
        PreferenceDefaults.MATCHING_BRACKETS, PreferenceDefaults.MATCHING_BRACKETS_COLOUR);
  }

  @Override
  protected void doSetInput(IEditorInput input) throws CoreException {
    ISourceViewer viewer = getSourceViewer();
    if (viewer != null) {
      problems.clear(viewer.getAnnotationModel());
    }
    super.doSetInput(input);
  }

  /** Returns what the text means, as it is being typed. */
  public ModelSnapshots snapshots() {
    return snapshots;
  }

  /** Returns the document, which is there while the editor has an input. */
  public IDocument document() {
    return getDocumentProvider().getDocument(getEditorInput());
  }

  /** Returns the annotations of the document. */
  public IAnnotationModel annotations() {
    return getDocumentProvider().getAnnotationModel(getEditorInput());
  }

  /** Returns the viewer, for tests and for actions of this bundle. */
  public ISourceViewer viewer() {
    return getSourceViewer();
  }

  /** Returns what tells about the text under the pointer. */
  public ITextHover hover() {
    return new ModelHover(this, getSourceViewer());
  }

  /** Selects a span and shows it. */
  public void reveal(Span span) {
    int length = document().getLength();
    int start = Math.min(span.start(), length);
    selectAndReveal(start, Math.min(span.length(), length - start));
  }

  /** Moves the caret to the bracket that belongs to the one beside it. */
  void goToMatchingBracket() {
    ISourceViewer viewer = getSourceViewer();
    int caret = viewer.getSelectedRange().x;
    IRegion match = brackets.match(document(), caret);
    if (match == null) {
      return;
    }
    boolean atOpening = brackets.getAnchor() == ICharacterPairMatcher.LEFT;
    int target = atOpening ? match.getOffset() + match.getLength() : match.getOffset() + 1;
    if (viewer instanceof ITextViewerExtension5 folded) {
      folded.exposeModelRange(new Region(target, 0));
    }
    viewer.setSelectedRange(target, 0);
    viewer.revealRange(target, 0);
  }

  @Override
  public <T> T getAdapter(Class<T> type) {
    if (type == IContentOutlinePage.class) {
      if (outline == null) {
        outline = new ModelOutlinePage(this);
      }
      return type.cast(outline);
    }
    if (type == ModelSnapshots.class) {
      return type.cast(snapshots);
    }
    if (projection != null) {
      T adapter = projection.getAdapter(getSourceViewer(), type);
      if (adapter != null) {
        return adapter;
      }
    }
    return super.getAdapter(type);
  }

  /** Forgets the outline page that was disposed, so that a new one is made when it is asked for. */
  void outlineDisposed() {
    outline = null;
  }

  @Override
  public void dispose() {
    endColours.run();
    brackets.dispose();
    if (projection != null) {
      projection.dispose();
    }
    super.dispose();
  }
}
