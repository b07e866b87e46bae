package org.flexbound.frame;

import java.util.Arrays;
import java.util.Collections;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Six stiffnesses in their own axes, or a full symmetric matrix, with what an update made of them.
 *
 * <p>A factor f_k of a component of a full matrix K scales its row and its column by √f_k: K stays
 * symmetric and positive, and grows by f where all factors are f.
 */
public final class SpringSet {
  private final List<Stiffness> components;
  private final Optional<double[][]> matrix;
  private final Map<Spring, StiffnessSetting> factors;

  private SpringSet(
      List<Stiffness> components,
      Optional<double[][]> matrix,
      Map<Spring, StiffnessSetting> factors) {
    this.components = List.copyOf(components);
    this.matrix = matrix;
    Map<Spring, StiffnessSetting> copy = new EnumMap<>(Spring.class);
    copy.putAll(factors);
    this.factors = Collections.unmodifiableMap(copy);
  }

  /**
   * Six stiffnesses.
   *
   * @param components in the order of {@link Spring}
   * @return the set
   */
  public static SpringSet of(List<Stiffness> components) {
    if (components.size() != 6) {
      throw new IllegalArgumentException("six stiffnesses are needed, not " + components.size());
    }
    return new SpringSet(components, Optional.empty(), Map.of());
  }

  /**
   * A full matrix.
   *
   * @param matrix symmetric, 6 × 6, N/m, N/rad and N·m/rad
   * @return the set
   */
  public static SpringSet of(double[][] matrix) {
    double[][] copy = copy(matrix);
    List<Stiffness> diagonal =
        Arrays.stream(Spring.values())
            .map(spring -> new Stiffness(copy[spring.index()][spring.index()]))
            .toList();
    return new SpringSet(diagonal, Optional.of(copy), Map.of());
  }

  /**
   * The same with factors added to those it has.
   *
   * @param next the factors
   * @return the changed set
   */
  public SpringSet with(Map<Spring, StiffnessSetting> next) {
    Map<Spring, StiffnessSetting> all = new EnumMap<>(Spring.class);
    all.putAll(factors);
    next.forEach((spring, setting) -> all.merge(spring, setting, StiffnessSetting::then));
    return new SpringSet(components, matrix, all);
  }

  /**
   * The stiffness of a component (of a full matrix its diagonal entry) without factors.
   *
   * @param spring the component
   * @return as the user states it
   */
  public Stiffness stated(Spring spring) {
    return components.get(spring.index());
  }

  /**
   * The stiffness of a component (of a full matrix its diagonal entry) with its factor.
   *
   * @param spring the component
   * @return as set
   */
  public Stiffness stiffness(Spring spring) {
    return factor(spring).of(stated(spring));
  }

  /**
   * The factor of a component.
   *
   * @param spring the component
   * @return the setting, nominal where there is none
   */
  public StiffnessSetting factor(Spring spring) {
    return factors.getOrDefault(spring, StiffnessSetting.nominal());
  }

  /**
   * All factors that are set.
   *
   * @return by component
   */
  public Map<Spring, StiffnessSetting> factors() {
    return factors;
  }

  /**
   * The full matrix with factors, where the set was given as one.
   *
   * @return a copy, 6 × 6
   */
  public Optional<double[][]> matrix() {
    return matrix.map(
        stated -> {
          double[][] result = copy(stated);
          for (Spring row : Spring.values()) {
            for (Spring column : Spring.values()) {
              result[row.index()][column.index()] *=
                  Math.sqrt(scale(row)) * Math.sqrt(scale(column));
            }
          }
          return result;
        });
  }

  private double scale(Spring spring) {
    double nominal = stated(spring).value();
    return nominal == 0 ? 1 : stiffness(spring).value() / nominal;
  }

  private static double[][] copy(double[][] matrix) {
    return Arrays.stream(matrix).map(double[]::clone).toArray(double[][]::new);
  }
}
