package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * How one coefficient changed between two tests.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param unit the SI unit
 * @param before its value in the earlier test
 * @param now its value in this test
 * @param difference now less before
 * @param standardUncertainty of the difference, shared calibration cancelling
 * @param degreesOfFreedom effective degrees of freedom; left out where infinite
 * @param probability of so large a difference by chance, this coefficient alone
 * @param adjusted the same with all coefficients allowed for (Holm)
 * @param significant whether it changed beyond chance
 */
public record CoefficientChange(
    String configuration,
    String gauge,
    String load,
    String unit,
    double before,
    double now,
    double difference,
    double standardUncertainty,
    OptionalDouble degreesOfFreedom,
    double probability,
    double adjusted,
    boolean significant) {}
