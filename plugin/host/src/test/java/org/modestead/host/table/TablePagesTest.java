package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.Progress;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.Table;

/** The first page of a large table is read without the rest of it; whatever needs the rest reads it. */
class TablePagesTest {

    private static final TablePages.Wish FIRST = new TablePages.Wish(0, 200, OptionalInt.empty(), false, "", false);
    private static final TablePages.Wish COUNT = new TablePages.Wish(0, 0, OptionalInt.empty(), false, "", true);

    @TempDir
    private Path folder;

    private Table table(int rows, String last) throws IOException {
        Files.writeString(folder.resolve("big.csv"), IntStream.range(0, rows).mapToObj(i -> i + ".5," + (i == rows - 1 ? last : rows - i + ".25"))
                .collect(Collectors.joining("\n", "a,b\n", "\n")));
        return (Table) new TableSource().run(new NodeInputs(Map.of()), SettingsReader.read(new TableSource(), Map.of("path", "big.csv")).settings().orElseThrow(),
                new RunContext(Progress.NONE, folder, folder)).outputs().get("table");
    }

    private static List<Optional<Object>> cells(Object... cells) {
        return java.util.stream.Stream.of(cells).map(Optional::of).toList();
    }

    /** The last row cannot be read: whoever reads it finds a fault. Types are told from the first rows, so the table itself opens. */
    @Test
    void theFirstPageNeverReadsTheLastRow() throws IOException {
        try (TablePages pages = new TablePages(table(40_000, "broken"))) {
            TablePages.Page page = pages.page(FIRST).orElseThrow();
            assertEquals(cells(0.5, 40_000.25), page.rows().get(0));
            assertEquals(List.of(200, false, (long) TablePages.BEGINNING), List.of(page.rows().size(), page.whole(), page.total()));
            String fault = assertThrows(TableFault.class, () -> pages.page(COUNT)).getMessage();
            assertTrue(fault.contains("row 40000 (line 40001), column b: the text \"broken\""), fault);
            assertEquals(200, pages.page(FIRST).orElseThrow().rows().size(), "the beginning can still be looked at");
        }
    }

    @Test
    void sortingSearchingAndLookingFurtherReadAll() throws IOException {
        Table table = table(40_000, "1.25");
        try (TablePages pages = new TablePages(table)) {
            assertEquals(cells(39_999.5, 1.25), pages.page(new TablePages.Wish(0, 1, OptionalInt.of(0), true, "", false)).orElseThrow().rows().get(0));
        }
        try (TablePages pages = new TablePages(table)) {
            TablePages.Page page = pages.page(new TablePages.Wish(39_998, 200, OptionalInt.empty(), false, "", false)).orElseThrow();
            assertEquals(List.of(List.of(39_999L, 40_000L), 40_000L, true), List.of(page.numbers(), page.total(), page.whole()));
        }
        try (TablePages pages = new TablePages(table)) {
            TablePages.Page page = pages.page(new TablePages.Wish(0, 5, OptionalInt.empty(), false, "39999.5", false)).orElseThrow();
            assertEquals(List.of(1L, List.of(40_000L)), List.of(page.found(), page.numbers()));
        }
    }

    @Test
    void aSmallTableIsWholeAtOnceAndAClosedOneGivesNothing() throws IOException {
        TablePages pages = new TablePages(table(TablePages.BEGINNING, "1.25"));
        TablePages.Page page = pages.page(FIRST).orElseThrow();
        assertEquals(List.of(true, (long) TablePages.BEGINNING), List.of(page.whole(), page.total()));
        pages.close();
        assertEquals(Optional.empty(), pages.page(FIRST));
    }
}
