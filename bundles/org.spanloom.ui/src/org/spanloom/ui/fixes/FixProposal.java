/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.fixes;

import java.util.List;
import java.util.function.Consumer;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.contentassist.ICompletionProposal;
import org.eclipse.jface.text.contentassist.IContextInformation;
import org.eclipse.swt.graphics.Image;
import org.eclipse.swt.graphics.Point;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.ui.Icon;
import org.spanloom.workspace.FixText;

/** A fix in the list of the editor. */
final class FixProposal implements ICompletionProposal {

  private final Fix fix;
  private final Consumer<IDocument> application;

  /** Offers a fix made for the text as it stands. */
  FixProposal(Fix fix) {
    this.fix = fix;
    this.application = document -> FixApplication.apply(document, fix.edits());
  }

  /** Offers a fix kept with a marker; it does nothing where the text has changed since. */
  FixProposal(FixText.Anchored anchored) {
    this.fix = anchored.fix();
    this.application = document -> FixApplication.apply(document, anchored);
  }

  @Override
  public void apply(IDocument document) {
    application.accept(document);
  }

  @Override
  public Point getSelection(IDocument document) {
    List<TextEdit> edits = fix.edits();
    if (edits.size() != 1) {
      return null;
    }
    TextEdit edit = edits.getFirst();
    return new Point(edit.span().start() + edit.replacement().length(), 0);
  }

  @Override
  public String getDisplayString() {
    return fix.label();
  }

  @Override
  public String getAdditionalProposalInfo() {
    return null;
  }

  @Override
  public Image getImage() {
    return Icon.OTHER.image();
  }

  @Override
  public IContextInformation getContextInformation() {
    return null;
  }
}
