package org.flexbound.flexibility;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.finding.Where;

/**
 * Measured modes of vibration, for the flexibility that they make up.
 *
 * <p>{@code a_ij = Σ_k φ_k(i) φ_k(j) / (m_k ω_k²)} over the modes stated. What the modes that were
 * not measured would add is positive semi-definite: direct coefficients come out too small.
 *
 * @param modes the modes, in the order of the table
 * @param where the table
 */
public record MeasuredModes(List<Mode> modes, Where where) {
  /** Copies the list. */
  public MeasuredModes {
    modes = List.copyOf(modes);
  }

  /**
   * One mode.
   *
   * @param configuration the configuration; empty for every one
   * @param name its name
   * @param angularFrequency ω, rad/s, above 0
   * @param frequencyUncertainty standard uncertainty of the frequency, relative, where stated
   * @param modalMass m = φᵀMφ, kg, above 0; 1 where the shape is mass-normalised
   * @param shape the shape's component along each gauge's and each load's direction, by their names,
   *     m or rad; in 1/√kg or rad/(m√kg) where it is mass-normalised
   * @param where its row
   */
  public record Mode(
      Optional<String> configuration,
      String name,
      double angularFrequency,
      OptionalDouble frequencyUncertainty,
      double modalMass,
      Map<String, Double> shape,
      Where where) {
    /** Copies the map and keeps its order; checks what is divided by. */
    public Mode {
      shape = Collections.unmodifiableMap(new LinkedHashMap<>(shape));
      if (!(angularFrequency > 0 && modalMass > 0)) {
        throw new IllegalArgumentException("a mode has a frequency and a modal mass above 0");
      }
    }

    private boolean isOf(String wanted) {
      return configuration.isEmpty() || configuration.get().equals(wanted);
    }
  }

  /**
   * The modes of a configuration.
   *
   * @param configuration its name
   * @return those stated for it and those stated for every configuration
   */
  public List<Mode> of(String configuration) {
    return modes.stream().filter(mode -> mode.isOf(configuration)).toList();
  }

  /**
   * The coefficient that the modes of a configuration make up.
   *
   * @param configuration the configuration's name
   * @param gauge the gauge's name
   * @param load the load's name
   * @return motion per load, SI; empty where a mode lacks one of the two, or there is no mode
   */
  public OptionalDouble coefficient(String configuration, String gauge, String load) {
    List<Mode> own = of(configuration);
    double sum = 0;
    for (Mode mode : own) {
      Double atGauge = mode.shape().get(gauge);
      Double atLoad = mode.shape().get(load);
      if (atGauge == null || atLoad == null) {
        return OptionalDouble.empty();
      }
      sum +=
          atGauge * atLoad / (mode.modalMass() * mode.angularFrequency() * mode.angularFrequency());
    }
    return own.isEmpty() ? OptionalDouble.empty() : OptionalDouble.of(sum);
  }
}
