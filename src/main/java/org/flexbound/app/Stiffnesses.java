package org.flexbound.app;

import java.util.OptionalDouble;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Parameter;

/** Stiffnesses of parameters as the summary shows them. */
final class Stiffnesses {
  private Stiffnesses() {}

  static String text(Parameter p, OptionalDouble value, UnitSystem units) {
    if (value.isEmpty()) {
      return "rigid";
    }
    double shown =
        p.unit().equals("1") ? value.getAsDouble() : units.shown(value.getAsDouble(), p.unit());
    return Rounded.significant(shown, 3);
  }

  static String interval(Parameter p, UnitSystem units) {
    if (p.lower95().isEmpty() && p.upper95().isEmpty()) {
      return "open";
    }
    if (p.upper95().isEmpty()) {
      return "above " + text(p, p.lower95(), units);
    }
    return p.lower95().isEmpty()
        ? "below " + text(p, p.upper95(), units)
        : text(p, p.lower95(), units) + " to " + text(p, p.upper95(), units);
  }
}
