package org.modestead.knime.dialog;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Component;
import java.awt.Container;
import java.awt.Dimension;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import javax.swing.JTextArea;
import javax.swing.JViewport;
import javax.swing.text.JTextComponent;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.modestead.knime.testing.Painted;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.SettingText;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.contract.Visibility;

/** The form of every node, held against its declaration and against the checks that a workflow runs through. */
class SettingsFormTest {

    private static final Map<String, SettingsForm> FORMS = new java.util.concurrent.ConcurrentHashMap<>();

    /** One form a node, opened again and again. */
    private static SettingsForm opened(Node node, Map<String, Object> stored) {
        SettingsForm form = FORMS.computeIfAbsent(node.declaration().id(), id -> DialogNodes.opened(node, Map.of()));
        return DialogNodes.reopened(form, node, stored);
    }

    static List<Node> nodes() {
        return DialogNodes.all();
    }

    static Stream<DialogNodes.Place> places() {
        return DialogNodes.places();
    }

    @Test
    void everyNodeIsLookedAt() {
        assertTrue(nodes().size() >= 12, nodes().size() + " nodes");
        assertTrue(places().count() > 100, places().count() + " settings");
    }

    @ParameterizedTest
    @MethodSource("places")
    void everySettingHasAFieldWithNameUnitHelpAndDefault(DialogNodes.Place place) {
        FieldRow row = opened(place.node(), Map.of()).row(place.setting().key());
        String unit = SettingText.unit(place.setting());
        assertTrue(row.label().getText().startsWith(place.setting().common().label()));
        assertEquals(!unit.isEmpty(), row.label().getText().endsWith("]"), row.label().getText());
        assertEquals(row.editor().parts().get(0), row.label().getLabelFor());
        for (JComponent part : row.editor().parts()) {
            String name = part.getAccessibleContext().getAccessibleName();
            assertTrue(name != null && name.contains(place.setting().common().label()), part.getClass().getSimpleName() + " is named "
                    + name);
            assertFalse(part.getAccessibleContext().getAccessibleDescription().isBlank());
            assertTrue(part.getToolTipText().startsWith("<html>"));
        }
        String help = FieldWords.help(place.setting());
        assertTrue(help.startsWith(place.setting().common().help()));
        assertTrue(help.contains(SettingText.range(place.setting())) || place.setting() instanceof Setting.Choice, help);
        assertTrue(help.contains(FieldWords.initial(place.setting()).replace("\n", ", ")), help);
        assertFalse(row.reset().isEnabled(), "a fresh setting is at its default");
    }

    /** Every option of every choice and flag, one after the other, with what it opens in turn. */
    @ParameterizedTest
    @MethodSource("nodes")
    void fieldsAreShownAsTheDeclarationSays(Node node) {
        for (Map<String, Object> stored : selections(node)) {
            SettingsForm form = opened(node, stored);
            var settings = SettingsReader.read(node.declaration(), stored, node.declaration().settingsVersion());
            List<String> seen = node.declaration().settings().stream().map(Setting::key)
                    .filter(key -> form.row(key).label().isVisible()).toList();
            assertEquals(Visibility.shown(node.declaration(), settings.settings().orElseThrow()).stream().map(Setting::key).toList(),
                    seen,
                    stored.toString());
        }
    }

    private static List<Map<String, Object>> selections(Node node) {
        List<Map<String, Object>> selections = new ArrayList<>(List.of(Map.of()));
        for (Setting setting : node.declaration().settings()) {
            for (Map<String, Object> before : List.copyOf(selections).subList(0, Math.min(selections.size(), 6))) {
                for (Object value : values(setting)) {
                    Map<String, Object> next = new java.util.HashMap<>(before);
                    next.put(setting.key(), value);
                    selections.add(next);
                }
            }
        }
        selections.removeIf(stored -> SettingsReader.read(node.declaration(), stored,
                node.declaration().settingsVersion()).settings().isEmpty());
        return selections;
    }

    private static List<?> values(Setting setting) {
        return setting instanceof Setting.Choice choice ? choice.options().stream().map(Setting.Option::id).toList()
                : setting instanceof Setting.Flag ? List.of(true, false) : List.of();
    }

    /** The message below a field is the sentence that a workflow with this value would be refused with. */
    @ParameterizedTest
    @MethodSource("places")
    void whatIsTypedWrongIsToldAsAWorkflowTellsIt(DialogNodes.Place place) {
        Setting setting = place.setting();
        for (String typed : List.of("abc", "-1e308", "1e308", "0.5", "-3", "1, x", "")) {
            SettingsForm form = opened(place.node(), Map.of());
            if (!(form.row(setting.key()).editor().parts().get(0) instanceof JTextComponent field)) {
                return;
            }
            field.setText("x");
            field.setText(typed);
            Map<String, Object> stored = new java.util.HashMap<>();
            SettingsReader.fromText(setting, typed).ifPresent(value -> stored.put(setting.key(), value));
            List<SettingProblem> told = SettingsReader.read(place.node(), stored).problems().stream()
                    .filter(problem -> problem.key().equals(setting.key())).toList();
            boolean shown = form.row(setting.key()).label().isVisible();
            if (shown && (!told.isEmpty() || SettingsReader.read(place.node(), stored).problems().isEmpty())) {
                assertTrue(form.row(setting.key()).message().startsWith(told.isEmpty() ? "" : "To correct: "
                        + FieldWords.sentences(told)),
                        place + " <- " + typed + ": " + form.row(setting.key()).message() + told);
            }
            assertEquals(!told.isEmpty(), form.problems().stream().anyMatch(problem -> told.contains(problem)), place + " <- " + typed
                    + told + form.problems());
            assertEquals(told.isEmpty(), form.refusals().stream().noneMatch(text -> text.startsWith(setting.common().label() + ": ")
                    && told.stream().anyMatch(problem -> text.endsWith(FieldWords.sentence(problem)))), place + " <- " + typed + told);
        }
    }

    @ParameterizedTest
    @MethodSource("places")
    void aFormOpensWithAnyStoredValueAndHandsItBackUntouched(DialogNodes.Place place) {
        for (Object bad : List.of("no such thing", -7L, 1e99, true, List.of("a", "b"), List.of(), List.of(3.5), "")) {
            Map<String, Object> stored = Map.of(place.setting().key(), bad);
            SettingsForm form = opened(place.node(), stored);
            assertEquals(stored, form.values(), "opening changes nothing");
            assertEquals(List.of(), form.refusals(), "what was stored wrong is not refused before it is touched");
            Optional<SettingProblem> problem = form.problems().stream().filter(found -> found.key().equals(place.setting().key()))
                    .findFirst();
            boolean wrong = !SettingsReader.read(place.node().declaration(), stored, place.node().declaration().settingsVersion())
                    .problems().stream()
                    .noneMatch(found -> found.key().equals(place.setting().key()));
            assertTrue(!wrong || problem.isPresent());
            if (wrong && form.row(place.setting().key()).label().isVisible()) {
                assertTrue(form.row(place.setting().key()).message().contains(FieldWords.sentence(problem.orElseThrow())));
                assertTrue(form.status().contains(place.setting().common().label()));
            }
        }
        Painted.image(Painted.laidOut(opened(place.node(), Map.of(place.setting().key(), "no such thing")).component(),
                new Dimension(740, 500)));
    }

    @Test
    void valuesThatAreNoneOfTheOptionsAreStillShown() {
        SettingsForm form = opened(DialogNodes.node("operator-fitter"), Map.of("estimator", "dictonary"));
        assertEquals("dictonary (unknown)",
                ((javax.swing.JComboBox<?>) form.row("estimator").editor().parts().get(0)).getSelectedItem().toString());
        assertTrue(form.row("estimator").message().contains("perhaps you meant dictionary"));
        SettingsForm number = opened(DialogNodes.node("operator-fitter"), Map.of("ridge", "much"));
        assertEquals("much", ((JTextComponent) number.row("ridge").editor().parts().get(0)).getText());
    }

    @Test
    void keysThatTheNodeDoesNotKnowAreKeptAndTold() {
        SettingsForm form = opened(DialogNodes.node("forecast"), Map.of("horizont", 3.0));
        assertEquals(Map.of("horizont", 3.0), form.values());
        assertTrue(Painted.shown(form.component()).stream().anyMatch(part -> part instanceof javax.swing.JLabel label
                && String.valueOf(label.getAccessibleContext().getAccessibleName()).contains("horizont")));
    }

    /** The order in which the keyboard walks: that of the containers and, the fields standing below each other, of the eye. */
    @ParameterizedTest
    @MethodSource("nodes")
    void theKeyboardWalksInTheOrderOfTheDeclaration(Node node) {
        SettingsForm form = opened(node, Map.of());
        List<String> groups = node.declaration().settings().stream().map(setting -> setting.common().group()).distinct().toList();
        for (String group : groups) {
            if (form.tabs().getTabCount() > 0) {
                form.tabs().setSelectedIndex(groups.indexOf(group));
            }
            Painted.laidOut(form.component(), new Dimension(740, 500));
            List<Component> order = Painted.shown(form.component());
            List<FieldRow> rows = node.declaration().settings().stream().filter(setting -> setting.common().group().equals(group))
                    .map(setting -> form.row(setting.key())).filter(row -> row.label().isVisible()).toList();
            for (int i = 1; i < rows.size(); i++) {
                assertTrue(at(order, rows.get(i - 1)) < at(order, rows.get(i)), rows.get(i).label().getText());
                assertTrue(top(rows.get(i - 1)) < top(rows.get(i)), rows.get(i).label().getText());
            }
        }
        for (FieldRow row : node.declaration().settings().stream().map(setting -> form.row(setting.key())).toList()) {
            for (JComponent part : row.editor().parts()) {
                assertTrue(part.isFocusable());
                assertTrue(!(part instanceof JTextArea area) || area.getFocusTraversalKeys(0).stream()
                        .anyMatch(key -> key.getKeyCode() == java.awt.event.KeyEvent.VK_TAB && key.getModifiers() == 0), "Tab leaves "
                                + row.label().getText());
            }
        }
    }

    private static int at(List<Component> order, FieldRow row) {
        return order.indexOf(row.editor().parts().get(0));
    }

    private static int top(FieldRow row) {
        int y = 0;
        for (Component part = row.label(); part != null; part = part.getParent()) {
            y += part.getY();
        }
        return y;
    }

    /** Within 800 x 600 with the platform's frame around; what is taller scrolls up and down, nothing sideways. */
    @ParameterizedTest
    @MethodSource("nodes")
    void everyPageFits(Node node) {
        for (Map<String, Object> stored : selections(node).subList(0, Math.min(12, selections(node).size()))) {
            SettingsForm form = opened(node, stored);
            assertTrue(form.component().getPreferredSize().width <= 760 && form.component().getPreferredSize().height <= 520);
            for (int tab = 0; tab < Math.max(1, form.tabs().getTabCount()); tab++) {
                if (form.tabs().getTabCount() > 0) {
                    form.tabs().setSelectedIndex(tab);
                }
                Painted.laidOut(form.component(), new Dimension(740, 500));
                Painted.shown(form.component()).forEach(part -> insideSideways(part, node.declaration().id()));
            }
        }
    }

    private static void insideSideways(Component part, String where) {
        Container parent = part.getParent();
        boolean scrolledText = part instanceof JTextComponent || parent instanceof JViewport && parent.getParent() instanceof JScrollPane;
        if (parent != null && !scrolledText && part.getWidth() > 0) {
            assertTrue(part.getX() >= 0 && part.getX() + part.getWidth() <= parent.getWidth(), where + ": " + part);
        }
    }

    @Test
    void theWayBackRestoresTheDefault() {
        SettingsForm form = opened(DialogNodes.node("operator-fitter"), Map.of("ridge", 0.25, "estimator", "generator"));
        FieldRow ridge = form.row("ridge");
        assertTrue(ridge.reset().isEnabled());
        assertEquals("0.25", ((JTextComponent) ridge.editor().parts().get(0)).getText());
        ridge.reset().doClick();
        assertEquals("", ((JTextComponent) ridge.editor().parts().get(0)).getText());
        assertEquals("0 (default)", ((TypedEditor.GreyText) ridge.editor().parts().get(0)).grey());
        assertFalse(ridge.reset().isEnabled());
        assertEquals(Map.of("estimator", "generator"), form.values());
    }

    @Test
    void whatIsTypedComesBackInTheKindOfTheSetting() {
        SettingsForm form = opened(DialogNodes.node("backtest"), Map.of());
        ((JTextComponent) form.row("origins").editor().parts().get(0)).setText("7");
        ((JTextComponent) form.row("horizon").editor().parts().get(0)).setText("2.50");
        ((JTextComponent) form.row("score-horizons").editor().parts().get(0)).setText("1, 2.5");
        assertEquals(Map.of("origins", 7L, "horizon", 2.5, "score-horizons", List.of(1.0, 2.5)), form.values());
        assertEquals(List.of(), form.refusals());
    }

    /** As when a reader of screens cannot see the colour of a message. */
    @Test
    void whatIsWrongIsToldInWordsAtTheFieldTheTabAndTheFoot() {
        SettingsForm form = opened(DialogNodes.node("snapshot-builder"), Map.of("gap-factor", 0.5));
        assertTrue(form.row("gap-factor").editor().parts().get(0).getAccessibleContext().getAccessibleDescription()
                .endsWith("To correct: The number 0.5; use a number above 1."));
        assertEquals("To correct: Gap factor.", form.status());
        assertTrue(java.util.stream.IntStream.range(0, form.tabs().getTabCount()).mapToObj(form.tabs()::getTitleAt)
                .anyMatch("Times and gaps (1 to correct)"::equals));
    }

    @Test
    void aLockedSettingSaysWhyAndCannotBeChanged() {
        SettingsForm form = opened(DialogNodes.node("operator-fitter"), Map.of("ridge", 0.25));
        form.lock("ridge", Optional.of("Set by the flow variable r, now 0.1."));
        JTextComponent field = (JTextComponent) form.row("ridge").editor().parts().get(0);
        assertFalse(field.isEditable());
        assertFalse(form.row("ridge").reset().isEnabled());
        assertEquals("Set by the flow variable r, now 0.1.", form.row("ridge").message());
        form.lock("ridge", Optional.empty());
        assertTrue(field.isEditable());
        assertEquals("", form.row("ridge").message());
    }

    @Test
    void missingColumnsAreToldBesideOtherFaults() {
        SettingsForm form = opened(DialogNodes.node("snapshot-builder"), Map.of("gap-factor", 0.5, "time-column", "tme"));
        assertTrue(form.row("time-column").message().contains("the input has no column tme, perhaps you meant time".substring(1)));
        assertNotEquals("", form.row("gap-factor").message());
    }
}
