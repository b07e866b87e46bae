package org.flexbound.report.results;

import java.util.List;

/**
 * A member of the frame model.
 *
 * @param name its name
 * @param start first node
 * @param end second node
 * @param section name of the section
 * @param startPoint x, y, z of the start of its axis, m
 * @param endPoint x, y, z of the end of its axis, m
 * @param depthAxis unit vector of its z (depth) in global axes
 * @param outline section outline as y, z pairs, m, in member axes; empty where the section is
 *     given by numbers
 */
public record Member(
    String name,
    String start,
    String end,
    String section,
    List<Double> startPoint,
    List<Double> endPoint,
    List<Double> depthAxis,
    List<List<Double>> outline) {
  /** Copies the lists. */
  public Member {
    startPoint = List.copyOf(startPoint);
    endPoint = List.copyOf(endPoint);
    depthAxis = List.copyOf(depthAxis);
    outline = List.copyOf(outline);
  }
}
