package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.SortedSet;
import org.flexbound.finding.Where;

/**
 * Watches the readings of one column of a run go by, one after another, and keeps what may tell of a
 * fault: little of it, however long the run is.
 */
final class ColumnWatch {
  /** So many excursions, zeros and different values are kept; enough to tell what they are. */
  private static final int KEPT = 40;

  /**
   * A reading, or several equal ones, away from the readings before and after, on one side of both.
   *
   * @param firstRow its first row
   * @param lastRow its last row
   * @param value what was read
   * @param load the load then
   * @param before the reading before, and the load then
   * @param beforeLoad the load then
   * @param after the reading after
   * @param afterLoad the load then
   */
  record Excursion(
      int firstRow,
      int lastRow,
      double value,
      double load,
      double before,
      double beforeLoad,
      double after,
      double afterLoad) {
    double size() {
      return Math.min(Math.abs(value - before), Math.abs(value - after));
    }
  }

  /** A reading of exactly nought. */
  record Zero(int row, double load) {}

  private final List<Excursion> excursions = new ArrayList<>();
  private final List<Zero> zeros = new ArrayList<>();
  private final DifferentValues different = new DifferentValues();
  private int least;
  private double leastSize;
  private Optional<Where> sample = Optional.empty();
  private int readings;
  private int blanks;
  private int pendingBlanks;
  private int firstBlank;
  private int lastBlank;
  private int pendingFirst;
  private int pendingLast;
  private double largest;
  private int largestRow;
  private int equalInARow;
  private double value = Double.NaN;
  private double load;
  private int firstRow;
  private int lastRow;
  private double before = Double.NaN;
  private double beforeLoad;

  /** Sees a reading. */
  void see(int row, double reading, double loadThen, Where where) {
    if (Double.isNaN(reading)) {
      if (readings > 0) {
        pendingFirst = pendingBlanks == 0 ? row : pendingFirst;
        pendingLast = row;
        pendingBlanks++;
      }
      return;
    }
    if (sample.isEmpty()) {
      sample = Optional.of(where);
    }
    if (pendingBlanks > 0) {
      firstBlank = blanks == 0 ? pendingFirst : firstBlank;
      lastBlank = pendingLast;
      blanks += pendingBlanks;
      pendingBlanks = 0;
    }
    readings++;
    if (Math.abs(reading) > Math.abs(largest)) {
      largest = reading;
      largestRow = row;
    }
    if (reading == 0 && zeros.size() < KEPT) {
      zeros.add(new Zero(row, loadThen));
    }
    if (reading == value) {
      lastRow = row;
      equalInARow++;
      return;
    }
    different.see(reading);
    if (!Double.isNaN(value)
        && !Double.isNaN(before)
        && (value - before) * (value - reading) > 0
        && isLarge(Math.min(Math.abs(value - before), Math.abs(value - reading)))) {
      keep(
          new Excursion(
              firstRow, lastRow, value, load, before, beforeLoad, reading, loadThen));
    }
    before = value;
    beforeLoad = load;
    value = reading;
    load = loadThen;
    firstRow = row;
    lastRow = row;
  }

  /** Whether an excursion of this size would be kept: in noise nearly every second reading is one. */
  private boolean isLarge(double size) {
    return excursions.size() < KEPT || size > leastSize;
  }

  private void keep(Excursion found) {
    if (excursions.size() == KEPT) {
      excursions.remove(least);
    }
    excursions.add(found);
    if (excursions.size() == KEPT) {
      least = 0;
      for (int k = 1; k < KEPT; k++) {
        least = excursions.get(k).size() < excursions.get(least).size() ? k : least;
      }
      leastSize = excursions.get(least).size();
    }
  }

  /** Excursions in the order of their rows, the largest ones where there were many. */
  List<Excursion> excursions() {
    return excursions.stream().sorted(Comparator.comparingInt(Excursion::firstRow)).toList();
  }

  List<Zero> zeros() {
    return List.copyOf(zeros);
  }

  int readings() {
    return readings;
  }

  /** Blank cells between readings. */
  int blanks() {
    return blanks;
  }

  int firstBlank() {
    return firstBlank;
  }

  int lastBlank() {
    return lastBlank;
  }

  /** The reading of largest magnitude. */
  double largest() {
    return largest;
  }

  int largestRow() {
    return largestRow;
  }

  int differentValues() {
    return different.size();
  }

  /** Share of the readings that repeat the one before. */
  double repeats() {
    return readings > 1 ? equalInARow / (readings - 1.0) : 0;
  }

  /** All rows of the column that were read. */
  Where column() {
    return sample
        .map(where -> where.rows(where.row().orElse(1), Math.max(lastRow, where.row().orElse(1))))
        .orElseGet(Where::nowhere);
  }

  /** A place in the column over some rows. */
  Where rows(int first, int last) {
    return sample.map(where -> where.rows(first, last)).orElseGet(Where::nowhere);
  }

  /** The different values that were read, the first of them where there were many. */
  Set<Double> values() {
    return Collections.unmodifiableSet(different.ordered());
  }

  /**
   * The step in which readings go, where they all lie on a grid of it; empty where they do not, or
   * where they are too few to say. Equal load steps make such a grid as well, without any scatter about
   * the line.
   *
   * @param values different readings of one instrument
   */
  static OptionalDouble grid(SortedSet<Double> values) {
    if (values.size() < 5) {
      return OptionalDouble.empty();
    }
    double step = Double.POSITIVE_INFINITY;
    double previous = Double.NaN;
    double size = Math.max(Math.abs(values.first()), Math.abs(values.last()));
    List<Double> gaps = new ArrayList<>();
    for (double v : values) {
      // closer than rounding in another unit: one value
      if (!Double.isNaN(previous) && v - previous > 1e-9 * size) {
        gaps.add(v - previous);
        step = Math.min(step, v - previous);
      }
      previous = v;
    }
    for (double gap : gaps) {
      double times = gap / step;
      if (Math.abs(times - Math.rint(times)) > 0.02) {
        return OptionalDouble.empty();
      }
    }
    return gaps.size() >= 4 ? OptionalDouble.of(step) : OptionalDouble.empty();
  }
}
