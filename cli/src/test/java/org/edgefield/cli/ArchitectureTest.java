package org.edgefield.cli;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.Architectures.layeredArchitecture;

import com.tngtech.archunit.core.importer.ImportOption.DoNotIncludeTests;
import com.tngtech.archunit.junit.AnalyzeClasses;
import com.tngtech.archunit.junit.ArchTest;
import com.tngtech.archunit.lang.ArchRule;

@AnalyzeClasses(packages = "org.edgefield", importOptions = DoNotIncludeTests.class)
class ArchitectureTest {
  @ArchTest
  static final ArchRule ARROWS =
      layeredArchitecture()
          .consideringOnlyDependenciesInLayers()
          .layer("importer")
          .definedBy("org.edgefield.importer..")
          .layer("curvature")
          .definedBy("org.edgefield.curvature..")
          .layer("field")
          .definedBy("org.edgefield.field..")
          .layer("cli")
          .definedBy("org.edgefield.cli..")
          .whereLayer("cli")
          .mayNotBeAccessedByAnyLayer()
          .whereLayer("field")
          .mayOnlyBeAccessedByLayers("cli")
          .whereLayer("curvature")
          .mayOnlyBeAccessedByLayers("field", "cli");

  @ArchTest
  static final ArchRule MODELS_ARE_FOR_TESTS =
      noClasses()
          .that()
          .resideInAnyPackage(
              "org.edgefield.importer..",
              "org.edgefield.curvature..",
              "org.edgefield.field..",
              "org.edgefield.cli..")
          .should()
          .dependOnClassesThat()
          .resideInAPackage("org.edgefield.models..");

  @ArchTest
  static final ArchRule ONLY_CONSOLE_READS_THE_ENVIRONMENT =
      noClasses()
          .that()
          .resideInAnyPackage(
              "org.edgefield.curvature..", "org.edgefield.field..", "org.edgefield.cli..")
          .and()
          .resideOutsideOfPackage("org.edgefield.cli.console..")
          .should()
          .callMethod(System.class, "getenv")
          .orShould()
          .callMethod(System.class, "getenv", String.class)
          .orShould()
          .callMethod(System.class, "getProperty", String.class)
          .orShould()
          .accessField(System.class, "out")
          .orShould()
          .accessField(System.class, "err");
}
