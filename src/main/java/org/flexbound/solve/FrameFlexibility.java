package org.flexbound.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Where;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Stiffness;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.sparse.FactorSettings;
import org.flexbound.sparse.PivotBreakdownException;

/**
 * A frame with its gauges and loads, made ready once and solved for any setting of the stiffnesses
 * that may be set. The order of elimination is found once.
 *
 * <p>Not for use by several threads at a time.
 */
public final class FrameFlexibility implements PreparedFlexibility {
  /**
   * A spring that may be set is worked by its gap where it is stiffer than this multiple of its
   * nominal value: as a spring it would cost digits, as a gap it costs none.
   */
  private static final double WORKED_BY_GAP = 1e3;

  /** A pivot below this share of its diagonal entry is taken for a free motion. */
  private static final double PIVOT_LIMIT = 1e-13;

  /** More lost digits than this are reported. */
  private static final double REPORTED_DIGITS = 6;

  private final FrameModel model;
  private final List<Gauge> gauges;
  private final List<Load> loads;
  private final List<StiffnessPath> parameters;
  private final List<List<Place>> gaugePlaces = new ArrayList<>();
  private final List<List<Place>> loadPlaces = new ArrayList<>();
  private final Mesh mesh;
  private final Readings readings;
  private final List<Functional> gaugeRows = new ArrayList<>();
  private final List<Functional> loadColumns = new ArrayList<>();
  private final List<Map<Integer, Double>> held = new ArrayList<>();
  private final Map<List<Integer>, Structure> structures = new HashMap<>();
  private final double length;
  private final boolean[] springSlots;

  private FrameFlexibility(
      FrameModel model,
      List<Gauge> gauges,
      List<Load> loads,
      List<StiffnessPath> parameters,
      List<List<Place>> gaugePlaces,
      List<List<Place>> loadPlaces) {
    this.model = model;
    this.gauges = List.copyOf(gauges);
    this.loads = List.copyOf(loads);
    this.parameters = List.copyOf(parameters);
    this.gaugePlaces.addAll(gaugePlaces);
    this.loadPlaces.addAll(loadPlaces);
    this.length = PlaceFinder.extent(model);
    MeshBuilder builder = new MeshBuilder(model);
    for (int g = 0; g < gauges.size(); g++) {
      // Section forces are exact anywhere on a piece: a strain needs no point of its own.
      if (gauges.get(g).kind() != GaugeKind.STRAIN) {
        gaugePlaces.get(g).forEach(builder::divide);
      }
    }
    loadPlaces.forEach(places -> places.forEach(builder::divide));
    mesh = builder.build();
    readings = new Readings(model, mesh);
    springSlots = new boolean[mesh.slots().count()];
    for (SpringElement spring : mesh.springs()) {
      for (int slot : spring.slots()) {
        springSlots[slot] = true;
      }
    }
    for (int g = 0; g < gauges.size(); g++) {
      gaugeRows.add(readings.of(gauges.get(g), gaugePlaces.get(g)));
    }
    for (int l = 0; l < loads.size(); l++) {
      loadColumns.add(readings.of(loads.get(l), loadPlaces.get(l)));
    }
  }

  /**
   * Makes a frame ready: holds gauges and loads against the model, and refuses a structure that can
   * move freely.
   *
   * @param model the frame
   * @param gauges the rows
   * @param loads the columns
   * @param parameters the stiffnesses that may be set, each of an entry of the model
   * @return the frame made ready, with what was found; no value where anything is in error
   */
  public static Outcome<FrameFlexibility> prepare(
      FrameModel model,
      List<Gauge> gauges,
      List<Load> loads,
      List<StiffnessPath> parameters) {
    Findings findings = new Findings();
    PlaceFinder finder = new PlaceFinder(model, findings);
    List<List<Place>> gaugePlaces = gauges.stream().map(finder::of).toList();
    List<List<Place>> loadPlaces = loads.stream().map(finder::of).toList();
    parameters.forEach(path -> findings.addAll(model.resolve(path, Where.nowhere())));
    if (findings.hasErrors()) {
      return Outcome.none(findings.list());
    }
    FrameFlexibility ready =
        new FrameFlexibility(model, gauges, loads, parameters, gaugePlaces, loadPlaces);
    ready.hold(findings);
    if (findings.hasErrors() || !ready.check(findings)) {
      return Outcome.none(findings.list());
    }
    return Outcome.of(ready, findings.list());
  }

  private void hold(Findings findings) {
    held.addAll(
        new Holding(model, mesh, findings)
            .rows(gauges, gaugePlaces, loads, loadPlaces, loadColumns));
  }

  /** Solves the nominal frame once, so that what is wrong with it is found before anything else. */
  private boolean check(Findings findings) {
    Where where = model.where();
    double[] stiffness = mesh.slots().set(List.of(), List.of());
    boolean[] told = new boolean[mesh.springs().size()];
    Structure structure =
        structure(
            stiffness,
            List.of(),
            spring -> {
              if (!told[spring]) {
                told[spring] = true;
                findings.add(
                    SolveFinding.HELD_TWICE,
                    where,
                    "the "
                        + mesh.springNames().get(spring)
                        + " holds a motion that is held already");
              }
            });
    List<String> idle = new IdleFreedoms(structure, columns()).hold(stiffness, held);
    if (!idle.isEmpty()) {
      structures.clear();
      findings.add(
          SolveFinding.HELD_FREEDOM,
          where,
          "nothing resists and nothing acts on " + String.join(", ", idle) + ": held");
      structure = structure(stiffness, List.of(), spring -> {});
    }
    try {
      Fields fields = Fields.of(structure, new State(structure, stiffness), columns());
      Evidence evidence = evidence(structure, fields);
      if (evidence.lostDigits() > REPORTED_DIGITS) {
        findings.add(
            SolveFinding.NEARLY_SINGULAR,
            where,
            String.format(
                Locale.ROOT,
                "about %.0f of 16 digits are lost in solving the model (one step of refinement"
                    + " has been made)",
                evidence.lostDigits()));
      }
      return true;
    } catch (PivotBreakdownException breakdown) {
      findings.add(
          SolveFinding.MECHANISM,
          where,
          new Mechanism(model, structure, new State(structure, stiffness))
              .describe(breakdown.unknown()));
      return false;
    }
  }

  private static Evidence evidence(Structure structure, Fields fields) {
    return new Evidence(
        structure.transformation().unknowns(),
        fields.residual(),
        fields.correction(),
        fields.leastPivot());
  }

  private Functional[] columns() {
    List<Functional> all = new ArrayList<>(gaugeRows);
    all.addAll(loadColumns);
    return all.toArray(Functional[]::new);
  }

  /** The structure for which these slots are worked by their gaps. */
  private Structure structure(
      double[] stiffness, List<Integer> open, java.util.function.IntConsumer redundant) {
    List<Integer> key = new ArrayList<>(open);
    for (int slot = 0; slot < stiffness.length; slot++) {
      if (springSlots[slot]
          && Double.isInfinite(stiffness[slot])
          && !open.contains(slot)) {
        key.add(-1 - slot);
      }
    }
    List<Map<Integer, Double>> allHeld = new ArrayList<>(held);
    for (int n = 0; n < mesh.spins().size(); n++) {
      if (mesh.spins().get(n).isFree(stiffness)) {
        key.add(stiffness.length + n);
        allHeld.add(mesh.spins().get(n).row());
      }
    }
    Structure known = structures.get(key);
    if (known != null) {
      return known;
    }
    boolean[] mayOpen = new boolean[stiffness.length];
    open.forEach(slot -> mayOpen[slot] = true);
    FactorSettings settings = FactorSettings.defaults().withPivotLimit(PIVOT_LIMIT);
    Structure made =
        Structure.of(mesh, stiffness, mayOpen, allHeld, length, settings, redundant);
    structures.put(key, made);
    return made;
  }

  @Override
  public FlexibilitySolution solve(List<StiffnessSetting> settings) {
    if (settings.size() != parameters.size()) {
      throw new IllegalArgumentException(
          settings.size() + " settings for " + parameters.size() + " parameters");
    }
    double[] stiffness = mesh.slots().set(parameters, settings);
    List<Integer> open = new ArrayList<>();
    for (StiffnessPath parameter : parameters) {
      for (Slots.Target target : mesh.slots().targets(parameter)) {
        if (worksByGap(target.slot(), stiffness[target.slot()])
            && !open.contains(target.slot())) {
          open.add(target.slot());
        }
      }
    }
    Structure structure = structure(stiffness, open, spring -> {});
    State state = new State(structure, stiffness);
    Fields fields;
    try {
      fields = Fields.of(structure, state, columns());
    } catch (PivotBreakdownException breakdown) {
      throw new Refusal(List.of(freed(breakdown, structure, state, settings)));
    }
    return new FlexibilitySolution(
        this, structure, state, fields, evidence(structure, fields), settings);
  }

  private Finding freed(
      PivotBreakdownException breakdown,
      Structure structure,
      State state,
      List<StiffnessSetting> settings) {
    String motion = new Mechanism(model, structure, state).describe(breakdown.unknown());
    return new Finding(
        SolveFinding.MECHANISM, model.where(), setFree(parameters, settings) + motion);
  }

  /** Names the stiffnesses that are set to nothing. */
  static String setFree(List<StiffnessPath> parameters, List<StiffnessSetting> settings) {
    List<String> free = new ArrayList<>();
    for (int k = 0; k < settings.size(); k++) {
      if (settings.get(k) instanceof StiffnessSetting.Value value && value.stiffness() == 0) {
        free.add(parameters.get(k).toString());
      }
    }
    return free.isEmpty() ? "as set: " : "with " + String.join(", ", free) + " set free: ";
  }

  private boolean worksByGap(int slot, double stiffness) {
    if (!springSlots[slot]) {
      return false;
    }
    double nominal = mesh.slots().nominal(slot);
    boolean stiff =
        Double.isInfinite(nominal)
            ? stiffness > 0
            : nominal > 0 && stiffness > WORKED_BY_GAP * nominal;
    return stiff || Double.isInfinite(stiffness);
  }

  @Override
  public List<Gauge> gauges() {
    return gauges;
  }

  @Override
  public List<Load> loads() {
    return loads;
  }

  @Override
  public List<StiffnessPath> parameters() {
    return parameters;
  }

  /** A stiffness of the model with the settings of its own path. */
  Stiffness asSet(StiffnessPath path, List<StiffnessSetting> settings) {
    return asSet(model, parameters, settings, path);
  }

  /** A stiffness of a model with the settings of its own path. */
  static Stiffness asSet(
      FrameModel model,
      List<StiffnessPath> parameters,
      List<StiffnessSetting> settings,
      StiffnessPath path) {
    Stiffness result =
        model
            .stiffness(path)
            .orElseThrow(() -> new IllegalArgumentException("the model has no " + path));
    for (int k = 0; k < parameters.size(); k++) {
      if (parameters.get(k).equals(path)) {
        result = settings.get(k).of(result);
      }
    }
    return result;
  }

  Mesh mesh() {
    return mesh;
  }

  PlaceDerivatives places() {
    return new PlaceDerivatives(readings, gauges, gaugePlaces, loads, loadPlaces);
  }

  List<Functional> gaugeRows() {
    return gaugeRows;
  }
}
