package org.flexbound.statistics;

/**
 * A pooled model of run-to-run scatter: variance of one run's value = floor² + (share · value)²,
 * fitted to the variances seen in many small groups.
 *
 * <p>A variance s² from k degrees of freedom has variance 2σ⁴/k (normal scatter); floor² and share²,
 * neither below zero, are fitted to all s² by weighted least squares with these weights, repeated
 * until they settle (method of moments of a gamma regression: McCullagh &amp; Nelder, Generalized
 * Linear Models, 2nd ed., ch. 8). The degrees of freedom are those of the fitted variances: 2σ⁴ over
 * the variance of the fitted σ², averaged (Satterthwaite 1946, Biometrics Bull. 2:110).
 *
 * @param floorVariance floor²
 * @param shareVariance share²
 * @param degreesOfFreedom of the pooled variances; 0 where nothing could be estimated
 */
public record PooledScatter(double floorVariance, double shareVariance, double degreesOfFreedom) {
  /**
   * The variance of one run's value.
   *
   * @param value the mean value of its group
   * @return floor² + share² · value²
   */
  public double variance(double value) {
    return floorVariance + shareVariance * value * value;
  }

  /**
   * Fits.
   *
   * @param values the mean of each group
   * @param variances the variance seen in each group, with n − 1
   * @param degreesOfFreedom n − 1 of each group; groups with 0 are passed over
   * @return the model
   */
  public static PooledScatter fit(
      double[] values, double[] variances, int[] degreesOfFreedom) {
    double total = 0;
    double pooled = 0;
    double largest = 0;
    for (int k = 0; k < values.length; k++) {
      total += degreesOfFreedom[k];
      pooled += degreesOfFreedom[k] * variances[k];
      largest = degreesOfFreedom[k] > 0 ? Math.max(largest, Math.abs(values[k])) : largest;
    }
    if (total == 0) {
      return new PooledScatter(0, 0, 0);
    }
    if (pooled == 0 || largest == 0) {
      return new PooledScatter(pooled / total, 0, total);
    }
    double floor = pooled / total / 2;
    double share = floor / (largest * largest);
    double[] z = new double[values.length];
    for (int k = 0; k < values.length; k++) {
      z[k] = values[k] * values[k];
    }
    for (int pass = 0; pass < 100; pass++) {
      double[] next = step(z, variances, degreesOfFreedom, floor, share);
      boolean settled =
          Math.abs(next[0] - floor) <= 1e-10 * (floor + next[0])
              && Math.abs(next[1] - share) <= 1e-10 * (share + next[1]);
      floor = next[0];
      share = next[1];
      if (settled) {
        break;
      }
    }
    return new PooledScatter(floor, share, degrees(z, degreesOfFreedom, floor, share));
  }

  private static double weight(double dof, double z, double floor, double share, double least) {
    double variance = Math.max(floor + share * z, least);
    return dof / (2 * variance * variance);
  }

  /** A variance below this share of the largest is held there, so that no group rules alone. */
  private static double least(double[] z, double floor, double share) {
    double largest = 0;
    for (double value : z) {
      largest = Math.max(largest, floor + share * value);
    }
    return 1e-6 * largest;
  }

  private static double[] step(
      double[] z, double[] variances, int[] dof, double floor, double share) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double t0 = 0;
    double t1 = 0;
    double least = least(z, floor, share);
    for (int k = 0; k < z.length; k++) {
      double w = weight(dof[k], z[k], floor, share, least);
      s0 += w;
      s1 += w * z[k];
      s2 += w * z[k] * z[k];
      t0 += w * variances[k];
      t1 += w * z[k] * variances[k];
    }
    double determinant = s0 * s2 - s1 * s1;
    if (determinant > 1e-9 * s0 * s2) {
      double a = (s2 * t0 - s1 * t1) / determinant;
      double b = (s0 * t1 - s1 * t0) / determinant;
      if (a >= 0 && b >= 0) {
        return new double[] {a, b};
      }
      if (b < 0) {
        return new double[] {t0 / s0, 0};
      }
      return new double[] {0, t1 / s2};
    }
    return new double[] {t0 / s0, 0};
  }

  private static double degrees(double[] z, int[] dof, double floor, double share) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double least = least(z, floor, share);
    for (int k = 0; k < z.length; k++) {
      double w = weight(dof[k], z[k], floor, share, least);
      s0 += w;
      s1 += w * z[k];
      s2 += w * z[k] * z[k];
    }
    double determinant = s0 * s2 - s1 * s1;
    double sum = 0;
    int groups = 0;
    for (int k = 0; k < z.length; k++) {
      if (dof[k] == 0) {
        continue;
      }
      double variance = Math.max(floor + share * z[k], least);
      double ofVariance;
      if (share == 0 || !(determinant > 1e-9 * s0 * s2)) {
        ofVariance = 1 / s0;
      } else if (floor == 0) {
        ofVariance = z[k] * z[k] / s2;
      } else {
        ofVariance = (s2 - 2 * z[k] * s1 + z[k] * z[k] * s0) / determinant;
      }
      sum += ofVariance / (2 * variance * variance);
      groups++;
    }
    return groups / sum;
  }
}
