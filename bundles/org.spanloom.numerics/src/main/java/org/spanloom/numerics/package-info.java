/**
 * Linear systems {@code x' = A(t) x + b(t)} as numbers, and what can be computed from them.
 *
 * <pre>
 * LinearSystem --> solution.SolutionSolver --> Outcome of Solution
 *                     |   exponential: constant coefficients
 *                     |   collocation: varying coefficients
 *                     v
 *                  basis: conditioning along the range, windows, independence, closed forms checked
 *                  spectrum: eigenvalues with their conditioning; conserved quantities
 * </pre>
 *
 * <p>Nothing here knows where the numbers come from. Nothing here throws for a system that is hard:
 * an {@link org.spanloom.numerics.Outcome} says what came of it. The same input gives the same bits
 * in every run.
 */
package org.spanloom.numerics;
