package org.modestead.host.table;

import java.util.Collection;
import java.util.stream.Collectors;

/** Quotes names and texts for SQL, so that no name of a file or column can become a command. */
final class Sql {

    private Sql() {}

    static String name(String identifier) {
        return '"' + identifier.replace("\"", "\"\"") + '"';
    }

    static String text(String value) {
        return "'" + value.replace("'", "''") + "'";
    }

    static String texts(Collection<String> values) {
        return values.stream().map(Sql::text).collect(Collectors.joining(", ", "[", "]"));
    }
}
