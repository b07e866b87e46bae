package org.flexbound.reduce;

import java.util.Arrays;
import java.util.SortedSet;
import java.util.TreeSet;

/**
 * The first different values of a column, in order. Whether a value is known already is looked up in
 * an open table of the numbers' bits, since it is asked for every reading.
 */
final class DifferentValues {
  private static final int MOST = 256;
  private static final int SLOTS = 4 * MOST;

  /** Bits that no number has: an empty slot. */
  private static final long EMPTY = Double.doubleToLongBits(Double.NaN);

  private final TreeSet<Double> ordered = new TreeSet<>();
  private final long[] table = new long[SLOTS];

  DifferentValues() {
    Arrays.fill(table, EMPTY);
  }

  /** Sees a value that is a number. */
  void see(double value) {
    if (ordered.size() == MOST) {
      return;
    }
    long bits = Double.doubleToLongBits(value);
    int slot = (int) ((bits * 0x9E3779B97F4A7C15L) >>> 54);
    while (table[slot] != EMPTY) {
      if (table[slot] == bits) {
        return;
      }
      slot = (slot + 1) % SLOTS;
    }
    table[slot] = bits;
    ordered.add(value);
  }

  /** How many there are; no more than 256 are kept. */
  int size() {
    return ordered.size();
  }

  /** The values in ascending order. */
  SortedSet<Double> ordered() {
    return ordered;
  }
}
