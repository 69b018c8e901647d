package org.modestead.nodes.contract;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.net.URL;
import java.net.URLClassLoader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.nodes.contract.NodeDeclaration.Stage;

class NodeCatalogTest {

    private record Named(String id, Stage stage) implements Node {
        @Override
        public NodeDeclaration declaration() {
            return new NodeDeclaration(id, "T", stage, "P.", "D.", List.of(), List.of(), List.of(), List.of(), List.of(),
                    1);
        }

        @Override
        public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
            return new NodeResult(Map.of(), List.of(), List.of(), List.of());
        }
    }

    @Test
    void nodesComeByStageAndThenAsFound() {
        NodeCatalog catalog = NodeCatalog.of(List.of(new Named("d", Stage.REPORT), new Named("b", Stage.FIT),
                new Named("c", Stage.FIT),
                new Named("a", Stage.DATA)));
        assertEquals(List.of("a", "b", "c", "d"), catalog.ids());
    }

    @Test
    void twoNodesOfOneIdAreRefusedWithBothClasses() {
        CatalogFault fault = assertThrows(CatalogFault.class,
                () -> NodeCatalog.of(List.of(new Named("a", Stage.FIT), new Named("a", Stage.DATA))));
        assertEquals("node a", fault.where());
        assertTrue(fault.seen().contains(Named.class.getName()));
    }

    @Test
    void aClassSeenThroughTwoLoadersCountsOnce() {
        ClassLoader own = Node.class.getClassLoader();
        try (URLClassLoader child = new URLClassLoader(new URL[0], own)) {
            assertEquals(NodeCatalog.load(List.of(own)).ids(), NodeCatalog.load(List.of(own, child)).ids());
        } catch (java.io.IOException cannotClose) {
            throw new AssertionError(cannotClose);
        }
    }

    @Test
    void aServiceFileThatNamesNoClassIsToldInOneSentence(@TempDir Path folder) throws java.io.IOException {
        Path file = folder.resolve("META-INF/services/" + Node.class.getName());
        Files.createDirectories(file.getParent());
        Files.writeString(file, "org.example.Absent\n");
        try (URLClassLoader broken = new URLClassLoader(new URL[] {folder.toUri().toURL()},
                Node.class.getClassLoader())) {
            CatalogFault fault = assertThrows(CatalogFault.class, () -> NodeCatalog.load(List.of(broken)));
            assertTrue(fault.getMessage().contains("org.example.Absent"), fault.getMessage());
        }
    }

    @Test
    void aMistypedIdLeadsToTheNearestOne() {
        NodeCatalog catalog = NodeCatalog.of(List.of(new Named("snapshot-builder", Stage.PREPARE), new Named("forecast",
                Stage.FORECAST)));
        assertEquals(Optional.of("snapshot-builder"), catalog.nearest("snapshots-builder"));
        assertEquals(Optional.empty(), catalog.nearest("spectrogram"));
        assertTrue(catalog.find("forecast").isPresent());
        assertTrue(catalog.find("Forecast").isEmpty());
    }
}
