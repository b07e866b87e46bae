package org.flexbound.sparse;

import java.util.Arrays;

/** Vertices filed by degree, the one filed last first; gives one of least degree. */
final class DegreeLists {
  private static final int NONE = -1;

  private final int[] head;
  private final int[] next;
  private final int[] previous;
  /** Where each vertex is filed. */
  private final int[] filed;
  private int least;

  DegreeLists(int vertices, int largestDegree) {
    head = new int[largestDegree + 1];
    next = new int[vertices];
    previous = new int[vertices];
    filed = new int[vertices];
    Arrays.fill(head, NONE);
  }

  void add(int v, int degree) {
    int first = head[degree];
    filed[v] = degree;
    next[v] = first;
    previous[v] = NONE;
    if (first != NONE) {
      previous[first] = v;
    }
    head[degree] = v;
    least = Math.min(least, degree);
  }

  void remove(int v) {
    if (next[v] != NONE) {
      previous[next[v]] = previous[v];
    }
    if (previous[v] != NONE) {
      next[previous[v]] = next[v];
    } else {
      head[filed[v]] = next[v];
    }
  }

  /** Takes out a vertex of least degree; there must be one. */
  int takeLeast() {
    while (head[least] == NONE) {
      least++;
    }
    int v = head[least];
    remove(v);
    return v;
  }
}
