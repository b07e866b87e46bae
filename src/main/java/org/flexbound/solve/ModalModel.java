package org.flexbound.solve;

import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.finding.Findings;
import org.flexbound.frame.Member;
import org.flexbound.sparse.EigenPairs;
import org.flexbound.sparse.EigenSettings;
import org.flexbound.sparse.EigenSolver;
import org.flexbound.sparse.FactorSettings;
import org.flexbound.sparse.PivotBreakdownException;
import org.flexbound.sparse.SymmetricMatrix;

/** Stiffness and mass of a divided frame, joints as elements of their own. */
final class ModalModel {
  /** A mode whose strain energy is below this share of what its motions would have, one by one. */
  private static final double RIGID = 1e-12;

  private final DividedFrame frame;
  private final Mesh mesh;
  private final Structure structure;
  private final State state;
  private final SymmetricMatrix stiffness;
  private final SymmetricMatrix mass;
  private final double[] slots;

  /** By member piece. */
  private final Mesh.Piece[] pieces;

  private final Member[] members;

  ModalModel(DividedFrame frame, Structure structure, double[] slots) {
    this.frame = frame;
    this.mesh = frame.mesh();
    this.structure = structure;
    this.slots = slots;
    state = new State(structure, slots);
    stiffness =
        structure.assemble(
            (e, values) -> structure.elements().get(e).stiffness(state.basic(e), values));
    pieces = new Mesh.Piece[mesh.members().size()];
    members = new Member[pieces.length];
    mesh.pieces()
        .forEach(
            (name, list) ->
                list.forEach(
                    piece -> {
                      pieces[piece.element()] = piece;
                      Member member = frame.model().members().get(name);
                      if (member != null) {
                        members[piece.element()] = member;
                      }
                    }));
    mass = mass();
  }

  DividedFrame frame() {
    return frame;
  }

  Structure structure() {
    return structure;
  }

  State state() {
    return state;
  }

  SymmetricMatrix stiffness() {
    return stiffness;
  }

  SymmetricMatrix massMatrix() {
    return mass;
  }

  private SymmetricMatrix mass() {
    return structure.assemble(
        (e, values) -> {
          Element element = structure.elements().get(e);
          if (element instanceof MemberElement member) {
            double[] m = MemberMass.of(frame.model(), members[e], pieces[e], member, slots);
            System.arraycopy(m, 0, values, 0, m.length);
          } else if (element instanceof BodyElement body) {
            body.writeMass(values);
          } else {
            Arrays.fill(values, 0, element.freedoms() * element.freedoms(), 0);
          }
        });
  }

  EigenPairs lowest(int count) {
    EigenSolver solver = new EigenSolver(EigenSettings.defaults(), FactorSettings.defaults());
    return solver.lowest(
        stiffness, mass, structure.transformation().group(), count);
  }

  /** How many of the lowest pairs have no strain energy. */
  int rigidBodyModes(EigenPairs pairs) {
    int n = pairs.size();
    double[] diagonal = stiffness.diagonal();
    double[] x = pairs.vectors();
    double[] kx = new double[x.length];
    stiffness.multiply(x, kx, pairs.count());
    int rigid = 0;
    for (int k = 0; k < pairs.count(); k++) {
      double energy = 0;
      double apart = 0;
      for (int i = 0; i < n; i++) {
        energy += x[k * n + i] * kx[k * n + i];
        apart += diagonal[i] * x[k * n + i] * x[k * n + i];
      }
      if (energy > RIGID * apart) {
        break;
      }
      rigid = k + 1;
    }
    return rigid;
  }

  double[] expand(double[] q) {
    double[] motions = new double[mesh.freedoms()];
    structure.transformation().expand(q, 0, motions, 0);
    return motions;
  }

  double[] atGauges(double[] motions) {
    double[] result = new double[frame.gaugeRows().size()];
    for (int g = 0; g < result.length; g++) {
      result[g] = read(frame.gaugeRows().get(g), motions);
    }
    return result;
  }

  double[] atLoads(double[] motions) {
    return frame.loadColumns().stream().mapToDouble(column -> column.of(motions, 0)).toArray();
  }

  double read(Functional functional, Fields fields, int column) {
    return fields.read(functional, structure, state, column);
  }

  private double read(Functional functional, double[] motions) {
    return read(functional, Fields.given(motions.length, motions), 0);
  }

  /** A member piece's mass as its shear deflection changes, see {@link MemberMass}. */
  double[][] massByShear(int element) {
    return MemberMass.byShear(
        frame.model(),
        members[element],
        pieces[element],
        mesh.members().get(element),
        slots);
  }

  Map<String, double[]> atNodes(double[] motions) {
    Map<String, double[]> result = new LinkedHashMap<>();
    mesh.pointOfNode()
        .forEach(
            (node, point) ->
                result.put(node, Arrays.copyOfRange(motions, 6 * point, 6 * point + 6)));
    return result;
  }

  /**
   * The whole static flexibility. Of a structure that moves freely: held at one node, the rigid-body
   * modes then taken out of the motions, so that it is what all its elastic modes would make.
   */
  double[][] full(EigenPairs pairs, int rigid, Findings findings) {
    Structure held = structure;
    State heldState = state;
    // A structure with supports that still moves freely breaks down below and is described.
    if (rigid > 0 && frame.model().supports().isEmpty()) {
      List<Map<Integer, Double>> rows =
          new Holding(frame.model(), mesh, findings).free(frame.loads(), frame.loadColumns());
      held = frame.structure(slots, rows);
      heldState = new State(held, slots);
    }
    Fields fields;
    try {
      fields = Fields.of(held, heldState, frame.columns());
    } catch (PivotBreakdownException breakdown) {
      findings.add(
          SolveFinding.MECHANISM,
          frame.model().where(),
          new Mechanism(frame.model(), held, heldState).describe(breakdown.unknown()));
      return new double[0][0];
    }
    double[][] result = new double[frame.gauges().size()][frame.loads().size()];
    for (int l = 0; l < frame.loads().size(); l++) {
      int from = (frame.gauges().size() + l) * fields.size();
      double[] motions =
          Arrays.copyOfRange(fields.motions(), from, from + fields.size());
      for (int k = 0; k < rigid; k++) {
        takeOut(motions, pairs.vector(k));
      }
      double[] read = atGauges(motions);
      for (int g = 0; g < read.length; g++) {
        result[g][l] = read[g];
      }
    }
    return result;
  }

  /** motions −= R (Rᵀ M motions) for a rigid-body mode R. */
  private void takeOut(double[] motions, double[] mode) {
    double[] q = new double[mode.length];
    for (int i = 0; i < q.length; i++) {
      q[i] = motions[structure.transformation().freedomOf(i)];
    }
    double[] mq = new double[q.length];
    mass.multiply(q, mq, 1);
    double share = 0;
    for (int i = 0; i < q.length; i++) {
      share += mode[i] * mq[i];
    }
    double[] moved = expand(mode);
    for (int f = 0; f < motions.length; f++) {
      motions[f] -= share * moved[f];
    }
  }
}
