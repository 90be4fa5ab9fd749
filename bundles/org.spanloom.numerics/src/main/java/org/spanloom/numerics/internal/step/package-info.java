/**
 * What all methods that step share: how errors are weighed, how rounding errors are signed, and
 * where steps have to end.
 */
package org.spanloom.numerics.internal.step;
