package steelyard.arch;

import static com.tngtech.archunit.base.DescribedPredicate.not;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAPackage;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.Architectures.layeredArchitecture;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.ArchRule;
import java.time.Clock;
import java.time.Instant;
import java.util.Date;
import java.util.List;
import java.util.Random;
import java.util.SplittableRandom;
import java.util.concurrent.ThreadLocalRandom;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.variants.model.Constraint;

/** Holds the layers, and shows that each rule would notice a class that breaks it. */
class ArchitectureTest {
  private static final JavaClasses MAIN =
      new ClassFileImporter()
          .withImportOption(new ImportOption.DoNotIncludeTests())
          .importPackages("steelyard");

  private static final JavaClasses WITH_OFFENDERS =
      new ClassFileImporter().importPackages("steelyard");

  static List<ArchRule> rules() {
    return Stream.concat(
            Stream.of(
                layers(),
                noCycles(),
                backendsApart(),
                onlyWorkersLoadSolversAndFamilies(),
                engineSeesNoModel(),
                constraintsAreRecords(),
                seeded(),
                oneClock(),
                onlyProcessStartsProcesses(),
                standardStreams()),
            libraries().map(Library::rule))
        .toList();
  }

  private static ArchRule layers() {
    return layeredArchitecture()
        .consideringOnlyDependenciesInLayers()
        .layer("harness")
        .definedBy("steelyard.harness..")
        .layer("adapters")
        .definedBy("steelyard.adapters..")
        .layer("variants")
        .definedBy("steelyard.variants..")
        .layer("results")
        .definedBy("steelyard.results..")
        .whereLayer("harness")
        .mayNotBeAccessedByAnyLayer()
        .whereLayer("adapters")
        .mayOnlyBeAccessedByLayers("harness")
        .whereLayer("results")
        .mayOnlyBeAccessedByLayers("harness")
        .whereLayer("variants")
        .mayOnlyBeAccessedByLayers("adapters", "harness");
  }

  private static ArchRule noCycles() {
    return slices().matching("steelyard.(**)").should().beFreeOfCycles();
  }

  private static ArchRule backendsApart() {
    return slices()
        .matching("steelyard.adapters.(*)..")
        .should()
        .notDependOnEachOther()
        .ignoreDependency(
            resideInAPackage("steelyard.adapters.."), resideInAPackage("steelyard.adapters.spi.."))
        .ignoreDependency(
            resideInAPackage("steelyard.adapters.program.."),
            resideInAPackage("steelyard.adapters.sat.encoding.."))
        .as("no adapter knows another; only the encoding of clauses is shared");
  }

  private static ArchRule onlyWorkersLoadSolversAndFamilies() {
    return noClasses()
        .that()
        .resideInAPackage("steelyard.harness..")
        .and()
        .resideOutsideOfPackage("steelyard.harness.worker..")
        .should()
        .dependOnClassesThat(
            resideInAPackage("steelyard.adapters..")
                .and(not(resideInAPackage("steelyard.adapters.spi..")))
                .or(resideInAPackage("steelyard.variants.catalog..")))
        .as("only workers load solvers and families");
  }

  private static ArchRule engineSeesNoModel() {
    return noClasses()
        .that()
        .resideInAnyPackage(
            "steelyard.adapters.engine.core..",
            "steelyard.adapters.engine.propagators..",
            "steelyard.adapters.engine.search..")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage("steelyard.variants..", "steelyard.adapters.spi..");
  }

  private static ArchRule constraintsAreRecords() {
    return classes()
        .that()
        .areAssignableTo(Constraint.class)
        .and()
        .areNotInterfaces()
        .should()
        .beRecords();
  }

  private static ArchRule seeded() {
    return noClasses()
        .should()
        .callMethod(Math.class, "random")
        .orShould()
        .dependOnClassesThat()
        .areAssignableTo(ThreadLocalRandom.class)
        .orShould()
        .callConstructor(Random.class)
        .orShould()
        .callConstructor(SplittableRandom.class)
        .as("every random number comes from a seed");
  }

  private static ArchRule oneClock() {
    return noClasses()
        .that()
        .doNotHaveFullyQualifiedName("steelyard.harness.cli.Desk")
        .should()
        .callMethod(System.class, "currentTimeMillis")
        .orShould()
        .callMethod(Instant.class, "now")
        .orShould()
        .callConstructor(Date.class)
        .orShould()
        .callMethod(Clock.class, "systemUTC")
        .as("the time of day comes from one clock");
  }

  private static ArchRule onlyProcessStartsProcesses() {
    return noClasses()
        .that()
        .resideOutsideOfPackage("steelyard.harness.process..")
        .should()
        .dependOnClassesThat()
        .areAssignableTo(ProcessBuilder.class);
  }

  private static ArchRule standardStreams() {
    return noClasses()
        .that()
        .resideOutsideOfPackages("steelyard.harness.cli..", "steelyard.harness.worker..")
        .should()
        .accessField(System.class, "out")
        .orShould()
        .accessField(System.class, "err");
  }

  /** A library and the packages that may use it. */
  private record Library(String packages, List<String> homes) {
    Library(String packages, String... homes) {
      this(packages, List.of(homes));
    }

    ArchRule rule() {
      return noClasses()
          .that()
          .resideOutsideOfPackages(homes.toArray(String[]::new))
          .should()
          .dependOnClassesThat()
          .resideInAPackage(packages)
          .as(packages + " is used only in " + homes);
    }

    boolean isUsed() {
      return MAIN.stream()
          .filter(it -> resideInAnyPackage(homes.toArray(String[]::new)).test(it))
          .flatMap(it -> it.getDirectDependenciesFromSelf().stream())
          .anyMatch(d -> resideInAPackage(packages).test(d.getTargetClass()));
    }
  }

  private static Stream<Library> libraries() {
    return Stream.of(
        new Library("org.sat4j..", "steelyard.adapters.sat.."),
        new Library("com.google.ortools..", "steelyard.adapters.cpsat.."),
        new Library("org.knowm..", "steelyard.results.brief.."),
        new Library("gg.jte..", "steelyard.results.brief..", "gg.jte.."),
        new Library("org.jdbi..", "steelyard.results.ledger.."),
        new Library("org.flywaydb..", "steelyard.results.ledger.."),
        new Library("picocli..", "steelyard.harness.cli.."),
        new Library("me.tongfei..", "steelyard.harness.cli.."),
        new Library("oshi..", "steelyard.harness.process.."),
        new Library(
            "com.fasterxml.jackson.databind..",
            "steelyard.harness.sweep..",
            "steelyard.results.ledger..",
            "steelyard.results.brief.."),
        new Library(
            "com.fasterxml.jackson.core..",
            "steelyard.harness.worker..",
            "steelyard.harness.sweep..",
            "steelyard.harness.cli..",
            "steelyard.results.ledger..",
            "steelyard.results.brief.."));
  }

  @ParameterizedTest
  @MethodSource("rules")
  void main_code_keeps(ArchRule rule) {
    rule.check(MAIN);
  }

  /** The constraint rule has no offender: the type is sealed, javac refuses one. */
  static List<ArchRule> offendedRules() {
    String sealed = constraintsAreRecords().getDescription();
    return rules().stream().filter(rule -> !rule.getDescription().equals(sealed)).toList();
  }

  @ParameterizedTest
  @MethodSource("offendedRules")
  void a_planted_offender_is_noticed(ArchRule rule) {
    assertThat(rule.evaluate(WITH_OFFENDERS).hasViolation()).as(rule.getDescription()).isTrue();
  }

  /** A misspelt package would never be broken. */
  @Test
  void every_confined_library_is_used_at_home() {
    assertThat(libraries()).allMatch(Library::isUsed);
  }
}
