package org.flexbound.sparse;

import java.util.Arrays;

/**
 * The order of elimination and the pattern of the factor of every matrix on one {@link SparsePattern}: made once, reused for each new set of
 * values. Immutable, may be used by several threads.
 *
 * <p>The columns of the factor stand in supernodes: runs of columns that have the same rows below. Supernode s has the columns {@code
 * starts[s] .. starts[s + 1] - 1} and below them the rows {@code rows[rowStarts[s]] .. rows[rowStarts[s + 1] - 1]}, ascending, in the order
 * of elimination. Its front is the dense matrix of its columns and rows.
 */
public final class SymbolicFactor {
  /** Numbers that one array may hold. */
  private static final long LARGEST_BLOCK = Integer.MAX_VALUE - 64;

  private final SparsePattern pattern;
  private final FactorSettings settings;
  private final long nonzeros;
  private final double operations;
  /** order[k] is the unknown eliminated k-th. */
  final int[] order;
  /** The place of every unknown in the order. */
  final int[] places;
  final int[] starts;
  final int[] parents;
  final int[] rowStarts;
  final int[] rows;
  /** For each row of a supernode its position in the parent's front. */
  final int[] relative;
  /** Entries of the matrix by supernode: position among the matrix's values, and in the supernode's panel. */
  final int[] entryStarts;
  final int[] entrySources;
  final int[] entryTargets;
  /** Children of every supernode, in the order in which their update matrices are added. */
  final int[] childStarts;
  final int[] children;

  private SymbolicFactor(SparsePattern pattern, FactorSettings settings, OrderChoice choice) {
    this.pattern = pattern;
    this.settings = settings;
    nonzeros = choice.counts.nonzeros();
    operations = choice.counts.operations();
    SupernodeTree tree = new SupernodeTree(choice.counts);
    int n = choice.order.length;
    order = new int[n];
    for (int k = 0; k < n; k++) {
      order[k] = choice.order[tree.columnOrder[k]];
    }
    places = Trees.inverse(order);
    starts = tree.starts;
    parents = tree.parents;
    int supernodes = parents.length;
    childStarts = new int[supernodes + 1];
    children = new int[supernodes];
    collectChildren();
    entrySources = new int[pattern.entryCount()];
    entryTargets = new int[pattern.entryCount()];
    int[] columnStarts = sortEntries();
    entryStarts = new int[supernodes + 1];
    for (int s = 0; s < supernodes; s++) {
      entryStarts[s + 1] = columnStarts[starts[s + 1]];
    }
    rowStarts = new int[supernodes + 1];
    rows = findRows();
    relative = new int[rows.length];
    place(columnStarts);
  }

  private void collectChildren() {
    for (int p : parents) {
      if (p >= 0) {
        childStarts[p + 1]++;
      }
    }
    for (int s = 0; s < parents.length; s++) {
      childStarts[s + 1] += childStarts[s];
    }
    int[] next = childStarts.clone();
    for (int s = 0; s < parents.length; s++) {
      if (parents[s] >= 0) {
        children[next[parents[s]]++] = s;
      }
    }
  }

  /** Sorts the matrix's entries by column of the factor, with the row of each as its target; returns where columns begin. */
  private int[] sortEntries() {
    int n = order.length;
    int[] cs = pattern.starts();
    int[] rs = pattern.rowIndices();
    int[] columnStarts = new int[n + 1];
    for (int j = 0; j < n; j++) {
      for (int p = cs[j]; p < cs[j + 1]; p++) {
        columnStarts[Math.min(places[j], places[rs[p]]) + 1]++;
      }
    }
    for (int j = 0; j < n; j++) {
      columnStarts[j + 1] += columnStarts[j];
    }
    int[] at = columnStarts.clone();
    for (int j = 0; j < n; j++) {
      for (int p = cs[j]; p < cs[j + 1]; p++) {
        int a = places[j];
        int b = places[rs[p]];
        int q = at[Math.min(a, b)]++;
        entrySources[q] = p;
        entryTargets[q] = Math.max(a, b);
      }
    }
    return columnStarts;
  }

  /** The rows below every supernode: those of its own entries and of its children. */
  private int[] findRows() {
    int n = order.length;
    int[] found = new int[Math.max(16, 8 * parents.length)];
    int[] mark = new int[n];
    Arrays.fill(mark, -1);
    for (int s = 0; s < parents.length; s++) {
      int end = starts[s + 1];
      int from = rowStarts[s];
      int count = from;
      long most = (long) entryStarts[s + 1] - entryStarts[s];
      for (int k = childStarts[s]; k < childStarts[s + 1]; k++) {
        most += (long) rowStarts[children[k] + 1] - rowStarts[children[k]];
      }
      most = Math.min(most, n - end);
      if (count + most > found.length) {
        found = Arrays.copyOf(found, Math.toIntExact(count + most + found.length / 2));
      }
      for (int q = entryStarts[s]; q < entryStarts[s + 1]; q++) {
        int row = entryTargets[q];
        if (row >= end && mark[row] != s) {
          mark[row] = s;
          found[count++] = row;
        }
      }
      for (int k = childStarts[s]; k < childStarts[s + 1]; k++) {
        for (int q = rowStarts[children[k]]; q < rowStarts[children[k] + 1]; q++) {
          int row = found[q];
          if (row >= end && mark[row] != s) {
            mark[row] = s;
            found[count++] = row;
          }
        }
      }
      Arrays.sort(found, from, count);
      rowStarts[s + 1] = count;
    }
    return Arrays.copyOf(found, rowStarts[parents.length]);
  }

  /** Finds the positions of entries and of children's rows in the fronts. */
  private void place(int[] columnStarts) {
    int[] local = new int[order.length];
    for (int s = 0; s < parents.length; s++) {
      int width = starts[s + 1] - starts[s];
      int height = height(s);
      if (Math.max(Panel.size(width, height), update(s)) > LARGEST_BLOCK) {
        throw new IllegalArgumentException("the factor would need a dense block of " + height + " rows and " + width
            + " columns, more numbers than one array holds; the matrix is too densely coupled for a direct factor");
      }
      for (int j = 0; j < width; j++) {
        local[starts[s] + j] = j;
      }
      for (int q = rowStarts[s]; q < rowStarts[s + 1]; q++) {
        local[rows[q]] = width + q - rowStarts[s];
      }
      for (int j = 0; j < width; j++) {
        int base = Panel.column(j, height);
        for (int q = columnStarts[starts[s] + j]; q < columnStarts[starts[s] + j + 1]; q++) {
          entryTargets[q] = base + local[entryTargets[q]];
        }
      }
      for (int k = childStarts[s]; k < childStarts[s + 1]; k++) {
        for (int q = rowStarts[children[k]]; q < rowStarts[children[k] + 1]; q++) {
          relative[q] = local[rows[q]];
        }
      }
    }
  }

  /**
   * Analyses a pattern, every unknown by itself, with the usual settings.
   *
   * @param pattern the pattern of the matrices to be factorized
   */
  public static SymbolicFactor analyze(SparsePattern pattern) {
    int[] alone = new int[pattern.size()];
    for (int i = 0; i < alone.length; i++) {
      alone[i] = i;
    }
    return analyze(pattern, alone, FactorSettings.defaults());
  }

  /**
   * Analyses a pattern whose unknowns belong to groups.
   *
   * @param pattern the pattern of the matrices to be factorized
   * @param group the group (node) of every unknown, any numbers from 0 to size - 1; a group's unknowns are coupled to much the same others,
   *     and ordering the groups is quicker and often better than ordering the unknowns
   * @param settings how
   * @throws IllegalArgumentException if there is not one group number for each unknown, from 0 to size - 1, or if the factor would have a
   *     dense block of more than 2³¹ numbers
   */
  public static SymbolicFactor analyze(SparsePattern pattern, int[] group, FactorSettings settings) {
    int n = pattern.size();
    if (group.length != n) {
      throw new IllegalArgumentException(group.length + " group numbers for " + n + " unknowns");
    }
    for (int i = 0; i < n; i++) {
      if (group[i] < 0 || group[i] >= n) {
        throw new IllegalArgumentException("group " + group[i] + " of unknown " + i + " is not from 0 to " + (n - 1));
      }
    }
    return new SymbolicFactor(pattern, settings, OrderChoice.choose(pattern, group, settings.ordering()));
  }

  /** Number of unknowns. */
  public int size() {
    return order.length;
  }

  /** The pattern that was analysed. */
  public SparsePattern pattern() {
    return pattern;
  }

  /** The order of elimination: the unknown eliminated first, second and so on (a copy). */
  public int[] order() {
    return order.clone();
  }

  /** Nonzeros of the factor's lower triangle, the diagonal included. */
  public long nonzeros() {
    return nonzeros;
  }

  /** Numbers kept for the factor: its nonzeros, the zeros of merged supernodes and the unused upper triangles of their diagonal blocks. */
  public long storedNumbers() {
    long sum = 0;
    for (int s = 0; s < parents.length; s++) {
      sum += Panel.size(width(s), height(s));
    }
    return sum + order.length;
  }

  /** The most numbers held at once while factorizing with one thread: factor and update matrices. */
  public long peakNumbers() {
    long now = order.length;
    long most = now;
    for (int s = 0; s < parents.length; s++) {
      now += Panel.size(width(s), height(s)) + update(s);
      most = Math.max(most, now);
      for (int k = childStarts[s]; k < childStarts[s + 1]; k++) {
        now -= update(children[k]);
      }
    }
    return most;
  }

  /** Multiplications, and as many additions, of a factorization. */
  public double operations() {
    return operations;
  }

  FactorSettings settings() {
    return settings;
  }

  int supernodes() {
    return parents.length;
  }

  /** Columns of a supernode. */
  int width(int s) {
    return starts[s + 1] - starts[s];
  }

  /** Rows of a supernode's front: its columns and the rows below. */
  int height(int s) {
    return starts[s + 1] - starts[s] + rowStarts[s + 1] - rowStarts[s];
  }

  /** Numbers of a supernode's update matrix. */
  private long update(int s) {
    long r = (long) rowStarts[s + 1] - rowStarts[s];
    return r * (r + 1) / 2;
  }

  /**
   * Factorizes a positive definite matrix.
   *
   * @param matrix values on the analysed pattern
   * @throws PivotBreakdownException if a pivot is not positive, or small against its own original diagonal entry
   * @throws IllegalArgumentException if the matrix has another pattern
   */
  public NumericFactor cholesky(SymmetricMatrix matrix) {
    return NumericFactor.compute(this, checked(matrix), matrix.diagonal(), true);
  }

  /**
   * Factorizes an indefinite matrix as L D Lᵀ with diagonal D, without exchanging pivots. The result's number of negative pivots is that
   * of the matrix's negative eigenvalues (Sylvester's law of inertia).
   *
   * @param matrix values on the analysed pattern
   * @throws PivotBreakdownException if a pivot is small against its own original diagonal entry
   * @throws IllegalArgumentException if the matrix has another pattern
   */
  public NumericFactor indefinite(SymmetricMatrix matrix) {
    return NumericFactor.compute(this, checked(matrix), matrix.diagonal(), false);
  }

  /**
   * Factorizes {@code K - shift · M}; pivots are judged against {@code |K[i][i]| + |shift · M[i][i]|}. A breakdown means that the shift meets
   * an eigenvalue (of the pencil, or of a leading part of it): try another shift nearby.
   *
   * @param k first matrix, its entries within the analysed pattern
   * @param shift the shift
   * @param m second matrix, its entries within the analysed pattern
   * @throws PivotBreakdownException if a pivot is small
   * @throws IllegalArgumentException if a matrix has an entry outside the analysed pattern
   */
  public NumericFactor shifted(SymmetricMatrix k, double shift, SymmetricMatrix m) {
    double[] scale = k.diagonal();
    double[] mass = m.diagonal();
    for (int i = 0; i < scale.length; i++) {
      scale[i] = Math.abs(scale[i]) + Math.abs(shift * mass[i]);
    }
    SymmetricMatrix sum = k.on(pattern).plus(-shift, m.on(pattern));
    return NumericFactor.compute(this, sum, scale, false);
  }

  private SymmetricMatrix checked(SymmetricMatrix matrix) {
    if (!matrix.pattern().equals(pattern)) {
      throw new IllegalArgumentException("the matrix has another pattern than the one analysed");
    }
    return matrix;
  }
}
