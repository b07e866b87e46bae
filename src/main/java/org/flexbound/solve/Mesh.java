package org.flexbound.solve;

import java.util.List;
import java.util.Map;
import org.flexbound.frame.Axes;
import org.flexbound.setup.Vector;

/**
 * The structure in points and elements, free of names.
 *
 * @param places of the points
 * @param labels of the points, for messages
 * @param pointOfNode the point of every node
 * @param members the member pieces
 * @param pieces the pieces of every member in order, by their first place on it
 * @param springs connections, supports and joints that stand by themselves
 * @param springNames of {@code springs}, for messages
 * @param ties pairs of points that move as one rigid body: leader, follower
 * @param spins the points between the ends of members whose ends may both turn about their axis
 * @param bodies masses at points, for modes only
 * @param slots all stiffnesses
 */
record Mesh(
    List<Vector> places,
    List<String> labels,
    Map<String, Integer> pointOfNode,
    List<MemberElement> members,
    Map<String, List<Piece>> pieces,
    List<SpringElement> springs,
    List<String> springNames,
    List<Tie> ties,
    List<Spin> spins,
    List<BodyElement> bodies,
    Slots slots) {

  /**
   * Two points that move as one rigid body.
   *
   * @param leader the point that leads
   * @param follower the point that follows
   */
  record Tie(int leader, int follower) {}

  /**
   * A divided member whose joints may both be free about its axis: its inner part could then spin by
   * itself, which changes nothing, and is held.
   *
   * @param point a point between its ends
   * @param axis its axis
   * @param startSlot the start joint's stiffness about the axis
   * @param endSlot the end joint's
   */
  record Spin(int point, Vector axis, int startSlot, int endSlot) {
    boolean isFree(double[] stiffness) {
      return stiffness[startSlot] == 0 && stiffness[endSlot] == 0;
    }

    /** The constraint that holds it. */
    Map<Integer, Double> row() {
      double[] c = {axis.x(), axis.y(), axis.z()};
      Map<Integer, Double> row = new java.util.TreeMap<>();
      for (int i = 0; i < 3; i++) {
        if (c[i] != 0) {
          row.put(6 * point + 3 + i, c[i]);
        }
      }
      return row;
    }
  }

  /**
   * A piece of a member.
   *
   * @param element the index among the member pieces
   * @param from its start as a share of the member's flexible length
   * @param to its end
   * @param startPoint the point at its start
   * @param startArm from that point to its start
   * @param endPoint the point at its end
   * @param endArm from that point to its end
   * @param axes the member's axes
   */
  record Piece(
      int element,
      double from,
      double to,
      int startPoint,
      Vector startArm,
      int endPoint,
      Vector endArm,
      Axes axes) {}

  int pointCount() {
    return places.size();
  }

  int freedoms() {
    return 6 * places.size();
  }

  int point(String node) {
    Integer point = pointOfNode.get(node);
    if (point == null) {
      throw new IllegalArgumentException("no node " + node);
    }
    return point;
  }

  List<Piece> pieces(String member) {
    List<Piece> list = pieces.get(member);
    if (list == null) {
      throw new IllegalArgumentException("no member " + member);
    }
    return list;
  }

  /**
   * B for two points: d = the motion of the second, carried along its arm, less that of the first,
   * carried along its own.
   */
  static double[] shape(Axes axes, Vector firstArm, Vector secondArm) {
    double[] b = new double[72];
    for (int i = 0; i < 3; i++) {
      Vector e = axes.axis(i);
      put(b, 12 * i, e, -1);
      put(b, 12 * i + 3, firstArm.cross(e), -1);
      put(b, 12 * i + 6, e, 1);
      put(b, 12 * i + 9, secondArm.cross(e), 1);
      put(b, 12 * (i + 3) + 3, e, -1);
      put(b, 12 * (i + 3) + 9, e, 1);
    }
    return b;
  }

  /** B for a point against the ground. */
  static double[] shape(Axes axes) {
    double[] b = new double[36];
    for (int i = 0; i < 3; i++) {
      put(b, 6 * i, axes.axis(i), 1);
      put(b, 6 * (i + 3) + 3, axes.axis(i), 1);
    }
    return b;
  }

  private static void put(double[] b, int at, Vector v, double sign) {
    // Adding 0.0 turns a negative zero into a zero.
    b[at] = sign * v.x() + 0.0;
    b[at + 1] = sign * v.y() + 0.0;
    b[at + 2] = sign * v.z() + 0.0;
  }
}
