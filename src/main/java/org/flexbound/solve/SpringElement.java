package org.flexbound.solve;

/**
 * A connection or a support: springs between two points, or from one point to the ground. Components
 * that are rigid are constraints and not part of it.
 */
final class SpringElement extends Element {
  private final EndSprings springs;

  /** Components worked by their gap, see {@link Fields}; or held as constraints. */
  private final boolean[] constrained = new boolean[6];

  SpringElement(int[] points, double[] shape, EndSprings springs) {
    super(points, shape);
    this.springs = springs;
  }

  EndSprings springs() {
    return springs;
  }

  /** The same with some components constrained. */
  SpringElement constrain(boolean[] which) {
    SpringElement result = new SpringElement(points, shape, springs);
    System.arraycopy(which, 0, result.constrained, 0, 6);
    return result;
  }

  boolean whollyConstrained() {
    boolean all = true;
    for (boolean one : constrained) {
      all &= one;
    }
    return all;
  }

  @Override
  int[] slots() {
    return springs.slots();
  }

  @Override
  double[] basic(double[] stiffness) {
    if (springs.full()) {
      return springs.matrix(stiffness);
    }
    double[] k = new double[36];
    for (int i = 0; i < 6; i++) {
      if (!constrained[i]) {
        k[7 * i] = stiffness[springs.slot(i)];
      }
    }
    return k;
  }

  @Override
  void derivatives(Work work, SlotSink sink) {
    for (int i = 0; i < 6; i++) {
      if (springs.full()) {
        sink.logarithm(
            springs.slot(i),
            -0.5
                * (work.gaugeDeformation()[i] * work.loadForces()[i]
                    + work.gaugeForces()[i] * work.loadDeformation()[i]));
      } else if (!constrained[i]) {
        sink.motion(
            springs.slot(i), -work.gaugeDeformation()[i] * work.loadDeformation()[i]);
      }
    }
  }
}
