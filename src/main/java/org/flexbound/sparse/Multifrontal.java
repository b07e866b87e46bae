package org.flexbound.sparse;

import java.util.Arrays;

/**
 * The multifrontal process: every supernode's front is assembled from the matrix and its children's update matrices, factorized, and leaves
 * an update matrix to its parent. Supernodes are visited in postorder; subtrees with little work are one task, the others one each.
 *
 * <p>Source: I. S. Duff, J. K. Reid, "The multifrontal solution of indefinite sparse symmetric linear equations", ACM Trans. Math. Softw. 9
 * (1983) 302-325 (without its exchange of pivots).
 */
final class Multifrontal {
  /** A subtree with less than this part of the work a thread has to do is one task. */
  private static final double SMALL_TASK = 0.02;
  /** Numbers of an update matrix from which adding it is shared. */
  private static final int WORTH_SHARING = 400_000;
  private static final double[] EMPTY = new double[0];

  private final SymbolicFactor symbolic;
  private final double[] values;
  private final double[] scale;
  private final FrontFactor.PivotRule rule;
  private final Crew crew;
  private final FrontFactor[] fronts;
  private final double[][] panels;
  private final double[][] updates;
  private final double[] pivots;

  /**
   * A process.
   *
   * @param scale what the pivot of each unknown is judged against, in the numbering of the matrix
   */
  Multifrontal(SymbolicFactor symbolic, SymmetricMatrix matrix, double[] scale, FrontFactor.PivotRule rule, DenseKernel kernel, int threads) {
    this.symbolic = symbolic;
    this.values = matrix.entries();
    this.rule = rule;
    int n = symbolic.size();
    this.scale = new double[n];
    for (int k = 0; k < n; k++) {
      this.scale[k] = scale[symbolic.order[k]];
    }
    crew = new Crew(threads);
    fronts = new FrontFactor[threads];
    double[][] tiles = new double[threads][4 * DenseKernel.WIDTH];
    for (int w = 0; w < threads; w++) {
      fronts[w] = new FrontFactor(kernel, crew, w, tiles);
    }
    panels = new double[symbolic.supernodes()][];
    updates = new double[symbolic.supernodes()][];
    pivots = new double[n];
  }

  double[][] panels() {
    return panels;
  }

  double[] pivots() {
    return pivots;
  }

  void run() {
    int supernodes = symbolic.supernodes();
    if (crew.threads() == 1) {
      for (int s = 0; s < supernodes; s++) {
        front(s, 0);
      }
      return;
    }
    // Tasks: [first supernode, last supernode], the roots of small subtrees and all supernodes above them.
    double[] work = new double[supernodes];
    int[] first = new int[supernodes];
    double all = 0;
    for (int s = 0; s < supernodes; s++) {
      double h = symbolic.height(s);
      double own = h * h * symbolic.width(s) + 100;
      all += own;
      work[s] += own;
      first[s] = symbolic.childStarts[s] < symbolic.childStarts[s + 1] ? first[symbolic.children[symbolic.childStarts[s]]] : s;
      if (symbolic.parents[s] >= 0) {
        work[symbolic.parents[s]] += work[s];
      }
    }
    double small = SMALL_TASK * all / crew.threads();
    int[] taskOf = new int[supernodes];
    int[] last = new int[supernodes];
    int tasks = 0;
    for (int s = 0; s < supernodes; s++) {
      boolean top = work[s] > small;
      boolean root = !top && (symbolic.parents[s] < 0 || work[symbolic.parents[s]] > small);
      taskOf[s] = -1;
      if (top || root) {
        if (top) {
          first[s] = s;
        }
        last[tasks] = s;
        taskOf[s] = tasks++;
      }
    }
    int[] parents = new int[tasks];
    for (int t = 0; t < tasks; t++) {
      int p = symbolic.parents[last[t]];
      parents[t] = p < 0 ? -1 : taskOf[p];
    }
    crew.run(parents, (t, worker) -> {
      for (int s = first[last[t]]; s <= last[t]; s++) {
        front(s, worker);
      }
    });
  }

  private void front(int s, int worker) {
    int width = symbolic.width(s);
    int height = symbolic.height(s);
    double[] panel = new double[Math.toIntExact(Panel.size(width, height))];
    int below = height - width;
    double[] update = below == 0 ? EMPTY : new double[Math.toIntExact((long) below * (below + 1) / 2)];
    for (int q = symbolic.entryStarts[s]; q < symbolic.entryStarts[s + 1]; q++) {
      panel[symbolic.entryTargets[q]] += values[symbolic.entrySources[q]];
    }
    for (int k = symbolic.childStarts[s]; k < symbolic.childStarts[s + 1]; k++) {
      int child = symbolic.children[k];
      add(child, panel, update, width, height, worker);
      updates[child] = EMPTY;
    }
    int first = symbolic.starts[s];
    try {
      fronts[worker].factor(panel, height, width, update, pivots, scale, first, rule);
    } catch (FrontFactor.SmallPivot e) {
      int unknown = symbolic.order[first + e.column];
      throw new PivotBreakdownException(unknown, e.pivot, scale[first + e.column], rule.limit());
    }
    panels[s] = panel;
    updates[s] = update;
  }

  /** Adds a child's update matrix to a front. */
  private void add(int child, double[] panel, double[] update, int width, int height, int worker) {
    double[] source = updates[child];
    int from = symbolic.rowStarts[child];
    int rows = symbolic.rowStarts[child + 1] - from;
    if (source.length < WORTH_SHARING) {
      addColumns(source, from, rows, 0, rows, panel, update, width, height);
      return;
    }
    int units = 16;
    crew.loop(units, worker, (u, w) -> addColumns(source, from, rows, (int) ((long) rows * u / units), (int) ((long) rows * (u + 1) / units),
        panel, update, width, height));
  }

  private void addColumns(double[] source, int from, int rows, int c0, int c1, double[] panel, double[] update, int width, int height) {
    int[] place = symbolic.relative;
    int below = height - width;
    int p = (int) ((long) c0 * rows - (long) c0 * (c0 - 1) / 2);
    for (int j = c0; j < c1; j++) {
      int column = place[from + j];
      double[] target;
      int base;
      if (column < width) {
        target = panel;
        base = Panel.column(column, height);
      } else {
        int c = column - width;
        target = update;
        base = (int) ((long) c * below - (long) c * (c + 1) / 2) - width;
      }
      for (int i = from + j; i < from + rows; i++) {
        target[base + place[i]] += source[p++];
      }
    }
  }

  @Override
  public String toString() {
    return "Multifrontal" + Arrays.asList(symbolic.size(), crew.threads());
  }
}
