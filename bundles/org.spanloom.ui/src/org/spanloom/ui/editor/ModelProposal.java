/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.DocumentEvent;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.ITextViewer;
import org.eclipse.jface.text.contentassist.ICompletionProposal;
import org.eclipse.jface.text.contentassist.ICompletionProposalExtension2;
import org.eclipse.jface.text.contentassist.ICompletionProposalExtension6;
import org.eclipse.jface.text.contentassist.IContextInformation;
import org.eclipse.jface.viewers.StyledString;
import org.eclipse.swt.graphics.Image;
import org.eclipse.swt.graphics.Point;
import org.spanloom.language.editing.Completion;
import org.spanloom.ui.Icon;

/** One proposal; it stays in the list as long as what is typed is the beginning of it. */
final class ModelProposal
    implements ICompletionProposal, ICompletionProposalExtension2, ICompletionProposalExtension6 {

  private final Completion.Proposal proposal;

  ModelProposal(Completion.Proposal proposal) {
    this.proposal = proposal;
  }

  @Override
  public void apply(ITextViewer viewer, char trigger, int stateMask, int offset) {
    int start = proposal.replaced().start();
    // What was typed since the list opened is replaced too.
    int end = Math.max(offset, proposal.replaced().end());
    try {
      viewer.getDocument().replace(start, end - start, proposal.text());
    } catch (BadLocationException e) {
      // The text changed under the list; then there is nothing to insert.
    }
  }

  @Override
  public void apply(IDocument document) {
    try {
      document.replace(proposal.replaced().start(), proposal.replaced().length(), proposal.text());
    } catch (BadLocationException e) {
      // As above.
    }
  }

  @Override
  public boolean validate(IDocument document, int offset, DocumentEvent event) {
    int start = proposal.replaced().start();
    try {
      return offset >= start && proposal.text().startsWith(document.get(start, offset - start));
    } catch (BadLocationException e) {
      return false;
    }
  }

  @Override
  public Point getSelection(IDocument document) {
    return new Point(proposal.replaced().start() + proposal.text().length(), 0);
  }

  @Override
  public String getAdditionalProposalInfo() {
    String documentation = proposal.documentation();
    String text = documentation.isEmpty() ? proposal.detail() : documentation;
    return text.isEmpty() ? null : text;
  }

  @Override
  public String getDisplayString() {
    return getStyledDisplayString().getString();
  }

  @Override
  public StyledString getStyledDisplayString() {
    StyledString text = new StyledString(proposal.text());
    if (!proposal.detail().isEmpty()) {
      text.append("  " + proposal.detail(), StyledString.QUALIFIER_STYLER);
    }
    return text;
  }

  @Override
  public Image getImage() {
    return Icon.OTHER.image();
  }

  @Override
  public IContextInformation getContextInformation() {
    return null;
  }

  @Override
  public void selected(ITextViewer viewer, boolean smartToggle) {
    // Nothing to prepare.
  }

  @Override
  public void unselected(ITextViewer viewer) {
    // Nothing to undo.
  }
}
