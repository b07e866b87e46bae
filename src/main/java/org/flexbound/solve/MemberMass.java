package org.flexbound.solve;

import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Material;
import org.flexbound.frame.Member;
import org.flexbound.frame.SectionProperties;
import org.flexbound.setup.Vector;

/**
 * The consistent mass matrix of a member piece with shear deformation and rotary inertia (J. S.
 * Przemieniecki 1968, Theory of Matrix Structural Analysis, sec. 11.3): the deflected shapes of a
 * uniform Timoshenko piece under end motions, integrated with the mass per length and the rotary
 * inertia of the section at every place; torsion with ρ(Iy + Iz); the non-structural mass lies in
 * the axis.
 */
final class MemberMass {
  private static final double[] POINTS = {
    -0.9061798459386640, -0.5384693101056831, 0, 0.5384693101056831, 0.9061798459386640
  };
  private static final double[] WEIGHTS = {
    0.2369268850561891, 0.4786286704993665, 0.5688888888888889, 0.4786286704993665,
    0.2369268850561891
  };

  private MemberMass() {}

  /**
   * The derivatives of the matrix by the logarithms of Φy and Φz, the shares of the shear deflection
   * in bending about y and about z.
   *
   * @return [Φy, Φz] 12 × 12 each, row by row
   */
  static double[][] byShear(
      FrameModel model,
      Member member,
      Mesh.Piece piece,
      MemberElement element,
      double[] stiffness) {
    Material material = model.material(member.material());
    double length = element.unit().length();
    double[][] local = new double[2][144];
    double phiY = shear(stiffness[element.slot(1)], stiffness[element.slot(5)], length);
    double phiZ = shear(stiffness[element.slot(2)], stiffness[element.slot(4)], length);
    for (int g = 0; g < POINTS.length; g++) {
      double x = (1 + POINTS[g]) / 2;
      double weight = WEIGHTS[g] / 2 * length;
      SectionProperties section =
          MeshBuilder.sectionAt(
              model,
              member,
              material.poissonRatio(),
              piece.from() + (piece.to() - piece.from()) * x);
      double mass = weight * (material.density() * section.area() + member.massPerLength());
      double aboutY = weight * material.density() * section.iy();
      double aboutZ = weight * material.density() * section.iz();
      Rows.addByShear(
          local[0], mass, phiY, deflection(x, length, phiY, 2, 4, -1), sheared(x, length, 2, 4, -1));
      Rows.addByShear(
          local[0], aboutY, phiY, rotation(x, length, phiY, 2, 4, -1), turned(x, 4));
      Rows.addByShear(
          local[1], mass, phiZ, deflection(x, length, phiZ, 1, 5, 1), sheared(x, length, 1, 5, 1));
      Rows.addByShear(
          local[1], aboutZ, phiZ, rotation(x, length, phiZ, 1, 5, 1), turned(x, 5));
    }
    double angle = model.startSection(member).principalAngle();
    double[][] result = new double[2][];
    for (int i = 0; i < 2; i++) {
      result[i] =
          Rows.atPoints(local[i], axes(piece, angle), piece.startArm(), piece.endArm());
    }
    return result;
  }

  /** The deflected shapes where all deflection is by shear. */
  private static double[] sheared(double x, double l, int shift, int turn, double sign) {
    double[] n = new double[12];
    n[shift] = 1 - x;
    n[turn] = sign * l * (x - x * x) / 2;
    n[shift + 6] = x;
    n[turn + 6] = -sign * l * (x - x * x) / 2;
    return n;
  }

  private static double[] turned(double x, int turn) {
    double[] n = new double[12];
    n[turn] = 1 - x;
    n[turn + 6] = x;
    return n;
  }

  /**
   * The matrix at the freedoms of the piece's two points.
   *
   * @param model the model
   * @param member the member
   * @param piece the piece
   * @param element the piece's element
   * @param stiffness of all slots, on which the shear deflection of the shapes depends
   * @return 12 × 12, row by row
   */
  static double[] of(
      FrameModel model,
      Member member,
      Mesh.Piece piece,
      MemberElement element,
      double[] stiffness) {
    Material material = model.material(member.material());
    double length = element.unit().length();
    double[] local = new double[144];
    double phiY = shear(stiffness[element.slot(1)], stiffness[element.slot(5)], length);
    double phiZ = shear(stiffness[element.slot(2)], stiffness[element.slot(4)], length);
    for (int g = 0; g < POINTS.length; g++) {
      double x = (1 + POINTS[g]) / 2;
      double weight = WEIGHTS[g] / 2 * length;
      SectionProperties section =
          MeshBuilder.sectionAt(
              model,
              member,
              material.poissonRatio(),
              piece.from() + (piece.to() - piece.from()) * x);
      double density = material.density();
      double mass = weight * (density * section.area() + member.massPerLength());
      double aboutY = weight * density * section.iy();
      double aboutZ = weight * density * section.iz();
      double[] axial = new double[12];
      axial[0] = 1 - x;
      axial[6] = x;
      Rows.add(local, mass, axial);
      double[] twist = new double[12];
      twist[3] = 1 - x;
      twist[9] = x;
      Rows.add(local, aboutY + aboutZ, twist);
      Rows.add(local, mass, deflection(x, length, phiZ, 1, 5, 1));
      Rows.add(local, aboutZ, rotation(x, length, phiZ, 1, 5, 1));
      // In the x-z plane a positive rotation about y turns z downwards along x.
      Rows.add(local, mass, deflection(x, length, phiY, 2, 4, -1));
      Rows.add(local, aboutY, rotation(x, length, phiY, 2, 4, -1));
    }
    double angle = model.startSection(member).principalAngle();
    return Rows.atPoints(local, axes(piece, angle), piece.startArm(), piece.endArm());
  }

  /** The principal axes of the section. */
  private static Vector[] axes(Mesh.Piece piece, double angle) {
    Vector y = piece.axes().y();
    Vector z = piece.axes().z();
    double c = Math.cos(angle);
    double s = Math.sin(angle);
    return new Vector[] {
      piece.axes().x(), y.times(c).plus(z.times(s)), z.times(c).minus(y.times(s))
    };
  }

  /** Φ = 12 EI/(GA_s L²). */
  private static double shear(double bending, double shear, double length) {
    return Double.isInfinite(shear) ? 0 : 12 * bending / (shear * length * length);
  }

  private static double[] deflection(
      double x, double l, double phi, int shift, int turn, double sign) {
    double d = 1 + phi;
    double[] n = new double[12];
    n[shift] = (1 - 3 * x * x + 2 * x * x * x + phi * (1 - x)) / d;
    n[turn] = sign * l * (x - 2 * x * x + x * x * x + phi / 2 * (x - x * x)) / d;
    n[shift + 6] = (3 * x * x - 2 * x * x * x + phi * x) / d;
    n[turn + 6] = sign * l * (-x * x + x * x * x - phi / 2 * (x - x * x)) / d;
    return n;
  }

  private static double[] rotation(
      double x, double l, double phi, int shift, int turn, double sign) {
    double d = 1 + phi;
    double[] n = new double[12];
    n[shift] = sign * 6 / l * (x * x - x) / d;
    n[turn] = (1 - 4 * x + 3 * x * x + phi * (1 - x)) / d;
    n[shift + 6] = sign * 6 / l * (x - x * x) / d;
    n[turn + 6] = (3 * x * x - 2 * x + phi * x) / d;
    return n;
  }

  /** Sums of squares of rows, and their change to the freedoms of the points. */
  private static final class Rows {
    static void add(double[] sum, double factor, double[] row) {
      for (int i = 0; i < 12; i++) {
        if (row[i] != 0) {
          for (int j = 0; j < 12; j++) {
            sum[12 * i + j] += factor * row[i] * row[j];
          }
        }
      }
    }

    /**
     * The derivative of factor · n nᵀ by ln Φ, where (1 + Φ) n = a + Φ b and so Φ dn/dΦ = Φ (b − n)/(1
     * + Φ).
     */
    static void addByShear(double[] sum, double factor, double phi, double[] n, double[] b) {
      for (int i = 0; i < 12; i++) {
        for (int j = 0; j < 12; j++) {
          double change = (b[i] - n[i]) * n[j] + n[i] * (b[j] - n[j]);
          sum[12 * i + j] += factor * phi / (1 + phi) * change;
        }
      }
    }

    /** Qᵀ M Q, Q from the motions of the points to those of the ends in local axes. */
    static double[] atPoints(double[] local, Vector[] axes, Vector startArm, Vector endArm) {
      double[] q = new double[144];
      for (int end = 0; end < 2; end++) {
        Vector arm = end == 0 ? startArm : endArm;
        for (int i = 0; i < 3; i++) {
          Vector turned = arm.cross(axes[i]);
          put(q, 12 * (6 * end + i) + 6 * end, axes[i]);
          put(q, 12 * (6 * end + i) + 6 * end + 3, turned);
          put(q, 12 * (6 * end + 3 + i) + 6 * end + 3, axes[i]);
        }
      }
      double[] mq = new double[144];
      for (int i = 0; i < 12; i++) {
        for (int k = 0; k < 12; k++) {
          double m = local[12 * i + k];
          if (m != 0) {
            for (int j = 0; j < 12; j++) {
              mq[12 * i + j] += m * q[12 * k + j];
            }
          }
        }
      }
      double[] result = new double[144];
      for (int i = 0; i < 12; i++) {
        for (int j = 0; j <= i; j++) {
          double sum = 0;
          for (int k = 0; k < 12; k++) {
            sum += q[12 * k + i] * mq[12 * k + j];
          }
          result[12 * i + j] = sum;
          result[12 * j + i] = sum;
        }
      }
      return result;
    }

    private static void put(double[] q, int at, Vector v) {
      q[at] = v.x();
      q[at + 1] = v.y();
      q[at + 2] = v.z();
    }
  }
}
