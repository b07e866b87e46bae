package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Forward and backward substitution with a supernodal factor. Right-hand sides are taken in blocks of {@link DenseKernel#WIDTH}, each block
 * kept row by row, so that the {@link DenseKernel} works directly on the factor's panels; a few left over are taken singly.
 */
final class TriangularSolve {
  private static final int BLOCK = DenseKernel.WIDTH;
  /** So many right-hand sides are padded to a block rather than taken singly. */
  private static final int WORTH_PADDING = 7;

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

  /** Solves in place, size × columns, column-major. */
  void solve(double[] rhs, int columns) {
    int n = pivots.length;
    int[] all = new int[symbolic.supernodes()];
    for (int s = 0; s < all.length; s++) {
      all[s] = s;
    }
    int units = blocks(columns);
    Crew.each(symbolic.settings().threads(), units, u -> {
      int from = u * BLOCK;
      int count = Math.min(BLOCK, columns - from);
      if (count >= WORTH_PADDING) {
        double[] x = new double[Math.multiplyExact(n, BLOCK)];
        for (int k = 0; k < n; k++) {
          int row = symbolic.order[k];
          for (int c = 0; c < count; c++) {
            x[k * BLOCK + c] = rhs[(from + c) * n + row];
          }
        }
        forward(x, all);
        backward(x, all);
        for (int k = 0; k < n; k++) {
          int row = symbolic.order[k];
          for (int c = 0; c < count; c++) {
            rhs[(from + c) * n + row] = x[k * BLOCK + c];
          }
        }
      } else {
        double[] x = new double[n];
        for (int c = from; c < from + count; c++) {
          for (int k = 0; k < n; k++) {
            x[k] = rhs[c * n + symbolic.order[k]];
          }
          forwardSingle(x, all);
          backwardSingle(x, all);
          for (int k = 0; k < n; k++) {
            rhs[c * n + symbolic.order[k]] = x[k];
          }
        }
      }
    });
  }

  private static int blocks(int columns) {
    return (columns + BLOCK - 1) / BLOCK;
  }

  /** Solves for sparse right-hand sides, wanted rows only. */
  double[] solve(SparseColumns rhs, int[] wanted) {
    int columns = rhs.columnCount();
    double[] chosen = new double[Math.multiplyExact(wanted.length, columns)];
    int[] back = reach(wanted, 0, wanted.length);
    Crew.each(symbolic.settings().threads(), blocks(columns), u -> {
      int from = u * BLOCK;
      int count = Math.min(BLOCK, columns - from);
      int[] starts = rhs.columnStarts();
      int[] rows = rhs.rowIndices();
      double[] values = rhs.entries();
      int width = count >= WORTH_PADDING ? BLOCK : 1;
      double[] x = new double[Math.multiplyExact(pivots.length, width)];
      for (int c = from; c < from + count; c += width) {
        int end = Math.min(from + count, c + width);
        Arrays.fill(x, 0);
        for (int d = c; d < end; d++) {
          for (int p = starts[d]; p < starts[d + 1]; p++) {
            x[symbolic.places[rows[p]] * width + d - c] += values[p];
          }
        }
        int[] reached = reach(rows, starts[c], starts[end]);
        if (width == BLOCK) {
          forward(x, reached);
          backward(x, back);
        } else {
          forwardSingle(x, reached);
          backwardSingle(x, back);
        }
        for (int d = c; d < end; d++) {
          for (int w = 0; w < wanted.length; w++) {
            chosen[d * wanted.length + w] = x[symbolic.places[wanted[w]] * width + d - c];
          }
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

  private void forward(double[] x, int[] supernodes) {
    for (int s : supernodes) {
      double[] panel = panels[s];
      int height = symbolic.height(s);
      int width = symbolic.width(s);
      int own = symbolic.starts[s] * BLOCK;
      int j = 0;
      for (; j + 4 <= width; j += 4) {
        int c = own + j * BLOCK;
        subtractColumns(panel, height, j, j, x, own, c, c + BLOCK, c + 2 * BLOCK, c + 3 * BLOCK);
        for (int k = 0; k < 3; k++) {
          int p = Panel.column(j + k, height) + j;
          for (int t = k + 1; t < 4; t++) {
            subtractRow(x, c + k * BLOCK, panel[p + t], c + t * BLOCK);
          }
        }
      }
      for (; j < width; j++) {
        for (int k = 0; k < j; k++) {
          subtractRow(x, own + k * BLOCK, panel[Panel.column(k, height) + j], own + j * BLOCK);
        }
      }
      int[] rows = symbolic.rows;
      int at = symbolic.rowStarts[s] - width;
      for (j = width; j + 4 <= height; j += 4) {
        subtractColumns(panel, height, j, width, x, own, rows[at + j] * BLOCK, rows[at + j + 1] * BLOCK, rows[at + j + 2] * BLOCK,
            rows[at + j + 3] * BLOCK);
      }
      for (; j < height; j++) {
        int target = rows[at + j] * BLOCK;
        for (int k = 0; k < width; k++) {
          subtractRow(x, own + k * BLOCK, panel[Panel.column(k, height) + j], target);
        }
      }
    }
  }

  /** Takes the first {@code depth} columns of a panel out of four rows of the right-hand sides. */
  private void subtractColumns(double[] panel, int height, int row, int depth, double[] x, int own, int c0, int c1, int c2, int c3) {
    for (int k = 0; k < depth; k += Panel.BLOCK) {
      int b = Panel.column(k, height) + row;
      kernel.subtract(x, own + k * BLOCK, BLOCK, panel, b, b + 1, b + 2, b + 3, Panel.stride(k, height), Math.min(Panel.BLOCK, depth - k), x,
          c0, c1, c2, c3);
    }
  }

  private static void subtractRow(double[] x, int from, double factor, int to) {
    for (int i = 0; i < BLOCK; i++) {
      x[to + i] = Math.fma(-factor, x[from + i], x[to + i]);
    }
  }

  private void backward(double[] x, int[] supernodes) {
    double[] gathered = new double[0];
    for (int i = supernodes.length - 1; i >= 0; i--) {
      int s = supernodes[i];
      double[] panel = panels[s];
      int height = symbolic.height(s);
      int width = symbolic.width(s);
      int first = symbolic.starts[s];
      int own = first * BLOCK;
      int below = height - width;
      if (gathered.length < below * BLOCK) {
        gathered = new double[below * BLOCK];
      }
      for (int r = 0; r < below; r++) {
        System.arraycopy(x, symbolic.rows[symbolic.rowStarts[s] + r] * BLOCK, gathered, r * BLOCK, BLOCK);
      }
      for (int j = 0; j < width; j++) {
        double inverse = 1 / pivots[first + j];
        for (int c = own + j * BLOCK; c < own + (j + 1) * BLOCK; c++) {
          x[c] *= inverse;
        }
      }
      // Columns in fours from the last; what is left over comes first in the supernode and is done at the end.
      int j = width - 4;
      for (; j >= 0; j -= 4) {
        int c = own + j * BLOCK;
        int b0 = Panel.column(j, height);
        int b1 = Panel.column(j + 1, height);
        int b2 = Panel.column(j + 2, height);
        int b3 = Panel.column(j + 3, height);
        kernel.subtract(gathered, 0, BLOCK, panel, b0 + width, b1 + width, b2 + width, b3 + width, 1, below, x, c, c + BLOCK, c + 2 * BLOCK,
            c + 3 * BLOCK);
        int next = j + 4;
        kernel.subtract(x, c + 4 * BLOCK, BLOCK, panel, b0 + next, b1 + next, b2 + next, b3 + next, 1, width - next, x, c, c + BLOCK,
            c + 2 * BLOCK, c + 3 * BLOCK);
        for (int t = 2; t >= 0; t--) {
          int p = Panel.column(j + t, height) + j;
          for (int k = t + 1; k < 4; k++) {
            subtractRow(x, c + k * BLOCK, panel[p + k], c + t * BLOCK);
          }
        }
      }
      for (j += 3; j >= 0; j--) {
        int target = own + j * BLOCK;
        int p = Panel.column(j, height);
        for (int r = 0; r < below; r++) {
          subtractRow(x, gathered, r * BLOCK, panel[p + width + r], target);
        }
        for (int k = j + 1; k < width; k++) {
          subtractRow(x, own + k * BLOCK, panel[p + k], target);
        }
      }
    }
  }

  private static void subtractRow(double[] x, double[] from, int at, double factor, int to) {
    for (int i = 0; i < BLOCK; i++) {
      x[to + i] = Math.fma(-factor, from[at + i], x[to + i]);
    }
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
