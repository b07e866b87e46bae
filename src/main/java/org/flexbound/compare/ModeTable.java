package org.flexbound.compare;

import java.util.OptionalDouble;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.flexibility.MeasuredModes;

/** The coefficients that a table of measured modes makes up, base motion taken out of them. */
final class ModeTable {
  private ModeTable() {}

  /** In the order of the measured coefficients; empty where the table lacks what one needs. */
  static OptionalDouble[] coefficients(MeasuredFlexibility measured, MeasuredModes modes) {
    int size = measured.absolute().size();
    double[] absolute = new double[size];
    double[] other = new double[size];
    for (int i = 0; i < size; i++) {
      AbsoluteCoefficient a = measured.absolute().get(i);
      OptionalDouble value =
          modes.coefficient(
              measured.configuration(),
              measured.gauges().get(a.gauge()).name(),
              measured.loads().get(a.load()).name());
      absolute[i] = value.orElse(0);
      // Any other number in place of what is missing shows which coefficients hang on it.
      other[i] = value.orElse(Math.PI + i);
    }
    double[] first = measured.map().apply(absolute);
    double[] second = measured.map().apply(other);
    OptionalDouble[] result = new OptionalDouble[first.length];
    for (int r = 0; r < first.length; r++) {
      result[r] =
          Double.compare(first[r], second[r]) == 0
              ? OptionalDouble.of(first[r])
              : OptionalDouble.empty();
    }
    return result;
  }
}
