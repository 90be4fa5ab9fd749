/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui;

import org.eclipse.jface.resource.ImageDescriptor;
import org.eclipse.jface.resource.ImageRegistry;
import org.eclipse.jface.resource.JFaceResources;
import org.eclipse.jface.resource.ResourceLocator;
import org.eclipse.swt.graphics.Image;
import org.spanloom.language.editing.OutlineNode;

/** The small pictures of this bundle, in the folder {@code icons}. */
public enum Icon {
  /** A model file. */
  MODEL("model"),
  /** A system. */
  SYSTEM("system"),
  /** A constant. */
  CONSTANT("constant"),
  /** A named expression. */
  FUNCTION("function"),
  /** A matrix. */
  MATRIX("matrix"),
  /** A state. */
  STATE("state"),
  /** An output. */
  OUTPUT("output"),
  /** An equation. */
  EQUATION("equation"),
  /** Initial values. */
  INITIAL("initial"),
  /** A basis. */
  BASIS("basis"),
  /** A requirement. */
  REQUIREMENT("requirement"),
  /** Anything else. */
  OTHER("other"),
  /** A curve. */
  SOLUTION("solution"),
  /** Write a table to a file. */
  EXPORT_TABLE("exporttable"),
  /** Write a picture to a file. */
  EXPORT_IMAGE("exportimage"),
  /** Show the whole curve. */
  WHOLE("whole"),
  /** Go back to the part shown before. */
  BACK("back"),
  /** A new project, large. */
  NEW_PROJECT_BANNER("newproject"),
  /** A new model, large. */
  NEW_MODEL_BANNER("newmodel");

  private final String path;

  Icon(String name) {
    this.path = "icons/" + name + ".svg";
  }

  /** Returns the picture's description. */
  public ImageDescriptor descriptor() {
    return ResourceLocator.imageDescriptorFromBundle(UiIds.BUNDLE, path)
        .orElseGet(ImageDescriptor::getMissingImageDescriptor);
  }

  /** Returns the picture; it is shared and must not be disposed. */
  public Image image() {
    ImageRegistry registry = JFaceResources.getImageRegistry();
    String key = UiIds.BUNDLE + "/" + path;
    if (registry.getDescriptor(key) == null) {
      registry.put(key, descriptor());
    }
    return registry.get(key);
  }

  /** Returns the picture of a node of an outline. */
  public static Icon of(OutlineNode.Kind kind) {
    return switch (kind) {
      case SYSTEM -> SYSTEM;
      case PARAMETER -> CONSTANT;
      case LET -> FUNCTION;
      case MATRIX -> MATRIX;
      case PART, IMPORT -> SYSTEM;
      case STATE -> STATE;
      case OUTPUT -> OUTPUT;
      case EQUATION, JUMP -> EQUATION;
      case INITIAL_VALUES, BOUNDARY -> INITIAL;
      case BASIS -> BASIS;
      case REQUIREMENT -> REQUIREMENT;
      case ACCURACY, LOOP, UNREAD -> OTHER;
    };
  }
}
