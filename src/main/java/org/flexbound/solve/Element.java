package org.flexbound.solve;

/**
 * A deformable piece between one or two points. Its deformation is d = B u (6 numbers in its own
 * axes), its force s = K_b (d − d₀).
 */
abstract class Element {
  /** The points it is fastened to; six freedoms each. */
  final int[] points;

  /** B, 6 × (6 · points), row by row. */
  final double[] shape;

  Element(int[] points, double[] shape) {
    this.points = points;
    this.shape = shape;
  }

  int freedoms() {
    return 6 * points.length;
  }

  int freedom(int local) {
    return 6 * points[local / 6] + local % 6;
  }

  /** d = B u, from one column of motions of all points. */
  double[] deformation(double[] motions, int column, int size) {
    double[] d = new double[6];
    int m = freedoms();
    int from = column * size;
    for (int p = 0; p < points.length; p++) {
      for (int c = 0; c < 6; c++) {
        double u = motions[from + 6 * points[p] + c];
        if (u != 0) {
          for (int i = 0; i < 6; i++) {
            d[i] += shape[i * m + 6 * p + c] * u;
          }
        }
      }
    }
    return d;
  }

  /** sum += Bᵀ s, at the freedoms of all points. */
  void addForces(double[] s, double[] sum, int from) {
    int m = freedoms();
    for (int k = 0; k < m; k++) {
      double f = 0;
      for (int i = 0; i < 6; i++) {
        f += shape[i * m + k] * s[i];
      }
      sum[from + freedom(k)] += f;
    }
  }

  /** K_b for the stiffnesses of all slots. */
  abstract double[] basic(double[] stiffness);

  /** Bᵀ K_b B, with exact zeros where a free joint takes a force out. */
  void stiffness(double[] basic, double[] result) {
    int m = freedoms();
    double[] kb = new double[6 * m];
    for (int i = 0; i < 6; i++) {
      for (int j = 0; j < 6; j++) {
        double k = basic[i * 6 + j];
        if (k != 0) {
          for (int c = 0; c < m; c++) {
            kb[i * m + c] += k * shape[j * m + c];
          }
        }
      }
    }
    for (int r = 0; r < m; r++) {
      for (int c = 0; c <= r; c++) {
        double sum = 0;
        for (int i = 0; i < 6; i++) {
          sum += shape[i * m + r] * kb[i * m + c];
        }
        result[r * m + c] = sum;
        result[c * m + r] = sum;
      }
    }
  }

  /** The slots whose stiffnesses it is made of. */
  abstract int[] slots();

  /** Adds the derivatives of a coefficient by the stiffnesses of this element's slots. */
  abstract void derivatives(Work work, SlotSink sink);

  /** The numbers slots take in: for each slot the product of forces or of deformations. */
  interface SlotSink {
    /**
     * A part whose compliance is regular.
     *
     * @param slot the slot
     * @param byCompliance ∂a/∂(1/θ)
     */
    void force(int slot, double byCompliance);

    /**
     * A part whose stiffness is regular.
     *
     * @param slot the slot
     * @param byStiffness ∂a/∂θ
     */
    void motion(int slot, double byStiffness);

    /**
     * A part of a full matrix.
     *
     * @param slot the slot
     * @param byLogarithm ∂a/∂ln θ
     */
    void logarithm(int slot, double byLogarithm);
  }

  /**
   * Forces and deformations of an element for one gauge and one load.
   *
   * @param stiffness of all slots
   * @param basic K_b
   * @param gaugeForces s of the gauge's unit load (or imposed strain)
   * @param gaugeDeformation its deformation
   * @param loadForces s of the load
   * @param loadDeformation its deformation
   */
  @SuppressWarnings("ArrayRecordComponent") // handed over within one loop, never kept
  record Work(
      double[] stiffness,
      double[] basic,
      double[] gaugeForces,
      double[] gaugeDeformation,
      double[] loadForces,
      double[] loadDeformation) {}
}
