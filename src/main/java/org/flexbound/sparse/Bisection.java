package org.flexbound.sparse;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;

/**
 * Multilevel search for a small vertex separator: the graph is coarsened by matching, its coarsest version split from several start vertices,
 * and the best split refined on every level back to the graph itself.
 *
 * <p>Source: B. Hendrickson, E. Rothberg, "Improving the run time and quality of nested dissection ordering", SIAM J. Sci. Comput. 20 (1998)
 * 468-489; G. Karypis, V. Kumar, "A fast and high quality multilevel scheme for partitioning irregular graphs", ibid. 359-392.
 */
final class Bisection {
  /** Coarsening stops at so many vertices. */
  private static final int COARSEST = 60;
  /** Coarsening stops when a level keeps more than this part of the vertices. */
  private static final double SLOW = 0.9;
  /** Number of splits of the coarsest graph that are tried. */
  private static final int STARTS = 8;

  private final Random random;

  Bisection(Random random) {
    this.random = random;
  }

  /** The side of every vertex: 0, 1 or {@link Separator#SEPARATOR}. */
  byte[] separate(WeightedGraph graph) {
    List<WeightedGraph> levels = new ArrayList<>();
    List<int[]> maps = new ArrayList<>();
    WeightedGraph coarse = graph;
    int heaviest = Math.max(1, (int) (1.5 * graph.total / COARSEST));
    while (coarse.count > COARSEST) {
      int[] map = coarse.match(shuffled(coarse.count), Math.max(heaviest, heaviestPair(coarse)));
      if (map[coarse.count] > SLOW * coarse.count) {
        break;
      }
      levels.add(coarse);
      maps.add(map);
      coarse = coarse.contract(map);
    }
    byte[] side = split(coarse);
    for (int level = levels.size() - 1; level >= 0; level--) {
      WeightedGraph fine = levels.get(level);
      int[] map = maps.get(level);
      byte[] projected = new byte[fine.count];
      for (int v = 0; v < fine.count; v++) {
        projected[v] = side[map[v]];
      }
      Separator separator = new Separator(fine, projected);
      separator.refine();
      side = separator.side;
    }
    return side;
  }

  private static int heaviestPair(WeightedGraph graph) {
    // Coarse graphs of a few heavy vertices could not be matched at all under the usual limit.
    return graph.count < 2 * COARSEST ? 2 * graph.total / graph.count : 1;
  }

  private int[] shuffled(int count) {
    int[] order = new int[count];
    for (int i = 0; i < count; i++) {
      order[i] = i;
    }
    for (int i = count - 1; i > 0; i--) {
      int j = random.nextInt(i + 1);
      int t = order[i];
      order[i] = order[j];
      order[j] = t;
    }
    return order;
  }

  /** The best of several splits grown from random vertices. */
  private byte[] split(WeightedGraph graph) {
    byte[] best = new byte[graph.count];
    double bestCost = Double.POSITIVE_INFINITY;
    for (int s = 0; s < STARTS; s++) {
      Separator separator = new Separator(graph, grow(graph, random.nextInt(graph.count)));
      separator.refine();
      if (separator.cost() < bestCost) {
        bestCost = separator.cost();
        best = separator.side;
      }
    }
    return best;
  }

  /** Side 0 grown breadth first from a vertex to half the weight; its neighbours outside are the separator, the rest side 1. */
  private static byte[] grow(WeightedGraph graph, int start) {
    byte[] side = new byte[graph.count];
    Arrays.fill(side, (byte) 1);
    int[] queue = new int[graph.count];
    int head = 0;
    int tail = 0;
    int weight = 0;
    int unseen = 0;
    boolean[] queued = new boolean[graph.count];
    queue[tail++] = start;
    queued[start] = true;
    while (2 * weight < graph.total) {
      if (head == tail) {
        while (unseen < graph.count && queued[unseen]) {
          unseen++;
        }
        if (unseen == graph.count) {
          break;
        }
        queued[unseen] = true;
        queue[tail++] = unseen;
      }
      int v = queue[head++];
      side[v] = 0;
      weight += graph.weights[v];
      for (int p = graph.starts[v]; p < graph.starts[v + 1]; p++) {
        int u = graph.ends[p];
        if (!queued[u]) {
          queued[u] = true;
          queue[tail++] = u;
        }
      }
    }
    for (int v = 0; v < graph.count; v++) {
      if (side[v] == 0) {
        for (int p = graph.starts[v]; p < graph.starts[v + 1]; p++) {
          if (side[graph.ends[p]] == 1) {
            side[graph.ends[p]] = Separator.SEPARATOR;
          }
        }
      }
    }
    return side;
  }
}
