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
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;

/**
 * The nodes of a collocation mesh. Where the states jump there are two nodes at one time, and the
 * link between them is the jump instead of a step.
 *
 * @param times not decreasing, at least two
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
    TreeSet<Double> jumps = new TreeSet<>();
    for (Jump jump : system.jumps()) {
      // A jump at the start is over when the range begins.
      if (range.start() < jump.time() && jump.time() <= range.end()) {
        jumps.add(jump.time());
      }
    }
    TreeSet<Double> corners = new TreeSet<>(List.of(range.end()));
    corners.addAll(jumps);
    conditions.forEach(c -> c.samples().forEach(s -> corners.add(s.time())));
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
      if (jumps.contains(corner)) {
        times.add(corner);
      }
      before = corner;
    }
    double[] nodes = times.stream().mapToDouble(Double::doubleValue).toArray();
    TreeSet<Integer> stations = new TreeSet<>(List.of(0, nodes.length - 1));
    for (BoundaryCondition condition : conditions) {
      condition.samples().forEach(s -> stations.add(node(nodes, s.time(), s.side())));
    }
    return new BoundaryMesh(nodes, stations.stream().mapToInt(Integer::intValue).toArray());
  }

  /** Returns the node at a time: of two, the one on the side asked for. */
  private static int node(double[] times, double time, Side side) {
    // The sum makes 0 of -0, which would be looked for before it.
    int node = Arrays.binarySearch(times, time + 0.0);
    int before = node > 0 && times[node - 1] == time ? node - 1 : node;
    boolean twice = before + 1 < times.length && times[before + 1] == time;
    return twice && side == Side.AFTER ? before + 1 : before;
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

  /** Returns the number of links: steps and jumps. */
  int links() {
    return times.length - 1;
  }

  /** Tells whether a link is a jump of the states. */
  boolean isJump(int link) {
    return times[link] == times[link + 1];
  }

  /** Returns the number of the station at a time. */
  int station(double time, Side side) {
    return Arrays.binarySearch(stations, node(times, time, side));
  }

  /**
   * Returns the mesh with each step split into equal parts.
   *
   * @param parts how many, for each link, at least 1; 1 for a jump
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
    int[] parts = new int[links()];
    Arrays.setAll(parts, k -> isJump(k) ? 1 : 2);
    return split(parts);
  }
}
