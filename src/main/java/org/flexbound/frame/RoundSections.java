package org.flexbound.frame;

import java.util.Map;

/**
 * Solid and hollow circles. Shear coefficients: Cowper 1966, J. Appl. Mech. 33, 335, table 1.
 */
final class RoundSections {
  private RoundSections() {}

  static SectionProperties solid(Map<String, Double> d, double nu) {
    double diameter = Shape.size(d, "diameter");
    double area = Math.PI * diameter * diameter / 4;
    double i = Math.PI * Math.pow(diameter, 4) / 64;
    double shear = area * 6 * (1 + nu) / (7 + 6 * nu);
    return SectionProperties.symmetric(area, i, i, 2 * i, shear, shear);
  }

  static SectionProperties tube(Map<String, Double> d, double nu) {
    double outer = Shape.size(d, "diameter");
    double inner = outer - 2 * Shape.size(d, "wall");
    double area = Math.PI * (outer * outer - inner * inner) / 4;
    double i = Math.PI * (Math.pow(outer, 4) - Math.pow(inner, 4)) / 64;
    double m = inner / outer;
    double m2 = m * m;
    double square = (1 + m2) * (1 + m2);
    double shear =
        area * 6 * (1 + nu) * square / ((7 + 6 * nu) * square + (20 + 12 * nu) * m2);
    return SectionProperties.symmetric(area, i, i, 2 * i, shear, shear);
  }
}
