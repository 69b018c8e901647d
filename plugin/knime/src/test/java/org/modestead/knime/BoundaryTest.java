package org.modestead.knime;

import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.jar.Attributes;
import java.util.jar.Manifest;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** What the bridge may know: the platform's core, the nodes and the JDK; and what its manifest says of that. */
class BoundaryTest {

    private final JavaClasses bridge = new ClassFileImporter().withImportOption(new ImportOption.DoNotIncludeTests())
            .importPackages("org.modestead.knime");

    @Test
    void byteCodeNamesNothingButThePlatformsCoreTheNodesAndTheJdk() {
        classes().should().onlyDependOnClassesThat(resideInAnyPackage("org.modestead.knime..", "org.modestead.nodes..",
                "org.modestead.engine..", "org.knime.core..", "java..", "javax..", "org.w3c.dom..", "org.xml.sax..")).check(bridge);
    }

    @Test
    void byteCodeNamesNoWorkbench() {
        noClasses().should().dependOnClassesThat().resideInAnyPackage("org.eclipse..", "org.knime.workbench..",
                "org.knime.core.ui..", "org.knime.core.internal..").check(bridge);
    }

    /** Arrows point one way: knime -> nodes -> engine; the embedded host is another world. */
    @Test
    void theBridgeKnowsNothingOfTheEmbeddedHostAndTheNodesNothingOfTheBridge() {
        noClasses().should().dependOnClassesThat().resideInAnyPackage("org.modestead.host..").check(bridge);
        JavaClasses below = new ClassFileImporter().withImportOption(new ImportOption.DoNotIncludeTests())
                .importPackages("org.modestead.nodes", "org.modestead.engine");
        noClasses().should().dependOnClassesThat().resideInAnyPackage("org.modestead.knime..", "org.knime..").check(below);
    }

    /** What runs on a server knows nothing of what a person sees, except where the platform asks for it by signature. */
    @Test
    void onlyFactoryAndPortsKnowDialogsAndViews() {
        noClasses().that().resideOutsideOfPackages("org.modestead.knime.dialog..", "org.modestead.knime.view..")
                .and().doNotHaveFullyQualifiedName(DeclaredNodeFactory.class.getName())
                .and().doNotHaveFullyQualifiedName("org.modestead.knime.port.PortViews")
                .should().dependOnClassesThat().resideInAnyPackage("org.modestead.knime.dialog..", "org.modestead.knime.view..").check(bridge);
    }

    /** Names inside texts too: a class could be asked for by reflection. */
    @Test
    void noClassFileMentionsAWorkbench() throws IOException {
        try (Stream<Path> files = Files.walk(Path.of("target", "classes"))) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                String bytes = new String(Files.readAllBytes(file), java.nio.charset.StandardCharsets.ISO_8859_1);
                for (String toolkit : List.of("org/eclipse/swt", "org.eclipse.swt", "org/eclipse/jface", "org.eclipse.jface",
                        "org/eclipse/ui", "org.eclipse.ui")) {
                    assertFalse(bytes.contains(toolkit), file + " mentions " + toolkit);
                }
            }
        }
    }

    @Test
    void manifestImportsOnlyPackagesAndPinsThePlatformsToItsCore() throws IOException {
        Attributes manifest = manifest();
        assertEquals(null, manifest.getValue("Require-Bundle"));
        assertEquals(null, manifest.getValue("Export-Package"), "no package of ours or of a library is offered to others");
        assertEquals("JavaSE-17", manifest.getValue("Bundle-RequiredExecutionEnvironment"));
        for (String clause : manifest.getValue("Import-Package").split(",(?=(?:[^\"]*\"[^\"]*\")*[^\"]*$)")) {
            String name = clause.split(";")[0];
            boolean platform = name.startsWith("org.knime.core.");
            boolean ours = name.startsWith("org.modestead.engine") || name.startsWith("org.modestead.nodes");
            boolean jdk = name.startsWith("javax.") || name.startsWith("org.w3c.dom") || name.startsWith("org.xml.sax");
            assertTrue(platform || ours || jdk, clause);
            assertEquals(platform, clause.contains("bundle-symbolic-name=\"org.knime.core\""), clause);
            assertEquals(platform, clause.contains("bundle-version=\"[5.5.0,6.0.0)\""), clause);
            // The platform's core exports without versions: a range would never be met.
            assertEquals(platform, clause.contains(";version=\"0.0.0\""), clause);
            assertEquals(ours, clause.matches(".*;version=\"\\[0[.]\\d+,0[.]\\d+\\)\".*"), clause);
        }
    }

    private static Attributes manifest() throws IOException {
        try (InputStream in = Files.newInputStream(Path.of("target", "classes", "META-INF", "MANIFEST.MF"))) {
            return new Manifest(in).getMainAttributes();
        }
    }
}
