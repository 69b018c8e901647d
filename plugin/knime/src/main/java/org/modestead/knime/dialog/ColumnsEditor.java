package org.modestead.knime.dialog;

import java.awt.BorderLayout;
import java.awt.Dimension;
import java.awt.FlowLayout;
import java.awt.GridLayout;
import java.awt.KeyboardFocusManager;
import java.awt.event.ActionEvent;
import java.awt.event.KeyEvent;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import javax.swing.AbstractAction;
import javax.swing.JButton;
import javax.swing.JCheckBox;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.JTable;
import javax.swing.JTextField;
import javax.swing.KeyStroke;
import javax.swing.RowFilter;
import javax.swing.event.DocumentEvent;
import javax.swing.event.DocumentListener;
import javax.swing.table.DefaultTableCellRenderer;
import javax.swing.table.TableRowSorter;
import org.modestead.knime.columns.ColumnRule;
import org.modestead.knime.columns.ColumnRules;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.TableSchema;

/**
 * Several columns of an input table: marked one by one, with a search, or taken by a rule (wildcard, regular expression, type). A
 * rule is applied anew whenever the node runs; the rows show what it takes of the table as it is now.
 */
final class ColumnsEditor implements Editor {
    private static final int HEIGHT = 118;
    private static final int MARK_WIDTH = 44;
    private static final int PATTERN_WIDTH = 12;
    private static final int TYPES_A_LINE = 2;

    private final Setting.Columns setting;
    private final Edits edits;
    private final JPanel panel = new JPanel(new BorderLayout(0, 4));
    private final JComboBox<Way> way = new JComboBox<>(Way.values());
    private final JLabel patternLabel = new JLabel();
    private final JTextField pattern = new JTextField(PATTERN_WIDTH);
    private final Map<CellType, JCheckBox> types = new EnumMap<>(CellType.class);
    private final JPanel typeGrid = new JPanel(new GridLayout(0, TYPES_A_LINE));
    private final ColumnRows rows = new ColumnRows(this::mark);
    private final JTable table = new JTable(rows);
    private final TableRowSorter<ColumnRows> search = new TableRowSorter<>(rows);
    private final JLabel count = Looks.plain(new JLabel());
    private final JButton all = new JButton("All");
    private final JButton none = new JButton("None");
    private Draft draft;
    private boolean showing;
    private boolean allowed = true;

    /** How the columns are chosen. */
    enum Way {
        /** Named. */
        NAMES("By name", "Search"),
        /** {@link ColumnRule.Wildcard}. */
        WILDCARD("By wildcard", "Pattern, * and ?"),
        /** {@link ColumnRule.Regex}. */
        REGEX("By regular expression", "Expression"),
        /** {@link ColumnRule.OfType}. */
        TYPE("By type", "");

        private final String title;
        private final String prompt;

        Way(String title, String prompt) {
            this.title = title;
            this.prompt = prompt;
        }

        @Override
        public String toString() {
            return title;
        }
    }

    ColumnsEditor(Setting.Columns setting, Edits edits, Draft empty) {
        this.setting = setting;
        this.edits = edits;
        this.draft = empty;
        panel.setOpaque(false);
        panel.add(top(), BorderLayout.PAGE_START);
        panel.add(rowsPane(), BorderLayout.CENTER);
        panel.add(bottom(), BorderLayout.PAGE_END);
        way.addActionListener(event -> ruled());
        types.values().forEach(box -> box.addActionListener(event -> ruled()));
        pattern.addActionListener(event -> addName());
        pattern.getDocument().addDocumentListener(new DocumentListener() {
            @Override
            public void insertUpdate(DocumentEvent event) {
                patternChanged();
            }

            @Override
            public void removeUpdate(DocumentEvent event) {
                patternChanged();
            }

            @Override
            public void changedUpdate(DocumentEvent event) {
                patternChanged();
            }
        });
        all.addActionListener(event -> markShown(true));
        none.addActionListener(event -> markShown(false));
    }

    private JComponent top() {
        JPanel line = new JPanel(new BorderLayout(6, 2));
        line.setOpaque(false);
        way.getAccessibleContext().setAccessibleName(setting.common().label() + ": how they are chosen");
        patternLabel.setLabelFor(pattern);
        JPanel asked = new JPanel(new BorderLayout(6, 0));
        asked.setOpaque(false);
        asked.add(patternLabel, BorderLayout.LINE_START);
        asked.add(pattern, BorderLayout.CENTER);
        line.add(way, BorderLayout.LINE_START);
        line.add(asked, BorderLayout.CENTER);
        line.add(typeBoxes(), BorderLayout.PAGE_END);
        return line;
    }

    private JComponent typeBoxes() {
        typeGrid.setOpaque(false);
        for (CellType type : CellType.values()) {
            if (setting.types().contains(type)) {
                JCheckBox box = new JCheckBox(type.title());
                box.setOpaque(false);
                box.getAccessibleContext().setAccessibleName(setting.common().label() + ": type " + type.title());
                types.put(type, box);
                typeGrid.add(box);
            }
        }
        return typeGrid;
    }

    private JComponent rowsPane() {
        table.setRowSorter(search);
        search.setSortable(0, false);
        search.setSortable(1, false);
        search.setSortable(2, false);
        table.getTableHeader().setReorderingAllowed(false);
        table.getColumnModel().getColumn(0).setMaxWidth(MARK_WIDTH);
        table.setDefaultRenderer(String.class, Looks.plain(new DefaultTableCellRenderer()));
        table.getAccessibleContext().setAccessibleName(setting.common().label() + ": columns");
        table.setFocusTraversalKeys(KeyboardFocusManager.FORWARD_TRAVERSAL_KEYS, null);
        table.setFocusTraversalKeys(KeyboardFocusManager.BACKWARD_TRAVERSAL_KEYS, null);
        table.getInputMap(JComponent.WHEN_FOCUSED).put(KeyStroke.getKeyStroke(KeyEvent.VK_SPACE, 0), "mark");
        table.getActionMap().put("mark", new AbstractAction() {
            private static final long serialVersionUID = 1L;

            @Override
            public void actionPerformed(ActionEvent event) {
                markSelected();
            }
        });
        JScrollPane pane = new JScrollPane(table);
        pane.setColumnHeaderView(table.getTableHeader());
        pane.setPreferredSize(new Dimension(0, HEIGHT));
        pane.setMinimumSize(new Dimension(0, HEIGHT));
        return pane;
    }

    private JComponent bottom() {
        JPanel line = new JPanel(new FlowLayout(FlowLayout.LEADING, 4, 0));
        line.setOpaque(false);
        all.getAccessibleContext().setAccessibleName(setting.common().label() + ": use all that are listed");
        none.getAccessibleContext().setAccessibleName(setting.common().label() + ": use none that is listed");
        count.setForeground(Looks.quiet(Looks.panel()));
        line.add(all);
        line.add(none);
        line.add(count);
        return line;
    }

    @Override
    public JComponent component() {
        return panel;
    }

    @Override
    public List<JComponent> parts() {
        List<JComponent> parts = new ArrayList<>(List.of(way, pattern));
        parts.addAll(types.values());
        parts.addAll(List.of(table, all, none));
        return parts;
    }

    @Override
    public void show(Draft shown) {
        draft = shown;
        showing = true;
        String rule = storedRule();
        Way chosen = rule.isBlank() ? Way.NAMES : rule.startsWith(ColumnRule.REGEX.strip()) ? Way.REGEX
                : rule.startsWith(ColumnRule.TYPE.strip()) ? Way.TYPE : Way.WILDCARD;
        way.setSelectedItem(chosen);
        pattern.setText(chosen == Way.NAMES || chosen == Way.TYPE ? "" : rule.replaceFirst("^(wildcard|regex) ?", ""));
        List<String> titles = chosen == Way.TYPE ? List.of(rule.replaceFirst("^type ?", "").split(", ?")) : List.of();
        types.forEach((type, box) -> box.setSelected(titles.contains(type.title())));
        showing = false;
        arrange();
    }

    @Override
    public void follow(Draft changed) {
        boolean same = storedRule().isBlank() && draft.value(setting.key()).equals(changed.value(setting.key()))
                && draft.value(ColumnRules.key(setting)).equals(changed.value(ColumnRules.key(setting)));
        draft = changed;
        if (!same) {
            arrange();
        }
    }

    @Override
    public void allow(boolean may) {
        allowed = may;
        parts().stream().filter(part -> part != table).forEach(part -> part.setEnabled(may));
        arrange();
    }

    private void arrange() {
        Way chosen = chosenWay();
        boolean known = schema().isPresent();
        patternLabel.setText(chosen == Way.NAMES && !known ? "Add a name (Enter)" : chosen.prompt);
        patternLabel.setVisible(chosen != Way.TYPE);
        pattern.setVisible(chosen != Way.TYPE);
        typeGrid.setVisible(chosen == Way.TYPE);
        all.setVisible(chosen == Way.NAMES);
        none.setVisible(chosen == Way.NAMES);
        List<String> used = chosen == Way.NAMES ? names() : taken();
        int selected = table.getSelectedRow();
        rows.show(ColumnRows.rows(setting, schema(), used), allowed && chosen == Way.NAMES);
        if (selected >= 0 && selected < table.getRowCount()) {
            table.changeSelection(selected, 0, false, false);
        }
        filter();
        count.setText(said(used.size(), known));
    }

    private String said(int used, boolean known) {
        String columns = used == 1 ? "1 column" : used + " columns";
        if (!known && chosenWay() != Way.NAMES) {
            return "The input is not known yet";
        }
        return used > 0 ? columns + " used" : chosenWay() == Way.NAMES ? "None marked" : "No column fits";
    }

    private void filter() {
        String wanted = pattern.getText().strip().toLowerCase(Locale.ROOT);
        boolean searching = chosenWay() == Way.NAMES && schema().isPresent() && !wanted.isEmpty();
        search.setRowFilter(searching ? new RowFilter<ColumnRows, Integer>() {
            @Override
            public boolean include(Entry<? extends ColumnRows, ? extends Integer> entry) {
                return entry.getModel().row(entry.getIdentifier()).name().toLowerCase(Locale.ROOT).contains(wanted);
            }
        } : null);
    }

    private void patternChanged() {
        if (!showing && chosenWay() == Way.NAMES) {
            filter();
        } else {
            ruled();
        }
    }

    private void ruled() {
        if (!showing) {
            String rule = switch (chosenWay()) {
                case NAMES -> "";
                case WILDCARD -> ColumnRule.WILDCARD + pattern.getText();
                case REGEX -> ColumnRule.REGEX + pattern.getText();
                case TYPE -> ColumnRule.TYPE + types.entrySet().stream().filter(entry -> entry.getValue().isSelected())
                        .map(entry -> entry.getKey().title()).collect(Collectors.joining(", "));
            };
            edits.edited(ColumnRules.key(setting), rule.isEmpty() ? Optional.empty() : Optional.of(rule));
        }
    }

    private void addName() {
        String name = pattern.getText().strip();
        if (chosenWay() == Way.NAMES && schema().isEmpty() && !name.isEmpty()) {
            pattern.setText("");
            mark(name, true);
        }
    }

    private void mark(String name, boolean use) {
        Set<String> changed = new LinkedHashSet<>(names());
        if (use) {
            changed.add(name);
        } else {
            changed.remove(name);
        }
        store(changed);
    }

    private void markShown(boolean use) {
        Set<String> changed = new LinkedHashSet<>(names());
        for (int i = 0; i < table.getRowCount(); i++) {
            String name = rows.row(table.convertRowIndexToModel(i)).name();
            if (use) {
                changed.add(name);
            } else {
                changed.remove(name);
            }
        }
        store(changed);
    }

    private void markSelected() {
        int selected = table.getSelectedRow();
        if (selected >= 0 && rows.isCellEditable(selected, 0)) {
            ColumnRows.Row row = rows.row(table.convertRowIndexToModel(selected));
            mark(row.name(), !row.used());
        }
    }

    /** Keeps the order of the table while the list has it; a list in another order keeps its own, new names at the end. */
    private void store(Set<String> changed) {
        List<String> order = schema().map(TableSchema::names).orElse(List.of());
        Map<String, Integer> places = new HashMap<>();
        order.forEach(name -> places.putIfAbsent(name, places.size()));
        List<Integer> before = names().stream().filter(places::containsKey).map(places::get).toList();
        boolean ordered = before.equals(before.stream().sorted().toList());
        List<String> sorted = new ArrayList<>(changed);
        if (ordered) {
            sorted.sort(Comparator.comparingInt(name -> places.getOrDefault(name, Integer.MAX_VALUE)));
        }
        edits.edited(setting.key(), sorted.isEmpty() ? Optional.empty() : Optional.of(List.copyOf(sorted)));
    }

    private List<String> names() {
        Object stored = draft.value(setting.key()).orElse(List.of());
        return stored instanceof List<?> list ? list.stream().map(String::valueOf).toList() : List.of(stored.toString());
    }

    private List<String> taken() {
        try {
            ColumnRule rule = ColumnRule.parse(setting.key(), storedRule());
            return schema().map(known -> ColumnRules.names(draft.declaration(), draft.values(), setting, rule, known))
                    .orElse(List.of());
        } catch (SettingFault unreadable) {
            return List.of();
        }
    }

    private Way chosenWay() {
        return way.getSelectedItem() instanceof Way chosen ? chosen : Way.NAMES;
    }

    private String storedRule() {
        return draft.value(ColumnRules.key(setting)).map(String::valueOf).orElse("");
    }

    private Optional<TableSchema> schema() {
        return Optional.ofNullable(draft.inputs().get(setting.port()));
    }
}
