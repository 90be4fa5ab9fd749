/**
 * Systems whose coefficients vary slowly while their solutions turn fast: on each step the solution
 * is the exponential of one matrix, which commutators of A build.
 */
package org.spanloom.numerics.magnus;
