package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Groups the columns of a factor into supernodes, runs of columns with the same rows below; merges small ones where that adds few zeros; and
 * puts the tree in an order that keeps the stack of update matrices low.
 *
 * <p>Source: C. Ashcraft, R. Grimes, "The influence of relaxed supernode partitions on the multifrontal method", ACM Trans. Math. Softw. 15
 * (1989) 291-309; J. W. H. Liu, "On the storage requirement in the out-of-core multifrontal method for sparse factorization", ibid. 12 (1986)
 * 249-264.
 */
final class SupernodeTree {
  /** Merged supernodes up to so many columns may hold the part of zeros beside it; wider ones that of the last. */
  private static final int[] WIDTHS = {8, 16, 48};

  private static final double[] ZEROS = {0.2, 0.15, 0.1, 0.05};

  private final int[] firstColumn;
  private final int[] parent;
  private final int[] width;
  private final int[] below;
  private final double[] zeros;
  /** Supernode that each one was merged into, itself if none. */
  private final int[] merged;
  private int count;

  /** Final order of the columns, in terms of the numbering given. */
  final int[] columnOrder;
  /** First column of every final supernode, in the final order, and the number of columns at the end. */
  final int[] starts;
  /** Parent of every final supernode, -1 for a root. */
  final int[] parents;

  /** Finds the supernodes of a factor from its tree and counts (any topological order of columns). */
  SupernodeTree(ColumnCounts counts) {
    int n = counts.parent.length;
    int[] post = counts.postorder;
    int[] at = Trees.inverse(post);
    int[] columnParent = new int[n];
    int[] columnCount = new int[n];
    for (int k = 0; k < n; k++) {
      int p = counts.parent[post[k]];
      columnParent[k] = p < 0 ? -1 : at[p];
      columnCount[k] = counts.counts[post[k]];
    }
    int[] owner = new int[n];
    int[] first = new int[n + 1];
    for (int k = 0; k < n; k++) {
      boolean continues = k > 0 && columnParent[k - 1] == k && columnCount[k - 1] == columnCount[k] + 1;
      if (!continues) {
        first[count++] = k;
      }
      owner[k] = count - 1;
    }
    first[count] = n;
    firstColumn = Arrays.copyOf(first, count + 1);
    parent = new int[count];
    width = new int[count];
    below = new int[count];
    zeros = new double[count];
    merged = new int[count];
    for (int s = 0; s < count; s++) {
      int last = firstColumn[s + 1] - 1;
      parent[s] = columnParent[last] < 0 ? -1 : owner[columnParent[last]];
      width[s] = last + 1 - firstColumn[s];
      below[s] = columnCount[last] - 1;
      merged[s] = s;
    }
    merge();
    int[] final0 = lowStack();
    starts = new int[final0.length + 1];
    parents = new int[final0.length];
    columnOrder = columns(final0, post);
  }

  /** Merges children into parents, from the leaves up, the child with the most rows first. */
  private void merge() {
    int[] childStarts = new int[count + 1];
    for (int s = 0; s < count; s++) {
      if (parent[s] >= 0) {
        childStarts[parent[s] + 1]++;
      }
    }
    for (int s = 0; s < count; s++) {
      childStarts[s + 1] += childStarts[s];
    }
    int[] children = new int[childStarts[count]];
    int[] next = Arrays.copyOf(childStarts, count);
    for (int s = 0; s < count; s++) {
      if (parent[s] >= 0) {
        children[next[parent[s]]++] = s;
      }
    }
    for (int p = 0; p < count; p++) {
      sortByRows(children, childStarts[p], childStarts[p + 1]);
      for (int k = childStarts[p]; k < childStarts[p + 1]; k++) {
        int c = children[k];
        double extra = (double) width[c] * (width[p] + below[p] - below[c]);
        double holes = zeros[c] + zeros[p] + extra;
        int w = width[c] + width[p];
        double whole = (double) w * (w + 1) / 2 + (double) w * below[p];
        if (holes <= allowed(w) * whole) {
          merged[c] = p;
          width[p] = w;
          zeros[p] = holes;
        }
      }
    }
    // Parents may have been merged after their children were looked at: lead every one to the top of its chain.
    for (int s = count - 1; s >= 0; s--) {
      merged[s] = merged[s] == s ? s : merged[merged[s]];
    }
  }

  private static double allowed(int w) {
    int i = 0;
    while (i < WIDTHS.length && w > WIDTHS[i]) {
      i++;
    }
    return ZEROS[i];
  }

  private void sortByRows(int[] children, int from, int to) {
    for (int k = from + 1; k < to; k++) {
      int c = children[k];
      int at = k;
      if (to - from > 64) {
        // Long lists (stars) are left in their order: sorting them by insertion would take too long.
        return;
      }
      while (at > from && below[children[at - 1]] < below[c]) {
        children[at] = children[at - 1];
        at--;
      }
      children[at] = c;
    }
  }

  /** The supernodes that remain, in a postorder in which the children that need the most room beyond their result come first. */
  private int[] lowStack() {
    double[] peak = new double[count];
    int[] up = new int[count];
    Arrays.fill(up, -1);
    Integer[][] children = new Integer[count][];
    int[] childCount = new int[count];
    int kept = 0;
    for (int s = 0; s < count; s++) {
      if (merged[s] == s) {
        kept++;
        up[s] = parent[s] < 0 ? -1 : merged[parent[s]];
        if (up[s] >= 0) {
          childCount[up[s]]++;
        }
      }
    }
    for (int s = 0; s < count; s++) {
      children[s] = new Integer[childCount[s]];
      childCount[s] = 0;
    }
    int[] visit = new int[kept];
    int visited = 0;
    for (int s = 0; s < count; s++) {
      if (merged[s] != s) {
        continue;
      }
      // All children of s come before it and have their peaks.
      Arrays.sort(children[s], (a, b) -> {
        int byRoom = Double.compare(peak[b] - update(b), peak[a] - update(a));
        return byRoom != 0 ? byRoom : Integer.compare(a, b);
      });
      double waiting = 0;
      double most = 0;
      for (int c : children[s]) {
        most = Math.max(most, waiting + peak[c]);
        waiting += update(c);
      }
      peak[s] = Math.max(most, waiting + update(s));
      if (up[s] >= 0) {
        children[up[s]][childCount[up[s]]++] = s;
      } else {
        visit[visited++] = s;
      }
    }
    return walk(visit, visited, children, kept);
  }

  private double update(int s) {
    return below[s] * (below[s] + 1.0) / 2;
  }

  private int[] walk(int[] roots, int rootCount, Integer[][] children, int kept) {
    int[] order = new int[kept];
    int done = kept;
    int[] stack = new int[kept];
    int top = 0;
    for (int r = 0; r < rootCount; r++) {
      stack[top++] = roots[r];
    }
    // Parents before children, last child first: the reverse of a postorder.
    while (top > 0) {
      int s = stack[--top];
      order[--done] = s;
      for (int c : children[s]) {
        stack[top++] = c;
      }
    }
    return order;
  }

  private int[] columns(int[] finalOrder, int[] post) {
    int[] place = new int[count];
    for (int k = 0; k < finalOrder.length; k++) {
      place[finalOrder[k]] = k;
    }
    for (int s = 0; s < count; s++) {
      starts[place[merged[s]] + 1] += firstColumn[s + 1] - firstColumn[s];
    }
    for (int k = 0; k < finalOrder.length; k++) {
      starts[k + 1] += starts[k];
      int s = finalOrder[k];
      parents[k] = parent[s] < 0 ? -1 : place[merged[parent[s]]];
    }
    int[] next = starts.clone();
    int[] columns = new int[post.length];
    for (int s = 0; s < count; s++) {
      int k = place[merged[s]];
      for (int j = firstColumn[s]; j < firstColumn[s + 1]; j++) {
        columns[next[k]++] = post[j];
      }
    }
    return columns;
  }
}
