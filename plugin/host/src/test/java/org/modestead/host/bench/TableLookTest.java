package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** Tables are looked at page by page, sorted where that is asked for; none is ever sent whole. */
class TableLookTest {

    private static final int ROWS = 60 * 100;
    /** Rows of the largest page that the server sends. */
    private static final int PAGE = 500;

    @TempDir
    private Path folder;

    @Test
    void aTableIsSentInSortedPagesAndNeverWhole() throws IOException, InterruptedException {
        Path workflow = TestWorkflows.write(folder, List.of("flow:signal-generator:{\"scenario\": \"flows\", \"runs\": 60, \"samples\": 100}"), List.of());
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desk"), Optional.of(workflow))) {
            bench.post("/api/run", "{}");
            assertEquals("done", TestBench.kind(bench.awaitRest(), "flow"));
            JsonNode greedy = page(bench, "limit=1000000");
            assertEquals(PAGE, greedy.path("rows").size(), "however many are asked for");
            assertEquals(ROWS, greedy.path("total").asInt());
            List<Double> falling = column(page(bench, "sort=x&order=down&limit=40"));
            assertEquals(40, falling.size());
            assertEquals(falling.stream().sorted((a, b) -> Double.compare(b, a)).toList(), falling);
            List<Double> rising = column(page(bench, "sort=x&limit=1"));
            assertTrue(rising.get(0) < falling.get(39), rising + " " + falling);
            JsonNode last = page(bench, "offset=" + (ROWS - 7));
            assertEquals(7, last.path("rows").size());
            assertEquals(ROWS, last.path("numbers").path(6).asInt(), "rows are numbered as in the table");
        }
    }

    private static JsonNode page(TestBench bench, String query) throws IOException, InterruptedException {
        return bench.get("/api/steps/flow/tables/table?" + query).json();
    }

    private static List<Double> column(JsonNode page) {
        int place = page.path("columns").findValuesAsText("name").indexOf("x");
        List<Double> values = new ArrayList<>();
        for (JsonNode row : page.path("rows")) {
            values.add(row.path(place).asDouble());
        }
        return values;
    }
}
