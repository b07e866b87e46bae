package org.flexbound.frame;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.function.Function;
import org.flexbound.document.Json;
import org.flexbound.finding.Where;

/**
 * Writes a model: the user's own entries and units as they were read, and factors where stiffnesses
 * were set. A factor is a number; a stiffness set in place of a rigid or free one is a text with its
 * unit.
 */
public final class FrameWriter {
  private static final String FACTORS = "factors";

  private FrameWriter() {}

  /**
   * Writes a model as JSON.
   *
   * @param model the model
   * @return the text of the file, with a line feed at its end
   */
  public static String write(FrameModel model) {
    return JsonText.of(tree(model));
  }

  /** The tree of values with the factors that the model has. */
  static Json.Members tree(FrameModel model) {
    Map<String, Json> top = new LinkedHashMap<>(model.source().members());
    set(
        top,
        "materials",
        model.materials(),
        material ->
            material.factor().equals(StiffnessSetting.nominal())
                ? Map.of()
                : Map.of("E", value(material.factor(), Measure.STRESS, SpringReader.RIGID)));
    set(top, "members", model.members(), FrameWriter::factors);
    set(
        top,
        "joints",
        model.joints(),
        joint -> springs(joint.springs().factors(), SpringReader.RIGID));
    set(
        top,
        "connections",
        model.connections(),
        connection -> springs(connection.factors(), SpringReader.RIGID));
    set(
        top,
        "supports",
        model.supports(),
        support -> springs(support.springs().factors(), SpringReader.FIXED));
    return new Json.Members(model.source().where(), top);
  }

  private static Map<String, Json> factors(Member member) {
    Map<String, Json> factors = new LinkedHashMap<>();
    member
        .factors()
        .forEach(
            (rigidity, setting) ->
                factors.put(
                    rigidity.key(), value(setting, Measure.of(rigidity), SpringReader.RIGID)));
    return factors;
  }

  private static Map<String, Json> springs(
      Map<Spring, StiffnessSetting> settings, String rigid) {
    Map<String, Json> factors = new LinkedHashMap<>();
    settings.forEach(
        (spring, setting) ->
            factors.put(spring.key(), value(setting, Measure.of(spring), rigid)));
    return factors;
  }

  private static Json value(StiffnessSetting setting, Measure measure, String rigid) {
    if (setting instanceof StiffnessSetting.Factor factor) {
      return new Json.Numeral(Where.nowhere(), factor.factor());
    }
    double stiffness = ((StiffnessSetting.Value) setting).stiffness();
    if (stiffness == 0) {
      return new Json.Text(Where.nowhere(), SpringReader.FREE);
    }
    return new Json.Text(
        Where.nowhere(),
        Double.isInfinite(stiffness) ? rigid : stiffness + " " + measure.siSymbol());
  }

  /** Sets the factors of all entries of a table. */
  private static <T> void set(
      Map<String, Json> top, String table, Map<String, T> parts, Function<T, Map<String, Json>> of) {
    if (!(top.get(table) instanceof Json.Members members)) {
      return;
    }
    Map<String, Json> all = new LinkedHashMap<>(members.members());
    parts.forEach(
        (name, part) -> {
          if (all.get(name) instanceof Json.Members fields) {
            all.put(name, withFactors(fields, of.apply(part)));
          }
        });
    top.put(table, new Json.Members(members.where(), all));
  }

  private static Json.Members withFactors(Json.Members entry, Map<String, Json> factors) {
    if (factors.isEmpty() && entry.get(FACTORS).isEmpty()) {
      return entry;
    }
    Map<String, Json> changed = new LinkedHashMap<>(entry.members());
    if (factors.isEmpty()) {
      changed.remove(FACTORS);
    } else {
      changed.put(FACTORS, new Json.Members(Where.nowhere(), factors));
    }
    return new Json.Members(entry.where(), changed);
  }
}
