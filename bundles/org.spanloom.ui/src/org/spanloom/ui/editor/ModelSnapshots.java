/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.List;
import java.util.Optional;
import java.util.concurrent.CopyOnWriteArrayList;
import java.util.function.Consumer;

/** Publishes the snapshots of one editor. Listeners are called in the thread of the reconciler. */
public final class ModelSnapshots {

  private final List<Consumer<ModelSnapshot>> listeners = new CopyOnWriteArrayList<>();
  private volatile ModelSnapshot latest;

  /** Returns the latest snapshot; empty before the text was first read. */
  public Optional<ModelSnapshot> latest() {
    return Optional.ofNullable(latest);
  }

  /** Adds a listener; it is not told of the snapshot that is there. */
  public void listen(Consumer<ModelSnapshot> listener) {
    listeners.add(listener);
  }

  /** Removes a listener. */
  public void unlisten(Consumer<ModelSnapshot> listener) {
    listeners.remove(listener);
  }

  void publish(ModelSnapshot snapshot) {
    latest = snapshot;
    listeners.forEach(l -> l.accept(snapshot));
  }
}
