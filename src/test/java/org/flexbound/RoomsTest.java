package org.flexbound;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** Keeps the table of rooms true: a package imports directly only those that its row names. */
class RoomsTest {
  private static final String ROOT = "org.flexbound.";

  /** Room to the rooms it may use; change a row here only with the reason written beside it. */
  private static final Map<String, Set<String>> ROOMS = rooms();

  private static JavaClasses classes;

  private static Map<String, Set<String>> rooms() {
    Map<String, Set<String>> rooms = new LinkedHashMap<>();
    rooms.put("quantity", Set.of());
    rooms.put("finding", Set.of());
    rooms.put("statistics", Set.of());
    rooms.put("sparse", Set.of());
    rooms.put("document", Set.of("quantity", "finding"));
    rooms.put("setup", Set.of("quantity", "finding", "document"));
    rooms.put("testlog", Set.of("setup", "document", "quantity", "finding"));
    rooms.put("flexibility", Set.of("setup", "document", "statistics", "quantity", "finding"));
    rooms.put(
        "reduce", Set.of("testlog", "flexibility", "setup", "statistics", "quantity", "finding"));
    rooms.put("frame", Set.of("setup", "document", "quantity", "finding"));
    rooms.put("study", Set.of("frame", "setup", "document", "quantity", "finding"));
    rooms.put("solve", Set.of("frame", "setup", "sparse", "flexibility", "finding"));
    rooms.put(
        "compare",
        Set.of("study", "frame", "solve", "flexibility", "setup", "statistics", "finding"));
    rooms.put(
        "update",
        Set.of(
            "compare", "study", "frame", "solve", "flexibility", "setup", "statistics", "finding"));
    rooms.put(
        "acceptance",
        Set.of(
            "update", "compare", "reduce", "study", "flexibility", "setup", "statistics",
            "quantity", "finding"));
    Set<String> everyRowAbove = new TreeSet<>(rooms.keySet());
    rooms.put("report", everyRowAbove);
    Set<String> everyRow = new TreeSet<>(rooms.keySet());
    rooms.put("app", everyRow);
    return rooms;
  }

  @BeforeAll
  static void read() {
    classes =
        new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
            .importPackages("org.flexbound");
  }

  private static String roomOf(JavaClass type) {
    String name = type.getPackageName();
    if (!name.startsWith(ROOT)) {
      return "";
    }
    String rest = name.substring(ROOT.length());
    int dot = rest.indexOf('.');
    return dot < 0 ? rest : rest.substring(0, dot);
  }

  @Test
  void everyPackageIsARoomOfTheTable() {
    Set<String> found =
        classes.stream().map(RoomsTest::roomOf).collect(Collectors.toCollection(TreeSet::new));
    assertThat(ROOMS.keySet()).containsAll(found);
  }

  @Test
  void aRoomUsesOnlyTheRoomsItsRowNames() {
    List<String> breaches = new ArrayList<>();
    for (JavaClass type : classes) {
      Set<String> allowed = ROOMS.get(roomOf(type));
      type.getDirectDependenciesFromSelf()
          .forEach(
              dependency -> {
                String target = roomOf(dependency.getTargetClass().getBaseComponentType());
                if (!target.isEmpty()
                    && !target.equals(roomOf(type))
                    && !allowed.contains(target)) {
                  breaches.add(dependency.getDescription());
                }
              });
    }
    assertThat(breaches).isEmpty();
  }

  @Test
  void theRoomsHaveNoCircles() {
    slices().matching("org.flexbound.(*)..").should().beFreeOfCycles().check(classes);
  }

  @Test
  void nothingIsCalledUtilCommonHelperManagerOrMisc() {
    classes()
        .should()
        .haveNameNotMatching("(?i).*\\b\\w*(util|utils|common|helper|manager|misc)\\b.*")
        .check(classes);
  }

  @Test
  void onlyTheCommandLinePrintsOrEnds() {
    noClasses()
        .that()
        .resideOutsideOfPackage("org.flexbound.app..")
        .should()
        .accessField(System.class, "out")
        .orShould()
        .accessField(System.class, "err")
        .orShould()
        .callMethod(System.class, "exit", int.class)
        .check(classes);
  }
}
