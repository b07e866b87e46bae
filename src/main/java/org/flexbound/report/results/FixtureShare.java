package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * How much of one gauge's motion is that of the base and the fixture.
 *
 * @param configuration the configuration
 * @param gauge the gauge, which measures the article from the ground
 * @param load the load
 * @param unit the SI unit of the coefficients
 * @param total the coefficient as read
 * @param totalUncertainty its standard uncertainty
 * @param own the article's own coefficient: base and fixture taken out
 * @param ownUncertainty its standard uncertainty: what taking them out costs
 * @param share base and fixture over total; left out where the total is nothing against its
 *     uncertainty
 * @param shareUncertainty standard uncertainty of the share
 */
public record FixtureShare(
    String configuration,
    String gauge,
    String load,
    String unit,
    double total,
    double totalUncertainty,
    double own,
    double ownUncertainty,
    OptionalDouble share,
    OptionalDouble shareUncertainty) {}
