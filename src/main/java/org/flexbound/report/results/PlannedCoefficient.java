package org.flexbound.report.results;

/**
 * A coefficient that a planned test would measure.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param expected what the nominal model expects, SI
 * @param standardUncertainty the standard uncertainty that it would have, SI
 * @param motion the motion expected at the largest load, base motion taken out, SI
 * @param unit the SI unit of the coefficient
 */
public record PlannedCoefficient(
    String configuration,
    String gauge,
    String load,
    double expected,
    double standardUncertainty,
    double motion,
    String unit) {}
