package org.modestead.knime;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.knime.core.node.NodeSettings;
import org.knime.core.node.NodeSettingsRO;
import org.modestead.knime.columns.ColumnRules;
import org.modestead.knime.settings.NativeSettings;
import org.modestead.nodes.contract.SettingsReader;

/** The workflows of test-workflows/knime, which the platform itself has saved: every setting of every node of ours is still understood. */
class SavedWorkflowsTest {

    private static final Path FOLDER = Path.of(System.getProperty("basedir", ""), "../../test-workflows/knime").toAbsolutePath().normalize();
    private static final String OURS = DeclaredNodeFactory.class.getName();

    /** Returns the settings files of our nodes. */
    static List<Path> nodes() throws IOException {
        try (Stream<Path> files = Files.walk(FOLDER)) {
            List<Path> found = files.filter(file -> file.getFileName().toString().equals("settings.xml")).sorted().toList();
            return found.stream().filter(file -> text(file).contains("value=\"" + OURS + "\"")).map(FOLDER::relativize).toList();
        }
    }

    @Test
    void workflowsAreThere() throws IOException {
        Set<String> workflows = nodes().stream().map(file -> file.getName(0).toString()).collect(Collectors.toCollection(TreeSet::new));
        assertTrue(workflows.containsAll(Set.of("pump-house", "three-flows")), workflows.toString());
        assertTrue(nodes().size() > 20, nodes().toString());
    }

    @ParameterizedTest
    @MethodSource("nodes")
    void everySettingIsUnderstood(Path file) throws Exception {
        NodeSettingsRO stored;
        try (InputStream in = Files.newInputStream(FOLDER.resolve(file))) {
            stored = NodeSettings.loadFromXML(in);
        }
        Rig rig = Rig.of(stored.getNodeSettings("factory_settings").getString(DeclaredNodeFactory.NODE));
        NodeSettingsRO model = stored.getNodeSettings("model");
        rig.engine().settings((NodeSettings) model);
        SettingsReader.Reading reading = SettingsReader.read(Rig.node(rig.declaration().id()), NativeSettings.read(rig.declaration(), model));
        assertEquals(List.of(), reading.problems());
        Set<String> unknown = new TreeSet<>(model.keySet());
        unknown.removeIf(key -> key.endsWith("_Internals"));
        unknown.removeAll(ColumnRules.keys(rig.declaration()));
        // a setting that came later is not stored and has its default; one that is stored must not have gone
        assertEquals(Set.of(), unknown, "stored, but of no use");
    }

    private static String text(Path file) {
        try {
            return Files.readString(file);
        } catch (IOException unreadable) {
            throw new UncheckedIOException(unreadable);
        }
    }
}
