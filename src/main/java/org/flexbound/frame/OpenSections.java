package org.flexbound.frame;

import java.util.Map;

/**
 * Open sections: I, channel, angle, T. Areas and second moments with fillets are exact; torsion of
 * the I with fillets after El Darwish &amp; Johnston 1965 (J. Struct. Div. ASCE 91(ST1), 203), of the
 * others Σ b t³/3 without fillets; shear areas of I and T after Cowper 1966 (J. Appl. Mech. 33, 335),
 * across the web those of the flanges as rectangles; of channel and angle from the shear flow.
 */
final class OpenSections {
  private OpenSections() {}

  static SectionProperties i(Map<String, Double> d, double nu) {
    double h = Shape.size(d, "depth");
    double b = Shape.size(d, "width");
    double tw = Shape.size(d, "web");
    double tf = Shape.size(d, "flange");
    double r = Shape.size(d, "radius");
    CompositeArea shape = new CompositeArea();
    shape.rectangle(0, 0, tw, h - 2 * tf, 1);
    for (int end = -1; end <= 1; end += 2) {
      shape.rectangle(0, end * (h - tf) / 2, b, tf, 1);
      for (int side = -1; side <= 1; side += 2) {
        shape.corner(side * tw / 2, end * (h / 2 - tf), side, -end, r, 1);
      }
    }
    double area = shape.area();
    double inscribed =
        ((r + tw / 2) * (r + tw / 2) + (r + tf) * (r + tf) - r * r) / (2 * r + tf);
    double torsion =
        2.0 / 3 * (b - 0.63 * tf) * Math.pow(tf, 3)
            + (h - 2 * tf) * Math.pow(tw, 3) / 3
            + 2 * tw / tf * (0.145 + 0.1 * r / tf) * Math.pow(inscribed, 4);
    double web = h - tf;
    double m = 2 * b * tf / (web * tw);
    double n = b / web;
    double along =
        10
            * (1 + nu)
            * (1 + 3 * m)
            * (1 + 3 * m)
            / (12
                + 72 * m
                + 150 * m * m
                + 90 * m * m * m
                + nu * (11 + 66 * m + 135 * m * m + 90 * m * m * m)
                + 30 * n * n * (m + m * m)
                + 5 * nu * n * n * (8 * m + 9 * m * m));
    return SectionProperties.symmetric(
        area, shape.iy(), shape.iz(), torsion, 2 * b * tf * rectangle(nu), area * along);
  }

  private static double rectangle(double nu) {
    return 10 * (1 + nu) / (12 + 11 * nu);
  }

  static SectionProperties t(Map<String, Double> d, double nu) {
    double h = Shape.size(d, "depth");
    double b = Shape.size(d, "width");
    double tw = Shape.size(d, "web");
    double tf = Shape.size(d, "flange");
    CompositeArea shape = new CompositeArea();
    shape.rectangle(0, -tf / 2, b, tf, 1);
    shape.rectangle(0, -(h + tf) / 2, tw, h - tf, 1);
    for (int side = -1; side <= 1; side += 2) {
      shape.corner(side * tw / 2, -tf, side, -1, Shape.size(d, "radius"), 1);
    }
    double stem = h - tf / 2;
    double m = b * tf / (stem * tw);
    double n = b / stem;
    double along =
        10
            * (1 + nu)
            * (1 + 4 * m)
            * (1 + 4 * m)
            / (12
                + 96 * m
                + 276 * m * m
                + 192 * m * m * m
                + nu * (11 + 88 * m + 248 * m * m + 216 * m * m * m)
                + 30 * n * n * (m + m * m)
                + 10 * nu * n * n * (4 * m + 5 * m * m + m * m * m));
    return new SectionProperties(
        shape.area(),
        shape.iy(),
        shape.iz(),
        (b * Math.pow(tf, 3) + (h - tf) * Math.pow(tw, 3)) / 3,
        b * tf * rectangle(nu),
        shape.area() * along,
        0,
        0,
        -tf / 2 - shape.centroidZ());
  }

  static SectionProperties channel(Map<String, Double> d, double nu) {
    double h = Shape.size(d, "depth");
    double b = Shape.size(d, "width");
    double tw = Shape.size(d, "web");
    double tf = Shape.size(d, "flange");
    CompositeArea shape = new CompositeArea();
    shape.rectangle(tw / 2, 0, tw, h - 2 * tf, 1);
    for (int end = -1; end <= 1; end += 2) {
      shape.rectangle(b / 2, end * (h - tf) / 2, b, tf, 1);
      shape.corner(tw, end * (h / 2 - tf), 1, -end, Shape.size(d, "radius"), 1);
    }
    double z = (h - tf) / 2;
    ThinChain walls =
        new ThinChain(
            new double[][] {{b, -z}, {tw / 2, -z}, {tw / 2, z}, {b, z}},
            new double[] {tf, tw, tf});
    double torsion = (2 * b * Math.pow(tf, 3) + (h - 2 * tf) * Math.pow(tw, 3)) / 3;
    boolean deep = shape.iy() >= shape.iz();
    return new SectionProperties(
        shape.area(),
        shape.iy(),
        shape.iz(),
        torsion,
        deep ? walls.ay() : walls.az(),
        deep ? walls.az() : walls.ay(),
        0,
        walls.shearCentreY() - shape.centroidY(),
        0);
  }

  static SectionProperties angle(Map<String, Double> d, double nu) {
    double h = Shape.size(d, "depth");
    double b = Shape.size(d, "width");
    double t = Shape.size(d, "wall");
    double toe = Shape.size(d, "toeRadius");
    CompositeArea shape = new CompositeArea();
    shape.rectangle(t / 2, h / 2, t, h, 1);
    shape.rectangle((b + t) / 2, t / 2, b - t, t, 1);
    shape.corner(t, t, 1, 1, Shape.size(d, "radius"), 1);
    shape.corner(t, h, -1, -1, toe, -1);
    shape.corner(b, t, -1, -1, toe, -1);
    double iy = shape.iy();
    double iz = shape.iz();
    double product = shape.iyz();
    double angle = 0.5 * Math.atan2(-2 * product, iy - iz);
    double mean = (iy + iz) / 2;
    double radius = Math.hypot((iy - iz) / 2, product);
    ThinChain walls =
        new ThinChain(
            new double[][] {{t / 2, h}, {t / 2, t / 2}, {b, t / 2}}, new double[] {t, t});
    return new SectionProperties(
        shape.area(),
        mean + radius,
        mean - radius,
        (h + b - t) * Math.pow(t, 3) / 3,
        walls.ay(),
        walls.az(),
        angle,
        walls.shearCentreY() - shape.centroidY(),
        walls.shearCentreZ() - shape.centroidZ());
  }
}
