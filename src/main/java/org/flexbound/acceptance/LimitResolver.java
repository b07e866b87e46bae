package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Predicate;
import org.flexbound.compare.CoefficientComparison;
import org.flexbound.finding.Findings;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.quantity.Dimension;
import org.flexbound.setup.Direction;
import org.flexbound.setup.DirectionText;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.LimitKind;
import org.flexbound.setup.LimitSpec;
import org.flexbound.setup.Load;
import org.flexbound.setup.Vector;

/** Finds in one configuration the quantities that a limit is set on. */
final class LimitResolver {
  /** Coefficients at a point that disagree so strongly by chance in fewer cases are contradictory. */
  private static final double CONTRADICTORY = 0.01;

  /** A motion smaller than this many uncertainties has no span that figures could be shares of. */
  private static final double SEEN = 3;

  private final CheckedConfiguration tested;
  private final MeasuredFlexibility measured;
  private final Propagation propagation;
  private final Collocation collocation;
  private final Findings findings;

  LimitResolver(CheckedConfiguration tested, Findings findings) {
    this.tested = tested;
    this.measured = tested.reduction().flexibility();
    this.propagation = new Propagation(measured);
    this.collocation = new Collocation(measured, tested.places());
    this.findings = findings;
  }

  Resolved resolve(LimitSpec limit) {
    return switch (limit.kind()) {
      case COEFFICIENT -> coefficients(limit);
      case DIRECT_STIFFNESS -> stiffnesses(limit);
      case COMPLIANCE, SOFTEST_COMPLIANCE -> point(limit);
      case FIXTURE_SHARE -> fixtureShares(limit);
      case MODEL_AGREEMENT -> agreement(limit);
      case RECIPROCITY -> reciprocity(limit);
      case LINEARITY, HYSTERESIS, SET, REPEATABILITY -> figures(limit);
    };
  }

  private Gauge gauge(Coefficient c) {
    return measured.gauges().get(c.gauge());
  }

  private Load load(Coefficient c) {
    return measured.loads().get(c.load());
  }

  private String subject(Coefficient c) {
    return gauge(c).name() + " under " + load(c).name();
  }

  private boolean named(LimitSpec limit, int gauge, int load) {
    return limit.gauge().filter(g -> !g.equals(measured.gauges().get(gauge).name())).isEmpty()
        && limit.load().filter(l -> !l.equals(measured.loads().get(load).name())).isEmpty();
  }

  private static Dimension motionPerLoad(Gauge gauge, Load load) {
    Dimension motion =
        switch (gauge.kind()) {
          case DISPLACEMENT, RELATIVE -> Dimension.LENGTH;
          case ROTATION -> Dimension.ANGLE;
          case STRAIN -> Dimension.NUMBER;
        };
    return motion.per(load.isMoment() ? Dimension.MOMENT : Dimension.FORCE);
  }

  private String unmeasured(LimitSpec limit, String what) {
    return "found a limit on "
        + what
        + limit.gauge().map(g -> " of gauge '" + g + "'").orElse("")
        + limit.load().map(l -> " under load '" + l + "'").orElse("")
        + limit.node().map(n -> " at '" + n + "'").orElse("")
        + ", which this test did not measure; measured are the gauges "
        + String.join(", ", measured.gauges().stream().map(Gauge::name).toList())
        + " under the loads "
        + String.join(", ", measured.loads().stream().map(Load::name).toList());
  }

  private void wrongUnit(LimitSpec limit, String expected) {
    findings.add(
        AcceptanceFinding.UNIT,
        limit.where(),
        "found the unit '" + limit.unit().symbol() + "'; expected " + expected);
  }

  private Resolved coefficients(LimitSpec limit) {
    List<Quantity> result = new ArrayList<>();
    boolean otherUnit = false;
    for (int row = 0; row < measured.coefficients().size(); row++) {
      Coefficient c = measured.coefficients().get(row);
      if (!named(limit, c.gauge(), c.load())) {
        continue;
      }
      if (!limit.unit().dimension().fits(motionPerLoad(gauge(c), load(c)))) {
        otherUnit = true;
        continue;
      }
      result.add(linear(subject(c), propagation.gradient(row)));
    }
    if (result.isEmpty() && otherUnit) {
      wrongUnit(limit, "one of motion per load of the gauge and the load that it names");
    }
    return Resolved.of(result, unmeasured(limit, "a coefficient"));
  }

  private Quantity linear(String subject, double[] gradient) {
    return new Quantity(
        subject,
        propagation.value(gradient),
        propagation.budget(gradient),
        propagation.runs(gradient),
        Quantity.Law.ABOUT_VALUE);
  }

  private Resolved stiffnesses(LimitSpec limit) {
    List<Quantity> result = new ArrayList<>();
    boolean otherUnit = false;
    for (Collocation.Mate mate : collocation.mates()) {
      Optional<Integer> row = row(mate.gauge(), mate.load());
      if (row.isEmpty() || !named(limit, mate.gauge(), mate.load())) {
        continue;
      }
      Coefficient c = measured.coefficients().get(row.get());
      if (!limit
          .unit()
          .dimension()
          .fits(Dimension.NUMBER.per(motionPerLoad(gauge(c), load(c))))) {
        otherUnit = true;
        continue;
      }
      double value = mate.sign() * c.value();
      if (!(value > 0)) {
        return new Resolved(
            List.of(),
            "",
            Optional.of("the direct coefficient " + subject(c) + " is not above zero"));
      }
      double[] gradient =
          Arrays.stream(propagation.gradient(row.get()))
              .map(w -> -mate.sign() * w / (value * value))
              .toArray();
      result.add(
          new Quantity(
              "1 / (" + subject(c) + ")",
              1 / value,
              propagation.budget(gradient),
              propagation.runs(gradient),
              Quantity.Law.INVERSE));
    }
    if (result.isEmpty() && otherUnit) {
      wrongUnit(limit, "one of load per motion of the gauge and the load that it names");
    }
    return Resolved.of(
        result,
        unmeasured(limit, "a direct stiffness")
            + " (a direct stiffness needs a gauge on the load point and along its line)");
  }

  private Optional<Integer> row(int gauge, int load) {
    for (int row = 0; row < measured.coefficients().size(); row++) {
      Coefficient c = measured.coefficients().get(row);
      if (c.gauge() == gauge && c.load() == load) {
        return Optional.of(row);
      }
    }
    return Optional.empty();
  }

  private Resolved point(LimitSpec limit) {
    Optional<String> point = limit.node().or(limit::gauge);
    if (point.isEmpty() || (limit.kind() == LimitKind.COMPLIANCE && limit.direction().isEmpty())) {
      findings.add(
          AcceptanceFinding.INCOMPLETE,
          limit.where(),
          "found no "
              + (point.isEmpty() ? "node (or gauge) that names the point" : "direction")
              + "; a compliance needs the point"
              + (limit.kind() == LimitKind.COMPLIANCE ? " and the direction" : ""));
      return Resolved.missing("");
    }
    boolean turns =
        limit.unit().dimension().equals(Dimension.ANGLE.per(Dimension.MOMENT))
            || limit.direction().map(Direction::rotation).orElse(false);
    Dimension wanted =
        turns
            ? Dimension.ANGLE.per(Dimension.MOMENT)
            : Dimension.LENGTH.per(Dimension.FORCE);
    if (!limit.unit().dimension().fits(wanted)) {
      wrongUnit(limit, turns ? "one such as mrad/(kN·m)" : "one such as µm/kN or mrad/(kN·m)");
      return Resolved.missing("");
    }
    PointCompliance compliance = new PointCompliance(measured, propagation);
    for (int row = 0; row < measured.coefficients().size(); row++) {
      Coefficient c = measured.coefficients().get(row);
      if (load(c).isMoment() == turns
          && Collocation.likeKind(gauge(c), load(c))
          && collocation.at(gauge(c), point.get())
          && collocation.at(load(c), point.get())) {
        compliance.add(row);
      }
    }
    if (compliance.isEmpty()) {
      return Resolved.missing(
          "found a limit on the compliance at '"
              + point.get()
              + "', where no gauge was read under a load at the same place");
    }
    Optional<String> doubt = doubt(limit, point.get(), compliance);
    if (doubt.isPresent()) {
      return new Resolved(List.of(), "", doubt);
    }
    return limit.kind() == LimitKind.COMPLIANCE
        ? along(limit, point.get(), compliance)
        : softest(limit, point.get(), compliance);
  }

  private Optional<String> doubt(LimitSpec limit, String point, PointCompliance compliance) {
    if (compliance.partlyCorrected()) {
      findings.add(
          AcceptanceFinding.PARTLY_CORRECTED,
          limit.where(),
          "base motion is taken out of some of the coefficients at '" + point + "' only");
      return Optional.of("base motion is taken out of some of the coefficients only");
    }
    double probability =
        compliance.reciprocity().probability(measured.scatterDegreesOfFreedom());
    if (probability < CONTRADICTORY) {
      findings.add(
          AcceptanceFinding.NOT_RECIPROCAL,
          limit.where(),
          String.format(
              Locale.ROOT,
              "the coefficients at '%s' would disagree so far with reciprocity by chance in %.1g"
                  + " of all tests",
              point,
              probability));
      return Optional.of("the coefficients contradict reciprocity");
    }
    return Optional.empty();
  }

  private Resolved along(LimitSpec limit, String point, PointCompliance compliance) {
    Direction direction = limit.direction().orElseThrow();
    return compliance
        .along(direction.vector())
        .map(
            g ->
                Resolved.of(
                    List.of(linear(point + " along " + DirectionText.print(direction), g)), ""))
        .orElseGet(
            () ->
                Resolved.missing(
                    "found a limit on the compliance at '"
                        + point
                        + "' along "
                        + DirectionText.print(direction)
                        + ", which the directions loaded and read there do not determine"));
  }

  private Resolved softest(LimitSpec limit, String point, PointCompliance compliance) {
    Optional<PointCompliance.Softest> softest = compliance.softest();
    if (softest.isEmpty()) {
      return Resolved.missing(
          "found a limit on the softest compliance at '"
              + point
              + "', but gauges and loads there were not in the same directions");
    }
    PointCompliance.Softest found = softest.get();
    Vector v = found.direction();
    Quantity quantity =
        linear(
            String.format(
                Locale.ROOT, "%s, softest along (%.2f, %.2f, %.2f)",
                point,
                plain(v.x()),
                plain(v.y()),
                plain(v.z())),
            found.gradient());
    if (found.dimensions() < 3) {
      findings.add(
          AcceptanceFinding.FEWER_DIRECTIONS,
          limit.where(),
          "at '"
              + point
              + "' "
              + (found.dimensions() == 1 ? "one direction was" : "two directions were")
              + " loaded and measured; the softest of three may be softer");
    }
    if (quantity.value() - found.next() < 2 * quantity.budget().standardUncertainty()) {
      findings.add(
          AcceptanceFinding.ALIKE_DIRECTIONS,
          limit.where(),
          "the two softest directions at '" + point + "' differ by less than their uncertainty");
    }
    return Resolved.of(List.of(quantity), "");
  }

  /** Nought without a sign. */
  private static double plain(double component) {
    return Math.abs(component) < 0.005 ? 0 : component;
  }

  private Resolved fixtureShares(LimitSpec limit) {
    FixtureMotion motion = new FixtureMotion(tested);
    List<Quantity> result = new ArrayList<>();
    for (FixtureMotion.Parted parted : motion.parted()) {
      Coefficient c = measured.coefficients().get(parted.row());
      if (named(limit, c.gauge(), c.load())) {
        motion.share(parted, subject(c)).ifPresent(result::add);
      }
    }
    return Resolved.of(
        result,
        unmeasured(limit, "the share of base or fixture")
            + " (it needs gauges that measure the fixture, or base gauges, that determine how the"
            + " fixture moves a gauge which measures the article and stands on the ground)");
  }

  private Resolved agreement(LimitSpec limit) {
    if (tested.comparison().isEmpty()) {
      return Resolved.missing(
          "found a limit on the agreement with a model, but there is none; check a study that names"
              + " one");
    }
    List<CoefficientComparison> all = tested.comparison().get().coefficients();
    List<Quantity> result = new ArrayList<>();
    for (int row = 0; row < all.size(); row++) {
      CoefficientComparison compared = all.get(row);
      Coefficient c = measured.coefficients().get(row);
      if (!named(limit, c.gauge(), c.load()) || compared.ratio().isEmpty()) {
        continue;
      }
      double scale = Math.abs(compared.computed());
      double[] gradient =
          Arrays.stream(propagation.gradient(row)).map(w -> w / scale).toArray();
      Budget own = propagation.budget(gradient);
      List<Budget.Source> sources = new ArrayList<>(own.fixed());
      double whole = compared.standardUncertainty() / scale;
      double rest = whole * whole - own.standardUncertainty() * own.standardUncertainty();
      if (rest > 1e-6 * whole * whole) {
        sources.add(
            new Budget.Source(
                "places and directions of gauges and loads", Math.sqrt(rest), Double.NaN));
      }
      result.add(
          new Quantity(
              subject(c) + " against the model",
              compared.difference() / scale * Math.signum(compared.computed()),
              new Budget(own.scatter(), own.scatterDegreesOfFreedom(), sources),
              propagation.runs(gradient),
              Quantity.Law.ABOUT_VALUE));
    }
    return Resolved.of(result, unmeasured(limit, "the agreement with the model"));
  }

  private Resolved reciprocity(LimitSpec limit) {
    List<Collocation.Mate> mates = collocation.mates();
    List<Quantity> result = new ArrayList<>();
    for (int i = 0; i < mates.size(); i++) {
      for (int j = 0; j < i; j++) {
        pair(limit, mates.get(j), mates.get(i)).ifPresent(result::add);
      }
    }
    return Resolved.of(
        result,
        unmeasured(limit, "reciprocity")
            + " in pairs (a pair needs two load points with a gauge on each)");
  }

  private Optional<Quantity> pair(LimitSpec limit, Collocation.Mate a, Collocation.Mate b) {
    Optional<double[]> first = collocation.absolute(a.gauge(), b.load());
    Optional<double[]> second = collocation.absolute(b.gauge(), a.load());
    boolean wanted =
        named(limit, a.gauge(), b.load()) || named(limit, b.gauge(), a.load());
    if (a.load() == b.load() || first.isEmpty() || second.isEmpty() || !wanted) {
      return Optional.empty();
    }
    double sign = a.sign() * b.sign();
    double one = propagation.value(first.get());
    double other = sign * propagation.value(second.get());
    double mean = (Math.abs(one) + Math.abs(other)) / 2;
    double[] gradient = new double[first.get().length];
    for (int k = 0; k < gradient.length; k++) {
      gradient[k] = (first.get()[k] - sign * second.get()[k]) / mean;
    }
    String name =
        measured.gauges().get(a.gauge()).name()
            + " under "
            + measured.loads().get(b.load()).name()
            + " against "
            + measured.gauges().get(b.gauge()).name()
            + " under "
            + measured.loads().get(a.load()).name();
    return mean > 0
        ? Optional.of(linear(name, gradient))
        : Optional.empty();
  }

  private Resolved figures(LimitSpec limit) {
    RunFigures figures = new RunFigures(tested.reduction(), tested.instruments());
    List<Quantity> result = new ArrayList<>();
    Predicate<Coefficient> seen =
        c ->
            (limit.gauge().isPresent() && limit.load().isPresent())
                || Math.abs(c.value()) > SEEN * c.standardUncertainty();
    for (Coefficient c : measured.coefficients()) {
      if (!named(limit, c.gauge(), c.load()) || !seen.test(c)) {
        continue;
      }
      String gauge = gauge(c).name();
      String load = load(c).name();
      (limit.kind() == LimitKind.REPEATABILITY
              ? figures.repeatability(gauge, load, subject(c))
              : figures.largest(limit.kind(), gauge, load, subject(c)))
          .ifPresent(result::add);
    }
    return Resolved.of(
        result,
        unmeasured(limit, word(limit.kind()))
            + (limit.kind() == LimitKind.REPEATABILITY ? " in two runs or more" : ""));
  }

  private static String word(LimitKind kind) {
    return kind.name().toLowerCase(Locale.ROOT).replace('_', ' ');
  }
}
