package org.flexbound.samples;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.solve.FlexibilitySolution;
import org.flexbound.solve.FrameFlexibility;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.WorkbookLog;
import org.junit.jupiter.api.Test;

/** The truth behind the sample by the unit-load theorem, against the program's frame solver. */
class GantryTruthTest {
  private static void compare(Map<String, Double> factors) {
    FrameModel nominal = SignGantry.model();
    Map<StiffnessPath, StiffnessSetting> settings = new LinkedHashMap<>();
    factors.forEach(
        (path, factor) ->
            settings.put(
                StiffnessPath.parse(path).orElseThrow(), new StiffnessSetting.Factor(factor)));
    TestLog log =
        WorkbookLog.read(SignGantry.FOLDER.resolve(SignGantry.LOG), SignGantry.LOG).orRefuse();
    FrameFlexibility frame =
        FrameFlexibility.prepare(
                nominal.with(settings), log.gauges(), log.loads(), List.<StiffnessPath>of())
            .orRefuse();
    FlexibilitySolution solution = frame.solve(frame.nominal());
    CantileverTruth truth = new CantileverTruth(nominal, SignGantry.CHAIN, factors);
    for (int i = 0; i < SignGantry.DIALS.size(); i++) {
      for (int j = 0; j < SignGantry.PULLS.size(); j++) {
        double expected =
            truth.flexibility(
                SignGantry.action(SignGantry.DIALS.get(i)),
                SignGantry.action(SignGantry.PULLS.get(j)));
        assertThat(solution.value(i, j))
            .as(SignGantry.DIALS.get(i).name() + " under " + SignGantry.PULLS.get(j).name())
            .isCloseTo(expected, within(1e-9 * Math.max(Math.abs(expected), 1e-7)));
      }
    }
  }

  @Test
  void theSolverAgreesWithTheUnitLoadTheoremOnTheNominalModel() {
    compare(Map.of());
  }

  @Test
  void theSolverAgreesWithTheUnitLoadTheoremOnTheTruth() {
    compare(SignGantry.truth());
  }
}
