package org.flexbound.testlog;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.NearestWord;
import org.flexbound.quantity.Unit;
import org.flexbound.setup.BeddingIn;
import org.flexbound.setup.DecisionRule;
import org.flexbound.setup.FitRange;
import org.flexbound.setup.QualityLimits;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.SlopeFit;

/** Reads the sheet Options: item and entry, shares in percent. */
final class OptionsReader {
  /** The items of the sheet, with what belongs in the entry; used by the template too. */
  static final Map<String, String> ITEMS = items();

  /** The items that may be set for one gauge. */
  static final List<String> OF_A_GAUGE = List.of("Fit range lower", "Fit range upper");

  private final EntryCells cells;
  private final Findings findings;
  private final Map<String, Where> gauges = new LinkedHashMap<>();

  OptionsReader(EntryCells cells, Findings findings) {
    this.cells = cells;
    this.findings = findings;
  }

  private static Map<String, String> items() {
    Map<String, String> items = new LinkedHashMap<>();
    items.put(
        "Stated repeatability",
        "relative standard deviation of a slope from run to run, %; needed where there is one run");
    items.put("Fit range lower", "lower end of the fit, % of the peak load; usually 10");
    items.put("Fit range upper", "upper end of the fit, % of the peak load; usually 100");
    items.put("First cycle", "leave out, or keep");
    items.put("Slope fit", "automatic, ordinary, both variables, robust or weighted");
    items.put("Local gravity", "m/s², for loads stated in kg");
    items.put("Base motion", "take out, or leave");
    items.put("Linearity limit", "% of span");
    items.put("Hysteresis limit", "% of span");
    items.put("Repeatability limit", "%");
    items.put("Zero return limit", "% of the peak reading");
    items.put("Resolution limit", "% of span");
    items.put("Curvature limit", "% of span");
    items.put("Reciprocity limit", "largest |z| of a pair");
    items.put("Base motion limit", "largest share of a reading, %");
    items.put("Decision rule", "guard band, or simple");
    items.put(
        "Probability of being wrong",
        "largest one with a pass or a fail, %, above 0 and below 50; usually 5");
    return items;
  }

  /** The gauges for which something was set, each with the first cell that names it. */
  Map<String, Where> gauges() {
    return Collections.unmodifiableMap(gauges);
  }

  ReductionOptions read(EntryTable table) {
    Map<String, EntryTable.Entry> common = new LinkedHashMap<>();
    Map<String, EntryTable.Entry> lower = new LinkedHashMap<>();
    Map<String, EntryTable.Entry> upper = new LinkedHashMap<>();
    for (EntryTable.Entry entry : table.entries()) {
      Optional<String> item =
          ITEMS.keySet().stream()
              .filter(EntryCells.text(entry, "Item")::equalsIgnoreCase)
              .findFirst();
      Optional<String> gauge = EntryCells.name(entry, "Gauge");
      if (entry.get("Entry").isBlank() && item.isPresent()) {
        continue;
      }
      if (item.isEmpty()) {
        findings.add(
            TestlogFinding.OPTION,
            entry.get("Item").where(),
            "found '"
                + EntryCells.text(entry, "Item")
                + "'; expected one of "
                + String.join(", ", ITEMS.keySet())
                + NearestWord.question(EntryCells.text(entry, "Item"), ITEMS.keySet()));
      } else if (gauge.isEmpty()) {
        common.put(item.get(), entry);
      } else if (item.get().equals("Fit range lower")) {
        gauges.putIfAbsent(gauge.get(), entry.get("Gauge").where());
        lower.put(gauge.get(), entry);
      } else if (item.get().equals("Fit range upper")) {
        gauges.putIfAbsent(gauge.get(), entry.get("Gauge").where());
        upper.put(gauge.get(), entry);
      } else {
        findings.add(
            TestlogFinding.OPTION,
            entry.get("Gauge").where(),
            "'" + item.get() + "' cannot be set for one gauge; expected a blank cell");
      }
    }
    return options(common, lower, upper);
  }

  private ReductionOptions options(
      Map<String, EntryTable.Entry> common,
      Map<String, EntryTable.Entry> lower,
      Map<String, EntryTable.Entry> upper) {
    ReductionOptions usual = ReductionOptions.USUAL;
    FitRange range =
        range(
            share(common, "Fit range lower", usual.fitRange().lower()),
            share(common, "Fit range upper", usual.fitRange().upper()),
            Optional.ofNullable(common.get("Fit range lower"))
                .or(() -> Optional.ofNullable(common.get("Fit range upper"))));
    Map<String, FitRange> byGauge = new LinkedHashMap<>();
    for (String gauge : gauges.keySet()) {
      Optional<EntryTable.Entry> from = Optional.ofNullable(lower.get(gauge));
      Optional<EntryTable.Entry> to = Optional.ofNullable(upper.get(gauge));
      byGauge.put(
          gauge,
          range(
              from.map(this::percent).orElse(OptionalDouble.empty()).orElse(range.lower()),
              to.map(this::percent).orElse(OptionalDouble.empty()).orElse(range.upper()),
              from.or(() -> to)));
    }
    QualityLimits q = usual.qualityLimits();
    QualityLimits quality =
        new QualityLimits(
            share(common, "Linearity limit", q.linearity()),
            share(common, "Hysteresis limit", q.hysteresis()),
            share(common, "Repeatability limit", q.repeatability()),
            share(common, "Zero return limit", q.zeroReturn()),
            share(common, "Resolution limit", q.resolution()),
            share(common, "Curvature limit", q.curvature()),
            number(common, "Reciprocity limit").orElse(q.reciprocityZ()),
            share(common, "Base motion limit", q.baseMotionShare()));
    EntryTable.Entry repeatability = common.get("Stated repeatability");
    return new ReductionOptions(
        repeatability == null ? OptionalDouble.empty() : percent(repeatability),
        range,
        byGauge,
        choice(common, "First cycle", List.of("leave out", "keep")) == 1
            ? BeddingIn.KEEP
            : BeddingIn.LEAVE_OUT_WHERE_OTHERS,
        List.of(SlopeFit.values())
            .get(
                choice(
                    common,
                    "Slope fit",
                    List.of("automatic", "ordinary", "both variables", "robust", "weighted"))),
        gravity(common),
        choice(common, "Base motion", List.of("take out", "leave")) == 0,
        quality,
        rule(common));
  }

  private DecisionRule rule(Map<String, EntryTable.Entry> common) {
    DecisionRule.Kind kind =
        List.of(DecisionRule.Kind.values())
            .get(choice(common, "Decision rule", List.of("guard band", "simple")));
    double usual = DecisionRule.GUARD_BAND.largestProbability();
    double stated = share(common, "Probability of being wrong", usual);
    if (stated > 0 && stated < 0.5) {
      return new DecisionRule(kind, stated);
    }
    EntryTable.Entry entry = common.get("Probability of being wrong");
    if (entry != null) {
      findings.add(
          TestlogFinding.OUT_OF_RANGE,
          entry.get("Entry").where(),
          "found " + 100 * stated + " %; expected a probability above 0 and below 50 %");
    }
    return new DecisionRule(kind, usual);
  }

  private double gravity(Map<String, EntryTable.Entry> common) {
    EntryTable.Entry entry = common.get("Local gravity");
    if (entry == null) {
      return ReductionOptions.STANDARD_GRAVITY;
    }
    Unit metric = new Unit("m/s²", Dimension.ACCELERATION, 1, 0);
    List<Dimension> wanted = List.of(Dimension.ACCELERATION);
    Unit unit =
        cells.unit(entry.get("Unit"), wanted, "acceleration, such as m/s²").orElse(metric);
    double si =
        cells
            .si(entry, "Entry", Optional.of(unit), wanted, UnaryOperator.identity())
            .orElse(ReductionOptions.STANDARD_GRAVITY);
    // on the Earth's surface gravity lies from 9.76 to 9.84 m/s²
    if (!(si > 9.7 && si < 9.9)) {
      findings.add(
          TestlogFinding.OUT_OF_RANGE,
          entry.get("Entry").where(),
          "found " + si + " m/s²; expected the local gravity, 9.76 to 9.84 m/s²");
    }
    return si;
  }

  private FitRange range(double lower, double upper, Optional<EntryTable.Entry> entry) {
    if (0 <= lower && lower < upper && upper <= 1) {
      return new FitRange(lower, upper);
    }
    entry.ifPresent(
        found ->
            findings.add(
                TestlogFinding.OUT_OF_RANGE,
                found.get("Entry").where(),
                "found a fit range from "
                    + 100 * lower
                    + " to "
                    + 100 * upper
                    + " %; expected it to rise from 0 or more to 100 or less"));
    return FitRange.USUAL;
  }

  private double share(Map<String, EntryTable.Entry> common, String item, double otherwise) {
    EntryTable.Entry entry = common.get(item);
    return entry == null ? otherwise : percent(entry).orElse(otherwise);
  }

  private OptionalDouble number(Map<String, EntryTable.Entry> common, String item) {
    EntryTable.Entry entry = common.get(item);
    return entry == null ? OptionalDouble.empty() : cells.notNegative(entry, "Entry");
  }

  private OptionalDouble percent(EntryTable.Entry entry) {
    return cells.percent(entry, "Entry");
  }

  private int choice(Map<String, EntryTable.Entry> common, String item, List<String> words) {
    EntryTable.Entry entry = common.get(item);
    if (entry == null) {
      return 0;
    }
    String wanted = EntryCells.text(entry, "Entry").toLowerCase(Locale.ROOT);
    int index = words.indexOf(wanted);
    if (index < 0) {
      findings.add(
          TestlogFinding.CHOICE,
          entry.get("Entry").where(),
          "found '" + wanted + "'; expected " + String.join(", ", words));
      return 0;
    }
    return index;
  }
}
