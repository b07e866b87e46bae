package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Partial factorization of dense fronts: {@code L D Lᵀ} of the columns of a supernode, and the update {@code U - L₂₁ D L₂₁ᵀ} of what is below.
 * The panel is laid out as {@link Panel} says; the update matrix keeps its lower triangle by columns. One object belongs to one thread; loops
 * of large fronts are shared with a {@link Crew}.
 *
 * <p>The columns are halved recursively (to a depth of the logarithm of the width); all work but that on narrow diagonal blocks is done by the
 * {@link DenseKernel} on packed strips, after K. Goto, R. A. van de Geijn, "Anatomy of high-performance matrix multiplication", ACM Trans.
 * Math. Softw. 34 (2008) 12.
 */
final class FrontFactor {
  /** Columns factorized by themselves; a multiple of four and a divisor of {@link Panel#BLOCK}. */
  private static final int NARROW = 24;
  /** Depth of a packed strip: a strip of both operands stays in the first levels of cache. */
  private static final int DEPTH = 192;
  /** Columns of one unit of a shared loop. */
  private static final int UNIT = 96;
  private static final int STRIP = DenseKernel.WIDTH;
  /** Multiplications from which a loop is worth sharing. */
  private static final double WORTH_SHARING = 2e6;

  private final DenseKernel kernel;
  private final Crew crew;
  private final int worker;
  /** Scratch tiles of all workers. */
  private final double[][] tiles;
  private double[] strips = new double[0];
  private double[] columns = new double[0];
  private double[] spare = new double[0];

  FrontFactor(DenseKernel kernel, Crew crew, int worker, double[][] tiles) {
    this.kernel = kernel;
    this.crew = crew;
    this.worker = worker;
    this.tiles = tiles;
  }

  /** What is wrong with a pivot: its column in the front. */
  static final class SmallPivot extends Exception {
    private static final long serialVersionUID = 1;
    final int column;
    final double pivot;

    SmallPivot(int column, double pivot) {
      super(null, null, false, false);
      this.column = column;
      this.pivot = pivot;
    }
  }

  /** What decides whether a pivot may stand. */
  record PivotRule(boolean definite, double limit) {
    boolean rejects(double pivot, double scale) {
      double measured = definite ? pivot : Math.abs(pivot);
      return !(measured > limit * Math.abs(scale)) || Double.isInfinite(measured);
    }
  }

  /**
   * Factorizes a front.
   *
   * @param panel height × width; its lower trapezoid becomes L (unit diagonal not stored: the diagonal keeps the pivots)
   * @param update lower triangle of order height - width by columns
   * @param pivots receives the pivots from offset first
   * @param scale original diagonal entries from offset first
   */
  void factor(double[] panel, int height, int width, double[] update, double[] pivots, double[] scale, int first, PivotRule rule)
      throws SmallPivot {
    split(panel, height, 0, width, pivots, scale, first, rule);
    int r = height - width;
    for (int k = 0; k < width && r > 0; k += DEPTH) {
      product(panel, height, pivots, first, k, Math.min(width, k + DEPTH), width, height, update, true);
    }
  }

  private void split(double[] panel, int height, int from, int to, double[] pivots, double[] scale, int first, PivotRule rule)
      throws SmallPivot {
    if (to - from <= NARROW) {
      diagonal(panel, height, from, to, pivots, scale, first, rule);
      below(panel, height, from, to, pivots, first);
      return;
    }
    int middle = from + Math.max(NARROW, (to - from) / 2 / NARROW * NARROW);
    split(panel, height, from, middle, pivots, scale, first, rule);
    for (int k = from; k < middle; k += DEPTH) {
      product(panel, height, pivots, first, k, Math.min(middle, k + DEPTH), middle, to, panel, false);
    }
    split(panel, height, middle, to, pivots, scale, first, rule);
  }

  /** Factorizes a narrow diagonal block. */
  private static void diagonal(double[] panel, int height, int from, int to, double[] pivots, double[] scale, int first, PivotRule rule)
      throws SmallPivot {
    int stride = Panel.stride(from, height);
    int origin = Panel.column(from, height) - from * stride;
    for (int j = from; j < to; j++) {
      int source = origin + j * stride;
      double d = panel[source + j];
      if (rule.rejects(d, scale[first + j])) {
        throw new SmallPivot(j, d);
      }
      pivots[first + j] = d;
      for (int k = j + 1; k < to; k++) {
        double l = panel[source + k] / d;
        int target = origin + k * stride;
        for (int i = k; i < to; i++) {
          panel[target + i] = Math.fma(-l, panel[source + i], panel[target + i]);
        }
      }
      for (int k = j + 1; k < to; k++) {
        panel[source + k] /= d;
      }
    }
  }

  /** Solves for the rows below a narrow diagonal block, strip by strip. */
  private void below(double[] panel, int height, int from, int to, double[] pivots, int first) {
    int rows = height - to;
    if (rows == 0) {
      return;
    }
    int stride = Panel.stride(from, height);
    int origin = Panel.column(from, height) - from * stride;
    int whole = rows / STRIP;
    double work = (double) rows * (to - from) * (to - from);
    if (work > WORTH_SHARING) {
      int units = (whole + 15) / 16;
      crew.loop(units, worker, (u, w) -> {
        for (int s = 16 * u; s < Math.min(whole, 16 * u + 16); s++) {
          strip(panel, origin, stride, from, to, pivots, first, panel, origin + to + s * STRIP, stride);
        }
      });
    } else {
      for (int s = 0; s < whole; s++) {
        strip(panel, origin, stride, from, to, pivots, first, panel, origin + to + s * STRIP, stride);
      }
    }
    int rest = rows - whole * STRIP;
    if (rest > 0) {
      int row = to + whole * STRIP;
      spare = room(spare, STRIP * NARROW);
      for (int j = from; j < to; j++) {
        int at = (j - from) * STRIP;
        System.arraycopy(panel, origin + j * stride + row, spare, at, rest);
        Arrays.fill(spare, at + rest, at + STRIP, 0);
      }
      strip(panel, origin, stride, from, to, pivots, first, spare, -from * STRIP, STRIP);
      for (int j = from; j < to; j++) {
        System.arraycopy(spare, (j - from) * STRIP, panel, origin + j * stride + row, rest);
      }
    }
  }

  /** One strip of rows, at {@code x[xo + j·xs ..]} for column j; entry (i, j) of the diagonal block is {@code panel[origin + j·stride + i]}. */
  private void strip(double[] panel, int origin, int stride, int from, int to, double[] pivots, int first, double[] x, int xo, int xs) {
    int j = from;
    for (; j + 4 <= to; j += 4) {
      int c = xo + j * xs;
      if (j > from) {
        int b = origin + from * stride + j;
        kernel.subtract(x, xo + from * xs, xs, panel, b, b + 1, b + 2, b + 3, stride, j - from, x, c, c + xs, c + 2 * xs, c + 3 * xs);
      }
      triangle(panel, origin, stride, j, j + 4, x, xo, xs, j);
    }
    triangle(panel, origin, stride, j, to, x, xo, xs, from);
    for (int k = from; k < to; k++) {
      double inverse = 1 / pivots[first + k];
      int at = xo + k * xs;
      for (int i = at; i < at + STRIP; i++) {
        x[i] *= inverse;
      }
    }
  }

  /** Takes columns {@code since} and later out of columns from to to. */
  private static void triangle(double[] panel, int origin, int stride, int from, int to, double[] x, int xo, int xs, int since) {
    for (int j = from; j < to; j++) {
      int target = xo + j * xs;
      for (int k = since; k < j; k++) {
        double l = -panel[origin + k * stride + j];
        int source = xo + k * xs;
        for (int i = 0; i < STRIP; i++) {
          x[target + i] = Math.fma(l, x[source + i], x[target + i]);
        }
      }
    }
  }

  /**
   * Subtracts the product of columns k0 to k1 - 1 from the lower trapezoid whose columns are rows {@code from} to {@code to - 1} of the panel
   * and whose rows go on to the panel's end: of the panel itself, or of the update matrix.
   */
  private void product(double[] panel, int height, double[] pivots, int first, int k0, int k1, int from, int to, double[] target,
      boolean packed) {
    int depth = k1 - k0;
    int stripCount = (height - from + STRIP - 1) / STRIP;
    int groups = (to - from + 3) / 4;
    strips = room(strips, Math.multiplyExact(stripCount * STRIP, depth));
    columns = room(columns, groups * 4 * depth);
    double[] a = strips;
    double[] b = columns;
    double work = 0.5 * depth * (to - from) * (2.0 * height - from - to);
    int units = (to - from + UNIT - 1) / UNIT;
    boolean shared = work > WORTH_SHARING && units > 1;
    if (shared) {
      int packs = (stripCount + 31) / 32;
      crew.loop(packs, worker, (u, w) -> packStrips(panel, height, k0, k1, from, 32 * u, Math.min(stripCount, 32 * u + 32), a));
      crew.loop(units, worker, (u, w) -> packColumns(panel, height, pivots, first, k0, k1, from, to, u * UNIT / 4,
          Math.min(groups, (u + 1) * UNIT / 4), b));
      crew.loop(units, worker, (u, w) -> unit(a, b, depth, height - from, u * UNIT, Math.min(to - from, u * UNIT + UNIT), target,
          packed ? -1 : height, from, tiles[w]));
    } else {
      packStrips(panel, height, k0, k1, from, 0, stripCount, a);
      packColumns(panel, height, pivots, first, k0, k1, from, to, 0, groups, b);
      for (int u = 0; u < units; u++) {
        unit(a, b, depth, height - from, u * UNIT, Math.min(to - from, u * UNIT + UNIT), target, packed ? -1 : height, from, tiles[worker]);
      }
    }
  }

  private static void packStrips(double[] panel, int height, int k0, int k1, int from, int s0, int s1, double[] a) {
    int depth = k1 - k0;
    for (int s = s0; s < s1; s++) {
      int row = from + s * STRIP;
      int rows = Math.min(STRIP, height - row);
      int at = s * STRIP * depth;
      for (int k = k0; k < k1; k++) {
        System.arraycopy(panel, Panel.column(k, height) + row, a, at, rows);
        if (rows < STRIP) {
          Arrays.fill(a, at + rows, at + STRIP, 0);
        }
        at += STRIP;
      }
    }
  }

  private static void packColumns(double[] panel, int height, double[] pivots, int first, int k0, int k1, int from, int to, int g0, int g1,
      double[] b) {
    int depth = k1 - k0;
    for (int g = g0; g < g1; g++) {
      int row = from + g * 4;
      int rows = Math.min(4, to - row);
      int at = g * 4 * depth;
      for (int k = k0; k < k1; k++) {
        double d = pivots[first + k];
        int source = Panel.column(k, height) + row;
        for (int t = 0; t < rows; t++) {
          b[at + t] = panel[source + t] * d;
        }
        for (int t = rows; t < 4; t++) {
          b[at + t] = 0;
        }
        at += 4;
      }
    }
  }

  /**
   * Columns c0 to c1 - 1 of the trapezoid of {@code order} rows, which begins at row and column {@code offset} of a panel of the given
   * height, or is the packed lower triangle if the height is negative.
   */
  private void unit(double[] a, double[] b, int depth, int order, int c0, int c1, double[] target, int height, int offset, double[] tile) {
    for (int row = c0 / STRIP * STRIP; row < order; row += STRIP) {
      int ao = row * depth;
      for (int c = c0; c < c1 && c < row + STRIP; c += 4) {
        int bo = c * depth;
        boolean inside = row >= c + 3 && row + STRIP <= order && c + 4 <= c1;
        if (inside) {
          int t0 = start(c, order, height, offset) + row;
          int t1 = start(c + 1, order, height, offset) + row;
          int t2 = start(c + 2, order, height, offset) + row;
          int t3 = start(c + 3, order, height, offset) + row;
          kernel.subtract(a, ao, STRIP, b, bo, bo + 1, bo + 2, bo + 3, 4, depth, target, t0, t1, t2, t3);
        } else {
          Arrays.fill(tile, 0);
          kernel.subtract(a, ao, STRIP, b, bo, bo + 1, bo + 2, bo + 3, 4, depth, tile, 0, STRIP, 2 * STRIP, 3 * STRIP);
          int end = Math.min(order, row + STRIP);
          for (int t = 0; t < 4 && c + t < c1; t++) {
            int base = start(c + t, order, height, offset);
            int shift = t * STRIP - row;
            for (int i = Math.max(row, c + t); i < end; i++) {
              target[base + i] += tile[shift + i];
            }
          }
        }
      }
    }
  }

  /** Where row 0 of a column would stand. */
  private static int start(int column, int order, int height, int offset) {
    if (height < 0) {
      return (int) ((long) column * order - (long) column * (column + 1) / 2);
    }
    return Panel.column(column + offset, height) + offset;
  }

  private static double[] room(double[] array, int needed) {
    return array.length >= needed ? array : new double[Math.max(needed, array.length + array.length / 2)];
  }
}
