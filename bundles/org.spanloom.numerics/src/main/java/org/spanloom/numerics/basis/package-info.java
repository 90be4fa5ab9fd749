/**
 * Bases of the solution space and how far each can be trusted.
 *
 * <table>
 * <caption>Questions and who answers them</caption>
 * <tr><td>How sound is a basis along the range?</td><td>{@link org.spanloom.numerics.basis.ConditionProfile}</td></tr>
 * <tr><td>Into how many windows must the range be cut so that it stays sound?</td><td>{@link org.spanloom.numerics.basis.Windows}</td></tr>
 * <tr><td>Are the columns independent, and if not, which combination vanishes?</td><td>{@link org.spanloom.numerics.basis.Independence}</td></tr>
 * <tr><td>Do closed forms solve the system?</td><td>{@link org.spanloom.numerics.basis.ClosedFormResidual}</td></tr>
 * </table>
 *
 * <p>For true solutions one time decides independence: the determinant at any other time follows
 * from it by Liouville's formula. The condition number, however, changes along the range: in a
 * dissipative system fast directions die first, and what is left of them drowns in rounding.
 */
package org.spanloom.numerics.basis;
