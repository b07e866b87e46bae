package org.flexbound.setup;

import java.util.OptionalDouble;

/**
 * How well the place and the line of a load or a gauge are known.
 *
 * @param positionUncertainty standard uncertainty of the place in each direction, m
 * @param angleUncertainty standard uncertainty of the direction about each normal axis, rad
 */
public record Placing(OptionalDouble positionUncertainty, OptionalDouble angleUncertainty) {
  /** Nothing stated: reported as not included in the uncertainty. */
  public static final Placing UNSTATED = new Placing(OptionalDouble.empty(), OptionalDouble.empty());
}
