package ebbline;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.plantuml.rules.PlantUmlArchCondition.Configuration.consideringOnlyDependenciesInDiagram;
import static com.tngtech.archunit.library.plantuml.rules.PlantUmlArchCondition.adhereToPlantUmlDiagram;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;

/** The house keeps to its drawing, and third parties stay in their rooms. */
class ArchitectureTest {
  private static final JavaClasses HOUSE =
      new ClassFileImporter()
          .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
          .importPackages("ebbline");

  @Test
  void importsGoDownAlongTheArrowsOnly() {
    classes()
        .should(
            adhereToPlantUmlDiagram(
                Path.of("docs", "floors.puml"), consideringOnlyDependenciesInDiagram()))
        .check(HOUSE);
  }

  @Test
  void everyPackageIsInTheDrawing() {
    // The condition above throws for a class outside the drawing only if it is asked for all.
    classes()
        .should()
        .resideInAnyPackage(
            "ebbline.cli..",
            "ebbline.report..",
            "ebbline.data..",
            "ebbline.check..",
            "ebbline.risk..",
            "ebbline.fitting..",
            "ebbline.pricing..",
            "ebbline.model..",
            "ebbline.bond..",
            "ebbline.curve..",
            "ebbline.instrument..",
            "ebbline.time..")
        .check(HOUSE);
  }

  @Test
  void filesAreReadAndWrittenByTwoPackagesOnly() {
    noClasses()
        .that()
        .resideOutsideOfPackages("ebbline.data..", "ebbline.report..")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage("com.opencsv..", "com.fasterxml..")
        .check(HOUSE);
  }

  @Test
  void onlyTheCommandLineUsesItsParser() {
    noClasses()
        .that()
        .resideOutsideOfPackage("ebbline.cli..")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage("picocli..")
        .check(HOUSE);
  }
}
