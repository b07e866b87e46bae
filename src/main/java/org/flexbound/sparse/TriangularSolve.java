package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Forward and backward substitution with a supernodal factor: right-hand sides are taken in blocks as wide as the tiles of the
 * {@link DenseKernel}, wide ones first, a last one or two singly.
 */
final class TriangularSolve {
  /** So few right-hand sides are taken singly. */
  private static final int SINGLY = 1;

  private final SymbolicFactor symbolic;
  private final double[][] panels;
  private final double[] pivots;
  private final DenseKernel kernel;

  TriangularSolve(SymbolicFactor symbolic, double[][] panels, double[] pivots, DenseKernel kernel) {
    this.symbolic = symbolic;
    this.panels = panels;
    this.pivots = pivots;
    this.kernel = kernel;
  }

  /** First columns of the blocks that so many right-hand sides are taken in, and their number at the end. */
  private static int[] blocks(int columns) {
    int wide = columns / DenseKernel.WIDTH;
    int rest = columns - wide * DenseKernel.WIDTH;
    if (rest > 2 * DenseKernel.NARROW) {
      wide++;
      rest = 0;
    }
    int narrow = (rest + DenseKernel.NARROW - 1) / DenseKernel.NARROW;
    int[] starts = new int[wide + narrow + 1];
    for (int b = 1; b < starts.length; b++) {
      starts[b] = Math.min(columns, starts[b - 1] + (b <= wide ? DenseKernel.WIDTH : DenseKernel.NARROW));
    }
    return starts;
  }

  private static int width(int count) {
    return count > DenseKernel.NARROW ? DenseKernel.WIDTH : count > SINGLY ? DenseKernel.NARROW : 1;
  }

  private void substitute(double[] x, int width, int[] forward, int[] backward) {
    if (width == 1) {
      forwardSingle(x, forward);
      backwardSingle(x, backward);
    } else {
      BlockSubstitution block = new BlockSubstitution(symbolic, panels, pivots, kernel, width, x);
      block.forward(forward);
      block.backward(backward);
    }
  }

  private double[] rows(int width) {
    return new double[Math.multiplyExact(Math.addExact(pivots.length, BlockSubstitution.SPARE_ROWS), width)];
  }

  /** Solves in place, size × columns, column-major. */
  void solve(double[] rhs, int columns) {
    int n = pivots.length;
    int[] all = new int[symbolic.supernodes()];
    for (int s = 0; s < all.length; s++) {
      all[s] = s;
    }
    int[] blocks = blocks(columns);
    Crew.each(symbolic.settings().threads(), blocks.length - 1, u -> {
      int from = blocks[u];
      int count = blocks[u + 1] - from;
      int width = width(count);
      double[] x = rows(width);
      for (int k = 0; k < n; k++) {
        int row = from * n + symbolic.order[k];
        for (int c = 0; c < count; c++) {
          x[k * width + c] = rhs[c * n + row];
        }
      }
      substitute(x, width, all, all);
      for (int k = 0; k < n; k++) {
        int row = from * n + symbolic.order[k];
        for (int c = 0; c < count; c++) {
          rhs[c * n + row] = x[k * width + c];
        }
      }
    });
  }

  /** Solves for sparse right-hand sides, wanted rows only. */
  double[] solve(SparseColumns rhs, int[] wanted) {
    int columns = rhs.columnCount();
    double[] chosen = new double[Math.multiplyExact(wanted.length, columns)];
    int[] back = reach(wanted, 0, wanted.length);
    int[] blocks = blocks(columns);
    int[] starts = rhs.columnStarts();
    int[] rows = rhs.rowIndices();
    double[] values = rhs.entries();
    Crew.each(symbolic.settings().threads(), blocks.length - 1, u -> {
      int from = blocks[u];
      int to = blocks[u + 1];
      int width = width(to - from);
      double[] x = rows(width);
      for (int c = from; c < to; c++) {
        for (int p = starts[c]; p < starts[c + 1]; p++) {
          x[symbolic.places[rows[p]] * width + c - from] += values[p];
        }
      }
      substitute(x, width, reach(rows, starts[from], starts[to]), back);
      for (int c = from; c < to; c++) {
        for (int w = 0; w < wanted.length; w++) {
          chosen[c * wanted.length + w] = x[symbolic.places[wanted[w]] * width + c - from];
        }
      }
    });
    return chosen;
  }

  /** The supernodes of some unknowns and all above them, ascending. */
  private int[] reach(int[] unknowns, int from, int to) {
    boolean[] reached = new boolean[symbolic.supernodes()];
    int count = 0;
    for (int p = from; p < to; p++) {
      int at = Arrays.binarySearch(symbolic.starts, symbolic.places[unknowns[p]]);
      int s = at >= 0 ? at : -at - 2;
      while (s >= 0 && !reached[s]) {
        reached[s] = true;
        count++;
        s = symbolic.parents[s];
      }
    }
    int[] list = new int[count];
    int k = 0;
    for (int s = 0; s < reached.length; s++) {
      if (reached[s]) {
        list[k++] = s;
      }
    }
    return list;
  }

  private void forwardSingle(double[] x, int[] supernodes) {
    double[] sum = new double[0];
    for (int s : supernodes) {
      double[] panel = panels[s];
      int height = symbolic.height(s);
      int width = symbolic.width(s);
      int first = symbolic.starts[s];
      if (sum.length < height) {
        sum = new double[height];
      }
      Arrays.fill(sum, 0, height, 0);
      int j = 0;
      for (; j + 4 <= width; j += 4) {
        int p = Panel.column(j, height);
        int stride = Panel.stride(j, height);
        double x0 = x[first + j] - sum[j];
        double x1 = x[first + j + 1] - sum[j + 1] - panel[p + j + 1] * x0;
        double x2 = x[first + j + 2] - sum[j + 2] - panel[p + j + 2] * x0 - panel[p + stride + j + 2] * x1;
        double x3 = x[first + j + 3] - sum[j + 3] - panel[p + j + 3] * x0 - panel[p + stride + j + 3] * x1
            - panel[p + 2 * stride + j + 3] * x2;
        x[first + j] = x0;
        x[first + j + 1] = x1;
        x[first + j + 2] = x2;
        x[first + j + 3] = x3;
        addFour(panel, p, stride, j + 4, height, x0, x1, x2, x3, sum);
      }
      for (; j < width; j++) {
        double xj = x[first + j] - sum[j];
        x[first + j] = xj;
        int p = Panel.column(j, height);
        for (int i = j + 1; i < height; i++) {
          sum[i] = Math.fma(panel[p + i], xj, sum[i]);
        }
      }
      int at = symbolic.rowStarts[s] - width;
      for (int i = width; i < height; i++) {
        x[symbolic.rows[at + i]] -= sum[i];
      }
    }
  }

  private static void addFour(double[] panel, int p0, int stride, int from, int height, double x0, double x1, double x2, double x3, double[] sum) {
    int p1 = p0 + stride;
    int p2 = p1 + stride;
    int p3 = p2 + stride;
    for (int i = from; i < height; i++) {
      sum[i] = Math.fma(panel[p3 + i], x3, Math.fma(panel[p2 + i], x2, Math.fma(panel[p1 + i], x1, Math.fma(panel[p0 + i], x0, sum[i]))));
    }
  }

  private void backwardSingle(double[] x, int[] supernodes) {
    double[] gathered = new double[0];
    for (int k = supernodes.length - 1; k >= 0; k--) {
      int s = supernodes[k];
      double[] panel = panels[s];
      int height = symbolic.height(s);
      int width = symbolic.width(s);
      int first = symbolic.starts[s];
      if (gathered.length < height) {
        gathered = new double[height];
      }
      int at = symbolic.rowStarts[s] - width;
      for (int i = width; i < height; i++) {
        gathered[i] = x[symbolic.rows[at + i]];
      }
      for (int j = width - 1; j >= 0; j--) {
        double sum = dot(panel, Panel.column(j, height), gathered, j + 1, height);
        gathered[j] = x[first + j] / pivots[first + j] - sum;
        x[first + j] = gathered[j];
      }
    }
  }

  private static double dot(double[] panel, int p, double[] y, int from, int to) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int i = from;
    for (; i + 4 <= to; i += 4) {
      s0 = Math.fma(panel[p + i], y[i], s0);
      s1 = Math.fma(panel[p + i + 1], y[i + 1], s1);
      s2 = Math.fma(panel[p + i + 2], y[i + 2], s2);
      s3 = Math.fma(panel[p + i + 3], y[i + 3], s3);
    }
    for (; i < to; i++) {
      s0 = Math.fma(panel[p + i], y[i], s0);
    }
    return (s0 + s1) + (s2 + s3);
  }
}
