package org.modestead.host.table;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * A file whose cells are read as texts first.
 *
 * @param path absolute
 * @param shown the name as the person wrote it, for messages
 * @param read table expression that gives all columns as texts
 * @param names of the columns, in order
 * @param unnamed those among them that the file itself does not name: left out when they hold nothing
 * @param places names rows and finds what DuckDB stumbled over
 */
record TextFile(Path path, String shown, String read, List<String> names, Set<String> unnamed, Places places) {

    TextFile {
        names = List.copyOf(names);
        unnamed = Set.copyOf(unnamed);
    }

    /** Names places in the file. */
    interface Places {
        /** @throws TableFault if the last row would be left out because it is too long; asked once for a file, before its columns are looked at */
        void requireEnd();

        /** Returns how a person finds a data row, counted from 1; asked only after something went wrong. */
        String row(long row);

        /** Looks through the file for a row or a letter that makes it unreadable; asked only after something went wrong. */
        Optional<TableFault> broken();
    }
}
