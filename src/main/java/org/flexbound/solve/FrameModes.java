package org.flexbound.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.frame.FrameModel;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.flexbound.sparse.EigenPairs;

/**
 * The lowest modes of a frame at its gauges and loads, and the flexibility that so many of them make:
 * G_n = Σ_{k≤n} (b·φ_k)(φ_k·c)/ω_k², φ mass-normalised. Rigid-body modes of a structure that can
 * move freely are found and set aside; its flexibility is then that of the motions without them.
 *
 * <p>What G_n lacks is positive semidefinite: direct coefficients are too small, cross coefficients
 * may be either. Immutable.
 */
public final class FrameModes {
  private final List<Gauge> gauges;
  private final List<Load> loads;
  private final double[] eigenvalues;
  private final double[] residuals;
  private final double orthogonality;
  private final int rigidBodyModes;
  private final int unknowns;
  private final double[][] atGauges;
  private final double[][] atLoads;
  private final double[][] full;
  private final double[][] massless;
  private final List<Map<String, double[]>> shapes;

  private FrameModes(ModalModel model, EigenPairs pairs, int rigid, double[][] full) {
    this.gauges = model.frame().gauges();
    this.loads = model.frame().loads();
    this.rigidBodyModes = rigid;
    this.unknowns = pairs.size();
    int count = pairs.count() - rigid;
    eigenvalues = Arrays.copyOfRange(pairs.values(), rigid, pairs.count());
    residuals = Arrays.copyOfRange(pairs.residuals(), rigid, pairs.count());
    orthogonality = pairs.orthogonality();
    atGauges = new double[count][];
    atLoads = new double[count][];
    shapes = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      double[] motions = model.expand(pairs.vector(rigid + k));
      atGauges[k] = model.atGauges(motions);
      atLoads[k] = model.atLoads(motions);
      shapes.add(model.atNodes(motions));
    }
    this.full = full;
    this.massless = MasslessPart.of(model);
  }

  /**
   * Works out the lowest modes.
   *
   * @param model the frame, with densities or masses
   * @param gauges the rows
   * @param loads the columns
   * @param settings how many, and how members are divided
   * @return the modes with what was found; no value where anything is in error
   */
  public static Outcome<FrameModes> of(
      FrameModel model, List<Gauge> gauges, List<Load> loads, ModeSettings settings) {
    Findings findings = new Findings();
    Optional<DividedFrame.Settled> settled =
        DividedFrame.settle(model, gauges, loads, settings, findings);
    if (settled.isEmpty()) {
      return Outcome.none(findings.list());
    }
    return of(settled.get(), settings.count(), findings);
  }

  /** The modes of a divided frame that were found already. */
  static Outcome<FrameModes> of(DividedFrame.Settled settled, int count, Findings findings) {
    FrameModel model = settled.frame().model();
    ModalModel modal = settled.nominal();
    EigenPairs pairs = settled.pairs();
    int rigid = settled.rigid();
    tell(pairs, count + rigid, model, findings);
    if (findings.hasErrors()) {
      return Outcome.none(findings.list());
    }
    double[][] full = modal.full(pairs, rigid, findings);
    return findings.hasErrors()
        ? Outcome.none(findings.list())
        : Outcome.of(new FrameModes(modal, pairs, rigid, full), findings.list());
  }

  private static void tell(
      EigenPairs pairs, int wanted, FrameModel model, Findings findings) {
    String problem =
        switch (pairs.outcome()) {
          case COMPLETE -> "";
          case FEWER_EXIST ->
              "there are only " + pairs.count() + " modes, not " + wanted;
          case BASIS_FULL ->
              "only " + pairs.count() + " of " + wanted + " modes settled";
          case SOME_MISSED ->
              String.format(
                  Locale.ROOT,
                  "%d modes lie below the highest that was found, but only %d were found",
                  pairs.countedBelow(),
                  pairs.count());
        };
    if (!problem.isEmpty()) {
      findings.add(SolveFinding.MODES_NOT_SETTLED, model.where(), problem);
    }
  }

  /** How many elastic modes there are. */
  public int count() {
    return eigenvalues.length;
  }

  /** How many rigid-body modes were set aside. */
  public int rigidBodyModes() {
    return rigidBodyModes;
  }

  /** How many unknowns the modes were worked out with. */
  public int unknowns() {
    return unknowns;
  }

  /**
   * The natural frequencies.
   *
   * @return Hz, ascending
   */
  public double[] frequencies() {
    return Arrays.stream(eigenvalues).map(v -> Math.sqrt(v) / (2 * Math.PI)).toArray();
  }

  /**
   * How well each mode satisfies the equations.
   *
   * @return relative residuals
   */
  public double[] residuals() {
    return residuals.clone();
  }

  /**
   * How far the modes are from mass-normalised and orthogonal.
   *
   * @return the largest entry of |ΦᵀMΦ − I|
   */
  public double orthogonality() {
    return orthogonality;
  }

  /**
   * A mode at the gauges.
   *
   * @param mode from 0
   * @return what every gauge reads for the mass-normalised mode, gauge unit per √kg
   */
  public double[] atGauges(int mode) {
    return atGauges[mode].clone();
  }

  /**
   * A mode at the nodes.
   *
   * @param mode from 0
   * @return by node six motions, mass-normalised
   */
  public Map<String, double[]> shape(int mode) {
    Map<String, double[]> copy = new LinkedHashMap<>();
    shapes.get(mode).forEach((node, motions) -> copy.put(node, motions.clone()));
    return copy;
  }

  /**
   * The whole static flexibility.
   *
   * @return [gauge][load]
   */
  public double[][] full() {
    return Arrays.stream(full).map(double[]::clone).toArray(double[][]::new);
  }

  /**
   * The flexibility of the lowest modes.
   *
   * @param modes how many, from 0 to {@link #count()}
   * @return [gauge][load]
   */
  public double[][] truncated(int modes) {
    if (modes < 0 || modes > count()) {
      throw new IllegalArgumentException(modes + " of " + count() + " modes were asked for");
    }
    double[][] sum = new double[gauges.size()][loads.size()];
    for (int k = 0; k < modes; k++) {
      for (int g = 0; g < sum.length; g++) {
        for (int l = 0; l < sum[g].length; l++) {
          sum[g][l] += atGauges[k][g] * atLoads[k][l] / eigenvalues[k];
        }
      }
    }
    return sum;
  }

  /**
   * What so many modes leave out.
   *
   * @param modes how many
   * @return full less truncated, [gauge][load]
   */
  public double[][] remainder(int modes) {
    double[][] result = truncated(modes);
    for (int g = 0; g < result.length; g++) {
      for (int l = 0; l < result[g].length; l++) {
        result[g][l] = full[g][l] - result[g][l];
      }
    }
    return result;
  }

  /**
   * What no number of modes makes up, since freedoms without mass follow statically.
   *
   * @return [gauge][load]; zero where every freedom has mass
   */
  public double[][] massless() {
    return Arrays.stream(massless).map(double[]::clone).toArray(double[][]::new);
  }

  /**
   * From how many modes on a truncated coefficient stays within a share of the full one.
   *
   * @param gauge the gauge's index
   * @param load the load's index
   * @param share such as 0.05
   * @return the number of modes; empty where the modes at hand do not get there
   */
  public OptionalInt enough(int gauge, int load, double share) {
    double allowed = share * Math.abs(full[gauge][load]);
    double sum = 0;
    int enough = Math.abs(full[gauge][load]) <= allowed ? 0 : -1;
    for (int k = 0; k < count(); k++) {
      sum += atGauges[k][gauge] * atLoads[k][load] / eigenvalues[k];
      if (Math.abs(full[gauge][load] - sum) > allowed) {
        enough = -1;
      } else if (enough < 0) {
        enough = k + 1;
      }
    }
    return enough < 0 ? OptionalInt.empty() : OptionalInt.of(enough);
  }

  /** The gauges, the rows. */
  public List<Gauge> gauges() {
    return gauges;
  }

  /** The loads, the columns. */
  public List<Load> loads() {
    return loads;
  }
}
