package org.flexbound.solve;

import java.util.List;

/**
 * Derivatives of all coefficients by single stiffnesses, from the motions under loads and under the
 * unit loads of gauges: for a force s_i of gauge i and s_j of load j in a part of flexibility F/θ,
 * ∂a_ij/∂(1/θ) = s_iᵀ F s_j; for a spring ∂a_ij/∂θ = −δ_i δ_j. A strain gauge's unit load is an
 * imposed strain; where its row itself depends on θ, that is added.
 */
final class Sensitivity implements Derivatives.Source {
  private final Structure structure;
  private final State state;
  private final Fields fields;
  private final List<Functional> gauges;

  Sensitivity(Structure structure, State state, Fields fields, List<Functional> gauges) {
    this.structure = structure;
    this.state = state;
    this.fields = fields;
    this.gauges = gauges;
  }

  /** Is told derivatives. */
  @FunctionalInterface
  interface Sink {
    /**
     * A derivative.
     *
     * @param slot by which stiffness
     * @param gauge the gauge
     * @param load the load
     * @param kind in which form it is regular
     * @param value the derivative in that form
     */
    void add(int slot, int gauge, int load, Derivative kind, double value);
  }

  /** Turns a derivative in the form in which it is regular into another. */
  static double convert(Derivative from, double value, Derivative to, double stiffness) {
    if (from == to) {
      return value;
    }
    double logarithm =
        switch (from) {
          case LOGARITHM -> value;
          case COMPLIANCE -> Double.isInfinite(stiffness) ? 0 : -value / stiffness;
          case STIFFNESS -> value * stiffness;
        };
    return switch (to) {
      case LOGARITHM -> logarithm;
      case COMPLIANCE -> from == Derivative.STIFFNESS
          ? -value * stiffness * stiffness
          : -logarithm * stiffness;
      case STIFFNESS -> Double.isInfinite(stiffness) || stiffness == 0
          ? 0
          : logarithm / stiffness;
    };
  }

  /** Goes through the elements that have one of the slots. */
  @Override
  public void collect(
      boolean[] wanted, int gaugeFrom, int gaugeTo, int loadFrom, int loadTo, Sink sink) {
    for (int e = 0; e < structure.elements().size(); e++) {
      Element element = structure.elements().get(e);
      if (!touches(element, wanted)) {
        continue;
      }
      double[][] sg = new double[gaugeTo - gaugeFrom][];
      double[][] dg = new double[gaugeTo - gaugeFrom][];
      for (int g = gaugeFrom; g < gaugeTo; g++) {
        dg[g - gaugeFrom] = element.deformation(fields.motions(), g, fields.size());
        double[] strained = dg[g - gaugeFrom];
        if (imposed(g, e)) {
          strained = strained.clone();
          double[] row = gauges.get(g).strain().orElseThrow().row(state.stiffness());
          for (int i = 0; i < 6; i++) {
            strained[i] -= row[i];
          }
          dg[g - gaugeFrom] = strained;
        }
        sg[g - gaugeFrom] = Matrix6.times(state.basic(e), strained);
      }
      for (int l = loadFrom; l < loadTo; l++) {
        double[] dl = element.deformation(fields.motions(), gauges.size() + l, fields.size());
        double[] sl = Matrix6.times(state.basic(e), dl);
        if (element instanceof MemberElement member && member.isPlain()) {
          plain(member, wanted, sg, gaugeFrom, l, sl, sink);
        } else {
          for (int g = gaugeFrom; g < gaugeTo; g++) {
            Element.Work work =
                new Element.Work(
                    state.stiffness(),
                    state.basic(e),
                    sg[g - gaugeFrom],
                    dg[g - gaugeFrom],
                    sl,
                    dl);
            element.derivatives(work, new Told(wanted, g, l, sink));
          }
        }
        for (int g = gaugeFrom; g < gaugeTo; g++) {
          if (imposed(g, e)) {
            explicit(gauges.get(g).strain().orElseThrow(), wanted, g, l, sl, sink);
          }
        }
      }
    }
    for (int n = 0; n < structure.gaps().size(); n++) {
      int slot = structure.gaps().get(n).slot();
      if (wanted[slot]) {
        for (int g = gaugeFrom; g < gaugeTo; g++) {
          for (int l = loadFrom; l < loadTo; l++) {
            double product = fields.gapForce(g, n) * fields.gapForce(gauges.size() + l, n);
            sink.add(slot, g, l, Derivative.COMPLIANCE, product);
          }
        }
      }
    }
  }

  private boolean imposed(int gauge, int element) {
    return gauges.get(gauge).strain().filter(s -> s.element() == element).isPresent();
  }

  private static boolean touches(Element element, boolean[] wanted) {
    for (int slot : element.slots()) {
      if (wanted[slot]) {
        return true;
      }
    }
    return false;
  }

  /** A member piece without joints: one product with F for all gauges. */
  private static void plain(
      MemberElement member,
      boolean[] wanted,
      double[][] sg,
      int gaugeFrom,
      int load,
      double[] sl,
      Sink sink) {
    for (int p = 0; p < 6; p++) {
      int slot = member.slot(p);
      if (wanted[slot]) {
        double[] d = Matrix6.times(member.unit().part(p), sl);
        for (int g = 0; g < sg.length; g++) {
          sink.add(
              slot, g + gaugeFrom, load, Derivative.COMPLIANCE, Matrix6.dot(sg[g], d));
        }
      }
    }
  }

  /** A strain is (section force)/θ: where θ grows, it falls by itself. */
  private void explicit(
      Functional.Strain strain, boolean[] wanted, int gauge, int load, double[] sl, Sink sink) {
    for (int p = 0; p < strain.slots().length; p++) {
      int slot = strain.slots()[p];
      if (wanted[slot]) {
        double part = Matrix6.dot(strain.rows()[p], sl) / state.stiffness()[slot];
        sink.add(slot, gauge, load, Derivative.LOGARITHM, -part);
      }
    }
  }

  @SuppressWarnings("ArrayRecordComponent") // lives for one element and load only
  private record Told(boolean[] wanted, int gauge, int load, Sink sink)
      implements Element.SlotSink {
    @Override
    public void force(int slot, double byCompliance) {
      tell(slot, Derivative.COMPLIANCE, byCompliance);
    }

    @Override
    public void motion(int slot, double byStiffness) {
      tell(slot, Derivative.STIFFNESS, byStiffness);
    }

    @Override
    public void logarithm(int slot, double byLogarithm) {
      tell(slot, Derivative.LOGARITHM, byLogarithm);
    }

    private void tell(int slot, Derivative kind, double value) {
      if (wanted[slot]) {
        sink.add(slot, gauge, load, kind, value);
      }
    }
  }
}
