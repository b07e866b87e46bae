package org.flexbound.testlog;

/**
 * What the sheet {@code Test} says; texts as written, empty where nothing stands.
 *
 * @param title the test's title
 * @param article what was tested
 * @param fixture what held it
 * @param date when, ISO 8601 where it could be read as a date
 * @param place where
 * @param testedBy who
 * @param ambientTemperature the air's temperature as written
 * @param notes anything else
 */
public record TestInformation(
    String title,
    String article,
    String fixture,
    String date,
    String place,
    String testedBy,
    String ambientTemperature,
    String notes) {}
