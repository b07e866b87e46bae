package org.flexbound.solve;

import java.util.List;
import org.flexbound.frame.StiffnessPath;

/**
 * The computed flexibility of a frame for one setting of its stiffnesses, in full or from its lowest
 * modes: coefficients, derivatives, contributions. Immutable.
 */
public sealed interface ComputedFlexibility permits FlexibilitySolution, TruncatedSolution {
  /**
   * A coefficient.
   *
   * @param gauge the gauge's index
   * @param load the load's index
   * @return motion (or strain) at the gauge per unit of the load, SI
   */
  double value(int gauge, int load);

  /**
   * All coefficients.
   *
   * @return [gauge][load], SI, a copy
   */
  double[][] values();

  /**
   * The derivative of all coefficients by one parameter.
   *
   * @param parameter the parameter's index
   * @param by its logarithm, compliance or stiffness
   * @return [gauge][load]
   */
  double[][] derivative(int parameter, Derivative by);

  /**
   * The derivative of all coefficients by any stiffness of the model. For a joint that connections
   * use with a factor of their own, compliance and stiffness are those of the joint.
   *
   * @param path the stiffness
   * @param by its logarithm, compliance or stiffness
   * @return [gauge][load]
   */
  double[][] derivative(StiffnessPath path, Derivative by);

  /**
   * The derivatives of all coefficients by the logarithms of many stiffnesses, in one pass over the
   * elements.
   *
   * @param groups for each parameter the stiffnesses that it scales together
   * @return [parameter][gauge][load]
   */
  double[][][] byLogarithms(List<List<StiffnessPath>> groups);

  /**
   * What every part contributes to one coefficient; the contributions sum to it.
   *
   * @param gauge the gauge's index
   * @param load the load's index
   * @return the contributions that are not nothing, in the order members, joints at members' ends,
   *     connections, supports
   */
  List<PartContribution> contributions(int gauge, int load);

  /**
   * How the coefficients of a gauge change with its place and direction, held rigidly by the
   * structure where it stands (a strain gauge: with its place on the member).
   *
   * @param gauge the gauge's index
   * @return by place (one; two for a difference), then load, then x, y, z of the place (per m) and
   *     the angle of the direction about x, y, z (per rad)
   */
  double[][][] byGaugePlace(int gauge);

  /**
   * How the coefficients of a load change with the place and direction of its points.
   *
   * @param load the load's index
   * @return by point of the pattern, then gauge, then x, y, z of the place (per m) and the angle of
   *     the direction about x, y, z (per rad)
   */
  double[][][] byLoadPlace(int load);
}
