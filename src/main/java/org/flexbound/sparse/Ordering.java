package org.flexbound.sparse;

/**
 * A way to choose the order of elimination so that the factor stays sparse. The same graph always gives the same order.
 */
@FunctionalInterface
public interface Ordering {
  /**
   * Orders the vertices of a graph for elimination.
   *
   * @param graph the graph; it need not be connected
   * @return the vertices in the order of elimination, each once
   */
  int[] order(Graph graph);

  /** Minimum degree with approximate external degrees (Amestoy, Davis and Duff 1996): quick, best for slender and small graphs. */
  static Ordering minimumDegree() {
    return graph -> new MinimumDegree(graph).order();
  }

  /**
   * Nested dissection by multilevel bisection and breadth-first levels: best for large graphs that spread in two or three directions.
   *
   * @param seed of the random choices; the same seed gives the same order
   */
  static Ordering nestedDissection(long seed) {
    return new NestedDissection(seed);
  }

  /** Minimum degree, and nested dissection where the work per vertex promises a gain; the order with the least estimated work is kept. */
  static Ordering leastWork() {
    return new LeastWork();
  }
}
