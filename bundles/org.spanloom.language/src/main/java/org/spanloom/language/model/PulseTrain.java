/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/**
 * A train of pulses without beginning or end: 1 from {@code start + k period} up to, but not at,
 * {@code start + k period + width} for every whole k, else 0.
 *
 * <p>The edges are numbers, rounded as written here, and the value changes exactly at them.
 *
 * @param period time from one pulse to the next, in coherent SI units
 * @param width how long a pulse lasts, in coherent SI units, not more than the period
 * @param start when one of the pulses begins, in coherent SI units
 */
public record PulseTrain(double period, double width, double start) implements Curve {

  /** The name of the built-in function. */
  public static final String NAME = "pulse";

  /** What it is, in a few words. */
  public static final String MEANING = "1 for a while in every period, else 0";

  /** Tells whether the numbers make a train of pulses. */
  public boolean isSound() {
    return period > 0
        && width > 0
        && width <= period
        && Double.isFinite(period)
        && Double.isFinite(start);
  }

  /** Returns when a pulse begins. */
  public double rise(double k) {
    return start + k * period;
  }

  /** Returns when a pulse ends. */
  public double fall(double k) {
    return rise(k) + width;
  }

  /** Returns the number of the last pulse that has begun at a time. */
  double pulseAt(double time) {
    double k = Math.floor((time - start) / period);
    while (rise(k + 1) <= time && rise(k + 1) > rise(k)) {
      k++;
    }
    while (rise(k) > time && rise(k - 1) < rise(k)) {
      k--;
    }
    return k;
  }

  /** Returns 1 or 0; not a number where the numbers make no train of pulses. */
  @Override
  public double at(double time) {
    if (!isSound() || !Double.isFinite(time)) {
      return Double.NaN;
    }
    return time < fall(pulseAt(time)) ? 1 : 0;
  }

  /** Encloses the values over a range of times. */
  Interval over(Interval times) {
    if (times.isEmpty()) {
      return Interval.EMPTY;
    }
    if (!isSound() || !times.isBounded()) {
      return new Interval(0, 1);
    }
    double k = pulseAt(times.low());
    boolean up = times.high() < fall(k);
    boolean down = times.low() >= fall(k) && times.high() < rise(k + 1);
    return up ? Interval.at(1) : down ? Interval.at(0) : new Interval(0, 1);
  }
}
