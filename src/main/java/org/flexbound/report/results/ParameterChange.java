package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * How a parameter changed between two tests.
 *
 * @param name its name
 * @param factor stiffness now over stiffness then; left out where it was rigid or free
 */
public record ParameterChange(
    String name,
    OptionalDouble factor) {}
