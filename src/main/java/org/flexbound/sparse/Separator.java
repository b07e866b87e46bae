package org.flexbound.sparse;

import java.util.Arrays;

/**
 * A vertex separator of a graph: every vertex on side 0, on side 1 or in the separator, no edge between the sides; and its refinement by
 * moving single vertices out of the separator (which pulls their neighbours on the other side into it), uphill too, keeping the best state
 * seen.
 *
 * <p>Source: C. Ashcraft, J. W. H. Liu, "A partition improvement algorithm for generalized nested dissection" (1994), after C. M. Fiduccia,
 * R. M. Mattheyses, "A linear-time heuristic for improving network partitions", 19th Design Automation Conference (1982) 175-181.
 */
final class Separator {
  static final byte SEPARATOR = 2;
  /** No side is to weigh more than this part of the whole. */
  static final double LARGEST_SIDE = 0.6;
  /** How much dearer a separator is when it leaves all the rest on one side. */
  private static final double LOPSIDED = 0.7;
  private static final int PASSES = 8;

  private final WeightedGraph graph;
  final byte[] side;
  private final int[] sideWeight = new int[3];
  /** For separator vertices: weight of their neighbours on either side. */
  private final int[] near0;
  private final int[] near1;
  private final int[] locked;
  private int pass;
  private final VertexHeap heap0;
  private final VertexHeap heap1;
  private int[] log = new int[64];
  private int logged;

  Separator(WeightedGraph graph, byte[] side) {
    this.graph = graph;
    this.side = side;
    near0 = new int[graph.count];
    near1 = new int[graph.count];
    locked = new int[graph.count];
    heap0 = new VertexHeap(graph.count);
    heap1 = new VertexHeap(graph.count);
    for (int v = 0; v < graph.count; v++) {
      sideWeight[side[v]] += graph.weights[v];
    }
  }

  int weight(int part) {
    return sideWeight[part];
  }

  double cost() {
    return cost(sideWeight[0], sideWeight[1], sideWeight[2], graph.total);
  }

  /** What is to be made small: the separator's weight, dearer the more the sides differ; a side without vertices separates nothing. */
  static double cost(int side0, int side1, int separator, int total) {
    int less = Math.min(side0, side1);
    double lopsided = total == 0 ? 0 : Math.abs(side0 - side1) / (double) total;
    return separator * (1 + LOPSIDED * lopsided * lopsided) + (less == 0 ? total : 0);
  }
  /** Refines until a pass brings nothing. */
  void refine() {
    int largest = (int) Math.ceil(LARGEST_SIDE * graph.total);
    for (int i = 0; i < PASSES; i++) {
      if (!improve(largest)) {
        return;
      }
    }
  }

  private boolean improve(int largest) {
    pass++;
    heap0.clear();
    heap1.clear();
    logged = 0;
    int members = 0;
    for (int v = 0; v < graph.count; v++) {
      if (side[v] == SEPARATOR) {
        enter(v);
        members++;
      }
    }
    double start = cost();
    double best = start;
    int bestLog = 0;
    int patience = Math.max(30, Math.min(200, members / 2));
    int since = 0;
    while (since < patience) {
      int to = chooseSide(largest);
      if (to < 0) {
        break;
      }
      move(to == 0 ? heap0.top() : heap1.top(), to);
      since++;
      double now = cost();
      if (now < best) {
        best = now;
        bestLog = logged;
        since = 0;
      }
    }
    undoTo(bestLog);
    return best < start;
  }

  /** Puts a separator vertex where it can be chosen. */
  private void enter(int v) {
    int a = 0;
    int b = 0;
    for (int p = graph.starts[v]; p < graph.starts[v + 1]; p++) {
      int u = graph.ends[p];
      if (side[u] == 0) {
        a += graph.weights[u];
      } else if (side[u] == 1) {
        b += graph.weights[u];
      }
    }
    near0[v] = a;
    near1[v] = b;
    if (locked[v] != pass) {
      heap0.put(v, graph.weights[v] - b);
      heap1.put(v, graph.weights[v] - a);
    }
  }

  /** The side with the better first move that keeps the balance; -1 if there is none. */
  private int chooseSide(int largest) {
    boolean can0 = !heap0.isEmpty() && fits(heap0.top(), 0, largest);
    boolean can1 = !heap1.isEmpty() && fits(heap1.top(), 1, largest);
    if (can0 && can1) {
      int difference = heap0.topKey() - heap1.topKey();
      if (difference != 0) {
        return difference > 0 ? 0 : 1;
      }
      return sideWeight[0] <= sideWeight[1] ? 0 : 1;
    }
    if (can0) {
      return 0;
    }
    return can1 ? 1 : -1;
  }

  private boolean fits(int v, int to, int largest) {
    return sideWeight[to] + graph.weights[v] <= largest || sideWeight[to] < sideWeight[1 - to];
  }

  private void move(int v, int to) {
    heap0.remove(v);
    heap1.remove(v);
    locked[v] = pass;
    int from = 1 - to;
    side[v] = (byte) to;
    sideWeight[2] -= graph.weights[v];
    sideWeight[to] += graph.weights[v];
    int pulled = 0;
    for (int p = graph.starts[v]; p < graph.starts[v + 1]; p++) {
      int u = graph.ends[p];
      if (side[u] == SEPARATOR) {
        approach(u, to, graph.weights[v]);
      } else if (side[u] == from) {
        side[u] = SEPARATOR;
        sideWeight[from] -= graph.weights[u];
        sideWeight[2] += graph.weights[u];
        record(u);
        pulled++;
        for (int q = graph.starts[u]; q < graph.starts[u + 1]; q++) {
          int w = graph.ends[q];
          if (side[w] == SEPARATOR) {
            approach(w, from, -graph.weights[u]);
          }
        }
        enter(u);
      }
    }
    record(v);
    record(pulled * 2 + to);
  }

  /** A neighbour of separator vertex u joined or left a side. */
  private void approach(int u, int part, int change) {
    if (part == 0) {
      near0[u] += change;
    } else {
      near1[u] += change;
    }
    if (locked[u] != pass) {
      if (part == 0) {
        heap1.put(u, graph.weights[u] - near0[u]);
      } else {
        heap0.put(u, graph.weights[u] - near1[u]);
      }
    }
  }

  private void record(int value) {
    if (logged == log.length) {
      log = Arrays.copyOf(log, logged * 2);
    }
    log[logged++] = value;
  }

  private void undoTo(int mark) {
    while (logged > mark) {
      int code = log[--logged];
      int v = log[--logged];
      int to = code & 1;
      side[v] = SEPARATOR;
      sideWeight[to] -= graph.weights[v];
      sideWeight[2] += graph.weights[v];
      for (int k = code >> 1; k > 0; k--) {
        int u = log[--logged];
        side[u] = (byte) (1 - to);
        sideWeight[1 - to] += graph.weights[u];
        sideWeight[2] -= graph.weights[u];
      }
    }
  }
}
