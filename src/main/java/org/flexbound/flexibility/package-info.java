/**
 * Flexibility matrices, measured or computed: values, covariance by source, the operator that takes
 * out base motion, reciprocity and definiteness, and tables of coefficients from outside.
 *
 * <p>In: slopes from the reduction, or tables. Out: {@link
 * org.flexbound.flexibility.MeasuredFlexibility}. Rows are gauges, columns are loads; a coefficient
 * is the motion at the gauge, positive along its direction, per unit of the load, positive along its
 * own; SI units.
 */
@NullMarked
package org.flexbound.flexibility;

import org.jspecify.annotations.NullMarked;
