package railwalk;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.Dependency;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.util.Collection;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

/**
 * The house plan as data: which package stands on which floor and who owns which library. A package
 * uses only floors below its own; siblings don't see each other.
 */
class ArchitectureTest {
  /** From the ground up; packages of one line are siblings. */
  private static final List<List<String>> FLOORS =
      List.of(
          List.of("units", "source"),
          List.of("device"),
          List.of("circuit"),
          List.of("netlist", "walk", "readings"),
          List.of("solve"),
          List.of("spread", "findings", "fit"),
          List.of("diagnosis"),
          List.of("chart"),
          List.of("render.type"),
          List.of("render.pdf", "render.text", "render.csv", "render.json"),
          List.of("app"),
          List.of("cli"));

  /** The packages of each library, and the one package of ours that may use them. */
  private static final Map<String, String> LIBRARY_OWNERS =
      Map.of(
          "org.antlr", "netlist",
          "org.jgrapht", "walk",
          "org.apache.pdfbox", "render.pdf",
          "org.apache.fontbox", "render.pdf",
          "org.hipparchus.optim", "fit",
          "org.hipparchus.linear", "fit",
          "org.hipparchus.random", "spread",
          "picocli", "cli",
          "com.fasterxml", "render.json");

  private static final JavaClasses CLASSES =
      new ClassFileImporter()
          .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
          .importPackages("railwalk");

  @Test
  void everyPackageStandsOnAFloorAndEveryFloorIsThere() {
    TreeSet<String> seen =
        CLASSES.stream()
            .filter(c -> !c.getSimpleName().equals("package-info"))
            .map(ArchitectureTest::packageOf)
            .collect(Collectors.toCollection(TreeSet::new));
    System.out.println("Packages seen: " + seen + ", classes: " + CLASSES.size());
    assertThat(seen).containsExactlyInAnyOrderElementsOf(floorOf().keySet());
  }

  @Test
  void arrowsPointDownstairs() {
    Map<String, Integer> floorOf = floorOf();
    List<String> upward =
        CLASSES.stream()
            .flatMap(c -> c.getDirectDependenciesFromSelf().stream())
            .filter(d -> isOurs(d.getTargetClass()))
            .filter(d -> !packageOf(d.getOriginClass()).equals(packageOf(d.getTargetClass())))
            .filter(d -> floor(floorOf, d.getTargetClass()) >= floor(floorOf, d.getOriginClass()))
            .map(Dependency::getDescription)
            .toList();
    assertThat(upward).isEmpty();
  }

  @Test
  void packagesFormNoCircle() {
    slices().matching("railwalk.(**)").should().beFreeOfCycles().check(CLASSES);
  }

  @Test
  void eachLibraryHasOneOwner() {
    List<String> trespasses =
        CLASSES.stream()
            .flatMap(c -> c.getDirectDependenciesFromSelf().stream())
            .filter(d -> isForeign(d.getTargetClass(), packageOf(d.getOriginClass())))
            .map(Dependency::getDescription)
            .toList();
    assertThat(trespasses).isEmpty();
  }

  /** The same input gives the same bytes, so nothing below the command line asks for the time. */
  @Test
  void nothingBelowTheCommandLineAsksForTheTime() {
    noClasses()
        .that()
        .resideOutsideOfPackage("railwalk.cli")
        .should()
        .callMethod(System.class, "currentTimeMillis")
        .orShould()
        .callMethod(System.class, "nanoTime")
        .orShould()
        .dependOnClassesThat()
        .resideInAPackage("java.time")
        .check(CLASSES);
  }

  @Test
  void onlyTheDoorEndsTheProcess() {
    noClasses()
        .that()
        .doNotHaveFullyQualifiedName("railwalk.cli.Main")
        .should()
        .callMethod(System.class, "exit", int.class)
        .check(CLASSES);
  }

  private static Map<String, Integer> floorOf() {
    Map<String, Integer> floorOf = new HashMap<>();
    for (int floor = 0; floor < FLOORS.size(); floor++) {
      for (String name : FLOORS.get(floor)) {
        floorOf.put(name, floor);
      }
    }
    assertThat(floorOf).hasSize((int) FLOORS.stream().mapToLong(Collection::size).sum());
    return floorOf;
  }

  private static int floor(Map<String, Integer> floorOf, JavaClass type) {
    Integer floor = floorOf.get(packageOf(type));
    assertThat(floor).as("floor of %s", type.getName()).isNotNull();
    return floor;
  }

  /** Returns whether {@code type} belongs to a library that another package owns. */
  private static boolean isForeign(JavaClass type, String user) {
    return LIBRARY_OWNERS.entrySet().stream()
        .filter(e -> isInside(type.getPackageName(), e.getKey()))
        .anyMatch(e -> !e.getValue().equals(user));
  }

  private static boolean isOurs(JavaClass type) {
    return isInside(type.getPackageName(), "railwalk");
  }

  private static boolean isInside(String packageName, String prefix) {
    return packageName.equals(prefix) || packageName.startsWith(prefix + ".");
  }

  private static String packageOf(JavaClass type) {
    return type.getPackageName().replaceFirst("^railwalk\\.", "");
  }
}
