/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * The editor of model files.
 *
 * <pre>
 *   typing --&gt; ModelReconcilingStrategy (a job) -- ModelReader --&gt; ModelSnapshot --&gt; problems, outline, folding, views
 * </pre>
 *
 * <p>A {@link org.spanloom.ui.editor.ModelSnapshot} is immutable: what the text meant at one
 * moment. Everything that shows meaning listens to {@link org.spanloom.ui.editor.ModelSnapshots}
 * and drops what is stale. Problems of the text are annotations of the editor while it is open; the
 * builder's markers of the same kinds are not shown again there. Colouring needs no meaning: {@link
 * org.spanloom.ui.editor.ModelTokenScanner} asks the lexer line by line.
 */
package org.spanloom.ui.editor;
