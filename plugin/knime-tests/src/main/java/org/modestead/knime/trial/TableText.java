package org.modestead.knime.trial;

import java.io.IOException;
import java.io.Writer;
import java.util.StringJoiner;
import org.knime.core.data.BooleanValue;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataColumnSpec;
import org.knime.core.data.DataRow;
import org.knime.core.data.DataTableSpec;
import org.knime.core.data.DoubleValue;
import org.knime.core.data.IntValue;
import org.knime.core.data.LongValue;
import org.knime.core.data.collection.ListDataValue;
import org.knime.core.data.container.CloseableRowIterator;
import org.knime.core.data.time.localdate.LocalDateValue;
import org.knime.core.data.time.localdatetime.LocalDateTimeValue;
import org.knime.core.data.time.zoneddatetime.ZonedDateTimeValue;
import org.knime.core.node.BufferedDataTable;

/** A table of the platform as text, read cell by cell without the bridge; every double with all its digits. */
final class TableText {

    private TableText() {}

    /** Returns names and types of all columns. */
    static String columns(DataTableSpec spec) {
        StringJoiner columns = new StringJoiner(", ");
        for (DataColumnSpec column : spec) {
            columns.add(column.getName() + ": " + column.getType());
        }
        return columns.toString();
    }

    /** Writes a line of column names and a line a row, cells separated by tabs; a missing cell is empty. */
    static void write(BufferedDataTable table, Writer writer) throws IOException {
        StringJoiner names = new StringJoiner("\t");
        for (DataColumnSpec column : table.getDataTableSpec()) {
            names.add(Desk.escaped(column.getName()));
        }
        writer.write(names + "\n");
        try (CloseableRowIterator rows = table.iterator()) {
            while (rows.hasNext()) {
                DataRow row = rows.next();
                StringJoiner cells = new StringJoiner("\t");
                for (int j = 0; j < row.getNumCells(); j++) {
                    cells.add(text(row.getCell(j)));
                }
                writer.write(cells + "\n");
            }
        }
    }

    private static String text(DataCell cell) {
        if (cell.isMissing()) {
            return "";
        } else if (cell instanceof BooleanValue flag) { // before the numbers: such a cell is one too
            return Boolean.toString(flag.getBooleanValue());
        } else if (cell instanceof IntValue whole) {
            return Integer.toString(whole.getIntValue());
        } else if (cell instanceof LongValue whole) {
            return Long.toString(whole.getLongValue());
        } else if (cell instanceof DoubleValue number) {
            return Double.toString(number.getDoubleValue());
        } else if (cell instanceof LocalDateValue day) {
            return day.getLocalDate().toString();
        } else if (cell instanceof LocalDateTimeValue moment) {
            return moment.getLocalDateTime().toString();
        } else if (cell instanceof ZonedDateTimeValue zoned) {
            return zoned.getZonedDateTime().toString();
        } else if (cell instanceof ListDataValue list) {
            StringJoiner entries = new StringJoiner(", ", "[", "]");
            list.forEach(entry -> entries.add(text(entry)));
            return entries.toString();
        }
        return Desk.escaped(cell.toString());
    }
}
