package org.flexbound.sparse;

/** Solutions improved by iterative refinement, with the evidence for them. Immutable. */
public final class RefinedSolution {
  /** Why the refinement of a column ended. */
  public enum Outcome {
    /** The last correction was below the rounding of the solution: every digit that 64 bits hold is settled. */
    SETTLED,
    /** A correction was no longer much smaller than the one before: the matrix is too ill-conditioned for its factor to bring more. */
    STAGNATED,
    /** The largest number of steps was reached. */
    STEP_LIMIT
  }

  private final double[] solution;
  private final int columns;
  private final double[] backwardErrors;
  private final double[] corrections;
  private final int[] steps;
  private final Outcome[] outcomes;

  RefinedSolution(double[] solution, int columns, double[] backwardErrors, double[] corrections, int[] steps, Outcome[] outcomes) {
    this.solution = solution;
    this.columns = columns;
    this.backwardErrors = backwardErrors;
    this.corrections = corrections;
    this.steps = steps;
    this.outcomes = outcomes;
  }

  /** The solutions, size × columns, column-major (a copy). */
  public double[] solution() {
    return solution.clone();
  }

  /** Number of columns. */
  public int columns() {
    return columns;
  }

  /**
   * For each column the componentwise backward error: the largest {@code |b - A x|[i] / (|A||x| + |b|)[i]}, the residual taken in twice the
   * working precision (Oettli and Prager 1964). Free of units.
   */
  public double[] backwardErrors() {
    return backwardErrors.clone();
  }

  /**
   * For each column the size of the last correction over that of the solution, both weighed by the square root of the matrix's diagonal: an
   * estimate of the relative error left.
   */
  public double[] corrections() {
    return corrections.clone();
  }

  /** Steps of refinement done for a column. */
  public int steps(int column) {
    return steps[column];
  }

  /** Why the refinement of a column ended. */
  public Outcome outcome(int column) {
    return outcomes[column];
  }
}
