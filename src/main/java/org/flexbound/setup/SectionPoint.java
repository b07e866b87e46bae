package org.flexbound.setup;

/**
 * A point of a member's cross-section, from the centroid, in member axes.
 *
 * @param y along the member's y (width), m
 * @param z along the member's z (depth), m
 */
public record SectionPoint(double y, double z) {}
