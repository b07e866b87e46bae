package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * What reciprocal pairs say of the scale of one point's gauge and load.
 *
 * @param gauge the gauge at the point
 * @param load the load at the point
 * @param factor how many times too much the gauge reads, or too little the load, against the other
 *     points
 * @param logRatio natural logarithm of the factor
 * @param standardUncertainty standard uncertainty of the logarithm, calibration included
 * @param z the logarithm over its standard uncertainty
 * @param limit what |z| may be by chance
 * @param suspect whether this point explains the pairs by itself, clearly better than any other
 */
public record PointGain(
    String gauge,
    String load,
    double factor,
    double logRatio,
    double standardUncertainty,
    OptionalDouble z,
    double limit,
    boolean suspect) {}
