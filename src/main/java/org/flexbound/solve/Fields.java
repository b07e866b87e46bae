package org.flexbound.solve;

import org.flexbound.sparse.NumericFactor;
import org.flexbound.sparse.SymmetricMatrix;

/**
 * The motions of all freedoms under the loads and under the unit loads of the gauges, from one
 * factorization; gaps of rigid components that may open are let open by G = G_rigid + N C (I + S C)⁻¹
 * Nᵀ, N the forces in them, S the forces per imposed gap, C their compliances.
 */
final class Fields {
  private final int size;
  private final double[] motions;

  /** Forces in the gaps: by column, then gap. */
  private final double[][] gapForces;

  private final double residual;
  private final double correction;
  private final double leastPivot;

  private Fields(
      int size,
      double[] motions,
      double[][] gapForces,
      double residual,
      double correction,
      double leastPivot) {
    this.size = size;
    this.motions = motions;
    this.gapForces = gapForces;
    this.residual = residual;
    this.correction = correction;
    this.leastPivot = leastPivot;
  }

  /**
   * Fields that were made of modes.
   *
   * @param size number of freedoms
   * @param motions size × (gauges, then loads)
   */
  static Fields given(int size, double[] motions) {
    return new Fields(size, motions, new double[0][0], 0, 0, 1);
  }

  /**
   * What a functional reads under one column.
   *
   * @param functional a gauge, a load, or a derivative of one
   * @param structure the structure
   * @param state its stiffnesses
   * @param column gauges, then loads
   */
  double read(Functional functional, Structure structure, State state, int column) {
    double motion = functional.of(motions, column * size);
    if (functional.strain().isEmpty()) {
      return motion;
    }
    Functional.Strain strain = functional.strain().get();
    double[] d =
        structure.elements().get(strain.element()).deformation(motions, column, size);
    double[] s = Matrix6.times(state.basic(strain.element()), d);
    return motion + Matrix6.dot(strain.row(state.stiffness()), s);
  }

  /**
   * Solves.
   *
   * @param structure the structure
   * @param state its stiffnesses
   * @param columns gauges, then loads
   */
  static Fields of(Structure structure, State state, Functional[] columns) {
    SymmetricMatrix k =
        structure.assemble(
            (e, values) -> structure.elements().get(e).stiffness(state.basic(e), values));
    NumericFactor factor = structure.symbolic().cholesky(k);
    Transformation t = structure.transformation();
    int n = t.unknowns();
    int size = t.freedoms();
    int gapCount = t.gaps();
    int count = columns.length + gapCount;
    double[] rhs = new double[Math.multiplyExact(n, count)];
    double[] forces = new double[size];
    for (int c = 0; c < columns.length; c++) {
      java.util.Arrays.fill(forces, 0);
      columns[c].addTo(forces, 0, structure, state);
      t.reduce(forces, 0, rhs, c * n);
    }
    for (int g = 0; g < gapCount; g++) {
      double[] opened = new double[size];
      t.addGap(g, opened, 0);
      double[] reaction = nodalForces(structure, state, opened, 0);
      for (int f = 0; f < size; f++) {
        reaction[f] = -reaction[f];
      }
      t.reduce(reaction, 0, rhs, (columns.length + g) * n);
    }
    Refined refined = refine(k, factor, rhs, n, count);
    double[] motions = new double[Math.multiplyExact(size, columns.length)];
    for (int c = 0; c < columns.length; c++) {
      t.expand(refined.solution, c * n, motions, c * size);
    }
    double[][] gapForces = new double[columns.length][0];
    if (gapCount > 0) {
      gapForces = open(structure, state, columns, refined.solution, motions);
    }
    return new Fields(
        size, motions, gapForces, refined.residual, refined.correction, factor.leastPivotRatio());
  }

  @SuppressWarnings("ArrayRecordComponent") // handed over once
  private record Refined(double[] solution, double residual, double correction) {}

  /** One step of iterative refinement; its size tells how many digits the factor has lost. */
  private static Refined refine(
      SymmetricMatrix k, NumericFactor factor, double[] rhs, int n, int count) {
    if (count == 0 || n == 0) {
      return new Refined(new double[n * count], 0, 0);
    }
    double[] x = rhs.clone();
    factor.solve(x, count);
    double[] r = new double[rhs.length];
    k.multiply(x, r, count);
    double[] weight = k.diagonal();
    double worstResidual = 0;
    for (int c = 0; c < count; c++) {
      double above = 0;
      double below = 0;
      for (int i = c * n; i < (c + 1) * n; i++) {
        r[i] = rhs[i] - r[i];
        double d = weight[i - c * n];
        if (d > 0) {
          above += r[i] * r[i] / d;
          below += rhs[i] * rhs[i] / d;
        }
      }
      worstResidual = Math.max(worstResidual, below > 0 ? Math.sqrt(above / below) : 0);
    }
    factor.solve(r, count);
    double worst = 0;
    for (int c = 0; c < count; c++) {
      double above = 0;
      double below = 0;
      for (int i = c * n; i < (c + 1) * n; i++) {
        double d = weight[i - c * n];
        above += d * r[i] * r[i];
        below += d * x[i] * x[i];
        x[i] += r[i];
      }
      worst = Math.max(worst, below > 0 ? Math.sqrt(above / below) : 0);
    }
    return new Refined(x, worstResidual, worst);
  }

  /** K u at all freedoms. */
  private static double[] nodalForces(
      Structure structure, State state, double[] motions, int column) {
    int size = structure.transformation().freedoms();
    double[] result = new double[size];
    for (int e = 0; e < structure.elements().size(); e++) {
      Element element = structure.elements().get(e);
      double[] d = element.deformation(motions, column, size);
      element.addForces(Matrix6.times(state.basic(e), d), result, 0);
    }
    return result;
  }

  /** Lets the gaps open: adds to the motions, gives the forces. */
  private static double[][] open(
      Structure structure,
      State state,
      Functional[] columns,
      double[] solution,
      double[] motions) {
    Transformation t = structure.transformation();
    int size = t.freedoms();
    int n = t.unknowns();
    int gaps = t.gaps();
    double[] fields = new double[Math.multiplyExact(size, gaps)];
    double[][] s = new double[gaps][gaps];
    for (int g = 0; g < gaps; g++) {
      t.expand(solution, (columns.length + g) * n, fields, g * size);
      t.addGap(g, fields, g * size);
      double[] forces = nodalForces(structure, state, fields, g);
      for (int h = 0; h < gaps; h++) {
        s[h][g] = t.reduceToGap(forces, 0, h);
      }
    }
    double[][] closed = new double[columns.length][gaps];
    double[] forces = new double[size];
    for (int c = 0; c < columns.length; c++) {
      java.util.Arrays.fill(forces, 0);
      columns[c].addTo(forces, 0, structure, state);
      for (int g = 0; g < gaps; g++) {
        double sum = 0;
        for (int f = 0; f < size; f++) {
          sum += forces[f] * fields[g * size + f];
        }
        closed[c][g] = sum;
      }
    }
    GapOpening opening = GapOpening.of(structure.gaps(), state.stiffness(), s, closed);
    for (int c = 0; c < columns.length; c++) {
      for (int g = 0; g < gaps; g++) {
        double opened = opening.openings()[c][g];
        for (int f = 0; f < size; f++) {
          motions[c * size + f] += opened * fields[g * size + f];
        }
      }
    }
    return opening.forces();
  }

  int size() {
    return size;
  }

  /** size × columns; not copied. */
  double[] motions() {
    return motions;
  }

  double gapForce(int column, int gap) {
    return gapForces[column][gap];
  }

  double residual() {
    return residual;
  }

  double correction() {
    return correction;
  }

  double leastPivot() {
    return leastPivot;
  }
}
