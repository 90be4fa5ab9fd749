/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.eclipse.core.filebuffers.FileBuffers;
import org.eclipse.core.filebuffers.ITextFileBuffer;
import org.eclipse.core.filebuffers.LocationKind;
import org.eclipse.core.resources.IFile;
import org.eclipse.ui.ide.ResourceUtil;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.ProjectFile;
import org.spanloom.language.files.ProjectFiles;
import org.spanloom.workspace.WorkspaceFiles;

/** The files of a project as a person sees them: what is open in an editor wins over the disk. */
final class EditorFiles implements ProjectFiles {

  private final WorkspaceFiles files;

  private EditorFiles(WorkspaceFiles files) {
    this.files = files;
  }

  /** Returns the files that the model in an editor may read; none if it is in no project. */
  static ProjectFiles of(ModelEditor editor) {
    IFile file = ResourceUtil.getFile(editor.getEditorInput());
    return file == null ? ProjectFiles.none() : new EditorFiles(WorkspaceFiles.of(file));
  }

  @Override
  public FileKey self() {
    return files.self();
  }

  @Override
  public ProjectFile read(FileKey key) {
    ProjectFile found = files.read(key);
    ITextFileBuffer buffer =
        FileBuffers.getTextFileBufferManager()
            .getTextFileBuffer(files.file(key).getFullPath(), LocationKind.IFILE);
    return found instanceof ProjectFile.Content && buffer != null && buffer.isDirty()
        ? new ProjectFile.Content(buffer.getDocument().get())
        : found;
  }
}
