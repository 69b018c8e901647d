package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** The settings that a step ran with are told with units as people say them. */
class SettingsLookTest {

    @TempDir
    private Path folder;

    @Test
    void timesAreInTheUnitOfTheRecordingAndOneThingIsInTheSingular() throws IOException, InterruptedException {
        Path workflow = TestWorkflows.write(folder, List.of("flow:signal-generator:{\"scenario\": \"flows\", \"runs\": 3}",
                "snapshots:snapshot-builder:{\"time-column\": \"time\", \"time-unit\": \"min\", \"run-column\": \"run\", \"resampling\": \"uniform\", \"step\": 0.02, "
                        + "\"delay-spacing\": 2}"), List.of("flow.table>snapshots.table"));
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desk"), Optional.of(workflow))) {
            bench.post("/api/run", "{}");
            bench.awaitRest();
            Map<String, String> told = told(bench.get("/api/steps/snapshots/look").json());
            assertEquals("0.02 min", told.get("step"));
            assertEquals("1 min", told.get("row-step"), "the unit of the recording has no plural");
            assertEquals("1 sample", told.get("delay-depth"));
            assertEquals("2 samples", told.get("delay-spacing"));
            assertEquals(" ", told(bench.get("/api/steps/flow/look").json()).get("duration"), "what is not set has no unit");
        }
    }

    private static Map<String, String> told(JsonNode look) {
        Map<String, String> told = new TreeMap<>();
        look.path("settings").forEach(setting -> told.put(setting.path("key").asText(), setting.path("value").asText() + " " + setting.path("unit").asText()));
        return told;
    }
}
