package org.flexbound.solve;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * How far the gaps of rigid components open and what force they carry: G = G_rigid + N C (I + S C)⁻¹
 * Nᵀ, worked in the symmetric form (I + D S D) y = D N with D the root of the compliances C, regular
 * where D is zero. A component that holds the same motion as others opens as they do, e_m = Σ a_k e_k;
 * its force is the multiplier of that condition.
 *
 * @param openings by column, then gap, m or rad per unit
 * @param forces by column, then gap, N or N·m per unit
 */
@SuppressWarnings("ArrayRecordComponent") // handed over once
record GapOpening(double[][] openings, double[][] forces) {
  /**
   * Where several rigid components hold the same motion, each is given this share of the flexibility
   * of its surroundings, so that they share the force alike; the opening stays below rounding.
   */
  private static final double SHARED = 1e-20;

  /**
   * Solves.
   *
   * @param gaps those that open by themselves first, then those that follow
   * @param stiffness of all slots
   * @param s forces in the gaps that open by themselves, per imposed gap
   * @param closed by column: the forces in them while all are closed
   */
  static GapOpening of(
      List<Structure.Gap> gaps, double[] stiffness, double[][] s, double[][] closed) {
    int all = gaps.size();
    int free = s.length;
    int following = all - free;
    double[] root = roots(gaps, stiffness, s);
    double[][] both = new double[all][all];
    DMatrixRMaj h = new DMatrixRMaj(all, all);
    for (int g = 0; g < all; g++) {
      for (int k = 0; k < all; k++) {
        both[g][k] = g < free && k < free ? (s[g][k] + s[k][g]) / 2 : 0;
        h.set(g, k, (g == k ? 1 : 0) + root[g] * both[g][k] * root[k]);
      }
    }
    DMatrixRMaj right = new DMatrixRMaj(all, closed.length);
    for (int c = 0; c < closed.length; c++) {
      for (int g = 0; g < free; g++) {
        right.set(g, c, root[g] * closed[c][g]);
      }
    }
    DMatrixRMaj y = solved(h, right);
    DMatrixRMaj condition = new DMatrixRMaj(following, all);
    for (int q = 0; q < following; q++) {
      int row = q;
      condition.set(q, free + q, 1);
      gaps.get(free + q).follows().forEach((gap, a) -> condition.set(row, gap, -a));
    }
    DMatrixRMaj multiplier = new DMatrixRMaj(following, closed.length);
    if (following > 0) {
      multiplier = follow(h, y, condition, root);
    }
    double[][] openings = new double[closed.length][all];
    double[][] forces = new double[closed.length][all];
    for (int c = 0; c < closed.length; c++) {
      for (int g = 0; g < all; g++) {
        openings[c][g] = root[g] * y.get(g, c);
      }
      for (int g = 0; g < all; g++) {
        double force = g < free ? closed[c][g] : 0;
        for (int k = 0; k < all; k++) {
          force -= both[g][k] * openings[c][k];
        }
        for (int q = 0; q < following; q++) {
          force += condition.get(q, g) * multiplier.get(q, c);
        }
        // Where the component is soft the force follows from the opening without cancellation.
        forces[c][g] =
            root[g] * root[g] * both[g][g] > 1 ? y.get(g, c) / root[g] : force;
      }
    }
    return new GapOpening(openings, forces);
  }

  private static double[] roots(List<Structure.Gap> gaps, double[] stiffness, double[][] s) {
    double[] root = new double[gaps.size()];
    for (int g = 0; g < root.length; g++) {
      root[g] = Math.sqrt(1 / stiffness[gaps.get(g).slot()]);
    }
    for (int g = s.length; g < root.length; g++) {
      for (int k : gaps.get(g).follows().keySet()) {
        double least = Math.sqrt(SHARED / Math.max(s[k][k], Double.MIN_NORMAL));
        root[g] = Math.max(root[g], least);
        root[k] = Math.max(root[k], least);
      }
    }
    return root;
  }

  /** y += H⁻¹ D Bᵀ μ with B D y = 0; gives μ. */
  private static DMatrixRMaj follow(
      DMatrixRMaj h, DMatrixRMaj y, DMatrixRMaj condition, double[] root) {
    DMatrixRMaj bd = condition.copy();
    for (int q = 0; q < bd.numRows; q++) {
      double largest = 0;
      for (int g = 0; g < bd.numCols; g++) {
        bd.set(q, g, bd.get(q, g) * root[g]);
        largest = Math.max(largest, Math.abs(bd.get(q, g)));
      }
      // Scaled, so that stiff and soft conditions weigh alike.
      for (int g = 0; g < bd.numCols; g++) {
        bd.set(q, g, bd.get(q, g) / largest);
        condition.set(q, g, condition.get(q, g) / largest);
      }
    }
    DMatrixRMaj turned = new DMatrixRMaj(bd.numCols, bd.numRows);
    CommonOps_DDRM.transpose(bd, turned);
    DMatrixRMaj w = solved(h, turned);
    DMatrixRMaj schur = new DMatrixRMaj(bd.numRows, bd.numRows);
    CommonOps_DDRM.mult(bd, w, schur);
    DMatrixRMaj broken = new DMatrixRMaj(bd.numRows, y.numCols);
    CommonOps_DDRM.mult(-1, bd, y, broken);
    DMatrixRMaj multiplier = solved(schur, broken);
    CommonOps_DDRM.multAdd(w, multiplier, y);
    return multiplier;
  }

  private static DMatrixRMaj solved(DMatrixRMaj matrix, DMatrixRMaj right) {
    DMatrixRMaj result = new DMatrixRMaj(matrix.numCols, right.numCols);
    if (!CommonOps_DDRM.solve(matrix.copy(), right, result)) {
      throw new ArithmeticException("the gaps of rigid components cannot be worked out");
    }
    return result;
  }
}
