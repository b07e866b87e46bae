package org.flexbound.sparse;

import java.util.Arrays;

/** What a minimum degree process leaves: every vertex absorbed into an element or another vertex, every element but the roots into a later one. */
final class AbsorptionTree {
  private static final int NONE = -1;

  private final int[] parent;
  private final boolean[] isElement;
  private final int[] pivots;
  private final int pivotCount;

  /**
   * A tree.
   *
   * @param parent what each vertex or element was absorbed into, -1 for none
   * @param pivots the elements in the order of their creation
   */
  AbsorptionTree(int[] parent, boolean[] isElement, int[] pivots, int pivotCount) {
    this.parent = parent;
    this.isElement = isElement;
    this.pivots = pivots;
    this.pivotCount = pivotCount;
  }

  /** The order of elimination: the tree of absorbed vertices in postorder, each element's own vertices together, dense ones last. */
  int[] order(int[] dense, int inner) {
    int n = parent.length;
    // A variable hangs below the element that eliminated it; skip the variables in between.
    int[] element = new int[n];
    for (int v = 0; v < n; v++) {
      element[v] = v;
    }
    for (int v = 0; v < n; v++) {
      int e = v;
      while (!isElement[e] && parent[e] != NONE) {
        e = parent[e];
      }
      int top = e;
      e = v;
      while (!isElement[e] && parent[e] != NONE) {
        int up = parent[e];
        parent[e] = top;
        e = up;
      }
      element[v] = top;
    }
    int[] tree = new int[n];
    Arrays.fill(tree, NONE);
    for (int k = 0; k < pivotCount; k++) {
      tree[pivots[k]] = parent[pivots[k]];
    }
    int[] firstMember = new int[n];
    int[] nextMember = new int[n];
    Arrays.fill(firstMember, NONE);
    for (int v = n - 1; v >= 0; v--) {
      nextMember[v] = firstMember[element[v]];
      firstMember[element[v]] = v;
    }
    boolean[] isDense = new boolean[n];
    for (int v : dense) {
      isDense[v] = true;
    }
    int[] order = new int[inner];
    int count = 0;
    for (int e : Trees.postorder(tree, pivots, pivotCount)) {
      for (int v = firstMember[e]; v != NONE; v = nextMember[v]) {
        if (!isDense[v]) {
          order[count++] = v;
        }
      }
    }
    for (int v : dense) {
      order[count++] = v;
    }
    return order;
  }
}
