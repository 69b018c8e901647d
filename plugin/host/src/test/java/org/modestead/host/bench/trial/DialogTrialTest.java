package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** What is typed into a dialog, lists of several lines and numbers that begin with a default too, is what is kept. */
@NeedsBrowser
class DialogTrialTest {

    @TempDir
    Path folder;

    @Test
    void listsAndNumbersAreKeptAsTyped() throws IOException {
        JsonNode wanted = new ObjectMapper().readTree("""
                {"choose": "rank", "candidates": ["linear", "gaussian"], "scale-multiples": [4, 16], "rank": 200}""");
        try (Trial trial = Trial.start(folder, Optional.of(TestWorkflows.write(folder, List.of("kernel:kernel-chooser"), List.of())))) {
            trial.settings("kernel");
            new Form(trial.browser()).fill(wanted);
            trial.browser().reads("dialog .dialog-foot [role=status]", "All settings can be used");
            trial.keep();
            JsonNode kept = trial.desk().path("steps").get(0).path("settings");
            wanted.properties().forEach(one -> assertEquals(one.getValue().toString(), kept.path(one.getKey()).toString().replace(".0", ""), one.getKey()));
        }
    }
}
