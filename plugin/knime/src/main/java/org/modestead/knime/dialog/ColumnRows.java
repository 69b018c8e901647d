package org.modestead.knime.dialog;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.BiConsumer;
import java.util.stream.Collectors;
import javax.swing.table.AbstractTableModel;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/** The columns that a list of columns can take, as rows with a mark each: what the input offers, then names that it lacks. */
final class ColumnRows extends AbstractTableModel {
    private static final long serialVersionUID = 1L;
    private static final List<String> HEADS = List.of("Use", "Column", "Type");

    private final transient BiConsumer<String, Boolean> marked;
    private transient List<Row> rows = List.of();
    private boolean open = true;

    /**
     * One column.
     *
     * @param name of it
     * @param type for people
     * @param used whether it is in the list
     */
    record Row(String name, String type, boolean used) {}

    /** @param marked hears of a row that a person marked or unmarked */
    ColumnRows(BiConsumer<String, Boolean> marked) {
        this.marked = marked;
    }

    /** Returns the rows for a setting: fitting columns of the input, then used names that are not among them. */
    static List<Row> rows(Setting.Columns setting, Optional<TableSchema> schema, List<String> used) {
        List<Row> rows = new ArrayList<>();
        Set<String> marked = Set.copyOf(used);
        List<Column> columns = schema.map(TableSchema::columns).orElse(List.of());
        columns.stream().filter(column -> setting.types().contains(column.type()))
                .map(column -> new Row(column.name(), column.type().title(), marked.contains(column.name()))).forEach(rows::add);
        Set<String> offered = rows.stream().map(Row::name).collect(Collectors.toSet());
        used.stream().filter(name -> !offered.contains(name)).distinct().map(name -> new Row(name, lacking(schema, name), true))
                .forEach(rows::add);
        return rows;
    }

    private static String lacking(Optional<TableSchema> schema, String name) {
        return schema.isEmpty() ? "not known yet" : schema.get().indexOf(name).isEmpty() ? "not in the input" : "of another type";
    }

    /** Shows other rows. */
    void show(List<Row> others, boolean canBeMarked) {
        rows = List.copyOf(others);
        open = canBeMarked;
        fireTableDataChanged();
    }

    /** Returns the row at a position of the model. */
    Row row(int index) {
        return rows.get(index);
    }

    @Override
    public int getRowCount() {
        return rows.size();
    }

    @Override
    public int getColumnCount() {
        return HEADS.size();
    }

    @Override
    public String getColumnName(int column) {
        return HEADS.get(column);
    }

    @Override
    public Class<?> getColumnClass(int column) {
        return column == 0 ? Boolean.class : String.class;
    }

    @Override
    public boolean isCellEditable(int row, int column) {
        return column == 0 && open;
    }

    @Override
    public Object getValueAt(int row, int column) {
        Row shown = rows.get(row);
        return column == 0 ? (Object) shown.used() : column == 1 ? shown.name() : shown.type();
    }

    @Override
    public void setValueAt(Object value, int row, int column) {
        marked.accept(rows.get(row).name(), Boolean.TRUE.equals(value));
    }
}
