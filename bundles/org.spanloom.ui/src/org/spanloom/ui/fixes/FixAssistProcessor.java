/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.fixes;

import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import org.eclipse.core.resources.IMarker;
import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.Position;
import org.eclipse.jface.text.contentassist.ICompletionProposal;
import org.eclipse.jface.text.quickassist.IQuickAssistInvocationContext;
import org.eclipse.jface.text.quickassist.IQuickAssistProcessor;
import org.eclipse.jface.text.source.Annotation;
import org.eclipse.jface.text.source.IAnnotationModel;
import org.eclipse.ui.texteditor.MarkerAnnotation;
import org.spanloom.language.problem.Fix;
import org.spanloom.ui.editor.ProblemAnnotation;
import org.spanloom.workspace.FixText;
import org.spanloom.workspace.MarkerAttributes;

/** Lists the fixes of the findings in the line of the caret; those at the caret come first. */
public final class FixAssistProcessor implements IQuickAssistProcessor {

  @Override
  public ICompletionProposal[] computeQuickAssistProposals(IQuickAssistInvocationContext context) {
    IAnnotationModel annotations = context.getSourceViewer().getAnnotationModel();
    IDocument document = context.getSourceViewer().getDocument();
    if (annotations == null || document == null) {
      return new ICompletionProposal[0];
    }
    List<ICompletionProposal> atCaret = new ArrayList<>();
    List<ICompletionProposal> inLine = new ArrayList<>();
    for (Iterator<Annotation> i = annotations.getAnnotationIterator(); i.hasNext(); ) {
      Annotation annotation = i.next();
      Position position = annotations.getPosition(annotation);
      if (position != null && !annotation.isMarkedDeleted()) {
        boolean touched =
            position.getOffset() <= context.getOffset()
                && context.getOffset() <= position.getOffset() + position.getLength();
        if (touched) {
          atCaret.addAll(proposals(annotation));
        } else if (sameLine(document, position.getOffset(), context.getOffset())) {
          inLine.addAll(proposals(annotation));
        }
      }
    }
    atCaret.addAll(inLine);
    return atCaret.toArray(ICompletionProposal[]::new);
  }

  private static List<ICompletionProposal> proposals(Annotation annotation) {
    List<ICompletionProposal> proposals = new ArrayList<>();
    if (annotation instanceof ProblemAnnotation problem) {
      for (Fix fix : problem.problem().fixes()) {
        proposals.add(new FixProposal(fix));
      }
    } else if (annotation instanceof MarkerAnnotation saved) {
      IMarker marker = saved.getMarker();
      for (FixText.Anchored fix : FixText.read(marker.getAttribute(MarkerAttributes.FIXES, ""))) {
        proposals.add(new FixProposal(fix));
      }
    }
    return proposals;
  }

  private static boolean sameLine(IDocument document, int one, int other) {
    try {
      return document.getLineOfOffset(one) == document.getLineOfOffset(other);
    } catch (BadLocationException e) {
      return false;
    }
  }

  @Override
  public boolean canFix(Annotation annotation) {
    return annotation instanceof ProblemAnnotation problem
        ? problem.isQuickFixable()
        : annotation instanceof MarkerAnnotation saved
            && !saved.getMarker().getAttribute(MarkerAttributes.FIXES, "").isEmpty();
  }

  @Override
  public boolean canAssist(IQuickAssistInvocationContext context) {
    return false;
  }

  @Override
  public String getErrorMessage() {
    return null;
  }
}
