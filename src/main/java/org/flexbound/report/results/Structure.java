package org.flexbound.report.results;

import java.util.List;

/**
 * The frame model as far as its drawing needs it.
 *
 * @param model the file of the model, relative
 * @param up the unit vector that points up
 * @param nodes the nodes
 * @param members the members
 * @param places supports, joints and links
 */
public record Structure(
    String model,
    List<Double> up,
    List<Node> nodes,
    List<Member> members,
    List<Place> places) {
  /** Copies the lists. */
  public Structure {
    up = List.copyOf(up);
    nodes = List.copyOf(nodes);
    members = List.copyOf(members);
    places = List.copyOf(places);
  }
}
