package org.modestead.knime.dialog;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/** One column of an input table, offered among those of fitting types; typed by name while the table is not known. */
final class ColumnEditor implements Editor {
    private final Setting.OneColumn setting;
    private final Edits edits;
    private final JComboBox<Item> list = Looks.plain(new JComboBox<>());
    private boolean showing;

    /**
     * One line of the list.
     *
     * @param name of the column, empty for none
     * @param label what is shown
     */
    record Item(String name, String label) {
        @Override
        public String toString() {
            return label;
        }
    }

    ColumnEditor(Setting.OneColumn setting, Edits edits) {
        this.setting = setting;
        this.edits = edits;
        list.addActionListener(event -> chosen());
    }

    @Override
    public JComponent component() {
        return list;
    }

    @Override
    public List<JComponent> parts() {
        return List.of(list);
    }

    @Override
    public void show(Draft draft) {
        String name = draft.value(setting.key()).map(String::valueOf).orElse("");
        Optional<TableSchema> schema = Optional.ofNullable(draft.inputs().get(setting.port()));
        List<Item> items = items(schema, name);
        showing = true;
        list.setEditable(schema.isEmpty());
        if (list.getEditor().getEditorComponent() instanceof JComponent text) {
            text.getAccessibleContext().setAccessibleName(setting.common().label());
        }
        list.removeAllItems();
        items.forEach(list::addItem);
        items.stream().filter(item -> item.name().equals(name)).findFirst().ifPresent(list::setSelectedItem);
        showing = false;
    }

    private List<Item> items(Optional<TableSchema> schema, String name) {
        List<Item> items = new ArrayList<>();
        items.add(new Item("", setting.required() ? "(choose a column)" : "(none)"));
        schema.ifPresent(known -> known.columns().stream().filter(column -> setting.types().contains(column.type()))
                .map(ColumnEditor::item).forEach(items::add));
        if (items.stream().noneMatch(item -> item.name().equals(name))) {
            String why = schema.isEmpty() ? "" : schema.get().indexOf(name).isEmpty() ? " (not in the input)" : " (of another type)";
            items.add(new Item(name, name + why));
        }
        return items;
    }

    private static Item item(Column column) {
        return new Item(column.name(), column.name() + " (" + column.type().title() + ")");
    }

    @Override
    public void allow(boolean allowed) {
        list.setEnabled(allowed);
    }

    private void chosen() {
        Object selected = list.getSelectedItem();
        if (!showing && selected != null) {
            String name = selected instanceof Item item ? item.name() : selected.toString().strip();
            edits.edited(setting.key(), name.isEmpty() ? Optional.empty() : Optional.of(name));
        }
    }
}
