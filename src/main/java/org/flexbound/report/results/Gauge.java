package org.flexbound.report.results;

import java.util.Optional;

/**
 * A gauge: one row of the flexibility matrix.
 *
 * @param configuration the configuration
 * @param name its name
 * @param kind displacement, rotation, relative or strain
 * @param point where and in which direction it reads
 * @param second the second place of a relative gauge
 * @param measures article, fixture or ground
 * @param standsOn article, fixture or ground
 * @param base true where its motion is part of the base motion that is taken out of the others
 * @param instrument the instrument that reads it, or empty
 * @param remark the remark of the log
 */
public record Gauge(
    String configuration,
    String name,
    String kind,
    Point point,
    Optional<Point> second,
    String measures,
    String standsOn,
    boolean base,
    String instrument,
    String remark) {}
