package org.flexbound.frame;

import org.flexbound.setup.Vector;

/**
 * Right-handed axes: three unit vectors at right angles, in global components.
 *
 * @param x the first
 * @param y the second
 * @param z the third
 */
public record Axes(Vector x, Vector y, Vector z) {
  /** The global axes. */
  public static final Axes GLOBAL =
      new Axes(new Vector(1, 0, 0), new Vector(0, 1, 0), new Vector(0, 0, 1));

  /** A direction counts as parallel to another where the sine of the angle is below this. */
  private static final double PARALLEL = 1e-6;

  /**
   * Axes from x and a vector in the plane of x and y.
   *
   * @param x any length but zero
   * @param inPlane not parallel to x
   * @return the axes
   */
  public static Axes fromXy(Vector x, Vector inPlane) {
    Vector ex = x.unit();
    Vector ez = ex.cross(inPlane).unit();
    return new Axes(ex, ez.cross(ex), ez);
  }

  /**
   * Member axes: z in the plane of x and the reference direction, on its side.
   *
   * @param x along the member
   * @param reference not parallel to x
   * @return the axes
   */
  public static Axes ofMember(Vector x, Vector reference) {
    Vector ex = x.unit();
    Vector ey = reference.cross(ex).unit();
    return new Axes(ex, ey, ex.cross(ey));
  }

  /**
   * Whether two directions are parallel (or opposed).
   *
   * @param a a direction
   * @param b another
   * @return true where the sine of the angle between them is below a millionth
   */
  public static boolean parallel(Vector a, Vector b) {
    return a.unit().cross(b.unit()).norm() < PARALLEL;
  }

  /**
   * One of the axes.
   *
   * @param index 0 for x, 1 for y, 2 for z
   * @return the unit vector
   */
  public Vector axis(int index) {
    return index == 0 ? x : index == 1 ? y : z;
  }
}
