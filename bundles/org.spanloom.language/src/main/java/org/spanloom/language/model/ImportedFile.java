/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.files.FileKey;
import org.spanloom.language.syntax.SyntaxFile;

/**
 * A file that a model imports itself.
 *
 * @param key which file of the project it is
 * @param syntax its tree
 */
public record ImportedFile(FileKey key, SyntaxFile syntax) {}
