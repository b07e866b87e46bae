package org.flexbound.update;

import org.flexbound.compare.OutsideModel;

/** The flexibility of a model held elsewhere. */
final class OutsideFunction implements FlexibilityFunction {
  private final OutsideModel model;

  OutsideFunction(OutsideModel model) {
    this.model = model;
  }

  @Override
  public Computed at(double[] x) {
    return new Computed(model.coefficients(x), model.derivatives(x));
  }

  @Override
  public double[] coefficients(double[] x) {
    return model.coefficients(x);
  }
}
