package org.flexbound.compare;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalInt;
import org.flexbound.finding.Findings;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.solve.FrameModes;
import org.flexbound.solve.TruncatedFlexibility;

/** What comparing with the lowest modes alone does, coefficient by coefficient and to the misfit. */
final class TruncationEffect {
  private final ConfiguredFrame frame;
  private final MeasuredFlexibility measured;
  private final TruncatedFlexibility truncated;
  private final double[] full;

  /** By number of modes, then coefficient. */
  private final List<double[]> series = new ArrayList<>();

  TruncationEffect(ConfiguredFrame frame, TruncatedFlexibility truncated) {
    this.frame = frame;
    this.measured = frame.measured();
    this.truncated = truncated;
    this.full = mapped(truncated.modes().full());
    for (int n = 0; n <= truncated.modes().count(); n++) {
      series.add(mapped(truncated.modes().truncated(n)));
    }
  }

  private double[] mapped(double[][] matrix) {
    return measured.map().apply(frame.absolute(matrix));
  }

  List<CoefficientComparison.Truncated> coefficients() {
    double[] massless = mapped(truncated.modes().massless());
    List<CoefficientComparison.Truncated> result = new ArrayList<>();
    for (int r = 0; r < full.length; r++) {
      result.add(
          new CoefficientComparison.Truncated(
              full[r],
              full[r] - series.get(truncated.modeCount())[r],
              massless[r],
              within(r, 0.10),
              within(r, 0.05),
              within(r, 0.01)));
    }
    return result;
  }

  /** The number of modes from which the error stays below a share. */
  private OptionalInt within(int row, double share) {
    int enough = -1;
    for (int n = series.size() - 1; n >= 0; n--) {
      if (Math.abs(full[row] - series.get(n)[row]) > share * Math.abs(full[row])) {
        break;
      }
      enough = n;
    }
    return enough < 0 ? OptionalInt.empty() : OptionalInt.of(enough);
  }

  /** Says what truncation alone explains of the difference to the measurement. */
  void tell(double misfit, WeightedSquares squares, double[] uncertainty, Findings findings) {
    FrameModes modes = truncated.modes();
    int n = truncated.modeCount();
    double[] values = measured.values();
    double[] differences = new double[values.length];
    double largest = 0;
    for (int r = 0; r < values.length; r++) {
      differences[r] = values[r] - full[r];
      if (Math.abs(full[r]) > uncertainty[r]) {
        double left = Math.abs(full[r] - series.get(n)[r]) / Math.abs(full[r]);
        largest = Math.max(largest, left);
      }
    }
    double inFull = squares.product(differences, differences);
    String share =
        inFull < misfit
            ? String.format(
                Locale.ROOT,
                "truncation alone explains %.0f %% of the misfit",
                100 * (1 - inFull / misfit))
            : "truncation explains nothing of the misfit";
    findings.add(
        CompareFinding.TRUNCATION,
        frame.model().where(),
        String.format(
            Locale.ROOT,
            "in the configuration '%s' the model stands with its lowest %d modes (to %.4g Hz), which"
                + " leave out up to %.2g %% of a coefficient; the misfit is %.4g with them and %.4g"
                + " with the whole flexibility: %s",
            measured.configuration(),
            n,
            modes.frequencies()[n - 1],
            100 * largest,
            misfit,
            inFull,
            share));
  }
}
