package org.flexbound.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.flexbound.document.Json;
import org.flexbound.finding.Findings;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Quantity;
import org.flexbound.quantity.UnitException;

/** Reads one parameter of a study. */
final class ParameterReader {
  private static final List<String> KEYS =
      List.of(
          "scales",
          "lower",
          "upper",
          "priorStandardDeviation",
          "working",
          "referenceMember",
          "justification");
  private static final List<String> SPRING = List.of("x", "y", "z", "rx", "ry", "rz");
  private static final Map<String, List<String>> COMPONENTS =
      new TreeMap<>(
          Map.of(
              "joints", SPRING,
              "connections", SPRING,
              "supports", SPRING,
              "members", List.of("EA", "EIy", "EIz", "GJ", "GAy", "GAz"),
              "materials", List.of("E")));

  private final JsonEntries entries;
  private final Findings findings;

  private final boolean modelElsewhere;

  ParameterReader(JsonEntries entries, Findings findings, boolean modelElsewhere) {
    this.entries = entries;
    this.findings = findings;
    this.modelElsewhere = modelElsewhere;
  }

  Optional<Parameter> read(String name, Json value) {
    Optional<Json.Members> found = entries.members(value, "the parameter '" + name + "'");
    if (found.isEmpty()) {
      return Optional.empty();
    }
    Json.Members members = found.get();
    entries.refuseOtherKeys(members, KEYS);
    List<String> scales = scales(name, members);
    Optional<Level> lower = level(name, members, "lower", scales);
    Optional<Level> upper = level(name, members, "upper", scales);
    Working working = working(members);
    Optional<String> reference = entries.text(members, "referenceMember");
    if (working == Working.FIXITY && reference.isEmpty()) {
      findings.add(
          StudyFinding.MISSING_KEY,
          members.where(),
          "the parameter '"
              + name
              + "' is worked in its fixity factor, which needs the key 'referenceMember' with the"
              + " name of a member");
    }
    Optional<Spread> spread = spread(name, members, working, scales);
    if (working == Working.LN) {
      refuseEnd(name, members, "lower", lower);
      refuseEnd(name, members, "upper", upper);
    }
    refuseDisorder(name, members, lower, upper);
    if (scales.isEmpty() || lower.isEmpty() || upper.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Parameter(
            name,
            scales,
            lower.get(),
            upper.get(),
            spread,
            working,
            reference,
            entries.text(members, "justification").orElse(""),
            members.where()));
  }

  void refuseScaledTwice(List<Parameter> parameters) {
    Map<String, String> owner = new TreeMap<>();
    for (Parameter parameter : parameters) {
      for (String path : parameter.scales()) {
        String before = owner.putIfAbsent(path, parameter.name());
        if (before != null) {
          findings.add(
              StudyFinding.SCALED_TWICE,
              parameter.where(),
              "the parameter '"
                  + parameter.name()
                  + "' scales "
                  + path
                  + ", which "
                  + (before.equals(parameter.name()) ? "it already names" : "'" + before + "' scales too"));
        }
      }
    }
  }

  private List<String> scales(String name, Json.Members members) {
    Optional<Json> value = members.get("scales");
    if (modelElsewhere) {
      // The table has a column under the parameter's name; there is no model to look anything up in.
      return List.of(name);
    }
    if (value.isEmpty()) {
      findings.add(
          StudyFinding.MISSING_KEY,
          members.where(),
          "the parameter '" + name + "' has no key 'scales', which says what it multiplies");
      return List.of();
    }
    List<Json> items =
        value.get() instanceof Json.Text
            ? List.of(value.get())
            : entries.items(value.get(), "a stiffness such as \"joints.knee.rz\", or several");
    List<String> result = new ArrayList<>();
    for (Json item : items) {
      if (item instanceof Json.Text text) {
        if (isStiffness(text.text())) {
          result.add(text.text());
        } else {
          findings.add(
              StudyFinding.BAD_SCALE,
              item.where(),
              "found "
                  + item.shown()
                  + "; expected joints, connections or supports with x, y, z, rx, ry or rz, members"
                  + " with EA, EIy, EIz, GJ, GAy or GAz, or materials with E");
        }
      } else {
        entries.wrong(item, "a stiffness such as \"joints.knee.rz\"");
      }
    }
    if (items.isEmpty() && value.get() instanceof Json.Items) {
      entries.wrong(value.get(), "at least one stiffness, such as \"joints.knee.rz\"");
    }
    return result;
  }

  private static boolean isStiffness(String path) {
    int first = path.indexOf('.');
    int last = path.lastIndexOf('.');
    return first > 0
        && last > first + 1
        && COMPONENTS.getOrDefault(path.substring(0, first), List.of()).contains(path.substring(last + 1));
  }

  /** The dimension of the stiffness that a path names. */
  private static Optional<Dimension> dimension(List<String> scales) {
    if (scales.isEmpty()) {
      return Optional.empty();
    }
    String path = scales.get(0);
    if (path.indexOf('.') < 0) {
      return Optional.empty();
    }
    String component = path.substring(path.lastIndexOf('.') + 1);
    if (path.startsWith("members.")) {
      return Optional.of(
          component.startsWith("EI") || component.equals("GJ")
              ? Dimension.FORCE.times(Dimension.AREA)
              : Dimension.FORCE);
    }
    if (path.startsWith("materials.")) {
      return Optional.of(Dimension.STRESS);
    }
    return Optional.of(
        component.startsWith("r") ? Dimension.ROTATIONAL_STIFFNESS : Dimension.STIFFNESS);
  }

  private Optional<Level> level(
      String name, Json.Members members, String key, List<String> scales) {
    Optional<Json> value = members.get(key);
    if (value.isEmpty()) {
      findings.add(
          StudyFinding.MISSING_KEY,
          members.where(),
          "the parameter '"
              + name
              + "' has no key '"
              + key
              + "'; expected a multiple of the nominal stiffness or a stiffness with its unit");
      return Optional.empty();
    }
    if (value.get() instanceof Json.Numeral numeral) {
      if (numeral.value() > 0) {
        return Optional.of(new Level.OfNominal(numeral.value()));
      }
      entries.wrong(value.get(), "a multiple of the nominal stiffness above 0");
      return Optional.empty();
    }
    if (value.get() instanceof Json.Text text) {
      return switch (text.text().strip().toLowerCase(Locale.ROOT)) {
        case "rigid" -> Optional.of(new Level.Rigid());
        case "free" -> Optional.of(new Level.Free());
        default ->
            quantity(value.get(), text.text(), dimension(scales), key).map(Level.Stiffness::new);
      };
    }
    entries.wrong(
        value.get(), "a multiple of the nominal stiffness, a stiffness with its unit, rigid or free");
    return Optional.empty();
  }

  private Optional<Double> quantity(
      Json value, String text, Optional<Dimension> wanted, String key) {
    try {
      Quantity quantity = Quantity.parse(text);
      if (wanted.isPresent() && !quantity.unit().dimension().fits(wanted.get())) {
        entries.wrong(value, "the unit of what the parameter scales, for '" + key + "'");
        return Optional.empty();
      }
      if (!(quantity.si() > 0)) {
        entries.wrong(value, "a value above 0 for '" + key + "'");
        return Optional.empty();
      }
      return Optional.of(quantity.si());
    } catch (UnitException bad) {
      findings.add(StudyFinding.WRONG_KIND, value.where(), String.valueOf(bad.getMessage()));
      return Optional.empty();
    }
  }

  private Optional<Spread> spread(
      String name, Json.Members members, Working working, List<String> scales) {
    Optional<Json> value = members.get("priorStandardDeviation");
    if (value.isEmpty()) {
      return Optional.empty();
    }
    if (value.get() instanceof Json.Numeral numeral) {
      if (numeral.value() > 0) {
        return Optional.of(new Spread.InWorkingVariable(numeral.value()));
      }
      entries.wrong(value.get(), "a standard deviation above 0 for '" + name + "'");
      return Optional.empty();
    }
    if (value.get() instanceof Json.Text text && working == Working.COMPLIANCE) {
      Optional<Dimension> compliance = dimension(scales).map(Dimension.NUMBER::per);
      return quantity(value.get(), text.text(), compliance, "priorStandardDeviation")
          .map(Spread.OfCompliance::new);
    }
    entries.wrong(
        value.get(),
        "a number in the working variable (with the working variable compliance also a compliance"
            + " with its unit)");
    return Optional.empty();
  }

  private Working working(Json.Members members) {
    Optional<Json> value = members.get("working");
    if (value.isEmpty()) {
      return Working.LN;
    }
    for (Working working : Working.values()) {
      if (value.get() instanceof Json.Text text
          && text.text().equals(working.name().toLowerCase(Locale.ROOT))) {
        return working;
      }
    }
    entries.wrong(value.get(), "\"ln\", \"compliance\" or \"fixity\"");
    return Working.LN;
  }

  private void refuseEnd(String name, Json.Members members, String key, Optional<Level> level) {
    if (level.isPresent()
        && (level.get() instanceof Level.Rigid || level.get() instanceof Level.Free)) {
      findings.add(
          StudyFinding.BAD_BOUNDS,
          members.get(key).orElse(members).where(),
          "the parameter '"
              + name
              + "' is worked in its logarithm, which has no end at 'rigid' or 'free'; expected a"
              + " stiffness, or \"working\": \"compliance\" or \"fixity\"");
    }
  }

  private void refuseDisorder(
      String name, Json.Members members, Optional<Level> lower, Optional<Level> upper) {
    if (lower.isEmpty() || upper.isEmpty()) {
      return;
    }
    boolean disorder = lower.get() instanceof Level.Rigid || upper.get() instanceof Level.Free;
    if (lower.get() instanceof Level.OfNominal low && upper.get() instanceof Level.OfNominal high) {
      disorder = !(low.factor() < high.factor());
    } else if (lower.get() instanceof Level.Stiffness low
        && upper.get() instanceof Level.Stiffness high) {
      disorder = !(low.value() < high.value());
    }
    if (disorder) {
      findings.add(
          StudyFinding.BAD_BOUNDS,
          members.where(),
          "the lower bound of the parameter '" + name + "' is not below its upper bound");
    }
  }
}
