package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.flexbound.report.results.Energy;
import org.flexbound.report.results.Results;

/** The cautions, with the stored energy of the test worked out from the readings. */
final class CautionSection {
  private final Results results;
  private final Shown shown;

  CautionSection(Results results, Shown shown) {
    this.results = results;
    this.shown = shown;
  }

  Section make() {
    List<String> items = new ArrayList<>();
    items.add(energy());
    items.add(
        "Dead weights fall and loaded rods, cables and jacks are thrown when something gives way:"
            + " keep the drop height small, catch the load close under the structure, prefer oil at"
            + " low volume to gas.");
    items.add(
        "Keep a zone about the test clear. Nobody stands under the load or in line with a loaded rod"
            + " or cable; read from outside. One competent person is in charge, and anyone may call"
            + " a stop.");
    items.add(
        "Write down the load stages, hold times and stop criteria before the first load, and hold"
            + " the load below the stated limit. Guard against overload by a relief valve or a load"
            + " limiter a little above the largest step.");
    items.add(
        "Stop where a deflection passes its forecast, the slope softens, the motion creeps at"
            + " constant load, something cracks, slips or sounds, the zero does not come back, the"
            + " line of the load is visibly off, or a gauge that guards a limit fails.");
    items.add(
        "This report does not certify strength. A fitted stiffness is no proof of strength. The test"
            + " load and its ratio to the design load are for a licensed engineer to set, under the"
            + " local code and the rules of the site, which come first.");
    items.add(
        "Results hold in the range of load that was tested, at that temperature and with the joints"
            + " tightened as they were; bolted joints slip beyond it.");
    return new Section("cautions", "Cautions", List.of(new Block.Bullets(items)));
  }

  private String energy() {
    Optional<Energy> most =
        results.energy().stream()
            .filter(Energy::complete)
            .max(Comparator.comparingDouble(Energy::energy));
    String general =
        "A loaded structure stores energy and gives it back at once when something gives way. ";
    if (most.isEmpty()) {
      return general
          + "No gauge of this test reads along a load at its point, so that the stored energy could"
          + " not be worked out: about half the load times the motion of its point.";
    }
    return general
        + "In this test the structure stored up to "
        + shown.withUnit(most.get().energy(), "J")
        + " (run "
        + most.get().run()
        + "; half the load times the motion of its point), and the loading gear stored more.";
  }
}
