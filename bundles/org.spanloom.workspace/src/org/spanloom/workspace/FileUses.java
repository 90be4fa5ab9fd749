/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.Map;
import java.util.Set;
import java.util.function.BooleanSupplier;
import org.eclipse.core.resources.IFile;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;

/** Which models of a project use which other files, imports of imports included. */
final class FileUses {

  private final Map<IFile, Set<IFile>> used = new HashMap<>();

  /** Takes what a model that was read asked for, whether it was there or not. */
  void note(IFile file, WorkspaceFiles files, Model model) {
    Set<IFile> uses = new LinkedHashSet<>();
    model.files().forEach(key -> uses.add(files.file(key)));
    used.put(file, uses);
  }

  /** Forgets a file that is no more. */
  void forget(IFile file) {
    used.remove(file);
  }

  /**
   * Tells whether a model uses one of some files. A model that was not read since the workbench
   * started is read for its names.
   */
  boolean usesAny(IFile model, Set<IFile> files, BooleanSupplier cancelled) {
    if (!used.containsKey(model)
        && ModelFile.read(model) instanceof ModelFile.Content.Readable readable) {
      WorkspaceFiles around = WorkspaceFiles.of(model);
      note(model, around, ModelReader.read(readable.text(), around, cancelled));
    }
    return used.getOrDefault(model, Set.of()).stream().anyMatch(files::contains);
  }
}
