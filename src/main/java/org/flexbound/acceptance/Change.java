package org.flexbound.acceptance;

/**
 * How one coefficient changed between two tests.
 *
 * @param now the coefficient today
 * @param before its value in the earlier test, SI
 * @param difference now less before
 * @param standardUncertainty of the difference, shared calibration cancelling
 * @param degreesOfFreedom effective ones of the difference
 * @param probability of so large a difference by chance, this coefficient alone
 * @param adjusted the same, all coefficients allowed for (Holm 1979)
 * @param significant whether the adjusted probability is below the level
 */
public record Change(
    KeptTest.Value now,
    double before,
    double difference,
    double standardUncertainty,
    double degreesOfFreedom,
    double probability,
    double adjusted,
    boolean significant) {}
