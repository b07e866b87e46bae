package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * A load cell or a transducer with its calibration.
 *
 * @param configuration the configuration whose log names it
 * @param name its name
 * @param kind what it is, in the words of the log
 * @param serial serial number, or empty
 * @param calibrationReference certificate, or empty
 * @param calibrationDate date of the calibration as written, or empty
 * @param gainUncertainty standard uncertainty (k = 1) of its gain, relative; left out where
 *     not stated
 * @param floorUncertainty standard uncertainty (k = 1) of its fixed part, SI; left out where
 *     not stated
 * @param resolution smallest step it shows, SI
 * @param range largest reading it can show, SI
 */
public record Instrument(
    String configuration,
    String name,
    String kind,
    String serial,
    String calibrationReference,
    String calibrationDate,
    OptionalDouble gainUncertainty,
    OptionalDouble floorUncertainty,
    OptionalDouble resolution,
    OptionalDouble range) {}
