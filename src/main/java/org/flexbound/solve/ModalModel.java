package org.flexbound.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.finding.Findings;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
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

  private final FrameModel model;
  private final List<Gauge> gauges;
  private final List<Load> loads;
  private final Mesh mesh;
  private final Structure structure;
  private final State state;
  private final SymmetricMatrix stiffness;
  private final SymmetricMatrix mass;
  private final List<Functional> gaugeRows = new ArrayList<>();
  private final List<Functional> loadColumns = new ArrayList<>();
  private final double[] slots;

  ModalModel(
      FrameModel model,
      List<Gauge> gauges,
      List<List<Place>> gaugePlaces,
      List<Load> loads,
      List<List<Place>> loadPlaces,
      Map<String, Integer> division,
      Findings findings) {
    this.model = model;
    this.gauges = List.copyOf(gauges);
    this.loads = List.copyOf(loads);
    MeshBuilder builder = new MeshBuilder(model);
    builder.forModes(division);
    for (int g = 0; g < gauges.size(); g++) {
      if (gauges.get(g).kind() != GaugeKind.STRAIN) {
        gaugePlaces.get(g).forEach(builder::divide);
      }
    }
    loadPlaces.forEach(places -> places.forEach(builder::divide));
    mesh = builder.build();
    slots = mesh.slots().set(List.of(), List.of());
    Readings readings = new Readings(model, mesh);
    for (int g = 0; g < gauges.size(); g++) {
      gaugeRows.add(readings.of(gauges.get(g), gaugePlaces.get(g)));
    }
    for (int l = 0; l < loads.size(); l++) {
      loadColumns.add(readings.of(loads.get(l), loadPlaces.get(l)));
    }
    List<Map<Integer, Double>> held = new ArrayList<>();
    if (!model.supports().isEmpty()) {
      held.addAll(
          new Holding(model, mesh, findings)
              .rows(gauges, gaugePlaces, loads, loadPlaces, loadColumns));
    }
    Structure first = structure(held);
    if (!new IdleFreedoms(first, columns()).hold(slots, held).isEmpty()) {
      first = structure(held);
    }
    structure = first;
    state = new State(structure, slots);
    stiffness =
        structure.assemble(
            (e, values) -> structure.elements().get(e).stiffness(state.basic(e), values));
    mass = mass();
  }

  private Structure structure(List<Map<Integer, Double>> held) {
    return Structure.of(
        mesh,
        slots,
        new boolean[slots.length],
        held,
        PlaceFinder.extent(model),
        FactorSettings.defaults(),
        spring -> {});
  }

  private SymmetricMatrix mass() {
    Mesh.Piece[] pieces = new Mesh.Piece[mesh.members().size()];
    Member[] members = new Member[pieces.length];
    mesh.pieces()
        .forEach(
            (name, list) ->
                list.forEach(
                    piece -> {
                      pieces[piece.element()] = piece;
                      Member member = model.members().get(name);
                      if (member != null) {
                        members[piece.element()] = member;
                      }
                    }));
    return structure.assemble(
        (e, values) -> {
          Element element = structure.elements().get(e);
          if (element instanceof MemberElement member) {
            double[] m = MemberMass.of(model, members[e], pieces[e], member, slots);
            System.arraycopy(m, 0, values, 0, m.length);
          } else if (element instanceof BodyElement body) {
            body.writeMass(values);
          } else {
            Arrays.fill(values, 0, element.freedoms() * element.freedoms(), 0);
          }
        });
  }

  private Functional[] columns() {
    List<Functional> all = new ArrayList<>(gaugeRows);
    all.addAll(loadColumns);
    return all.toArray(Functional[]::new);
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
    double[] result = new double[gaugeRows.size()];
    for (int g = 0; g < result.length; g++) {
      result[g] = read(gaugeRows.get(g), motions);
    }
    return result;
  }

  double[] atLoads(double[] motions) {
    return loadColumns.stream().mapToDouble(column -> column.of(motions, 0)).toArray();
  }

  private double read(Functional functional, double[] motions) {
    double value = functional.of(motions, 0);
    if (functional.strain().isPresent()) {
      Functional.Strain strain = functional.strain().get();
      double[] d =
          structure.elements().get(strain.element()).deformation(motions, 0, motions.length);
      value +=
          Matrix6.dot(strain.row(slots), Matrix6.times(state.basic(strain.element()), d));
    }
    return value;
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
    if (rigid > 0) {
      List<Map<Integer, Double>> rows =
          new Holding(model, mesh, findings).free(loads, loadColumns);
      held = structure(rows);
      heldState = new State(held, slots);
    }
    Fields fields;
    try {
      fields = Fields.of(held, heldState, columns());
    } catch (PivotBreakdownException breakdown) {
      findings.add(
          SolveFinding.MECHANISM,
          model.where(),
          new Mechanism(model, held, heldState).describe(breakdown.unknown()));
      return new double[0][0];
    }
    double[][] result = new double[gauges.size()][loads.size()];
    for (int l = 0; l < loads.size(); l++) {
      int from = (gauges.size() + l) * fields.size();
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

  List<Gauge> gauges() {
    return gauges;
  }

  List<Load> loads() {
    return loads;
  }
}
