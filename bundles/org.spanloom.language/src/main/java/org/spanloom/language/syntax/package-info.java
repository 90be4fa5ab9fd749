/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * From text to a tree: lexer, statement splitter, recursive-descent parser. Never fails and knows
 * no meaning.
 *
 * <pre>
 * SourceText -> Lexer -> tokens -> StatementSplitter -> lines -> Parser -> SyntaxFile
 *                                                       (StatementParser, RequireParser, ExpressionParser)
 * </pre>
 *
 * <p>Laws: every character of a text belongs to a token or is white space; every token carries its
 * place; a statement that cannot be read has one problem and never hides the next statement; the
 * work is linear in the length of the text. A new form of statement is a record of {@link
 * org.spanloom.language.syntax.Statement}, a method with its rule in EBNF in the parser, and a case
 * in every switch the compiler then names.
 */
package org.spanloom.language.syntax;
