/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * The canonical layout of a model file.
 *
 * <pre>
 * SourceText -> tokens, statements -> Layout: how many blanks stand before each token -> TextEdits
 *                                     Spacing, Indentation, Alignment, CommentColumns
 * </pre>
 *
 * <p>Laws: only white space changes, so no token, comment or line of code is made, moved or lost;
 * the layout follows from the tokens alone, so laying out twice is laying out once; a statement
 * that cannot be read keeps its blanks but for the indentation; what stands in a line depends on
 * the lines directly beside it at most, so that a small change stays a small difference.
 */
package org.spanloom.language.formatting;
