package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.reduce.BaseMotion;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Part;

/**
 * Fixture against article: how much of a gauge's motion is that of the base and the fixture, which
 * the gauges that measure them show.
 *
 * <p>A gauge that measures the article and stands on the ground reads the article's own deflection,
 * the motion of the fixture that carries it, and the base's. The base's is taken out by the base
 * gauges already; the fixture's rigid motion follows from the gauges that measure the fixture, where
 * they determine it. What is left is the article's own flexibility.
 */
final class FixtureMotion {
  private final CheckedConfiguration tested;
  private final MeasuredFlexibility measured;
  private final Propagation propagation;

  FixtureMotion(CheckedConfiguration tested) {
    this.tested = tested;
    this.measured = tested.reduction().flexibility();
    this.propagation = new Propagation(measured);
  }

  /** One gauge's motion under one load, parted; gradients are by the absolute coefficients. */
  static final class Parted {
    private final int row;
    private final double[] total;
    private final double[] own;

    private Parted(int row, double[] total, double[] own) {
      this.row = row;
      this.total = total;
      this.own = own;
    }

    /** The compared coefficient. */
    int row() {
      return row;
    }

    /** Gradient of the motion as read. */
    double[] total() {
      return total;
    }

    /** Gradient of what is left after base and fixture are taken out. */
    double[] own() {
      return own;
    }
  }

  /** What can be parted, in the order of the coefficients. */
  List<Parted> parted() {
    List<Parted> result = new ArrayList<>();
    for (int row = 0; row < measured.coefficients().size(); row++) {
      parted(row).ifPresent(result::add);
    }
    return result;
  }

  /** Parts one coefficient; empty where nothing shows how the base or the fixture moved it. */
  Optional<Parted> parted(int row) {
    Coefficient c = measured.coefficients().get(row);
    Gauge gauge = measured.gauges().get(c.gauge());
    if (gauge.standsOn() != Part.GROUND
        || gauge.measures() != Part.ARTICLE
        || gauge.kind() == GaugeKind.STRAIN) {
      return Optional.empty();
    }
    double[] own = propagation.gradient(row);
    double[] total = new double[own.length];
    boolean parted = false;
    for (int k = 0; k < own.length; k++) {
      if (measured.absolute().get(k).gauge() == c.gauge()) {
        total[k] = own[k];
      } else if (own[k] != 0) {
        parted = true;
      }
    }
    List<Gauge> fixtures = new ArrayList<>();
    List<Integer> rows = new ArrayList<>();
    for (int other = 0; other < measured.coefficients().size(); other++) {
      Coefficient candidate = measured.coefficients().get(other);
      Gauge fixture = measured.gauges().get(candidate.gauge());
      if (candidate.load() == c.load()
          && fixture.measures() == Part.FIXTURE
          && fixture.standsOn() == Part.GROUND
          && fixture.kind() != GaugeKind.STRAIN) {
        fixtures.add(fixture);
        rows.add(other);
      }
    }
    if (!fixtures.isEmpty()) {
      Optional<double[]> weights = new BaseMotion(tested.places()).weights(gauge, fixtures);
      if (weights.isEmpty()) {
        return Optional.empty();
      }
      for (int f = 0; f < rows.size(); f++) {
        double[] fixture = propagation.gradient(rows.get(f));
        for (int k = 0; k < own.length; k++) {
          own[k] -= weights.get()[f] * fixture[k];
        }
      }
      parted = true;
    }
    return parted ? Optional.of(new Parted(row, total, own)) : Optional.empty();
  }

  /** The share of the motion as read that is base or fixture, with its gradient. */
  Optional<Quantity> share(Parted parted, String subject) {
    double total = propagation.value(parted.total());
    double own = propagation.value(parted.own());
    Budget whole = propagation.budget(parted.total());
    if (!(Math.abs(total) > 3 * whole.standardUncertainty())) {
      return Optional.empty();
    }
    double[] gradient = new double[parted.total().length];
    for (int k = 0; k < gradient.length; k++) {
      gradient[k] = -parted.own()[k] / total + parted.total()[k] * own / (total * total);
    }
    return Optional.of(
        new Quantity(
            subject,
            1 - own / total,
            propagation.budget(gradient),
            propagation.runs(gradient),
            Quantity.Law.ABOUT_VALUE));
  }

  /** The table of all that can be parted. */
  List<FixtureShare> table() {
    List<FixtureShare> result = new ArrayList<>();
    for (Parted parted : parted()) {
      Coefficient c = measured.coefficients().get(parted.row());
      Optional<Quantity> share = share(parted, "");
      result.add(
          new FixtureShare(
              measured.configuration(),
              measured.gauges().get(c.gauge()).name(),
              measured.loads().get(c.load()).name(),
              propagation.value(parted.total()),
              propagation.budget(parted.total()).standardUncertainty(),
              propagation.value(parted.own()),
              propagation.budget(parted.own()).standardUncertainty(),
              share.map(Quantity::value).orElse(Double.NaN),
              share.map(q -> q.budget().standardUncertainty()).orElse(Double.NaN)));
    }
    return result;
  }
}
