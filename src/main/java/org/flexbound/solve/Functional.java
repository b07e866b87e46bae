package org.flexbound.solve;

import java.util.Optional;
import org.flexbound.setup.Vector;

/**
 * What a gauge reads, or what a load does work on: a linear combination of freedoms, or of section
 * forces where a strain is read.
 */
final class Functional {
  private final int[] freedoms;
  private final double[] coefficients;
  private final Optional<Strain> strain;

  Functional(int[] freedoms, double[] coefficients, Optional<Strain> strain) {
    this.freedoms = freedoms;
    this.coefficients = coefficients;
    this.strain = strain;
  }

  /**
   * A strain at a section: Σ_p lever_p · (section force of p) / θ_p over EA, EIy and EIz.
   *
   * @param element the index of the member piece
   * @param slots the stiffnesses θ_p at the member's start
   * @param rows for each p what gives lever · section force · θ(start)/θ(here) out of the force s of
   *     the piece
   */
  @SuppressWarnings("ArrayRecordComponent") // built once, read only within this package
  record Strain(int element, int[] slots, double[][] rows) {
    /** What gives the strain out of s. */
    double[] row(double[] stiffness) {
      double[] g = new double[6];
      for (int p = 0; p < slots.length; p++) {
        for (int i = 0; i < 6; i++) {
          g[i] += rows[p][i] / stiffness[slots[p]];
        }
      }
      return g;
    }
  }

  Optional<Strain> strain() {
    return strain;
  }

  /** As forces at all freedoms, added to a column. */
  void addTo(double[] column, int from, Structure structure, State state) {
    for (int i = 0; i < freedoms.length; i++) {
      column[from + freedoms[i]] += coefficients[i];
    }
    strain.ifPresent(
        s -> {
          double[] forces =
              Matrix6.times(state.basic(s.element()), s.row(state.stiffness()));
          structure.elements().get(s.element()).addForces(forces, column, from);
        });
  }

  /** Its value for motions of all freedoms (a strain apart). */
  double of(double[] motions, int from) {
    double sum = 0;
    for (int i = 0; i < freedoms.length; i++) {
      sum += coefficients[i] * motions[from + freedoms[i]];
    }
    return sum;
  }

  /**
   * The resultant of its forces over the sum of their sizes, moments divided by a length; 0 where
   * they balance.
   */
  double unbalanced(Mesh mesh, double length) {
    Vector force = Vector.ZERO;
    Vector moment = Vector.ZERO;
    double sizes = 0;
    for (int i = 0; i < freedoms.length; i++) {
      Vector unit =
          new Vector(
              freedoms[i] % 3 == 0 ? 1 : 0,
              freedoms[i] % 3 == 1 ? 1 : 0,
              freedoms[i] % 3 == 2 ? 1 : 0);
      Vector part = unit.times(coefficients[i]);
      if (freedoms[i] % 6 < 3) {
        force = force.plus(part);
        moment = moment.plus(mesh.places().get(freedoms[i] / 6).cross(part));
        sizes += Math.abs(coefficients[i]);
      } else {
        moment = moment.plus(part);
        sizes += Math.abs(coefficients[i]) / length;
      }
    }
    return sizes > 0 ? Math.max(force.norm(), moment.norm() / length) / sizes : 0;
  }
}
