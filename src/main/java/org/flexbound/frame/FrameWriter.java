package org.flexbound.frame;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
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
    model.materials().forEach(
        (name, material) -> {
          Map<String, Json> factors = new LinkedHashMap<>();
          if (!material.factor().equals(StiffnessSetting.nominal())) {
            factors.put("E", value(material.factor(), Measure.STRESS, SpringReader.RIGID));
          }
          set(top, "materials", name, factors);
        });
    model.members().forEach(
        (name, member) -> {
          Map<String, Json> factors = new LinkedHashMap<>();
          member.factors().forEach(
              (rigidity, setting) ->
                  factors.put(
                      rigidity.key(),
                      value(setting, Measure.of(rigidity), SpringReader.RIGID)));
          set(top, "members", name, factors);
        });
    model.joints().forEach(
        (name, joint) ->
            set(top, "joints", name, springs(joint.springs().factors(), SpringReader.RIGID)));
    model.connections().forEach(
        (name, connection) ->
            set(top, "connections", name, springs(connection.factors(), SpringReader.RIGID)));
    model.supports().forEach(
        (name, support) ->
            set(
                top,
                "supports",
                name,
                springs(support.springs().factors(), SpringReader.FIXED)));
    return new Json.Members(model.source().where(), top);
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

  private static void set(
      Map<String, Json> top, String table, String name, Map<String, Json> factors) {
    if (!(top.get(table) instanceof Json.Members members)) {
      return;
    }
    Optional<Json> entry = members.get(name);
    if (entry.isEmpty() || !(entry.get() instanceof Json.Members fields)) {
      return;
    }
    Map<String, Json> changed = new LinkedHashMap<>(fields.members());
    if (factors.isEmpty()) {
      if (changed.remove(FACTORS) == null) {
        return;
      }
    } else {
      changed.put(FACTORS, new Json.Members(Where.nowhere(), factors));
    }
    Map<String, Json> all = new LinkedHashMap<>(members.members());
    all.put(name, new Json.Members(fields.where(), changed));
    top.put(table, new Json.Members(members.where(), all));
  }
}
