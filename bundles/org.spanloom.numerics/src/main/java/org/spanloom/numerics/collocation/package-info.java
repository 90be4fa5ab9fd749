/**
 * Systems whose coefficients vary in time, solved by collocation: on each step the solution is a
 * polynomial that satisfies the equations at s points. For a linear system these conditions are one
 * linear system, with one factorisation for all columns and no iteration.
 *
 * <pre>
 * CollocationTableau   points and weights of a method
 * StageSystem          the linear system of one step, factored
 * CollocationIntegrator  steps through the range: every step is also done in two halves, which gives the local error
 * CollocationSolution  what is known afterwards: values and errors at the nodes, polynomials in between on demand
 * </pre>
 *
 * <table>
 * <caption>Methods</caption>
 * <tr><th>family</th><th>points s</th><th>order</th><th>for</th></tr>
 * <tr><td>Radau IIA</td><td>3, 5, 7</td><td>2s - 1</td><td>systems with fast decaying directions</td></tr>
 * <tr><td>Gauss</td><td>3, 5, 7</td><td>2s</td><td>oscillatory systems without them</td></tr>
 * </table>
 */
package org.spanloom.numerics.collocation;
