package org.flexbound.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.flexbound.frame.FrameModel;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/**
 * A well-conditioned random frame with every kind of part, and gauges and loads of every kind. The
 * same seed gives the same frame.
 */
final class RandomFrame {
  private final Random random;
  private final FrameModel model;
  private final List<Gauge> gauges = new ArrayList<>();
  private final List<Load> loads = new ArrayList<>();

  RandomFrame(long seed) {
    random = new Random(seed);
    model = Frames.model(json());
    gaugesAndLoads();
  }

  FrameModel model() {
    return model;
  }

  List<Gauge> gauges() {
    return gauges;
  }

  List<Load> loads() {
    return loads;
  }

  private double between(double low, double high) {
    return low + random.nextDouble() * (high - low);
  }

  private String number(double low, double high) {
    return String.format(Locale.ROOT, "%.6g", between(low, high));
  }

  private String place(double x, double y, double z) {
    return String.format(
        Locale.ROOT,
        "[%.4f, %.4f, %.4f]",
        x + between(-0.3, 0.3),
        y + between(-0.3, 0.3),
        z + between(-0.3, 0.3));
  }

  private String vector(double size) {
    return "[" + number(-size, size) + ", " + number(-size, size) + ", " + number(-size, size) + "]";
  }

  private String matrix() {
    double[][] a = new double[6][6];
    double[][] half = new double[6][6];
    for (double[] row : half) {
      for (int i = 0; i < 6; i++) {
        row[i] = between(-1, 1);
      }
    }
    StringBuilder text = new StringBuilder("[");
    for (int i = 0; i < 6; i++) {
      text.append(i == 0 ? "[" : ", [");
      for (int j = 0; j < 6; j++) {
        for (int k = 0; k < 6; k++) {
          a[i][j] += half[i][k] * half[j][k];
        }
        a[i][j] += i == j ? 1 : 0;
        text.append(j == 0 ? "" : ", ").append(a[i][j] * 3e6);
      }
      text.append("]");
    }
    return text.append("]").toString();
  }

  private String json() {
    return """
        {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
         "nodes": {
           "A": %s, "B": %s, "C": %s, "D": %s,
           "E": %s, "F": %s, "G": %s, "H": %s, "I": %s, "J": %s, "K": %s},
         "materials": {
           "steel": {"E": 210e9, "nu": 0.3, "density": 7850},
           "alloy": {"E": 70e9, "G": 26e9, "density": 2700}},
         "sections": {
           "numbers": {"A": 4e-3, "Iy": 2e-5, "Iz": 1e-5, "J": 1.5e-5, "Ay": 2e-3, "Az": 1.8e-3},
           "thin": {"A": 3e-3, "Iy": 1.5e-5, "Iz": 1e-5, "J": 1e-5},
           "box": {"shape": "rectangular hollow", "depth": 0.2, "width": 0.15, "wall": 0.01},
           "small": {"shape": "rectangular hollow", "depth": 0.12, "width": 0.1, "wall": 0.008},
           "angle": {"shape": "angle", "depth": 0.2, "width": 0.15, "wall": 0.04},
           "channel": {"shape": "channel", "depth": 0.2, "width": 0.1, "web": 0.02, "flange": 0.03},
           "bar": {"shape": "solid round", "diameter": 0.08}},
         "joints": {
           "knee": {"ry": %s, "rz": %s},
           "soft": {"x": %s, "y": %s, "z": %s, "rx": %s, "ry": %s, "rz": %s},
           "pin": {"ry": "free", "rz": "free", "rx": "free"},
           "pinned": {"ry": "free", "rz": "free"},
           "full": {"matrix": %s},
           "half": {"ry": %s, "x": %s}},
         "members": {
           "ae": {"nodes": ["A", "E"], "section": "numbers", "material": "steel", "joints": {"start": "knee"}},
           "bf": {"nodes": ["B", "F"], "section": "box", "material": "steel", "reference": %s},
           "cg": {"nodes": ["C", "G"], "section": "thin", "material": "alloy", "joints": {"end": "soft"}},
           "dh": {"nodes": ["D", "H"], "section": "box", "endSection": "small", "material": "steel"},
           "ef": {"nodes": ["E", "F"], "section": "numbers", "material": "alloy",
                  "offsets": {"start": %s, "end": %s}, "joints": {"start": "knee", "end": "pinned"}},
           "fg": {"nodes": ["F", "G"], "section": "angle", "material": "steel", "joints": {"end": "full"}},
           "gh": {"nodes": ["G", "H"], "section": "channel", "material": "steel", "joints": {"start": "knee"}},
           "he": {"nodes": ["H", "E"], "section": "box", "material": "steel", "joints": {"start": "soft"}},
           "eg": {"nodes": ["E", "G"], "section": "bar", "material": "steel", "joints": {"start": "pin", "end": "pin"}},
           "hi": {"nodes": ["H", "I"], "section": "box", "endSection": "small", "material": "steel", "joints": {"end": "knee"}},
           "ik": {"nodes": ["I", "K"], "section": "small", "material": "steel"}},
         "connections": {
           "splice": {"nodes": ["F", "J"], "joint": "soft", "axes": {"x": [1, 1, 0], "y": [-1, 1, 0]}},
           "tie": {"nodes": ["J", "K"], "joint": "half", "at": [2, 2, 3]},
           "block": {"nodes": ["G", "I"], "joint": "full"}},
         "supports": {
           "A": {"x": "fixed", "y": "fixed", "z": "fixed", "rx": "fixed", "ry": "fixed", "rz": "fixed"},
           "B": {"x": %s, "y": %s, "z": "fixed", "rx": %s, "ry": %s, "rz": %s},
           "C": {"x": "fixed", "y": "fixed", "axes": {"x": [1, 2, 0.5], "y": [-2, 1, 0]}},
           "D": {"x": "fixed", "y": %s, "z": %s, "ry": %s}}
        }
        """
        .formatted(
            place(0, 0, 0),
            place(3, 0, 0),
            place(3, 3, 0),
            place(0, 3, 0),
            place(0, 0, 3),
            place(3, 0, 3),
            place(3, 3, 3),
            place(0, 3, 3),
            place(1.5, 3, 5),
            place(3.2, 0.5, 3.5),
            place(2, 1.5, 5),
            number(5e5, 5e6),
            number(5e5, 5e6),
            number(1e7, 1e8),
            number(1e7, 1e8),
            number(1e7, 1e8),
            number(5e5, 5e6),
            number(5e5, 5e6),
            number(5e5, 5e6),
            matrix(),
            number(5e5, 5e6),
            number(1e7, 1e8),
            vector(1),
            vector(0.15),
            vector(0.15),
            number(1e7, 1e8),
            number(1e7, 1e8),
            number(5e5, 5e6),
            number(5e5, 5e6),
            number(5e5, 5e6),
            number(1e7, 1e8),
            number(1e7, 1e8),
            number(5e5, 5e6));
  }

  private Vector anyDirection() {
    return new Vector(between(-1, 1), between(-1, 1), between(0.1, 1));
  }

  private Station station(int kind) {
    return switch (kind % 4) {
      case 0 -> new Station.AtNode("K", new Vector(between(-0.2, 0.2), 0.1, 0.05));
      case 1 -> new Station.OnMember("dh", between(0.2, 0.8));
      case 2 -> new Station.OnMember("gh", 0);
      default -> new Station.AtNode("J", Vector.ZERO);
    };
  }

  private void gaugesAndLoads() {
    for (int i = 0; i < 4; i++) {
      Direction along = Direction.along(anyDirection());
      gauges.add(
          Frames.gauge(
              GaugeKind.DISPLACEMENT,
              station(i),
              java.util.Optional.empty(),
              along,
              java.util.Optional.empty()));
      loads.add(Frames.load(List.of(Frames.point(station(i), along, 1))));
    }
    gauges.add(
        Frames.gauge(
            GaugeKind.ROTATION,
            station(1),
            java.util.Optional.empty(),
            Direction.about(anyDirection()),
            java.util.Optional.empty()));
    gauges.add(
        Frames.gauge(
            GaugeKind.RELATIVE,
            new Station.AtNode("F", Vector.ZERO),
            java.util.Optional.of(new Station.AtNode("J", Vector.ZERO)),
            Direction.along(anyDirection()),
            java.util.Optional.empty()));
    gauges.add(Frames.strain("dh@0.37", 0.05, 0.06));
    gauges.add(Frames.strain("fg@1", 0.03, -0.02));
    gauges.add(Frames.strain("ae@0", -0.03, 0.05));
    gauges.add(Frames.strain("eg@0.5", 0, 0));
    loads.add(
        Frames.load(
            List.of(Frames.point(station(0), Direction.about(anyDirection()), 1))));
    loads.add(
        Frames.load(
            List.of(
                Frames.point(station(3), Direction.along(anyDirection()), 0.25),
                Frames.point(station(1), Direction.along(anyDirection()), 0.75))));
  }
}
