/**
 * How the inner loops stop: a cancelled or hopeless computation leaves them by one of two signals,
 * which the doors of the numerics turn into an {@link org.spanloom.numerics.Outcome}.
 */
package org.spanloom.numerics.internal.work;
