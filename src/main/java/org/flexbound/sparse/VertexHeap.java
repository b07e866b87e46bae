package org.flexbound.sparse;

import java.util.Arrays;

/** A heap of vertices by descending key, ties by ascending vertex; keys can be changed. */
final class VertexHeap {
  private final int[] heap;
  private final int[] place;
  private final int[] key;
  private int size;

  VertexHeap(int vertices) {
    heap = new int[vertices];
    place = new int[vertices];
    key = new int[vertices];
    Arrays.fill(place, -1);
  }

  boolean isEmpty() {
    return size == 0;
  }

  int top() {
    return heap[0];
  }

  int topKey() {
    return key[heap[0]];
  }

  void clear() {
    for (int i = 0; i < size; i++) {
      place[heap[i]] = -1;
    }
    size = 0;
  }

  /** Adds a vertex, or changes its key. */
  void put(int v, int newKey) {
    key[v] = newKey;
    if (place[v] < 0) {
      place[v] = size;
      heap[size++] = v;
    }
    sink(rise(place[v]));
  }

  void remove(int v) {
    int at = place[v];
    if (at < 0) {
      return;
    }
    place[v] = -1;
    int last = heap[--size];
    if (last != v) {
      heap[at] = last;
      place[last] = at;
      sink(rise(at));
    }
  }

  private boolean before(int u, int v) {
    return key[u] > key[v] || (key[u] == key[v] && u < v);
  }

  private int rise(int from) {
    int at = from;
    int v = heap[at];
    while (at > 0) {
      int up = (at - 1) >>> 1;
      if (!before(v, heap[up])) {
        break;
      }
      heap[at] = heap[up];
      place[heap[at]] = at;
      at = up;
    }
    heap[at] = v;
    place[v] = at;
    return at;
  }

  private void sink(int from) {
    int at = from;
    int v = heap[at];
    for (;;) {
      int child = 2 * at + 1;
      if (child >= size) {
        break;
      }
      if (child + 1 < size && before(heap[child + 1], heap[child])) {
        child++;
      }
      if (!before(heap[child], v)) {
        break;
      }
      heap[at] = heap[child];
      place[heap[at]] = at;
      at = child;
    }
    heap[at] = v;
    place[v] = at;
  }
}
