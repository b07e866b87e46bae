/**
 * Measured against computed flexibility, configuration by configuration.
 *
 * <p>In: {@link org.flexbound.flexibility.MeasuredFlexibility} and, for each of its absolute
 * coefficients, the model's. Out: {@link org.flexbound.compare.Comparison}: ratio, difference and z
 * of every coefficient that is compared, with what each part of the structure contributes to it. SI
 * units; a coefficient is positive where gauge and load agree in sign.
 *
 * <ol>
 *   <li>The measured map (base motion taken out, repeats averaged) is applied to the model's
 *       absolute coefficients.
 *   <li>The covariance of the differences is that of scatter and floors, plus one rank-one term for
 *       each gain, rebuilt from the model's coefficients (building it from measured ones would bias
 *       every sum of squares: Peelle's effect).
 *   <li>z = (measured − computed)/u.
 * </ol>
 */
@NullMarked
package org.flexbound.compare;

import org.jspecify.annotations.NullMarked;
