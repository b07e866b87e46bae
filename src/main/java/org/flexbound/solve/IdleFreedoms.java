package org.flexbound.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.flexbound.sparse.SymmetricMatrix;

/**
 * Rotations of a point that nothing resists at all and on which no gauge and no load acts, such as
 * those of a pin where all members are released: held, with a finding, and not a mechanism.
 */
final class IdleFreedoms {
  private static final String[] DIRECTIONS = {"x", "y", "z", "rx", "ry", "rz"};

  private final Structure structure;
  private final Functional[] columns;

  IdleFreedoms(Structure structure, Functional[] columns) {
    this.structure = structure;
    this.columns = columns;
  }

  /** Adds what is held to the rows; gives the names of the freedoms. */
  List<String> hold(double[] stiffness, List<Map<Integer, Double>> held) {
    State state = new State(structure, stiffness);
    SymmetricMatrix k =
        structure.assemble(
            (e, values) -> structure.elements().get(e).stiffness(state.basic(e), values));
    double[] diagonal = k.diagonal();
    Transformation t = structure.transformation();
    double[] acting = new double[t.unknowns()];
    for (Functional column : columns) {
      double[] forces = new double[t.freedoms()];
      column.addTo(forces, 0, structure, state);
      double[] reduced = new double[t.unknowns()];
      t.reduce(forces, 0, reduced, 0);
      for (int i = 0; i < reduced.length; i++) {
        acting[i] += Math.abs(reduced[i]);
      }
    }
    List<String> names = new ArrayList<>();
    for (int i = 0; i < diagonal.length; i++) {
      int freedom = t.freedomOf(i);
      if (diagonal[i] == 0 && acting[i] == 0 && freedom % 6 >= 3) {
        held.add(Map.of(freedom, 1.0));
        names.add(
            DIRECTIONS[freedom % 6] + " of " + structure.mesh().labels().get(freedom / 6));
      }
    }
    return names;
  }
}
