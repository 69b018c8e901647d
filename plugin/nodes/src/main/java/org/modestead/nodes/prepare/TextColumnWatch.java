package org.modestead.nodes.prepare;

import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.nodes.table.RowCursor;

/**
 * Watches a column of text that takes no part: if most of its cells are numbers, a few odd cells have probably made it
 * text, and leaving the channel out in silence would mislead.
 */
final class TextColumnWatch {

    private final String name;
    private final int column;
    private long numbers;
    private long others;
    private long firstOtherRow;
    private String firstOther = "";

    TextColumnWatch(String name, int column) {
        this.name = name;
        this.column = column;
    }

    void see(RowCursor cursor) {
        String text = cursor.text(column).strip();
        if (text.isEmpty()) {
            return;
        }
        if (NumberCell.parse(text).isPresent()) {
            numbers++;
            return;
        }
        if (others++ == 0) {
            firstOtherRow = cursor.row();
            firstOther = text;
        }
    }

    Optional<Doubt> doubt() {
        if (numbers == 0 || numbers < others) {
            return Optional.empty();
        }
        String cause = others == 0 ? "although every cell is a number"
                : "because " + others + " of its " + (numbers + others) + " cells are not numbers, the first in row "
                        + firstOtherRow + " (\"" + firstOther + "\")";
        return Optional.of(new Doubt("column-left-out", "Column " + name + " holds text and takes no part, " + cause
                + "; name it among the channels or correct the cells if it was measured."));
    }
}
