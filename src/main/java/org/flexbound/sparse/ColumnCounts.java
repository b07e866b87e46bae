package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Elimination tree and the number of entries in every column of the factor, from the pattern alone, in almost linear time.
 *
 * <p>Source: J. W. H. Liu, "The role of elimination trees in sparse factorization", SIAM J. Matrix Anal. Appl. 11 (1990) 134-172; J. R.
 * Gilbert, E. G. Ng, B. W. Peyton, "An efficient algorithm to compute row and column counts for sparse Cholesky factorization", ibid. 15
 * (1994) 1075-1091.
 */
final class ColumnCounts {
  private final int[] weights;
  /** Parent of every column, -1 for a root. */
  final int[] parent;
  /** Columns in postorder. */
  final int[] postorder;
  /** Unknowns in every column of the factor, the column's own included. */
  final int[] counts;

  /**
   * Counts for a matrix given by rows: row i of the strict lower triangle has the columns {@code columns[starts[i]] .. columns[starts[i + 1]
   * - 1]}, all below i, in any order.
   *
   * @param weights number of unknowns that a row (and column) stands for
   */
  ColumnCounts(int[] starts, int[] columns, int[] weights) {
    int n = starts.length - 1;
    this.weights = weights;
    parent = tree(starts, columns);
    postorder = Trees.postorder(parent);
    counts = count(n, starts, columns);
  }

  static int[] tree(int[] starts, int[] columns) {
    int n = starts.length - 1;
    int[] parent = new int[n];
    int[] ancestor = new int[n];
    Arrays.fill(parent, -1);
    Arrays.fill(ancestor, -1);
    for (int i = 0; i < n; i++) {
      for (int p = starts[i]; p < starts[i + 1]; p++) {
        int j = columns[p];
        while (ancestor[j] != i) {
          int up = ancestor[j];
          ancestor[j] = i;
          if (up < 0) {
            parent[j] = i;
            break;
          }
          j = up;
        }
      }
    }
    return parent;
  }

  private int[] count(int n, int[] starts, int[] columns) {
    // The strict lower triangle by columns, in terms of the postorder: column j meets its rows in ascending order of j's place.
    int[] colStarts = new int[n + 1];
    for (int p = 0; p < starts[n]; p++) {
      colStarts[columns[p] + 1]++;
    }
    for (int j = 0; j < n; j++) {
      colStarts[j + 1] += colStarts[j];
    }
    int[] next = colStarts.clone();
    int[] rows = new int[starts[n]];
    for (int i = 0; i < n; i++) {
      for (int p = starts[i]; p < starts[i + 1]; p++) {
        rows[next[columns[p]]++] = i;
      }
    }
    int[] firstDescendant = new int[n];
    Arrays.fill(firstDescendant, -1);
    int[] delta = new int[n];
    for (int k = 0; k < n; k++) {
      int j = postorder[k];
      delta[j] = firstDescendant[j] < 0 ? weights[j] : 0;
      for (int v = j; v >= 0 && firstDescendant[v] < 0; v = parent[v]) {
        firstDescendant[v] = k;
      }
    }
    int[] lastLeafPlace = new int[n];
    int[] lastLeaf = new int[n];
    int[] set = new int[n];
    Arrays.fill(lastLeafPlace, -1);
    Arrays.fill(lastLeaf, -1);
    for (int v = 0; v < n; v++) {
      set[v] = v;
    }
    for (int k = 0; k < n; k++) {
      int j = postorder[k];
      if (parent[j] >= 0) {
        delta[parent[j]] -= weights[j];
      }
      for (int p = colStarts[j]; p < colStarts[j + 1]; p++) {
        int i = rows[p];
        if (firstDescendant[j] > lastLeafPlace[i]) {
          // j is a leaf of row i's subtree: one more entry in every column from j up to where it meets the earlier leaves.
          delta[j] += weights[i];
          int earlier = lastLeaf[i];
          if (earlier >= 0) {
            int meet = earlier;
            while (set[meet] != meet) {
              meet = set[meet];
            }
            for (int v = earlier; v != meet;) {
              int up = set[v];
              set[v] = meet;
              v = up;
            }
            delta[meet] -= weights[i];
          }
          lastLeaf[i] = j;
          lastLeafPlace[i] = k;
        }
      }
      if (parent[j] >= 0) {
        set[j] = parent[j];
      }
    }
    for (int k = 0; k < n; k++) {
      int j = postorder[k];
      if (parent[j] >= 0) {
        delta[parent[j]] += delta[j];
      }
    }
    return delta;
  }

  /** Entries of the factor's lower triangle, the diagonal included. */
  long nonzeros() {
    long sum = 0;
    for (int j = 0; j < counts.length; j++) {
      long w = weights[j];
      sum += w * counts[j] - w * (w - 1) / 2;
    }
    return sum;
  }

  /** Multiplications and additions of the factorization, to leading order: the squared number of entries of every column. */
  double operations() {
    double sum = 0;
    for (int j = 0; j < counts.length; j++) {
      for (int t = 0; t < weights[j]; t++) {
        sum += (double) (counts[j] - t) * (counts[j] - t);
      }
    }
    return sum;
  }
}
