package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.SectionPoint;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.junit.jupiter.api.Test;

/** Derivatives by places and directions against gauges and loads that really stand elsewhere. */
class PlaceDerivativesTest {
  private static final double H = 1e-4;
  private static final Vector[] AXES = {
    new Vector(1, 0, 0), new Vector(0, 1, 0), new Vector(0, 0, 1)
  };

  private final RandomFrame frame = new RandomFrame(21);
  private final FlexibilitySolution solution =
      Frames.solve(frame.model(), frame.gauges(), frame.loads());

  private static Station shifted(Station station, Vector by) {
    Station.AtNode node = (Station.AtNode) station;
    return new Station.AtNode(node.node(), node.offset().plus(by));
  }

  /** A direction turned by a small rotation, exactly. */
  private static Direction turned(Direction d, Vector turn) {
    Vector k = turn.unit();
    double a = turn.norm();
    Vector v = d.vector();
    Vector next =
        v.times(Math.cos(a))
            .plus(k.cross(v).times(Math.sin(a)))
            .plus(k.times(k.dot(v) * (1 - Math.cos(a))));
    return new Direction(d.rotation(), next);
  }

  private static Gauge with(Gauge g, Station station, Direction direction) {
    return Frames.gauge(g.kind(), station, g.second(), direction, g.sectionPoint());
  }

  @Test
  void aGaugeMovedAndTurnedReadsWhatItsDerivativesForetell() {
    for (int g : new int[] {0, 3, 5}) {
      Gauge gauge = frame.gauges().get(g);
      double[][][] exact = solution.byGaugePlace(g);
      for (int i = 0; i < 6; i++) {
        double[][] difference = new double[1][];
        for (int sign : new int[] {1, -1}) {
          Vector by = AXES[i % 3].times(sign * H);
          Gauge moved =
              i < 3
                  ? with(gauge, shifted(gauge.station(), by), gauge.direction())
                  : with(gauge, gauge.station(), turned(gauge.direction(), by));
          double[] row =
              Frames.solve(frame.model(), List.of(moved), frame.loads()).values()[0];
          if (sign == 1) {
            difference[0] = row;
          } else {
            for (int l = 0; l < row.length; l++) {
              difference[0][l] = (difference[0][l] - row[l]) / (2 * H);
            }
          }
        }
        for (int l = 0; l < frame.loads().size(); l++) {
          double own = exact[0][l][i];
          if (i >= 3 && gauge.second().isPresent()) {
            // Turning the gauge turns the direction at both of its places.
            own += exact[1][l][i];
          }
          assertThat(own)
              .as("gauge %s, load %s, %s", g, l, i)
              .isCloseTo(difference[0][l], within(1e-6 * size(exact[0][l], difference[0][l])));
        }
      }
    }
  }

  private static double size(double[] values, double another) {
    double size = Math.abs(another);
    for (double value : values) {
      size = Math.max(size, Math.abs(value));
    }
    return size;
  }

  @Test
  void aLoadMovedAndTurnedDoesWhatItsDerivativesForetell() {
    for (int l : new int[] {0, 3, 5}) {
      Load load = frame.loads().get(l);
      double[][][] exact = solution.byLoadPlace(l);
      LoadPoint first = load.points().get(0);
      for (int i = 0; i < 6; i++) {
        double[][] values = new double[2][];
        for (int sign = 0; sign < 2; sign++) {
          Vector by = AXES[i % 3].times((1 - 2 * sign) * H);
          List<LoadPoint> points = new ArrayList<>(load.points());
          points.set(
              0,
              i < 3
                  ? Frames.point(shifted(first.station(), by), first.direction(), first.share())
                  : Frames.point(first.station(), turned(first.direction(), by), first.share()));
          double[][] all =
              Frames.solve(frame.model(), frame.gauges(), List.of(Frames.load(points))).values();
          values[sign] = new double[all.length];
          for (int g = 0; g < all.length; g++) {
            values[sign][g] = all[g][0];
          }
        }
        for (int g = 0; g < frame.gauges().size(); g++) {
          double expected = (values[0][g] - values[1][g]) / (2 * H);
          assertThat(exact[0][g][i])
              .as("load %s, gauge %s, %s", l, g, i)
              .isCloseTo(expected, within(1e-6 * size(exact[0][g], expected)));
        }
      }
    }
  }

  @Test
  void aStrainGaugeMovedOnItsMemberReadsWhatItsDerivativesForetell() {
    // On a uniform member: along it, and across its section.
    double at = 0.4;
    double length =
        frame
            .model()
            .end(frame.model().members().get("ae"))
            .minus(frame.model().start(frame.model().members().get("ae")))
            .norm();
    Gauge gauge = Frames.strain("ae@" + at, 0.04, 0.03);
    FlexibilitySolution there = Frames.solve(frame.model(), List.of(gauge), frame.loads());
    double[][] exact = there.byGaugePlace(0)[0];
    org.flexbound.frame.Axes axes = frame.model().axes(frame.model().members().get("ae"));
    for (int i = 0; i < 3; i++) {
      Vector along = axes.axis(i);
      double[][] rows = new double[2][];
      for (int sign = 0; sign < 2; sign++) {
        double h = (1 - 2 * sign) * H;
        Gauge moved =
            Frames.gauge(
                GaugeKind.STRAIN,
                new Station.OnMember("ae", i == 0 ? at + h / length : at),
                java.util.Optional.empty(),
                gauge.direction(),
                java.util.Optional.of(
                    new SectionPoint(i == 1 ? 0.04 + h : 0.04, i == 2 ? 0.03 + h : 0.03)));
        rows[sign] = Frames.solve(frame.model(), List.of(moved), frame.loads()).values()[0];
      }
      for (int l = 0; l < frame.loads().size(); l++) {
        double expected = (rows[0][l] - rows[1][l]) / (2 * H);
        double own = along.x() * exact[l][0] + along.y() * exact[l][1] + along.z() * exact[l][2];
        assertThat(own)
            .as("load %s, axis %s", l, i)
            .isCloseTo(expected, within(1e-6 * size(exact[l], expected)));
      }
    }
  }
}
