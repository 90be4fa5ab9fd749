/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * What an editor asks about a model, answered as plain data: offsets, labels, texts to insert.
 *
 * <table>
 * <caption>Questions and answers</caption>
 * <tr><td>What is in the file?</td><td>{@link org.spanloom.language.editing.Outline}</td></tr>
 * <tr><td>What can be folded?</td><td>{@link org.spanloom.language.editing.Folding}</td></tr>
 * <tr><td>What is this?</td><td>{@link org.spanloom.language.editing.Hover}</td></tr>
 * <tr><td>Where is this declared?</td><td>{@link org.spanloom.language.editing.Definition}</td></tr>
 * <tr><td>Where is this used?</td><td>{@link org.spanloom.language.editing.References}</td></tr>
 * <tr><td>May this be called otherwise?</td><td>{@link org.spanloom.language.editing.Rename}</td></tr>
 * <tr><td>What can stand here?</td><td>{@link org.spanloom.language.editing.Completion}</td></tr>
 * <tr><td>Can this long line be broken?</td><td>{@link org.spanloom.language.editing.LineSplit}</td></tr>
 * <tr><td>Can these equations be one of matrices, or the other way round?</td><td>{@link
 *     org.spanloom.language.editing.MatrixForm}, {@link
 *     org.spanloom.language.editing.ScalarForm}</td></tr>
 * </table>
 *
 * <p>{@link org.spanloom.language.editing.Names} says what a name stands for, and every answer
 * about one comes from there. A new form of statement or expression tells its names in {@code
 * NameBinder}, and those it declares in {@code NameScopes}. Nothing here knows an editor, and every
 * answer works on texts with errors.
 */
package org.spanloom.language.editing;
