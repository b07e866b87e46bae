package org.flexbound.solve;

import java.util.Arrays;
import java.util.function.DoubleFunction;
import org.flexbound.frame.Rigidity;
import org.flexbound.frame.SectionProperties;

/**
 * The flexibility of a piece of a member held at its start and loaded at its end by the forces s =
 * (N, Vy, Vz, T, My, Mz) in member axes, split by the six rigidities and each for the value 1 of the
 * rigidity at the member's start: F_p = ∫ r_p(x) r_p(x)ᵀ θ_p(start)/θ_p(x) dx, where r_p(x)ᵀ s is the
 * section force that belongs to the rigidity. Exact for forces at the ends. (Virtual forces:
 * Przemieniecki 1968, Theory of Matrix Structural Analysis, ch. 6; torsion about the shear centre.)
 */
final class UnitFlexibility {
  /** A taper is divided until no entry of F changes by more than this share of its diagonal. */
  private static final double SETTLED = 1e-13;

  private static final double[] POINTS = {
    -0.9061798459386640, -0.5384693101056831, 0, 0.5384693101056831, 0.9061798459386640
  };
  private static final double[] WEIGHTS = {
    0.2369268850561891, 0.4786286704993665, 0.5688888888888889, 0.4786286704993665,
    0.2369268850561891
  };

  private final double length;
  private final double[][] parts;
  private final double cos;
  private final double sin;
  private final double shearY;
  private final double shearZ;

  private UnitFlexibility(double length, SectionProperties start) {
    this.length = length;
    this.parts = new double[Rigidity.values().length][];
    this.cos = Math.cos(start.principalAngle());
    this.sin = Math.sin(start.principalAngle());
    this.shearY = start.shearCentreY();
    this.shearZ = start.shearCentreZ();
  }

  /** A piece of one section. */
  static UnitFlexibility uniform(double length, SectionProperties section) {
    UnitFlexibility result = new UnitFlexibility(length, section);
    for (Rigidity p : Rigidity.values()) {
      result.parts[index(p)] = result.integral(p, 1, x -> 1.0);
    }
    return result;
  }

  /**
   * A piece of a tapered member.
   *
   * @param start the section at the member's start, to which the rigidities refer
   * @param at the section at a share of the piece's length, from 0 to 1
   */
  static UnitFlexibility tapered(
      double length, SectionProperties start, DoubleFunction<SectionProperties> at) {
    UnitFlexibility result = new UnitFlexibility(length, start);
    for (Rigidity p : Rigidity.values()) {
      DoubleFunction<Double> ratio = x -> ratio(p, start, at.apply(x));
      double[] before = result.integral(p, 1, ratio);
      for (int intervals = 2; ; intervals *= 2) {
        double[] finer = result.integral(p, intervals, ratio);
        if (settled(before, finer) || intervals >= 1024) {
          result.parts[index(p)] = finer;
          break;
        }
        before = finer;
      }
    }
    return result;
  }

  private static boolean settled(double[] a, double[] b) {
    for (int i = 0; i < 6; i++) {
      for (int j = 0; j < 6; j++) {
        double scale = Math.sqrt(b[i * 6 + i]) * Math.sqrt(b[j * 6 + j]);
        if (Math.abs(a[i * 6 + j] - b[i * 6 + j]) > SETTLED * scale) {
          return false;
        }
      }
    }
    return true;
  }

  static int index(Rigidity rigidity) {
    return switch (rigidity) {
      case EA -> 0;
      case EI_Y -> 1;
      case EI_Z -> 2;
      case GJ -> 3;
      case GA_Y -> 4;
      case GA_Z -> 5;
    };
  }

  static double ratio(Rigidity p, SectionProperties start, SectionProperties here) {
    return switch (p) {
      case EA -> start.area() / here.area();
      case EI_Y -> start.iy() / here.iy();
      case EI_Z -> start.iz() / here.iz();
      case GJ -> start.j() / here.j();
      case GA_Y -> Double.isInfinite(start.ay()) ? 1 : start.ay() / here.ay();
      case GA_Z -> Double.isInfinite(start.az()) ? 1 : start.az() / here.az();
    };
  }

  private double[] integral(Rigidity p, int intervals, DoubleFunction<Double> ratio) {
    double[] sum = new double[36];
    double step = 1.0 / intervals;
    for (int n = 0; n < intervals; n++) {
      for (int g = 0; g < POINTS.length; g++) {
        double share = (n + (1 + POINTS[g]) / 2) * step;
        double weight = WEIGHTS[g] / 2 * step * length * ratio.apply(share);
        Matrix6.addOuter(sum, weight, row(p, share));
      }
    }
    return sum;
  }

  /** r_p at a share of the length: the section force of a rigidity is r · s. */
  double[] row(Rigidity p, double share) {
    double arm = length * (1 - share);
    double[] r = new double[6];
    switch (p) {
      case EA -> r[0] = 1;
      case GA_Y -> {
        r[1] = cos;
        r[2] = sin;
      }
      case GA_Z -> {
        r[1] = -sin;
        r[2] = cos;
      }
      case GJ -> {
        r[3] = 1;
        r[1] = shearZ;
        r[2] = -shearY;
      }
      case EI_Y -> {
        r[4] = cos;
        r[2] = -cos * arm;
        r[5] = sin;
        r[1] = sin * arm;
      }
      case EI_Z -> {
        r[4] = -sin;
        r[2] = sin * arm;
        r[5] = cos;
        r[1] = cos * arm;
      }
    }
    return r;
  }

  double length() {
    return length;
  }

  /** F of a rigidity of value 1; not copied. */
  double[] part(int index) {
    return parts[index];
  }

  /** The sum of the parts, each over its rigidity. */
  double[] sum(double[] rigidities, int[] slots) {
    double[] f = new double[36];
    for (int p = 0; p < parts.length; p++) {
      double compliance = 1 / rigidities[slots[p]];
      double[] part = parts[p];
      for (int i = 0; i < 36; i++) {
        f[i] += compliance * part[i];
      }
    }
    return f;
  }

  @Override
  public String toString() {
    return "UnitFlexibility[" + length + ", " + Arrays.toString(parts[0]) + "]";
  }
}
