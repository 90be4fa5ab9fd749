/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace.tests;

import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.IProjectDescription;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.resources.IWorkspace;
import org.eclipse.core.resources.IWorkspaceDescription;
import org.eclipse.core.resources.IncrementalProjectBuilder;
import org.eclipse.core.resources.ResourcesPlugin;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IPath;
import org.spanloom.workspace.Ids;
import org.spanloom.workspace.MarkerAttributes;

/** A project of the workspace for one test; it is built only when the test says so. */
final class TestProject implements AutoCloseable {

  private final IProject project;

  TestProject(String name) throws CoreException {
    IWorkspace workspace = ResourcesPlugin.getWorkspace();
    IWorkspaceDescription settings = workspace.getDescription();
    settings.setAutoBuilding(false);
    workspace.setDescription(settings);
    project = workspace.getRoot().getProject(name);
    if (project.exists()) {
      project.delete(true, true, null);
    }
    project.create(null);
    project.open(null);
    project.setDefaultCharset(StandardCharsets.UTF_8.name(), null);
    IProjectDescription description = project.getDescription();
    description.setNatureIds(new String[] {Ids.NATURE});
    project.setDescription(description, null);
  }

  IProject project() {
    return project;
  }

  IFile file(String name) {
    return project.getFile(IPath.fromOSString(name));
  }

  IFile write(String name, String text) throws CoreException {
    return write(name, text.getBytes(StandardCharsets.UTF_8));
  }

  IFile write(String name, byte[] content) throws CoreException {
    IFile file = file(name);
    if (file.exists()) {
      file.setContents(new ByteArrayInputStream(content), true, false, null);
    } else {
      file.create(new ByteArrayInputStream(content), true, null);
    }
    return file;
  }

  void build() throws CoreException {
    project.build(IncrementalProjectBuilder.INCREMENTAL_BUILD, null);
  }

  /** Returns our markers of a type and its sub-types, in the order of the text. */
  static List<IMarker> markers(IResource resource, String type) throws CoreException {
    IMarker[] markers = resource.findMarkers(type, true, IResource.DEPTH_INFINITE);
    return Arrays.stream(markers).sorted((a, b) -> Integer.compare(line(a), line(b))).toList();
  }

  static int line(IMarker marker) {
    return marker.getAttribute(IMarker.LINE_NUMBER, 0);
  }

  /** Returns the ids of the problems of a file, in the order of the text. */
  static List<String> codes(IResource resource) throws CoreException {
    return markers(resource, Ids.PROBLEM).stream()
        .map(m -> m.getAttribute(MarkerAttributes.CODE, ""))
        .toList();
  }

  @Override
  public void close() throws CoreException {
    project.delete(true, true, null);
  }
}
