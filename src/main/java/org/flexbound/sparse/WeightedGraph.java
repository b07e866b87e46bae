package org.flexbound.sparse;

import java.util.Arrays;

/**
 * A graph with weights on vertices and edges, and its coarsening by matching: what the levels of a multilevel bisection are. Neighbours of v
 * are {@code ends[starts[v]] .. ends[starts[v + 1] - 1]}, with the edges' weights beside them.
 */
final class WeightedGraph {
  final int count;
  final int[] starts;
  final int[] ends;
  final int[] edgeWeights;
  final int[] weights;
  final int total;

  WeightedGraph(int count, int[] starts, int[] ends, int[] edgeWeights, int[] weights) {
    this.count = count;
    this.starts = starts;
    this.ends = ends;
    this.edgeWeights = edgeWeights;
    this.weights = weights;
    int sum = 0;
    for (int v = 0; v < count; v++) {
      sum += weights[v];
    }
    total = sum;
  }

  /**
   * Matches every vertex with the free neighbour along its heaviest edge (relative to the weight of the neighbour), visiting vertices in
   * the given order.
   *
   * @param heaviest pairs heavier than this are not matched
   * @return the coarse vertex of every vertex, numbered from 0; the last element is the number of coarse vertices
   */
  int[] match(int[] visit, int heaviest) {
    int[] coarse = new int[count + 1];
    Arrays.fill(coarse, 0, count, -1);
    int next = 0;
    for (int k = 0; k < count; k++) {
      int v = visit[k];
      if (coarse[v] >= 0) {
        continue;
      }
      int best = -1;
      double bestScore = 0;
      for (int p = starts[v]; p < starts[v + 1]; p++) {
        int u = ends[p];
        if (coarse[u] < 0 && weights[u] + weights[v] <= heaviest) {
          double score = edgeWeights[p] / (double) weights[u];
          if (score > bestScore) {
            bestScore = score;
            best = u;
          }
        }
      }
      coarse[v] = next;
      if (best >= 0) {
        coarse[best] = next;
      }
      next++;
    }
    coarse[count] = next;
    return coarse;
  }

  /** The graph of the coarse vertices, edges between the same two added up. */
  WeightedGraph contract(int[] coarse) {
    int m = coarse[count];
    int[] first = new int[m];
    int[] second = new int[m];
    Arrays.fill(first, -1);
    Arrays.fill(second, -1);
    int[] coarseWeights = new int[m];
    for (int v = 0; v < count; v++) {
      int c = coarse[v];
      coarseWeights[c] += weights[v];
      if (first[c] < 0) {
        first[c] = v;
      } else {
        second[c] = v;
      }
    }
    int[] coarseStarts = new int[m + 1];
    int[] coarseEnds = new int[starts[count]];
    int[] coarseEdges = new int[starts[count]];
    int[] at = new int[m];
    Arrays.fill(at, -1);
    int edges = 0;
    for (int c = 0; c < m; c++) {
      int from = edges;
      for (int v = first[c]; v >= 0; v = v == second[c] ? -1 : second[c]) {
        for (int p = starts[v]; p < starts[v + 1]; p++) {
          int d = coarse[ends[p]];
          if (d == c) {
            continue;
          }
          if (at[d] >= from && at[d] < edges && coarseEnds[at[d]] == d) {
            coarseEdges[at[d]] += edgeWeights[p];
          } else {
            at[d] = edges;
            coarseEnds[edges] = d;
            coarseEdges[edges++] = edgeWeights[p];
          }
        }
      }
      coarseStarts[c + 1] = edges;
    }
    return new WeightedGraph(m, coarseStarts, Arrays.copyOf(coarseEnds, edges), Arrays.copyOf(coarseEdges, edges), coarseWeights);
  }
}
