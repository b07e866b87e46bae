package org.flexbound.testlog;

import org.flexbound.finding.Where;

/**
 * One row of readings as seen during a visit; reused by its run, so it may not be kept.
 *
 * <p>Loads and gauges are counted as in {@link Run#loads()} and {@link Run#gauges()}; values are in
 * SI units; a blank cell is NaN (the one place where NaN stands for nothing, since a record a
 * reading would cost more than the reading).
 */
public interface Reading {
  /**
   * The row's number as the user sees it, from 1.
   *
   * @return the row number
   */
  int row();

  /**
   * A load reading.
   *
   * @param channel the load channel, from 0
   * @return N or N·m; NaN if blank
   */
  double load(int channel);

  /**
   * A gauge reading.
   *
   * @param channel the gauge channel, from 0
   * @return m, rad or strain; NaN if blank
   */
  double gauge(int channel);

  /**
   * The time.
   *
   * @return s from any origin; NaN if there is none
   */
  double time();

  /**
   * The step label.
   *
   * @return the label, or empty
   */
  String step();

  /**
   * Whether the user wants the row used.
   *
   * @return false where the column Use says no
   */
  boolean use();

  /**
   * The user's remark.
   *
   * @return the remark, or empty
   */
  String remark();

  /**
   * The place of a load's cell.
   *
   * @param channel the load channel, from 0
   * @return the cell
   */
  Where whereLoad(int channel);

  /**
   * The place of a gauge's cell.
   *
   * @param channel the gauge channel, from 0
   * @return the cell
   */
  Where whereGauge(int channel);
}
