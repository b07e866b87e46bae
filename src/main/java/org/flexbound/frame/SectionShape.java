package org.flexbound.frame;

import java.util.Map;

/** A cross-section by its numbers or by a shape with dimensions. */
public sealed interface SectionShape {
  /**
   * The properties that stiffness and mass are made of.
   *
   * @param poissonRatio ν of the material, on which Cowper's shear areas depend
   * @return areas and second moments
   */
  SectionProperties properties(double poissonRatio);

  /**
   * A section by its numbers.
   *
   * @param numbers as the user states them
   */
  record ByNumbers(SectionProperties numbers) implements SectionShape {
    @Override
    public SectionProperties properties(double poissonRatio) {
      return numbers;
    }
  }

  /**
   * A section by its shape.
   *
   * @param shape the shape
   * @param dimensions all of its dimensions by key, m
   */
  record ByShape(Shape shape, Map<String, Double> dimensions) implements SectionShape {
    /** Copies the map. */
    public ByShape {
      dimensions = Map.copyOf(dimensions);
    }

    @Override
    public SectionProperties properties(double poissonRatio) {
      return shape.properties(dimensions, poissonRatio);
    }

    /**
     * The section between this one and another of the same shape.
     *
     * @param end the other section
     * @param share 0 for this one, 1 for the other
     * @return the section whose dimensions lie linearly between
     */
    public ByShape towards(ByShape end, double share) {
      if (end.shape != shape) {
        throw new IllegalArgumentException("a " + shape.key() + " cannot taper to another shape");
      }
      Map<String, Double> between = new java.util.TreeMap<>();
      dimensions.forEach(
          (key, value) ->
              between.put(key, value + share * (end.dimensions.getOrDefault(key, value) - value)));
      return new ByShape(shape, between);
    }
  }
}
