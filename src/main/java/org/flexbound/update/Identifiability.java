package org.flexbound.update;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

/**
 * Which parameters the data identify by themselves, and which only together.
 *
 * <p>For a parameter that is not identified, others are held one after another, each time the one
 * that tells most about it (largest squared partial correlation of the posterior), until it would be
 * identified; those held form its collinear group with it. Groups that share a parameter are one.
 * What a group determines are the directions of its posterior covariance, the rest integrated out,
 * in which more than 90 % of the prior variance is removed.
 */
final class Identifiability {
  /** More than this share of the prior variance removed: identified. */
  static final double MUCH = 0.90;

  /** Less than this share removed: not identifiable. */
  static final double LITTLE = 0.05;

  /** A partner that explains less of the remaining variance than this is no partner. */
  private static final double NO_PARTNER = 0.02;

  private final Posterior posterior;

  Identifiability(Posterior posterior) {
    this.posterior = posterior;
  }

  boolean identified(int parameter) {
    return posterior.removed(parameter) > MUCH && posterior.dataVariance(parameter) < 1;
  }

  /** The collinear groups, each in ascending order, in the order of their first parameters. */
  List<List<Integer>> groups() {
    int n = posterior.size();
    int[] owner = new int[n];
    List<TreeSet<Integer>> groups = new ArrayList<>();
    java.util.Arrays.fill(owner, -1);
    for (int i = 0; i < n; i++) {
      if (identified(i)) {
        continue;
      }
      List<Integer> partners = partners(i);
      if (partners.isEmpty()) {
        continue;
      }
      TreeSet<Integer> merged = new TreeSet<>(partners);
      merged.add(i);
      for (int member : List.copyOf(merged)) {
        if (owner[member] >= 0) {
          merged.addAll(groups.get(owner[member]));
          groups.get(owner[member]).clear();
        }
      }
      groups.add(merged);
      for (int member : merged) {
        owner[member] = groups.size() - 1;
      }
    }
    return groups.stream()
        .filter(group -> !group.isEmpty())
        .map(List::copyOf)
        .sorted((a, b) -> Integer.compare(a.get(0), b.get(0)))
        .toList();
  }

  /** The parameters that must be held for one to be identified; empty if none would do. */
  private List<Integer> partners(int parameter) {
    int n = posterior.size();
    if (posterior.removed(parameter) < 1e-6 && !correlatedAtAll(parameter)) {
      return List.of();
    }
    // sweep the covariance: what is left of it when the held ones are known
    DMatrixRMaj left = posterior.covariance();
    List<Integer> held = new ArrayList<>();
    boolean[] isHeld = new boolean[n];
    while (left.get(parameter, parameter) >= 1 - MUCH) {
      int best = -1;
      double most = NO_PARTNER * left.get(parameter, parameter);
      for (int j = 0; j < n; j++) {
        if (j != parameter && !isHeld[j] && left.get(j, j) > 1e-12) {
          double told = left.get(parameter, j) * left.get(parameter, j) / left.get(j, j);
          if (told > most * (1 + 1e-9)) {
            most = told;
            best = j;
          }
        }
      }
      if (best < 0) {
        return List.of();
      }
      double pivot = left.get(best, best);
      double[] column = new double[n];
      for (int j = 0; j < n; j++) {
        column[j] = left.get(j, best);
      }
      for (int j = 0; j < n; j++) {
        for (int k = 0; k < n; k++) {
          left.add(j, k, -column[j] * column[k] / pivot);
        }
      }
      isHeld[best] = true;
      held.add(best);
    }
    return held;
  }

  private boolean correlatedAtAll(int parameter) {
    for (int j = 0; j < posterior.size(); j++) {
      if (j != parameter && Math.abs(posterior.covariance(parameter, j)) > 1e-6) {
        return true;
      }
    }
    return false;
  }

  /**
   * The directions that a group determines, best first; each of unit length in scaled unknowns.
   *
   * @param group its parameters
   * @return one direction a row, with the variance left in it in front
   */
  List<double[]> determined(List<Integer> group) {
    int n = group.size();
    DMatrixRMaj block = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < n; k++) {
        block.set(i, k, posterior.covariance(group.get(i), group.get(k)));
      }
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, true, true);
    if (!eigen.decompose(block)) {
      return List.of();
    }
    List<double[]> result = new ArrayList<>();
    for (int e = 0; e < n; e++) {
      double value = eigen.getEigenvalue(e).getReal();
      if (value < 1 - MUCH) {
        double[] row = new double[n + 1];
        row[0] = Math.max(value, 0);
        int largest = 0;
        for (int i = 0; i < n; i++) {
          row[i + 1] = eigen.getEigenVector(e).get(i);
          if (Math.abs(row[i + 1]) > Math.abs(row[largest + 1]) * (1 + 1e-9)) {
            largest = i;
          }
        }
        double sign = Math.signum(row[largest + 1]);
        for (int i = 0; i < n; i++) {
          row[i + 1] *= sign;
        }
        result.add(row);
      }
    }
    result.sort((a, b) -> Double.compare(a[0], b[0]));
    return result;
  }
}
