package org.flexbound.solve;

import org.flexbound.frame.PointMass;
import org.flexbound.setup.Vector;

/** A rigid body fastened to a point: mass without stiffness. */
final class BodyElement extends Element {
  private final double[] mass = new double[36];

  BodyElement(int point, PointMass body) {
    super(new int[] {point}, new double[36]);
    double m = body.mass();
    Vector r = body.offset();
    double[][] cross = {{0, r.z(), -r.y()}, {-r.z(), 0, r.x()}, {r.y(), -r.x(), 0}};
    // The centre moves with u + θ × r = u + C θ, C_ij = cross[i][j].
    for (int i = 0; i < 3; i++) {
      mass[7 * i] += m;
      Vector row = body.inertia().get(i);
      double[] own = {row.x(), row.y(), row.z()};
      for (int j = 0; j < 3; j++) {
        mass[6 * i + 3 + j] += m * cross[i][j];
        mass[6 * (3 + j) + i] += m * cross[i][j];
        double steiner = 0;
        for (int k = 0; k < 3; k++) {
          steiner += cross[k][i] * cross[k][j];
        }
        mass[6 * (3 + i) + 3 + j] += m * steiner + own[j];
      }
    }
  }

  void writeMass(double[] values) {
    System.arraycopy(mass, 0, values, 0, 36);
  }

  @Override
  int[] slots() {
    return new int[0];
  }

  @Override
  double[] basic(double[] stiffness) {
    return new double[36];
  }

  @Override
  void derivatives(Work work, SlotSink sink) {
    // A mass has no stiffness.
  }
}
