package org.flexbound.simulated;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import org.flexbound.compare.Comparison;
import org.flexbound.compare.FlexibilityComparator;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Finding;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.reduce.Reducer;
import org.flexbound.study.Study;
import org.flexbound.study.StudyReader;
import org.junit.jupiter.api.Test;

/** Beside a model, mistakes of a log are named as what they are; a merely wrong model is not. */
class ComparisonHintsTest {
  private static List<Finding> compare(SimulatedTest test) {
    Study study =
        StudyReader.read(
                JsonFile.parse("{\"model\": \"m.json\", \"log\": \"l.xlsx\"}", "study.json")
                    .orRefuse())
            .orRefuse();
    MeasuredFlexibility measured =
        Reducer.reduce(
                new ReductionProblem(Study.ONLY_CONFIGURATION, test.log(), test.places()))
            .orRefuse()
            .flexibility();
    Comparison comparison =
        FlexibilityComparator.compare(study, test.frame.wrongModel(), List.of(measured)).orRefuse();
    return comparison.findings().stream().filter(f -> f.code().startsWith("COMPARE-LOOKS")).toList();
  }

  /** How many of some tests with a fault (or none) are named so by the comparison; and otherwise. */
  private static int[] named(String fault, String code, int tests) {
    Optional<LogFault> wanted =
        LogFault.all().stream().filter(f -> f.name().equals(fault)).findFirst();
    int[] counts = new int[2];
    int done = 0;
    for (long seed = 100; done < tests; seed++) {
      SimulatedTest test = new SimulatedTest(seed);
      Optional<String> target =
          wanted.isEmpty() ? Optional.of("") : wanted.get().injector().into(test, 2);
      if (target.isPresent()) {
        done++;
        List<Finding> found = compare(test);
        counts[0] += found.stream().anyMatch(f -> f.code().equals(code)) ? 1 : 0;
        counts[1] += found.stream().anyMatch(f -> !f.code().equals(code)) ? 1 : 0;
      }
    }
    return counts;
  }

  @Test
  void aModelThatIsMerelyWrongIsNotTakenForAMistakeInTheLog() {
    assertThat(named("", "", 12)[1]).isLessThanOrEqualTo(1);
  }

  @Test
  void mistakesThroughoutALogAreNamedAsWhatTheyAre() {
    assertThat(named("gauge reversed", "COMPARE-LOOKS-REVERSED", 6)[0]).isGreaterThanOrEqualTo(3);
    assertThat(named("two columns exchanged", "COMPARE-LOOKS-EXCHANGED", 6)[0])
        .isGreaterThanOrEqualTo(2);
    assertThat(named("gauge in inches for mm (25.4)", "COMPARE-LOOKS-LIKE-UNIT", 6)[0])
        .isGreaterThanOrEqualTo(3);
    // what reciprocity cannot see, the model shows
    assertThat(named("load in kgf for N (9.807)", "COMPARE-LOOKS-LIKE-UNIT", 6)[0])
        .isGreaterThanOrEqualTo(4);
  }
}
