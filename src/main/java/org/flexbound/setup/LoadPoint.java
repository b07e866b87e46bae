package org.flexbound.setup;

import java.util.Optional;

/**
 * A place and direction at which the structure is loaded, with its share of the total where several
 * are loaded in fixed proportion.
 *
 * @param station the place
 * @param coordinates the place in space, m, where the user stated it (besides a node or member)
 * @param direction the direction; a positive reading acts along it
 * @param share what part of the total acts here; 1 for a single load point
 * @param placing how well place and line are known
 */
public record LoadPoint(
    Station station,
    Optional<Vector> coordinates,
    Direction direction,
    double share,
    Placing placing) {}
