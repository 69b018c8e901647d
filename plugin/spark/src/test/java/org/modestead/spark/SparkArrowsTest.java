package org.modestead.spark;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import org.junit.jupiter.api.Test;

/** The arrow spark -> engine, and nothing the other way. */
class SparkArrowsTest {

    private final JavaClasses classes = new ClassFileImporter().withImportOption(new ImportOption.DoNotIncludeTests())
            .importPackages("org.modestead");

    @Test
    void theJobKnowsTheEngineOnly() {
        assertTrue(classes.stream().anyMatch(found -> found.getPackageName().equals("org.modestead.spark")));
        noClasses().that().resideInAPackage("org.modestead.spark..").should().dependOnClassesThat()
                .resideInAnyPackage("org.modestead.nodes..", "org.modestead.host..", "org.modestead.knime..").check(classes);
    }

    @Test
    void nothingKnowsTheJobOrSpark() {
        noClasses().that().resideOutsideOfPackage("org.modestead.spark..").should().dependOnClassesThat()
                .resideInAnyPackage("org.modestead.spark..", "org.apache.spark..", "org.apache.hadoop..").check(classes);
    }
}
