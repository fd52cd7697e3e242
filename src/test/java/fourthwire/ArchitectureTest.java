package fourthwire;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.GeneralCodingRules.NO_CLASSES_SHOULD_ACCESS_STANDARD_STREAMS;
import static com.tngtech.archunit.library.GeneralCodingRules.NO_CLASSES_SHOULD_THROW_GENERIC_EXCEPTIONS;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The house rules: which package may use which, and what the engine must not know. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class ArchitectureTest {
  /** Each package and the packages of ours it may use; a package not named here fails the test. */
  private static final Map<String, Set<String>> MAY_USE = new TreeMap<>();

  private static final Set<String> ENGINE =
      Set.of("quantity", "site", "load", "network", "limits", "metering", "audit", "report");

  static {
    MAY_USE.put("quantity", Set.of());
    MAY_USE.put("site", Set.of("quantity"));
    MAY_USE.put("network", Set.of("quantity"));
    MAY_USE.put("limits", Set.of("quantity"));
    MAY_USE.put("load", Set.of("quantity", "site"));
    MAY_USE.put("metering", Set.of("quantity", "site"));
    MAY_USE.put("audit", Set.of("quantity", "site", "load", "network", "limits", "metering"));
    MAY_USE.put("json", Set.of("quantity", "site", "limits", "metering", "audit"));
    MAY_USE.put("intake", Set.of("quantity", "site", "load", "metering"));
    MAY_USE.put("store", Set.of("quantity", "site", "load", "limits", "metering", "audit", "json"));
    MAY_USE.put(
        "jobs",
        Set.of("quantity", "site", "load", "limits", "metering", "audit", "intake", "json"));
    MAY_USE.put(
        "web",
        Set.of(
            "quantity", "site", "load", "limits", "metering", "audit", "intake", "jobs", "json"));
    MAY_USE.put(
        "config",
        Set.of(
            "quantity",
            "site",
            "load",
            "network",
            "limits",
            "metering",
            "audit",
            "json",
            "intake",
            "store",
            "jobs",
            "web"));
  }

  private final JavaClasses house =
      new ClassFileImporter()
          .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
          .importPackages("fourthwire");

  static Stream<String> packages() {
    return MAY_USE.keySet().stream();
  }

  @Test
  void theRulesAreHeldAgainstTheWholeHouse() {
    assertThat(house.size()).isGreaterThan(200);
    assertThat(
            house.stream().map(c -> room(c.getPackageName())).filter(r -> !r.isEmpty()).distinct())
        .as("every package has its line in the table")
        .allSatisfy(room -> assertThat(MAY_USE).containsKey(room));
  }

  @ParameterizedTest
  @MethodSource("packages")
  void usesOnlyWhatItMay(String room) {
    List<String> forbidden = new ArrayList<>(MAY_USE.keySet());
    forbidden.remove(room);
    forbidden.removeAll(MAY_USE.get(room));
    String[] patterns =
        forbidden.stream().map(p -> "fourthwire." + p + "..").toArray(String[]::new);
    noClasses()
        .that()
        .resideInAPackage("fourthwire." + room + "..")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage(patterns)
        .allowEmptyShould(true)
        .check(house);
  }

  @Test
  void packagesMakeNoCycles() {
    slices().matching("fourthwire.(**)").should().beFreeOfCycles().check(house);
  }

  @Test
  void theEngineKnowsNoFrameworkNoDatabaseNoFilesNoClock() {
    String[] engine = ENGINE.stream().map(p -> "fourthwire." + p + "..").toArray(String[]::new);
    noClasses()
        .that()
        .resideInAnyPackage(engine)
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage(
            "org.springframework..",
            "jakarta..",
            "java.sql..",
            "javax.sql..",
            "java.nio.file..",
            "java.net..",
            "tools.jackson..",
            "com.fasterxml..")
        .because("the engine is plain Java that any program could use")
        .check(house);
    for (Class<?> clock : List.of(Instant.class, LocalDate.class, LocalDateTime.class)) {
      noClasses()
          .that()
          .resideInAnyPackage(engine)
          .should()
          .callMethod(clock, "now")
          .because("a result must not depend on when it was computed")
          .check(house);
    }
  }

  @Test
  void nothingWritesToStandardStreamsOrThrowsGenericExceptions() {
    NO_CLASSES_SHOULD_ACCESS_STANDARD_STREAMS.check(house);
    NO_CLASSES_SHOULD_THROW_GENERIC_EXCEPTIONS.check(house);
  }

  @Test
  void onlyTheApplicationLivesInTheRoot() {
    classes()
        .that()
        .resideInAPackage("fourthwire")
        .and()
        .areTopLevelClasses()
        .should()
        .haveSimpleName("Application")
        .orShould()
        .haveSimpleName("package-info")
        .check(house);
  }

  @Test
  void everyPackageSaysWhatItIsForAndIsNullMarked() throws IOException {
    Path sources = Path.of("src/main/java/fourthwire");
    try (Stream<Path> files = Files.walk(sources)) {
      List<Path> folders =
          files
              .filter(f -> f.toString().endsWith(".java"))
              .map(Path::getParent)
              .distinct()
              .sorted()
              .toList();
      assertThat(folders).isNotEmpty();
      for (Path folder : folders) {
        Path info = folder.resolve("package-info.java");
        assertThat(info).exists();
        assertThat(Files.readString(info))
            .as(info.toString())
            .contains("@org.jspecify.annotations.NullMarked", "/**");
      }
    }
  }

  private static String room(String packageName) {
    String[] parts = packageName.split("\\.");
    return parts.length > 1 ? parts[1] : "";
  }
}
