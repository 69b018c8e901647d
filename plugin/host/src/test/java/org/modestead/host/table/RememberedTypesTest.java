package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.Table;

/** Types of columns are looked for once for each way of reading each state of a file. */
class RememberedTypesTest {

    private static final TextRules PLAIN = new TextRules(false, "", List.of());
    private static final Instant LONG_AGO = Instant.parse("2020-01-01T00:00:00Z");

    @TempDir
    Path folder;

    private final RememberedTypes types = new RememberedTypes();
    private final AtomicInteger searches = new AtomicInteger();

    @Test
    void aFileThatIsAsBeforeIsNotReadAgain() throws IOException {
        written("1,2", LONG_AGO);
        assertEquals(List.of(1, 1), List.of(asked("a", PLAIN), asked("a", PLAIN)));
    }

    @Test
    void anotherWayOfReadingIsAnotherQuestion() throws IOException {
        written("1,2", LONG_AGO);
        assertEquals(List.of(1, 2, 3), List.of(asked("a", PLAIN), asked("b", PLAIN), asked("a", new TextRules(true, "", List.of()))));
    }

    @Test
    void aChangedFileIsReadAgain() throws IOException {
        written("1,2", LONG_AGO);
        asked("a", PLAIN);
        written("1,2", LONG_AGO.plusMillis(1));
        assertEquals(2, asked("a", PLAIN), "the time of change counts");
        written("1,2.5", LONG_AGO.plusMillis(1));
        assertEquals(3, asked("a", PLAIN), "the size counts");
        written("1,2.6", LONG_AGO.plusMillis(1));
        assertEquals(4, asked("a", PLAIN), "the content of the ends counts");
    }

    @Test
    void aFileThatHasJustChangedIsNotTrusted() throws IOException {
        written("1,2", Instant.now());
        assertEquals(List.of(1, 2), List.of(asked("a", PLAIN), asked("a", PLAIN)));
    }

    @Test
    void theCheckAndTheRunBehindItFindTheSameTable() throws IOException {
        written("n,x\n1,2\n2,2.5\n", LONG_AGO);
        TableSource source = new TableSource();
        for (int time = 0; time < 2; time++) {
            Table table = (Table) Steps.run(source, folder, Map.of(), "path", "t.csv").outputs().get("table");
            assertEquals(List.of(CellType.LONG, CellType.DOUBLE), table.schema().columns().stream().map(Column::type).toList());
            assertEquals(List.of("1|2.0", "2|2.5"), Steps.rows(table));
        }
    }

    private void written(String text, Instant changed) throws IOException {
        Files.setLastModifiedTime(Files.writeString(folder.resolve("t.csv"), text), FileTime.from(changed));
    }

    /** Returns how often was searched until now. */
    private int asked(String read, TextRules rules) {
        TextFile file = new TextFile(folder.resolve("t.csv"), "t.csv", read, List.of("n"), Set.of(), null);
        types.of(file, rules, () -> {
            searches.incrementAndGet();
            return new TextTyper.Result(1, List.of());
        });
        return searches.get();
    }
}
