/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Supplier;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.text.Span;

/** Collects what is found while a model is resolved, up to a limit. */
final class Problems {

  /** Most problems listed for one text. */
  static final int LIMIT = 1000;

  /**
   * Most problems for which a similar name is looked for; bounds the work for files with many
   * names.
   */
  private static final int SUGGESTIONS = 200;

  /** Most turns that are counted in which a repeated statement is wrong. */
  private static final int COUNT_LIMIT = 1000;

  private final List<Problem> found = new ArrayList<>();
  private final IndexStack indices = new IndexStack();
  private final Map<Object, Tally> tallies = new IdentityHashMap<>();
  private final List<Tally> openTallies = new ArrayList<>();
  private final Map<Integer, String> turnOf = new HashMap<>();
  private boolean counting;
  private boolean muted;
  private boolean failed;
  private boolean cut;
  private int suggestions;

  /** What was found in a repeated statement. */
  private static final class Tally {
    private final int from;
    private final int to;
    private int furtherTurns;
    private boolean closed;

    /** Counts problems of the turn in which there were some first. */
    Tally(int from, int to) {
      this.from = from;
      this.to = to;
    }
  }

  /** Returns the indices of the loops and sums that are being gone through. */
  IndexStack indices() {
    return indices;
  }

  void report(ProblemKind kind, Span span, String message, Fix... fixes) {
    failed = true;
    if (muted) {
      return;
    }
    if (isFull()) {
      cut = true;
    } else if (indices.isEmpty()) {
      found.add(new Problem(kind, span, message, List.of(fixes)));
    } else if (counting) {
      turnOf.put(found.size(), indices.text());
      found.add(new Problem(kind, span, message, List.of(fixes)));
    } else {
      String text = message + " (In turn " + indices.text() + ".)";
      found.add(new Problem(kind, span, text, List.of(fixes)));
    }
  }

  /** Reports something that has nothing to do with the turn in which it is found. */
  void reportForAllTurns(ProblemKind kind, Span span, String message) {
    if (!muted && !isFull()) {
      found.add(new Problem(kind, span, message, List.of()));
    }
    cut |= isFull();
  }

  /** Does something and drops the problems it reports. */
  <T> T quietly(Supplier<T> work) {
    boolean outerMuted = muted;
    boolean outerFailed = failed;
    muted = true;
    T result = work.get();
    muted = outerMuted;
    failed = outerFailed;
    return result;
  }

  /**
   * Reads something that is repeated, in one turn. What is wrong with it is reported once, for the
   * first turn in which it is; further ones are counted.
   *
   * @param repeated what is read, the same object in every turn
   */
  void inTurn(Object repeated, Runnable reading) {
    Tally known = tallies.isEmpty() ? null : tallies.get(repeated);
    if (known != null && known.furtherTurns > COUNT_LIMIT) {
      return;
    }
    boolean outerFailed = failed;
    boolean outerMuted = muted;
    boolean outerCounting = counting;
    int from = found.size();
    failed = false;
    muted |= known != null;
    counting = true;
    reading.run();
    if (failed && known == null) {
      Tally tally = new Tally(from, found.size());
      tallies.put(repeated, tally);
      openTallies.add(tally);
    } else if (failed && !known.closed) {
      known.furtherTurns++;
    }
    failed |= outerFailed;
    muted = outerMuted;
    counting = outerCounting;
  }

  /** Ends the counting of turns: says in each problem found in a loop in which turns it is so. */
  void closeTurns() {
    for (Tally tally : openTallies) {
      for (int i = tally.from; i < tally.to; i++) {
        Problem problem = found.get(i);
        String turn = turnOf.getOrDefault(i, "");
        String more =
            tally.furtherTurns > COUNT_LIMIT ? COUNT_LIMIT + " or" : "" + tally.furtherTurns;
        String where =
            " (In turn " + turn + (tally.furtherTurns == 0 ? "" : " and " + more + " more") + ".)";
        if (!turn.isEmpty()) {
          found.set(
              i,
              new Problem(
                  problem.kind(), problem.span(), problem.message() + where, problem.fixes()));
        }
        turnOf.remove(i);
      }
      tally.closed = true;
    }
    openTallies.clear();
  }

  /** Tells whether further problems are dropped, so that costly suggestions can be left out. */
  boolean isFull() {
    return found.size() >= LIMIT;
  }

  /**
   * Tells whether a name may still be looked for that someone may have meant; each look goes
   * through all names.
   */
  boolean maySuggest() {
    return !isFull() && ++suggestions <= SUGGESTIONS;
  }

  /**
   * Returns these problems and others in the order of the text, at most {@link #LIMIT} and a last
   * one that says so.
   */
  List<Problem> inTextOrder(List<Problem> others) {
    List<Problem> all = new ArrayList<>(others);
    all.addAll(found);
    all.sort(
        Comparator.<Problem>comparingInt(p -> p.span().start())
            .thenComparingInt(p -> p.span().end()));
    if (all.size() <= LIMIT && !cut) {
      return all;
    }
    int kept = Math.min(LIMIT, all.size());
    List<Problem> first = new ArrayList<>(all.subList(0, kept));
    first.add(
        new Problem(
            ProblemKind.TOO_MANY_PROBLEMS,
            first.getLast().span(),
            "There are more than " + LIMIT + " problems; the rest is not listed: mend these first.",
            List.of()));
    return first;
  }
}
