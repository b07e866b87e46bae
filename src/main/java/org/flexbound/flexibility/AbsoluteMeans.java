package org.flexbound.flexibility;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * The absolute coefficients of a test, those of one gauge and load averaged over its instruments, with
 * the covariance of any linear combination of them: scatter and floors independent, gains shared.
 */
final class AbsoluteMeans {
  private final MeasuredFlexibility measured;
  private final Map<Long, Combination> byPlace = new LinkedHashMap<>();
  private final double[] values;

  AbsoluteMeans(MeasuredFlexibility measured) {
    this.measured = measured;
    this.values =
        measured.absolute().stream().mapToDouble(AbsoluteCoefficient::value).toArray();
    Map<Long, Integer> runs = new LinkedHashMap<>();
    for (AbsoluteCoefficient a : measured.absolute()) {
      runs.merge(key(a.gauge(), a.load()), a.runs(), Integer::sum);
    }
    Map<Long, Combination.Sum> sums = new LinkedHashMap<>();
    for (int k = 0; k < values.length; k++) {
      AbsoluteCoefficient a = measured.absolute().get(k);
      long key = key(a.gauge(), a.load());
      sums.computeIfAbsent(key, unused -> new Combination.Sum())
          .add(k, a.runs() / (double) Math.max(1, runs.getOrDefault(key, 1)));
    }
    sums.forEach((key, sum) -> byPlace.put(key, sum.made()));
  }

  private AbsoluteMeans(AbsoluteMeans other) {
    this.measured = other.measured;
    this.values = other.values;
    this.byPlace.putAll(other.byPlace);
  }

  /** The same, were one gauge's readings a factor larger. */
  AbsoluteMeans scaled(int gauge, double factor) {
    AbsoluteMeans result = new AbsoluteMeans(this);
    result.byPlace.replaceAll(
        (key, value) ->
            (int) (key >> 32) == gauge
                ? new Combination.Sum().add(value, factor).made()
                : value);
    return result;
  }

  /** The same, were two gauges' columns exchanged. */
  AbsoluteMeans exchanged(int gauge, int other) {
    AbsoluteMeans result = new AbsoluteMeans(this);
    for (int l = 0; l < measured.loads().size(); l++) {
      Combination first = byPlace.get(key(gauge, l));
      Combination second = byPlace.get(key(other, l));
      result.put(gauge, l, second);
      result.put(other, l, first);
    }
    return result;
  }

  /** The same, were one gauge's readings a factor larger under one load. */
  AbsoluteMeans scaled(int gauge, int load, double factor) {
    AbsoluteMeans result = new AbsoluteMeans(this);
    Combination own = byPlace.get(key(gauge, load));
    if (own != null) {
      result.put(gauge, load, new Combination.Sum().add(own, factor).made());
    }
    return result;
  }

  /** The same, were two gauges' columns exchanged under one load. */
  AbsoluteMeans exchanged(int gauge, int other, int load) {
    AbsoluteMeans result = new AbsoluteMeans(this);
    result.put(gauge, load, byPlace.get(key(other, load)));
    result.put(other, load, byPlace.get(key(gauge, load)));
    return result;
  }

  /** The same, had a load acted with a share of another load along with it, which is taken off. */
  AbsoluteMeans without(int load, int other, double share) {
    AbsoluteMeans result = new AbsoluteMeans(this);
    for (int g = 0; g < measured.gauges().size(); g++) {
      Combination own = byPlace.get(key(g, load));
      Combination side = byPlace.get(key(g, other));
      if (own != null && side != null) {
        result.put(g, load, new Combination.Sum().add(own, 1).add(side, -share).made());
      }
    }
    return result;
  }

  private void put(int gauge, int load, @Nullable Combination combination) {
    if (combination == null) {
      byPlace.remove(key(gauge, load));
    } else {
      byPlace.put(key(gauge, load), combination);
    }
  }

  private static long key(int gauge, int load) {
    return ((long) gauge << 32) | load;
  }

  MeasuredFlexibility measured() {
    return measured;
  }

  /** The mean of a gauge under a load; empty where it was not measured. */
  Optional<Combination> of(int gauge, int load) {
    return Optional.ofNullable(byPlace.get(key(gauge, load)));
  }

  boolean has(int gauge, int load) {
    return byPlace.containsKey(key(gauge, load));
  }

  /** The value of what {@link #of} gives; NaN where there is none. */
  double value(int gauge, int load) {
    return of(gauge, load).map(this::value).orElse(Double.NaN);
  }

  double value(Combination combination) {
    double sum = 0;
    for (int k = 0; k < combination.size(); k++) {
      sum += combination.weight(k) * values[combination.index(k)];
    }
    return sum;
  }

  /** Covariance of two combinations. */
  double covariance(Combination p, Combination q) {
    double[] gains = gains(p);
    double[] others = p == q ? gains : gains(q);
    double sum = random(p, q);
    for (int g = 0; g < gains.length; g++) {
      sum += gains[g] * others[g];
    }
    return sum;
  }

  /** The part of the covariance from scatter and floors, without gains. */
  double random(Combination p, Combination q) {
    double sum = 0;
    int k = 0;
    int l = 0;
    while (k < p.size() && l < q.size()) {
      if (p.index(k) < q.index(l)) {
        k++;
      } else if (p.index(k) > q.index(l)) {
        l++;
      } else {
        AbsoluteCoefficient a = measured.absolute().get(p.index(k));
        sum +=
            p.weight(k)
                * q.weight(l)
                * (a.scatterUncertainty() * a.scatterUncertainty()
                    + a.floorUncertainty() * a.floorUncertainty());
        k++;
        l++;
      }
    }
    return sum;
  }

  /** What one standard uncertainty of each gain adds to a combination. */
  private double[] gains(Combination p) {
    double[] result = new double[measured.gains().size()];
    for (int k = 0; k < p.size(); k++) {
      AbsoluteCoefficient a = measured.absolute().get(p.index(k));
      for (int gain : a.gains()) {
        result[gain] += p.weight(k) * measured.gains().get(gain).priorUncertainty() * a.value();
      }
    }
    return result;
  }

  double uncertainty(Combination p) {
    return Math.sqrt(covariance(p, p));
  }

  /** Effective degrees of freedom (Welch–Satterthwaite): only scatter has finite ones. */
  double degreesOfFreedom(Combination p) {
    double scatter = 0;
    for (int k = 0; k < p.size(); k++) {
      double u = p.weight(k) * measured.absolute().get(p.index(k)).scatterUncertainty();
      scatter += u * u;
    }
    double ratio = scatter > 0 ? covariance(p, p) / scatter : Double.POSITIVE_INFINITY;
    return measured.scatterDegreesOfFreedom() * ratio * ratio;
  }
}
