package org.flexbound.report.results;

/**
 * A held-out coefficient against its prediction.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param measured the measured coefficient
 * @param predicted what the reading should have been
 * @param standardUncertainty standard uncertainty of the difference
 * @param lower95 lower end of the 95 % prediction interval
 * @param upper95 upper end of it
 * @param z measured less predicted, over the standard uncertainty
 * @param within whether it lies within the 95 % interval
 * @param unit the SI unit
 */
public record Validation(
    String configuration,
    String gauge,
    String load,
    double measured,
    double predicted,
    double standardUncertainty,
    double lower95,
    double upper95,
    double z,
    boolean within,
    String unit) {}
