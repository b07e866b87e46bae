package org.flexbound.frame;

/**
 * An open thin-walled section whose walls follow one another (a channel, an angle): shear areas and
 * shear centre from the shear flow q = V Q / I in its centre lines (Timoshenko, Strength of
 * Materials, part I; shear area from the energy ∫q²/t ds, Poisson's ratio left out).
 */
final class ThinChain {
  /** Gauss–Legendre, three points: exact for the square of the quadratic Q(s). */
  private static final double[] POINTS = {-Math.sqrt(0.6), 0, Math.sqrt(0.6)};

  private static final double[] WEIGHTS = {5.0 / 9, 8.0 / 9, 5.0 / 9};

  private final double[][] corners;
  private final double[] walls;
  private double centroidY;
  private double centroidZ;
  private double angle;
  private double ay;
  private double az;
  private double shearCentreY;
  private double shearCentreZ;

  /** Corners (y, z) in order, and the thickness of the wall after each but the last. */
  ThinChain(double[][] corners, double[] walls) {
    this.corners = corners;
    this.walls = walls;
    principalAxes();
  }

  private void principalAxes() {
    double area = 0;
    double firstY = 0;
    double firstZ = 0;
    for (int w = 0; w < walls.length; w++) {
      double a = length(w) * walls[w];
      area += a;
      firstY += a * (corners[w][0] + corners[w + 1][0]) / 2;
      firstZ += a * (corners[w][1] + corners[w + 1][1]) / 2;
    }
    centroidY = firstY / area;
    centroidZ = firstZ / area;
    double yy = 0;
    double zz = 0;
    double yz = 0;
    for (int w = 0; w < walls.length; w++) {
      for (int g = 0; g < 3; g++) {
        double y = y(w, POINTS[g]);
        double z = z(w, POINTS[g]);
        double a = WEIGHTS[g] / 2 * length(w) * walls[w];
        yy += a * y * y;
        zz += a * z * z;
        yz += a * y * z;
      }
    }
    angle = 0.5 * Math.atan2(-2 * yz, zz - yy);
    double c = Math.cos(angle);
    double s = Math.sin(angle);
    double iy = s * s * yy - 2 * s * c * yz + c * c * zz;
    double iz = c * c * yy + 2 * s * c * yz + s * s * zz;
    flow(c, s, iy, iz);
  }

  private void flow(double c, double s, double iy, double iz) {
    double energyY = 0;
    double energyZ = 0;
    double momentY = 0;
    double momentZ = 0;
    double startY = 0;
    double startZ = 0;
    for (int w = 0; w < walls.length; w++) {
      double l = length(w);
      double arm =
          (corners[w][0] - centroidY) * (corners[w + 1][1] - corners[w][1]) / l
              - (corners[w][1] - centroidZ) * (corners[w + 1][0] - corners[w][0]) / l;
      double u0 = c * y(w, -1) + s * z(w, -1);
      double u1 = c * y(w, 1) + s * z(w, 1);
      double v0 = -s * y(w, -1) + c * z(w, -1);
      double v1 = -s * y(w, 1) + c * z(w, 1);
      for (int g = 0; g < 3; g++) {
        double share = (1 + POINTS[g]) / 2;
        // The flow along the chain balances the change of bending stress: q = −V Q / I.
        double qy = -(startY + walls[w] * l * share * (u0 + share * (u1 - u0) / 2)) / iz;
        double qz = -(startZ + walls[w] * l * share * (v0 + share * (v1 - v0) / 2)) / iy;
        double ds = WEIGHTS[g] / 2 * l;
        energyY += ds * qy * qy / walls[w];
        energyZ += ds * qz * qz / walls[w];
        momentY += ds * qy * arm;
        momentZ += ds * qz * arm;
      }
      startY += walls[w] * l * (u0 + u1) / 2;
      startZ += walls[w] * l * (v0 + v1) / 2;
    }
    ay = 1 / energyY;
    az = 1 / energyZ;
    // A force (Vu, Vv) at the shear centre (u, v) has the moment u·Vv − v·Vu of its flow.
    double u = momentZ;
    double v = -momentY;
    shearCentreY = c * u - s * v;
    shearCentreZ = s * u + c * v;
  }

  private double length(int wall) {
    return Math.hypot(
        corners[wall + 1][0] - corners[wall][0], corners[wall + 1][1] - corners[wall][1]);
  }

  private double y(int wall, double place) {
    return ((1 - place) * corners[wall][0] + (1 + place) * corners[wall + 1][0]) / 2 - centroidY;
  }

  private double z(int wall, double place) {
    return ((1 - place) * corners[wall][1] + (1 + place) * corners[wall + 1][1]) / 2 - centroidZ;
  }

  double ay() {
    return ay;
  }

  double az() {
    return az;
  }

  /** In the axes of the corners. */
  double shearCentreY() {
    return centroidY + shearCentreY;
  }

  /** In the axes of the corners. */
  double shearCentreZ() {
    return centroidZ + shearCentreZ;
  }
}
