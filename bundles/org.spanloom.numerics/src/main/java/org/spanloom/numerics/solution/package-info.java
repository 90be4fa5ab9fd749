/**
 * Solutions of a linear system: a {@link org.spanloom.numerics.solution.Solution} is known at every
 * time of its range and knows its error; {@link org.spanloom.numerics.solution.SolutionSolver}
 * finds one by the method that {@link org.spanloom.numerics.solution.MethodChoice} picks for the
 * system.
 */
package org.spanloom.numerics.solution;
