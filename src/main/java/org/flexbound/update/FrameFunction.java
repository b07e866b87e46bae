package org.flexbound.update;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.compare.ConfiguredFrame;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.solve.Derivative;
import org.flexbound.solve.ComputedFlexibility;
import org.flexbound.study.Working;

/** The flexibility of frames, all configurations, as a function of the parameters. */
final class FrameFunction implements FlexibilityFunction {
  private final List<ConfiguredFrame> frames;
  private final List<WorkingParameter> parameters;
  private final List<List<StiffnessPath>> paths = new ArrayList<>();

  /** The paths of the parameters worked in the logarithm; none for the others. */
  private final List<List<StiffnessPath>> logarithmic = new ArrayList<>();

  FrameFunction(List<ConfiguredFrame> frames, List<WorkingParameter> parameters) {
    this.frames = List.copyOf(frames);
    this.parameters = List.copyOf(parameters);
    for (WorkingParameter parameter : parameters) {
      List<StiffnessPath> own =
          parameter.parameter().scales().stream()
              .map(text -> StiffnessPath.parse(text).orElseThrow())
              .toList();
      paths.add(own);
      logarithmic.add(parameter.parameter().working() == Working.LN ? own : List.of());
    }
  }

  /** What a point sets the stiffnesses to. */
  static Map<StiffnessPath, StiffnessSetting> settings(
      List<WorkingParameter> parameters, double[] x) {
    Map<StiffnessPath, StiffnessSetting> result = new LinkedHashMap<>();
    for (int k = 0; k < x.length; k++) {
      WorkingParameter parameter = parameters.get(k);
      StiffnessSetting setting =
          parameter.parameter().working() == Working.LN
              ? new StiffnessSetting.Factor(Math.exp(x[k]))
              : new StiffnessSetting.Value(parameter.stiffness(x[k]));
      for (String scale : parameter.parameter().scales()) {
        result.put(StiffnessPath.parse(scale).orElseThrow(), setting);
      }
    }
    return result;
  }

  @Override
  public double[] coefficients(double[] x) {
    Map<StiffnessPath, StiffnessSetting> settings = settings(parameters, x);
    double[] result = new double[0];
    for (ConfiguredFrame frame : frames) {
      result = joined(result, frame.absolute(frame.solve(settings).values()));
    }
    return result;
  }

  private static double[] joined(double[] a, double[] b) {
    double[] result = java.util.Arrays.copyOf(a, a.length + b.length);
    System.arraycopy(b, 0, result, a.length, b.length);
    return result;
  }

  @Override
  public Computed at(double[] x) {
    Map<StiffnessPath, StiffnessSetting> settings = settings(parameters, x);
    int size = frames.stream().mapToInt(f -> f.measured().absolute().size()).sum();
    double[] values = new double[size];
    double[][] jacobian = new double[size][x.length];
    int offset = 0;
    for (ConfiguredFrame frame : frames) {
      ComputedFlexibility solution = frame.solve(settings);
      double[] own = frame.absolute(solution.values());
      System.arraycopy(own, 0, values, offset, own.length);
      double[][][] logarithms = solution.byLogarithms(logarithmic);
      for (int k = 0; k < x.length; k++) {
        if (parameters.get(k).parameter().working() == Working.LN) {
          add(frame.absolute(logarithms[k]), jacobian, offset, k);
          continue;
        }
        for (StiffnessPath path : paths.get(k)) {
          int index = frame.paths().indexOf(path);
          if (index >= 0) {
            add(derivative(frame, solution, index, k, x[k]), jacobian, offset, k);
          }
        }
      }
      offset += own.length;
    }
    return new Computed(values, jacobian);
  }

  private static void add(double[] column, double[][] jacobian, int offset, int k) {
    for (int i = 0; i < column.length; i++) {
      jacobian[offset + i][k] += column[i];
    }
  }

  /** ∂A/∂x of one stiffness; by the compliance near rigid, by the stiffness near free. */
  private double[] derivative(
      ConfiguredFrame frame, ComputedFlexibility solution, int index, int k, double x) {
    WorkingParameter parameter = parameters.get(k);
    return switch (parameter.parameter().working()) {
      case LN -> frame.absolute(solution.derivative(index, Derivative.LOGARITHM));
      case COMPLIANCE -> frame.absolute(solution.derivative(index, Derivative.COMPLIANCE));
      case FIXITY -> {
        double reference = parameter.referenceStiffness();
        // k = r γ/(1 − γ), c = 1/k
        yield x >= 0.5
            ? scaled(
                frame.absolute(solution.derivative(index, Derivative.COMPLIANCE)),
                -1 / (reference * x * x))
            : scaled(
                frame.absolute(solution.derivative(index, Derivative.STIFFNESS)),
                reference / ((1 - x) * (1 - x)));
      }
    };
  }

  private static double[] scaled(double[] vector, double factor) {
    for (int i = 0; i < vector.length; i++) {
      vector[i] *= factor;
    }
    return vector;
  }
}
