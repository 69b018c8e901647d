package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** Whatever stands in a workflow or in a table is shown as words; nothing of it is run. */
@NeedsBrowser
class HostileWordsTrialTest {

    private static final String WORDS = "<img src=x onerror='window.ran=1'><script>window.ran=1</script>${window.ran=1}";

    @TempDir
    Path folder;

    @Test
    void namesNotesAndColumnsAreWordsAndNothingOfThemIsRun() throws IOException {
        Files.writeString(folder.resolve("gauges.csv"), "time,\"" + WORDS + "\"\n0,1.5\n1,1.4\n2,1.6\n");
        String text = TestWorkflows.text(List.of("gauges:table-source:{\"path\": \"gauges.csv\"}"), List.of())
                .replace("\"name\": \"test\"", "\"name\": \"" + WORDS + "\", \"notes\": \"" + WORDS + "\"")
                .replace("\"id\": \"gauges\"", "\"id\": \"gauges\", \"title\": \"" + WORDS + "\", \"note\": \"" + WORDS + "\"");
        try (Trial trial = Trial.start(folder, Optional.of(Files.writeString(folder.resolve("workflow.json"), text)))) {
            Browser browser = trial.browser();
            browser.reads(".bar-title", WORDS);
            browser.reads("[data-step=gauges] .card-title", WORDS);
            browser.reads("[data-step=gauges] .card-note", WORDS);
            trial.choose("gauges");
            browser.click("[data-action=run-step]");
            trial.state("gauges", "done", "doubts");
            browser.reads("[data-look=gauges] [data-table] thead", WORDS);
            trial.settings("gauges");
            nothingRan(browser);
            browser.open(browser.address().replaceFirst("(://[^/]+).*", "$1/api/report.html"));
            browser.reads("body", WORDS);
            nothingRan(browser);
        }
    }

    private static void nothingRan(Browser browser) {
        assertEquals("undefined", browser.js("return typeof window.ran"));
        assertFalse(browser.has("img[src=x]"), "no words became markup");
    }
}
