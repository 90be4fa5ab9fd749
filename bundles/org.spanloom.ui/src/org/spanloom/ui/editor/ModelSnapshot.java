/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.spanloom.language.model.Model;

/**
 * What the text of an editor meant at one moment.
 *
 * @param model the model
 * @param stamp modification stamp of the document it was read from
 */
public record ModelSnapshot(Model model, long stamp) {}
