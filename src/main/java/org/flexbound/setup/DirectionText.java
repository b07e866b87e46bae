package org.flexbound.setup;

import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads directions and places as people write them in tables. */
public final class DirectionText {
  /** What a direction may look like, for messages. */
  public static final String EXPECTED = "+x, -z, (0, 0.7, -0.7), rx, -ry or r(0, 1, 1)";

  private static final String NUMBER = "\\s*([-+]?[0-9.]+(?:[eE][-+]?[0-9]+)?)\\s*";
  private static final Pattern AXIS = Pattern.compile("([-+\u2212]?)\\s*(r?)\\s*([xyz])");
  private static final Pattern COMPONENTS =
      Pattern.compile(
          "([-+\u2212]?)\\s*(r?)\\s*\\(" + NUMBER + "[,;]" + NUMBER + "[,;]" + NUMBER + "\\)");

  private DirectionText() {}

  /**
   * Reads a direction.
   *
   * @param text the text
   * @return the direction; empty where the text is not one, or the vector is zero
   */
  public static Optional<Direction> parse(String text) {
    String lower = text.strip().toLowerCase(Locale.ROOT);
    Matcher axis = AXIS.matcher(lower);
    if (axis.matches()) {
      Vector vector =
          switch (axis.group(3)) {
            case "x" -> new Vector(1, 0, 0);
            case "y" -> new Vector(0, 1, 0);
            default -> new Vector(0, 0, 1);
          };
      return Optional.of(
          new Direction(!axis.group(2).isEmpty(), vector.times(sign(axis.group(1)))));
    }
    Matcher components = COMPONENTS.matcher(lower);
    if (!components.matches()) {
      return Optional.empty();
    }
    try {
      Vector vector =
          new Vector(
              Double.parseDouble(components.group(3)),
              Double.parseDouble(components.group(4)),
              Double.parseDouble(components.group(5)));
      if (!(vector.norm() > 0) || Double.isInfinite(vector.norm())) {
        return Optional.empty();
      }
      return Optional.of(
          new Direction(
              !components.group(2).isEmpty(), vector.times(sign(components.group(1)))));
    } catch (NumberFormatException notNumbers) {
      return Optional.empty();
    }
  }

  private static double sign(String text) {
    return text.isEmpty() || text.equals("+") ? 1 : -1;
  }

  /**
   * Writes a direction as a table would have it.
   *
   * @param direction the direction
   * @return e.g. {@code +x} or {@code r(0, 0.6, 0.8)}
   */
  public static String print(Direction direction) {
    Vector v = direction.vector();
    String[] names = {"x", "y", "z"};
    double[] parts = {v.x(), v.y(), v.z()};
    for (int k = 0; k < 3; k++) {
      if (Math.abs(Math.abs(parts[k]) - 1) < 1e-12) {
        return (parts[k] > 0 ? "+" : "-") + (direction.rotation() ? "r" : "") + names[k];
      }
    }
    return String.format(
        Locale.ROOT, "%s(%s, %s, %s)", direction.rotation() ? "r" : "", v.x(), v.y(), v.z());
  }
}
