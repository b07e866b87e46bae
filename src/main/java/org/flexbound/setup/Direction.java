package org.flexbound.setup;

/**
 * A direction in which something is loaded or measured: along a unit vector, or about one by the
 * right-hand rule. A load in a rotational direction is a moment.
 *
 * @param rotation true for about the vector, false for along it
 * @param vector the unit vector in global axes
 */
public record Direction(boolean rotation, Vector vector) {
  /** Makes the vector a unit vector. */
  public Direction {
    vector = vector.unit();
  }

  /**
   * A direction along a vector.
   *
   * @param vector any vector but zero
   * @return the direction
   */
  public static Direction along(Vector vector) {
    return new Direction(false, vector);
  }

  /**
   * A direction about a vector.
   *
   * @param vector any vector but zero
   * @return the direction
   */
  public static Direction about(Vector vector) {
    return new Direction(true, vector);
  }
}
