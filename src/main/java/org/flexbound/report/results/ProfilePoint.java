package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * A point of a profile.
 *
 * @param value stiffness or factor, in the unit of the parameter; left out where it is rigid
 * @param working the value in the working variable
 * @param rise half the rise of the sum of squares over its minimum
 */
public record ProfilePoint(
    OptionalDouble value,
    double working,
    double rise) {}
