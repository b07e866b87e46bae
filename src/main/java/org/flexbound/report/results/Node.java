package org.flexbound.report.results;

/**
 * A node of the frame model.
 *
 * @param name its name
 * @param x m
 * @param y m
 * @param z m
 */
public record Node(
    String name,
    double x,
    double y,
    double z) {}
