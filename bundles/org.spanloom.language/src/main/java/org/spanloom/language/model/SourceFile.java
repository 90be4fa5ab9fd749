/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Map;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.text.SourceText;

/**
 * A file whose statements are read.
 *
 * @param key which file of the project it is
 * @param text its text
 * @param systems the systems that its statements can name, its own and those imported
 * @param files the other files of the project
 * @param matrices what matrices may cost, shared by all files of a model
 * @param repetition what loops and sums may repeat, shared by all files of a model
 * @param tables what tables may read from files, shared by all files of a model
 */
record SourceFile(
    FileKey key,
    SourceText text,
    Map<String, SystemType> systems,
    FileAccess files,
    MatrixBudget matrices,
    RepetitionBudget repetition,
    TableBudget tables) {}
