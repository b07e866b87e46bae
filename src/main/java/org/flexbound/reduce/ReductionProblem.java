package org.flexbound.reduce;

import org.flexbound.testlog.TestLog;

/**
 * What is to be reduced.
 *
 * @param configuration the configuration's name
 * @param log the test log
 * @param places where stations are, from a model; {@link Places#STATED} without one
 */
public record ReductionProblem(String configuration, TestLog log, Places places) {}
