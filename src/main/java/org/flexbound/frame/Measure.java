package org.flexbound.frame;

import org.flexbound.quantity.Dimension;

/** What a number of a model file measures, and so what the declared units make of it. */
enum Measure {
  NUMBER(Dimension.NUMBER, 0, 0, 0, 0, "a number"),
  LENGTH(Dimension.LENGTH, 1, 0, 0, 0, "a length"),
  AREA(Dimension.AREA, 2, 0, 0, 0, "an area"),
  SECOND_MOMENT(Dimension.SECOND_MOMENT_OF_AREA, 4, 0, 0, 0, "a second moment of area"),
  STRESS(Dimension.STRESS, -2, 1, 0, 0, "a modulus"),
  DENSITY(Dimension.DENSITY, -3, 0, 1, 0, "a density"),
  MASS_PER_LENGTH(Dimension.MASS_PER_LENGTH, -1, 0, 1, 0, "a mass per length"),
  MASS(Dimension.MASS, 0, 0, 1, 0, "a mass"),
  INERTIA(Dimension.INERTIA, 2, 0, 1, 0, "a mass moment of inertia"),
  FORCE(Dimension.FORCE, 0, 1, 0, 0, "a force"),
  STIFFNESS(Dimension.STIFFNESS, -1, 1, 0, 0, "a stiffness (force per length)"),
  COUPLING(Dimension.FORCE.per(Dimension.ANGLE), 0, 1, 0, -1, "a force per angle"),
  ROTATIONAL_STIFFNESS(
      Dimension.ROTATIONAL_STIFFNESS, 1, 1, 0, -1, "a rotational stiffness (moment per angle)"),
  BENDING_STIFFNESS(
      Dimension.FORCE.times(Dimension.AREA), 2, 1, 0, 0, "a bending or torsional stiffness");

  @SuppressWarnings("ImmutableEnumChecker") // a record of whole numbers
  private final Dimension dimension;
  private final int length;
  private final int force;
  private final int mass;
  private final int angle;
  private final String words;

  Measure(Dimension dimension, int length, int force, int mass, int angle, String words) {
    this.dimension = dimension;
    this.length = length;
    this.force = force;
    this.mass = mass;
    this.angle = angle;
    this.words = words;
  }

  Dimension dimension() {
    return dimension;
  }

  String words() {
    return words;
  }

  /** What one of the declared units is in SI. */
  double factor(DeclaredUnits units) {
    return power(units.length().siFactor(), length)
        * power(units.force().siFactor(), force)
        * power(units.mass().siFactor(), mass)
        * power(units.angle().siFactor(), angle);
  }

  /** By products, so that one metre or one newton leaves a number exactly as it is. */
  private static double power(double base, int exponent) {
    double result = 1;
    for (int i = 0; i < Math.abs(exponent); i++) {
      result *= base;
    }
    return exponent < 0 ? 1 / result : result;
  }

  /** The unit that the declared units make, as a header states it; empty for a number. */
  String declaredSymbol(DeclaredUnits units) {
    String above = "";
    String below = "";
    String[] symbols = {
      units.force().symbol(), units.mass().symbol(), units.length().symbol(), units.angle().symbol()
    };
    int[] powers = {force, mass, length, angle};
    for (int i = 0; i < symbols.length; i++) {
      String part = symbols[i] + (Math.abs(powers[i]) > 1 ? "^" + Math.abs(powers[i]) : "");
      if (powers[i] > 0) {
        above += (above.isEmpty() ? "" : "·") + part;
      } else if (powers[i] < 0) {
        below += "/" + part;
      }
    }
    return above + below;
  }

  /** The unit in which a stiffness is written where the user stated none. */
  String siSymbol() {
    return switch (this) {
      case STIFFNESS -> "N/m";
      case ROTATIONAL_STIFFNESS -> "N·m/rad";
      case FORCE -> "N";
      case BENDING_STIFFNESS -> "N·m²";
      case STRESS -> "Pa";
      default -> throw new IllegalArgumentException("no stiffness: " + this);
    };
  }

  static Measure of(Spring spring) {
    return spring.rotation() ? ROTATIONAL_STIFFNESS : STIFFNESS;
  }

  static Measure of(Rigidity rigidity) {
    return switch (rigidity) {
      case EA, GA_Y, GA_Z -> FORCE;
      case EI_Y, EI_Z, GJ -> BENDING_STIFFNESS;
    };
  }
}
