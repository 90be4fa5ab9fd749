/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import org.spanloom.numerics.internal.algebra.Flat;

/**
 * Exponentials of many small matrices of one size, with storage that is used again.
 *
 * <p>Diagonal Pad&eacute; approximants of degree 3, 5, 7, 9 and 13 with scaling and squaring; the
 * degree is chosen by the 1-norm (Higham, SIAM J. Matrix Anal. Appl. 26 (2005) 1179, table 2.3;
 * from memory). They are summed as {@code I + 2 (q - u)^-1 u} with u the odd part, so that small
 * matrices lose nothing to the identity.
 */
final class ExponentialKernel {

  private static final double[] LIMITS = {
    1.495585217958292e-2, 2.539398330063230e-1, 9.504178996162932e-1, 2.097847961257068
  };
  private static final double LARGEST = 5.371920351148152;

  private static final double[][] COEFFICIENTS = {
    {120, 60, 12, 1},
    {30240, 15120, 3360, 420, 30, 1},
    {17297280, 8648640, 1995840, 277200, 25200, 1512, 56, 1},
    {17643225600.0, 8821612800.0, 2075673600, 302702400, 30270240, 2162160, 110880, 3960, 90, 1},
  };

  private static final double[] THIRTEEN = {
    64764752532480000.0,
    32382376266240000.0,
    7771770303897600.0,
    1187353796428800.0,
    129060195264000.0,
    10559470521600.0,
    670442572800.0,
    33522128640.0,
    1323241920,
    40840800,
    960960,
    16380,
    182,
    1
  };

  private final int n;
  private final double[] a;
  private final double[] a2;
  private final double[] a4;
  private final double[] a6;
  private final double[] odd;
  private final double[] even;
  private final double[] work;

  /** Makes storage for matrices n by n. */
  ExponentialKernel(int n) {
    this.n = n;
    int size = n * n;
    a = new double[size];
    a2 = new double[size];
    a4 = new double[size];
    a6 = new double[size];
    odd = new double[size];
    even = new double[size];
    work = new double[size];
  }

  /** Returns about how many floating point operations an exponential takes. */
  double operations() {
    return 14.0 * n * n * n;
  }

  /**
   * Writes the exponential.
   *
   * @param matrix the exponent, row by row, of 1-norm {@code norm}
   * @param result receives its exponential; not {@code matrix}
   */
  void exponential(double[] matrix, double norm, double[] result) {
    int halvings = 0;
    if (norm > LARGEST) {
      halvings = (int) Math.ceil(Math.log(norm / LARGEST) / Math.log(2));
    }
    double factor = Math.scalb(1.0, -halvings);
    for (int e = 0; e < a.length; e++) {
      a[e] = matrix[e] * factor;
    }
    Flat.product(a, a, a2, n);
    int kind = 0;
    while (kind < 4 && !(norm * factor <= LIMITS[kind])) {
      kind++;
    }
    if (kind < 4) {
      low(COEFFICIENTS[kind]);
    } else {
      thirteen();
    }
    // even - odd, then 2 (even - odd)^-1 odd.
    for (int e = 0; e < a.length; e++) {
      even[e] -= odd[e];
      odd[e] *= 2;
    }
    Flat.solve(even, odd, n, n);
    System.arraycopy(odd, 0, result, 0, a.length);
    addIdentity(result, 1);
    for (int k = 0; k < halvings; k++) {
      Flat.product(result, result, work, n);
      System.arraycopy(work, 0, result, 0, a.length);
    }
  }

  private void low(double[] c) {
    for (int e = 0; e < a.length; e++) {
      work[e] = c[3] * a2[e];
      even[e] = c[2] * a2[e];
    }
    double[] power = a2;
    for (int k = 4; k < c.length; k += 2) {
      double[] next = k == 6 ? a6 : a4;
      if (k == 8) {
        Flat.product(a4, a4, odd, n);
        next = odd;
      } else {
        Flat.product(power, a2, next, n);
      }
      for (int e = 0; e < a.length; e++) {
        work[e] += c[k + 1] * next[e];
        even[e] += c[k] * next[e];
      }
      power = next;
    }
    addIdentity(work, c[1]);
    addIdentity(even, c[0]);
    Flat.product(a, work, odd, n);
  }

  private void thirteen() {
    double[] c = THIRTEEN;
    Flat.product(a2, a2, a4, n);
    Flat.product(a4, a2, a6, n);
    for (int e = 0; e < a.length; e++) {
      odd[e] = c[13] * a6[e] + c[11] * a4[e] + c[9] * a2[e];
    }
    Flat.product(a6, odd, work, n);
    for (int e = 0; e < a.length; e++) {
      work[e] += c[7] * a6[e] + c[5] * a4[e] + c[3] * a2[e];
      odd[e] = c[12] * a6[e] + c[10] * a4[e] + c[8] * a2[e];
    }
    addIdentity(work, c[1]);
    Flat.product(a6, odd, even, n);
    for (int e = 0; e < a.length; e++) {
      even[e] += c[6] * a6[e] + c[4] * a4[e] + c[2] * a2[e];
    }
    addIdentity(even, c[0]);
    Flat.product(a, work, odd, n);
  }

  private void addIdentity(double[] target, double factor) {
    for (int e = 0; e < target.length; e += n + 1) {
      target[e] += factor;
    }
  }
}
