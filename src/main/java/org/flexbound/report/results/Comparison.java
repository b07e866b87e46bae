package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * A measured coefficient against the computed one, before and after the update.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param measured the measured coefficient
 * @param standardUncertainty standard uncertainty of the measured coefficient
 * @param computed computed with the nominal model
 * @param ratio measured over computed; left out where the computed one is nought
 * @param z measured less computed, over the standard uncertainty
 * @param updated computed with the updated model
 * @param updatedRatio measured over updated
 * @param updatedZ measured less updated, over the standard uncertainty
 * @param heldOut true where the load case was kept for validation
 * @param full computed with all modes, where the comparison is with the lowest modes only
 * @param modesWithin10 from how many modes on the error stays within 10 % of full; left out where
 *     more are needed than were worked out
 * @param modesWithin5 the same for 5 %
 * @param modesWithin1 the same for 1 %
 * @param massless the part of full that no number of modes makes up, for freedoms without mass
 * @param measuredModes what the table of measured modes makes it
 * @param unit the SI unit
 */
public record Comparison(
    String configuration,
    String gauge,
    String load,
    double measured,
    double standardUncertainty,
    double computed,
    OptionalDouble ratio,
    double z,
    OptionalDouble updated,
    OptionalDouble updatedRatio,
    OptionalDouble updatedZ,
    boolean heldOut,
    OptionalDouble full,
    OptionalDouble modesWithin10,
    OptionalDouble modesWithin5,
    OptionalDouble modesWithin1,
    OptionalDouble massless,
    OptionalDouble measuredModes,
    String unit) {}
