package org.flexbound.frame;

import java.util.Map;

/**
 * Solid and hollow rectangles. Shear coefficients: Cowper 1966, J. Appl. Mech. 33, 335, table 1;
 * torsion of the solid: Saint-Venant's series (Timoshenko &amp; Goodier, Theory of Elasticity, art.
 * 109); hollow: EN 10210-2:2006, annex A.
 */
final class RectangularSections {
  private RectangularSections() {}

  static SectionProperties solid(Map<String, Double> d, double nu) {
    double depth = Shape.size(d, "depth");
    double width = Shape.size(d, "width");
    double area = depth * width;
    double shear = area * 10 * (1 + nu) / (12 + 11 * nu);
    return SectionProperties.symmetric(
        area,
        width * depth * depth * depth / 12,
        depth * width * width * width / 12,
        torsion(Math.max(depth, width), Math.min(depth, width)),
        shear,
        shear);
  }

  /** The series falls with the fifth power: 40 terms leave less than 1e-10 of it. */
  static double torsion(double longSide, double shortSide) {
    double sum = 0;
    for (int n = 79; n >= 1; n -= 2) {
      sum += Math.tanh(n * Math.PI * longSide / (2 * shortSide)) / Math.pow(n, 5);
    }
    double factor = 1 - 192 / Math.pow(Math.PI, 5) * shortSide / longSide * sum;
    return longSide * Math.pow(shortSide, 3) / 3 * factor;
  }

  static SectionProperties hollow(Map<String, Double> d, double nu) {
    double h = Shape.size(d, "depth");
    double b = Shape.size(d, "width");
    double t = Shape.size(d, "wall");
    double outer = Shape.size(d, "outerRadius");
    double inner = Shape.size(d, "innerRadius");
    CompositeArea shape = new CompositeArea();
    shape.rectangle(0, 0, b, h, 1);
    shape.rectangle(0, 0, b - 2 * t, h - 2 * t, -1);
    for (int side = -1; side <= 1; side += 2) {
      for (int end = -1; end <= 1; end += 2) {
        shape.corner(side * b / 2, end * h / 2, -side, -end, outer, -1);
        shape.corner(side * (b / 2 - t), end * (h / 2 - t), -side, -end, inner, 1);
      }
    }
    double mean = (outer + inner) / 2;
    double round = 4 - Math.PI;
    double length = 2 * (b - t + h - t) - 2 * mean * round;
    double enclosed = (b - t) * (h - t) - mean * mean * round;
    double torsion = t * t * t * length / 3 + 4 * enclosed * enclosed * t / length;
    double area = shape.area();
    return SectionProperties.symmetric(
        area,
        shape.iy(),
        shape.iz(),
        torsion,
        area * box(h - t, b - t, nu),
        area * box(b - t, h - t, nu));
  }

  /**
   * Cowper's thin-walled box for shear along y when asked with (h, b) = (walls across, walls along);
   * walls of one thickness.
   */
  private static double box(double across, double along, double nu) {
    double n = across / along;
    double m = n;
    double plain = 12 + 72 * m + 150 * m * m + 90 * m * m * m;
    double withNu = 11 + 66 * m + 135 * m * m + 90 * m * m * m;
    return 10
        * (1 + nu)
        * (1 + 3 * m)
        * (1 + 3 * m)
        / (plain + nu * withNu + 10 * n * n * ((3 + nu) * m + 3 * m * m));
  }
}
