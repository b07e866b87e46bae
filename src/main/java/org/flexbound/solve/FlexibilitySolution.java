package org.flexbound.solve;

import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;

/**
 * The flexibility of a frame for one setting of its stiffnesses: coefficients, sensitivities,
 * contributions, deflected shapes, all from one factorization. Immutable.
 */
public final class FlexibilitySolution implements ComputedFlexibility {
  private final FrameFlexibility problem;
  private final Structure structure;
  private final State state;
  private final Fields fields;
  private final Evidence evidence;
  private final List<StiffnessSetting> settings;
  private final double[][] values;
  private final Derivatives derivatives;

  FlexibilitySolution(
      FrameFlexibility problem,
      Structure structure,
      State state,
      Fields fields,
      Evidence evidence,
      List<StiffnessSetting> settings) {
    this.problem = problem;
    this.settings = List.copyOf(settings);
    this.structure = structure;
    this.state = state;
    this.fields = fields;
    this.evidence = evidence;
    int g = problem.gauges().size();
    int l = problem.loads().size();
    values = new double[g][l];
    for (int i = 0; i < g; i++) {
      for (int j = 0; j < l; j++) {
        values[i][j] = read(problem.gaugeRows().get(i), g + j);
      }
    }
    derivatives =
        new Derivatives(
            new Sensitivity(structure, state, fields, problem.gaugeRows()),
            problem.mesh().slots(),
            state.stiffness(),
            g,
            l);
  }

  /** The structure that was solved. */
  Structure structure() {
    return structure;
  }

  /** Its stiffnesses. */
  State state() {
    return state;
  }

  /** What a functional reads under a column of motions. */
  private double read(Functional functional, int column) {
    return fields.read(functional, structure, state, column);
  }

  @Override
  public double value(int gauge, int load) {
    return values[gauge][load];
  }

  @Override
  public double[][] values() {
    return Arrays.stream(values).map(double[]::clone).toArray(double[][]::new);
  }

  @Override
  public double[][] derivative(int parameter, Derivative by) {
    return derivative(problem.parameters().get(parameter), by);
  }

  @Override
  public double[][] derivative(StiffnessPath path, Derivative by) {
    return derivatives.by(path, by, problem.asSet(path, settings));
  }

  @Override
  public double[][][] byLogarithms(List<List<StiffnessPath>> groups) {
    return derivatives.byLogarithms(groups);
  }

  @Override
  public List<PartContribution> contributions(int gauge, int load) {
    return derivatives.contributions(gauge, load);
  }

  @Override
  public double[][][] byGaugePlace(int gauge) {
    return problem
        .places()
        .byGauge(gauge, (row, load) -> read(row, problem.gauges().size() + load));
  }

  @Override
  public double[][][] byLoadPlace(int load) {
    return problem.places().byLoad(load, this::read);
  }

  /**
   * The deflected shape under a load.
   *
   * @param load the load's index
   * @return by node: three displacements (m) and three rotations (rad) per unit of the load, global
   *     axes
   */
  public Map<String, double[]> shape(int load) {
    Map<String, double[]> result = new LinkedHashMap<>();
    int from = (problem.gauges().size() + load) * fields.size();
    problem
        .mesh()
        .pointOfNode()
        .forEach(
            (node, point) ->
                result.put(
                    node,
                    Arrays.copyOfRange(
                        fields.motions(), from + 6 * point, from + 6 * point + 6)));
    return Collections.unmodifiableMap(result);
  }

  /**
   * How far the solution can be trusted numerically.
   *
   * @return residual, refinement, pivots
   */
  public Evidence evidence() {
    return evidence;
  }
}
