package org.modestead.knime.dialog;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import javax.swing.AbstractButton;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JTable;
import javax.swing.JTextField;
import org.junit.jupiter.api.Test;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/** Choosing several columns: by name with a search, and by rule. */
class ColumnsEditorTest {
    private final SettingsForm form = DialogNodes.opened(DialogNodes.node("snapshot-builder"), Map.of("channels", List.of("p_1 [bar]",
            "gone")));

    @Test
    void onlyColumnsOfFittingTypesAreOffered() {
        assertEquals(List.of("run text false", "time number false", "p_1 [bar] number true", "p_2 [bar] number false",
                "flow [m3/h] number false", "valve whole number false", "<html>note text false", "gone not in the input true"), rows());
    }

    @Test
    void searchNarrowsTheRowsAndTakesNothingAway() {
        part(JTextField.class).setText("BAR");
        assertEquals(List.of("p_1 [bar] number true", "p_2 [bar] number false"), rows());
        assertEquals(Map.of("channels", List.of("p_1 [bar]", "gone")), form.values());
        button("All").doClick();
        assertEquals(Map.of("channels", List.of("p_1 [bar]", "p_2 [bar]", "gone")), form.values());
    }

    @Test
    void aMarkKeepsTheOrderOfTheTable() {
        part(JTable.class).setValueAt(true, 1, 0);
        part(JTable.class).setValueAt(false, 7, 0);
        assertEquals(Map.of("channels", List.of("time", "p_1 [bar]")), form.values());
        assertFalse(form.row("channels").message().contains("gone"));
    }

    @Test
    void anOrderOfOnesOwnIsKept() {
        form.load(Map.of("channels", List.of("valve", "p_1 [bar]")), DialogNodes.inputs(DialogNodes.node("snapshot-builder")));
        part(JTable.class).setValueAt(true, 1, 0);
        assertEquals(Map.of("channels", List.of("valve", "p_1 [bar]", "time")), form.values());
    }

    @Test
    void spaceMarksTheSelectedRow() {
        JTable table = part(JTable.class);
        table.setRowSelectionInterval(3, 3);
        table.getActionMap().get("mark").actionPerformed(new java.awt.event.ActionEvent(table, 0, ""));
        assertEquals(Map.of("channels", List.of("p_1 [bar]", "p_2 [bar]", "gone")), form.values());
    }

    @Test
    void aWildcardIsStoredBesideTheColumnsThatItTakesNow() {
        way(ColumnsEditor.Way.WILDCARD);
        part(JTextField.class).setText("*[bar]");
        assertEquals(Map.of("channels", List.of("p_1 [bar]", "p_2 [bar]"), "channels-by", "wildcard *[bar]"), form.values());
        assertEquals("", form.row("channels").message());
        assertFalse(part(JTable.class).isCellEditable(0, 0));
    }

    @Test
    void aTypeTakesNoColumnThatHasAnotherPart() {
        form.load(Map.of("time-column", "time"), DialogNodes.inputs(DialogNodes.node("snapshot-builder")));
        way(ColumnsEditor.Way.TYPE);
        assertTrue(form.row("channels").message().contains("A rule without a type"), form.row("channels").message());
        button("number").doClick();
        assertEquals(List.of("p_1 [bar]", "p_2 [bar]", "flow [m3/h]"), form.values().get("channels"));
        assertEquals("type number", form.values().get("channels-by"));
    }

    @Test
    void anExpressionThatCannotBeReadIsToldAtOnce() {
        form.load(Map.of(), DialogNodes.inputs(DialogNodes.node("snapshot-builder")));
        way(ColumnsEditor.Way.REGEX);
        part(JTextField.class).setText("p_(");
        assertTrue(form.row("channels").message().startsWith("To correct: The regular expression \"p_(\""),
                form.row("channels").message());
        assertEquals(1, form.refusals().size());
    }

    @Test
    void aStoredRuleIsShownAndTheWayBackForgetsIt() {
        form.load(Map.of("channels-by", "regex p.*"), DialogNodes.inputs(DialogNodes.node("snapshot-builder")));
        assertEquals("p.*", part(JTextField.class).getText());
        assertTrue(form.row("channels").reset().isEnabled());
        form.row("channels").reset().doClick();
        assertEquals(Map.of(), form.values());
    }

    @Test
    void namesCanBeAddedWhileTheTableIsNotKnown() {
        form.load(Map.of(), Map.of());
        part(JTextField.class).setText("p_9");
        part(JTextField.class).postActionEvent();
        assertEquals(Map.of("channels", List.of("p_9")), form.values());
        assertEquals(List.of("p_9 not known yet true"), rows());
    }

    /** Every mark sorts the list anew: in time that grows with the columns, not with their square. */
    @Test
    void thousandsOfColumnsAreNoHindrance() {
        List<Column> many = IntStream.range(0, 5_000).mapToObj(i -> Column.number("c" + i)).toList();
        form.load(Map.of(), Map.of("table", new TableSchema(many)));
        button("All").doClick();
        part(JTable.class).setValueAt(false, 2_500, 0);
        assertEquals(4_999, ((List<?>) form.values().get("channels")).size());
    }

    private List<String> rows() {
        JTable table = part(JTable.class);
        return IntStream.range(0, table.getRowCount()).mapToObj(i -> table.getValueAt(i, 1) + " " + table.getValueAt(i, 2) + " "
                + table.getValueAt(i, 0)).toList();
    }

    private void way(ColumnsEditor.Way chosen) {
        part(JComboBox.class).setSelectedItem(chosen);
    }

    private AbstractButton button(String text) {
        return form.row("channels").editor().parts().stream().filter(AbstractButton.class::isInstance).map(AbstractButton.class::cast)
                .filter(found -> found.getText().equals(text)).findFirst().orElseThrow();
    }

    private <T extends JComponent> T part(Class<T> type) {
        return form.row("channels").editor().parts().stream().filter(type::isInstance).map(type::cast).findFirst().orElseThrow();
    }
}
