/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.files.FileKey;
import org.spanloom.language.text.SourceText;

/**
 * A file whose statements are read.
 *
 * @param key which file of the project it is
 * @param text its text
 * @param files the other files of the project
 */
record SourceFile(FileKey key, SourceText text, FileAccess files) {}
