package org.flexbound.flexibility;

/**
 * A flexibility coefficient as it is compared with a model: base motion taken out where it can be.
 *
 * @param gauge the gauge's index in {@link MeasuredFlexibility#gauges()}
 * @param load the load's index in {@link MeasuredFlexibility#loads()}
 * @param value motion per load, SI
 * @param standardUncertainty combined standard uncertainty from all sources, same unit
 * @param degreesOfFreedom effective degrees of freedom (Welch–Satterthwaite); infinite where all is
 *     stated
 */
public record Coefficient(
    int gauge, int load, double value, double standardUncertainty, double degreesOfFreedom) {}
