package org.flexbound.report.results;

/**
 * What the update found of the gain of an instrument.
 *
 * @param key instrument and calibration
 * @param description for the reader
 * @param priorUncertainty standard uncertainty before, relative
 * @param fitted the gain at the estimate, relative
 * @param standardDeviation standard deviation after the data, relative
 */
public record GainEstimate(
    String key,
    String description,
    double priorUncertainty,
    double fitted,
    double standardDeviation) {}
