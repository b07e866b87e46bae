package org.flexbound.sparse;

import java.util.Arrays;

/**
 * The order of all unknowns of a pattern: from an order of their groups, or of the unknowns themselves where that may be better, whichever
 * needs the fewer operations.
 */
final class OrderChoice {
  /** The unknowns are ordered too if the pattern fills less than this part of its groups' full blocks. */
  private static final double SPARSE_BLOCKS = 0.6;
  /** Ordering the unknowns takes longer than factorizing saves, unless there are few of them or the factor is slender. */
  private static final int FEW = 3_000;
  private static final double SLENDER = 1e4;

  /** The unknowns in the order of elimination. */
  final int[] order;
  /** Tree and counts in that order. */
  final ColumnCounts counts;

  private OrderChoice(SparsePattern pattern, int[] order) {
    this.order = order;
    counts = lowerRows(pattern, order);
  }

  static OrderChoice choose(SparsePattern pattern, int[] group, Ordering ordering) {
    int n = pattern.size();
    int[] number = new int[n];
    Arrays.fill(number, -1);
    int[] member = new int[n];
    int groups = 0;
    for (int i = 0; i < n; i++) {
      if (number[group[i]] < 0) {
        number[group[i]] = groups++;
      }
      member[i] = number[group[i]];
    }
    Graph graph = Graph.of(pattern, member, groups);
    OrderChoice byGroups = new OrderChoice(pattern, expand(ordering.order(graph), member, groups));
    if (groups == n || fullness(pattern, graph) > SPARSE_BLOCKS) {
      return byGroups;
    }
    double work = byGroups.counts.operations();
    if (n > FEW && work > SLENDER * n) {
      return byGroups;
    }
    int[] alone = new int[n];
    for (int i = 0; i < n; i++) {
      alone[i] = i;
    }
    OrderChoice byUnknowns = new OrderChoice(pattern, ordering.order(Graph.of(pattern, alone, n)));
    return byUnknowns.counts.operations() < work ? byUnknowns : byGroups;
  }

  private static int[] expand(int[] groupOrder, int[] member, int groups) {
    int[] rank = Trees.inverse(groupOrder);
    int[] starts = new int[groups + 1];
    for (int g : member) {
      starts[rank[g] + 1]++;
    }
    for (int g = 0; g < groups; g++) {
      starts[g + 1] += starts[g];
    }
    int[] order = new int[member.length];
    for (int i = 0; i < member.length; i++) {
      order[starts[rank[member[i]]]++] = i;
    }
    return order;
  }

  /** Entries of the pattern over those of full blocks between neighbouring groups. */
  private static double fullness(SparsePattern pattern, Graph graph) {
    double full = 0;
    for (int g = 0; g < graph.vertexCount(); g++) {
      double w = graph.weights[g];
      full += w * (w + 1) / 2;
      for (int p = graph.starts[g]; p < graph.starts[g + 1]; p++) {
        full += w * graph.weights[graph.neighbours[p]] / 2;
      }
    }
    return pattern.entryCount() / full;
  }

  /** Elimination tree and column counts of a pattern under an order. */
  private static ColumnCounts lowerRows(SparsePattern pattern, int[] order) {
    int n = pattern.size();
    int[] at = Trees.inverse(order);
    int[] cs = pattern.starts();
    int[] rs = pattern.rowIndices();
    int[] starts = new int[n + 1];
    for (int j = 0; j < n; j++) {
      for (int p = cs[j] + 1; p < cs[j + 1]; p++) {
        starts[Math.max(at[j], at[rs[p]]) + 1]++;
      }
    }
    for (int j = 0; j < n; j++) {
      starts[j + 1] += starts[j];
    }
    int[] next = starts.clone();
    int[] columns = new int[starts[n]];
    for (int j = 0; j < n; j++) {
      for (int p = cs[j] + 1; p < cs[j + 1]; p++) {
        int a = at[j];
        int b = at[rs[p]];
        columns[next[Math.max(a, b)]++] = Math.min(a, b);
      }
    }
    int[] ones = new int[n];
    Arrays.fill(ones, 1);
    return new ColumnCounts(starts, columns, ones);
  }
}
