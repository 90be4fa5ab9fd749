/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.eclipse.core.resources.IContainer;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IPath;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.ProjectFile;
import org.spanloom.language.files.ProjectFiles;

/**
 * The files of a project of the workspace that a model may read, by the same rule as on the command
 * line: those below the nearest folder, from the model's own upwards, that holds a settings file,
 * else below the project. Nothing is read through a link that leads out of it.
 */
public final class WorkspaceFiles implements ProjectFiles {

  private final IContainer root;
  private final FileKey self;

  private WorkspaceFiles(IContainer root, IFile model) {
    this.root = root;
    this.self = key(model);
  }

  /** Returns the files that a model may read. */
  public static WorkspaceFiles of(IFile model) {
    IContainer folder = model.getParent();
    while (!(folder instanceof IProject)
        && !folder.getFile(IPath.fromPortableString(Settings.FILE_NAME)).exists()) {
      folder = folder.getParent();
    }
    return new WorkspaceFiles(folder, model);
  }

  private FileKey key(IResource resource) {
    return new FileKey(
        resource.getFullPath().makeRelativeTo(root.getFullPath()).toPortableString());
  }

  /** Returns the file of a key, which need not exist. */
  public IFile file(FileKey key) {
    return root.getFile(IPath.fromPortableString(key.path()));
  }

  @Override
  public FileKey self() {
    return self;
  }

  @Override
  public ProjectFile read(FileKey key) {
    IFile file = file(key);
    try {
      if (!file.exists()) {
        boolean folder = root.findMember(IPath.fromPortableString(key.path())) != null;
        return folder
            ? new ProjectFile.Unreadable("it is a folder")
            : new ProjectFile.Missing(others(file.getParent()));
      }
      if (!isInside(file)) {
        return new ProjectFile.Outside();
      }
    } catch (CoreException | IOException e) {
      return new ProjectFile.Unreadable("the system does not give it out");
    }
    return switch (ModelFile.read(file)) {
      case ModelFile.Content.Readable readable ->
          new ProjectFile.Content(readable.text().content());
      case ModelFile.Content.Unreadable unreadable when unreadable.isTooLarge() ->
          new ProjectFile.TooLarge(ModelFile.LARGEST);
      case ModelFile.Content.Unreadable unreadable -> new ProjectFile.Unreadable("it is no text");
    };
  }

  /** A file may be linked into the workspace, or stand behind a link of the file system. */
  private boolean isInside(IResource resource) throws IOException {
    if (resource.isLinked(IResource.CHECK_ANCESTORS)) {
      return false;
    }
    IPath location = resource.getLocation();
    IPath around = root.getLocation();
    return location == null
        || around == null
        || Path.of(location.toOSString())
            .toRealPath()
            .startsWith(Path.of(around.toOSString()).toRealPath());
  }

  private List<FileKey> others(IContainer folder) throws CoreException, IOException {
    List<FileKey> keys = new ArrayList<>();
    if (folder.exists() && (folder.equals(root) || isInside(folder))) {
      for (IResource member : folder.members()) {
        if (member instanceof IFile && keys.size() < ProjectFile.Missing.OTHERS_LIMIT) {
          keys.add(key(member));
        }
      }
    }
    return keys.stream().sorted().toList();
  }
}
