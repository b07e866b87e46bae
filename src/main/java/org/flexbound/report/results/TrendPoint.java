package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * One value of a history.
 *
 * @param test the test
 * @param date its date
 * @param value the value, SI
 * @param standardUncertainty its standard uncertainty; left out where not known
 * @param range distance to the value before; left out for the first
 * @param baseline whether it is one of the baseline
 * @param outside whether it lies outside of the limits
 * @param jump whether its moving range is past its limit
 */
public record TrendPoint(
    String test,
    String date,
    double value,
    OptionalDouble standardUncertainty,
    OptionalDouble range,
    boolean baseline,
    boolean outside,
    boolean jump) {}
