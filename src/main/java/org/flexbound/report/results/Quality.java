package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * A quality figure of a coefficient.
 *
 * @param name what it is
 * @param value its value, a pure number (shares, not per cent)
 * @param limit the value it should not pass
 * @param passed whether it is within its limit; true where there is none
 */
public record Quality(
    String name,
    double value,
    OptionalDouble limit,
    boolean passed) {}
