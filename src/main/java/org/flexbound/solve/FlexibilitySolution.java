package org.flexbound.solve;

import java.util.ArrayList;
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
public final class FlexibilitySolution {
  private final FrameFlexibility problem;
  private final Structure structure;
  private final State state;
  private final Fields fields;
  private final Evidence evidence;
  private final List<StiffnessSetting> settings;
  private final double[][] values;
  private final Sensitivity sensitivity;

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
    sensitivity = new Sensitivity(structure, state, fields, problem.gaugeRows(), l);
  }

  /** What a functional reads under a column of motions. */
  private double read(Functional functional, int column) {
    double motion = functional.of(fields.motions(), column * fields.size());
    if (functional.strain().isEmpty()) {
      return motion;
    }
    Functional.Strain strain = functional.strain().get();
    double[] d =
        structure
            .elements()
            .get(strain.element())
            .deformation(fields.motions(), column, fields.size());
    double[] s = Matrix6.times(state.basic(strain.element()), d);
    return motion + Matrix6.dot(strain.row(state.stiffness()), s);
  }

  /**
   * A coefficient.
   *
   * @param gauge the gauge's index
   * @param load the load's index
   * @return motion (or strain) at the gauge per unit of the load, SI
   */
  public double value(int gauge, int load) {
    return values[gauge][load];
  }

  /**
   * All coefficients.
   *
   * @return [gauge][load], SI, a copy
   */
  public double[][] values() {
    return Arrays.stream(values).map(double[]::clone).toArray(double[][]::new);
  }

  /**
   * The derivative of all coefficients by one parameter.
   *
   * @param parameter the parameter's index
   * @param by its logarithm, compliance or stiffness
   * @return [gauge][load]
   */
  public double[][] derivative(int parameter, Derivative by) {
    return derivative(problem.parameters().get(parameter), by);
  }

  /**
   * The derivative of all coefficients by any stiffness of the model. For a joint that connections
   * use with a factor of their own, compliance and stiffness are those of the joint.
   *
   * @param path the stiffness
   * @param by its logarithm, compliance or stiffness
   * @return [gauge][load]
   */
  public double[][] derivative(StiffnessPath path, Derivative by) {
    int loads = problem.loads().size();
    double[][] result = new double[problem.gauges().size()][loads];
    double[] ratio = new double[state.stiffness().length];
    boolean[] wanted = new boolean[ratio.length];
    for (Slots.Target target : problem.mesh().slots().targets(path)) {
      wanted[target.slot()] = true;
      ratio[target.slot()] = target.ratio();
    }
    boolean material = path.group() == StiffnessPath.Group.MATERIALS;
    sensitivity.collect(
        wanted,
        (slot, gauge, load, kind, value) -> {
          double stiffness = state.stiffness()[slot];
          Derivative wantedKind = material ? Derivative.LOGARITHM : by;
          double converted = Sensitivity.convert(kind, value, wantedKind, stiffness);
          double factor =
              material
                  ? 1
                  : switch (by) {
                    case LOGARITHM -> 1;
                    case COMPLIANCE -> 1 / ratio[slot];
                    case STIFFNESS -> ratio[slot];
                  };
          result[gauge][load] += factor * converted;
        });
    if (material && by != Derivative.LOGARITHM) {
      double modulus = problem.asSet(path, settings).value();
      for (double[] row : result) {
        for (int l = 0; l < loads; l++) {
          row[l] = Sensitivity.convert(Derivative.LOGARITHM, row[l], by, modulus);
        }
      }
    }
    return result;
  }

  /**
   * The derivatives of all coefficients by the logarithms of many stiffnesses, in one pass over the
   * elements.
   *
   * @param groups for each parameter the stiffnesses that it scales together
   * @return [parameter][gauge][load]
   */
  public double[][][] byLogarithms(List<List<StiffnessPath>> groups) {
    double[][][] result =
        new double[groups.size()][problem.gauges().size()][problem.loads().size()];
    boolean[] wanted = new boolean[state.stiffness().length];
    int[][] of = new int[wanted.length][0];
    for (int k = 0; k < groups.size(); k++) {
      for (StiffnessPath path : groups.get(k)) {
        for (Slots.Target target : problem.mesh().slots().targets(path)) {
          wanted[target.slot()] = true;
          int[] before = of[target.slot()];
          of[target.slot()] = Arrays.copyOf(before, before.length + 1);
          of[target.slot()][before.length] = k;
        }
      }
    }
    sensitivity.collect(
        wanted,
        (slot, gauge, load, kind, value) -> {
          double converted =
              Sensitivity.convert(
                  kind, value, Derivative.LOGARITHM, state.stiffness()[slot]);
          for (int k : of[slot]) {
            result[k][gauge][load] += converted;
          }
        });
    return result;
  }

  /**
   * What every part contributes to one coefficient; the contributions sum to it.
   *
   * @param gauge the gauge's index
   * @param load the load's index
   * @return the contributions that are not nothing, in the order members, joints at members' ends,
   *     connections, supports
   */
  public List<PartContribution> contributions(int gauge, int load) {
    boolean[] all = new boolean[state.stiffness().length];
    Arrays.fill(all, true);
    double[] sums = new double[all.length];
    sensitivity.collect(
        all,
        gauge,
        gauge + 1,
        load,
        load + 1,
        (slot, g, l, kind, value) ->
            sums[slot] -=
                Sensitivity.convert(
                    kind, value, Derivative.LOGARITHM, state.stiffness()[slot]));
    List<PartContribution> result = new ArrayList<>();
    for (int slot = 0; slot < sums.length; slot++) {
      if (sums[slot] != 0) {
        result.add(new PartContribution(problem.mesh().slots().part(slot), sums[slot]));
      }
    }
    result.sort((a, b) -> Integer.compare(rank(a), rank(b)));
    return Collections.unmodifiableList(result);
  }

  private static int rank(PartContribution contribution) {
    return switch (contribution.part().group()) {
      case MEMBERS, MATERIALS -> 0;
      case JOINTS -> 1;
      case CONNECTIONS -> 2;
      case SUPPORTS -> 3;
    };
  }

  /**
   * How the coefficients of a gauge change with its place and direction, held rigidly by the
   * structure where it stands (a strain gauge: with its place on the member).
   *
   * @param gauge the gauge's index
   * @return by place (one; two for a difference), then load, then x, y, z of the place (per m) and
   *     the angle of the direction about x, y, z (per rad)
   */
  public double[][][] byGaugePlace(int gauge) {
    List<Place> places = problem.gaugePlaces(gauge);
    int loads = problem.loads().size();
    int gauges = problem.gauges().size();
    double[][][] result = new double[places.size()][loads][6];
    for (int p = 0; p < places.size(); p++) {
      List<Functional> rows =
          problem.readings().byPlace(problem.gauges().get(gauge), places, p);
      for (int l = 0; l < loads; l++) {
        for (int k = 0; k < 6; k++) {
          result[p][l][k] = read(rows.get(k), gauges + l);
        }
      }
    }
    return result;
  }

  /**
   * How the coefficients of a load change with the place and direction of its points.
   *
   * @param load the load's index
   * @return by point of the pattern, then gauge, then x, y, z of the place (per m) and the angle of
   *     the direction about x, y, z (per rad)
   */
  public double[][][] byLoadPlace(int load) {
    List<Place> places = problem.loadPlaces(load);
    int gauges = problem.gauges().size();
    double[][][] result = new double[places.size()][gauges][6];
    for (int p = 0; p < places.size(); p++) {
      List<Functional> rows = problem.readings().byPlace(problem.loads().get(load), places, p);
      for (int g = 0; g < gauges; g++) {
        for (int k = 0; k < 6; k++) {
          // By reciprocity: the motion at the load under the unit load of the gauge.
          result[p][g][k] = read(rows.get(k), g);
        }
      }
    }
    return result;
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
