package org.flexbound.setup;

/**
 * A vector in the global right-handed axes: a place in m, or a direction without unit.
 *
 * @param x component along x
 * @param y component along y
 * @param z component along z
 */
public record Vector(double x, double y, double z) {
  /** The zero vector. */
  public static final Vector ZERO = new Vector(0, 0, 0);

  /**
   * The sum.
   *
   * @param other the other vector
   * @return this plus other
   */
  public Vector plus(Vector other) {
    return new Vector(x + other.x, y + other.y, z + other.z);
  }

  /**
   * The difference.
   *
   * @param other the other vector
   * @return this minus other
   */
  public Vector minus(Vector other) {
    return new Vector(x - other.x, y - other.y, z - other.z);
  }

  /**
   * A multiple.
   *
   * @param factor the factor
   * @return this times factor
   */
  public Vector times(double factor) {
    return new Vector(x * factor, y * factor, z * factor);
  }

  /**
   * The scalar product.
   *
   * @param other the other vector
   * @return this · other
   */
  public double dot(Vector other) {
    return x * other.x + y * other.y + z * other.z;
  }

  /**
   * The vector product.
   *
   * @param other the other vector
   * @return this × other
   */
  public Vector cross(Vector other) {
    return new Vector(
        y * other.z - z * other.y, z * other.x - x * other.z, x * other.y - y * other.x);
  }

  /**
   * The length.
   *
   * @return the Euclidean norm
   */
  public double norm() {
    return Math.sqrt(dot(this));
  }

  /**
   * The unit vector of the same direction.
   *
   * @return this divided by its length
   * @throws IllegalArgumentException for the zero vector
   */
  public Vector unit() {
    double norm = norm();
    if (!(norm > 0)) {
      throw new IllegalArgumentException("the zero vector has no direction");
    }
    return times(1 / norm);
  }
}
