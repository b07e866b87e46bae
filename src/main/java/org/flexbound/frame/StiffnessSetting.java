package org.flexbound.frame;

/** What a stiffness of the model is set to. */
public sealed interface StiffnessSetting {
  /**
   * The stiffness as the model has it.
   *
   * @return the factor 1
   */
  static StiffnessSetting nominal() {
    return new Factor(1);
  }

  /**
   * The stiffness that results.
   *
   * @param nominal the stiffness as the model has it
   * @return the stiffness as set
   */
  Stiffness of(Stiffness nominal);

  /**
   * A multiple of the nominal stiffness; a rigid one stays rigid, a free one free.
   *
   * @param factor above 0
   */
  record Factor(double factor) implements StiffnessSetting {
    /** Checks the factor. */
    public Factor {
      if (!(factor > 0 && factor < Double.POSITIVE_INFINITY)) {
        throw new IllegalArgumentException("a factor is a number above 0, not " + factor);
      }
    }

    @Override
    public Stiffness of(Stiffness nominal) {
      return new Stiffness(nominal.value() * factor);
    }
  }

  /**
   * A stiffness in place of the nominal one.
   *
   * @param stiffness from 0 (free) to positive infinity (rigid), SI
   */
  record Value(double stiffness) implements StiffnessSetting {
    /** Checks the stiffness. */
    public Value {
      if (!(stiffness >= 0)) {
        throw new IllegalArgumentException("a stiffness is at least 0, not " + stiffness);
      }
    }

    @Override
    public Stiffness of(Stiffness nominal) {
      return new Stiffness(stiffness);
    }
  }

  /**
   * This setting followed by another.
   *
   * @param next what is set afterwards
   * @return one setting that does both
   */
  default StiffnessSetting then(StiffnessSetting next) {
    if (next instanceof Value) {
      return next;
    }
    double factor = ((Factor) next).factor();
    return this instanceof Factor first
        ? new Factor(first.factor() * factor)
        : new Value(((Value) this).stiffness() * factor);
  }
}
