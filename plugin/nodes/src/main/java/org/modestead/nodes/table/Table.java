package org.modestead.nodes.table;

import java.util.OptionalLong;

/**
 * A table as the nodes see it, whichever host holds it: columns known at once, rows streamed. A host's table may be
 * far larger than memory; nobody asks for all rows at once.
 */
public interface Table {

    /** Returns the columns, never null. */
    TableSchema schema();

    /**
     * Returns where the table came from, for messages, for example a file name; never null.
     */
    String origin();

    /** Returns the number of rows, where it is known without reading them. */
    default OptionalLong rowCount() {
        return OptionalLong.empty();
    }

    /**
     * Opens the rows from the first one. The same table can be opened again and gives the same rows in the same order.
     *
     * @return to be closed by the caller
     */
    RowCursor open();
}
