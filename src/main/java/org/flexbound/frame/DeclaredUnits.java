package org.flexbound.frame;

import org.flexbound.quantity.Unit;

/**
 * The units of the numbers that stand in a model file without a unit of their own.
 *
 * @param length of lengths
 * @param force of forces
 * @param mass of masses
 * @param angle of angles
 */
public record DeclaredUnits(Unit length, Unit force, Unit mass, Unit angle) {
  /** Metre, newton, kilogram, radian. */
  public static final DeclaredUnits SI =
      new DeclaredUnits(
          Unit.METRE,
          Unit.NEWTON,
          new Unit("kg", org.flexbound.quantity.Dimension.MASS, 1, 0),
          Unit.RADIAN);
}
