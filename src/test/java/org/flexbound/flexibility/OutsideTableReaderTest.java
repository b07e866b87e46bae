package org.flexbound.flexibility;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.testlog.WorkbookMaker;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Tables of flexibility from elsewhere. */
class OutsideTableReaderTest {
  private static final List<String> PARAMETERS = List.of("knee", "base");

  @TempDir Path folder;

  private Outcome<OutsideFlexibility> computed(String text) throws IOException {
    Path file = Files.writeString(folder.resolve("table.csv"), text, StandardCharsets.UTF_8);
    return OutsideTableReader.read(file, "table.csv", PARAMETERS);
  }

  private static List<String> problems(Outcome<?> outcome) {
    return outcome.findings().stream()
        .filter(finding -> !finding.code().startsWith("DOC-CSV"))
        .map(finding -> finding.code() + " " + finding.where() + ": " + finding.message())
        .toList();
  }

  @Test
  void computedFlexibilityIsReadFromCsvWithDecimalCommasInSi() throws IOException {
    OutsideFlexibility table =
        computed(
                """
                Computed elsewhere; invented
                Configuration;Gauge;Load;Value [mm/kN];knee;base [µm/N]
                ;tip;pull;1,5;-0,5;-0,25
                braced;tip;pull;1,2;-0,4;-0,2
                ;mid;pull;0,7 rad/MN;0;0
                """)
            .orRefuse();
    assertThat(table.entries()).hasSize(3);
    OutsideFlexibility.Entry general = table.find("bare", "tip", "pull").orElseThrow();
    assertThat(general.value()).isCloseTo(1.5e-6, within(1e-20));
    assertThat(general.byLogarithm().get("knee")).isCloseTo(-0.5e-6, within(1e-20));
    assertThat(general.byLogarithm().get("base")).isCloseTo(-0.25e-6, within(1e-20));
    assertThat(table.find("braced", "tip", "pull").orElseThrow().value())
        .isCloseTo(1.2e-6, within(1e-20));
    assertThat(table.find("bare", "mid", "pull")).isPresent();
    assertThat(table.find("bare", "tip", "push")).isEmpty();
  }

  @Test
  void theSameTableIsReadFromAWorkbooksSecondSheetWithUnitsByRow() {
    WorkbookMaker maker = new WorkbookMaker();
    maker.row("Notes", "Made by another program");
    maker.row("Table", "Gauge", "Load", "Value", "Unit", "knee", "base");
    maker.row("Table", "tip", "pull", 1.5, "mm/kN", -0.5, -0.25);
    maker.row("Table", "tip", "twist", 2, "mrad/(kN·m)", 0, 0);
    Path file = maker.write(folder.resolve("table.xlsx"));
    OutsideFlexibility table = OutsideTableReader.read(file, "table.xlsx", PARAMETERS).orRefuse();
    assertThat(table.entries()).extracting("value").containsExactly(1.5e-6, 2e-6);
    assertThat(table.entries().get(0).byLogarithm())
        .isEqualTo(Map.of("knee", -0.5e-6, "base", -0.25e-6));
    assertThat(table.where().sheet()).contains("Table");
  }

  @Test
  void everyProblemOfATableComesInOneAnswerWithItsCell() throws IOException {
    assertThat(
            problems(
                computed(
                    """
                    Gauge,Load,Value [mm/kN],knee,base
                    tip,pull,1.5,-0.5,
                    tip,pull,1.5,-0.5,-0.2
                    ,pull,much,-0.5,-0.2 kN
                    """)))
        .extracting(text -> text.substring(0, text.indexOf(':')))
        .containsExactly(
            "OUTSIDE-WRONG-CELL table.csv, cell E2, line 2",
            "OUTSIDE-STATED-TWICE table.csv, cell A3, line 3",
            "OUTSIDE-WRONG-CELL table.csv, cell A4, line 4",
            "OUTSIDE-WRONG-CELL table.csv, cell C4, line 4",
            "OUTSIDE-WRONG-CELL table.csv, cell E4, line 4");
  }

  @Test
  void aTableWithoutUnitIsRefused() throws IOException {
    assertThat(problems(computed("Gauge,Load,Value,knee,base\ntip,pull,1.5,0,0\n")))
        .first()
        .asString()
        .startsWith("OUTSIDE-WRONG-CELL table.csv, cell C2")
        .contains("'1.5' without a unit", "mm/kN");
    assertThat(problems(computed("Gauge,Load,Value [kN],knee,base\ntip,pull,1.5,0,0\n")))
        .first()
        .asString()
        .contains("the unit 'kN'");
  }

  @Test
  void aMissingColumnIsNamedWithTheNearestThatIsThere() throws IOException {
    assertThat(problems(computed("Gauge,Load,Value [mm/kN],kneee,base\ntip,pull,1.5,0,0\n")))
        .singleElement()
        .asString()
        .startsWith("OUTSIDE-NO-TABLE table.csv")
        .contains("not there: knee", "Did you mean 'kneee'?");
    assertThat(problems(computed("Gauge,Load,Value [mm/kN],knee,base\n")))
        .singleElement()
        .asString()
        .contains("no row below its header");
  }

  private Outcome<MeasuredModes> modes(String text) throws IOException {
    Path file = Files.writeString(folder.resolve("modes.csv"), text, StandardCharsets.UTF_8);
    return OutsideTableReader.readModes(file, "modes.csv", List.of("tip"), List.of("pull"));
  }

  @Test
  void measuredModesMakeUpTheFlexibilityOfAMassOnASpring() throws IOException {
    // k = 1 MN/m and m = 4 kg: one mode of √(k/m)/2π, flexibility 1/k whatever the shape's scale
    MeasuredModes modes =
        modes(
                """
                Mode;Frequency [Hz];Modal mass [kg];Frequency uncertainty;tip;pull
                bounce;79,57747154594767;0,04;0,1;0,1;0,1
                """)
            .orRefuse();
    assertThat(modes.coefficient("as tested", "tip", "pull").getAsDouble())
        .isCloseTo(1e-6, within(1e-18));
    assertThat(modes.modes().get(0).frequencyUncertainty()).hasValue(0.001);
    assertThat(modes.coefficient("as tested", "tip", "push")).isEmpty();
    MeasuredModes normalised =
        modes("Mode,Frequency,tip,pull\nbounce,79.57747154594767,0.5,0.5\n").orRefuse();
    assertThat(normalised.coefficient("as tested", "tip", "pull").getAsDouble())
        .isCloseTo(1e-6, within(1e-18));
  }

  @Test
  void modesOfOtherConfigurationsDoNotCount() throws IOException {
    MeasuredModes modes =
        modes(
                """
                Configuration,Mode,Frequency,Modal mass,tip [mm],pull [mm]
                bare,1,0.05 kHz,2,1000,1000
                braced,1,100 Hz,2,1000,1000
                ,2,200 Hz,2 kg,0,0
                """)
            .orRefuse();
    assertThat(modes.of("bare")).extracting("name").containsExactly("1", "2");
    assertThat(modes.coefficient("bare", "tip", "pull").getAsDouble())
        .isCloseTo(1 / (2 * Math.pow(2 * Math.PI * 50, 2)), within(1e-18));
  }

  @Test
  void modesWithoutFrequencyMassOrShapeAreRefused() throws IOException {
    Outcome<MeasuredModes> outcome =
        modes(
            """
            Mode,Frequency,Modal mass,tip,pull
            1,0,1,1,1
            2,10,-1,1,1
            3,60 rad/s,1,1,1
            4,10,1,,1
            """);
    assertThat(outcome.findings()).filteredOn(f -> f.code().startsWith("OUTSIDE"))
        .extracting(Finding::where)
        .extracting(where -> where.cells().orElse(""))
        .containsExactly("B2", "C3", "B4", "D5");
  }
}
