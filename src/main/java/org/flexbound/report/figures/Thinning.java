package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.report.results.CurvePoint;

/** Draws fewer points where there are very many, without losing the extremes. */
final class Thinning {
  /** More points than this cannot be told apart in a plot of a few hundred pixels. */
  static final int MOST = 240;

  private Thinning() {}

  /**
   * Keeps, of each stretch of points, the first and those with the least and the largest residual,
   * and the very last point.
   */
  static List<CurvePoint> thin(List<CurvePoint> points) {
    if (points.size() <= MOST) {
      return points;
    }
    int stretches = MOST / 3;
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
