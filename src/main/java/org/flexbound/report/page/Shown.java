package org.flexbound.report.page;

import java.util.OptionalDouble;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Parameter;

/** Values in the reader's units, rounded. */
final class Shown {
  /** From so many degrees of freedom on, Student's t is the normal to three digits. */
  private static final double MANY = 1000;

  private final UnitSystem units;

  Shown(UnitSystem units) {
    this.units = units;
  }

  UnitSystem units() {
    return units;
  }

  /** A value rounded to its uncertainty, without unit. */
  String value(double si, double uncertainty, String unit) {
    return Rounded.value(units.shown(si, unit), units.shown(uncertainty, unit));
  }

  String uncertainty(double si, String unit) {
    return Rounded.uncertainty(units.shown(si, unit));
  }

  String symbol(String unit) {
    return units.symbol(unit);
  }

  /** A value of three significant digits with its unit. */
  String withUnit(double si, String unit) {
    return Rounded.significant(units.shown(si, unit), 3) + " " + units.symbol(unit);
  }

  /** A stiffness of a parameter; a factor where unlike stiffnesses are tied. */
  String stiffness(Parameter p, OptionalDouble value, String missing) {
    if (value.isEmpty()) {
      return missing;
    }
    if (p.unit().equals("1")) {
      return "× " + Rounded.significant(value.getAsDouble(), 3);
    }
    return withUnit(value.getAsDouble(), p.unit());
  }

  /** The 95 % interval of a parameter in words. */
  String interval(Parameter p) {
    if (p.lower95().isEmpty() && p.upper95().isEmpty()) {
      return "open on both sides";
    }
    if (p.upper95().isEmpty()) {
      return "above " + stiffness(p, p.lower95(), "");
    }
    if (p.lower95().isEmpty()) {
      return "below " + stiffness(p, p.upper95(), "");
    }
    return p.unit().equals("1")
        ? stiffness(p, p.lower95(), "") + " to " + stiffness(p, p.upper95(), "")
        : Rounded.significant(units.shown(p.lower95().getAsDouble(), p.unit()), 3)
            + " to "
            + withUnit(p.upper95().getAsDouble(), p.unit());
  }

  /** The 95 % interval as factors on the nominal stiffness, or empty where there is no factor. */
  String factorInterval(Parameter p) {
    if (p.factor().isEmpty()) {
      return "";
    }
    double nominal = p.unit().equals("1") ? 1 : p.nominal().orElse(1);
    String low = p.lower95().isPresent() ? Rounded.significant(p.lower95().getAsDouble() / nominal, 3) : "open";
    String high = p.upper95().isPresent() ? Rounded.significant(p.upper95().getAsDouble() / nominal, 3) : "open";
    return low + " to " + high;
  }

  static String optional(OptionalDouble value, int digits) {
    return value.isPresent() ? Rounded.significant(value.getAsDouble(), digits) : "–";
  }

  /** Degrees of freedom; infinite where left out, or where it makes no difference. */
  static String freedom(OptionalDouble value) {
    return value.isPresent() && value.getAsDouble() < MANY ? Rounded.significant(value.getAsDouble(), 2) : "∞";
  }

  static String count(long number, String one, String many) {
    return number + " " + (number == 1 ? one : many);
  }
}
