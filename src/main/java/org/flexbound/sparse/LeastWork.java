package org.flexbound.sparse;

/** The better of minimum degree and nested dissection, by the operations of the factorization. */
final class LeastWork implements Ordering {
  /**
   * Operations per vertex, under minimum degree, from which dissection is tried: below, the factorization takes less time than dissecting
   * would.
   */
  private static final double WORTH_DISSECTING = 5e4;
  /** Small graphs are dissected several times from other seeds, so many vertices in all. */
  private static final int VERTICES_IN_ALL = 5_000;

  private static final int MOST_TRIES = 4;
  private static final long SEED = 20_240_601;

  @Override
  public int[] order(Graph graph) {
    MinimumDegree process = new MinimumDegree(graph);
    int[] degree = process.order();
    double n = graph.vertexCount();
    if (process.mostOperations() <= WORTH_DISSECTING * n || graph.neighbours.length > NestedDissection.DENSE * n * n) {
      return degree;
    }
    double work = operations(graph, degree);
    if (work <= WORTH_DISSECTING * graph.vertexCount()) {
      return degree;
    }
    int[] best = degree;
    int tries = Math.max(1, Math.min(MOST_TRIES, VERTICES_IN_ALL / graph.vertexCount()));
    for (int t = 0; t < tries; t++) {
      int[] dissection = new NestedDissection(SEED + t).order(graph);
      double other = operations(graph, dissection);
      if (other < work) {
        work = other;
        best = dissection;
      }
    }
    return best;
  }

  static double operations(Graph graph, int[] order) {
    int n = order.length;
    int[] at = Trees.inverse(order);
    int[] starts = new int[n + 1];
    int[] columns = new int[graph.neighbours.length / 2];
    int[] weights = new int[n];
    int count = 0;
    for (int i = 0; i < n; i++) {
      int v = order[i];
      weights[i] = graph.weights[v];
      for (int p = graph.starts[v]; p < graph.starts[v + 1]; p++) {
        int j = at[graph.neighbours[p]];
        if (j < i) {
          columns[count++] = j;
        }
      }
      starts[i + 1] = count;
    }
    return new ColumnCounts(starts, columns, weights).operations();
  }
}
