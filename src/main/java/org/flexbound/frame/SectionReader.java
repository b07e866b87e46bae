package org.flexbound.frame;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import org.flexbound.document.Json;

/** Reads materials and sections. */
final class SectionReader {
  private static final List<String> NUMBERS = List.of("A", "Iy", "Iz", "J", "Ay", "Az");

  private final Entries entries;
  private final SpringReader springs;

  SectionReader(Entries entries, SpringReader springs) {
    this.entries = entries;
    this.springs = springs;
  }

  Map<String, Material> materials(Json.Members top) {
    Map<String, Material> result = new LinkedHashMap<>();
    entries
        .table(top, "materials")
        .forEach((name, entry) -> material(name, entry).ifPresent(m -> result.put(name, m)));
    return result;
  }

  private Optional<Material> material(String name, Json.Members entry) {
    String owner = "the material '" + name + "'";
    entries.refuseOtherKeys(entry, owner, List.of("E", "nu", "G", "density", "factors"));
    OptionalDouble e = entries.neededPositive(entry, "E", owner, Measure.STRESS);
    OptionalDouble nu = entries.number(entry, "nu", Measure.NUMBER);
    OptionalDouble g = entries.positive(entry, "G", Measure.STRESS);
    OptionalDouble density = entries.number(entry, "density", Measure.DENSITY);
    if (density.isPresent() && density.getAsDouble() < 0) {
      entries.add(
          FrameFinding.OUT_OF_RANGE, entry.where(), owner + " has a density of less than 0");
    }
    boolean bothStated = entry.get("nu").isPresent() && entry.get("G").isPresent();
    if (nu.isEmpty() && g.isEmpty()) {
      if (entry.get("nu").isEmpty() && entry.get("G").isEmpty()) {
        entries.add(
            FrameFinding.MISSING_KEY, entry.where(), owner + " has neither key 'nu' nor key 'G'");
      }
      return Optional.empty();
    }
    if (nu.isPresent() && !(nu.getAsDouble() > -1 && nu.getAsDouble() <= 0.5)) {
      entries.add(
          FrameFinding.OUT_OF_RANGE,
          entry.where(),
          owner + " has a Poisson's ratio outside of −1 to 0.5");
      return Optional.empty();
    }
    if (e.isEmpty()) {
      return Optional.empty();
    }
    double fromNu = nu.isPresent() ? e.getAsDouble() / (2 * (1 + nu.getAsDouble())) : 0;
    if (bothStated && nu.isPresent() && g.isPresent()) {
      double stated = g.getAsDouble();
      if (Math.abs(fromNu - stated) > 0.02 * stated) {
        entries.add(
            FrameFinding.OUT_OF_RANGE,
            entry.where(),
            owner + " has E, nu and G that do not fit together; state nu or G, not both");
      }
    }
    return Optional.of(
        new Material(
            name,
            e.getAsDouble(),
            g.isPresent() ? g.getAsDouble() : fromNu,
            Math.max(0, density.orElse(0)),
            springs.materialFactor(entry, owner),
            entry.where()));
  }

  Map<String, Section> sections(Json.Members top) {
    Map<String, Section> result = new LinkedHashMap<>();
    entries
        .table(top, "sections")
        .forEach(
            (name, entry) ->
                shape("the section '" + name + "'", entry)
                    .ifPresent(
                        shape -> result.put(name, new Section(name, shape, entry.where()))));
    return result;
  }

  private Optional<SectionShape> shape(String owner, Json.Members entry) {
    if (entry.get("shape").isEmpty()) {
      return numbers(owner, entry);
    }
    Optional<String> text = entries.text(entry, "shape");
    if (text.isEmpty()) {
      return Optional.empty();
    }
    Optional<Shape> shape = Shape.of(text.get());
    if (shape.isEmpty()) {
      List<String> shapes = Arrays.stream(Shape.values()).map(Shape::key).toList();
      entries.add(
          FrameFinding.WRONG_KIND,
          entry.get("shape").orElse(entry).where(),
          "found the shape '" + text.get() + "'" + NearestName.hint(text.get(), shapes));
      return Optional.empty();
    }
    return dimensions(owner, entry, shape.get());
  }

  private Optional<SectionShape> dimensions(String owner, Json.Members entry, Shape shape) {
    List<String> keys = new ArrayList<>(List.of("shape"));
    keys.addAll(shape.needed());
    keys.addAll(shape.optional());
    entries.refuseOtherKeys(entry, owner + " (" + shape.key() + ")", keys);
    Map<String, Double> dimensions = new TreeMap<>();
    for (String key : shape.needed()) {
      entries
          .neededPositive(entry, key, owner, Measure.LENGTH)
          .ifPresent(value -> dimensions.put(key, value));
    }
    for (String key : shape.optional()) {
      double value = entries.number(entry, key, Measure.LENGTH).orElse(0);
      if (value < 0) {
        entries.add(
            FrameFinding.OUT_OF_RANGE, entry.where(), owner + " has a negative '" + key + "'");
        return Optional.empty();
      }
      dimensions.put(key, value);
    }
    if (!dimensions.keySet().containsAll(shape.needed())) {
      return Optional.empty();
    }
    Optional<String> problem = shape.problem(dimensions);
    if (problem.isPresent()) {
      entries.add(FrameFinding.OUT_OF_RANGE, entry.where(), "in " + owner + " " + problem.get());
      return Optional.empty();
    }
    if (shape.shearByFlow()) {
      entries.add(
          FrameFinding.SHEAR_BY_FLOW,
          entry.where(),
          owner + " is of the shape " + shape.key() + ", for which no shear coefficient is"
              + " published; its shear areas come from the shear flow of its walls");
    }
    return Optional.of(new SectionShape.ByShape(shape, dimensions));
  }

  private Optional<SectionShape> numbers(String owner, Json.Members entry) {
    boolean any = NUMBERS.stream().anyMatch(key -> entry.get(key).isPresent());
    if (!any) {
      entries.add(
          FrameFinding.MISSING_KEY,
          entry.where(),
          owner + " has neither a 'shape' nor the numbers A, Iy, Iz and J");
    }
    List<String> known = new ArrayList<>(NUMBERS);
    known.add("shape");
    entries.refuseOtherKeys(entry, owner, known);
    if (!any) {
      return Optional.empty();
    }
    OptionalDouble a = entries.neededPositive(entry, "A", owner, Measure.AREA);
    OptionalDouble iy = entries.neededPositive(entry, "Iy", owner, Measure.SECOND_MOMENT);
    OptionalDouble iz = entries.neededPositive(entry, "Iz", owner, Measure.SECOND_MOMENT);
    OptionalDouble j = entries.neededPositive(entry, "J", owner, Measure.SECOND_MOMENT);
    double ay = entries.positive(entry, "Ay", Measure.AREA).orElse(Double.POSITIVE_INFINITY);
    double az = entries.positive(entry, "Az", Measure.AREA).orElse(Double.POSITIVE_INFINITY);
    if (a.isEmpty() || iy.isEmpty() || iz.isEmpty() || j.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new SectionShape.ByNumbers(
            SectionProperties.symmetric(
                a.getAsDouble(), iy.getAsDouble(), iz.getAsDouble(), j.getAsDouble(), ay, az)));
  }
}
