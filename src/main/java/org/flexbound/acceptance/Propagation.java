package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.Gain;
import org.flexbound.flexibility.LinearMap;
import org.flexbound.flexibility.MeasuredFlexibility;

/**
 * Propagates the sources of uncertainty of the absolute coefficients to a quantity by its gradient
 * (JCGM 100:2008, 5.1.2 and, for the shared gains, 5.2.2).
 */
final class Propagation {
  private static final String FLOORS = "fixed part of the gauges' uncertainty";

  private final MeasuredFlexibility measured;

  Propagation(MeasuredFlexibility measured) {
    this.measured = measured;
  }

  /** The gradient of a compared coefficient: its row of the map. */
  double[] gradient(int row) {
    return gradient(measured.map(), row, measured.absolute().size());
  }

  private static double[] gradient(LinearMap map, int row, int size) {
    double[] gradient = new double[size];
    int[] columns = map.columns(row);
    double[] weights = map.weights(row);
    for (int k = 0; k < columns.length; k++) {
      gradient[columns[k]] += weights[k];
    }
    return gradient;
  }

  /** The value of a linear form of the absolute coefficients. */
  double value(double[] gradient) {
    double sum = 0;
    for (int k = 0; k < gradient.length; k++) {
      sum += gradient[k] * measured.absolute().get(k).value();
    }
    return sum;
  }

  /** What one standard uncertainty of a gain adds to the quantity. */
  private double effect(int gain, double[] gradient) {
    double sum = 0;
    for (int k = 0; k < gradient.length; k++) {
      AbsoluteCoefficient a = measured.absolute().get(k);
      if (gradient[k] != 0 && a.gains().contains(gain)) {
        sum += gradient[k] * a.value();
      }
    }
    return sum * measured.gains().get(gain).priorUncertainty();
  }

  /** The covariance of two quantities from all sources. */
  double covariance(double[] first, double[] second) {
    double sum = 0;
    for (int k = 0; k < first.length; k++) {
      AbsoluteCoefficient a = measured.absolute().get(k);
      sum +=
          first[k]
              * second[k]
              * (a.scatterUncertainty() * a.scatterUncertainty()
                  + a.floorUncertainty() * a.floorUncertainty());
    }
    for (int g = 0; g < measured.gains().size(); g++) {
      sum += effect(g, first) * effect(g, second);
    }
    return sum;
  }

  /** The quantity's uncertainty by source. */
  Budget budget(double[] gradient) {
    double scatter = 0;
    double floor = 0;
    for (int k = 0; k < gradient.length; k++) {
      AbsoluteCoefficient a = measured.absolute().get(k);
      scatter += Math.pow(gradient[k] * a.scatterUncertainty(), 2);
      floor += Math.pow(gradient[k] * a.floorUncertainty(), 2);
    }
    List<Budget.Source> sources = new ArrayList<>();
    for (int g = 0; g < measured.gains().size(); g++) {
      double effect = Math.abs(effect(g, gradient));
      if (effect > 0) {
        Gain gain = measured.gains().get(g);
        sources.add(new Budget.Source(gain.description(), effect, gain.priorUncertainty()));
      }
    }
    if (floor > 0) {
      sources.add(new Budget.Source(FLOORS, Math.sqrt(floor), Double.NaN));
    }
    return new Budget(Math.sqrt(scatter), measured.scatterDegreesOfFreedom(), sources);
  }

  /** The smallest number of runs among the coefficients that a quantity is made of. */
  int runs(double[] gradient) {
    int least = Integer.MAX_VALUE;
    for (int k = 0; k < gradient.length; k++) {
      if (gradient[k] != 0) {
        least = Math.min(least, measured.absolute().get(k).runs());
      }
    }
    return least == Integer.MAX_VALUE ? 0 : least;
  }
}
