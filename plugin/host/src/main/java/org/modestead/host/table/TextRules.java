package org.modestead.host.table;

import java.util.List;
import org.modestead.nodes.table.CellType;

/**
 * How texts of a CSV or JSON file become typed cells. The expressions give NULL for a text that is no cell of the
 * type, so that the same rule finds a column's type, reads it, and names the cell that does not fit.
 *
 * @param decimalComma whether numbers are written 1,5
 * @param timeFormat how dates or date-times are written, in strptime codes; empty for ISO 8601
 * @param textColumns columns that are read as text whatever they hold
 */
record TextRules(boolean decimalComma, String timeFormat, List<String> textColumns) {

    private static final String ZONE = "'.*[0-9](Z|[+-][0-9]{2}(:?[0-9]{2})?)$'";
    private static final int DATE_LENGTH = 10;

    TextRules {
        textColumns = List.copyOf(textColumns);
    }

    /** Returns the SQL expression of a text column read as a type; NULL where it does not fit. */
    String parsed(CellType type, String column) {
        String text = Sql.name(column);
        String number = decimalComma ? "replace(" + text + ", ',', '.')" : text;
        return switch (type) {
            case DOUBLE -> "TRY_CAST(" + number + " AS DOUBLE)";
            // a cast alone would round 1.5 to 2
            case LONG -> "CASE WHEN regexp_full_match(" + text + ", '\\s*[+-]?[0-9]{1,18}\\s*') THEN TRY_CAST(" + text
                    + " AS BIGINT) END";
            case TEXT -> text;
            case FLAG -> "CASE lower(" + text + ") WHEN 'true' THEN true WHEN 'false' THEN false END";
            case DATE -> date(text);
            case DATE_TIME -> dateTime(text);
            case ZONED_DATE_TIME -> timeFormat.isEmpty()
                    ? "CASE WHEN regexp_full_match(" + text + ", " + ZONE + ") AND length(" + text + ") > " + DATE_LENGTH
                            + " THEN TRY_CAST(" + text + " AS TIMESTAMPTZ) END"
                    : "CAST(NULL AS TIMESTAMPTZ)";
            default -> throw new IllegalArgumentException("a text is not read as " + type.title());
        };
    }

    private String date(String text) {
        if (timeFormat.isEmpty()) {
            return "CASE WHEN length(" + text + ") = " + DATE_LENGTH + " THEN TRY_CAST(" + text + " AS DATE) END";
        }
        return isDateOnly() ? "CAST(" + own(text) + " AS DATE)" : "CAST(NULL AS DATE)";
    }

    private String dateTime(String text) {
        if (timeFormat.isEmpty()) {
            return "CASE WHEN length(" + text + ") > " + DATE_LENGTH + " AND NOT regexp_full_match(" + text + ", " + ZONE
                    + ") THEN TRY_CAST(" + text + " AS TIMESTAMP) END";
        }
        return isDateOnly() ? "CAST(NULL AS TIMESTAMP)" : own(text);
    }

    private String own(String text) {
        return "CAST(try_strptime(" + text + ", " + Sql.text(timeFormat) + ") AS TIMESTAMP)";
    }

    private boolean isDateOnly() {
        return !timeFormat.matches(".*%[HIMSXTcs].*");
    }
}
