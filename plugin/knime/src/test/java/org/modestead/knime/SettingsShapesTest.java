package org.modestead.knime;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeSettings;
import org.knime.core.node.NodeSettingsRO;
import org.modestead.knime.settings.NativeSettings;
import org.modestead.nodes.contract.SettingsReader;

/**
 * Settings as workflows of a release hold them, kept for ever: what was saved once can be loaded. The folder is named after the release
 * that saved so first. {@code -Dshapes.write=true} adds the file of a node that has none yet, and changes no other.
 */
class SettingsShapesTest {

    private static final Path FOLDER = Path.of("src", "test", "resources", "settings", "0.1");

    static List<String> ids() {
        return Rig.ids();
    }

    private static NodeSettings shape(String id) throws IOException, InvalidSettingsException {
        Path file = FOLDER.resolve(id + ".xml");
        if (Boolean.getBoolean("shapes.write") && !Files.exists(file)) {
            Files.createDirectories(FOLDER);
            try (OutputStream out = Files.newOutputStream(file)) {
                Rig.of(id).engine().saved().saveToXML(out);
            }
        }
        assertTrue(Files.exists(file), "keep the shape of the new node " + id + ": run this test once with -Dshapes.write=true");
        try (InputStream in = Files.newInputStream(file)) {
            return (NodeSettings) NodeSettings.loadFromXML(in);
        }
    }

    @ParameterizedTest
    @MethodSource("ids")
    void whatAReleaseSavedIsUnderstoodAndMeansTheSame(String id) throws Exception {
        NodeSettings saved = shape(id);
        Rig rig = Rig.of(id);
        rig.engine().settings(saved);
        SettingsReader.Reading now = SettingsReader.read(Rig.node(id), NativeSettings.read(rig.declaration(), rig.engine().saved()));
        SettingsReader.Reading then = SettingsReader.read(Rig.node(id), NativeSettings.read(rig.declaration(), saved));
        assertEquals(then.settings(), now.settings());
        assertEquals(then.problems(), now.problems());
    }

    /** A key that vanished or changed its type would break workflows, and flow variables set on it. */
    @ParameterizedTest
    @MethodSource("ids")
    void noKeyVanishedOrChangedItsType(String id) throws Exception {
        Map<String, String> then = types(shape(id));
        Map<String, String> now = types(Rig.of(id).engine().saved());
        now.keySet().retainAll(then.keySet());
        assertEquals(then, now);
    }

    private static Map<String, String> types(NodeSettingsRO settings) {
        Map<String, String> types = new TreeMap<>();
        for (String key : settings.keySet()) {
            types.put(key, type(settings, key));
        }
        return types;
    }

    private static String type(NodeSettingsRO settings, String key) {
        try {
            settings.getConfig(key);
            return "part";
        } catch (InvalidSettingsException none) {
            if (settings.getString(key, null) != null) {
                return "text";
            } else if (settings.getLong(key, 1) == settings.getLong(key, 2)) {
                return "long";
            } else if (settings.getInt(key, 1) == settings.getInt(key, 2)) {
                return "int";
            }
            return settings.getBoolean(key, true) == settings.getBoolean(key, false) ? "flag" : "number";
        }
    }
}
