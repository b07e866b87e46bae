package org.flexbound.report.figures;

import java.util.List;

/**
 * A parallel projection of points in space onto the page: turned by an azimuth about the vertical,
 * then looked down upon by an elevation, then scaled to fit.
 */
final class Projection {
  /** A view from the front right, from above, in which the three axes stay apart. */
  static final double AZIMUTH = Math.toRadians(-52);

  static final double ELEVATION = Math.toRadians(22);

  private final double[][] basis;
  private double scale = 1;
  private double shiftX;
  private double shiftY;

  /** A projection in which {@code up} points to the top of the page. */
  Projection(List<Double> up) {
    double[] w = unit(up.stream().mapToDouble(Double::doubleValue).toArray());
    double[] other = Math.abs(w[0]) < 0.9 ? new double[] {1, 0, 0} : new double[] {0, 1, 0};
    double along = dot(other, w);
    double[] u =
        unit(
            new double[] {
              other[0] - along * w[0], other[1] - along * w[1], other[2] - along * w[2]
            });
    double[] v = {
      w[1] * u[2] - w[2] * u[1], w[2] * u[0] - w[0] * u[2], w[0] * u[1] - w[1] * u[0]
    };
    basis = new double[][] {u, v, w};
  }

  private static double dot(double[] a, double[] b) {
    return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
  }

  private static double[] unit(double[] a) {
    double norm = Math.sqrt(dot(a, a));
    return new double[] {a[0] / norm, a[1] / norm, a[2] / norm};
  }

  /** Coordinates in the frame of the view: two level ones and one up. */
  double[] level(double[] point) {
    return new double[] {dot(point, basis[0]), dot(point, basis[1]), dot(point, basis[2])};
  }

  private double[] turned(double[] point) {
    double[] p = level(point);
    double c = Math.cos(AZIMUTH);
    double s = Math.sin(AZIMUTH);
    double right = c * p[0] - s * p[1];
    double depth = s * p[0] + c * p[1];
    return new double[] {
      right, -(p[2] * Math.cos(ELEVATION) + depth * Math.sin(ELEVATION))
    };
  }

  /** Chooses scale and place so that all points come to lie in a rectangle of the page. */
  void fit(List<double[]> points, double width, double height, double margin) {
    double left = Double.POSITIVE_INFINITY;
    double right = Double.NEGATIVE_INFINITY;
    double top = Double.POSITIVE_INFINITY;
    double bottom = Double.NEGATIVE_INFINITY;
    for (double[] point : points) {
      double[] p = turned(point);
      left = Math.min(left, p[0]);
      right = Math.max(right, p[0]);
      top = Math.min(top, p[1]);
      bottom = Math.max(bottom, p[1]);
    }
    double across = Math.max(right - left, 1e-9);
    double down = Math.max(bottom - top, 1e-9);
    scale = Math.min((width - 2 * margin) / across, (height - 2 * margin) / down);
    shiftX = width / 2 - scale * (left + right) / 2;
    shiftY = height / 2 - scale * (top + bottom) / 2;
  }

  /** Where a point comes to lie on the page. */
  double[] at(double[] point) {
    double[] p = turned(point);
    return new double[] {shiftX + scale * p[0], shiftY + scale * p[1]};
  }

  double scale() {
    return scale;
  }

  double shiftX() {
    return shiftX;
  }

  double shiftY() {
    return shiftY;
  }
}
