/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.TreeSet;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.TimeRange;

/**
 * The nodes of a collocation mesh.
 *
 * @param times increasing, at least two
 * @param stations the nodes that conditions name, with both ends; increasing
 */
record BoundaryMesh(double[] times, int[] stations) {

  /**
   * Returns a first mesh: fine at the ends, at conditions and at breakpoints, where layers of fast
   * directions stand, and doubling its steps away from them.
   *
   * @param system the system
   * @param range bounded, of positive length
   * @param conditions what is asked; their times lie in the range
   * @param speed about the rate of the fastest direction, in 1/time
   */
  static BoundaryMesh first(
      LinearSystem system, TimeRange range, List<BoundaryCondition> conditions, double speed) {
    TreeSet<Double> named = new TreeSet<>(List.of(range.start(), range.end()));
    conditions.forEach(c -> c.samples().forEach(s -> named.add(s.time())));
    TreeSet<Double> corners = new TreeSet<>(named);
    for (double t : system.breakpoints()) {
      if (range.start() < t && t < range.end()) {
        corners.add(t);
      }
    }
    List<Double> times = new ArrayList<>();
    double before = range.start();
    times.add(before);
    for (double corner : corners.tailSet(range.start(), false)) {
      addGraded(times, before, corner, range.length(), speed);
      before = corner;
    }
    return of(times.stream().mapToDouble(Double::doubleValue).toArray(), named);
  }

  private static void addGraded(
      List<Double> times, double from, double to, double whole, double speed) {
    double half = (to - from) / 2;
    double widest = Math.max(whole / 12, (to - from) * 1e-3);
    double step = Math.min(Math.max(1 / speed, (to - from) * 1e-9), widest);
    List<Double> offsets = new ArrayList<>();
    double offset = step;
    while (offset < 0.75 * half) {
      offsets.add(offset);
      step = Math.min(2 * step, widest);
      offset += step;
    }
    offsets.forEach(o -> times.add(from + o));
    times.add(from + half);
    for (int k = offsets.size() - 1; k >= 0; k--) {
      times.add(to - offsets.get(k));
    }
    times.add(to);
  }

  private static BoundaryMesh of(double[] times, TreeSet<Double> named) {
    int[] stations = named.stream().mapToInt(t -> Arrays.binarySearch(times, t)).toArray();
    return new BoundaryMesh(times, stations);
  }

  /** Returns the number of steps. */
  int steps() {
    return times.length - 1;
  }

  /** Returns the number of the station at a time. */
  int station(double time) {
    int node = Arrays.binarySearch(times, time);
    return Arrays.binarySearch(stations, node);
  }

  /**
   * Returns the mesh with each step split into equal parts.
   *
   * @param parts how many, for each step, at least 1
   */
  BoundaryMesh split(int[] parts) {
    int count = Arrays.stream(parts).sum();
    double[] finer = new double[count + 1];
    int[] places = new int[times.length];
    int next = 0;
    for (int k = 0; k < parts.length; k++) {
      places[k] = next;
      for (int i = 0; i < parts[k]; i++) {
        finer[next++] = i == 0 ? times[k] : times[k] + (times[k + 1] - times[k]) * i / parts[k];
      }
    }
    places[parts.length] = next;
    finer[next] = times[parts.length];
    int[] moved = Arrays.stream(stations).map(s -> places[s]).toArray();
    return new BoundaryMesh(finer, moved);
  }

  /** Returns the mesh with each step halved. */
  BoundaryMesh halved() {
    int[] two = new int[steps()];
    Arrays.fill(two, 2);
    return split(two);
  }
}
