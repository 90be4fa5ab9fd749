/**
 * What can be told from which coefficients are zero, and from sums that vanish: the order in which
 * states depend on one another ({@link org.spanloom.numerics.structure.TriangularOrder}).
 */
package org.spanloom.numerics.structure;
