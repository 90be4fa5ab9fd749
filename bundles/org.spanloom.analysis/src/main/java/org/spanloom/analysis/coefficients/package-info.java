/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */

/**
 * From the terms of a model to coefficients the solvers can evaluate.
 *
 * <pre>
 *  LinearForm --SystemCompiler--> TermGraph (equal sub-terms once, constants folded)
 *                                     | ProgramWriter (JVM byte code, one hidden class)
 *                                     v
 *  LinearSystem <-- CoefficientSystem / CoupledSystem <-- CompiledTerms
 * </pre>
 *
 * {@link org.spanloom.analysis.coefficients.TermCompiler} compiles everything else that is a
 * function of time: outputs, requirements, closed forms. What is compiled gives the same bits as
 * what is folded: both use the operations of {@link java.lang.StrictMath}.
 */
package org.spanloom.analysis.coefficients;
