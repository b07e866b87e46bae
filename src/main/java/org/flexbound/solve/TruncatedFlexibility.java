package org.flexbound.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
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
import org.flexbound.setup.Load;
import org.flexbound.sparse.EigenPairs;
import org.flexbound.sparse.PivotBreakdownException;

/**
 * A frame whose flexibility is taken from its lowest elastic modes, made ready once and solved for any
 * setting of the stiffnesses that may be set. Where the mode above the cut has nearly the same
 * frequency as the one below, the cut is moved to the nearest gap, with a finding: modes that repeat
 * or cross can be told apart neither by a test nor by a derivative.
 *
 * <p>Not for use by several threads at a time.
 */
public final class TruncatedFlexibility implements PreparedFlexibility {
  /** Frequencies nearer to each other than this share are not cut apart (common practice, no source). */
  private static final double GAP = 0.01;

  /** Modes worked out beyond the cut: they speed up the derivative and show what is missing. */
  private static final int BEYOND = 12;

  /**
   * A rigid part that may be set stands as a spring of this many times the stiffness it joins, so
   * that there is a derivative by its compliance; it costs as many digits.
   */
  private static final double STIFF = 1e7;

  private final DividedFrame frame;
  private final List<StiffnessPath> parameters;
  private final FrameModes modes;
  private final int cut;
  private final int rigid;
  private final int worked;

  private TruncatedFlexibility(
      DividedFrame.Settled settled, FrameModes modes, int cut, List<StiffnessPath> parameters) {
    this.frame = settled.frame();
    this.modes = modes;
    this.cut = cut;
    this.rigid = settled.rigid();
    this.worked = settled.pairs().count();
    this.parameters = List.copyOf(parameters);
  }

  /**
   * Makes a frame ready.
   *
   * @param model the frame, with densities or masses
   * @param gauges the rows
   * @param loads the columns
   * @param parameters the stiffnesses that may be set, each of an entry of the model
   * @param count how many elastic modes, at least 1
   * @return the frame made ready, with what was found; no value where anything is in error
   */
  public static Outcome<TruncatedFlexibility> prepare(
      FrameModel model,
      List<Gauge> gauges,
      List<Load> loads,
      List<StiffnessPath> parameters,
      int count) {
    Findings findings = new Findings();
    parameters.forEach(path -> findings.addAll(model.resolve(path, Where.nowhere())));
    if (findings.hasErrors()) {
      return Outcome.none(findings.list());
    }
    int all = Math.max(2 * count, count + BEYOND);
    Optional<DividedFrame.Settled> settled =
        DividedFrame.settle(model, gauges, loads, ModeSettings.of(all), findings);
    if (settled.isEmpty()) {
      return Outcome.none(findings.list());
    }
    // That fewer than the modes beyond the cut exist concerns nobody.
    int asked = Math.min(all, Math.max(count, settled.get().pairs().count() - settled.get().rigid()));
    Outcome<FrameModes> modes = FrameModes.of(settled.get(), asked, findings);
    if (modes.value().isEmpty()) {
      return Outcome.none(modes.findings());
    }
    FrameModes found = modes.value().get();
    int cut = cut(found.frequencies(), count);
    tell(found.frequencies(), count, cut, model.where(), findings);
    return Outcome.of(
        new TruncatedFlexibility(settled.get(), found, cut, parameters), findings.list());
  }

  /** The gap nearest to the cut wanted, above it where two are as near; the widest where none is wide. */
  private static int cut(double[] frequencies, int wanted) {
    if (wanted >= frequencies.length) {
      return frequencies.length;
    }
    for (int away = 0; away < frequencies.length; away++) {
      for (int cut : new int[] {wanted + away, wanted - away}) {
        if (cut >= 1 && cut < frequencies.length && gap(frequencies, cut) >= GAP) {
          return cut;
        }
      }
    }
    int widest = wanted;
    for (int cut = 1; cut < frequencies.length; cut++) {
      widest = gap(frequencies, cut) > gap(frequencies, widest) ? cut : widest;
    }
    return widest;
  }

  private static double gap(double[] frequencies, int cut) {
    return frequencies[cut] / frequencies[cut - 1] - 1;
  }

  private static void tell(
      double[] frequencies, int wanted, int cut, Where where, Findings findings) {
    if (cut != wanted && wanted < frequencies.length) {
      findings.add(
          SolveFinding.CUT_MOVED,
          where,
          String.format(
              Locale.ROOT,
              "the modes %d and %d lie within %.2g %% of each other (%.6g and %.6g Hz): the lowest"
                  + " %d modes are taken in place of %d",
              wanted,
              wanted + 1,
              100 * gap(frequencies, wanted),
              frequencies[wanted - 1],
              frequencies[wanted],
              cut,
              wanted));
    }
  }

  @Override
  public TruncatedSolution solve(List<StiffnessSetting> settings) {
    if (settings.size() != parameters.size()) {
      throw new IllegalArgumentException(
          settings.size() + " settings for " + parameters.size() + " parameters");
    }
    double[] slots = springs(frame.mesh().slots().set(parameters, settings));
    ModalModel modal = frame.at(slots);
    EigenPairs pairs;
    try {
      pairs = modal.lowest(worked);
    } catch (PivotBreakdownException breakdown) {
      throw refused(settings, "the modes cannot be worked out");
    }
    int moving = modal.rigidBodyModes(pairs);
    if (moving > rigid) {
      throw refused(settings, moving - rigid + " of its modes move it without resistance");
    }
    return new TruncatedSolution(this, modal, pairs, settings);
  }

  private Refusal refused(List<StiffnessSetting> settings, String what) {
    return new Refusal(
        List.of(
            new Finding(
                SolveFinding.MECHANISM,
                frame.model().where(),
                FrameFlexibility.setFree(parameters, settings) + what)));
  }

  /** Stands springs in for rigid parts that may be set. */
  private double[] springs(double[] slots) {
    boolean[] settable = new boolean[slots.length];
    parameters.forEach(
        path -> frame.mesh().slots().targets(path).forEach(t -> settable[t.slot()] = true));
    List<SpringElement> stiff = new ArrayList<>();
    for (SpringElement spring : frame.mesh().springs()) {
      boolean any = false;
      for (int slot : spring.slots()) {
        any |= settable[slot] && Double.isInfinite(slots[slot]);
      }
      if (any) {
        stiff.add(spring);
      }
    }
    for (SpringElement spring : stiff) {
      double[] around = around(spring, slots);
      for (int c = 0; c < 6; c++) {
        int slot = spring.springs().slot(c);
        if (settable[slot] && Double.isInfinite(slots[slot])) {
          slots[slot] = STIFF * around[c / 3];
        }
      }
    }
    return slots;
  }

  /** The largest resistance of the member pieces at the points of a spring to shifts and to turns. */
  private double[] around(SpringElement spring, double[] slots) {
    double[] largest = new double[2];
    double[] values = new double[144];
    for (MemberElement member : frame.mesh().members()) {
      for (int end = 0; end < 2; end++) {
        for (int point : spring.points) {
          if (member.points[end] == point) {
            member.stiffness(member.basic(slots), values);
            for (int i = 0; i < 6; i++) {
              largest[i / 3] = Math.max(largest[i / 3], values[13 * (6 * end + i)]);
            }
          }
        }
      }
    }
    return new double[] {largest[0] > 0 ? largest[0] : 1, largest[1] > 0 ? largest[1] : 1};
  }

  /** How many of the lowest elastic modes make the flexibility. */
  public int modeCount() {
    return cut;
  }

  /**
   * The modes of the nominal frame, as many as were worked out: what truncation leaves out can be
   * read from them.
   *
   * @return at least as many modes as the cut
   */
  public FrameModes modes() {
    return modes;
  }

  @Override
  public List<Gauge> gauges() {
    return frame.gauges();
  }

  @Override
  public List<Load> loads() {
    return frame.loads();
  }

  @Override
  public List<StiffnessPath> parameters() {
    return parameters;
  }

  Stiffness asSet(StiffnessPath path, List<StiffnessSetting> settings) {
    return FrameFlexibility.asSet(frame.model(), parameters, settings, path);
  }

  DividedFrame frame() {
    return frame;
  }

  int rigid() {
    return rigid;
  }
}
