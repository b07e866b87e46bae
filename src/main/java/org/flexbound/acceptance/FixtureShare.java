package org.flexbound.acceptance;

/**
 * How much of one gauge's motion under one load is that of the base and the fixture.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param total the coefficient as read, SI
 * @param totalUncertainty its standard uncertainty
 * @param own the article's own coefficient: base and fixture taken out
 * @param ownUncertainty its standard uncertainty, which is what taking them out costs
 * @param share base and fixture over total, signed; NaN where the total is nothing against its
 *     uncertainty
 * @param shareUncertainty standard uncertainty of the share
 */
public record FixtureShare(
    String configuration,
    String gauge,
    String load,
    double total,
    double totalUncertainty,
    double own,
    double ownUncertainty,
    double share,
    double shareUncertainty) {}
