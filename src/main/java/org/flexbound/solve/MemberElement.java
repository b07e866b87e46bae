package org.flexbound.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A piece of a member with the joints at its ends, if any. Its force s is that at the end of the
 * piece, its deformation that of the end against the start carried along rigidly.
 *
 * <p>F = F_member + C_end + R C_start Rᵀ, K_b = F⁻¹: series of flexibilities, exact condensation of
 * the joints. A rigid component adds nothing. A free one takes its force out of K_b: K ← K − K a aᵀ K
 * / (aᵀ K a), a the row that gives the force; where another free joint has taken it out already (both
 * ends free about the axis), nothing is left to do.
 */
final class MemberElement extends Element {
  /** A force is out already where so little of its stiffness is left. */
  private static final double OUT = 1e-12;

  private final String member;
  private final UnitFlexibility unit;
  private final int[] slots;
  private final Optional<EndSprings> start;
  private final Optional<EndSprings> end;

  MemberElement(
      String member,
      int[] points,
      double[] shape,
      UnitFlexibility unit,
      int[] slots,
      Optional<EndSprings> start,
      Optional<EndSprings> end) {
    super(points, shape);
    this.member = member;
    this.unit = unit;
    this.slots = slots;
    this.start = start;
    this.end = end;
  }

  @Override
  int[] slots() {
    int[] result = java.util.Arrays.copyOf(slots, 6 + (start.isPresent() ? 6 : 0) + (end.isPresent() ? 6 : 0));
    start.ifPresent(s -> System.arraycopy(s.slots(), 0, result, 6, 6));
    end.ifPresent(s -> System.arraycopy(s.slots(), 0, result, result.length - 6, 6));
    return result;
  }

  /** Whether no joint stands at its ends. */
  boolean isPlain() {
    return start.isEmpty() && end.isEmpty();
  }

  String member() {
    return member;
  }

  UnitFlexibility unit() {
    return unit;
  }

  int slot(int rigidity) {
    return slots[rigidity];
  }

  /** The row that gives a component of the force at the start joint from s. */
  private double[] startRow(int component) {
    double[] row = new double[6];
    row[component] = 1;
    if (component == 4) {
      row[2] = -unit.length();
    } else if (component == 5) {
      row[1] = unit.length();
    }
    return row;
  }

  private static double[] endRow(int component) {
    double[] row = new double[6];
    row[component] = 1;
    return row;
  }

  private double[] row(boolean atStart, int component) {
    return atStart ? startRow(component) : endRow(component);
  }

  private Optional<EndSprings> springs(boolean atStart) {
    return atStart ? start : end;
  }

  @Override
  double[] basic(double[] stiffness) {
    double[] f = unit.sum(stiffness, slots);
    List<FreeGaps.Row> free = new ArrayList<>();
    for (boolean atStart : new boolean[] {true, false}) {
      springs(atStart).ifPresent(springs -> addJoint(springs, atStart, stiffness, f, free));
    }
    double[] k = Matrix6.inverse(f);
    if (free.isEmpty()) {
      return k;
    }
    double[] whole = k.clone();
    for (FreeGaps.Row row : free) {
      double[] a = row.values();
      double[] ka = Matrix6.times(k, a);
      double left = Matrix6.dot(a, ka);
      if (left > OUT * Matrix6.form(a, whole, a)) {
        Matrix6.addOuter(k, -1 / left, ka);
      }
    }
    return k;
  }

  private void addJoint(
      EndSprings springs, boolean atStart, double[] stiffness, double[] f, List<FreeGaps.Row> free) {
    if (springs.full()) {
      FullSprings.split(springs.matrix(stiffness))
          .forEach(
              direction -> {
                double[] row = new double[6];
                for (int c = 0; c < 6; c++) {
                  double[] part = row(atStart, c);
                  for (int i = 0; i < 6; i++) {
                    row[i] += direction.vector()[c] * part[i];
                  }
                }
                if (direction.stiffness() == 0) {
                  free.add(new FreeGaps.Row(row, -1));
                } else {
                  Matrix6.addOuter(f, 1 / direction.stiffness(), row);
                }
              });
      return;
    }
    for (int c = 0; c < 6; c++) {
      double k = stiffness[springs.slot(c)];
      if (k == 0) {
        free.add(new FreeGaps.Row(row(atStart, c), springs.slot(c)));
      } else if (!Double.isInfinite(k)) {
        Matrix6.addOuter(f, 1 / k, row(atStart, c));
      }
    }
  }

  @Override
  void stiffness(double[] basic, double[] result) {
    super.stiffness(basic, result);
    // Where all of a force is taken out, rounding must not leave a trace of stiffness behind.
    double largestForce = 0;
    double largestMoment = 0;
    for (int i = 0; i < 12; i++) {
      double d = result[13 * i];
      if (i % 6 < 3) {
        largestForce = Math.max(largestForce, d);
      } else {
        largestMoment = Math.max(largestMoment, d);
      }
    }
    double reference = Math.max(largestMoment, largestForce * unit.length() * unit.length());
    for (int i = 0; i < 12; i++) {
      double limit = 1e-15 * (i % 6 < 3 ? reference / unit.length() / unit.length() : reference);
      if (Math.abs(result[13 * i]) <= limit) {
        for (int j = 0; j < 12; j++) {
          result[12 * i + j] = 0;
          result[12 * j + i] = 0;
        }
      }
    }
  }

  @Override
  void derivatives(Work work, SlotSink sink) {
    double[] sg = work.gaugeForces();
    double[] sl = work.loadForces();
    for (int p = 0; p < slots.length; p++) {
      sink.force(slots[p], Matrix6.form(sg, unit.part(p), sl));
    }
    for (boolean atStart : new boolean[] {true, false}) {
      springs(atStart).ifPresent(springs -> joint(springs, atStart, work, sink));
    }
  }

  private void joint(EndSprings springs, boolean atStart, Work work, SlotSink sink) {
    double[] ng = new double[6];
    double[] nl = new double[6];
    for (int c = 0; c < 6; c++) {
      ng[c] = Matrix6.dot(row(atStart, c), work.gaugeForces());
      nl[c] = Matrix6.dot(row(atStart, c), work.loadForces());
    }
    if (springs.full()) {
      double[] k = springs.matrix(work.stiffness());
      double[] dg = FullSprings.deformation(k, ng);
      double[] dl = FullSprings.deformation(k, nl);
      for (int c = 0; c < 6; c++) {
        sink.logarithm(springs.slot(c), -0.5 * (ng[c] * dl[c] + dg[c] * nl[c]));
      }
      return;
    }
    for (int c = 0; c < 6; c++) {
      if (work.stiffness()[springs.slot(c)] == 0) {
        sink.motion(
            springs.slot(c),
            -gap(work, work.gaugeForces(), work.gaugeDeformation(), row(atStart, c), springs.slot(c))
                * gap(
                    work, work.loadForces(), work.loadDeformation(), row(atStart, c), springs.slot(c)));
      } else {
        sink.force(springs.slot(c), ng[c] * nl[c]);
      }
    }
  }

  /**
   * How far a free component opens: the deformation that the flexible part and the other springs do
   * not take up, shared out among the free components that take a force out by themselves.
   */
  private double gap(Work work, double[] s, double[] d, double[] row, int slot) {
    double[] f = unit.sum(work.stiffness(), slots);
    List<FreeGaps.Row> free = new ArrayList<>();
    for (boolean atStart : new boolean[] {true, false}) {
      springs(atStart)
          .ifPresent(springs -> addJoint(springs, atStart, work.stiffness(), f, free));
    }
    double[] k = Matrix6.inverse(f);
    double[] left = Matrix6.times(f, s);
    for (int i = 0; i < 6; i++) {
      left[i] = d[i] - left[i];
    }
    return FreeGaps.of(k, free, left, new FreeGaps.Row(row, slot), OUT);
  }
}
