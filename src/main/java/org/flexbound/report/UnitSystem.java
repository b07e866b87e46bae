package org.flexbound.report;

import java.util.Locale;
import java.util.Map;

/** The units in which a report is shown; files for machines stay in SI. */
public enum UnitSystem {
  /** Metre, newton, radian. */
  SI("si", 1, "m", 1, "N", 1, "rad"),
  /** Millimetre, kilonewton, milliradian: the trade's metric units. */
  MM_KN("mm-kn", 1e-3, "mm", 1e3, "kN", 1e-3, "mrad"),
  /** Inch, pound-force, radian: US customary units (NIST SP 811, appendix B). */
  IN_LBF("in-lbf", 0.0254, "in", 4.4482216152605, "lbf", 1, "rad");

  private final String option;
  private final double length;
  private final String lengthName;
  private final double force;
  private final String forceName;
  private final double angle;
  private final String angleName;

  UnitSystem(
      String option,
      double length,
      String lengthName,
      double force,
      String forceName,
      double angle,
      String angleName) {
    this.option = option;
    this.length = length;
    this.lengthName = lengthName;
    this.force = force;
    this.forceName = forceName;
    this.angle = angle;
    this.angleName = angleName;
  }

  /** What is shown for one SI unit. */
  private record Shown(double siFactor, String symbol) {}

  private Map<String, Shown> table() {
    double moment = force * length;
    String momentName = this == SI ? "N·m" : forceName + "·" + lengthName;
    // Moments and rotational stiffnesses in kN·mm are seldom wanted; the trade says kN·m.
    if (this == MM_KN) {
      moment = force;
      momentName = "kN·m";
    }
    return Map.ofEntries(
        Map.entry("m", new Shown(length, lengthName)),
        Map.entry("N", new Shown(force, forceName)),
        Map.entry("rad", new Shown(angle, angleName)),
        Map.entry("N·m", new Shown(moment, momentName)),
        Map.entry("m/N", new Shown(length / force, lengthName + "/" + forceName)),
        Map.entry("rad/N", new Shown(angle / force, angleName + "/" + forceName)),
        Map.entry("m/(N·m)", new Shown(length / moment, lengthName + "/(" + momentName + ")")),
        Map.entry("rad/(N·m)", new Shown(angle / moment, angleName + "/(" + momentName + ")")),
        Map.entry("1/N", new Shown(1e-6 / force, "µε/" + forceName)),
        Map.entry("1/(N·m)", new Shown(1e-6 / moment, "µε/(" + momentName + ")")),
        Map.entry("1", new Shown(1e-6, "µε")),
        Map.entry(
            "N/m", new Shown(force / length, forceName + "/" + lengthName)),
        Map.entry("N·m/rad", new Shown(moment, momentName + "/rad")),
        Map.entry("N·m²", new Shown(moment * (this == IN_LBF ? length : 1), momentName(momentName))),
        Map.entry("Pa", new Shown(stress(), stressName())),
        Map.entry("J", new Shown(this == IN_LBF ? moment : 1, this == IN_LBF ? "in·lbf" : "J")));
  }

  private static String momentName(String moment) {
    return switch (moment) {
      case "kN·m" -> "kN·m²";
      case "N·m" -> "N·m²";
      default -> "lbf·in²";
    };
  }

  private double stress() {
    return switch (this) {
      case SI -> 1;
      case MM_KN -> 1e9;
      case IN_LBF -> 6894.757293168361;
    };
  }

  private String stressName() {
    return switch (this) {
      case SI -> "Pa";
      case MM_KN -> "GPa";
      case IN_LBF -> "psi";
    };
  }

  /**
   * The SI unit of a motion per load.
   *
   * @param motion the SI unit of the motion: m, rad or 1
   * @param load the SI unit of the load: N or N·m
   * @return such as {@code m/N} or {@code rad/(N·m)}
   */
  public static String per(String motion, String load) {
    return motion + "/" + (load.equals("N") ? "N" : "(" + load + ")");
  }

  /**
   * How the system is named on the command line.
   *
   * @return such as {@code mm-kn}
   */
  public String option() {
    return option;
  }

  /**
   * Turns an SI value into the unit that is shown.
   *
   * @param si the value
   * @param unit its SI unit, as results.json spells it
   * @return the value to show; unchanged for a unit that is not known here
   */
  public double shown(double si, String unit) {
    Shown shown = table().get(unit);
    return shown == null ? si : si / shown.siFactor();
  }

  /**
   * The symbol that is shown for an SI unit.
   *
   * @param unit the SI unit, as results.json spells it
   * @return the symbol; unchanged for a unit that is not known here
   */
  public String symbol(String unit) {
    Shown shown = table().get(unit);
    return shown == null ? unit : shown.symbol();
  }

  /**
   * Finds a system by its name on the command line.
   *
   * @param text the name
   * @return the system
   * @throws IllegalArgumentException for an unknown name, with the known ones
   */
  public static UnitSystem parse(String text) {
    for (UnitSystem system : values()) {
      if (system.option.equals(text.toLowerCase(Locale.ROOT))) {
        return system;
      }
    }
    throw new IllegalArgumentException(
        "'" + text + "' is not a set of units; choose si, mm-kn or in-lbf");
  }
}
