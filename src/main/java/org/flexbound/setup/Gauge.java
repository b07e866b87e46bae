package org.flexbound.setup;

import java.util.Optional;
import org.flexbound.finding.Where;

/**
 * A gauge: what is read, where, and from what it stands on. A reading is positive along (about) the
 * direction; a strain is positive in tension.
 *
 * @param name its name
 * @param kind what it reads
 * @param station the place; for STRAIN a place on a member
 * @param second the second place of a RELATIVE gauge
 * @param coordinates the place in space, m, where the user stated it (besides a node or member)
 * @param direction along or about which it reads; for STRAIN the member's axis, and not used
 * @param sectionPoint for STRAIN, the point of the section
 * @param measures what it measures
 * @param standsOn what it stands on
 * @param base whether its motion is part of the base motion that is taken out of the others
 * @param instrument the name of the instrument (where runs do not say otherwise)
 * @param placing how well place and direction are known
 * @param remark the user's remark, or empty
 * @param where its place in the user's file
 */
public record Gauge(
    String name,
    GaugeKind kind,
    Station station,
    Optional<Station> second,
    Optional<Vector> coordinates,
    Direction direction,
    Optional<SectionPoint> sectionPoint,
    Part measures,
    Part standsOn,
    boolean base,
    Optional<String> instrument,
    Placing placing,
    String remark,
    Where where) {
  /**
   * Whether it reads an angle.
   *
   * @return true for rad, false for m or a strain
   */
  public boolean readsAngle() {
    return kind == GaugeKind.ROTATION;
  }
}
