package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Coefficient;
import org.flexbound.report.results.Comparison;
import org.flexbound.report.results.Gauge;
import org.flexbound.report.results.Load;
import org.flexbound.report.results.Member;
import org.flexbound.report.results.Place;
import org.flexbound.report.results.Point;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Structure;

/**
 * The structure in three dimensions with section outlines, gauges and loads; and for each load case
 * the measured and computed motions, drawn at the gauges.
 */
public final class StructureFigures {
  private static final int WIDTH = 760;
  private static final int HEIGHT = 520;

  /** The largest motion is drawn as long as this share of the structure. */
  private static final double SHARE = 0.16;

  private static final String MEMBER = "stroke=\"#1B1F24\" stroke-width=\"1.6\"";
  private static final String OUTLINE =
      "fill=\"#8A94A0\" fill-opacity=\"0.16\" stroke=\"#8A94A0\" stroke-width=\"0.6\"";
  private static final String GAUGE = "fill=\"#0072B2\" stroke=\"#fff\" stroke-width=\"1\"";
  private static final String BASE_GAUGE = "fill=\"#fff\" stroke=\"#0072B2\" stroke-width=\"2\"";
  private static final String JOINT = "fill=\"#fff\" stroke=\"#1B1F24\" stroke-width=\"1.4\"";
  private static final String LOAD = "stroke=\"#D55E00\" stroke-width=\"2.6\"";

  private final Results results;
  private final UnitSystem units;
  private final double size;

  /**
   * Draws the structure of some results.
   *
   * @param results the results
   * @param units the units to show
   */
  public StructureFigures(Results results, UnitSystem units) {
    this.results = results;
    this.units = units;
    this.size = size(results);
  }

  private static double size(Results results) {
    double[] low = {Double.MAX_VALUE, Double.MAX_VALUE, Double.MAX_VALUE};
    double[] high = {-Double.MAX_VALUE, -Double.MAX_VALUE, -Double.MAX_VALUE};
    List<double[]> points = new ArrayList<>();
    results
        .structure()
        .ifPresent(s -> s.nodes().forEach(n -> points.add(new double[] {n.x(), n.y(), n.z()})));
    results.gauges().forEach(g -> place(g.point()).ifPresent(points::add));
    for (double[] point : points) {
      for (int k = 0; k < 3; k++) {
        low[k] = Math.min(low[k], point[k]);
        high[k] = Math.max(high[k], point[k]);
      }
    }
    double squares = 0;
    for (int k = 0; k < 3 && !points.isEmpty(); k++) {
      squares += (high[k] - low[k]) * (high[k] - low[k]);
    }
    return Math.max(Math.sqrt(squares), 1e-6);
  }

  /**
   * Draws the structure with all gauges and loads.
   *
   * @return the figure; none where nothing has a known place
   */
  public Optional<Figure> overview() {
    if (results.gauges().stream().noneMatch(g -> place(g.point()).isPresent())) {
      return Optional.empty();
    }
    SpaceDrawing drawing = structure("structure");
    String configuration = results.gauges().get(0).configuration();
    for (Load load : results.loads()) {
      if (load.configuration().equals(configuration)) {
        arrows(drawing, load, true);
      }
    }
    for (Gauge gauge : results.gauges()) {
      if (gauge.configuration().equals(configuration)) {
        place(gauge.point()).ifPresent(at -> gauge(drawing, gauge, at));
      }
    }
    String heading = "The structure with its gauges and loads";
    String caption =
        "Blue dots with a stroke in the direction of a positive reading: gauges (hollow: base"
            + " gauges). Orange arrows: loads. Small white circles: joints; crosses: supports."
            + " In the web page the structure can be turned with the mouse or the arrow keys.";
    return Optional.of(
        new Figure("structure", heading, caption, WIDTH, HEIGHT, drawing.svg(heading, caption)));
  }

  /**
   * Draws each load case.
   *
   * @return one figure for each load of each configuration whose gauges have known places
   */
  public List<Figure> loadCases() {
    List<Figure> figures = new ArrayList<>();
    for (Load load : results.loads()) {
      loadCase("motion-" + (figures.size() + 1), load).ifPresent(figures::add);
    }
    return figures;
  }

  private Optional<Figure> loadCase(String id, Load load) {
    Map<String, Gauge> gauges = new LinkedHashMap<>();
    results.gauges().stream()
        .filter(g -> g.configuration().equals(load.configuration()))
        .filter(g -> g.kind().equals("displacement") && place(g.point()).isPresent())
        .forEach(g -> gauges.put(g.name(), g));
    List<Coefficient> measured =
        results.coefficients().stream()
            .filter(c -> c.configuration().equals(load.configuration()))
            .filter(c -> c.load().equals(load.name()) && gauges.containsKey(c.gauge()))
            .toList();
    double largest = measured.stream().mapToDouble(c -> Math.abs(c.value())).max().orElse(0);
    if (!(largest > 0)) {
      return Optional.empty();
    }
    double scale = SHARE * size / largest;
    SpaceDrawing drawing = structure(id);
    arrows(drawing, load, true);
    for (Coefficient c : measured) {
      Gauge gauge = gauges.get(c.gauge());
      if (gauge != null) {
        motions(drawing, gauge, c, comparison(c), scale);
      }
    }
    String unit = measured.get(0).unit();
    String heading = "Load " + load.name() + ": motions at the gauges";
    String caption =
        "Filled circle: measured"
            + (results.comparison().isEmpty()
                ? ""
                : "; ring on a dashed stroke: computed with the "
                    + (results.update().isPresent() ? "updated" : "nominal")
                    + " model")
            + ". The longest stroke stands for "
            + Rounded.significant(units.shown(largest, unit), 3)
            + " "
            + units.symbol(unit)
            + "; rotations and strains are not drawn.";
    return Optional.of(new Figure(id, heading, caption, WIDTH, HEIGHT, drawing.svg(heading, caption)));
  }

  private Optional<Comparison> comparison(Coefficient c) {
    return results.comparison().stream()
        .filter(
            other ->
                other.configuration().equals(c.configuration())
                    && other.gauge().equals(c.gauge())
                    && other.load().equals(c.load()))
        .findFirst();
  }

  private void motions(
      SpaceDrawing drawing,
      Gauge gauge,
      Coefficient c,
      Optional<Comparison> comparison,
      double scale) {
    double[] at = place(gauge.point()).orElseThrow();
    double[] measured = along(at, gauge.point().direction(), scale * c.value());
    drawing.line(List.of(at, measured), "stroke=\"#0072B2\" stroke-width=\"2.2\"");
    comparison.ifPresent(
        other -> {
          double value = other.updated().orElse(other.computed());
          double[] computed = along(at, gauge.point().direction(), scale * value);
          drawing.line(
              List.of(at, computed),
              "stroke=\"#D55E00\" stroke-width=\"1.4\" stroke-dasharray=\"4 3\"");
          drawing.dot(
              computed,
              5.5,
              "fill=\"none\" stroke=\"#D55E00\" stroke-width=\"1.6\"",
              gauge.name() + ", computed: " + shown(value, c.unit()));
        });
    drawing.dot(
        measured, 3.2, GAUGE, gauge.name() + ", measured: " + shown(c.value(), c.unit()));
    drawing.label(measured, gauge.name(), "fill=\"#1B1F24\"");
  }

  private String shown(double value, String unit) {
    return Rounded.significant(units.shown(value, unit), 4) + " " + units.symbol(unit);
  }

  private SpaceDrawing structure(String id) {
    Optional<Structure> structure = results.structure();
    SpaceDrawing drawing =
        new SpaceDrawing(
            id, WIDTH, HEIGHT, structure.map(Structure::up).orElse(List.of(0.0, 0.0, 1.0)));
    structure.ifPresent(
        s -> {
          s.members().forEach(member -> member(drawing, member));
          s.places().forEach(place -> place(drawing, place));
        });
    return drawing;
  }

  private static void member(SpaceDrawing drawing, Member member) {
    double[] a = array(member.startPoint());
    double[] b = array(member.endPoint());
    List<List<Double>> outline = member.outline();
    if (outline.size() > 2) {
      double[] x = unit(minus(b, a));
      double[] z = array(member.depthAxis());
      double[] y = cross(z, x);
      for (int k = 0; k < outline.size(); k++) {
        double[] p = across(outline.get(k), y, z);
        double[] q = across(outline.get((k + 1) % outline.size()), y, z);
        drawing.area(List.of(plus(a, p), plus(b, p), plus(b, q), plus(a, q)), OUTLINE);
      }
    }
    drawing.line(List.of(a, b), MEMBER);
  }

  private void place(SpaceDrawing drawing, Place place) {
    double[] at = array(place.point());
    String words = place.kind() + " " + place.name();
    if (place.kind().equals("support")) {
      double r = 0.02 * size;
      for (int k = 0; k < 3; k++) {
        double[] low = at.clone();
        double[] high = at.clone();
        low[k] -= r;
        high[k] += r;
        drawing.line(List.of(low, high), "stroke=\"#1B1F24\" stroke-width=\"2.4\"");
      }
      drawing.dot(at, 2, "fill=\"#1B1F24\"", words);
    } else if (place.kind().equals("link") && place.other().size() == 3) {
      drawing.line(
          List.of(at, array(place.other())),
          "stroke=\"#5A6470\" stroke-width=\"1.2\" stroke-dasharray=\"2 2\"");
    } else {
      drawing.dot(at, 4, JOINT, words);
    }
  }

  private void gauge(SpaceDrawing drawing, Gauge gauge, double[] at) {
    drawing.line(
        List.of(at, along(at, gauge.point().direction(), 0.05 * size)),
        "stroke=\"#0072B2\" stroke-width=\"1.6\"");
    drawing.dot(
        at,
        4,
        gauge.base() ? BASE_GAUGE : GAUGE,
        gauge.name() + ", " + gauge.kind() + ", " + gauge.point().place());
    drawing.label(at, gauge.name(), "fill=\"#00527F\"");
  }

  private void arrows(SpaceDrawing drawing, Load load, boolean labelled) {
    boolean first = labelled;
    for (Point point : load.points()) {
      if (place(point).isEmpty()) {
        continue;
      }
      double[] tip = place(point).get();
      double[] tail = along(tip, point.direction(), -0.14 * size);
      drawing.line(List.of(tail, tip), LOAD);
      drawing.keepClear(tail, tip);
      // The head, drawn as two strokes in a plane that holds the arrow.
      double[] direction = array(point.direction());
      double[] side = side(direction);
      double head = 0.03 * size;
      for (int sign = -1; sign <= 1; sign += 2) {
        double[] barb = new double[3];
        for (int k = 0; k < 3; k++) {
          barb[k] = tip[k] - head * direction[k] + sign * 0.5 * head * side[k];
        }
        drawing.line(List.of(barb, tip), LOAD);
      }
      if (first) {
        drawing.label(tail, load.name(), "fill=\"#8F3F00\" font-weight=\"bold\"");
        first = false;
      }
    }
  }

  private static double[] side(double[] direction) {
    double[] other =
        Math.abs(direction[2]) < 0.9 ? new double[] {0, 0, 1} : new double[] {1, 0, 0};
    return unit(cross(direction, other));
  }

  private static Optional<double[]> place(Point point) {
    return point.coordinates().size() == 3
        ? Optional.of(array(point.coordinates()))
        : Optional.empty();
  }

  private static double[] along(double[] from, List<Double> direction, double length) {
    double[] to = from.clone();
    for (int k = 0; k < 3; k++) {
      to[k] += length * direction.get(k);
    }
    return to;
  }

  private static double[] array(List<Double> list) {
    return list.stream().mapToDouble(Double::doubleValue).toArray();
  }

  private static double[] across(List<Double> yz, double[] y, double[] z) {
    double[] result = new double[3];
    for (int k = 0; k < 3; k++) {
      result[k] = yz.get(0) * y[k] + yz.get(1) * z[k];
    }
    return result;
  }

  private static double[] plus(double[] a, double[] b) {
    return new double[] {a[0] + b[0], a[1] + b[1], a[2] + b[2]};
  }

  private static double[] minus(double[] a, double[] b) {
    return new double[] {a[0] - b[0], a[1] - b[1], a[2] - b[2]};
  }

  private static double[] cross(double[] a, double[] b) {
    return new double[] {
      a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]
    };
  }

  private static double[] unit(double[] a) {
    double norm = Math.sqrt(a[0] * a[0] + a[1] * a[1] + a[2] * a[2]);
    return norm > 0 ? new double[] {a[0] / norm, a[1] / norm, a[2] / norm} : a;
  }
}
