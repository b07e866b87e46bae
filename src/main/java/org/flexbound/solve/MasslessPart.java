package org.flexbound.solve;

import java.util.Arrays;
import org.flexbound.sparse.SparsePattern;
import org.flexbound.sparse.SymbolicFactor;
import org.flexbound.sparse.SymmetricMatrix;

/**
 * What no number of modes makes: freedoms without mass follow the others statically, so that the
 * modes leave bᵀ K_mm⁻¹ c over the massless freedoms m. Zero where every freedom has mass.
 */
final class MasslessPart {
  private MasslessPart() {}

  static double[][] of(ModalModel modal) {
    int gauges = modal.frame().gauges().size();
    double[][] result = new double[gauges][modal.frame().loads().size()];
    double[] mass = modal.massMatrix().diagonal();
    int[] number = new int[mass.length];
    int count = 0;
    for (int i = 0; i < mass.length; i++) {
      number[i] = mass[i] == 0 ? count++ : -1;
    }
    if (count == 0) {
      return result;
    }
    double[] columns = reduced(modal, number, count);
    double[] solved = columns.clone();
    SymmetricMatrix k = part(modal.stiffness(), number, count);
    SymbolicFactor.analyze(k.pattern()).cholesky(k).solve(solved, solved.length / count);
    for (int g = 0; g < gauges; g++) {
      for (int l = 0; l < result[g].length; l++) {
        for (int i = 0; i < count; i++) {
          result[g][l] += columns[g * count + i] * solved[(gauges + l) * count + i];
        }
      }
    }
    return result;
  }

  private static double[] reduced(ModalModel modal, int[] number, int count) {
    Functional[] all = modal.frame().columns();
    Transformation t = modal.structure().transformation();
    double[] result = new double[Math.multiplyExact(count, all.length)];
    for (int c = 0; c < all.length; c++) {
      double[] forces = new double[t.freedoms()];
      all[c].addTo(forces, 0, modal.structure(), modal.state());
      double[] reduced = new double[number.length];
      t.reduce(forces, 0, reduced, 0);
      for (int i = 0; i < number.length; i++) {
        if (number[i] >= 0) {
          result[c * count + number[i]] = reduced[i];
        }
      }
    }
    return result;
  }

  private static SymmetricMatrix part(SymmetricMatrix k, int[] number, int count) {
    int[] starts = k.pattern().columnStarts();
    int[] rows = k.pattern().rows();
    double[] values = k.values();
    int[] newStarts = new int[count + 1];
    int[] newRows = new int[rows.length];
    double[] newValues = new double[rows.length];
    int at = 0;
    for (int j = 0; j < number.length; j++) {
      if (number[j] < 0) {
        continue;
      }
      for (int p = starts[j]; p < starts[j + 1]; p++) {
        if (number[rows[p]] >= 0) {
          newRows[at] = number[rows[p]];
          newValues[at++] = values[p];
        }
      }
      newStarts[number[j] + 1] = at;
    }
    return SymmetricMatrix.of(
        SparsePattern.of(newStarts, Arrays.copyOf(newRows, at)), Arrays.copyOf(newValues, at));
  }
}
