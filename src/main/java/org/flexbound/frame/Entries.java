package org.flexbound.frame;

import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.document.Json;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Quantity;
import org.flexbound.quantity.UnitException;
import org.flexbound.setup.Vector;

/** Takes values out of the tree of a model, in SI, with a finding for each that is not as expected. */
final class Entries {
  private final Findings findings;
  private final DeclaredUnits units;

  Entries(Findings findings, DeclaredUnits units) {
    this.findings = findings;
    this.units = units;
  }

  Findings findings() {
    return findings;
  }

  void add(FrameFinding kind, Where where, String message) {
    findings.add(kind, where, message);
  }

  void wrong(Json value, String expected) {
    add(FrameFinding.WRONG_KIND, value.where(), "found " + value.shown() + "; expected " + expected);
  }

  void refuseOtherKeys(Json.Members members, String owner, Collection<String> known) {
    members
        .members()
        .forEach(
            (key, value) -> {
              if (!known.contains(key)) {
                add(
                    FrameFinding.UNKNOWN_KEY,
                    value.where(),
                    "found the key '" + key + "' in " + owner + NearestName.hint(key, known));
              }
            });
  }

  /** The entries of a table, in the order of the file; a table that is not there has none. */
  Map<String, Json.Members> table(Json.Members top, String key) {
    Map<String, Json.Members> result = new LinkedHashMap<>();
    Json value = top.members().get(key);
    if (value instanceof Json.Members table) {
      table
          .members()
          .forEach(
              (name, entry) -> {
                if (entry instanceof Json.Members members) {
                  result.put(name, members);
                } else {
                  wrong(entry, "an object in braces for '" + name + "' of " + key);
                }
              });
    } else if (value != null) {
      wrong(value, "an object with one entry a name for '" + key + "'");
    }
    return result;
  }

  /** The entries of a list of objects. */
  List<Json.Members> list(Json.Members top, String key) {
    List<Json.Members> result = new ArrayList<>();
    Json value = top.members().get(key);
    if (value instanceof Json.Items items) {
      for (Json item : items.items()) {
        if (item instanceof Json.Members members) {
          result.add(members);
        } else {
          wrong(item, "an object in braces, one of '" + key + "'");
        }
      }
    } else if (value != null) {
      wrong(value, "a list in brackets for '" + key + "'");
    }
    return result;
  }

  Optional<Json.Members> members(Json.Members owner, String key) {
    Json value = owner.members().get(key);
    if (value == null || value instanceof Json.Nothing) {
      return Optional.empty();
    }
    if (value instanceof Json.Members members) {
      return Optional.of(members);
    }
    wrong(value, "an object in braces for '" + key + "'");
    return Optional.empty();
  }

  Optional<String> text(Json.Members owner, String key) {
    Json value = owner.members().get(key);
    if (value == null || value instanceof Json.Nothing) {
      return Optional.empty();
    }
    if (value instanceof Json.Text text) {
      return Optional.of(text.text());
    }
    wrong(value, "a text for '" + key + "'");
    return Optional.empty();
  }

  /** The name of an entry of a table; empty, with a finding, where it is missing or unknown. */
  Optional<String> name(
      Json.Members owner, String key, String ownerName, String table, Collection<String> names) {
    if (!owner.members().containsKey(key)) {
      missing(owner, key, ownerName);
      return Optional.empty();
    }
    return optionalName(owner, key, table, names);
  }

  Optional<String> optionalName(
      Json.Members owner, String key, String table, Collection<String> names) {
    Json value = owner.members().get(key);
    return value == null || value instanceof Json.Nothing
        ? Optional.empty()
        : nameIn(value, key, table, names);
  }

  Optional<String> nameIn(Json value, String key, String table, Collection<String> names) {
    String name;
    if (value instanceof Json.Text text) {
      name = text.text();
    } else if (value instanceof Json.Numeral number) {
      // Nodes are often called 1, 2, 3.
      name = Json.plain(number.value());
    } else {
      wrong(value, "the name of one of the " + table + " for '" + key + "'");
      return Optional.empty();
    }
    if (!names.contains(name)) {
      add(
          FrameFinding.UNKNOWN_NAME,
          value.where(),
          "found '" + name + "', which is not one of the " + table + NearestName.hint(name, names));
      return Optional.empty();
    }
    return Optional.of(name);
  }

  void missing(Json.Members owner, String key, String ownerName) {
    add(FrameFinding.MISSING_KEY, owner.where(), ownerName + " has no key '" + key + "'");
  }

  /** A number that must be there. */
  OptionalDouble needed(Json.Members owner, String key, String ownerName, Measure measure) {
    if (!owner.members().containsKey(key)) {
      missing(owner, key, ownerName + " (" + measure.words() + ")");
      return OptionalDouble.empty();
    }
    return number(owner, key, measure);
  }

  OptionalDouble number(Json.Members owner, String key, Measure measure) {
    Json value = owner.members().get(key);
    return value == null || value instanceof Json.Nothing
        ? OptionalDouble.empty()
        : number(value, measure);
  }

  /** A positive number that must be there. */
  OptionalDouble neededPositive(Json.Members owner, String key, String ownerName, Measure measure) {
    OptionalDouble value = needed(owner, key, ownerName, measure);
    return value.isPresent() ? positive(owner, key, value.getAsDouble()) : value;
  }

  OptionalDouble positive(Json.Members owner, String key, Measure measure) {
    OptionalDouble value = number(owner, key, measure);
    return value.isPresent() ? positive(owner, key, value.getAsDouble()) : value;
  }

  private OptionalDouble positive(Json.Members owner, String key, double value) {
    if (value > 0) {
      return OptionalDouble.of(value);
    }
    Json found = owner.members().getOrDefault(key, owner);
    add(
        FrameFinding.OUT_OF_RANGE,
        found.where(),
        "found " + found.shown() + " for '" + key + "'; expected more than 0");
    return OptionalDouble.empty();
  }

  /** A number in the declared units, or a text with its own unit. */
  OptionalDouble number(Json value, Measure measure) {
    if (value instanceof Json.Numeral number) {
      return finite(value, number.value() * measure.factor(units));
    }
    if (value instanceof Json.Text text) {
      return quantity(value, text.text(), measure);
    }
    wrong(value, measure.words() + ", as a number or a text with its unit");
    return OptionalDouble.empty();
  }

  private OptionalDouble quantity(Json value, String text, Measure measure) {
    try {
      Quantity quantity = Quantity.parse(text);
      if (!quantity.unit().dimension().fits(measure.dimension())) {
        add(
            FrameFinding.WRONG_UNIT,
            value.where(),
            "found " + value.shown() + "; expected " + measure.words());
        return OptionalDouble.empty();
      }
      return finite(value, quantity.si());
    } catch (UnitException bad) {
      add(
          FrameFinding.WRONG_UNIT,
          value.where(),
          bad.getMessage() + "; expected " + measure.words());
      return OptionalDouble.empty();
    }
  }

  private OptionalDouble finite(Json value, double si) {
    if (Double.isFinite(si)) {
      return OptionalDouble.of(si);
    }
    wrong(value, "a finite number");
    return OptionalDouble.empty();
  }

  /** Three numbers. */
  Optional<Vector> vector(Json value, Measure measure) {
    if (value instanceof Json.Items items && items.items().size() == 3) {
      double[] v = new double[3];
      for (int i = 0; i < 3; i++) {
        OptionalDouble number = number(items.items().get(i), measure);
        if (number.isEmpty()) {
          return Optional.empty();
        }
        v[i] = number.getAsDouble();
      }
      return Optional.of(new Vector(v[0], v[1], v[2]));
    }
    wrong(value, "three numbers in brackets: [x, y, z]");
    return Optional.empty();
  }

  Optional<Vector> vector(Json.Members owner, String key, Measure measure) {
    Json value = owner.members().get(key);
    return value == null || value instanceof Json.Nothing
        ? Optional.empty()
        : vector(value, measure);
  }

  /** A direction: three numbers, or +x … -z. */
  Optional<Vector> direction(Json.Members owner, String key) {
    Json value = owner.members().get(key);
    if (value == null || value instanceof Json.Nothing) {
      return Optional.empty();
    }
    if (value instanceof Json.Text text) {
      Optional<Vector> axis = axis(text.text());
      if (axis.isEmpty()) {
        wrong(value, "a direction such as \"+z\" or [0, 0, 1]");
      }
      return axis;
    }
    Optional<Vector> vector = vector(value, Measure.NUMBER);
    if (vector.isPresent() && !(vector.get().norm() > 0)) {
      add(
          FrameFinding.BAD_GEOMETRY,
          value.where(),
          "found [0, 0, 0] for '" + key + "', which is no direction");
      return Optional.empty();
    }
    return vector;
  }

  private static Optional<Vector> axis(String text) {
    String word = text.strip().toLowerCase(Locale.ROOT);
    double sign = word.startsWith("-") ? -1 : 1;
    String letter = word.startsWith("-") || word.startsWith("+") ? word.substring(1) : word;
    return switch (letter) {
      case "x" -> Optional.of(Axes.GLOBAL.x().times(sign));
      case "y" -> Optional.of(Axes.GLOBAL.y().times(sign));
      case "z" -> Optional.of(Axes.GLOBAL.z().times(sign));
      default -> Optional.empty();
    };
  }

  /** Own axes by x and a second vector, y, at right angles to it; global axes where not stated. */
  Axes axes(Json.Members owner, String ownerName) {
    Optional<Json.Members> stated = members(owner, "axes");
    if (stated.isEmpty()) {
      return Axes.GLOBAL;
    }
    refuseOtherKeys(stated.get(), "the axes of " + ownerName, List.of("x", "y"));
    Optional<Vector> x = direction(stated.get(), "x");
    Optional<Vector> y = direction(stated.get(), "y");
    if (x.isEmpty() || y.isEmpty()) {
      if (!stated.get().members().containsKey("x") || !stated.get().members().containsKey("y")) {
        missing(
            stated.get(),
            stated.get().members().containsKey("x") ? "y" : "x",
            "the axes of " + ownerName);
      }
      return Axes.GLOBAL;
    }
    if (Math.abs(x.get().unit().dot(y.get().unit())) > 1e-3) {
      add(
          FrameFinding.BAD_GEOMETRY,
          stated.get().where(),
          "the axes x and y of " + ownerName + " are not at right angles");
      return Axes.GLOBAL;
    }
    return Axes.fromXy(x.get(), y.get());
  }
}
