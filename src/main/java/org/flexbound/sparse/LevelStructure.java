package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Separators from breadth-first levels: rooted at a vertex far from all others, every level separates what lies before from what lies behind.
 * On regular lattices the levels seen from a corner are smaller than any plane between the faces.
 *
 * <p>Source: A. George, J. W. H. Liu, "An automatic nested dissection algorithm for irregular finite element problems", SIAM J. Numer. Anal.
 * 15 (1978) 1053-1069.
 */
final class LevelStructure {
  private final WeightedGraph graph;
  private final int[] queue;
  private final int[] level;

  LevelStructure(WeightedGraph graph) {
    this.graph = graph;
    queue = new int[graph.count];
    level = new int[graph.count];
  }

  /** The vertex visited last from a start vertex: one of those farthest from it. */
  int farthest(int start) {
    visit(start);
    return queue[graph.count - 1];
  }

  /** The side of every vertex for the cheapest level of a connected graph seen from a root. */
  byte[] separate(int root) {
    visit(root);
    int levels = level[queue[graph.count - 1]] + 1;
    int[] weight = new int[levels];
    for (int v = 0; v < graph.count; v++) {
      weight[level[v]] += graph.weights[v];
    }
    int best = 0;
    double bestCost = Double.POSITIVE_INFINITY;
    int before = 0;
    for (int l = 0; l < levels; l++) {
      int behind = graph.total - before - weight[l];
      double over = Math.max(0, Math.max(before, behind) - Separator.LARGEST_SIDE * graph.total);
      double cost = Separator.cost(before, behind, weight[l], graph.total) + over * graph.total;
      if (cost < bestCost) {
        bestCost = cost;
        best = l;
      }
      before += weight[l];
    }
    byte[] side = new byte[graph.count];
    for (int v = 0; v < graph.count; v++) {
      side[v] = level[v] < best ? 0 : level[v] > best ? 1 : Separator.SEPARATOR;
    }
    return side;
  }

  private void visit(int start) {
    Arrays.fill(level, -1);
    int head = 0;
    int tail = 0;
    queue[tail++] = start;
    level[start] = 0;
    while (head < tail) {
      int v = queue[head++];
      for (int p = graph.starts[v]; p < graph.starts[v + 1]; p++) {
        int u = graph.ends[p];
        if (level[u] < 0) {
          level[u] = level[v] + 1;
          queue[tail++] = u;
        }
      }
    }
  }
}
