/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * What a model file means: names resolved, units checked, equations in linear form; immutable.
 *
 * <pre>
 *   syntax tree --ModelReader--&gt; Model = SystemModel* + Problem*
 *                                   |
 *                                   +-- Parameter, Let, StateComponent, Output
 *                                   +-- LinearForm   M(t) x' = K(t) x + f(t), entries are Terms
 *                                   +-- InitialValues, Basis, Requirement
 * </pre>
 *
 * <p>A {@link org.spanloom.language.model.Term} is an expression of time and parameters, in
 * coherent SI units, and knows nothing of the text. What is done with terms:
 *
 * <table>
 *   <caption>Classes that work on terms</caption>
 *   <tr><td>{@link org.spanloom.language.model.Simplifier}</td><td>builds them, so that structural zeros are seen</td></tr>
 *   <tr><td>{@link org.spanloom.language.model.TermEvaluator}</td><td>computes values; the reference for compiled code</td></tr>
 *   <tr><td>{@link org.spanloom.language.model.TimeDerivative}</td><td>differentiates with respect to time</td></tr>
 *   <tr><td>{@link org.spanloom.language.model.TimeDependence}</td><td>tells numbers, parameters and time apart</td></tr>
 *   <tr><td>{@link org.spanloom.language.model.TermIntervals}</td><td>encloses values over a range of times</td></tr>
 *   <tr><td>{@link org.spanloom.language.model.Definedness}</td><td>proves that there is a value at every time of I</td></tr>
 *   <tr><td>{@link org.spanloom.language.model.TermPrinter}</td><td>writes them for messages</td></tr>
 * </table>
 *
 * <p>{@code ModelReader} reads each system by a {@code SystemReader}: {@code Declarations} (names,
 * in an order in which each comes after those it uses), {@code EquationReader} and {@code
 * LinearFormBuilder} (which equation governs which state), {@code InitialValuesReader}, {@code
 * BasisReader}, {@code RequirementReader}, {@code DefinednessCheck}. Expressions get their meaning
 * from {@code Resolver} and {@code NameResolver} as a {@code Quantity}, affine in the states.
 * Whatever returns an empty Optional has reported why, so that one mistake is reported once.
 *
 * <p>All classes of the table run along one {@code TermTape}, in which a shared sub-term occurs
 * once.
 */
package org.spanloom.language.model;
