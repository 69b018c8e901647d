package org.modestead.knime.dialog;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import javax.swing.JComboBox;
import javax.swing.JLabel;
import javax.swing.JTextField;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.knime.core.data.DataTableSpec;
import org.knime.core.node.FlowVariableModelButton;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeSettings;
import org.knime.core.node.port.PortObjectSpec;
import org.modestead.knime.settings.NativeSettings;
import org.modestead.knime.table.TableSpecs;
import org.modestead.knime.testing.Painted;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.table.TableSchema;

/** The platform's dialog: native settings and table specs in, native settings out. On stand-ins; the real engine is tried elsewhere. */
class DeclaredDialogTest {

    static List<Node> nodes() {
        return DialogNodes.all();
    }

    @ParameterizedTest
    @MethodSource("nodes")
    void openingAndSavingChangesNothingAndEverySettingHasAVariable(Node node) throws InvalidSettingsException {
        DeclaredDialog dialog = new DeclaredDialog(node);
        dialog.loadSettingsFrom(stored(node, Map.of()), new PortObjectSpec[node.declaration().inputs().size()]);
        assertEquals(Map.of(), nonDefault(node, saved(dialog)));
        assertEquals(node.declaration().settings().stream().map(Setting::key).collect(Collectors.toSet()), dialog.made.keySet());
    }

    @Test
    void columnsOfTheConnectedTableAreOffered() throws InvalidSettingsException {
        DeclaredDialog dialog = opened("snapshot-builder", Map.of("time-column", "time"), TableSpecs.spec(DialogNodes.TABLE));
        JComboBox<?> time = shown(dialog, JComboBox.class, 0);
        assertEquals(1 + 8, time.getItemCount(), "none, and every column but the flag");
        assertEquals("time (number)", time.getSelectedItem().toString());
        assertEquals("time", saved(dialog).getString("time-column"));
    }

    /** The platform gives a table without columns where nothing is connected. */
    @Test
    void aTableWithoutColumnsIsOneThatIsNotKnown() {
        DeclaredDialog dialog = opened("snapshot-builder", Map.of("time-column", "time"), TableSpecs.spec(new TableSchema(List.of())));
        assertTrue(shown(dialog, JComboBox.class, 0).isEditable());
        assertFalse(texts(dialog).contains("has no column"));
    }

    @Test
    void whatWasTypedWrongIsRefusedWithASentenceAndWhatWasStoredWrongIsNot() throws InvalidSettingsException {
        DeclaredDialog dialog = opened("backtest", Map.of("origins", 0L));
        assertEquals(0L, saved(dialog).getLong("origins"), "it is the model that refuses it, after the dialog has shown it");
        JTextField origins = shown(dialog, JTextField.class, 0);
        origins.setText("many");
        InvalidSettingsException refused = assertThrows(InvalidSettingsException.class, () -> saved(dialog));
        assertEquals("Origins: The text \"many\"; use a whole number at least 1 and at most 1000.", refused.getMessage());
        origins.setText("12");
        assertEquals(12L, saved(dialog).getLong("origins"));
    }

    @Test
    void aValueOfAnotherTypeIsShownAndKept() throws InvalidSettingsException {
        Node node = DialogNodes.node("backtest");
        NodeSettings settings = stored(node, Map.of("origins", "a dozen"));
        DeclaredDialog dialog = new DeclaredDialog(node);
        dialog.loadSettingsFrom(settings, new PortObjectSpec[0]);
        assertEquals("a dozen", shown(dialog, JTextField.class, 0).getText());
        assertTrue(texts(dialog).contains("The text \"a dozen\""));
        assertEquals("a dozen", saved(dialog).getString("origins"));
    }

    @Test
    void aFlowVariableLocksTheFieldUntilItIsTakenAway() {
        DeclaredDialog dialog = opened("backtest", Map.of());
        dialog.made.get("origins").use(Optional.of("starts"));
        assertFalse(shown(dialog, JTextField.class, 0).isEditable());
        assertTrue(texts(dialog).contains("Set by the flow variable starts."));
        dialog.made.get("origins").use(Optional.empty());
        assertTrue(shown(dialog, JTextField.class, 0).isEditable());
        assertEquals("Flow variable for Origins", shown(dialog, FlowVariableModelButton.class, 0)
                .getAccessibleContext().getAccessibleName());
    }

    private static DeclaredDialog opened(String id, Map<String, Object> raw, DataTableSpec... tables) {
        Node node = DialogNodes.node(id);
        DeclaredDialog dialog = new DeclaredDialog(node);
        dialog.loadSettingsFrom(stored(node, raw), tables);
        return dialog;
    }

    private static NodeSettings stored(Node node, Map<String, Object> raw) {
        NodeSettings settings = new NodeSettings("model");
        NativeSettings.write(node.declaration(), raw, settings);
        return settings;
    }

    private static NodeSettings saved(DeclaredDialog dialog) throws InvalidSettingsException {
        NodeSettings settings = new NodeSettings("model");
        dialog.saveSettingsTo(settings);
        return settings;
    }

    private static Map<String, Object> nonDefault(Node node, NodeSettings settings) {
        Map<String, Object> raw = new HashMap<>(NativeSettings.read(node.declaration(), settings));
        node.declaration().settings().stream().filter(setting -> FieldWords.isDefault(setting,
                Optional.ofNullable(raw.get(setting.key()))))
                .forEach(setting -> raw.remove(setting.key()));
        return raw;
    }

    private static <T> T shown(DeclaredDialog dialog, Class<T> type, int index) {
        return Painted.shown(dialog.getPanel()).stream().filter(type::isInstance).map(type::cast).skip(index).findFirst().orElseThrow();
    }

    private static String texts(DeclaredDialog dialog) {
        StringBuilder texts = new StringBuilder();
        Painted.shown(dialog.getPanel()).stream().filter(JLabel.class::isInstance).map(JLabel.class::cast)
                .forEach(label -> texts.append(label.getAccessibleContext().getAccessibleName()).append('\n'));
        return texts.toString();
    }
}
