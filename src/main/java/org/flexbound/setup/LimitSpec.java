package org.flexbound.setup;

import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;

/**
 * One acceptance limit.
 *
 * @param name its name
 * @param kind what it is set on
 * @param gauge the gauge, where the kind needs one
 * @param load the load, where the kind needs one
 * @param node the point, for a compliance
 * @param direction the direction, for a compliance in a stated one
 * @param lower the smallest allowed value, SI
 * @param upper the largest allowed value, SI
 * @param unit the unit in which the user stated it
 * @param where its place in the user's file
 */
public record LimitSpec(
    String name,
    LimitKind kind,
    Optional<String> gauge,
    Optional<String> load,
    Optional<String> node,
    Optional<Direction> direction,
    OptionalDouble lower,
    OptionalDouble upper,
    Unit unit,
    Where where) {}
