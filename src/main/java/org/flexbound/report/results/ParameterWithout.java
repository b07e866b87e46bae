package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * A parameter's estimate without one load case.
 *
 * @param name the parameter
 * @param value its estimate at weight 1, in the parameter's unit; left out where it is rigid
 * @param shift how far it moved, in posterior standard deviations
 */
public record ParameterWithout(
    String name,
    OptionalDouble value,
    double shift) {}
