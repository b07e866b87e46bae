package org.flexbound.frame;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.setup.SectionPoint;

/**
 * The shapes of cross-sections. Depth is along the member's z, width along its y.
 *
 * <p>To add a shape: a constant here with its dimensions, its properties in one of the section
 * classes, a published table as a check file, and a line in the schema of the frame model.
 */
public enum Shape {
  /** A solid circle. */
  SOLID_ROUND("solid round", List.of("diameter"), List.of(), RoundSections::solid),
  /** A circular tube. */
  TUBE("tube", List.of("diameter", "wall"), List.of(), RoundSections::tube),
  /** A solid rectangle. */
  RECTANGLE("rectangle", List.of("depth", "width"), List.of(), RectangularSections::solid),
  /** A rectangular hollow section; without radii its corners are sharp. */
  RECTANGULAR_HOLLOW(
      "rectangular hollow",
      List.of("depth", "width", "wall"),
      List.of("outerRadius", "innerRadius"),
      RectangularSections::hollow),
  /** A doubly symmetric I with parallel flanges; radius is that of its fillets. */
  I("I", List.of("depth", "width", "web", "flange"), List.of("radius"), OpenSections::i),
  /** A channel with parallel flanges, web along z, flanges towards +y. */
  CHANNEL(
      "channel",
      List.of("depth", "width", "web", "flange"),
      List.of("radius"),
      OpenSections::channel),
  /** An angle: one leg along z at the side of −y, one along y at the side of −z. */
  ANGLE(
      "angle",
      List.of("depth", "width", "wall"),
      List.of("radius", "toeRadius"),
      OpenSections::angle),
  /** A T: flange along y at the side of +z, stem along z. */
  T("T", List.of("depth", "width", "web", "flange"), List.of("radius"), OpenSections::t);

  /** Works the properties out. */
  @FunctionalInterface
  interface Formula {
    SectionProperties properties(Map<String, Double> dimensions, double poissonRatio);
  }

  private final String key;
  @SuppressWarnings("ImmutableEnumChecker") // an unmodifiable list
  private final List<String> needed;

  @SuppressWarnings("ImmutableEnumChecker") // an unmodifiable list
  private final List<String> optional;

  @SuppressWarnings("ImmutableEnumChecker") // a pure function
  private final Formula formula;

  Shape(String key, List<String> needed, List<String> optional, Formula formula) {
    this.key = key;
    this.needed = needed;
    this.optional = optional;
    this.formula = formula;
  }

  /**
   * The shape as files spell it.
   *
   * @return its name
   */
  public String key() {
    return key;
  }

  /**
   * The dimensions that must be stated.
   *
   * @return their keys
   */
  public List<String> needed() {
    return needed;
  }

  /**
   * The dimensions that may be stated (0 where they are not).
   *
   * @return their keys
   */
  public List<String> optional() {
    return optional;
  }

  /**
   * The shape of a name.
   *
   * @param text as in a file, upper and lower case alike
   * @return the shape, if there is one
   */
  public static Optional<Shape> of(String text) {
    return Arrays.stream(values())
        .filter(shape -> shape.key.equalsIgnoreCase(text.strip()))
        .findFirst();
  }

  SectionProperties properties(Map<String, Double> dimensions, double poissonRatio) {
    return formula.properties(dimensions, poissonRatio);
  }

  /** Whether Cowper gives no coefficient and shear areas come from the shear flow of thin walls. */
  boolean shearByFlow() {
    return this == CHANNEL || this == ANGLE;
  }

  /** What is impossible about the dimensions, as a message; empty where all is well. */
  Optional<String> problem(Map<String, Double> d) {
    List<String> problems = new ArrayList<>();
    switch (this) {
      case TUBE -> lessThanHalf(problems, d, "wall", "diameter");
      case RECTANGULAR_HOLLOW -> {
        lessThanHalf(problems, d, "wall", "depth");
        lessThanHalf(problems, d, "wall", "width");
        double outer = d.getOrDefault("outerRadius", 0.0);
        if (2 * outer > Math.min(size(d, "depth"), size(d, "width"))) {
          problems.add("'outerRadius' must be at most half of depth and width");
        }
        if (d.getOrDefault("innerRadius", 0.0) > outer) {
          problems.add("'innerRadius' must be at most 'outerRadius'");
        }
      }
      case I, CHANNEL -> {
        lessThanHalf(problems, d, "flange", "depth");
        lessThan(problems, d, "web", "width");
      }
      case T -> {
        lessThan(problems, d, "flange", "depth");
        lessThan(problems, d, "web", "width");
      }
      case ANGLE -> {
        lessThan(problems, d, "wall", "depth");
        lessThan(problems, d, "wall", "width");
      }
      case SOLID_ROUND, RECTANGLE -> {}
    }
    return problems.isEmpty() ? Optional.empty() : Optional.of(String.join(", and ", problems));
  }

  private static void lessThanHalf(
      List<String> problems, Map<String, Double> d, String small, String large) {
    if (2 * size(d, small) >= size(d, large)) {
      problems.add("'" + small + "' must be less than half of '" + large + "'");
    }
  }

  private static void lessThan(
      List<String> problems, Map<String, Double> d, String small, String large) {
    if (size(d, small) >= size(d, large)) {
      problems.add("'" + small + "' must be less than '" + large + "'");
    }
  }

  static double size(Map<String, Double> dimensions, String key) {
    return dimensions.getOrDefault(key, 0.0);
  }

  /**
   * Whether a point, from the centroid, can lie on a section of this size.
   *
   * @param dimensions the dimensions
   * @param point the point
   * @return false where it lies farther out than the section's whole depth or width
   */
  public boolean mayHold(Map<String, Double> dimensions, SectionPoint point) {
    double depth = dimensions.getOrDefault("depth", size(dimensions, "diameter"));
    double width = dimensions.getOrDefault("width", size(dimensions, "diameter"));
    return Math.abs(point.z()) <= depth * 1.000001 && Math.abs(point.y()) <= width * 1.000001;
  }
}
