package org.flexbound.solve;

import java.util.List;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;

/** Derivatives of coefficients by the places and directions of gauges and loads. */
final class PlaceDerivatives {
  private final Readings readings;
  private final List<Gauge> gauges;
  private final List<List<Place>> gaugePlaces;
  private final List<Load> loads;
  private final List<List<Place>> loadPlaces;

  PlaceDerivatives(
      Readings readings,
      List<Gauge> gauges,
      List<List<Place>> gaugePlaces,
      List<Load> loads,
      List<List<Place>> loadPlaces) {
    this.readings = readings;
    this.gauges = List.copyOf(gauges);
    this.gaugePlaces = List.copyOf(gaugePlaces);
    this.loads = List.copyOf(loads);
    this.loadPlaces = List.copyOf(loadPlaces);
  }

  /** What a functional reads under one load, or under the unit load of one gauge. */
  @FunctionalInterface
  interface Reader {
    double read(Functional functional, int partner);
  }

  /** [place][load][x, y, z of the place, angles of the direction]. */
  double[][][] byGauge(int gauge, Reader underLoad) {
    List<Place> places = gaugePlaces.get(gauge);
    double[][][] result = new double[places.size()][][];
    for (int p = 0; p < result.length; p++) {
      result[p] =
          table(readings.byPlace(gauges.get(gauge), places, p), loads.size(), underLoad);
    }
    return result;
  }

  /**
   * [point][gauge][x, y, z of the place, angles of the direction]: by reciprocity the motion at the
   * load under the unit load of the gauge.
   */
  double[][][] byLoad(int load, Reader underGauge) {
    List<Place> places = loadPlaces.get(load);
    double[][][] result = new double[places.size()][][];
    for (int p = 0; p < result.length; p++) {
      result[p] =
          table(readings.byPlace(loads.get(load), places, p), gauges.size(), underGauge);
    }
    return result;
  }

  private static double[][] table(List<Functional> rows, int partners, Reader reader) {
    double[][] result = new double[partners][rows.size()];
    for (int other = 0; other < partners; other++) {
      for (int k = 0; k < result[other].length; k++) {
        result[other][k] = reader.read(rows.get(k), other);
      }
    }
    return result;
  }
}
