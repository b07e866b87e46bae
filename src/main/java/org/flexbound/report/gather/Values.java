package org.flexbound.report.gather;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import org.flexbound.setup.Vector;

/** Numbers and words as results.json holds them. */
final class Values {
  private Values() {}

  /** A number that JSON can hold: nothing where it is not finite. */
  static OptionalDouble finite(double value) {
    return Double.isFinite(value) ? OptionalDouble.of(value) : OptionalDouble.empty();
  }

  /** The value, or nought where it is not finite: for fields that must be there. */
  static double orZero(double value) {
    return Double.isFinite(value) ? value : 0;
  }

  static List<Double> list(Vector v) {
    return List.of(v.x(), v.y(), v.z());
  }

  static List<Double> list(double[] values) {
    return Arrays.stream(values).map(Values::orZero).boxed().toList();
  }

  static List<List<Double>> rows(double[][] values) {
    return Arrays.stream(values).map(Values::list).toList();
  }

  /** An enum constant as a word. */
  static String word(Enum<?> constant) {
    return constant.name().toLowerCase(Locale.ROOT).replace('_', ' ');
  }

  /** The SI unit of a coefficient. */
  static String coefficientUnit(org.flexbound.setup.Gauge gauge, org.flexbound.setup.Load load) {
    return org.flexbound.report.UnitSystem.per(motionUnit(gauge), loadUnit(load));
  }

  static String motionUnit(org.flexbound.setup.Gauge gauge) {
    return switch (gauge.kind()) {
      case DISPLACEMENT, RELATIVE -> "m";
      case ROTATION -> "rad";
      case STRAIN -> "1";
    };
  }

  static String loadUnit(org.flexbound.setup.Load load) {
    return load.isMoment() ? "N·m" : "N";
  }
}
