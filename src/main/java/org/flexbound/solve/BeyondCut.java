package org.flexbound.solve;

import org.flexbound.sparse.NumericFactor;
import org.flexbound.sparse.SymmetricMatrix;

/**
 * For every mode i below the cut and every gauge or load b the field w = Σ_j φ_j (φ_j·b)/(λ_j − λ_i)
 * over all modes j that are not below the cut: the known ones by their sum, the others from (K − λ_i M)
 * w = b within what is orthogonal to all known modes. There the matrix is positive definite, and the
 * conjugate gradients, preconditioned with the factor at the shift, settle in few steps (eigenvalues
 * between 1 − (λ_i − s)/(λ_next − s) and 1).
 */
final class BeyondCut {
  private static final double SETTLED = 1e-13;
  private static final int MOST_STEPS = 300;

  private final ModePart part;
  private final SymmetricMatrix k;
  private final SymmetricMatrix m;
  private final NumericFactor factor;
  private final int n;
  private final int count;

  /** M Φ of all known modes. */
  private final double[] weighed;

  BeyondCut(ModalModel modal, ModePart part) {
    this.part = part;
    this.k = modal.stiffness();
    this.m = modal.massMatrix();
    this.n = part.unknowns();
    this.count = part.columnCount();
    factor = modal.structure().symbolic().shifted(k, part.shift(), m);
    weighed = new double[part.vectors().length];
    m.multiply(part.vectors(), weighed, part.known());
  }

  /**
   * The fields for one mode below the cut.
   *
   * @param mode which
   * @return unknowns × (gauges, then loads)
   */
  double[] fields(int mode) {
    double lambda = part.below(mode);
    double[] x = new double[Math.multiplyExact(n, count)];
    double[] r = part.columns().clone();
    // b less its share in the known modes.
    for (int c = 0; c < count; c++) {
      for (int j = 0; j < part.known(); j++) {
        add(r, c, -part.projectionOfKnown(c, j), weighed, j);
      }
    }
    solve(lambda, x, r);
    for (int c = 0; c < count; c++) {
      for (int j = 0; j < part.known(); j++) {
        if (!part.isIn(j)) {
          double share = part.projectionOfKnown(c, j) / (part.eigenvalue(j) - lambda);
          add(x, c, share, part.vectors(), j);
        }
      }
    }
    return x;
  }

  private void solve(double lambda, double[] x, double[] r) {
    double[] z = new double[r.length];
    double[] p = new double[r.length];
    double[] kp = new double[r.length];
    double[] mp = new double[r.length];
    double[] before = new double[count];
    double[] first = new double[count];
    boolean[] done = new boolean[count];
    for (int step = 0; step < MOST_STEPS; step++) {
      System.arraycopy(r, 0, z, 0, r.length);
      factor.solve(z, count);
      boolean all = true;
      for (int c = 0; c < count; c++) {
        orthogonal(z, c);
        double rz = dot(r, c, z, c);
        if (step == 0) {
          // What the known modes take out entirely leaves rounding only.
          first[c] = rz;
          done[c] = !(rz > 0) || rz <= 1e-24 * scale(c);
        }
        done[c] |= rz <= SETTLED * SETTLED * first[c];
        all &= done[c];
        double beta = step == 0 || done[c] ? 0 : rz / before[c];
        for (int i = c * n; i < (c + 1) * n; i++) {
          p[i] = done[c] ? 0 : z[i] + beta * p[i];
        }
        before[c] = rz;
      }
      if (all) {
        return;
      }
      k.multiply(p, kp, count);
      m.multiply(p, mp, count);
      for (int c = 0; c < count; c++) {
        if (done[c]) {
          continue;
        }
        double curvature = 0;
        for (int i = c * n; i < (c + 1) * n; i++) {
          kp[i] -= lambda * mp[i];
          curvature += p[i] * kp[i];
        }
        if (!(curvature > 0)) {
          done[c] = true;
          continue;
        }
        double alpha = before[c] / curvature;
        for (int i = c * n; i < (c + 1) * n; i++) {
          x[i] += alpha * p[i];
          r[i] -= alpha * kp[i];
        }
      }
    }
  }

  /** bᵀ (K − shift M)⁻¹ b as far as the known modes make it. */
  private double scale(int column) {
    double sum = 0;
    for (int j = 0; j < part.known(); j++) {
      double share = part.projectionOfKnown(column, j);
      double apart = part.eigenvalue(j) - part.shift();
      sum += apart > 0 ? share * share / apart : 0;
    }
    return sum;
  }

  /** z −= Φ (MΦ)ᵀ z. */
  private void orthogonal(double[] z, int column) {
    for (int j = 0; j < part.known(); j++) {
      add(z, column, -dot(z, column, weighed, j), part.vectors(), j);
    }
  }

  private double dot(double[] a, int ca, double[] b, int cb) {
    double sum = 0;
    for (int i = 0; i < n; i++) {
      sum += a[ca * n + i] * b[cb * n + i];
    }
    return sum;
  }

  private void add(double[] a, int ca, double factor, double[] b, int cb) {
    for (int i = 0; i < n; i++) {
      a[ca * n + i] += factor * b[cb * n + i];
    }
  }
}
