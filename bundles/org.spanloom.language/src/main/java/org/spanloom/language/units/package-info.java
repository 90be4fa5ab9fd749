/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * Units and dimensions. {@link org.spanloom.language.units.UnitReader} turns a UCUM code into a
 * {@link org.spanloom.language.units.UnitOfMeasure}: its {@link
 * org.spanloom.language.units.Dimension}, its size in coherent SI units and, for temperature
 * scales, its zero. {@link org.spanloom.language.units.UnitNames} goes the other way, from a
 * dimension to a code that people know.
 *
 * <p>A code is read by {@code UcumParser} along the grammar of the standard; its symbols are
 * defined in {@code UcumAtoms} in terms of each other, as in the tables of the standard, and
 * resolved as exact fractions. The whole package loads in a few milliseconds, which the command
 * line needs.
 */
package org.spanloom.language.units;
