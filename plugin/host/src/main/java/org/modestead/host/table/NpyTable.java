package org.modestead.host.table;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;
import java.util.OptionalLong;
import java.util.stream.IntStream;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/**
 * An array as NumPy keeps it, read row by row whenever somebody asks for the rows. Fields of a structured array are columns of their
 * names; an array of up to {@value #MOST_COLUMNS} columns gives columns called column1, column2 and so on, a wider one a single column of
 * lists called values.
 */
public final class NpyTable implements Table {

    private static final int MOST_COLUMNS = 1000;

    private final Path path;
    private final String shown;
    private final NpyHeader header;
    private final boolean copied;
    private final TableSchema schema;

    private NpyTable(Path path, String shown, NpyHeader header, boolean copied) {
        this.path = path;
        this.shown = shown;
        this.header = header;
        this.copied = copied;
        this.schema = schema(header);
    }

    /**
     * @param path absolute, a file that can be read
     * @param shown the name as the person wrote it
     * @param copied whether its rows belong into the result folder
     * @throws TableFault if it is no array of numbers in rows, or has no row
     */
    static NpyTable open(Path path, String shown, boolean copied) {
        try (FileChannel file = FileChannel.open(path, StandardOpenOption.READ)) {
            return new NpyTable(path, shown, NpyHeader.read(file, shown), copied);
        } catch (IOException unreadable) {
            throw new TableFault(shown, "the file cannot be read (" + unreadable.getMessage() + ")", "give a complete NPY file");
        }
    }

    private static TableSchema schema(NpyHeader header) {
        if (!header.names().isEmpty()) {
            return new TableSchema(header.names().stream().map(Column::number).toList());
        } else if (header.columns() <= MOST_COLUMNS) {
            return new TableSchema(IntStream.rangeClosed(1, header.columns()).mapToObj(k -> Column.number("column" + k)).toList());
        }
        return new TableSchema(List.of(new Column("values", CellType.DOUBLE_LIST)));
    }

    @Override
    public TableSchema schema() {
        return schema;
    }

    @Override
    public OptionalLong rowCount() {
        return OptionalLong.of(header.rows());
    }

    @Override
    public String origin() {
        return shown;
    }

    /** Returns whether the rows belong into the result folder; false where they are an input file as it is. */
    public boolean isCopied() {
        return copied;
    }

    @Override
    public RowCursor open() {
        try {
            return new NpyCursor(FileChannel.open(path, StandardOpenOption.READ), shown, header, schema.columns().get(0).type().isNumberList());
        } catch (IOException unreadable) {
            throw new TableFault(shown, "the file cannot be read (" + unreadable.getMessage() + ")", "leave it in its place until the run is over");
        }
    }
}
