package org.flexbound.setup;

/** What a gauge reads. */
public enum GaugeKind {
  /** A displacement along a direction, m. */
  DISPLACEMENT,
  /** A rotation about a direction, rad. */
  ROTATION,
  /** The displacement of the second place less that of the first, along a direction, m. */
  RELATIVE,
  /** A strain along a member's axis at a point of its section, without unit. */
  STRAIN
}
