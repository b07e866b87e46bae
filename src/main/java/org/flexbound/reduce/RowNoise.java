package org.flexbound.reduce;

/**
 * The noise of a column from row to row, seen while its rows go by: the median size of the second differences, which a steady ramp leaves at
 * nought, over 0.6745 √6, that of a normal variable. Keeps counts in bins of a sixteenth of an octave, however many rows there are.
 */
final class RowNoise {
  /** Median of |normal| times √(1 + 4 + 1). */
  private static final double OF_NORMAL = 0.6744897501960817 * Math.sqrt(6);

  /** Sign, exponent and the first four bits of the fraction of a double. */
  private static final int SHIFT = 48;

  private final int[] counts = new int[1 << 15];
  private int seen;
  private double before = Double.NaN;
  private double last = Double.NaN;

  void see(double value) {
    double second = Math.abs(value - 2 * last + before);
    if (!Double.isNaN(second) && !Double.isInfinite(second)) {
      counts[(int) (Double.doubleToLongBits(second) >>> SHIFT)]++;
      seen++;
    }
    before = last;
    last = value;
  }

  /** Standard deviation of one row; 0 where most rows follow each other evenly. */
  double standardDeviation() {
    int left = seen / 2;
    for (int bin = 0; bin < counts.length && seen > 0; bin++) {
      left -= counts[bin];
      if (left < 0) {
        return bin == 0 ? 0 : Double.longBitsToDouble(((long) bin << SHIFT) | (1L << (SHIFT - 1))) / OF_NORMAL;
      }
    }
    return 0;
  }
}
