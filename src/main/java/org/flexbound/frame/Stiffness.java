package org.flexbound.frame;

/**
 * A stiffness from free to rigid.
 *
 * @param value 0 for free, positive infinity for rigid (a support: fixed), else in SI units
 */
public record Stiffness(double value) {
  /** No resistance. */
  public static final Stiffness FREE = new Stiffness(0);

  /** No motion. */
  public static final Stiffness RIGID = new Stiffness(Double.POSITIVE_INFINITY);

  /** Checks that it is not negative. */
  public Stiffness {
    if (!(value >= 0)) {
      throw new IllegalArgumentException("a stiffness is at least 0, not " + value);
    }
  }

  /**
   * Whether it lets nothing move.
   *
   * @return true for rigid
   */
  public boolean isRigid() {
    return Double.isInfinite(value);
  }

  /**
   * Whether it resists nothing.
   *
   * @return true for free
   */
  public boolean isFree() {
    return value == 0;
  }

  /**
   * The inverse: 0 for rigid, positive infinity for free.
   *
   * @return 1 / value
   */
  public double compliance() {
    return isRigid() ? 0 : 1 / value;
  }
}
