package org.modestead.host.run;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.ObjectWriter;
import com.fasterxml.jackson.databind.SerializationFeature;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.modestead.engine.Doubt;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.host.workflow.PlannedStep;

/**
 * The record of a run, {@code run.json}: what was run with which settings and versions, how it ended, how long it took,
 * what a reader must know, and which files belong to it.
 */
final class RunRecord {

    static final String NAME = "run.json";

    private static final String FORMAT = "modestead-run/1";
    private static final double MILLIS = 1000;

    private RunRecord() {}

    /** Returns the files that an earlier run left in a folder, as its record lists them; empty when there is none. */
    static List<String> filesOf(Path folder) {
        Path record = folder.resolve(NAME);
        List<String> files = new ArrayList<>();
        try {
            JsonNode root = Files.isRegularFile(record) ? new ObjectMapper().readTree(record.toFile()) : null;
            if (root != null && root.path("format").asText().equals(FORMAT)) {
                root.path("files").forEach(file -> files.add(file.asText()));
            }
        } catch (IOException foreign) {
            // A file of that name that is not ours lists nothing of ours.
            files.clear();
        }
        return files;
    }

    /**
     * Writes the record as JSON.
     *
     * @param result how the run ended
     * @param started when
     * @param files that belong to it, without the record itself
     */
    static byte[] write(RunResult result, Instant started, List<String> files) throws JsonProcessingException {
        Map<String, Object> root = new LinkedHashMap<>();
        root.put("format", FORMAT);
        root.put("workflow", result.plan().workflow().name());
        root.put("file", result.plan().workflow().fileName());
        root.put("state", result.state().word());
        root.put("versions", Versions.all());
        root.put("linear_algebra", Versions.linearAlgebra());
        root.put("warnings", LinearAlgebra.installed().doubts().stream().map(RunRecord::warning).toList());
        root.put("started", time(started));
        root.put("seconds", seconds(result.time()));
        root.put("steps", result.plan().steps().stream().map(step -> step(step, result.outcomes().get(step.id()))).toList());
        root.put("files", files);
        ObjectWriter writer = new ObjectMapper().enable(SerializationFeature.INDENT_OUTPUT).writer();
        return writer.writeValueAsBytes(root);
    }

    /** Returns a time as the record writes it. */
    static String time(Instant time) {
        return time.truncatedTo(ChronoUnit.MILLIS).toString();
    }

    private static Map<String, Object> step(PlannedStep step, StepOutcome outcome) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("id", step.id());
        entry.put("node", step.declaration().id());
        entry.put("settings_version", step.declaration().settingsVersion());
        entry.put("settings", new TreeMap<>(step.settings().values()));
        entry.put("state", outcome.word());
        if (outcome instanceof StepOutcome.Done done) {
            entry.put("seconds", seconds(done.time()));
            entry.put("cached", done.cached());
            entry.put("summary", done.result().summary());
            entry.put("warnings", done.result().doubts().stream().map(RunRecord::warning).toList());
        } else if (outcome instanceof StepOutcome.Failed failed) {
            entry.put("seconds", seconds(failed.time()));
            entry.put("message", failed.sentence());
        } else if (outcome instanceof StepOutcome.Skipped skipped) {
            entry.put("message", "skipped because step " + skipped.because() + " gave no result");
        }
        return entry;
    }

    private static Map<String, String> warning(Doubt doubt) {
        Map<String, String> entry = new LinkedHashMap<>();
        entry.put("code", doubt.code());
        entry.put("sentence", doubt.sentence());
        return entry;
    }

    private static double seconds(Duration time) {
        return time.toMillis() / MILLIS;
    }
}
