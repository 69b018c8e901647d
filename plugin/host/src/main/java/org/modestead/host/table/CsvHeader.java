package org.modestead.host.table;

import java.io.IOException;
import java.nio.charset.CharacterCodingException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;

/** Finds the delimiter and the column names of a CSV file in its first record. */
final class CsvHeader {

    /** In the order in which ties are decided. */
    private static final String DELIMITERS = ",;\t|";
    private static final Pattern NUMBER = Pattern.compile("[+-]?(\\d+[.,]?\\d*|[.,]\\d+)([eE][+-]?\\d+)?");

    private CsvHeader() {}

    /** Returns the delimiter that occurs most often outside quotes in the first record. */
    static char delimiter(CsvFormat format, boolean decimalComma) {
        int most = 0;
        char best = decimalComma ? ';' : ',';
        for (char candidate : DELIMITERS.toCharArray()) {
            boolean usable = !decimalComma || candidate != ',';
            int cells = usable ? first(format.withDelimiter(candidate)).size() : 0;
            if (cells > Math.max(most, 1)) {
                most = cells;
                best = candidate;
            }
        }
        return best;
    }

    /**
     * Returns the column names: those of the header without surrounding blanks; {@code column3} for a column without a
     * name, by its position.
     *
     * @throws TableFault if two columns have the same name, or the header holds numbers only
     */
    static List<String> names(CsvFormat format) {
        List<String> cells = first(format);
        List<String> names = new ArrayList<>();
        for (String cell : cells) {
            String name = format.header() ? cell.strip() : "";
            names.add(name.isEmpty() ? "column" + (names.size() + 1) : name);
        }
        if (format.header() && cells.stream().allMatch(cell -> NUMBER.matcher(cell.strip()).matches())) {
            throw new TableFault(format.shown() + ", line " + (format.skipLines() + 1), "the header holds numbers only ("
                    + String.join(", ", cells.subList(0, Math.min(3, cells.size()))) + ")",
                    "write a line with the column names above it, or set header to false");
        }
        duplicate(names).ifPresent(name -> {
            throw new TableFault(format.shown() + ", line " + (format.skipLines() + 1) + ", column " + name,
                    "this name stands twice in the header", "give every column a name of its own");
        });
        return names;
    }

    /** Returns whether the header gives a column no name. */
    static boolean isUnnamed(CsvFormat format, int column) {
        return format.header() && first(format).get(column).isBlank();
    }

    private static List<String> first(CsvFormat format) {
        try (CsvRecords records = CsvRecords.open(format)) {
            if (!records.next()) {
                throw new TableFault(format.shown(), "the file holds no line of text"
                        + (format.skipLines() > 0 ? " after the " + format.skipLines() + " skipped ones" : ""),
                        "give a table with a header and at least one row");
            }
            return records.cells();
        } catch (CharacterCodingException foreign) {
            throw EncodingScan.fault(format);
        } catch (IOException unreadable) {
            throw new TableFault(format.shown(), "the file cannot be read (" + unreadable.getMessage() + ")",
                    "check that it is a CSV file and may be read");
        }
    }

    private static Optional<String> duplicate(List<String> names) {
        Set<String> once = new HashSet<>();
        return names.stream().filter(name -> !once.add(name.toLowerCase(java.util.Locale.ROOT))).findFirst();
    }
}
