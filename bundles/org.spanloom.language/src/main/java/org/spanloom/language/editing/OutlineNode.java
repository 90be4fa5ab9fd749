/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.List;
import org.spanloom.language.text.Span;

/**
 * A line of an outline.
 *
 * @param kind what it stands for
 * @param label its name, or its text where it has none
 * @param detail more about it, for example a unit; may be empty
 * @param span the whole statement
 * @param nameSpan what to select
 * @param children the lines below it
 */
public record OutlineNode(
    Kind kind, String label, String detail, Span span, Span nameSpan, List<OutlineNode> children) {

  /** Copies the list. */
  public OutlineNode {
    children = List.copyOf(children);
  }

  /** What a line of an outline stands for. */
  public enum Kind {
    /** A system. */
    SYSTEM,
    /** A parameter. */
    PARAMETER,
    /** A named expression or an input. */
    LET,
    /** A state or a derivative with a declaration of its own. */
    STATE,
    /** A matrix. */
    MATRIX,
    /** A part. */
    PART,
    /** An import. */
    IMPORT,
    /** An output. */
    OUTPUT,
    /** An equation or a transfer. */
    EQUATION,
    /** A jump of the states. */
    JUMP,
    /** A loop over equations, transfers and requirements. */
    LOOP,
    /** A set of initial values. */
    INITIAL_VALUES,
    /** A set of boundary conditions. */
    BOUNDARY,
    /** A candidate basis. */
    BASIS,
    /** A requirement. */
    REQUIREMENT,
    /** The accuracy asked for. */
    ACCURACY,
    /** A statement that cannot be read. */
    UNREAD
  }
}
