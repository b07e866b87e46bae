package org.flexbound.sparse;

/**
 * Forward and backward substitution for a block of right-hand sides kept row by row, so that the {@link DenseKernel} works directly on the
 * factor's panels. The block is as wide as one of the kernel's tiles; behind its last row it has four more, which take what the tiles give
 * beyond the rows that are wanted.
 */
final class BlockSubstitution {
  /** Rows behind the last that are written and never read. */
  static final int SPARE_ROWS = 4;

  private final SymbolicFactor symbolic;
  private final double[][] panels;
  private final double[] pivots;
  private final DenseKernel kernel;
  private final int block;
  private final double[] x;
  private final int spare;
  private double[] gathered = new double[0];

  /**
   * A substitution in place.
   *
   * @param block width of the block: {@link DenseKernel#WIDTH} or {@link DenseKernel#NARROW}
   * @param x (size + {@link #SPARE_ROWS}) × block, row by row in the order of elimination
   */
  BlockSubstitution(SymbolicFactor symbolic, double[][] panels, double[] pivots, DenseKernel kernel, int block, double[] x) {
    this.symbolic = symbolic;
    this.panels = panels;
    this.pivots = pivots;
    this.kernel = kernel;
    this.block = block;
    this.x = x;
    spare = pivots.length * block;
  }

  private void subtract(double[] a, int ao, double[] b, int b0, int b1, int b2, int b3, int bs, int depth, int c0, int c1, int c2, int c3) {
    if (block == DenseKernel.WIDTH) {
      kernel.subtract(a, ao, block, b, b0, b1, b2, b3, bs, depth, x, c0, c1, c2, c3);
    } else {
      kernel.subtractNarrow(a, ao, block, b, b0, b1, b2, b3, bs, depth, x, c0, c1, c2, c3);
    }
  }

  /** {@code L y = x} through the supernodes given, ascending. */
  void forward(int[] supernodes) {
    int[] rows = symbolic.rows;
    for (int s : supernodes) {
      double[] panel = panels[s];
      int height = symbolic.height(s);
      int width = symbolic.width(s);
      int own = symbolic.starts[s] * block;
      for (int j = 0; j < width; j += 4) {
        int c = own + j * block;
        int count = Math.min(4, width - j);
        subtractColumns(panel, height, j, count, j, own, c, c + block, c + 2 * block, c + 3 * block);
        for (int k = 0; k < count - 1; k++) {
          int p = Panel.column(j + k, height) + j;
          for (int t = k + 1; t < count; t++) {
            subtractRow(c + k * block, panel[p + t], c + t * block);
          }
        }
      }
      int at = symbolic.rowStarts[s] - width;
      int j = width;
      for (; j + 4 <= height; j += 4) {
        subtractColumns(panel, height, j, 4, width, own, rows[at + j] * block, rows[at + j + 1] * block, rows[at + j + 2] * block,
            rows[at + j + 3] * block);
      }
      if (j < height) {
        int c1 = j + 1 < height ? rows[at + j + 1] * block : spare;
        int c2 = j + 2 < height ? rows[at + j + 2] * block : spare;
        subtractColumns(panel, height, j, height - j, width, own, rows[at + j] * block, c1, c2, spare);
      }
    }
  }

  /** Takes the first {@code depth} columns of a panel out of one to four rows of the block; what is beyond the count goes to spare rows. */
  private void subtractColumns(double[] panel, int height, int row, int count, int depth, int own, int c0, int c1, int c2, int c3) {
    int t1 = count > 1 ? c1 : spare;
    int t2 = count > 2 ? c2 : spare + block;
    int t3 = count > 3 ? c3 : spare + 2 * block;
    for (int k = 0; k < depth; k += Panel.BLOCK) {
      int b = Panel.column(k, height) + row;
      subtract(x, own + k * block, panel, b, count > 1 ? b + 1 : b, count > 2 ? b + 2 : b, count > 3 ? b + 3 : b, Panel.stride(k, height),
          Math.min(Panel.BLOCK, depth - k), c0, t1, t2, t3);
    }
  }

  private void subtractRow(int from, double factor, int to) {
    for (int i = 0; i < block; i++) {
      x[to + i] = Math.fma(-factor, x[from + i], x[to + i]);
    }
  }

  /** {@code D Lᵀ y = x} through the supernodes given, descending. */
  void backward(int[] supernodes) {
    for (int i = supernodes.length - 1; i >= 0; i--) {
      backward(supernodes[i]);
    }
  }

  private void backward(int s) {
    double[] panel = panels[s];
    int height = symbolic.height(s);
    int width = symbolic.width(s);
    int first = symbolic.starts[s];
    int own = first * block;
    int below = height - width;
    if (gathered.length < below * block) {
      gathered = new double[below * block];
    }
    for (int r = 0; r < below; r++) {
      System.arraycopy(x, symbolic.rows[symbolic.rowStarts[s] + r] * block, gathered, r * block, block);
    }
    for (int j = 0; j < width; j++) {
      double inverse = 1 / pivots[first + j];
      for (int c = own + j * block; c < own + (j + 1) * block; c++) {
        x[c] *= inverse;
      }
    }
    // Columns in fours from the last; what is left over comes first in the supernode.
    for (int end = width; end > 0; end -= 4) {
      int j = Math.max(0, end - 4);
      int count = end - j;
      int c = own + j * block;
      int c1 = count > 1 ? c + block : spare;
      int c2 = count > 2 ? c + 2 * block : spare + block;
      int c3 = count > 3 ? c + 3 * block : spare + 2 * block;
      int b0 = Panel.column(j, height);
      int b1 = count > 1 ? Panel.column(j + 1, height) : b0;
      int b2 = count > 2 ? Panel.column(j + 2, height) : b0;
      int b3 = count > 3 ? Panel.column(j + 3, height) : b0;
      subtract(gathered, 0, panel, b0 + width, b1 + width, b2 + width, b3 + width, 1, below, c, c1, c2, c3);
      subtract(x, own + end * block, panel, b0 + end, b1 + end, b2 + end, b3 + end, 1, width - end, c, c1, c2, c3);
      for (int t = count - 2; t >= 0; t--) {
        int p = Panel.column(j + t, height) + j;
        for (int k = t + 1; k < count; k++) {
          subtractRow(c + k * block, panel[p + k], c + t * block);
        }
      }
    }
  }
}
