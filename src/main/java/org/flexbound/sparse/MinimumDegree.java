package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Minimum degree order with approximate external degrees on a quotient graph: element absorption (also of elements that have become subsets
 * of the newest one), mass elimination and indistinguishable vertices. Vertices of very high degree are set aside and ordered last.
 *
 * <p>The lists of all vertices and elements lie in one workspace. The list of a live variable holds its elements first, then its variables;
 * the list of an element holds its variables. All weights and degrees count unknowns, so a vertex may stand for several.
 *
 * <p>Source: P. R. Amestoy, T. A. Davis, I. S. Duff, "An approximate minimum degree ordering algorithm", SIAM J. Matrix Anal. Appl. 17
 * (1996) 886-905, algorithm 2. Departure: initial vertices carry weights. The tree of absorbed vertices is put in postorder without
 * recursion.
 */
final class MinimumDegree {
  private static final int NONE = -1;
  /** A vertex with more neighbours than this times the square root of the number of unknowns is ordered last. */
  private static final double DENSE = 10;

  private final int n;
  private final int total;
  /** Vertices from this one on are the halo: they count in degrees but are not eliminated. */
  private final int inner;
  /** Workspace of all lists. */
  private int[] lists;
  private int free;
  private final int[] start;
  private final int[] length;
  /** Number of elements at the head of a variable's list. */
  private final int[] elements;
  /** Weight of a live principal variable (negated while in the newest element), of an element its pivot's; zero once absorbed. */
  private final int[] weight;
  private final int[] degree;
  private final boolean[] isElement;
  /** Time stamp of an element: stamp - tag is the weight of its variables outside the newest element. Zero: absorbed. */
  private final int[] stamp;
  /** What an absorbed vertex or element was absorbed into. */
  private final int[] parent;
  private final DegreeLists degrees;
  /** The next variable of the same hash. */
  private final int[] next;
  private final int[] hashHead;
  private final int[] hash;
  private int tag = 1;
  /** Weight of all vertices but those set aside. */
  private int present;
  private int eliminated;
  /** Elements in the order of their creation. */
  private final int[] pivots;
  private int pivotCount;
  private double mostOperations;

  MinimumDegree(Graph graph) {
    this(graph, graph.vertexCount());
  }

  /**
   * An order of the first vertices of a graph; the others stand for what is eliminated later.
   *
   * @param inner number of vertices to order; the order returned holds only these
   */
  MinimumDegree(Graph graph, int inner) {
    this.inner = inner;
    n = graph.vertexCount();
    total = graph.totalWeight();
    int edges = graph.neighbours.length;
    lists = Arrays.copyOf(graph.neighbours, Math.addExact(edges, edges / 5 + n + 1));
    free = edges;
    start = Arrays.copyOf(graph.starts, n);
    length = new int[n];
    elements = new int[n];
    weight = graph.weights.clone();
    degree = new int[n];
    isElement = new boolean[n];
    stamp = new int[n];
    parent = new int[n];
    next = new int[n];
    hashHead = new int[n];
    hash = new int[n];
    pivots = new int[n];
    Arrays.fill(parent, NONE);
    Arrays.fill(hashHead, NONE);
    Arrays.fill(stamp, 1);
    for (int v = 0; v < n; v++) {
      length[v] = graph.starts[v + 1] - graph.starts[v];
      for (int p = start[v]; p < start[v] + length[v]; p++) {
        degree[v] += weight[lists[p]];
      }
    }
    degrees = new DegreeLists(n, total);
  }

  int[] order() {
    int[] dense = setDenseAside();
    int live = 0;
    for (int v = inner - 1; v >= 0; v--) {
      if (weight[v] > 0) {
        degrees.add(v, degree[v]);
        live += weight[v];
      }
    }
    present = live;
    for (int v = inner; v < n; v++) {
      present += weight[v];
    }
    while (eliminated < live) {
      eliminate(degrees.takeLeast());
    }
    return new AbsorptionTree(parent, isElement, pivots, pivotCount).order(dense, inner);
  }

  /** No fewer operations than the factorization in the order found takes. */
  double mostOperations() {
    return mostOperations;
  }

  /** Marks vertices of very high degree (weight negated, out of all lists) so that they are ordered last. */
  private int[] setDenseAside() {
    double limit = Math.max(16, DENSE * Math.sqrt(total));
    int[] dense = new int[n];
    int count = 0;
    for (int v = 0; v < inner; v++) {
      if (degree[v] > limit && length[v] > limit / Math.max(1, weight[v])) {
        dense[count++] = v;
      }
    }
    if (count == 0 || count == inner) {
      return new int[0];
    }
    for (int k = 0; k < count; k++) {
      weight[dense[k]] = -weight[dense[k]];
    }
    for (int v = 0; v < n; v++) {
      int to = start[v];
      for (int p = start[v]; p < start[v] + length[v]; p++) {
        int u = lists[p];
        if (weight[u] > 0) {
          lists[to++] = u;
        } else {
          degree[v] += weight[u];
        }
      }
      length[v] = to - start[v];
    }
    return Arrays.copyOf(dense, count);
  }

  private void eliminate(int pivot) {
    int pivotWeight = weight[pivot];
    eliminated += pivotWeight;
    int size = formElement(pivot);
    int from = start[pivot];
    int to = from + length[pivot];
    stampElements(from, to);
    int remaining = size;
    for (int p = from; p < to; p++) {
      int v = lists[p];
      int left = shorten(v, pivot);
      if (left == 0 && v < inner) {
        // Nothing outside the newest element is left: eliminated together with the pivot.
        int w = -weight[v];
        parent[v] = pivot;
        remaining -= w;
        pivotWeight += w;
        eliminated += w;
        weight[v] = 0;
        length[v] = 0;
      }
    }
    degree[pivot] = remaining;
    advanceTag(size);
    mergeAlike(from, to);
    finish(pivot, from, to, remaining);
    weight[pivot] = pivotWeight;
    double front = (double) pivotWeight + remaining;
    mostOperations += pivotWeight * front * front;
    if (length[pivot] == 0) {
      stamp[pivot] = 0;
    }
  }

  /** Gathers the variables of the new element, absorbing the pivot's elements; returns their weight. Members' weights become negative. */
  private int formElement(int pivot) {
    int w = weight[pivot];
    weight[pivot] = -w;
    int size = 0;
    int count = elements[pivot];
    int begin;
    int end;
    if (count == 0) {
      begin = start[pivot];
      end = begin;
      for (int p = begin; p < begin + length[pivot]; p++) {
        int v = lists[p];
        if (weight[v] > 0) {
          size += take(v);
          lists[end++] = v;
        }
      }
    } else {
      int room = 0;
      for (int k = 0; k < count; k++) {
        room += length[lists[start[pivot] + k]];
      }
      makeRoom(room + length[pivot]);
      begin = free;
      end = begin;
      for (int k = 0; k <= count; k++) {
        int source = k < count ? lists[start[pivot] + k] : pivot;
        int p = k < count ? start[source] : start[pivot] + count;
        int last = start[source] + length[source];
        for (; p < last; p++) {
          int v = lists[p];
          if (weight[v] > 0) {
            size += take(v);
            lists[end++] = v;
          }
        }
        if (k < count) {
          parent[source] = pivot;
          stamp[source] = 0;
          length[source] = 0;
        }
      }
      free = end;
    }
    start[pivot] = begin;
    length[pivot] = end - begin;
    isElement[pivot] = true;
    stamp[pivot] = 1;
    pivots[pivotCount++] = pivot;
    return size;
  }

  private int take(int v) {
    int w = weight[v];
    weight[v] = -w;
    if (v < inner) {
      degrees.remove(v);
    }
    return w;
  }

  /** For every element next to the new one: the weight of its variables outside the new one, as stamp - tag. */
  private void stampElements(int from, int to) {
    for (int p = from; p < to; p++) {
      int v = lists[p];
      int w = -weight[v];
      int fresh = tag - w;
      int end = start[v] + elements[v];
      for (int q = start[v]; q < end; q++) {
        int e = lists[q];
        int s = stamp[e];
        if (s >= tag) {
          stamp[e] = s - w;
        } else if (s != 0) {
          stamp[e] = degree[e] + fresh;
        }
      }
    }
  }

  /**
   * Drops what the newest element covers from a variable's list, bounds its degree outside the newest element and files it by hash.
   *
   * @return zero if nothing is left outside the newest element
   */
  private int shorten(int v, int pivot) {
    int begin = start[v];
    int write = begin;
    int key = v < inner ? 0 : 1;
    int outside = 0;
    int end = begin + elements[v];
    int last = begin + length[v];
    for (int q = begin; q < end; q++) {
      int e = lists[q];
      if (stamp[e] != 0) {
        int out = stamp[e] - tag;
        if (out > 0) {
          outside += out;
          lists[write++] = e;
          key += e;
        } else {
          parent[e] = pivot;
          stamp[e] = 0;
          length[e] = 0;
        }
      }
    }
    int kept = write - begin;
    int firstVariable = write;
    for (int q = end; q < last; q++) {
      int u = lists[q];
      if (weight[u] > 0) {
        outside += weight[u];
        lists[write++] = u;
        key += u;
      }
    }
    if (outside == 0 && v < inner) {
      return 0;
    }
    degree[v] = Math.min(degree[v], outside);
    // The newest element comes first; an element or variable was dropped to make room, since the pivot or one of its elements was here.
    lists[write] = lists[firstVariable];
    lists[firstVariable] = lists[begin];
    lists[begin] = pivot;
    elements[v] = kept + 1;
    length[v] = write - begin + 1;
    int bucket = (key & Integer.MAX_VALUE) % n;
    hash[v] = bucket;
    next[v] = hashHead[bucket];
    hashHead[bucket] = v;
    return outside;
  }

  private void advanceTag(int largest) {
    if (tag > Integer.MAX_VALUE - 2 * total - 2 * n - largest - 2) {
      for (int v = 0; v < n; v++) {
        if (stamp[v] != 0) {
          stamp[v] = 1;
        }
      }
      tag = 1;
    }
    tag += total + 1;
  }

  /** Merges variables of the newest element that have the same list. */
  private void mergeAlike(int from, int to) {
    for (int p = from; p < to; p++) {
      int v = lists[p];
      if (weight[v] >= 0) {
        continue;
      }
      int bucket = hash[v];
      int i = hashHead[bucket];
      hashHead[bucket] = NONE;
      while (i != NONE && next[i] != NONE) {
        markList(i);
        int before = i;
        int j = next[i];
        while (j != NONE) {
          if (length[j] == length[i] && elements[j] == elements[i] && (i < inner) == (j < inner) && allMarked(j)) {
            parent[j] = i;
            weight[i] += weight[j];
            weight[j] = 0;
            length[j] = 0;
            elements[j] = 0;
            j = next[j];
            next[before] = j;
          } else {
            before = j;
            j = next[j];
          }
        }
        tag++;
        i = next[i];
      }
    }
  }

  private void markList(int v) {
    for (int q = start[v] + 1; q < start[v] + length[v]; q++) {
      mark(lists[q]);
    }
  }

  private void mark(int u) {
    stamp[u] = tag;
  }

  private boolean allMarked(int v) {
    for (int q = start[v] + 1; q < start[v] + length[v]; q++) {
      if (stamp[lists[q]] != tag) {
        return false;
      }
    }
    return true;
  }

  /** Gives the members their new degrees and takes the eliminated ones out of the element's list. */
  private void finish(int pivot, int from, int to, int size) {
    int write = from;
    int left = present - eliminated;
    for (int p = from; p < to; p++) {
      int v = lists[p];
      int w = -weight[v];
      if (w <= 0) {
        continue;
      }
      weight[v] = w;
      degree[v] = Math.max(0, Math.min(degree[v] + size - w, left - w));
      if (v < inner) {
        degrees.add(v, degree[v]);
      }
      lists[write++] = v;
    }
    length[pivot] = write - from;
    if (free == to) {
      free = write;
    }
  }

  /** Squeezes the lists together when the workspace is full. */
  private void makeRoom(int need) {
    if (free + need <= lists.length) {
      return;
    }
    int[] packed = new int[lists.length];
    int count = 0;
    for (int v = 0; v < n; v++) {
      boolean used = isElement[v] ? stamp[v] != 0 : weight[v] != 0 || length[v] > 0;
      if (used) {
        System.arraycopy(lists, start[v], packed, count, length[v]);
        start[v] = count;
        count += length[v];
      } else {
        length[v] = 0;
      }
    }
    if (count + need > packed.length) {
      packed = Arrays.copyOf(packed, Math.addExact(count, need + need / 2));
    }
    lists = packed;
    free = count;
  }
}
