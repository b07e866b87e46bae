package org.flexbound.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.frame.FrameModel;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.sparse.EigenPairs;
import org.flexbound.sparse.FactorSettings;

/**
 * A frame divided for modes, with its gauges and loads: made once, then set to any stiffnesses. Joints
 * are elements of their own, so that what they leave free stays an unknown.
 */
final class DividedFrame {
  private final FrameModel model;
  private final List<Gauge> gauges;
  private final List<List<Place>> gaugePlaces;
  private final List<Load> loads;
  private final List<List<Place>> loadPlaces;
  private final Mesh mesh;
  private final List<Functional> gaugeRows = new ArrayList<>();
  private final List<Functional> loadColumns = new ArrayList<>();
  private final Readings readings;
  private final List<Map<Integer, Double>> held = new ArrayList<>();
  private final Map<List<Integer>, Structure> structures = new HashMap<>();

  private DividedFrame(
      FrameModel model,
      List<Gauge> gauges,
      List<List<Place>> gaugePlaces,
      List<Load> loads,
      List<List<Place>> loadPlaces,
      Map<String, Integer> division,
      Findings findings) {
    this.model = model;
    this.gauges = List.copyOf(gauges);
    this.gaugePlaces = List.copyOf(gaugePlaces);
    this.loads = List.copyOf(loads);
    this.loadPlaces = List.copyOf(loadPlaces);
    MeshBuilder builder = new MeshBuilder(model);
    builder.forModes(division);
    for (int g = 0; g < gauges.size(); g++) {
      if (gauges.get(g).kind() != GaugeKind.STRAIN) {
        gaugePlaces.get(g).forEach(builder::divide);
      }
    }
    loadPlaces.forEach(places -> places.forEach(builder::divide));
    mesh = builder.build();
    readings = new Readings(model, mesh);
    for (int g = 0; g < gauges.size(); g++) {
      gaugeRows.add(readings.of(gauges.get(g), gaugePlaces.get(g)));
    }
    for (int l = 0; l < loads.size(); l++) {
      loadColumns.add(readings.of(loads.get(l), loadPlaces.get(l)));
    }
    if (!model.supports().isEmpty()) {
      held.addAll(
          new Holding(model, mesh, findings)
              .rows(gauges, gaugePlaces, loads, loadPlaces, loadColumns));
    }
  }

  /**
   * A divided frame at its nominal stiffnesses with its lowest modes.
   *
   * @param frame the frame
   * @param nominal the frame at its nominal stiffnesses
   * @param pairs its lowest modes, rigid-body modes first
   * @param rigid how many of them are rigid-body modes
   */
  record Settled(DividedFrame frame, ModalModel nominal, EigenPairs pairs, int rigid) {}

  /**
   * Places gauges and loads, divides the members as finely as the highest mode wants it, and works
   * out the modes.
   *
   * @return nothing where anything is in error
   */
  static Optional<Settled> settle(
      FrameModel model,
      List<Gauge> gauges,
      List<Load> loads,
      ModeSettings settings,
      Findings findings) {
    PlaceFinder finder = new PlaceFinder(model, findings);
    List<List<Place>> gaugePlaces = gauges.stream().map(finder::of).toList();
    List<List<Place>> loadPlaces = loads.stream().map(finder::of).toList();
    if (findings.hasErrors()) {
      return Optional.empty();
    }
    if (isMassless(model)) {
      findings.add(
          SolveFinding.NO_MASS,
          model.where(),
          "no material has a density and there is no mass; modes need mass");
      return Optional.empty();
    }
    Map<String, Integer> division = new LinkedHashMap<>();
    int members = Math.max(1, model.members().size());
    int first =
        settings.pieces().orElse((int) Math.ceil(settings.count() * 2 / (6.0 * members)));
    model.members().keySet().forEach(name -> division.put(name, Math.max(1, first)));
    DividedFrame frame =
        new DividedFrame(model, gauges, gaugePlaces, loads, loadPlaces, division, findings);
    ModalModel modal = frame.at(frame.nominalSlots());
    EigenPairs pairs = modal.lowest(settings.count());
    int rigid = modal.rigidBodyModes(pairs);
    if (settings.pieces().isEmpty() && pairs.count() > rigid) {
      double highest = Math.sqrt(pairs.values()[pairs.count() - 1]);
      Map<String, Integer> wanted = Division.of(model, highest);
      wanted.replaceAll((name, pieces) -> Math.max(pieces, division.getOrDefault(name, 1)));
      if (!wanted.equals(division)) {
        frame =
            new DividedFrame(
                model, gauges, gaugePlaces, loads, loadPlaces, wanted, new Findings());
        modal = frame.at(frame.nominalSlots());
        pairs = modal.lowest(settings.count());
        rigid = modal.rigidBodyModes(pairs);
      }
    }
    if (rigid > 0) {
      pairs = modal.lowest(settings.count() + rigid);
      rigid = modal.rigidBodyModes(pairs);
    }
    return Optional.of(new Settled(frame, modal, pairs, rigid));
  }

  private static boolean isMassless(FrameModel model) {
    return model.masses().stream().allMatch(m -> m.mass() == 0)
        && model.members().values().stream()
            .allMatch(
                m -> m.massPerLength() == 0 && model.material(m.material()).density() == 0);
  }

  double[] nominalSlots() {
    return mesh.slots().set(List.of(), List.of());
  }

  /** The frame at these stiffnesses. */
  ModalModel at(double[] slots) {
    return new ModalModel(this, structure(slots), slots);
  }

  /** What is rigid and what is free decides which unknowns there are. */
  private Structure structure(double[] slots) {
    List<Integer> key = new ArrayList<>();
    for (SpringElement spring : mesh.springs()) {
      for (int slot : spring.slots()) {
        if (Double.isInfinite(slots[slot])) {
          key.add(slot);
        } else if (slots[slot] == 0) {
          key.add(-1 - slot);
        }
      }
    }
    Structure known = structures.get(key);
    if (known != null) {
      return known;
    }
    List<Map<Integer, Double>> rows = new ArrayList<>(held);
    for (Mesh.Spin spin : mesh.spins()) {
      if (spin.isFree(slots)) {
        rows.add(spin.row());
      }
    }
    Structure made = structure(slots, rows);
    if (!new IdleFreedoms(made, columns()).hold(slots, rows).isEmpty()) {
      made = structure(slots, rows);
    }
    structures.put(key, made);
    return made;
  }

  Structure structure(double[] slots, List<Map<Integer, Double>> rows) {
    return Structure.of(
        mesh,
        slots,
        new boolean[slots.length],
        rows,
        PlaceFinder.extent(model),
        FactorSettings.defaults(),
        spring -> {});
  }

  Functional[] columns() {
    List<Functional> all = new ArrayList<>(gaugeRows);
    all.addAll(loadColumns);
    return all.toArray(Functional[]::new);
  }

  FrameModel model() {
    return model;
  }

  Mesh mesh() {
    return mesh;
  }

  PlaceDerivatives places() {
    return new PlaceDerivatives(readings, gauges, gaugePlaces, loads, loadPlaces);
  }

  List<Gauge> gauges() {
    return gauges;
  }

  List<Load> loads() {
    return loads;
  }

  List<Functional> gaugeRows() {
    return gaugeRows;
  }

  List<Functional> loadColumns() {
    return loadColumns;
  }
}
