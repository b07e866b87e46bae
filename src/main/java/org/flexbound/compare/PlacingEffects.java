package org.flexbound.compare;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.setup.Placing;
import org.flexbound.solve.ComputedFlexibility;

/**
 * What uncertain places and directions of gauges and loads do to the absolute coefficients, by the
 * model's derivatives: for each uncertain coordinate or angle one effect, shared by all coefficients
 * of that gauge or load. Nothing for what states no uncertainty.
 */
public final class PlacingEffects {
  private PlacingEffects() {}

  /**
   * The effects.
   *
   * @param frame the configuration
   * @param solution its nominal solution
   * @return vectors in the order of {@code MeasuredFlexibility.absolute()}: what one standard
   *     uncertainty of one coordinate or angle adds, SI
   */
  public static List<double[]> of(ConfiguredFrame frame, ComputedFlexibility solution) {
    MeasuredFlexibility measured = frame.measured();
    List<double[]> result = new ArrayList<>();
    for (int g = 0; g < measured.gauges().size(); g++) {
      Placing placing = measured.gauges().get(g).placing();
      if (stated(placing)) {
        for (double[][] place : solution.byGaugePlace(g)) {
          add(measured, g, true, placing, place, result);
        }
      }
    }
    for (int l = 0; l < measured.loads().size(); l++) {
      double[][][] places = null;
      for (int p = 0; p < measured.loads().get(l).points().size(); p++) {
        Placing placing = measured.loads().get(l).points().get(p).placing();
        if (stated(placing)) {
          places = places == null ? solution.byLoadPlace(l) : places;
          add(measured, l, false, placing, places[p], result);
        }
      }
    }
    return result;
  }

  private static boolean stated(Placing placing) {
    return placing.positionUncertainty().orElse(0) > 0 || placing.angleUncertainty().orElse(0) > 0;
  }

  private static void add(
      MeasuredFlexibility measured,
      int index,
      boolean gauge,
      Placing placing,
      double[][] derivatives,
      List<double[]> result) {
    for (int k = 0; k < 6; k++) {
      double u =
          k < 3 ? placing.positionUncertainty().orElse(0) : placing.angleUncertainty().orElse(0);
      double[] effect = new double[measured.absolute().size()];
      boolean any = false;
      for (int i = 0; i < effect.length; i++) {
        AbsoluteCoefficient a = measured.absolute().get(i);
        if ((gauge ? a.gauge() : a.load()) == index) {
          effect[i] = u * derivatives[gauge ? a.load() : a.gauge()][k];
          any |= effect[i] != 0;
        }
      }
      if (any) {
        result.add(effect);
      }
    }
  }
}
