package org.flexbound.update;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;

/** What the data tell of each parameter: profile, status, interval; all at μ = 1. */
final class Told {
  private static final double ONE_SIDED = 0.95;

  private final List<WorkingParameter> parameters;
  private final FittedModel model;
  private final Posterior posterior;
  private final TruncatedPosterior truncated;
  private final Minimum estimate;
  private final Identifiability identifiability;
  private final ProfileTracer tracer;
  private final double scatterFactor;
  private final ProfileTracer.Traced[] profiles;
  private final List<List<Integer>> groups;

  Told(
      List<WorkingParameter> parameters,
      FittedModel model,
      GaussNewton solver,
      Minimum estimate,
      Posterior posterior,
      Posterior forIntervals,
      double scatterDegrees,
      int tracedProfiles) {
    this.parameters = parameters;
    this.model = model;
    this.posterior = posterior;
    this.estimate = estimate;
    this.truncated =
        new TruncatedPosterior(
            forIntervals,
            Arrays.copyOf(model.lower(), parameters.size()),
            Arrays.copyOf(model.upper(), parameters.size()));
    this.identifiability = new Identifiability(posterior);
    this.tracer = new ProfileTracer(solver, model, posterior, estimate, scatterDegrees);
    this.scatterFactor = MisfitLimit.scatterFactor(scatterDegrees);
    this.groups = identifiability.groups();
    this.profiles = new ProfileTracer.Traced[parameters.size()];
    List<Integer> worthwhile = new ArrayList<>();
    for (int k = 0; k < profiles.length; k++) {
      profiles[k] = tracer.linear(k);
      if (posterior.removed(k) > 0.01) {
        worthwhile.add(k);
      }
    }
    worthwhile.sort(Comparator.comparingDouble(k -> -posterior.removed(k)));
    for (int k : worthwhile.subList(0, Math.min(tracedProfiles, worthwhile.size()))) {
      profiles[k] = tracer.trace(k);
    }
  }

  Posterior posterior() {
    return posterior;
  }

  List<List<Integer>> groups() {
    return groups;
  }

  List<double[]> determined(List<Integer> group) {
    return identifiability.determined(group);
  }

  TruncatedPosterior truncated() {
    return truncated;
  }

  double threshold() {
    return tracer.threshold();
  }

  ProfileTracer.Traced profile(int k) {
    return profiles[k];
  }

  /** The status, the first that applies. */
  Status status(int k) {
    ProfileTracer.Traced profile = profiles[k];
    if (profile.lowOpen() != profile.highOpen()) {
      boolean lowerLimit = profile.highOpen() == parameters.get(k).growing();
      return lowerLimit ? Status.LOWER_LIMIT_ONLY : Status.UPPER_LIMIT_ONLY;
    }
    if (identifiability.identified(k)) {
      return Status.IDENTIFIED;
    }
    if (groups.stream().anyMatch(group -> group.contains(k))) {
      return Status.IDENTIFIED_ONLY_IN_COMBINATION;
    }
    return posterior.removed(k) < Identifiability.LITTLE
        ? Status.NOT_IDENTIFIABLE
        : Status.WEAKLY_IDENTIFIED;
  }

  /** Whether the interval comes from the profile. */
  boolean fromProfile(int k) {
    ProfileTracer.Traced profile = profiles[k];
    return profile.lowOpen() != profile.highOpen() || (profile.evaluated() && !profile.parabolic());
  }

  /** The interval in scaled unknowns; an open side ends at its bound. */
  Interval interval(int k, double widening) {
    double low = model.lower()[k];
    double high = model.upper()[k];
    ProfileTracer.Traced profile = profiles[k];
    Interval interval;
    if (profile.lowOpen() != profile.highOpen()) {
      interval = oneSided(k, profile, low, high);
    } else if (profile.evaluated() && !profile.parabolic()) {
      interval = Interval.of(profile, scatterFactor);
    } else {
      interval = Interval.of(truncated, k);
    }
    return interval.widened(estimate.w[k], widening, low, high);
  }

  /**
   * The more careful of two limits: where the profile says so, and the posterior's quantile. The
   * profile alone keeps its level over all tests, but not over those in which a side came out open:
   * that happens to a joint of moderate stiffness only where noise makes it look stiff, and its limit
   * is too high just then. A posterior keeps its level whatever picked the case.
   */
  private Interval oneSided(int k, ProfileTracer.Traced profile, double low, double high) {
    boolean curved = profile.evaluated() && !profile.parabolic();
    if (profile.lowOpen()) {
      double byPosterior =
          curved
              ? Interval.quantile(profile, scatterFactor, ONE_SIDED)
              : truncated.quantile(k, ONE_SIDED);
      return new Interval(low, Math.max(finite(profile.oneSidedHigh(), high), byPosterior));
    }
    double byPosterior =
        curved
            ? Interval.quantile(profile, scatterFactor, 1 - ONE_SIDED)
            : truncated.quantile(k, 1 - ONE_SIDED);
    return new Interval(Math.min(finite(profile.oneSidedLow(), low), byPosterior), high);
  }

  private static double finite(double value, double otherwise) {
    return Double.isNaN(value) ? otherwise : value;
  }
}
