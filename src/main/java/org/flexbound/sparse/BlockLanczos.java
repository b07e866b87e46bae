package org.flexbound.sparse;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

/**
 * Block Lanczos process for {@code (K - shift M)⁻¹ M} in the (semi-)inner product of M, every new block made orthogonal to all earlier ones
 * twice. Vectors that vanish under orthogonalisation are replaced by random ones in the operator's range, so that eigenvalues repeated more
 * often than the block is wide are found; if even those vanish the whole range is spanned.
 *
 * <p>Source: R. G. Grimes, J. G. Lewis, H. D. Simon, "A shifted block Lanczos algorithm for solving sparse symmetric generalized
 * eigenproblems", SIAM J. Matrix Anal. Appl. 15 (1994) 228-272. Departure: full instead of partial reorthogonalisation, one shift.
 */
final class BlockLanczos {
  /** A vector is taken to lie in the span of the basis when orthogonalisation leaves less than this part of it. */
  private static final double VANISHED = 1e-12;

  private final NumericFactor inverse;
  private final SymmetricMatrix mass;
  private final int n;
  private final int width;
  private final Random random;
  /** The basis in blocks, each n × (its width). */
  private final List<double[]> blocks = new ArrayList<>();
  private final List<Integer> widths = new ArrayList<>();
  private int basisSize;
  /** Projection of the operator on the basis, lower triangle by columns as found. */
  private double[][] projected = new double[0][];
  /** M times the newest block. */
  private double[] newestMass = new double[0];
  /** Coupling of the newest block (rows) with the one before (columns), column-major. */
  private double[] coupling = new double[0];
  private int couplingColumns;
  private boolean exhausted;
  private int calls;
  private double[] ritz = new double[0];
  private double[] bounds = new double[0];
  private double[][] ritzVectors = new double[0][];

  BlockLanczos(NumericFactor inverse, SymmetricMatrix mass, int width, long seed) {
    this.inverse = inverse;
    this.mass = mass;
    this.n = mass.size();
    this.width = Math.min(width, Math.max(1, n));
    this.random = new Random(seed);
    append(new double[0], 0);
  }

  int basisSize() {
    return basisSize;
  }

  /** Whether the basis spans all that the operator can reach. */
  boolean exhausted() {
    return exhausted;
  }

  int calls() {
    return calls;
  }

  /** Applies the operator to the newest block and adds what is new to the basis. */
  void step() {
    if (exhausted) {
      return;
    }
    int q = widths.get(widths.size() - 1);
    double[] w = newestMass;
    inverse.solve(w, q);
    calls += q;
    append(w, q);
  }

  /** Random vectors brought into the operator's range. */
  private double[] fresh(int count) {
    double[] x = new double[n * count];
    for (int i = 0; i < x.length; i++) {
      x[i] = random.nextDouble() - 0.5;
    }
    double[] w = new double[n * count];
    mass.multiply(x, w, count);
    inverse.solve(w, count);
    calls += count;
    return w;
  }

  /** Adds the part of w (n × q, the operator times the newest block) that is new, filled up with random vectors to the block's width. */
  private void append(double[] w, int q) {
    int before = basisSize;
    int source = before - q;
    double[][] column = new double[q][before + q];
    double[] kept = new double[n * width];
    double[] keptMass = new double[n * width];
    int count = orthonormalize(w, q, kept, keptMass, 0, column, before);
    if (count < width && !exhausted) {
      int missing = width - count;
      count = orthonormalize(fresh(missing), missing, kept, keptMass, count, new double[missing][before + width], before);
    }
    projected = Arrays.copyOf(projected, before);
    for (int j = 0; j < q; j++) {
      projected[source + j] = column[j];
    }
    coupling = new double[count * q];
    couplingColumns = q;
    for (int j = 0; j < q; j++) {
      for (int i = 0; i < Math.min(count, column[j].length - before); i++) {
        coupling[j * count + i] = column[j][before + i];
      }
    }
    if (count == 0) {
      exhausted = true;
      coupling = new double[0];
      return;
    }
    blocks.add(count == width ? kept : Arrays.copyOf(kept, n * count));
    widths.add(count);
    newestMass = count == width ? keptMass : Arrays.copyOf(keptMass, n * count);
    basisSize += count;
  }

  /**
   * Orthonormalises columns against the basis and the {@code already} kept vectors of the new block, appending those that do not vanish.
   * Coefficients are added into {@code column[j]}, those of the new block behind the first {@code before}.
   */
  private int orthonormalize(double[] w, int q, double[] kept, double[] keptMass, int already, double[][] column, int before) {
    double[] mw = new double[n * q];
    mass.multiply(w, mw, q);
    double[] norm = new double[q];
    for (int j = 0; j < q; j++) {
      norm[j] = Math.sqrt(Math.max(0, TallBlocks.dot(n, w, j * n, mw, j * n)));
    }
    for (int pass = 0; pass < 2; pass++) {
      int at = 0;
      for (int b = 0; b < blocks.size(); b++) {
        int p = widths.get(b);
        double[] c = new double[p * q];
        TallBlocks.project(n, blocks.get(b), 0, p, mw, 0, q, c);
        TallBlocks.add(n, blocks.get(b), 0, p, -1, c, 0, p, w, 0, q);
        for (int j = 0; j < q; j++) {
          for (int i = 0; i < p; i++) {
            column[j][at + i] += c[j * p + i];
          }
        }
        at += p;
      }
      mass.multiply(w, mw, q);
    }
    int count = already;
    for (int j = 0; j < q; j++) {
      for (int pass = 0; pass < 2; pass++) {
        for (int i = 0; i < count; i++) {
          double c = TallBlocks.dot(n, kept, i * n, mw, j * n);
          TallBlocks.axpy(n, -c, kept, i * n, w, j * n);
          TallBlocks.axpy(n, -c, keptMass, i * n, mw, j * n);
          if (before + i < column[j].length) {
            column[j][before + i] += c;
          }
        }
      }
      double left = Math.sqrt(Math.max(0, TallBlocks.dot(n, w, j * n, mw, j * n)));
      if (!(left > VANISHED * norm[j]) || count == width) {
        continue;
      }
      for (int i = 0; i < n; i++) {
        kept[count * n + i] = w[j * n + i] / left;
        keptMass[count * n + i] = mw[j * n + i] / left;
      }
      if (before + count < column[j].length) {
        column[j][before + count] += left;
      }
      count++;
    }
    return count;
  }

  /**
   * Ritz values of the operator, descending, with the bound of each one's error; the newest block only bounds.
   *
   * @return number of leading values whose bound, relative to the value, is within the tolerance
   */
  int settle(double tolerance) {
    int last = exhausted ? 0 : widths.get(widths.size() - 1);
    int k = basisSize - last;
    if (k == 0) {
      return 0;
    }
    DMatrixRMaj t = new DMatrixRMaj(k, k);
    for (int j = 0; j < k; j++) {
      for (int i = 0; i <= j; i++) {
        double upper = i < projected[j].length ? projected[j][i] : 0;
        double mirror = j < projected[i].length ? projected[i][j] : upper;
        t.set(i, j, (upper + mirror) / 2);
        t.set(j, i, (upper + mirror) / 2);
      }
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(k, true, true);
    if (!eigen.decompose(t)) {
      throw new IllegalStateException("the projected eigenproblem of size " + k + " did not converge");
    }
    Integer[] by = new Integer[k];
    for (int i = 0; i < k; i++) {
      by[i] = i;
    }
    Arrays.sort(by, (a, b) -> Double.compare(eigen.getEigenvalue(b).getReal(), eigen.getEigenvalue(a).getReal()));
    ritz = new double[k];
    bounds = new double[k];
    ritzVectors = new double[k][];
    for (int i = 0; i < k; i++) {
      ritz[i] = eigen.getEigenvalue(by[i]).getReal();
      ritzVectors[i] = eigen.getEigenVector(by[i]).getData().clone();
      double sum = 0;
      for (int r = 0; r < last; r++) {
        double part = 0;
        for (int c = 0; c < couplingColumns; c++) {
          part = Math.fma(coupling[c * last + r], ritzVectors[i][k - couplingColumns + c], part);
        }
        sum += part * part;
      }
      bounds[i] = Math.sqrt(sum);
    }
    int settled = 0;
    while (settled < k && ritz[settled] > 0 && bounds[settled] <= tolerance * ritz[settled]) {
      settled++;
    }
    return settled;
  }

  /** The Ritz values found by the last {@link #settle}, descending. */
  double[] ritzValues() {
    return ritz;
  }

  /** The first Ritz vectors, n × count, purified by one application of the operator (which removes what M does not see). */
  double[] vectors(int count) {
    double[] x = new double[n * count];
    double[] coefficients = new double[ritz.length * count];
    for (int j = 0; j < count; j++) {
      System.arraycopy(ritzVectors[j], 0, coefficients, j * ritz.length, ritz.length);
    }
    int at = 0;
    for (int b = 0; b < blocks.size() && at < ritz.length; b++) {
      int p = Math.min(widths.get(b), ritz.length - at);
      TallBlocks.add(n, blocks.get(b), 0, p, 1, coefficients, at, ritz.length, x, 0, count);
      at += p;
    }
    double[] y = new double[n * count];
    mass.multiply(x, y, count);
    inverse.solve(y, count);
    calls += count;
    return y;
  }
}
