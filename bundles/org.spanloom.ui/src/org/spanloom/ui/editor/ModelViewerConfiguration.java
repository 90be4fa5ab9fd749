/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.Map;
import org.eclipse.core.runtime.IAdaptable;
import org.eclipse.jface.preference.IPreferenceStore;
import org.eclipse.jface.text.IAutoEditStrategy;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.ITextHover;
import org.eclipse.jface.text.contentassist.ContentAssistant;
import org.eclipse.jface.text.contentassist.IContentAssistant;
import org.eclipse.jface.text.presentation.IPresentationReconciler;
import org.eclipse.jface.text.presentation.PresentationReconciler;
import org.eclipse.jface.text.quickassist.IQuickAssistAssistant;
import org.eclipse.jface.text.quickassist.QuickAssistAssistant;
import org.eclipse.jface.text.reconciler.IReconciler;
import org.eclipse.jface.text.reconciler.MonoReconciler;
import org.eclipse.jface.text.rules.DefaultDamagerRepairer;
import org.eclipse.jface.text.source.ISourceViewer;
import org.eclipse.ui.editors.text.TextSourceViewerConfiguration;
import org.spanloom.ui.fixes.FixAssistProcessor;

/** What the viewer of a model file can do. */
final class ModelViewerConfiguration extends TextSourceViewerConfiguration {

  private static final int PAUSE_MS = 400;
  private static final String HYPERLINK_TARGET = "org.spanloom.ui.definitions";

  private final ModelEditor editor;
  private final ModelTokenScanner scanner = new ModelTokenScanner();

  ModelViewerConfiguration(ModelEditor editor, IPreferenceStore store) {
    super(store);
    this.editor = editor;
  }

  /** Takes the colours of the current theme; the viewer must be painted anew. */
  void readColours() {
    scanner.readColours();
  }

  @Override
  public IPresentationReconciler getPresentationReconciler(ISourceViewer viewer) {
    PresentationReconciler reconciler = new PresentationReconciler();
    reconciler.setDocumentPartitioning(getConfiguredDocumentPartitioning(viewer));
    DefaultDamagerRepairer lines = new DefaultDamagerRepairer(scanner);
    reconciler.setDamager(lines, IDocument.DEFAULT_CONTENT_TYPE);
    reconciler.setRepairer(lines, IDocument.DEFAULT_CONTENT_TYPE);
    return reconciler;
  }

  @Override
  public IReconciler getReconciler(ISourceViewer viewer) {
    MonoReconciler reconciler =
        new MonoReconciler(new ModelReconcilingStrategy(editor, editor.snapshots()), false);
    reconciler.setDelay(PAUSE_MS);
    return reconciler;
  }

  @Override
  public IContentAssistant getContentAssistant(ISourceViewer viewer) {
    ContentAssistant assistant = new ContentAssistant(true);
    assistant.setDocumentPartitioning(getConfiguredDocumentPartitioning(viewer));
    assistant.setContentAssistProcessor(
        new ModelCompletionProcessor(editor), IDocument.DEFAULT_CONTENT_TYPE);
    assistant.enableColoredLabels(true);
    assistant.enableAutoInsert(true);
    assistant.setInformationControlCreator(getInformationControlCreator(viewer));
    return assistant;
  }

  @Override
  public IQuickAssistAssistant getQuickAssistAssistant(ISourceViewer viewer) {
    QuickAssistAssistant assistant = new QuickAssistAssistant();
    assistant.setQuickAssistProcessor(new FixAssistProcessor());
    assistant.setInformationControlCreator(getInformationControlCreator(viewer));
    return assistant;
  }

  @Override
  public ITextHover getTextHover(ISourceViewer viewer, String contentType) {
    return new ModelHover(editor, viewer);
  }

  @Override
  public String[] getDefaultPrefixes(ISourceViewer viewer, String contentType) {
    return new String[] {"#", ""};
  }

  @Override
  public IAutoEditStrategy[] getAutoEditStrategies(ISourceViewer viewer, String contentType) {
    IAutoEditStrategy[] inherited = super.getAutoEditStrategies(viewer, contentType);
    IAutoEditStrategy[] all = new IAutoEditStrategy[inherited.length + 1];
    System.arraycopy(inherited, 0, all, 0, inherited.length);
    all[inherited.length] = new BlockIndent();
    return all;
  }

  @Override
  protected Map<String, IAdaptable> getHyperlinkDetectorTargets(ISourceViewer viewer) {
    Map<String, IAdaptable> targets = super.getHyperlinkDetectorTargets(viewer);
    targets.put(HYPERLINK_TARGET, editor);
    return targets;
  }
}
