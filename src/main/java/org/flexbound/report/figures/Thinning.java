package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.report.results.CurvePoint;

/** Draws fewer points where there are very many, without losing the extremes. */
final class Thinning {
  /** More points than this cannot be told apart in a plot of a few hundred pixels. */
  private static final int MOST = 240;

  private static final int LEAST = 9;

  /** Points of all plots of a report together, so that its page stays small enough to send. */
  private static final int BUDGET = 24_000;

  private final int most;

  /**
   * Thins for so many series of points.
   *
   * @param series how many series the report draws
   */
  Thinning(int series) {
    most = Math.max(LEAST, Math.min(MOST, BUDGET / Math.max(1, series)));
  }

  /**
   * Keeps, of each stretch of points, the first and those with the least and the largest residual,
   * and the very last point.
   */
  List<CurvePoint> thin(List<CurvePoint> points) {
    if (points.size() <= most) {
      return points;
    }
    int stretches = most / 3;
    List<CurvePoint> kept = new ArrayList<>();
    for (int stretch = 0; stretch < stretches; stretch++) {
      int from = (int) ((long) stretch * points.size() / stretches);
      int to = (int) ((long) (stretch + 1) * points.size() / stretches);
      int least = from;
      int largest = from;
      for (int k = from; k < to; k++) {
        if (points.get(k).residual() < points.get(least).residual()) {
          least = k;
        }
        if (points.get(k).residual() > points.get(largest).residual()) {
          largest = k;
        }
      }
      for (int k = from; k < to; k++) {
        if (k == from || k == least || k == largest || k == points.size() - 1) {
          kept.add(points.get(k));
        }
      }
    }
    return kept;
  }
}
