package org.modestead.host.table;

import java.io.IOException;
import java.nio.charset.CharacterCodingException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/** Reads CSV files. Nothing is guessed but the delimiter and the types of the columns. */
final class CsvSource {

    private CsvSource() {}

    /**
     * @param format how the file is written
     * @param missing texts that stand for a missing cell, besides the empty one
     */
    static TextFile open(CsvFormat format, List<String> missing) {
        List<String> names = CsvHeader.names(format);
        Set<String> unnamed = new HashSet<>();
        for (int j = 0; j < names.size(); j++) {
            if (names.get(j).equals("column" + (j + 1)) && CsvHeader.isUnnamed(format, j)) {
                unnamed.add(names.get(j));
            }
        }
        return new TextFile(format.path(), format.shown(), read(format, names, missing), names, unnamed,
                new CsvPlaces(format));
    }

    private static String read(CsvFormat format, List<String> names, List<String> missing) {
        String columns = names.stream().map(name -> Sql.text(name) + ": 'VARCHAR'")
                .collect(Collectors.joining(", ", "{", "}"));
        List<String> nulls = new ArrayList<>(missing);
        nulls.add(0, "");
        return "read_csv(" + Sql.text(format.path().toString()) + ", auto_detect = false, columns = " + columns
                + ", delim = " + Sql.text(String.valueOf(format.delimiter())) + ", quote = '\"', escape = '\"', header = "
                + format.header() + ", skip = " + format.skipLines() + ", nullstr = " + Sql.texts(nulls)
                + ", encoding = " + Sql.text(encoding(format)) + ")";
    }

    private static String encoding(CsvFormat format) {
        return switch (format.encoding().name()) {
            case "ISO-8859-1" -> "latin-1";
            case "UTF-16" -> "utf-16";
            default -> format.encoding().name().toLowerCase(Locale.ROOT);
        };
    }

    /** Finds rows and faults in a CSV file by reading it once more, record by record. */
    private record CsvPlaces(CsvFormat format) implements TextFile.Places {

        @Override
        public void requireEnd() {
            LastLine.requireEnd(format);
        }

        @Override
        public String row(long row) {
            try (CsvRecords records = CsvRecords.open(format)) {
                for (long at = format.header() ? -1 : 0; at < row && records.next(); at++) {
                    // on to the row
                }
                return "row " + row + " (line " + records.line() + ")";
            } catch (IOException unreadable) {
                return "row " + row;
            }
        }

        @Override
        public Optional<TableFault> broken() {
            try (CsvRecords records = CsvRecords.open(format)) {
                long row = format.header() ? -1 : 0;
                int width = -1;
                while (records.next()) {
                    row++;
                    int cells = records.cells().size();
                    String place = format.shown() + (row == 0 ? "" : ", row " + row) + " (line " + records.line() + ")";
                    if (records.isUnterminated()) {
                        return Optional.of(new TableFault(place, "a quote \" opens here and never closes",
                                "close it, or write \"\" for a quote inside quotes"));
                    }
                    if (width >= 0 && cells != width) {
                        return Optional.of(new TableFault(place, cells + (cells == 1 ? " cell" : " cells") + " where the "
                                + (format.header() ? "header" : "first row") + " has " + width,
                                "give every row as many cells, and quote cells that hold the delimiter"));
                    }
                    width = cells;
                }
                return Optional.empty();
            } catch (CharacterCodingException foreign) {
                return Optional.of(EncodingScan.fault(format));
            } catch (IOException unreadable) {
                return Optional.of(new TableFault(format.shown(), "the file cannot be read (" + unreadable.getMessage()
                        + ")",
                        "check that it is complete"));
            }
        }
    }
}
