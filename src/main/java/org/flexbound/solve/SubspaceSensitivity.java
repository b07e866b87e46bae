package org.flexbound.solve;

import java.util.Arrays;

/**
 * How the flexibility of the modes below the cut changes because the space they span turns. With K =
 * K(θ), M = M(θ) and mass-normalised modes, the invariant subspace of the modes i below the cut
 * changes by first-order perturbation (T. Kato 1966, Perturbation Theory for Linear Operators, ch. II)
 * so that
 *
 * <p>dG = −u_bᵀ dK u_c − Σ_i (1/λ_i) [ w_{b,i}ᵀ (dK − λ_i dM) φ_i (φ_i·c) + (b·φ_i) φ_iᵀ (dK − λ_i dM)
 * w_{c,i} ],
 *
 * <p>u = Σ_i φ_i (φ_i·b)/λ_i, w_{b,i} = Σ_{j beyond} φ_j (φ_j·b)/(λ_j − λ_i). No pair of modes on the
 * same side of the cut is divided by the difference of its eigenvalues: they may repeat and cross. The
 * first term is that of {@link Sensitivity}; this class gives the second. The mass depends on
 * stiffness only through the shear deflection of its shapes.
 */
final class SubspaceSensitivity implements Derivatives.Source {
  private final ModalModel modal;
  private final ModePart part;
  private final int gauges;

  /** By mode below the cut: all freedoms × (gauges, then loads). */
  private final double[][] beyond;

  SubspaceSensitivity(ModalModel modal, ModePart part, int gauges, int loads) {
    this.modal = modal;
    this.part = part;
    this.gauges = gauges;
    BeyondCut solver = new BeyondCut(modal, part);
    Transformation t = modal.structure().transformation();
    beyond = new double[part.cut()][];
    for (int k = 0; k < beyond.length; k++) {
      double[] fields = solver.fields(k);
      beyond[k] = new double[Math.multiplyExact(t.freedoms(), gauges + loads)];
      for (int c = 0; c < gauges + loads; c++) {
        t.expand(fields, c * part.unknowns(), beyond[k], c * t.freedoms());
      }
    }
  }

  /** Products of one element for one mode: by slot of the element, then gauge or load. */
  private static final class Products implements Element.SlotSink {
    private final int[] slots;
    private final @org.jspecify.annotations.Nullable Derivative[] kinds;
    private final double[] values;

    Products(int[] slots) {
      this.slots = slots;
      this.kinds = new Derivative[slots.length];
      this.values = new double[slots.length];
    }

    void clear() {
      Arrays.fill(values, 0);
    }

    private void put(int slot, Derivative kind, double value) {
      for (int s = 0; s < slots.length; s++) {
        if (slots[s] == slot) {
          kinds[s] = kind;
          values[s] += value;
          return;
        }
      }
    }

    @Override
    public void force(int slot, double byCompliance) {
      put(slot, Derivative.COMPLIANCE, byCompliance);
    }

    @Override
    public void motion(int slot, double byStiffness) {
      put(slot, Derivative.STIFFNESS, byStiffness);
    }

    @Override
    public void logarithm(int slot, double byLogarithm) {
      put(slot, Derivative.LOGARITHM, byLogarithm);
    }
  }

  @Override
  public void collect(
      boolean[] wanted,
      int gaugeFrom,
      int gaugeTo,
      int loadFrom,
      int loadTo,
      Sensitivity.Sink sink) {
    int[] columns = new int[gaugeTo - gaugeFrom + loadTo - loadFrom];
    for (int c = 0; c < columns.length; c++) {
      columns[c] =
          c < gaugeTo - gaugeFrom
              ? gaugeFrom + c
              : gauges + loadFrom + c - (gaugeTo - gaugeFrom);
    }
    for (int e = 0; e < modal.structure().elements().size(); e++) {
      Element element = modal.structure().elements().get(e);
      int[] slots = Arrays.stream(element.slots()).distinct().toArray();
      boolean any = Arrays.stream(slots).anyMatch(slot -> wanted[slot]);
      if (any) {
        element(e, element, slots, columns, wanted, gaugeFrom, gaugeTo, loadFrom, loadTo, sink);
        if (element instanceof MemberElement member) {
          mass(e, member, columns, wanted, gaugeFrom, gaugeTo, loadFrom, loadTo, sink);
        }
      }
    }
  }

  private void element(
      int e,
      Element element,
      int[] slots,
      int[] columns,
      boolean[] wanted,
      int gaugeFrom,
      int gaugeTo,
      int loadFrom,
      int loadTo,
      Sensitivity.Sink sink) {
    int size = modal.structure().transformation().freedoms();
    double[] basic = modal.state().basic(e);
    double[] stiffness = modal.state().stiffness();
    Products products = new Products(slots);
    double[][][] all = new double[part.cut()][columns.length][];
    for (int k = 0; k < part.cut(); k++) {
      double[] d = element.deformation(part.motions(k), 0, size);
      double[] s = Matrix6.times(basic, d);
      for (int c = 0; c < columns.length; c++) {
        double[] dw = element.deformation(beyond[k], columns[c], size);
        products.clear();
        element.derivatives(
            new Element.Work(stiffness, basic, Matrix6.times(basic, dw), dw, s, d), products);
        all[k][c] = products.values.clone();
      }
    }
    for (int p = 0; p < slots.length; p++) {
      Derivative kind = products.kinds[p];
      if (!wanted[slots[p]] || kind == null) {
        continue;
      }
      for (int g = gaugeFrom; g < gaugeTo; g++) {
        for (int l = loadFrom; l < loadTo; l++) {
          double sum = 0;
          for (int k = 0; k < part.cut(); k++) {
            double ofGauge = all[k][g - gaugeFrom][p];
            double ofLoad = all[k][gaugeTo - gaugeFrom + l - loadFrom][p];
            sum +=
                (ofGauge * part.projection(gauges + l, k) + part.projection(g, k) * ofLoad)
                    / part.below(k);
          }
          sink.add(slots[p], g, l, kind, sum);
        }
      }
    }
  }

  /** The share of the mass: the bending stiffness raises Φ, the shear stiffness lowers it. */
  private void mass(
      int e,
      MemberElement member,
      int[] columns,
      boolean[] wanted,
      int gaugeFrom,
      int gaugeTo,
      int loadFrom,
      int loadTo,
      Sensitivity.Sink sink) {
    double[] stiffness = modal.state().stiffness();
    int[][] pairs = {
      {member.slot(1), member.slot(5)}, {member.slot(2), member.slot(4)}
    };
    double[][] byShear = new double[0][];
    for (int about = 0; about < 2; about++) {
      boolean asked = wanted[pairs[about][0]] || wanted[pairs[about][1]];
      if (!asked || Double.isInfinite(stiffness[pairs[about][1]])) {
        continue;
      }
      if (byShear.length == 0) {
        byShear = modal.massByShear(e);
      }
      double[][] forms = new double[part.cut()][columns.length];
      for (int k = 0; k < part.cut(); k++) {
        double[] mine = times(byShear[about], member, part.motions(k), 0);
        for (int c = 0; c < columns.length; c++) {
          forms[k][c] = dot(mine, member, beyond[k], columns[c]);
        }
      }
      for (int g = gaugeFrom; g < gaugeTo; g++) {
        for (int l = loadFrom; l < loadTo; l++) {
          double sum = 0;
          for (int k = 0; k < part.cut(); k++) {
            sum +=
                forms[k][g - gaugeFrom] * part.projection(gauges + l, k)
                    + part.projection(g, k) * forms[k][gaugeTo - gaugeFrom + l - loadFrom];
          }
          for (int which = 0; which < 2; which++) {
            if (wanted[pairs[about][which]]) {
              sink.add(
                  pairs[about][which], g, l, Derivative.LOGARITHM, which == 0 ? sum : -sum);
            }
          }
        }
      }
    }
  }

  private static double[] times(double[] matrix, Element element, double[] motions, int from) {
    double[] result = new double[12];
    for (int i = 0; i < 12; i++) {
      for (int j = 0; j < 12; j++) {
        result[i] += matrix[12 * i + j] * motions[from + element.freedom(j)];
      }
    }
    return result;
  }

  private double dot(double[] forces, Element element, double[] fields, int column) {
    int from = column * modal.structure().transformation().freedoms();
    double sum = 0;
    for (int i = 0; i < 12; i++) {
      sum += forces[i] * fields[from + element.freedom(i)];
    }
    return sum;
  }
}
