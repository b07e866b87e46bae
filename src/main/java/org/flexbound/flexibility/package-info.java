/**
 * Flexibility matrices, measured or computed: values, covariance by source, the operator that takes
 * out base motion, reciprocity, bounds, definiteness, gain pattern and triple products, and tables of coefficients from outside.
 *
 * <p>In: slopes from the reduction, or tables. Out: {@link
 * org.flexbound.flexibility.MeasuredFlexibility}. Rows are gauges, columns are loads; a coefficient
 * is the motion at the gauge, positive along its direction, per unit of the load, positive along its
 * own; SI units.
 *
 * <ol>
 *   <li>A gauge on a load point and along its line (for a pattern: its gauges weighted by the shares)
 *       makes the load a collocated point; two such points make a reciprocal pair.
 *   <li>{@link org.flexbound.flexibility.MatrixChecks} holds the absolute coefficients, as measured and
 *       before anything is made symmetric, against what every elastic structure keeps: pairs and all
 *       of them together, bounds, definiteness, gain pattern, triple products. Each with its standard
 *       uncertainty, and with a limit that allows for how many are tried.
 *   <li>Where something is wrong, guesses are tried (a gauge reversed, two exchanged, a unit's factor, a
 *       load off its line) and told only where one is clearly better than the rest; none is applied.
 *   <li>A scale error common to everything cannot be seen by reciprocity.
 * </ol>
 */
@NullMarked
package org.flexbound.flexibility;

import org.jspecify.annotations.NullMarked;
