package org.modestead.host.table;

import java.sql.SQLException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/** Makes a typed table of a file whose cells are texts, and names the cell that does not fit its column. */
final class TextTable implements Explainer {

    private static final Pattern MARK = Pattern.compile("modestead-cell ([0-9a-f]+) ([A-Z_]+) (\\d+)");
    private static final int LONGEST_QUOTE = 60;

    private final TextFile file;
    private final TextRules rules;
    private final SourceLimits limits;
    private final RememberedTypes types;

    TextTable(TextFile file, TextRules rules, SourceLimits limits, RememberedTypes types) {
        this.file = file;
        this.rules = rules;
        this.limits = limits;
        this.types = types;
    }

    /**
     * Looks at the columns and returns the table.
     *
     * @throws TableFault if it has no row, or a cell among those looked at does not fit
     */
    DuckDbTable open() {
        List<TextTyper.Found> found = found().columns();
        List<Column> columns = new ArrayList<>();
        for (int j = 0; j < found.size(); j++) {
            String name = file.names().get(j);
            if (found.get(j).cells() > 0 || !file.unnamed().contains(name)) {
                columns.add(new Column(name, found.get(j).type()));
            }
        }
        return new DuckDbTable(Recipe.file(select(columns), file.path()), new TableSchema(columns), file.shown(), limits.megabytes(),
                limits.copied(), this);
    }

    TextFile file() {
        return file;
    }

    /** Returns the SELECT of columns of this file, read as the types that are told. */
    String select(List<Column> columns) {
        return columns.stream().map(this::cell).collect(Collectors.joining(", ", "SELECT ", " FROM " + file.read()));
    }

    private TextTyper.Result search() throws SQLException {
        file.places().requireEnd();
        try (Database database = Database.open(limits.megabytes())) {
            return new TextTyper(database, file.read(), rules).types(file.names());
        }
    }

    /**
     * Returns what the columns hold, with all cells that were looked at of their column's type.
     *
     * @throws TableFault if there is no row, or a cell does not fit
     */
    TextTyper.Result found() {
        TextTyper.Result result;
        try {
            result = types.of(file, rules, this::search);
        } catch (SQLException failure) {
            throw explain(failure);
        }
        if (result.rows() == 0) {
            throw new TableFault(file.shown(), "there is a header (" + String.join(", ", file.names())
                    + ") but no row below it",
                    "give a table with at least one row");
        }
        for (int j = 0; j < file.names().size(); j++) {
            if (result.columns().get(j).misfits() > 0) {
                throw misfit(new Column(file.names().get(j), result.columns().get(j).type()));
            }
        }
        return result;
    }

    private String cell(Column column) {
        String parsed = rules.parsed(column.type(), column.name());
        String text = Sql.name(column.name());
        return column.type() == CellType.TEXT ? text
                : "coalesce(" + parsed + ", CASE WHEN " + text + " IS NOT NULL THEN error('" + mark(column) + "') END) AS " + text;
    }

    /** Stands in DuckDB's message for the column whose cell did not fit; the row is looked for only then. */
    private String mark(Column column) {
        return "modestead-cell " + Integer.toHexString(file.path().hashCode()) + " " + column.type() + " "
                + file.names().indexOf(column.name());
    }

    @Override
    public Optional<TableFault> claim(DuckDbMessage message) {
        Matcher mark = MARK.matcher(message.text());
        boolean marked = mark.find() && mark.group(1).equals(Integer.toHexString(file.path().hashCode()));
        return marked || message.text().contains(file.path().toString()) ? Optional.of(explain(message)) : Optional.empty();
    }

    @Override
    public TableFault explain(DuckDbMessage message) {
        Matcher mark = MARK.matcher(message.text());
        if (mark.find()) {
            CellType type = CellType.valueOf(mark.group(2));
            return misfit(new Column(file.names().get(Integer.parseInt(mark.group(3))), type));
        }
        return limits.explain(file.shown(), message)
                .or(() -> file.places().broken())
                .orElseGet(() -> new TableFault(file.shown(), message.brief(), "correct the file"));
    }

    private TableFault misfit(Column column) {
        String text = Sql.name(column.name());
        String find = "SELECT place, cell FROM (SELECT row_number() OVER () AS place, " + text + " AS cell, "
                + rules.parsed(column.type(), column.name()) + " AS parsed FROM " + file.read()
                + ") WHERE cell IS NOT NULL AND parsed IS NULL LIMIT 1";
        try (Database database = Database.open(limits.megabytes())) {
            return database.one(find, row -> new TableFault(
                    file.shown() + ", " + file.places().row(row.getLong(1)) + ", column " + column.name(),
                    "the text \"" + shortened(row.getString(2)) + "\" in a column of type " + column.type().title(),
                    "correct the cell, add this text to the setting missing, or name the column in the setting "
                    + "text-columns", row.getString(2)));
        } catch (SQLException failure) {
            throw explainOnce(failure);
        }
    }

    private TableFault explainOnce(SQLException failure) {
        return file.places().broken().orElseGet(() -> new TableFault(file.shown(), DuckDbMessage.of(failure).brief(),
                "correct the file"));
    }

    private static String shortened(String text) {
        return text.length() <= LONGEST_QUOTE ? text : text.substring(0, LONGEST_QUOTE) + "...";
    }
}
