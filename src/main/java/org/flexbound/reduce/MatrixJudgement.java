package org.flexbound.reduce;

import java.util.List;
import java.util.Locale;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.Bound;
import org.flexbound.flexibility.Definiteness;
import org.flexbound.flexibility.GainPattern;
import org.flexbound.flexibility.Hint;
import org.flexbound.flexibility.MatrixChecks;
import org.flexbound.flexibility.ReciprocityTable;
import org.flexbound.flexibility.TripleProduct;
import org.flexbound.setup.Gauge;

/** Turns the checks of the matrix into findings, each at the gauge it speaks of. */
final class MatrixJudgement {
  /** A scale error below this is not worth a word of its own: the pairs say it (no source). */
  private static final double WORTH_SAYING = 0.02;

  private final List<Gauge> gauges;
  private final Findings findings;

  MatrixJudgement(List<Gauge> gauges, Findings findings) {
    this.gauges = gauges;
    this.findings = findings;
  }

  void judge(MatrixChecks checks) {
    boolean paired = false;
    for (ReciprocityTable.Pair pair : checks.reciprocity().pairs()) {
      if (pair.broken()) {
        paired = true;
        findings.add(MatrixFinding.NOT_RECIPROCAL, at(pair.gauge()), words(pair));
      }
    }
    if (!paired && checks.reciprocity().probability() < MatrixChecks.JOINT_LEVEL) {
      findings.add(
          MatrixFinding.NOT_RECIPROCAL_TOGETHER,
          Where.nowhere(),
          String.format(
              Locale.ROOT,
              "the %d reciprocal pairs together have χ² %.1f with %d degrees of freedom",
              checks.reciprocity().pairs().size(),
              checks.reciprocity().statistic(),
              checks.reciprocity().degreesOfFreedom()));
    }
    checks.bounds().stream().filter(Bound::broken).forEach(this::bound);
    checks.definiteness().filter(Definiteness::broken).ifPresent(this::indefinite);
    checks.gainPattern().ifPresent(this::gains);
    List<TripleProduct> broken = checks.triples().stream().filter(TripleProduct::broken).toList();
    if (!broken.isEmpty()) {
      triples(broken, checks.triples().size());
    }
    checks.hints().forEach(this::hint);
  }

  private Where at(int gauge) {
    return gauges.get(gauge).where();
  }

  private static String words(ReciprocityTable.Pair pair) {
    String start = pair.first() + " and " + pair.second() + " should be equal but differ by ";
    return pair.z().isPresent()
        ? String.format(
            Locale.ROOT,
            "%s%.1f standard uncertainties (%.1f %%), limit %.1f",
            start,
            Math.abs(pair.z().getAsDouble()),
            100 * pair.share(),
            pair.limit())
        : String.format(
            Locale.ROOT,
            "%s%.1f %%, and nothing says how uncertain they are",
            start,
            100 * pair.share());
  }

  private void bound(Bound bound) {
    String far =
        bound.z().isPresent()
            ? String.format(
                Locale.ROOT,
                " by %.1f standard uncertainties, limit %.1f",
                bound.z().getAsDouble(),
                bound.limit())
            : "";
    findings.add(
        MatrixFinding.NOT_POSITIVE,
        at(bound.gauge()),
        bound.direct()
            ? bound.name() + " is below zero" + far + "; a direct coefficient is above zero"
            : String.format(
                Locale.ROOT,
                "%s is %.3g times the geometric mean of the two direct coefficients, which it"
                    + " should not pass%s",
                bound.name(),
                bound.ratio(),
                far.isEmpty() ? "" : ":" + far));
  }

  private void indefinite(Definiteness found) {
    int largest = 0;
    for (int k = 1; k < found.vector().size(); k++) {
      if (Math.abs(found.vector().get(k)) > Math.abs(found.vector().get(largest))) {
        largest = k;
      }
    }
    findings.add(
        MatrixFinding.INDEFINITE,
        Where.nowhere(),
        String.format(
            Locale.ROOT,
            "the smallest eigenvalue of the square part (%d points, scaled to a unit diagonal) is"
                + " %.3g%s; load '%s' has the largest part in it",
            found.points().size(),
            found.smallest(),
            found.z().isPresent()
                ? String.format(
                    Locale.ROOT,
                    ", %.1f standard uncertainties below nought, limit %.1f",
                    -found.z().getAsDouble(),
                    found.limit())
                : "",
            found.points().get(largest)));
  }

  private void gains(GainPattern pattern) {
    if (pattern.suspect().isEmpty()) {
      return;
    }
    GainPattern.PointGain point = pattern.points().get(pattern.suspect().getAsInt());
    double z = point.z().orElse(0);
    if (Math.abs(z) > point.limit() && Math.abs(point.logRatio()) > WORTH_SAYING) {
      findings.add(
          MatrixFinding.GAIN_STANDS_OUT,
          at(point.gaugeIndex()),
          String.format(
              Locale.ROOT,
              "gauge '%s' reads %.4g times too much, or load '%s' so much too little, against all"
                  + " other points (%.1f standard uncertainties, limit %.1f)",
              point.gauge(),
              Math.exp(point.logRatio()),
              point.load(),
              Math.abs(z),
              point.limit()));
    }
  }

  private void triples(List<TripleProduct> broken, int all) {
    TripleProduct worst = broken.get(0);
    findings.add(
        MatrixFinding.TRIPLE_PRODUCT,
        Where.nowhere(),
        String.format(
            Locale.ROOT,
            "round %s the two products of three coefficients have the ratio %.4g%s (%d of %d such"
                + " triples fail)",
            String.join(", ", worst.points()),
            worst.ratio(),
            worst.z().isPresent()
                ? String.format(
                    Locale.ROOT,
                    ", %.1f standard uncertainties off one, limit %.1f",
                    Math.abs(worst.z().getAsDouble()),
                    worst.limit())
                : "",
            broken.size(),
            all));
  }

  private void hint(Hint hint) {
    findings.add(
        switch (hint.kind()) {
          case REVERSED -> MatrixFinding.LOOKS_REVERSED;
          case EXCHANGED -> MatrixFinding.LOOKS_EXCHANGED;
          case UNIT, PLACE -> MatrixFinding.LOOKS_LIKE_UNIT;
          case OFF_LINE -> MatrixFinding.LOOKS_OFF_LINE;
        },
        at(hint.gauges().get(0)),
        hint.sentence());
  }
}
