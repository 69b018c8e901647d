package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** The SQL of a query step reaches its inputs and nothing else: no file, no network, no setting, no other statement. */
class QuerySafetyTest {

    @TempDir
    private Path folder;

    @Test
    void everythingBesideItsInputsIsRefused() throws IOException, InterruptedException {
        Path work = Files.createDirectories(folder.resolve("work"));
        Files.writeString(work.resolve("x.csv"), "time,x\n1,2\n2,3\n");
        Path secret = Files.writeString(work.resolve("secret.csv"), "hidden_word\nfound_it\n");
        TestWorkflows.write(work, List.of("a:table-source:{\"path\": \"x.csv\"}", "q:table-query"), List.of("a.table>q.input"));
        List<String> refused = List.of(
                "SELECT * FROM read_csv('" + secret + "')",
                "SELECT * FROM '" + secret + "'",
                "SELECT * FROM read_text('" + secret + "')",
                "SELECT * FROM read_blob('/etc/hostname')",
                "SELECT * FROM glob('" + work + "/*')",
                "SELECT * FROM sniff_csv('" + secret + "')",
                "SELECT * FROM read_parquet('http://127.0.0.1:1/x.parquet')",
                "SELECT * FROM read_csv('https://example.invalid/x.csv')",
                "SELECT * FROM read_json('s3://bucket/x.json')",
                "SELECT *, (SELECT content FROM read_text('" + secret + "')) AS y FROM input",
                "WITH z AS (SELECT * FROM read_csv('" + secret + "')) SELECT * FROM z",
                "SELECT getenv('HOME')",
                "COPY input TO '" + work.resolve("out.csv") + "'",
                "COPY (SELECT 1) TO '" + work.resolve("out.csv") + "'",
                "ATTACH '" + work.resolve("new.db") + "'",
                "INSTALL httpfs",
                "LOAD httpfs",
                "SET enable_external_access = true",
                "PRAGMA database_list",
                "EXPORT DATABASE '" + work + "'",
                "CREATE TABLE t AS SELECT 1",
                "SELECT 1; COPY (SELECT 1) TO '" + work.resolve("out.csv") + "'",
                "CALL pragma_version()");
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desk"), Optional.of(work))) {
            for (String sql : refused) {
                JsonNode desk = sql(bench, sql);
                String sentence = TestBench.step(desk, "q").path("problems").path(0).path("sentence").asText();
                if (!TestBench.kind(desk, "q").equals("unset")) {
                    // DuckDB looks at this file only when rows are asked for
                    bench.post("/api/run", "{}");
                    JsonNode ran = bench.awaitRest();
                    assertEquals("failed", TestBench.kind(ran, "q"), sql);
                    sentence = TestBench.step(ran, "q").path("state").path("sentence").asText();
                    assertEquals(409, bench.get("/api/steps/q/tables/table").status(), sql);
                }
                assertTrue(sentence.startsWith("step q, setting sql: "), sql + " gave " + sentence);
                assertFalse(desk.path("problems").toString().contains("found_it"), desk.toString());
                assertFalse(desk.path("problems").toString().contains("hidden_word"), desk.toString());
            }
            assertEquals(List.of("secret.csv", "workflow.json", "x.csv"), List.of(work.toFile().list()).stream().sorted().toList(), "nothing was written");
            JsonNode desk = sql(bench, "SELECT time, 2 * x AS twice FROM input ORDER BY time DESC");
            assertEquals(0, TestBench.step(desk, "q").path("problems").size(), desk.toString());
            bench.post("/api/run", "{}");
            bench.awaitRest();
            assertEquals("[[2,6],[1,4]]", bench.get("/api/steps/q/tables/table").json().path("rows").toString());
        }
    }

    @Test
    void aQueryThatFailsAtARowFailsAsItsOwnStepAndNotAsTheNextOne() throws IOException, InterruptedException {
        Path work = Files.createDirectories(folder.resolve("work"));
        Files.writeString(work.resolve("x.csv"), "time,x,word\n" + IntStream.range(0, 5000).mapToObj(row -> row + ",2," + (row == 4321 ? "three" : "3"))
                .collect(Collectors.joining("\n", "", "\n")));
        TestWorkflows.write(work, List.of("a:table-source:{\"path\": \"x.csv\", \"text-columns\": [\"word\"]}", "q:table-query", "s:snapshot-builder:{\"time-column\": \"time\"}"),
                List.of("a.table>q.input", "q.table>s.table"));
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desk"), Optional.of(work))) {
            assertEquals("waiting", TestBench.kind(sql(bench, "SELECT time, x, CAST(word AS DOUBLE) AS y FROM input"), "q"), "nothing is wrong with it by itself");
            bench.post("/api/run", "{\"steps\": [\"q\"]}");
            JsonNode ran = bench.awaitRest();
            assertEquals(List.of("done", "failed", "waiting"), List.of(TestBench.kind(ran, "a"), TestBench.kind(ran, "q"), TestBench.kind(ran, "s")),
                    ran.toString());
            String sentence = TestBench.step(ran, "q").path("state").path("sentence").asText();
            assertTrue(sentence.startsWith("step q, setting sql: ") && sentence.contains("three"), sentence);
            assertEquals("1 step failed, 1 done.", ran.path("run").path("last").asText());
        }
    }

    private static JsonNode sql(TestBench bench, String sql) throws IOException, InterruptedException {
        return bench.post("/api/edit", "{\"edits\": [{\"do\": \"set\", \"step\": \"q\", \"typed\": {\"sql\": " + JsonNodeFactory.instance.textNode(sql) + "}}]}").json();
    }
}
