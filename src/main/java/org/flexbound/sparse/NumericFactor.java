package org.flexbound.sparse;

/**
 * The factor {@code P A Pᵀ = L D Lᵀ} of a matrix: solves for right-hand sides and tells the inertia. Immutable, may be used by several
 * threads.
 */
public final class NumericFactor {
  private final SymbolicFactor symbolic;
  private final double[][] panels;
  private final double[] pivots;
  private final DenseKernel kernel;
  private final int softest;
  private final double leastRatio;

  private NumericFactor(SymbolicFactor symbolic, double[][] panels, double[] pivots, double[] scale, DenseKernel kernel) {
    this.symbolic = symbolic;
    this.panels = panels;
    this.pivots = pivots;
    this.kernel = kernel;
    int at = -1;
    double least = Double.POSITIVE_INFINITY;
    for (int k = 0; k < pivots.length; k++) {
      double ratio = Math.abs(pivots[k]) / Math.abs(scale[symbolic.order[k]]);
      if (ratio < least) {
        least = ratio;
        at = symbolic.order[k];
      }
    }
    softest = at;
    leastRatio = least;
  }

  static NumericFactor compute(SymbolicFactor symbolic, SymmetricMatrix matrix, double[] scale, boolean definite) {
    return compute(symbolic, matrix, scale, definite, DenseKernel.fastest());
  }

  static NumericFactor compute(SymbolicFactor symbolic, SymmetricMatrix matrix, double[] scale, boolean definite, DenseKernel kernel) {
    FrontFactor.PivotRule rule = new FrontFactor.PivotRule(definite, symbolic.settings().pivotLimit());
    int threads = symbolic.settings().threads();
    Multifrontal process = new Multifrontal(symbolic, matrix, scale, rule, kernel, threads);
    try {
      process.run();
    } catch (PivotBreakdownException e) {
      if (threads == 1) {
        throw e;
      }
      // Which of several breakdowns is met first depends on the threads: name the first in the order of elimination.
      process = new Multifrontal(symbolic, matrix, scale, rule, kernel, 1);
      process.run();
    }
    return new NumericFactor(symbolic, process.panels(), process.pivots(), scale, kernel);
  }

  /** Number of unknowns. */
  public int size() {
    return pivots.length;
  }

  /** The order and pattern this factor was made with. */
  public SymbolicFactor symbolic() {
    return symbolic;
  }

  /** The pivots D, by unknown in the numbering of the matrix. */
  public double[] pivots() {
    double[] byUnknown = new double[pivots.length];
    for (int k = 0; k < pivots.length; k++) {
      byUnknown[symbolic.order[k]] = pivots[k];
    }
    return byUnknown;
  }

  /**
   * The least ratio of a pivot's size to its own original diagonal entry (for a shifted pencil: to the sum of both diagonals' sizes): how near
   * the matrix came to a breakdown. Infinite for a matrix without unknowns.
   */
  public double leastPivotRatio() {
    return leastRatio;
  }

  /** The unknown with the least ratio of pivot to diagonal, -1 for a matrix without unknowns. */
  public int leastPivotUnknown() {
    return softest;
  }

  /** Number of negative pivots: the number of negative eigenvalues of the matrix. */
  public int negativePivots() {
    int count = 0;
    for (double d : pivots) {
      count += d < 0 ? 1 : 0;
    }
    return count;
  }

  /**
   * Solves in place for several right-hand sides.
   *
   * @param rhs size × columns, column-major; becomes the solution
   * @param columns number of right-hand sides
   * @throws IllegalArgumentException if the array is too short
   */
  public void solve(double[] rhs, int columns) {
    if (rhs.length < (long) size() * columns) {
      throw new IllegalArgumentException("needs " + size() + " × " + columns + " numbers, has " + rhs.length);
    }
    new TriangularSolve(symbolic, panels, pivots, kernel).solve(rhs, columns);
  }

  /**
   * Solves for sparse right-hand sides and gives only the wanted rows of the solution: forward only through the part of the tree that the
   * right-hand sides reach, backward only to the wanted rows.
   *
   * @param rhs the right-hand sides, each of the matrix's size
   * @param wanted rows of the solution that are wanted, in any order
   * @return wanted × columns, column-major
   * @throws IllegalArgumentException if the sizes differ or a wanted row does not exist
   */
  public double[] solve(SparseColumns rhs, int[] wanted) {
    if (rhs.size() != size()) {
      throw new IllegalArgumentException("right-hand sides have " + rhs.size() + " rows, the matrix " + size());
    }
    for (int row : wanted) {
      if (row < 0 || row >= size()) {
        throw new IllegalArgumentException("wanted row " + row + " is not from 0 to " + (size() - 1));
      }
    }
    return new TriangularSolve(symbolic, panels, pivots, kernel).solve(rhs, wanted);
  }
}
