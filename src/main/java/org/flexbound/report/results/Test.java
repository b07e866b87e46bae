package org.flexbound.report.results;

/**
 * What the test log says of the test; texts as written, empty where nothing stands.
 *
 * @param title the title of the test
 * @param article what was tested
 * @param fixture what held it
 * @param date when, ISO 8601 where it could be read as a date
 * @param place where
 * @param testedBy who
 * @param ambientTemperature the temperature of the air, as written
 * @param notes anything else
 */
public record Test(
    String title,
    String article,
    String fixture,
    String date,
    String place,
    String testedBy,
    String ambientTemperature,
    String notes) {}
