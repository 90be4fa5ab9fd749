/**
 * Systems with constant coefficients, solved by the exponential of their matrix.
 *
 * <p>{@link org.spanloom.numerics.exponential.PadeApproximant} gives e^A for a matrix of moderate
 * norm and says how often a larger one must be halved; {@link
 * org.spanloom.numerics.exponential.PropagatorLadder} squares its way up and keeps every rung, so
 * that e^(At) X costs products with X only at any t; {@link
 * org.spanloom.numerics.exponential.ExponentialSolution} climbs two ladders of unrelated step sizes
 * and takes their disagreement as the measure of its error.
 */
package org.spanloom.numerics.exponential;
