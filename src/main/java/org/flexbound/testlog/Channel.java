package org.flexbound.testlog;

import java.util.Optional;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;

/**
 * What one column of a run means: a load or a gauge, read by an instrument.
 *
 * @param name the load's or the gauge's name
 * @param column the header text, without its unit
 * @param unit the unit in which the column stands
 * @param instrument the name of the instrument that read it in this run
 * @param where the place of the column's header
 */
public record Channel(
    String name, String column, Unit unit, Optional<String> instrument, Where where) {}
