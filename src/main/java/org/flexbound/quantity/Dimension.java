package org.flexbound.quantity;

/**
 * The kind of a quantity as whole powers of length, mass, time, temperature and angle.
 *
 * <p>Angle is kept apart (the SI has it as the number one), so that a displacement per force and a
 * rotation per force are not mistaken for each other. {@link #fits} is the check to use on input:
 * it lets people leave out {@code rad}, as in N·m for N·m/rad.
 *
 * @param length power of length
 * @param mass power of mass
 * @param time power of time
 * @param temperature power of temperature
 * @param angle power of angle
 */
public record Dimension(int length, int mass, int time, int temperature, int angle) {
  /** A pure number. */
  public static final Dimension NUMBER = new Dimension(0, 0, 0, 0, 0);

  /** A length. */
  public static final Dimension LENGTH = new Dimension(1, 0, 0, 0, 0);

  /** A mass. */
  public static final Dimension MASS = new Dimension(0, 1, 0, 0, 0);

  /** A time. */
  public static final Dimension TIME = new Dimension(0, 0, 1, 0, 0);

  /** A temperature. */
  public static final Dimension TEMPERATURE = new Dimension(0, 0, 0, 1, 0);

  /** A plane angle. */
  public static final Dimension ANGLE = new Dimension(0, 0, 0, 0, 1);

  /** A force. */
  public static final Dimension FORCE = new Dimension(1, 1, -2, 0, 0);

  /** A moment (without angle, as in N·m). */
  public static final Dimension MOMENT = FORCE.times(LENGTH);

  /** A stress or a modulus of elasticity. */
  public static final Dimension STRESS = FORCE.per(area());

  /** An area. */
  public static final Dimension AREA = area();

  /** A second moment of area. */
  public static final Dimension SECOND_MOMENT_OF_AREA = AREA.times(AREA);

  /** A translational stiffness, N/m. */
  public static final Dimension STIFFNESS = FORCE.per(LENGTH);

  /** A rotational stiffness, N·m/rad. */
  public static final Dimension ROTATIONAL_STIFFNESS = MOMENT.per(ANGLE);

  /** A mass density, kg/m³. */
  public static final Dimension DENSITY = MASS.per(LENGTH.times(AREA));

  /** A mass per length, kg/m. */
  public static final Dimension MASS_PER_LENGTH = MASS.per(LENGTH);

  /** A mass moment of inertia, kg·m². */
  public static final Dimension INERTIA = MASS.times(AREA);

  /** An acceleration, m/s². */
  public static final Dimension ACCELERATION = LENGTH.per(TIME.times(TIME));

  private static Dimension area() {
    return LENGTH.times(LENGTH);
  }

  /**
   * The dimension of a product.
   *
   * @param other the other factor
   * @return this times other
   */
  public Dimension times(Dimension other) {
    return new Dimension(
        length + other.length,
        mass + other.mass,
        time + other.time,
        temperature + other.temperature,
        angle + other.angle);
  }

  /**
   * The dimension of a quotient.
   *
   * @param other the divisor
   * @return this per other
   */
  public Dimension per(Dimension other) {
    return new Dimension(
        length - other.length,
        mass - other.mass,
        time - other.time,
        temperature - other.temperature,
        angle - other.angle);
  }

  /**
   * Whether a value of this dimension may stand where {@code wanted} is asked for: equal, or equal
   * but for angles that were left out.
   *
   * @param wanted the dimension asked for
   * @return true if it fits
   */
  public boolean fits(Dimension wanted) {
    return equals(wanted)
        || (angle == 0
            && length == wanted.length
            && mass == wanted.mass
            && time == wanted.time
            && temperature == wanted.temperature
            && (mass != 0 || length != 0 || time != 0));
  }
}
