package org.flexbound.report.results;

import java.util.OptionalDouble;

/**
 * A coefficient against a bound that every elastic structure keeps.
 *
 * @param name the coefficient, gauge and load
 * @param direct true for a direct coefficient against zero, false for a cross coefficient against the
 *     geometric mean of the two direct ones
 * @param ratio the direct coefficient (SI), or the cross coefficient over the geometric mean
 * @param z how far on the wrong side, in standard uncertainties; negative where the bound is kept
 * @param limit what z may be by chance
 * @param passed whether it is within its limit
 */
public record BoundCheck(
    String name, boolean direct, double ratio, OptionalDouble z, double limit, boolean passed) {}
