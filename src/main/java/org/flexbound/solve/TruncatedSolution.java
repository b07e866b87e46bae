package org.flexbound.solve;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.sparse.EigenPairs;
import org.jspecify.annotations.Nullable;

/**
 * The flexibility that the lowest elastic modes of a frame make, for one setting of its stiffnesses:
 * G_n = Σ_{k≤n} (b·φ_k)(φ_k·c)/ω_k². Its derivatives are those of the invariant subspace of the modes
 * below the cut ({@link SubspaceSensitivity}), so that modes may repeat and cross within it. What a
 * part contributes is −∂a/∂ln θ; since all stiffnesses together scale G_n as they scale the whole
 * flexibility, the contributions sum to the coefficient.
 */
public final class TruncatedSolution implements ComputedFlexibility {
  private final TruncatedFlexibility problem;
  private final ModalModel modal;
  private final ModePart part;
  private final List<StiffnessSetting> settings;
  private final double[][] values;

  /** Fields under gauges and loads, made of the modes below the cut. */
  private final Fields fields;

  /** Worked out when it is first asked for. */
  private @Nullable Derivatives derivatives;

  TruncatedSolution(
      TruncatedFlexibility problem,
      ModalModel modal,
      EigenPairs pairs,
      List<StiffnessSetting> settings) {
    this.problem = problem;
    this.modal = modal;
    this.settings = List.copyOf(settings);
    this.part = new ModePart(modal, pairs, problem.rigid(), problem.modeCount());
    this.fields = Fields.given(problem.frame().mesh().freedoms(), part.fields());
    int gauges = problem.gauges().size();
    values = new double[gauges][problem.loads().size()];
    for (int g = 0; g < gauges; g++) {
      for (int l = 0; l < values[g].length; l++) {
        values[g][l] = modal.read(problem.frame().gaugeRows().get(g), fields, gauges + l);
      }
    }
  }

  @Override
  public double value(int gauge, int load) {
    return values[gauge][load];
  }

  @Override
  public double[][] values() {
    return Arrays.stream(values).map(double[]::clone).toArray(double[][]::new);
  }

  /**
   * The natural frequencies of the modes worked out, beyond the cut too.
   *
   * @return Hz, ascending
   */
  public double[] frequencies() {
    return part.frequencies();
  }

  /**
   * How far the lowest mode left out lies above the highest one taken in. Where it is nearly nothing
   * the two are about to change places, and the coefficients then jump.
   *
   * @return the ratio of their frequencies less 1; infinite where no mode is left out
   */
  public double gapAboveCut() {
    double[] f = part.frequencies();
    int n = problem.modeCount();
    return n < f.length ? f[n] / f[n - 1] - 1 : Double.POSITIVE_INFINITY;
  }

  private Derivatives derivatives() {
    Derivatives known = derivatives;
    if (known == null) {
      int gauges = problem.gauges().size();
      int loads = problem.loads().size();
      Sensitivity within =
          new Sensitivity(
              modal.structure(), modal.state(), fields, problem.frame().gaugeRows());
      SubspaceSensitivity across = new SubspaceSensitivity(modal, part, gauges, loads);
      known =
          new Derivatives(
              (wanted, g0, g1, l0, l1, sink) -> {
                within.collect(wanted, g0, g1, l0, l1, sink);
                across.collect(wanted, g0, g1, l0, l1, sink);
              },
              problem.frame().mesh().slots(),
              modal.state().stiffness(),
              gauges,
              loads);
      derivatives = known;
    }
    return known;
  }

  @Override
  public double[][] derivative(int parameter, Derivative by) {
    return derivative(problem.parameters().get(parameter), by);
  }

  @Override
  public double[][] derivative(StiffnessPath path, Derivative by) {
    return derivatives().by(path, by, problem.asSet(path, settings));
  }

  @Override
  public double[][][] byLogarithms(List<List<StiffnessPath>> groups) {
    return derivatives().byLogarithms(groups);
  }

  @Override
  public List<PartContribution> contributions(int gauge, int load) {
    return derivatives().contributions(gauge, load);
  }

  @Override
  public double[][][] byGaugePlace(int gauge) {
    return problem
        .frame()
        .places()
        .byGauge(gauge, (row, load) -> modal.read(row, fields, problem.gauges().size() + load));
  }

  @Override
  public double[][][] byLoadPlace(int load) {
    return problem.frame().places().byLoad(load, (row, gauge) -> modal.read(row, fields, gauge));
  }
}
