package org.flexbound.sparse;

import java.util.Arrays;

/**
 * An undirected graph whose vertices carry weights: what an {@link Ordering} works on. The neighbours of vertex v are
 * {@code neighbours[starts[v]] .. neighbours[starts[v + 1] - 1]}; every edge stands at both its ends, no vertex is its own neighbour. The
 * weight of a vertex is the number of unknowns it stands for. Immutable.
 */
public final class Graph {
  final int[] starts;
  final int[] neighbours;
  final int[] weights;

  Graph(int[] starts, int[] neighbours, int[] weights) {
    this.starts = starts;
    this.neighbours = neighbours;
    this.weights = weights;
  }

  /** Number of vertices. */
  public int vertexCount() {
    return weights.length;
  }

  /** The neighbours of a vertex, ascending (a copy). */
  public int[] neighbours(int vertex) {
    return Arrays.copyOfRange(neighbours, starts[vertex], starts[vertex + 1]);
  }

  /** The weight of a vertex: the number of unknowns it stands for. */
  public int weight(int vertex) {
    return weights[vertex];
  }

  /** The sum of all weights. */
  public int totalWeight() {
    int sum = 0;
    for (int w : weights) {
      sum += w;
    }
    return sum;
  }

  /**
   * The graph of the groups of a pattern's unknowns: two groups are neighbours if any of their unknowns share an entry.
   *
   * @param group the group of every unknown, from 0
   * @param groupCount number of groups, each with at least one unknown
   */
  static Graph of(SparsePattern pattern, int[] group, int groupCount) {
    int n = pattern.size();
    int[] colStarts = pattern.starts();
    int[] rows = pattern.rowIndices();
    int[] weights = new int[groupCount];
    int[] memberStarts = new int[groupCount + 1];
    for (int g : group) {
      weights[g]++;
    }
    for (int g = 0; g < groupCount; g++) {
      memberStarts[g + 1] = memberStarts[g] + weights[g];
    }
    int[] members = new int[n];
    int[] next = memberStarts.clone();
    for (int i = 0; i < n; i++) {
      members[next[group[i]]++] = i;
    }
    // Two passes over the lower triangle: count the distinct group pairs seen from the column's side, then mirror them.
    int[] seen = new int[groupCount];
    Arrays.fill(seen, -1);
    int[] pairFirst = new int[Math.max(16, groupCount * 4)];
    int[] pairSecond = new int[pairFirst.length];
    int pairs = 0;
    int[] degree = new int[groupCount + 1];
    for (int g = 0; g < groupCount; g++) {
      seen[g] = g;
      for (int m = memberStarts[g]; m < memberStarts[g + 1]; m++) {
        int j = members[m];
        for (int p = colStarts[j] + 1; p < colStarts[j + 1]; p++) {
          int h = group[rows[p]];
          if (seen[h] != g) {
            seen[h] = g;
            if (pairs == pairFirst.length) {
              pairFirst = Arrays.copyOf(pairFirst, pairs + pairs / 2);
              pairSecond = Arrays.copyOf(pairSecond, pairs + pairs / 2);
            }
            pairFirst[pairs] = g;
            pairSecond[pairs++] = h;
            degree[g + 1]++;
            degree[h + 1]++;
          }
        }
      }
    }
    for (int g = 0; g < groupCount; g++) {
      degree[g + 1] = Math.addExact(degree[g], degree[g + 1]);
    }
    int[] at = degree.clone();
    int[] neighbours = new int[degree[groupCount]];
    for (int e = 0; e < pairs; e++) {
      neighbours[at[pairFirst[e]]++] = pairSecond[e];
      neighbours[at[pairSecond[e]]++] = pairFirst[e];
    }
    return withoutRepeats(degree, neighbours, weights);
  }

  /** A pair whose entries lie on both sides of the diagonal was found from both groups: keep it once. */
  private static Graph withoutRepeats(int[] starts, int[] neighbours, int[] weights) {
    int n = weights.length;
    int[] kept = new int[n + 1];
    int count = 0;
    for (int v = 0; v < n; v++) {
      int from = count;
      Arrays.sort(neighbours, starts[v], starts[v + 1]);
      for (int p = starts[v]; p < starts[v + 1]; p++) {
        if (count == from || neighbours[count - 1] != neighbours[p]) {
          neighbours[count++] = neighbours[p];
        }
      }
      kept[v + 1] = count;
    }
    return new Graph(kept, Arrays.copyOf(neighbours, count), weights);
  }
}
