package org.flexbound.report.gather;

import java.util.List;
import org.flexbound.flexibility.GainPattern;
import org.flexbound.flexibility.MatrixChecks;
import org.flexbound.report.results.BoundCheck;
import org.flexbound.report.results.Hint;
import org.flexbound.report.results.MatrixCheck;
import org.flexbound.report.results.PointGain;
import org.flexbound.report.results.SmallestEigenvalue;
import org.flexbound.report.results.TripleProduct;

/** The checks of a matrix as results.json holds them. */
final class MatrixPart {
  private MatrixPart() {}

  static MatrixCheck of(String configuration, MatrixChecks checks) {
    return new MatrixCheck(
        configuration,
        checks
            .definiteness()
            .map(
                d ->
                    new SmallestEigenvalue(
                        d.points(),
                        d.smallest(),
                        d.standardUncertainty(),
                        d.z(),
                        d.limit(),
                        d.vector(),
                        !d.broken())),
        checks.bounds().stream()
            .map(
                b ->
                    new BoundCheck(
                        b.name(), b.direct(), b.ratio(), b.z(), b.limit(), !b.broken()))
            .toList(),
        checks.gainPattern().map(MatrixPart::gains).orElse(List.of()),
        checks.triples().stream()
            .map(t -> new TripleProduct(t.points(), t.ratio(), t.z(), t.limit(), !t.broken()))
            .toList(),
        checks.hints().stream()
            .map(h -> new Hint(h.looksLike(), h.because(), h.before(), h.after()))
            .toList());
  }

  private static List<PointGain> gains(GainPattern pattern) {
    return java.util.stream.IntStream.range(0, pattern.points().size())
        .mapToObj(
            k -> {
              GainPattern.PointGain p = pattern.points().get(k);
              return new PointGain(
                  p.gauge(),
                  p.load(),
                  Math.exp(p.logRatio()),
                  p.logRatio(),
                  p.standardUncertainty(),
                  p.z(),
                  p.limit(),
                  pattern.suspect().orElse(-1) == k);
            })
        .toList();
  }
}
