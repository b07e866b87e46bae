package org.flexbound.frame;

import java.util.Arrays;
import org.flexbound.finding.Where;
import org.flexbound.setup.Vector;

/**
 * A rigid body fastened to a node.
 *
 * @param node the node's name
 * @param mass kg
 * @param inertia about its own centre of mass, global axes, 3 × 3, kg·m² (products of inertia with
 *     the sign of the inertia tensor)
 * @param offset from the node to the centre of mass, m, global axes
 * @param where its place in the user's file
 */
public record PointMass(String node, double mass, double[][] inertia, Vector offset, Where where) {
  /** Copies the matrix. */
  public PointMass {
    inertia = copy(inertia);
  }

  @Override
  public double[][] inertia() {
    return copy(inertia);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof PointMass that
        && node.equals(that.node)
        && mass == that.mass
        && Arrays.deepEquals(inertia, that.inertia)
        && offset.equals(that.offset)
        && where.equals(that.where);
  }

  @Override
  public int hashCode() {
    return 31 * node.hashCode() + Arrays.deepHashCode(inertia);
  }

  private static double[][] copy(double[][] matrix) {
    return Arrays.stream(matrix).map(double[]::clone).toArray(double[][]::new);
  }
}
