package org.flexbound.solve;

/** The stiffnesses of all slots and the basic stiffness of every element for them. */
final class State {
  private final double[] stiffness;
  private final double[][] basic;

  State(Structure structure, double[] stiffness) {
    this.stiffness = stiffness;
    this.basic = new double[structure.elements().size()][];
    for (int e = 0; e < basic.length; e++) {
      basic[e] = structure.elements().get(e).basic(stiffness);
    }
  }

  /** Not copied. */
  double[] stiffness() {
    return stiffness;
  }

  /** K_b of an element; not copied. */
  double[] basic(int element) {
    return basic[element];
  }
}
