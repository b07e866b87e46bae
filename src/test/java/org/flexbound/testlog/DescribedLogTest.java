package org.flexbound.testlog;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Vector;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Logs of other programs, read through a description. */
class DescribedLogTest {
  private static final Path SCHEMA =
      Path.of("src/main/resources/schema/log-description.schema.json");

  private static final String DESCRIPTION =
      """
      {
        "test": {"title": "Invented bracket", "lengthUnit": "mm"},
        "instruments": [
          {"instrument": "Cell", "uncertaintyOfReading": "0.5 %", "uncertaintyFixed": "2 N", "asStated": "k=2"},
          {"instrument": "Dial", "uncertaintyOfReading": 0.4, "uncertaintyFixed": 2, "unit": "µm"}
        ],
        "loadPoints": [
          {"load": "tip", "node": "T", "direction": [0, 0, -1], "column": "Kraft", "unit": "kN", "instrument": "Cell", "x": "1 m"}
        ],
        "gauges": [
          {"gauge": "at tip", "node": "T", "direction": "-z", "column": "Weg 1", "unit": "mm", "instrument": "Dial"},
          {"gauge": "at mid", "node": "arm @ 0.5", "direction": "-z", "column": "Weg 2", "unit": "mm", "instrument": "Dial"}
        ],
        "readings": [{"file": "export.csv"}]
      }
      """;

  private static final String EXPORT =
      """
      Messrechner 3;Seriennummer 0815

      Zeit;Kraft;Weg 1;Weg 2
      s;kN;mm;mm
      0,0;0,0;0,10;0,20
      1,0;1,0;1,10;0,70
      2,0;2,0;2,10;1,20
      """;

  @TempDir Path folder;

  private void file(String name, String text, Charset charset) throws IOException {
    Path path = folder.resolve(name);
    Files.createDirectories(path.getParent());
    Files.write(path, text.getBytes(charset));
  }

  private Outcome<TestLog> read(String description, String export) throws IOException {
    file("export.csv", export, StandardCharsets.UTF_8);
    return read(description);
  }

  private Outcome<TestLog> read(String description) throws IOException {
    file("log.json", description, StandardCharsets.UTF_8);
    return LogFile.read(folder.resolve("log.json"), "log.json");
  }

  private static List<String> errors(Outcome<TestLog> outcome) {
    return outcome.findings().stream()
        .filter(finding -> finding.severity() == org.flexbound.finding.Severity.ERROR)
        .map(finding -> finding.code() + " " + finding.where() + ": " + finding.message())
        .toList();
  }

  private static List<Double> gauge(TestLog log, int run, int channel) {
    List<Double> seen = new ArrayList<>();
    log.runs().get(run).readings().forEach(reading -> seen.add(reading.gauge(channel)));
    return seen;
  }

  private static List<Double> load(TestLog log, int run) {
    List<Double> seen = new ArrayList<>();
    log.runs().get(run).readings().forEach(reading -> seen.add(reading.load(0)));
    return seen;
  }

  @Test
  void aLoggersExportWithPreambleUnitsRowAndDecimalCommasIsReadInSi() throws IOException {
    Outcome<TestLog> outcome = read(DESCRIPTION, EXPORT);
    assertThat(outcome.findings())
        .extracting(Finding::code)
        .containsExactly("DOC-CSV-LAYOUT", "LOG-COLUMN-NOT-USED");
    TestLog log = outcome.orRefuse();
    assertThat(log.runs()).extracting(Run::name).containsExactly("export");
    assertThat(load(log, 0)).containsExactly(0.0, 1000.0, 2000.0);
    assertThat(gauge(log, 0, 1).get(2)).isCloseTo(0.0012, within(1e-18));
    assertThat(log.inputs()).extracting(InputFile::file).containsExactly("log.json", "export.csv");
    assertThat(log.loads().get(0).points().get(0).direction())
        .isEqualTo(Direction.along(new Vector(0, 0, -1)));
    assertThat(log.loads().get(0).points().get(0).coordinates()).contains(new Vector(1, 0, 0));
    assertThat(log.instruments().get(0).gainUncertainty()).hasValue(0.0025);
    assertThat(log.instruments().get(0).floorUncertainty()).hasValue(1.0);
    assertThat(log.instruments().get(1).gainUncertainty()).hasValue(0.004);
    assertThat(log.instruments().get(1).floorUncertainty().getAsDouble())
        .isCloseTo(2e-6, within(1e-18));
    List<String> places = new ArrayList<>();
    log.runs().get(0).readings().forEach(r -> places.add(r.whereGauge(0).toString()));
    assertThat(places.get(2)).isEqualTo("export.csv, cell C7, line 7");
  }

  @Test
  void theSameDescriptionSaysTheSameAsTheWorkbook() throws IOException {
    WorkbookMaker maker = new WorkbookMaker();
    maker.row("Test", "Item", "Entry").row("Test", "Title", "Invented bracket")
        .row("Test", "Length unit", "mm");
    maker.row("Instruments", "Instrument", "Uncertainty of reading (%)", "Uncertainty fixed", "Unit", "As stated");
    maker.row("Instruments", "Cell", 0.5, 2, "N", "k=2").row("Instruments", "Dial", 0.4, 2, "µm", null);
    maker.row("Load points", "Load", "Node", "Direction", "Column", "Unit", "Instrument", "X");
    maker.row("Load points", "tip", "T", "-z", "Kraft", "kN", "Cell", 1000);
    maker.row("Gauges", "Gauge", "Node", "Direction", "Column", "Unit", "Instrument");
    maker.row("Gauges", "at tip", "T", "-z", "Weg 1", "mm", "Dial");
    maker.row("Gauges", "at mid", "arm @ 0.5", "-z", "Weg 2", "mm", "Dial");
    maker.row("export", "Kraft", "Weg 1", "Weg 2").row("export", 0, 0.1, 0.2)
        .row("export", 1, 1.1, 0.7).row("export", 2, 2.1, 1.2);
    TestLog workbook =
        WorkbookLog.read(maker.write(folder.resolve("log.xlsx")), "log.xlsx").orRefuse();
    TestLog described = read(DESCRIPTION, EXPORT).orRefuse();
    assertThat(described)
        .usingRecursiveComparison()
        .ignoringFieldsMatchingRegexes(".*where", "inputs.*", ".*readings")
        .isEqualTo(workbook);
    assertThat(gauge(described, 0, 0)).isEqualTo(gauge(workbook, 0, 0));
  }

  @Test
  void everyEncodingWithItsMarkOrByNameIsRead() throws IOException {
    String umlaut = EXPORT.replace("Kraft", "Prüfkraft");
    String description = DESCRIPTION.replace("Kraft", "Prüfkraft");
    file("export.csv", umlaut, StandardCharsets.ISO_8859_1);
    assertThat(load(read(description).orRefuse(), 0)).hasSize(3);
    file("export.csv", "\uFEFF" + umlaut, StandardCharsets.UTF_8);
    assertThat(load(read(description).orRefuse(), 0)).hasSize(3);
    file("export.csv", "\uFEFF" + umlaut, StandardCharsets.UTF_16LE);
    assertThat(load(read(description).orRefuse(), 0)).hasSize(3);
    String stated = "\"export.csv\", \"separator\": \";\", \"decimalSign\": \",\", \"encoding\": \"latin-1\"";
    file("export.csv", umlaut, StandardCharsets.ISO_8859_1);
    Outcome<TestLog> named = read(description.replace("\"export.csv\"", stated));
    assertThat(named.findings()).extracting(Finding::code).containsExactly("LOG-COLUMN-NOT-USED");
    assertThat(errors(read(description.replace("\"export.csv\"", stated.replace("latin-1", "utf-9")))))
        .singleElement()
        .asString()
        .startsWith("DOC-WRONG-KIND log.json, /readings/0/encoding")
        .contains("\"utf-9\"", "windows-1252");
  }

  @Test
  void textThatIsNotInTheStatedEncodingIsRefused() throws IOException {
    file("export.csv", EXPORT.replace("Kraft", "Prüfkraft"), StandardCharsets.ISO_8859_1);
    assertThat(
            errors(
                read(
                    DESCRIPTION.replace(
                        "\"export.csv\"", "\"export.csv\", \"encoding\": \"utf-8\""))))
        .first()
        .asString()
        .contains("export.csv", "not utf-8");
  }

  @Test
  void aWrongSeparatorIsSaidToBeOne() throws IOException {
    Outcome<TestLog> outcome =
        read(DESCRIPTION.replace("\"export.csv\"", "\"export.csv\", \"separator\": \"|\""), EXPORT);
    assertThat(errors(outcome))
        .singleElement()
        .asString()
        .startsWith("LOG-MISSING-COLUMN export.csv")
        .contains("every row holds a single cell", "separator");
  }

  @Test
  void aMissingColumnIsNamedWithTheNearestOne() throws IOException {
    assertThat(errors(read(DESCRIPTION.replace("\"Weg 2\"", "\"Weg 22\""), EXPORT)))
        .singleElement()
        .asString()
        .startsWith("LOG-MISSING-COLUMN export.csv")
        .contains("'Weg 22'", "Did you mean 'Weg 2'?");
    assertThat(errors(read(DESCRIPTION.replace("\"Kraft\"", "\"Krafft\""), EXPORT)))
        .singleElement()
        .asString()
        .contains("load column ('krafft')", "row 3 names", "is 'kraft' one of them?");
  }

  @Test
  void aHeaderThatNamesAColumnTwiceIsRefused() throws IOException {
    assertThat(errors(read(DESCRIPTION, EXPORT.replace("Zeit;", "Weg 1;").replace("s;", "mm;"))))
        .singleElement()
        .asString()
        .startsWith("LOG-TWICE export.csv, cell C3, line 3")
        .contains("'Weg 1'", "cell A3");
  }

  @Test
  void aUnitsRowThatContradictsTheDescriptionNamesBothPlaces() throws IOException {
    assertThat(errors(read(DESCRIPTION, EXPORT.replace("s;kN;mm;mm", "s;N;mm;mm"))))
        .singleElement()
        .asString()
        .startsWith("LOG-UNITS-DISAGREE export.csv, cell B4, line 4")
        .contains("'N' here but 'kN' at log.json, /loadPoints/0/unit");
  }

  @Test
  void aScaleTurnsWhatWasLoggedIntoTheStatedUnitWithANote() throws IOException {
    String scaled =
        DESCRIPTION.replace(
            "\"export.csv\"",
            "\"export.csv\", \"columns\": {\"Kraft\": {\"scale\": 12.5, \"unit\": \"kN\"},"
                + " \"Weg 2\": {\"scale\": -1}}");
    Outcome<TestLog> outcome = read(scaled, EXPORT.replace("s;kN;", "s;V;"));
    assertThat(outcome.findings()).extracting(Finding::code).contains("LOG-SCALED");
    assertThat(load(outcome.orRefuse(), 0)).containsExactly(0.0, 12500.0, 25000.0);
    assertThat(gauge(outcome.orRefuse(), 0, 1).get(1)).isCloseTo(-0.0007, within(1e-18));
    assertThat(errors(read(scaled.replace("12.5", "0"), EXPORT)))
        .singleElement()
        .asString()
        .contains("/readings/0/columns/Kraft/scale", "other than 0");
    assertThat(errors(read(scaled.replace("\"kN\"}", "\"N\"}"), EXPORT)))
        .singleElement()
        .asString()
        .startsWith("LOG-UNITS-DISAGREE log.json, /readings/0/columns/Kraft")
        .contains("'N' here but 'kN'");
    assertThat(errors(read(scaled.replace("\"Weg 2\": {\"scale\"", "\"Weg 3\": {\"scale\""), EXPORT)))
        .singleElement()
        .asString()
        .contains("'Weg 3'", "Did you mean");
  }

  @Test
  void anEmptyFileAMissingOneAndOneElsewhereAreAllNamedInOneAnswer() throws IOException {
    file("empty.csv", "", StandardCharsets.UTF_8);
    file("blank.csv", "\n\n", StandardCharsets.UTF_8);
    Files.createSymbolicLink(folder.resolve("link.csv"), Path.of("pom.xml").toAbsolutePath());
    Outcome<TestLog> outcome =
        read(
            DESCRIPTION.replace(
                "\"file\": \"export.csv\"",
                "\"files\": [\"empty.csv\", \"gone.csv\", \"../outside.csv\", \"/etc/hosts\","
                    + " \"link.csv\", \"blank.csv\"]"));
    Files.delete(folder.resolve("link.csv"));
    assertThat(errors(outcome))
        .extracting(text -> text.substring(0, text.indexOf(':')))
        .containsExactly(
            "DOC-UNREADABLE empty.csv",
            "DOC-MISSING gone.csv",
            "DOC-OUTSIDE-FOLDER log.json, /readings/0/files/2, line 14",
            "DOC-OUTSIDE-FOLDER log.json, /readings/0/files/3, line 14",
            "DOC-OUTSIDE-FOLDER log.json, /readings/0/files/4, line 14",
            "LOG-MISSING-COLUMN blank.csv");
  }

  @Test
  void unknownKeysGetTheNearestKnownOnes() throws IOException {
    assertThat(
            errors(
                read(
                    DESCRIPTION
                        .replace("\"title\"", "\"titel\"")
                        .replace("\"x\": \"1 m\"", "\"X\": \"1 m\"")
                        .replace("{\"file\": \"export.csv\"}", "{\"file\": \"export.csv\", \"seperator\": \";\"}")
                        .replace("\"lengthUnit\"", "\"lenghtUnit\""),
                    EXPORT)))
        .hasSize(4)
        .anySatisfy(text -> assertThat(text).contains("Did you mean 'title'?"))
        .anySatisfy(text -> assertThat(text).contains("Did you mean 'x'?"))
        .anySatisfy(text -> assertThat(text).contains("Did you mean 'separator'?"))
        .anySatisfy(text -> assertThat(text).contains("Did you mean 'lengthUnit'?"));
  }

  @Test
  void severalRunsInSeveralFilesTakeWhatTheirColumnsMeanFromTheDescription() throws IOException {
    file("a/one.csv", EXPORT, StandardCharsets.UTF_8);
    file("a/two.csv", EXPORT, StandardCharsets.UTF_8);
    String runs =
        """
        "readings": [{"files": ["a/one.csv", "a/two.csv"]}],
        "runs": [
          {"run": "up", "file": "a/one.csv", "firstRow": 5, "lastRow": 6, "date": "2026-01-02", "temperature": 20},
          {"run": "swapped", "file": "a/two.csv", "columns": {"Weg 1": "at mid", "Weg 2": "at tip"}}
        ]
        }
        """;
    String description = DESCRIPTION.substring(0, DESCRIPTION.indexOf("\"readings\"")) + runs;
    TestLog log = read(description).orRefuse();
    assertThat(log.runs()).extracting(Run::name).containsExactly("up", "swapped");
    assertThat(gauge(log, 0, 0)).hasSize(2);
    assertThat(log.runs().get(0).temperature()).hasValue(293.15);
    assertThat(log.runs().get(1).gauges()).extracting(Channel::name)
        .containsExactly("at mid", "at tip");
    assertThat(errors(read(description.replace("\"file\": \"a/two.csv\"", "\"file\": \"a/tow.csv\""))))
        .singleElement()
        .asString()
        .startsWith("LOG-MISSING-SHEET log.json, /runs/1")
        .contains("Did you mean 'a/two.csv'?");
  }

  @Test
  void aForeignWorkbooksSheetIsReadAsWell() throws IOException {
    WorkbookMaker maker = new WorkbookMaker();
    maker.row("Deckblatt", "Prüfbericht").row("Daten", "Kanal", 1, 2, 3);
    maker.row("Daten", "Zeit", "Kraft (kN)", "Weg 1 / mm", "Weg 2 in mm");
    maker.row("Daten", 0, 0.0, 0.1, 0.2).row("Daten", 1, 1.0, 1.1, 0.7);
    maker.write(folder.resolve("export.xlsx"));
    String description =
        DESCRIPTION.replace("export.csv", "export.xlsx").replace("\"unit\": \"mm\", ", "");
    Outcome<TestLog> outcome = read(description);
    assertThat(outcome.findings()).extracting(Finding::code)
        .containsExactly("LOG-SHEET-NOT-USED", "LOG-COLUMN-NOT-USED");
    assertThat(gauge(outcome.orRefuse(), 0, 1).get(1)).isCloseTo(0.0007, within(1e-18));
    assertThat(errors(read(description.replace("export.xlsx\"", "export.xlsx\", \"sheet\": \"Date\""))))
        .first()
        .asString()
        .contains("it has Deckblatt, Daten", "Did you mean 'Daten'?");
    assertThat(errors(read(description.replace("export.xlsx\"", "export.xlsx\", \"separator\": \";\""))))
        .first()
        .asString()
        .contains("a workbook and no text file");
  }

  @Test
  void aHeaderIsNotGuessedWhereTwoRowsNameTheColumns() throws IOException {
    String twice = EXPORT.replace("Messrechner 3;Seriennummer 0815", "Kanal;Kraft;Weg 1;Weg 2");
    assertThat(errors(read(DESCRIPTION, twice)))
        .singleElement()
        .asString()
        .startsWith("LOG-HEADER-UNCERTAIN export.csv")
        .contains("rows 1 and 3");
    assertThat(
            read(
                    DESCRIPTION.replace("\"export.csv\"", "\"export.csv\", \"headerRow\": 3"), twice)
                .hasErrors())
        .isFalse();
  }

  @Test
  void rowsOfChannelNumbersBelowTheHeaderAreLeftOutWithANote() throws IOException {
    Outcome<TestLog> outcome =
        read(DESCRIPTION, EXPORT.replace("s;kN;mm;mm", "Kanal 0;Kanal 1;Kanal 2;Kanal 3\ns;kN;mm;mm"));
    assertThat(outcome.findings()).extracting(Finding::code)
        .containsExactly("DOC-CSV-LAYOUT", "LOG-ROW-NOT-USED", "LOG-COLUMN-NOT-USED");
    assertThat(gauge(outcome.orRefuse(), 0, 0)).hasSize(3);
  }

  @Test
  void columnsWithoutAnyHeaderAreNamedByTheDescription() throws IOException {
    String names = "\"export.csv\", \"columnNames\": [\"Zeit\", \"Kraft\", \"Weg 1\", \"Weg 2\"]";
    TestLog log =
        read(DESCRIPTION.replace("\"export.csv\"", names), "0,0;0,0;0,10;0,20\n1,0;1,0;1,10;0,70\n")
            .orRefuse();
    assertThat(load(log, 0)).containsExactly(0.0, 1000.0);
  }

  @Test
  void wordsAndNumbersForAMissingReadingAreLeftOutAndCounted() throws IOException {
    String export =
        EXPORT.replace("1,0;1,0;1,10;0,70", "1,0;1,0;OVL;0,70").replace("2,0;2,0;2,10;1,20", "2,0;2,0;2,10;-9999");
    assertThat(errors(read(DESCRIPTION, export)))
        .singleElement()
        .asString()
        .startsWith("LOG-NOT-A-NUMBER export.csv, cell C6, line 6");
    Outcome<TestLog> outcome =
        read(
            DESCRIPTION.replace(
                "\"export.csv\"", "\"export.csv\", \"noReading\": [\"OVL\", -9999]"),
            export);
    assertThat(outcome.findings()).extracting(Finding::code)
        .containsExactly(
            "DOC-CSV-LAYOUT", "LOG-COLUMN-NOT-USED", "LOG-READINGS-MISSING", "LOG-READINGS-MISSING");
    assertThat(gauge(outcome.orRefuse(), 0, 0).get(1)).isNaN();
    assertThat(gauge(outcome.orRefuse(), 0, 1).get(2)).isNaN();
  }

  @Test
  void aTextFileInPlaceOfALogIsToldWhatItNeeds() throws IOException {
    file("export.csv", EXPORT, StandardCharsets.UTF_8);
    assertThat(LogFile.read(folder.resolve("export.csv"), "export.csv").findings())
        .singleElement()
        .satisfies(f -> assertThat(f.message()).contains("description (.json)"));
  }

  @Test
  void thePublishedSchemaIsMadeOfTheReadersOwnDefinitionsAndHoldsForTheTemplate() throws Exception {
    String text = DescriptionSchema.text();
    if (Boolean.getBoolean("schema.write")) {
      Files.writeString(SCHEMA, text);
    }
    assertThat(SCHEMA).content(StandardCharsets.UTF_8).isEqualTo(text);
    Schema checker =
        SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12).getSchema(text);
    assertThat(checker.validate(DESCRIPTION, InputFormat.JSON)).isEmpty();
    String template = Files.readString(Path.of("templates/log-description.json"));
    assertThat(checker.validate(template, InputFormat.JSON)).isEmpty();
    assertThat(checker.validate(template.replace("decimalSign", "decimal"), InputFormat.JSON))
        .isNotEmpty();
  }

  @Test
  void theTemplateIsReadAsItStandsAndIsTheOneThatTheProgramWrites() throws IOException {
    Outcome<TestLog> outcome =
        LogFile.read(Path.of("templates/log-description.json"), "log-description.json");
    assertThat(outcome.findings()).extracting(Finding::code).containsExactly("LOG-SCALED");
    assertThat(outcome.orRefuse().runs()).hasSize(6);
    for (String name : List.of("log-description.json", "logger-mid.csv", "logger-tip.csv")) {
      assertThat(Path.of("templates", name))
          .hasSameBinaryContentAs(Path.of("src/main/resources/templates", name));
    }
  }
}
