package org.modestead.knime.settings;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeSettings;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.CellType;

/** One typed key a setting, unset ones included; whatever is stored can be read. */
class NativeSettingsTest {

    private static Common common(String key) {
        return new Common(key, key, "All", "Help.");
    }

    /** A node with a setting of every kind, in its second version: "speed" was called "velocity" in the first. */
    private static final class EveryKind implements Node {

        @Override
        public NodeDeclaration declaration() {
            return new NodeDeclaration("every-kind", "Every Kind", NodeDeclaration.Stage.DATA, "Tries.", "Tries.", List.of(), List.of(),
                    List.of(), List.of(), List.of(
                            new Setting.Number(common("speed"), "m/s", 0, false, 10, OptionalDouble.of(2.5)),
                            new Setting.Number(common("limit"), "", 0, false, 10, OptionalDouble.empty()),
                            new Setting.Whole(common("count"), "", 0, 10, OptionalLong.of(3)),
                            new Setting.Whole(common("rank"), "", 1, 10, OptionalLong.empty()),
                            new Setting.Choice(common("way"), List.of(new Option("up", "Up", "Up."), new Option("down", "Down", "Down.")), "up"),
                            new Setting.Text(common("title"), "x", false, false),
                            new Setting.Flag(common("strict"), true),
                            new Setting.File(common("file"), true, List.of(), false),
                            new Setting.OneColumn(common("time"), "table", Set.of(CellType.DOUBLE), false),
                            new Setting.Columns(common("channels"), "table", Set.of(CellType.DOUBLE), 0, OptionalInt.empty()),
                            new Setting.Texts(common("units"), List.of("a")),
                            new Setting.Numbers(common("steps"), "", 0, 10, List.of(1.0, 2.0))), 2);
        }

        @Override
        public Map<String, Object> upgrade(Map<String, Object> stored, int version) {
            Map<String, Object> today = new HashMap<>(stored);
            Optional.ofNullable(today.remove("velocity")).ifPresent(value -> today.put("speed", value));
            return today;
        }

        @Override
        public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
            throw new UnsupportedOperationException();
        }
    }

    private static final Node NODE = new EveryKind();
    private static final NodeDeclaration DECLARATION = NODE.declaration();

    private static NodeSettings written(Map<String, Object> raw) {
        NodeSettings settings = new NodeSettings("model");
        NativeSettings.write(DECLARATION, raw, settings);
        return settings;
    }

    private static Map<String, Object> read(NodeSettings settings) {
        return NativeSettings.read(DECLARATION, settings);
    }

    @Test
    void everySettingHasATypedKeyThatAFlowVariableCanReplaceAlsoWhenNothingIsSet() throws InvalidSettingsException {
        NodeSettings settings = written(Map.of());
        assertEquals(2.5, settings.getDouble("speed"));
        assertTrue(Double.isNaN(settings.getDouble("limit")));
        assertEquals(3, settings.getLong("count"));
        assertEquals(Long.MIN_VALUE, settings.getLong("rank"));
        assertEquals("up", settings.getString("way"));
        assertEquals("x", settings.getString("title"));
        assertEquals(true, settings.getBoolean("strict"));
        assertEquals("", settings.getString("file"));
        assertEquals("", settings.getString("time"));
        assertEquals(0, settings.getStringArray("channels").length);
        assertEquals("", settings.getString("channels-by"));
        assertEquals(List.of("a"), List.of(settings.getStringArray("units")));
        assertEquals(2, settings.getDoubleArray("steps").length);
        assertEquals(2, settings.getInt("version_Internals"), "hidden from the list of variables by its ending");
        assertEquals(14, settings.keySet().size());
    }

    /** The platform cannot tell the type of an empty array; seen in its engine: a variable's numbers were written there as floats. */
    @Test
    void aListOfNoNumbersKeepsItsTypeAndNarrowNumbersAreReadAsTheyAreWritten() throws InvalidSettingsException {
        NodeSettings none = written(Map.of("steps", List.of()));
        assertEquals(1, none.getDoubleArray("steps").length);
        assertEquals(List.of(), read(none).get("steps"));
        none.addDoubleArray("steps");
        assertEquals(List.of(), read(none).get("steps"));
        NodeSettings narrow = written(Map.of());
        narrow.addFloatArray("steps", 0.1f, 3);
        assertEquals(List.of(0.1, 3.0), read(narrow).get("steps"));
    }

    @Test
    void whatIsWrittenComesBack() {
        Map<String, Object> raw = Map.ofEntries(Map.entry("speed", 1.0), Map.entry("limit", 0.0), Map.entry("count", 0L), Map.entry("rank", 7L),
                Map.entry("way", "down"), Map.entry("title", ""), Map.entry("strict", false), Map.entry("file", "a.zip"),
                Map.entry("time", "t"), Map.entry("channels", List.of("flow, total", "p\n2")), Map.entry("channels-by", "wildcard p_*"),
                Map.entry("units", List.of()), Map.entry("steps", List.of(3.0)));
        assertEquals(raw, read(written(raw)));
    }

    @Test
    void whatIsNotSetStaysUnsetAndAllElseHasItsDefault() {
        Settings fresh = SettingsReader.read(NODE, Map.of()).settings().orElseThrow();
        assertEquals(Optional.of(fresh), SettingsReader.read(NODE, read(written(Map.of()))).settings());
        assertTrue(fresh.findNumber("limit").isEmpty() && fresh.findWhole("rank").isEmpty());
    }

    /** The old shape: keys that came later are absent. */
    @Test
    void absentKeysHaveTheirDefaults() {
        NodeSettings old = new NodeSettings("model");
        old.addDouble("speed", 4);
        assertEquals(Map.of("speed", 4.0), read(old));
    }

    @Test
    void aValueOfAnotherTypeComesAsWhatItIsAndIsRefusedWithASentence() {
        NodeSettings settings = written(Map.of());
        settings.addString("speed", "fast");
        assertEquals("fast", read(settings).get("speed"));
        InvalidSettingsException refused = assertThrows(InvalidSettingsException.class, () -> StoredSettings.validate(NODE, settings));
        assertEquals("Setting \"speed\": the text \"fast\"; use a number at least 0 and at most 10 m/s.", refused.getMessage());
    }

    @Test
    void anIntegerStandsForALongAndAWholeNumberForANumber() {
        NodeSettings settings = written(Map.of());
        settings.addInt("count", 5);
        settings.addLong("speed", 4);
        settings.addIntArray("steps", 1, 2);
        assertEquals(5L, read(settings).get("count"));
        assertEquals(4.0, read(settings).get("speed"));
        assertEquals(List.of(1.0, 2.0), read(settings).get("steps"));
    }

    @Test
    void everythingWrongIsToldAtOnce() {
        NodeSettings settings = written(Map.of("speed", 99.0, "way", "sideways"));
        String told = assertThrows(InvalidSettingsException.class, () -> StoredSettings.validate(NODE, settings)).getMessage();
        assertEquals(2, told.lines().count(), told);
    }

    @Test
    void settingsOfAnOlderVersionAreBroughtForward() throws InvalidSettingsException {
        NodeSettings old = new NodeSettings("model");
        old.addInt("version_Internals", 1);
        old.addDouble("velocity", 4);
        StoredSettings.validate(NODE, old);
        assertEquals(Map.of("speed", 4.0), StoredSettings.load(NODE, old));
    }

    @Test
    void settingsOfANewerReleaseAreRefusedWithASentence() {
        NodeSettings newer = new NodeSettings("model");
        newer.addInt("version_Internals", 3);
        InvalidSettingsException refused = assertThrows(InvalidSettingsException.class,
                () -> CheckedSettings.read(NODE, StoredSettings.load(NODE, newer), Map.of()));
        assertTrue(refused.getMessage().contains("use a newer release"), refused.getMessage());
    }
}
