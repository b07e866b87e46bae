package org.flexbound.update;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.random.RandomGenerator;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.Gain;
import org.flexbound.flexibility.LinearMap;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Part;
import org.flexbound.setup.Placing;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.study.Level;
import org.flexbound.study.Parameter;
import org.flexbound.study.Rule;
import org.flexbound.study.Spread;
import org.flexbound.study.Working;

/** Invented measured flexibilities and closed forms for the tests of the update. */
final class Invented {
  private Invented() {}

  static Gauge gauge(String name) {
    return new Gauge(
        name,
        GaugeKind.DISPLACEMENT,
        new Station.AtNode("tip", Vector.ZERO),
        Optional.empty(),
        Optional.empty(),
        Direction.along(new Vector(0, 0, 1)),
        Optional.empty(),
        Part.ARTICLE,
        Part.GROUND,
        false,
        Optional.empty(),
        Placing.UNSTATED,
        "",
        Where.nowhere());
  }

  static Load load(String name) {
    return new Load(
        name,
        List.of(
            new LoadPoint(
                new Station.AtNode("tip", Vector.ZERO),
                Optional.empty(),
                Direction.along(new Vector(0, 0, 1)),
                1,
                Placing.UNSTATED)),
        Optional.empty(),
        OptionalDouble.empty(),
        "",
        Where.nowhere());
  }

  /**
   * A measured flexibility without base motion.
   *
   * @param truth gauges × loads, before any error
   * @param scatter relative scatter
   * @param cell prior uncertainty of the one load cell's gain; 0 for none
   * @param random draws the errors; empty for a measurement without error
   */
  static MeasuredFlexibility measured(
      String name, double[][] truth, double scatter, double cell, Optional<RandomGenerator> random) {
    List<Gauge> gauges = new ArrayList<>();
    List<Load> loads = new ArrayList<>();
    List<AbsoluteCoefficient> absolute = new ArrayList<>();
    List<Coefficient> coefficients = new ArrayList<>();
    double gain = random.map(r -> cell * r.nextGaussian()).orElse(0.0);
    for (int i = 0; i < truth.length; i++) {
      gauges.add(gauge("g" + i));
    }
    for (int j = 0; j < truth[0].length; j++) {
      loads.add(load("p" + j));
    }
    for (int i = 0; i < truth.length; i++) {
      for (int j = 0; j < truth[0].length; j++) {
        double error = random.map(r -> scatter * r.nextGaussian()).orElse(0.0);
        double u = scatter * Math.abs(truth[i][j]);
        double value = truth[i][j] * (1 + gain) + error * Math.abs(truth[i][j]);
        absolute.add(
            new AbsoluteCoefficient(
                i, j, value, u, 0, cell > 0 ? List.of(0) : List.of(), 3));
        coefficients.add(new Coefficient(i, j, value, u, Double.POSITIVE_INFINITY));
      }
    }
    return new MeasuredFlexibility(
        name,
        gauges,
        loads,
        absolute,
        cell > 0 ? List.of(new Gain("cell", "load cell", cell)) : List.of(),
        Double.POSITIVE_INFINITY,
        LinearMap.identity(absolute.size()),
        coefficients);
  }

  static Parameter parameter(String name, double lower, double upper, double spread) {
    return new Parameter(
        name,
        List.of("joints." + name + ".rz"),
        new Level.OfNominal(lower),
        new Level.OfNominal(upper),
        Optional.of(new Spread.InWorkingVariable(spread)),
        Working.LN,
        Optional.empty(),
        "",
        Where.nowhere());
  }

  /** A parameter worked in the logarithm, with nominal stiffness 1. */
  static WorkingParameter ln(String name, double lower, double upper, double spread) {
    return new WorkingParameter(
        parameter(name, lower, upper, spread),
        1,
        "1",
        Double.NaN,
        0,
        Math.log(lower),
        Math.log(upper),
        spread);
  }

  /**
   * Coefficients that are linear in every compliance factor: a = fixed + Σ part_k exp(−x_k), as of a
   * determinate structure.
   *
   * @param fixed coefficients of what does not change, gauges × loads
   * @param parts for each parameter its contributions at nominal
   */
  static FlexibilityFunction determinate(double[][] fixed, double[][]... parts) {
    int loads = fixed[0].length;
    return x -> {
      double[] values = new double[fixed.length * loads];
      double[][] jacobian = new double[values.length][parts.length];
      for (int i = 0; i < values.length; i++) {
        values[i] = fixed[i / loads][i % loads];
        for (int k = 0; k < parts.length; k++) {
          double part = parts[k][i / loads][i % loads] * Math.exp(-x[k]);
          values[i] += part;
          jacobian[i][k] = -part;
        }
      }
      return new FlexibilityFunction.Computed(values, jacobian);
    };
  }

  static double[][] matrix(int rows, int columns, Function<int[], Double> entry) {
    double[][] result = new double[rows][columns];
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        result[i][j] = entry.apply(new int[] {i, j});
      }
    }
    return result;
  }

  static double[][] shaped(double[] values, int rows) {
    int columns = values.length / rows;
    return matrix(rows, columns, at -> values[at[0] * columns + at[1]]);
  }

  static UpdateProblem problem(
      List<WorkingParameter> parameters, MeasuredFlexibility measured, FlexibilityFunction function) {
    return new UpdateProblem(
        parameters, List.of(measured), function, new Rule.Prior(), List.of(), 1);
  }
}
