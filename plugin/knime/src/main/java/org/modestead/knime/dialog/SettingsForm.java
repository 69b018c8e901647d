package org.modestead.knime.dialog;

import java.awt.BorderLayout;
import java.awt.Dimension;
import java.awt.KeyboardFocusManager;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import javax.swing.BorderFactory;
import javax.swing.JButton;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.JTabbedPane;
import javax.swing.JTextArea;
import org.modestead.knime.columns.ColumnRules;
import org.modestead.knime.swing.Sheet;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.TableSchema;

/**
 * The form of one node, made from its declaration: sections or tabs by group, a field for every setting, fields shown as the
 * values of others ask, messages while one types, help for the field at hand. Knows no platform; needs no display to be made,
 * filled and painted. To be used by one thread, the event thread where there is a display.
 *
 * <p>What a person does not touch is handed back as it was loaded, right or wrong.
 */
public final class SettingsForm {
    private static final int SECTIONS_AT_MOST = 3;
    private static final int ROWS_AT_MOST = 6;
    private static final Dimension SIZE = new Dimension(740, 500);
    private static final int BANNER_WIDTH = 480;
    private static final int HELP_ROWS = 4;

    private final Node node;
    private final Map<String, FieldRow> rows = new LinkedHashMap<>();
    private final List<Section> sections = new ArrayList<>();
    private final JPanel component = new JPanel(new BorderLayout(0, 6));
    private final JTabbedPane tabs = new JTabbedPane();
    private final JPanel banner = new JPanel(new BorderLayout(8, 0));
    private final JLabel bannerText = Looks.wrapping();
    private final JLabel status = Looks.plain(new JLabel(" "));
    private final JTextArea help = new JTextArea(HELP_ROWS, 20);
    private final Set<String> touched = new LinkedHashSet<>();
    private Draft draft;
    private boolean laid;

    /** Makes an empty form, with every setting at its default. */
    public SettingsForm(Node node) {
        this.node = node;
        this.draft = Draft.of(node, Map.of(), Map.of());
        for (Setting setting : draft.declaration().settings()) {
            FieldRow row = new FieldRow(setting, editor(setting), () -> back(setting));
            row.onFocus(this::explain);
            rows.put(setting.key(), row);
        }
        Map<String, List<FieldRow>> groups = new LinkedHashMap<>();
        rows.values().forEach(row -> groups.computeIfAbsent(row.setting().common().group(), unused -> new ArrayList<>()).add(row));
        groups.forEach((title, members) -> sections.add(new Section(title, members, draft.declaration())));
    }

    private Editor editor(Setting setting) {
        if (setting instanceof Setting.Choice choice) {
            return new ChoiceEditor(choice, this::edited);
        } else if (setting instanceof Setting.Flag flag) {
            return new FlagEditor(flag, this::edited);
        } else if (setting instanceof Setting.File file) {
            return new FileEditor(file, this::edited);
        } else if (setting instanceof Setting.OneColumn column) {
            return new ColumnEditor(column, this::edited);
        } else if (setting instanceof Setting.Columns columns) {
            return new ColumnsEditor(columns, this::edited, draft);
        }
        boolean area = setting instanceof Setting.Texts || setting instanceof Setting.Text text && text.multiline();
        return area ? TypedEditor.area(setting, this::edited) : TypedEditor.line(setting, this::edited);
    }

    /**
     * Puts something of the host's at the end of a setting's row; only before {@link #component()} is asked for.
     *
     * @param key of the setting
     */
    public void accessory(String key, JComponent extra) {
        rows.get(key).accessory(extra);
    }

    /** Returns what is to be shown; always the same. */
    public JComponent component() {
        if (!laid) {
            laid = true;
            lay();
            refresh();
        }
        return component;
    }

    private void lay() {
        component.setBorder(BorderFactory.createEmptyBorder(6, 6, 6, 6));
        component.setPreferredSize(SIZE);
        JButton remove = new JButton("Remove");
        remove.getAccessibleContext().setAccessibleName("Remove unknown settings");
        remove.addActionListener(event -> removeUnknown());
        bannerText.setForeground(Looks.error(Looks.panel()));
        banner.add(bannerText, BorderLayout.CENTER);
        banner.add(remove, BorderLayout.LINE_END);
        component.add(banner, BorderLayout.PAGE_START);
        if (!tabbed()) {
            alignLabels();
        }
        if (sections.isEmpty()) {
            component.add(new JLabel("This node has nothing to set."), BorderLayout.LINE_START);
        }
        component.add(tabbed() ? tabs : Sheet.scrolled(sections.stream().map(section -> section.lay(true)).toList()), BorderLayout.CENTER);
        if (tabbed()) {
            sections.forEach(section -> tabs.addTab(section.title(), Sheet.scrolled(List.of(section.lay(false)))));
            tabs.getAccessibleContext().setAccessibleName("Groups of settings");
        }
        component.add(foot(), BorderLayout.PAGE_END);
    }

    private void alignLabels() {
        int widest = rows.values().stream().mapToInt(row -> row.label().getPreferredSize().width).max().orElse(0);
        for (FieldRow row : rows.values()) {
            row.label().setPreferredSize(new Dimension(widest, row.label().getPreferredSize().height));
            row.label().setMinimumSize(row.label().getPreferredSize());
        }
    }

    private boolean tabbed() {
        return sections.size() > SECTIONS_AT_MOST || rows.size() > ROWS_AT_MOST && sections.size() > 1;
    }

    private JComponent foot() {
        help.setEditable(false);
        help.setLineWrap(true);
        help.setWrapStyleWord(true);
        help.setOpaque(false);
        help.setFocusTraversalKeys(KeyboardFocusManager.FORWARD_TRAVERSAL_KEYS, null);
        help.setFocusTraversalKeys(KeyboardFocusManager.BACKWARD_TRAVERSAL_KEYS, null);
        help.getAccessibleContext().setAccessibleName("Help");
        help.setText(draft.declaration().purpose());
        JPanel foot = new JPanel(new BorderLayout(0, 4));
        foot.add(status, BorderLayout.PAGE_START);
        JPanel framed = new JPanel(new BorderLayout());
        framed.setBorder(BorderFactory.createTitledBorder("Help"));
        JScrollPane pane = new JScrollPane(help, JScrollPane.VERTICAL_SCROLLBAR_AS_NEEDED, JScrollPane.HORIZONTAL_SCROLLBAR_NEVER);
        pane.setBorder(BorderFactory.createEmptyBorder());
        framed.add(pane);
        foot.add(framed, BorderLayout.CENTER);
        return foot;
    }

    /**
     * Shows stored settings.
     *
     * @param stored raw values by key; whatever is wrong is shown and told
     * @param inputs schemas of connected input tables, by port id, where known
     */
    public void load(Map<String, Object> stored, Map<String, TableSchema> inputs) {
        draft = Draft.of(node, stored, inputs);
        touched.clear();
        rows.values().forEach(row -> row.lock(Optional.empty()));
        rows.values().forEach(row -> row.editor().show(draft));
        refresh();
    }

    /**
     * Returns the settings to be stored: as loaded where nothing was touched; what was edited and is right in the kinds of
     * {@link Settings#values()}.
     */
    public Map<String, Object> values() {
        Map<String, Object> values = new HashMap<>(draft.values());
        ColumnRules.Resolved resolved = ColumnRules.resolved(draft.declaration(), values, draft.inputs());
        Optional<Settings> settings = SettingsReader.read(draft.declaration(), good(resolved.values()),
                draft.declaration().settingsVersion()).settings();
        for (String key : touched) {
            String own = key.endsWith(ColumnRules.SUFFIX) && !rows.containsKey(key) ? key.substring(0, key.length()
                    - ColumnRules.SUFFIX.length()) : key;
            boolean given = values.containsKey(key) || !own.equals(key) && resolved.values().containsKey(own);
            if (given && settings.isPresent() && settings.get().values().containsKey(own)) {
                values.put(own, settings.get().values().get(own));
            }
        }
        return values;
    }

    private Map<String, Object> good(Map<String, Object> raw) {
        Set<String> wrong = SettingsReader.read(draft.declaration(), raw, draft.declaration().settingsVersion()).problems().stream()
                .map(SettingProblem::key).collect(Collectors.toSet());
        Map<String, Object> kept = new HashMap<>(raw);
        kept.keySet().removeAll(wrong);
        return kept;
    }

    /** Returns everything wrong with the settings as they stand, as a workflow would tell it. */
    public List<SettingProblem> problems() {
        return draft.judge().problems();
    }

    /** Returns one sentence for each wrong value that was typed here; empty when everything typed is right. */
    public List<String> refusals() {
        return draft.judge().problems().stream().filter(problem -> touched.contains(problem.key())
                || touched.contains(problem.key() + ColumnRules.SUFFIX))
                .map(problem -> rows.get(problem.key()).setting().common().label() + ": " + FieldWords.sentence(problem)).toList();
    }

    /**
     * Shows that something else, such as a flow variable, sets a value, and forbids changing it here; empty allows it again.
     *
     * @param key of the setting
     * @param reason for people
     */
    public void lock(String key, Optional<String> reason) {
        rows.get(key).lock(reason);
        refresh();
    }

    private void edited(String key, Optional<Object> value) {
        touched.add(key);
        draft = draft.with(key, value);
        rows.values().forEach(row -> row.editor().follow(draft));
        refresh();
    }

    private void back(Setting setting) {
        touched.add(setting.key());
        draft = draft.with(setting.key(), Optional.empty());
        if (setting instanceof Setting.Columns columns) {
            draft = draft.with(ColumnRules.key(columns), Optional.empty());
        }
        rows.get(setting.key()).editor().show(draft);
        rows.values().forEach(row -> row.editor().follow(draft));
        refresh();
    }

    private void removeUnknown() {
        for (String key : draft.unknownKeys()) {
            draft = draft.with(key, Optional.empty());
        }
        refresh();
    }

    private void refresh() {
        Draft.Judgement judgement = draft.judge();
        List<SettingProblem> problems = judgement.problems();
        Set<String> shown = judgement.shown().stream().map(Setting::key).collect(Collectors.toCollection(LinkedHashSet::new));
        for (FieldRow row : rows.values()) {
            String key = row.setting().key();
            row.update(shown.contains(key), isDefault(row.setting()), of(problems, key));
        }
        for (int i = 0; i < sections.size(); i++) {
            sections.get(i).update(shown);
            if (laid && tabbed()) {
                title(i, problems);
            } else if (laid) {
                sections.get(i).panel().setVisible(sections.get(i).rows().stream().anyMatch(row -> shown.contains(row.setting().key())));
            }
        }
        List<String> unknown = draft.unknownKeys();
        banner.setVisible(!unknown.isEmpty());
        Looks.wrap(bannerText, "Stored but unknown to this node: " + String.join(", ", unknown) + ".", BANNER_WIDTH);
        summarise(problems, shown);
        component.revalidate();
        component.repaint();
    }

    private boolean isDefault(Setting setting) {
        boolean ruled = setting instanceof Setting.Columns columns && draft.value(ColumnRules.key(columns)).isPresent();
        return !ruled && FieldWords.isDefault(setting, draft.value(setting.key()));
    }

    private void title(int tab, List<SettingProblem> problems) {
        Section section = sections.get(tab);
        long wrong = section.rows().stream().filter(row -> !of(problems, row.setting().key()).isEmpty()).count();
        tabs.setTitleAt(tab, section.title() + (wrong == 0 ? "" : " (" + wrong + " to correct)"));
    }

    /** Names what is wrong; also what stands in a field that is not shown, which no message below a field could tell. */
    private void summarise(List<SettingProblem> problems, Set<String> shown) {
        List<String> hidden = problems.stream().filter(problem -> !shown.contains(problem.key()) && rows.containsKey(problem.key()))
                .map(problem -> label(problem.key()) + ": " + FieldWords.sentence(problem)).toList();
        List<String> labels = problems.stream().map(SettingProblem::key).filter(shown::contains).distinct().map(this::label).toList();
        String text = labels.isEmpty() ? "" : "To correct: " + String.join(", ", labels) + ".";
        status.setForeground(problems.isEmpty() ? Looks.quiet(Looks.panel()) : Looks.error(Looks.panel()));
        status.setText(problems.isEmpty() ? "All settings can be used." : (text + " " + String.join(" ", hidden)).strip());
        status.setToolTipText(status.getText());
    }

    private String label(String key) {
        return rows.get(key).setting().common().label();
    }

    private void explain(Setting setting) {
        help.setText(FieldWords.label(setting) + ": " + FieldWords.help(setting));
        help.setCaretPosition(0);
    }

    private static List<SettingProblem> of(List<SettingProblem> problems, String key) {
        return problems.stream().filter(problem -> problem.key().equals(key)).toList();
    }

    /** Returns the row of a setting, for tests in this package. */
    FieldRow row(String key) {
        return rows.get(key);
    }

    /** Returns the tabs, empty of tabs where the form has sections only. */
    JTabbedPane tabs() {
        return tabs;
    }

    /** Returns what is said of all settings together. */
    String status() {
        return status.getText();
    }

    /** Returns the help at the foot. */
    String helpText() {
        return help.getText();
    }
}
