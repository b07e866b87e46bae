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
}
