/**
 * Dense kernels that the methods lean on. Matrices are rows, {@code double[n][m]}: the inner loops
 * run along rows at equal indices, which the virtual machine turns into vector instructions. They
 * are our own where the general libraries offer no cancellation inside a factorisation or no right
 * sides side by side; singular values and eigenvalues come from EJML.
 */
package org.spanloom.numerics.internal.algebra;
