/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.ITextViewer;
import org.eclipse.jface.text.contentassist.ICompletionProposal;
import org.eclipse.jface.text.contentassist.IContentAssistProcessor;
import org.eclipse.jface.text.contentassist.IContextInformation;
import org.eclipse.jface.text.contentassist.IContextInformationValidator;
import org.spanloom.language.editing.Completion;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.text.SourceText;

/**
 * Proposes words, names and units. Runs outside the user interface thread, on a text of its own:
 * the snapshot if it is current, else the text read anew.
 */
final class ModelCompletionProcessor implements IContentAssistProcessor {

  private static final char[] ACTIVATION = {'['};

  private final ModelEditor editor;

  ModelCompletionProcessor(ModelEditor editor) {
    this.editor = editor;
  }

  @Override
  public ICompletionProposal[] computeCompletionProposals(ITextViewer viewer, int offset) {
    IDocument document = viewer.getDocument();
    if (document == null) {
      return new ICompletionProposal[0];
    }
    List<ICompletionProposal> proposals = new ArrayList<>();
    for (Completion.Proposal proposal : Completion.at(model(document), offset)) {
      proposals.add(new ModelProposal(proposal));
    }
    return proposals.toArray(ICompletionProposal[]::new);
  }

  private Model model(IDocument document) {
    Optional<Model> current =
        editor
            .snapshots()
            .latest()
            .filter(s -> s.stamp() == ModelReconcilingStrategy.stamp(document))
            .map(ModelSnapshot::model);
    return current.orElseGet(() ->
        ModelReader.read(
            new SourceText(editor.getTitle(), document.get()),
            EditorFiles.of(editor),
            () -> false));
  }

  @Override
  public IContextInformation[] computeContextInformation(ITextViewer viewer, int offset) {
    return new IContextInformation[0];
  }

  @Override
  public char[] getCompletionProposalAutoActivationCharacters() {
    return ACTIVATION.clone();
  }

  @Override
  public char[] getContextInformationAutoActivationCharacters() {
    return new char[0];
  }

  @Override
  public String getErrorMessage() {
    return null;
  }

  @Override
  public IContextInformationValidator getContextInformationValidator() {
    return null;
  }
}
