package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * A pair of absolute coefficients that should be equal (Maxwell-Betti).
 *
 * @param configuration the configuration
 * @param first the first coefficient, gauge and load
 * @param second the second coefficient, gauge and load
 * @param firstValue value of the first
 * @param secondValue value of the second, its sign turned where directions are opposed
 * @param unit the SI unit
 * @param difference first less second
 * @param standardUncertainty standard uncertainty of the difference, shared gains cancelling
 *     as they should
 * @param z difference over its standard uncertainty; empty where nothing is known of it
 */
public record Reciprocity(
    String configuration,
    String first,
    String second,
    double firstValue,
    double secondValue,
    String unit,
    double difference,
    double standardUncertainty,
    OptionalDouble z) {}
