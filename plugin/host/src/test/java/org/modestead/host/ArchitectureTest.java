package org.modestead.host;

import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.library.GeneralCodingRules;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/** The arrows host -> nodes -> engine, and what each part may know. The classes are read once for all tests. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class ArchitectureTest {

    private static final String ENGINE = "org.modestead.engine..";
    private static final String NODES = "org.modestead.nodes..";
    private static final String HOST = "org.modestead.host..";
    private static final int LEAST_CLASSES = 200;

    private final JavaClasses classes = new ClassFileImporter().withImportOption(new ImportOption.DoNotIncludeTests())
            .importPackages("org.modestead");

    @Test
    void theScanSeesAllThreeModules() {
        assertTrue(classes.size() > LEAST_CLASSES, "only " + classes.size() + " classes");
        for (String part : new String[] {ENGINE, NODES, HOST}) {
            assertTrue(classes.stream().anyMatch(resideInAnyPackage(part)), part);
        }
    }

    @Test
    void theEngineKnowsNeitherNodesNorHostNorFormatsNorPictures() {
        noClasses().that().resideInAPackage(ENGINE).should().dependOnClassesThat().resideInAnyPackage(NODES,
                HOST, "org.duckdb..",
                "com.fasterxml..", "picocli..", "org.knowm..", "java.awt..", "javax.swing..", "java.sql..").check(classes);
    }

    @Test
    void nodesKnowNoHostAndNoneOfItsLibraries() {
        noClasses().that().resideInAPackage(NODES).should().dependOnClassesThat().resideInAnyPackage(HOST, "org.duckdb..",
                "com.fasterxml.jackson.databind..", "picocli..", "java.sql..", "javax.swing..").check(classes);
    }

    @Test
    void onlyModelFilesOfTheNodesKnowJson() {
        noClasses().that().resideInAPackage(NODES).and().resideOutsideOfPackage("org.modestead.nodes.modelfile..")
                .should().dependOnClassesThat().resideInAPackage("com.fasterxml..").check(classes);
    }

    /** The accelerator is found at run time and may be missing. */
    @Test
    void nothingKnowsTheAcceleratorWhichKnowsTheEngineOnly() {
        noClasses().that().resideOutsideOfPackage("org.modestead.accelerator..").should().dependOnClassesThat()
                .resideInAnyPackage("org.modestead.accelerator..", "org.bytedeco..").check(classes);
        noClasses().that().resideInAPackage("org.modestead.accelerator..").should().dependOnClassesThat()
                .resideInAnyPackage(NODES, HOST).check(classes);
    }

    /** The bridge and the job stand above or beside: BoundaryTest and SparkArrowsTest hold them from their side. */
    @Test
    void engineNodesAndHostKnowNeitherTheBridgeNorItsPlatformNorTheJobOnManyMachines() {
        noClasses().should().dependOnClassesThat().resideInAnyPackage("org.modestead.knime..", "org.knime..",
                "org.modestead.spark..", "org.apache.spark..", "org.apache.hadoop..").check(classes);
    }

    @Test
    void theEngineKnowsItsTwoLibrariesAndTheJdkOnly() {
        classes().that().resideInAPackage(ENGINE).should().onlyDependOnClassesThat()
                .resideInAnyPackage(ENGINE, "org.ejml..", "org.jgrapht..", "java..").check(classes);
    }

    @Test
    void nothingKnowsAnEditorsWorkbench() {
        noClasses().should().dependOnClassesThat()
                .resideInAnyPackage("org.eclipse.swt..", "org.eclipse.jface..", "org.eclipse.ui..")
                .check(classes);
    }

    @Test
    void packagesOfTheHostFormNoCircle() {
        slices().matching("org.modestead.host.(**)").should().beFreeOfCycles().check(classes);
    }

    @Test
    void packagesOfTheNodesFormNoCircle() {
        slices().matching("org.modestead.nodes.(**)").should().beFreeOfCycles().check(classes);
    }

    @Test
    void packagesOfTheEngineFormNoCircle() {
        slices().matching("org.modestead.engine.(**)").should().beFreeOfCycles().check(classes);
    }

    @Test
    void onlyTheCommandLineSpeaksAndOnlyMainTouchesTheStandardStreams() {
        noClasses().that().doNotHaveFullyQualifiedName(Main.class.getName())
                .should(GeneralCodingRules.ACCESS_STANDARD_STREAMS).check(classes);
    }

    @Test
    void noClassThrowsExceptionsWithoutAName() {
        noClasses().should(GeneralCodingRules.THROW_GENERIC_EXCEPTIONS).check(classes);
    }

    /** A draw that fails once in many builds tells nothing of the change that is built. */
    @Test
    void everyPropertyDrawsFromAWrittenSeed() throws IOException {
        Pattern unseeded = Pattern.compile("(?m)^\\s*@Property\\b(?!\\([^)]*\\bseed = )");
        List<String> found = new ArrayList<>();
        for (Path tests : testsOfAllModules()) {
            try (Stream<Path> files = Files.walk(tests)) {
                for (Path source : files.filter(path -> path.toString().endsWith(".java")).toList()) {
                    if (unseeded.matcher(Files.readString(source)).find()) {
                        found.add(source.toString());
                    }
                }
            }
        }
        assertEquals(List.of(), found);
    }

    /** Only the sources: what a build writes beside them changes while they are read. */
    private static List<Path> testsOfAllModules() throws IOException {
        try (Stream<Path> modules = Files.list(Path.of(".."))) {
            List<Path> tests = modules.map(module -> module.resolve("src/test/java")).filter(Files::isDirectory).toList();
            assertTrue(tests.size() > 3, "modules with tests: " + tests);
            return tests;
        }
    }
}
