package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * A test of several quantities together.
 *
 * @param configuration the configuration
 * @param name what was tested
 * @param statistic the statistic
 * @param limit the value it should not pass
 * @param degreesOfFreedom its degrees of freedom
 * @param pValue the probability of a value as large by chance
 * @param passed whether it is within its limit
 * @param remark what it means
 */
public record JointTest(
    String configuration,
    String name,
    double statistic,
    OptionalDouble limit,
    OptionalDouble degreesOfFreedom,
    OptionalDouble pValue,
    boolean passed,
    String remark) {}
