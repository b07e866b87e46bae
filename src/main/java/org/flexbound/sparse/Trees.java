package org.flexbound.sparse;

import java.util.Arrays;

/** Walks over forests given by the parent of every vertex (-1 for a root), without recursion. */
final class Trees {
  private Trees() {}

  /** Vertices in postorder, children in ascending order, roots in ascending order. */
  static int[] postorder(int[] parent) {
    int[] all = new int[parent.length];
    for (int v = 0; v < all.length; v++) {
      all[v] = v;
    }
    return postorder(parent, all, all.length);
  }

  /**
   * Some vertices of a forest in postorder.
   *
   * @param parent parent of every vertex, -1 for a root; parents of the vertices listed are listed too
   * @param vertices the vertices, in the order in which children are to be visited
   * @param count how many of them count
   */
  static int[] postorder(int[] parent, int[] vertices, int count) {
    int[] firstChild = new int[parent.length];
    int[] sibling = new int[parent.length];
    Arrays.fill(firstChild, -1);
    int firstRoot = -1;
    for (int k = count - 1; k >= 0; k--) {
      int v = vertices[k];
      int p = parent[v];
      if (p < 0) {
        sibling[v] = firstRoot;
        firstRoot = v;
      } else {
        sibling[v] = firstChild[p];
        firstChild[p] = v;
      }
    }
    int[] order = new int[count];
    int done = 0;
    int v = firstRoot;
    while (v >= 0) {
      while (firstChild[v] >= 0) {
        v = firstChild[v];
      }
      order[done++] = v;
      int up = parent[v];
      int right = sibling[v];
      while (right < 0 && up >= 0) {
        order[done++] = up;
        right = sibling[up];
        up = parent[up];
      }
      v = right;
    }
    return order;
  }

  /** Inverse of a permutation. */
  static int[] inverse(int[] order) {
    int[] at = new int[order.length];
    for (int k = 0; k < order.length; k++) {
      at[order[k]] = k;
    }
    return at;
  }
}
