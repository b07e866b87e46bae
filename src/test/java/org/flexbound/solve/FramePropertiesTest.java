package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What must hold for any frame. */
class FramePropertiesTest {
  /** A gauge and a load at each of several places, in the same direction. */
  private record Pairs(FrameModel model, List<Gauge> gauges, List<Load> loads) {
    static Pairs of(long seed) {
      Random random = new Random(seed + 100);
      List<Gauge> gauges = new ArrayList<>();
      List<Load> loads = new ArrayList<>();
      List<Station> stations =
          List.of(
              new Station.AtNode("K", new Vector(0.1, -0.2, 0.05)),
              new Station.OnMember("dh", 0.3),
              new Station.OnMember("ef", 0.6),
              new Station.AtNode("J", Vector.ZERO),
              new Station.OnMember("eg", 0.5),
              new Station.OnMember("gh", 0));
      for (int i = 0; i < stations.size(); i++) {
        Vector v =
            new Vector(random.nextGaussian(), random.nextGaussian(), random.nextGaussian());
        Direction direction = i == 3 ? Direction.about(v) : Direction.along(v);
        gauges.add(
            Frames.gauge(
                i == 3 ? GaugeKind.ROTATION : GaugeKind.DISPLACEMENT,
                stations.get(i),
                java.util.Optional.empty(),
                direction,
                java.util.Optional.empty()));
        loads.add(Frames.load(List.of(Frames.point(stations.get(i), direction, 1))));
      }
      return new Pairs(new RandomFrame(seed).model(), gauges, loads);
    }

    double[][] values() {
      return Frames.solve(model, gauges, loads).values();
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12, 13})
  void motionHereUnderALoadThereIsMotionThereUnderALoadHere(long seed) {
    double[][] g = Pairs.of(seed).values();
    for (int i = 0; i < g.length; i++) {
      for (int j = 0; j < i; j++) {
        assertThat(g[i][j]).isCloseTo(g[j][i], within(1e-12 * Math.sqrt(g[i][i] * g[j][j])));
      }
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12, 13})
  void theFlexibilityIsPositiveDefinite(long seed) {
    double[][] g = Pairs.of(seed).values();
    DMatrixRMaj scaled = new DMatrixRMaj(g.length, g.length);
    for (int i = 0; i < g.length; i++) {
      for (int j = 0; j < g.length; j++) {
        scaled.set(i, j, (g[i][j] + g[j][i]) / 2 / Math.sqrt(g[i][i] * g[j][j]));
      }
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen =
        DecompositionFactory_DDRM.eig(g.length, false, true);
    eigen.decompose(scaled);
    for (int i = 0; i < g.length; i++) {
      assertThat(eigen.getEigenvalue(i).getReal()).isGreaterThan(1e-6);
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12})
  void rigidBodyMotionCostsNoForceInAnyMemberOrConnection(long seed) {
    FrameModel model = new RandomFrame(seed).model();
    MeshBuilder builder = new MeshBuilder(model);
    builder.divide(new PlaceFinder(model, new org.flexbound.finding.Findings())
        .of(Frames.gauge("ef@0.4", "z")).get(0));
    Mesh mesh = builder.build();
    double[] stiffness = mesh.slots().set(List.of(), List.of());
    Vector turn = new Vector(0.3, -0.7, 0.5);
    double[] motions = new double[mesh.freedoms()];
    for (int p = 0; p < mesh.pointCount(); p++) {
      Vector u = new Vector(1, 2, -1).plus(turn.cross(mesh.places().get(p)));
      double[] six = {u.x(), u.y(), u.z(), turn.x(), turn.y(), turn.z()};
      System.arraycopy(six, 0, motions, 6 * p, 6);
    }
    List<Element> elements = new ArrayList<>(mesh.members());
    mesh.springs().stream().filter(s -> s.points.length == 2).forEach(elements::add);
    assertThat(elements).hasSizeGreaterThan(13);
    for (Element element : elements) {
      double[] d = element.deformation(motions, 0, motions.length);
      for (double one : d) {
        assertThat(one).isCloseTo(0, within(1e-14 * 10));
      }
      if (element instanceof MemberElement) {
        double[] k = new double[144];
        element.stiffness(element.basic(stiffness), k);
        for (int i = 0; i < 12; i++) {
          double force = 0;
          double size = 0;
          for (int j = 0; j < 12; j++) {
            force += k[12 * i + j] * motions[element.freedom(j)];
            size += Math.abs(k[12 * i + j] * motions[element.freedom(j)]);
          }
          assertThat(force).isCloseTo(0, within(1e-12 * size));
        }
      }
    }
  }

  private static void same(double[][] actual, double[][] expected, double tolerance) {
    for (int g = 0; g < expected.length; g++) {
      double size = 0;
      for (double value : expected[g]) {
        size = Math.max(size, Math.abs(value));
      }
      for (int l = 0; l < expected[g].length; l++) {
        assertThat(actual[g][l])
            .as("gauge %s, load %s", g, l)
            .isCloseTo(expected[g][l], within(tolerance * size));
      }
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12})
  void turningAndShiftingTheWholeModelChangesNothing(long seed) {
    RandomFrame frame = new RandomFrame(seed);
    double[][] before = Frames.solve(frame.model(), frame.gauges(), frame.loads()).values();
    MovedFrame moved =
        MovedFrame.of(
            frame.model(),
            frame.gauges(),
            frame.loads(),
            new Vector(0.4, 0.7, -0.3),
            new Vector(30, -20, 12));
    same(Frames.solve(moved.model(), moved.gauges(), moved.loads()).values(), before, 1e-10);
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12})
  void theOrderOfNodesAndPartsInTheFileChangesNothing(long seed) {
    RandomFrame frame = new RandomFrame(seed);
    FrameModel model = frame.model();
    double[][] before = Frames.solve(model, frame.gauges(), frame.loads()).values();
    Random random = new Random(seed);
    FrameModel shuffled =
        new FrameModel(
            model.units(),
            model.up(),
            shuffled(model.nodes(), random),
            shuffled(model.materials(), random),
            shuffled(model.sections(), random),
            shuffled(model.members(), random),
            shuffled(model.joints(), random),
            shuffled(model.connections(), random),
            shuffled(model.supports(), random),
            model.rigidLinks(),
            model.masses(),
            model.source());
    same(Frames.solve(shuffled, frame.gauges(), frame.loads()).values(), before, 1e-11);
  }

  private static <T> Map<String, T> shuffled(Map<String, T> map, Random random) {
    List<String> names = new ArrayList<>(map.keySet());
    Collections.shuffle(names, random);
    Map<String, T> result = new LinkedHashMap<>();
    names.forEach(
        name -> {
          T value = map.get(name);
          if (value != null) {
            result.put(name, value);
          }
        });
    return result;
  }

  private static final String TWO_WAYS =
      """
      {"units": {"length": "%s", "force": "%s", "mass": "kg", "angle": "%s"},
       "nodes": {"a": [0, 0, 0], "b": [0, 0, %s], "c": [%s, 0, %s]},
       "materials": {"m": {"E": %s, "nu": 0.3}},
       "sections": {"s": {"shape": "rectangle", "depth": %s, "width": %s}},
       "joints": {"k": {"ry": %s}},
       "members": {"post": {"nodes": ["a", "b"], "section": "s", "material": "m",
                            "reference": [1, 0, 0], "joints": {"start": "k"}},
                   "arm": {"nodes": ["b", "c"], "section": "s", "material": "m"}},
       "supports": {"a": {"x": "fixed", "y": "fixed", "z": %s, "rx": "fixed", "ry": "fixed",
                          "rz": "fixed"}}}
      """;

  @Test
  void theUnitsOfTheFileChangeNothing() {
    String metric =
        TWO_WAYS.formatted("m", "N", "rad", 2.54, 1.27, 2.54, 2e11, 0.127, 0.0508, 3e5, 4e7);
    double pound = 4.4482216152605;
    String other =
        TWO_WAYS.formatted(
            "in",
            "lbf",
            "deg",
            100,
            50,
            100,
            2e11 / pound * 0.0254 * 0.0254,
            5,
            2,
            3e5 / pound / 0.0254 * Math.PI / 180,
            4e7 / pound * 0.0254);
    List<Gauge> gauges = List.of(Frames.gauge("c", "z"), Frames.gauge("c", "ry"));
    List<Load> loads = List.of(Frames.load("c", "z"), Frames.load("b", "y"));
    same(
        Frames.solve(Frames.model(other), gauges, loads).values(),
        Frames.solve(Frames.model(metric), gauges, loads).values(),
        1e-11);
  }

  @Test
  void compliancesAddInSeriesAndStiffnessesInParallel() {
    String text =
        """
        {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
         "nodes": {"a": [0, 0, 0], "b": [0, 0, 0], "c": [0, 0, 0]},
         "joints": {"one": {"x": 2e6, "rz": 5e4}, "two": {"x": 7e6, "rz": 3e4}},
         "connections": {%s},
         "supports": {"a": {"x": "fixed", "y": "fixed", "z": "fixed", "rx": "fixed", "ry": "fixed",
                            "rz": "fixed"}%s}}
        """;
    FrameModel series =
        Frames.model(
            text.formatted(
                "\"p\": {\"nodes\": [\"a\", \"b\"], \"joint\": \"one\"},"
                    + " \"q\": {\"nodes\": [\"b\", \"c\"], \"joint\": \"two\"}",
                ""));
    FrameModel parallel =
        Frames.model(
            text.formatted(
                "\"p\": {\"nodes\": [\"a\", \"c\"], \"joint\": \"one\"},"
                    + " \"q\": {\"nodes\": [\"a\", \"c\"], \"joint\": \"two\"}",
                ", \"b\": {\"x\": \"fixed\", \"y\": \"fixed\", \"z\": \"fixed\", \"rx\": \"fixed\","
                    + " \"ry\": \"fixed\", \"rz\": \"fixed\"}"));
    assertThat(Frames.coefficient(series, Frames.gauge("c", "x"), Frames.load("c", "x")))
        .isCloseTo(1 / 2e6 + 1 / 7e6, within(1e-18));
    assertThat(Frames.coefficient(series, Frames.gauge("c", "rz"), Frames.load("c", "rz")))
        .isCloseTo(1 / 5e4 + 1 / 3e4, within(1e-16));
    assertThat(Frames.coefficient(parallel, Frames.gauge("c", "x"), Frames.load("c", "x")))
        .isCloseTo(1 / 9e6, within(1e-18));
    assertThat(Frames.coefficient(parallel, Frames.gauge("c", "rz"), Frames.load("c", "rz")))
        .isCloseTo(1 / 8e4, within(1e-16));
  }

  @ParameterizedTest
  @ValueSource(strings = {"joints.soft.ry", "connections.tie.x", "supports.B.z"})
  void aStiffnessTakenTo1e12ApproachesRigid(String text) {
    RandomFrame frame = new RandomFrame(14);
    StiffnessPath path = StiffnessPath.parse(text).orElseThrow();
    double[][] rigid = with(frame, path, Double.POSITIVE_INFINITY);
    double before = Double.POSITIVE_INFINITY;
    for (double k : new double[] {1e8, 1e10, 1e12}) {
      double[][] stiff = with(frame, path, k);
      double away = 0;
      for (int g = 0; g < 4; g++) {
        for (int l = 0; l < 4; l++) {
          away = Math.max(away, Math.abs(stiff[g][l] - rigid[g][l]));
        }
      }
      assertThat(away).isLessThan(before);
      before = away / 50;
    }
    same(with(frame, path, 1e12), rigid, 1e-5);
  }

  private static double[][] with(RandomFrame frame, StiffnessPath path, double stiffness) {
    FrameModel model = frame.model().with(Map.of(path, new StiffnessSetting.Value(stiffness)));
    return Frames.solve(model, frame.gauges(), frame.loads()).values();
  }
}
