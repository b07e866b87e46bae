package org.flexbound.quantity;

import static tech.units.indriya.unit.Units.GRAM;
import static tech.units.indriya.unit.Units.KELVIN;
import static tech.units.indriya.unit.Units.KILOGRAM;
import static tech.units.indriya.unit.Units.METRE;
import static tech.units.indriya.unit.Units.NEWTON;
import static tech.units.indriya.unit.Units.PASCAL;
import static tech.units.indriya.unit.Units.SECOND;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import javax.measure.Unit;
import tech.units.indriya.unit.BaseUnit;
import tech.units.indriya.unit.UnitDimension;

/**
 * The table of spellings. Factors are exact by definition (NIST Special Publication 811, 2008,
 * appendix B.8): inch 0.0254 m, pound 0.453 592 37 kg, standard gravity 9.806 65 m/s².
 */
final class Spellings {
  private static final javax.measure.Dimension ANGLE = UnitDimension.parse('A');

  private static final Unit<?> RADIAN =
      new BaseUnit<javax.measure.quantity.Angle>("rad", "radian", ANGLE);

  /** What is offered in drop-down lists and messages, in the order of use. */
  static final List<String> OFFERED =
      List.of(
          "N", "kN", "daN", "MN", "kgf", "lbf", "kip", "kg", "t", "g", "mm", "µm", "m", "cm", "in",
          "mil", "ft", "mrad", "µrad", "rad", "deg", "arcmin", "arcsec", "N·m", "kN·m", "N·mm",
          "lbf·in", "lbf·ft", "kip·in", "µε", "%", "MPa", "GPa", "Pa", "N/mm²", "psi", "ksi", "s",
          "min", "h", "ms", "N/mm", "kN/mm", "kN/m", "N/m", "lbf/in", "kip/in", "N·m/rad",
          "kN·m/rad", "lbf·in/rad");

  /** Spelling to unit of the kept library. */
  static final Map<String, Unit<?>> TABLE = table();

  private Spellings() {}

  private static Map<String, Unit<?>> table() {
    Map<String, Unit<?>> table = new LinkedHashMap<>();
    prefixed(table, METRE, "m", "n", "µ", "m", "c", "d", "k");
    prefixed(table, NEWTON, "N", "m", "da", "k", "M", "G");
    prefixed(table, PASCAL, "Pa", "h", "k", "M", "G");
    prefixed(table, RADIAN, "rad", "m", "µ");
    prefixed(table, GRAM, "g", "m", "k");
    prefixed(table, SECOND, "s", "m", "µ");
    names(table, SECOND, "sec");
    names(table, SECOND.multiply(60), "min");
    names(table, SECOND.multiply(3600), "h", "hr");
    names(table, KILOGRAM.multiply(1000), "t", "tonne");
    names(table, KELVIN, "K");
    Unit<?> gravity = METRE.multiply(9.80665).divide(SECOND.pow(2));
    names(table, KILOGRAM.multiply(gravity), "kgf", "kp");
    names(table, GRAM.multiply(gravity), "gf");
    names(table, KILOGRAM.multiply(gravity).multiply(1000), "tf");
    Unit<?> pound = KILOGRAM.multiply(0.45359237);
    Unit<?> poundForce = pound.multiply(gravity);
    names(table, poundForce, "lbf");
    names(table, poundForce.multiply(1000), "kip", "kips", "klbf");
    names(table, poundForce.divide(16), "ozf");
    names(table, pound, "lbm");
    Unit<?> inch = METRE.multiply(0.0254);
    names(table, inch, "in", "inch", "inches", "\"");
    names(table, inch.multiply(12), "ft", "foot", "feet", "'");
    names(table, inch.divide(1000), "mil", "mils", "thou");
    Unit<?> psi = poundForce.divide(inch.pow(2));
    names(table, psi, "psi");
    names(table, psi.multiply(1e3), "ksi");
    names(table, psi.multiply(1e6), "Msi", "Mpsi");
    names(table, PASCAL.multiply(1e5), "bar");
    Unit<?> degree = RADIAN.multiply(Math.PI / 180);
    names(table, degree, "deg", "°", "degree", "degrees");
    names(table, degree.divide(60), "arcmin", "′");
    names(table, degree.divide(3600), "arcsec", "″");
    Unit<?> one = Units.one();
    names(table, one, "1", "strain", "ε");
    names(table, one.divide(100), "%");
    names(table, one.divide(1e6), "µε", "ue", "ustrain", "microstrain", "ppm");
    names(table, METRE.divide(1e6), "micron", "microns");
    prefixed(table, one.divide(SECOND), "Hz", "k");
    alias(table);
    return Collections.unmodifiableMap(table);
  }

  private static void prefixed(
      Map<String, Unit<?>> table, Unit<?> unit, String name, String... prefixes) {
    table.put(name, unit);
    for (String prefix : prefixes) {
      table.put(prefix + name, unit.multiply(power(prefix)));
    }
  }

  private static double power(String prefix) {
    return switch (prefix) {
      case "n" -> 1e-9;
      case "µ" -> 1e-6;
      case "m" -> 1e-3;
      case "c" -> 1e-2;
      case "d" -> 1e-1;
      case "da" -> 1e1;
      case "h" -> 1e2;
      case "k" -> 1e3;
      case "M" -> 1e6;
      case "G" -> 1e9;
      default -> throw new IllegalArgumentException("no prefix " + prefix);
    };
  }

  private static void names(Map<String, Unit<?>> table, Unit<?> unit, String... names) {
    for (String name : names) {
      table.put(name, unit);
    }
  }

  /** The letter mu (U+03BC) and a plain u stand for the micro sign (U+00B5). */
  private static void alias(Map<String, Unit<?>> table) {
    Map<String, Unit<?>> more = new LinkedHashMap<>();
    table.forEach(
        (name, unit) -> {
          if (name.startsWith("µ")) {
            more.put("\u03bc" + name.substring(1), unit);
            more.put("u" + name.substring(1), unit);
          }
        });
    more.forEach(table::putIfAbsent);
  }

  /** Our dimension for a base dimension of the kept library. */
  static Dimension dimension(javax.measure.Dimension base) {
    if (base.equals(UnitDimension.LENGTH)) {
      return Dimension.LENGTH;
    }
    if (base.equals(UnitDimension.MASS)) {
      return Dimension.MASS;
    }
    if (base.equals(UnitDimension.TIME)) {
      return Dimension.TIME;
    }
    if (base.equals(UnitDimension.TEMPERATURE)) {
      return Dimension.TEMPERATURE;
    }
    if (base.equals(ANGLE)) {
      return Dimension.ANGLE;
    }
    return Dimension.NUMBER;
  }
}
