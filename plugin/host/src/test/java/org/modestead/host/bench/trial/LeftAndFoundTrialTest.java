package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;
import org.openqa.selenium.Keys;

/** What is dropped on the bench, duplicated and written about the whole is there again when the work is gone on with, and the start page tells which file it is. */
@NeedsBrowser
class LeftAndFoundTrialTest {

    private static final String DEEP = "a-station-with-a-rather-long-name/recordings-of-the-whole-year/second-half-without-the-holidays/surge";

    @TempDir
    Path folder;

    @Test
    void aDroppedTableADuplicateAndNotesAreFoundAgainUnderTheEndOfALongPath() throws IOException {
        Path deep = Files.createDirectories(folder.resolve(DEEP));
        Path table = Files.writeString(folder.resolve("gauges.csv"), "time,level\n0,1.5\n1,1.4\n2,1.6\n");
        Path workflow = TestWorkflows.write(deep, List.of("station:signal-generator"), List.of());
        try (Trial trial = Trial.start(folder, Optional.of(workflow))) {
            Browser browser = trial.browser();
            drop(trial, table);
            duplicate(trial);
            write(trial);
            browser.click("[data-action=workflow-menu]");
            browser.click("[role=menu] [data-action=close-desk]");
            browser.see("[data-resume]");
            theEndOfThePathIsSeen(browser);
            browser.click("[data-resume]");
            browser.see("[data-step=table-source-2]");
            browser.reads("[data-step=table-source] .card-title", "gauges.csv");
            browser.await("the notes", () -> "Ask for the night runs.\nGauge 2 was stuck.".equals(browser.see("#workflow-notes").getAttribute("value")));
        }
    }

    /** A table from the system's own file manager, onto an open bench: it becomes a step that reads it. */
    private static void drop(Trial trial, Path table) {
        Browser browser = trial.browser();
        browser.see("[data-card=station]");
        browser.dropFile(table, "[data-part=bench]");
        browser.reads("dialog[data-dialog=dropped]", "gauges.csv", "What is it for?");
        browser.click("dialog [data-action=drop-add]");
        browser.gone("dialog");
        browser.reads("[data-step=table-source] .card-title", "gauges.csv");
        browser.click("[data-card=table-source]");
        browser.click("[data-action=run-step]");
        trial.state("table-source", "done");
        browser.reads("[data-look=table-source]", "level", "1.6");
    }

    /** The copy has the settings of the first, and one undo takes it back. */
    private static void duplicate(Trial trial) {
        Browser browser = trial.browser();
        trial.choose("table-source");
        browser.chord("d", Keys.CONTROL);
        browser.see("[data-step=table-source-2]");
        browser.chord("z", Keys.CONTROL);
        browser.gone("[data-step=table-source-2]");
        browser.chord("y", Keys.CONTROL);
        browser.see("[data-step=table-source-2]");
        JsonNode steps = trial.desk().path("steps");
        assertEquals(3, steps.size());
        assertEquals(steps.path(1).path("settings"), steps.path(2).path("settings"));
    }

    private static void write(Trial trial) {
        Browser browser = trial.browser();
        browser.click("[data-action=workflow-menu]");
        browser.click("[role=menu] [data-action=notes]");
        browser.await("the focus in the field", () -> browser.focused("#notes-field"));
        browser.keys("Ask for the night runs.", Keys.ENTER, "Gauge 2 was stuck.");
        browser.click("dialog [data-action=apply]");
        browser.gone("dialog");
        browser.await("the notes kept", () -> trial.desk().path("notes").asText().endsWith("stuck."));
    }

    /** In a narrow window too: the beginning gives way, the folder and the name of the file stay whole. */
    private static void theEndOfThePathIsSeen(Browser browser) {
        browser.size(640, 800);
        browser.await("the end of the path, its beginning cut", () -> Boolean.TRUE.equals(browser.js("""
                const cut = (part) => part.scrollWidth > part.clientWidth;
                const row = document.querySelector('[data-resume]');
                const end = row.querySelector('.path-end');
                return end.textContent.endsWith('/surge/workflow.json') && !cut(end) && cut(row.querySelector('.path-start'))
                    && end.getBoundingClientRect().right <= row.getBoundingClientRect().right + 1;
                """)));
        browser.size(1280, 800);
    }
}
