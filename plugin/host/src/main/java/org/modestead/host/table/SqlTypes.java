package org.modestead.host.table;

import java.util.Locale;
import org.modestead.nodes.table.CellType;

/** DuckDB's column types and the types that nodes know. */
final class SqlTypes {

    private SqlTypes() {}

    /** Returns the node type that holds a DuckDB type; whatever has no counterpart is told as text. */
    static CellType cellType(String sqlType) {
        String type = sqlType.toUpperCase(Locale.ROOT);
        if (type.endsWith("]")) {
            return listType(type.substring(0, type.lastIndexOf('[')));
        }
        if (type.startsWith("DECIMAL")) {
            return CellType.DOUBLE;
        }
        return switch (type) {
            case "TINYINT", "SMALLINT", "INTEGER", "BIGINT", "UTINYINT", "USMALLINT", "UINTEGER" -> CellType.LONG;
            case "FLOAT", "DOUBLE", "HUGEINT", "UHUGEINT", "UBIGINT" -> CellType.DOUBLE;
            case "BOOLEAN" -> CellType.FLAG;
            case "DATE" -> CellType.DATE;
            case "TIMESTAMP", "TIMESTAMP_S", "TIMESTAMP_MS", "TIMESTAMP_NS" -> CellType.DATE_TIME;
            case "TIMESTAMP WITH TIME ZONE" -> CellType.ZONED_DATE_TIME;
            default -> CellType.TEXT;
        };
    }

    /** Lists of lists, and of what has no counterpart, are told as text. */
    private static CellType listType(String entries) {
        CellType type = cellType(entries);
        boolean told = type != CellType.TEXT || entries.equals("VARCHAR");
        return told ? CellType.listOf(type).orElse(CellType.TEXT) : CellType.TEXT;
    }

    /** Returns the DuckDB type that a cursor reads for a node type. */
    static String sqlType(CellType type) {
        return switch (type) {
            case DOUBLE -> "DOUBLE";
            case LONG -> "BIGINT";
            case TEXT -> "VARCHAR";
            case FLAG -> "BOOLEAN";
            case DATE -> "DATE";
            case DATE_TIME -> "TIMESTAMP";
            case ZONED_DATE_TIME -> "TIMESTAMPTZ";
            case DOUBLE_LIST, LONG_LIST, TEXT_LIST, FLAG_LIST, DATE_LIST, DATE_TIME_LIST, ZONED_DATE_TIME_LIST ->
                sqlType(type.entries().orElseThrow()) + "[]";
        };
    }
}
