package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What stands on the bench tells what it is: the shelf by stages, ports by their type's name, states in words and shape, on a small screen and on a large one. */
@NeedsBrowser
class BenchTrialTest {

    private static final String STAGES = "[Data, Prepare, Fit, Judge, Forecast, Report]";

    @TempDir
    Path folder;

    @Test
    void shelfPortsAndStatesTellWhatTheyAre() throws IOException {
        try (Trial trial = Trial.start(folder, Optional.of(SmallStation.write(folder)))) {
            Browser browser = trial.browser();
            browser.see("[data-card=spectrum]");
            assertEquals(STAGES, texts(browser, ".shelf-stage"), "the shelf is grouped by stage");
            assertEquals(STAGES, texts(browser, "[data-band] .band-title"), "the bench is laid along the stages of the work");
            assertEquals(browser.all(".shelf-item").size(), trial.json("/api/nodes").path("nodes").size(), "every node is on the shelf");
            for (JsonNode step : trial.desk().path("steps")) {
                browser.reads("[data-step=" + step.path("id").asText() + "] .card-state", step.path("state").path("words").asText());
            }
            browser.reads(Trial.output("fit.operator"), "Operator");
            browser.reads(Trial.input("fit.snapshots"), "Snapshots");
            TreeSet<String> before = shapes(browser);
            browser.click("[data-action=run-all]");
            trial.state("spectrum", "done", "doubts");
            trial.rest();
            TreeSet<String> after = shapes(browser);
            after.retainAll(before);
            assertEquals(new TreeSet<>(), after, "a step that is done has another shape than one that waits or is ready");
            theMatrixOfTheOperatorIsAHeatMap(trial);
            onALargeScreen(browser);
        }
    }

    private static String texts(Browser browser, String css) {
        return browser.all(css).stream().map(one -> one.getText().strip()).toList().toString();
    }

    /** Outlines of the marks beside the words of the states. */
    private static TreeSet<String> shapes(Browser browser) {
        List<String> outlines = new ArrayList<>();
        ((List<?>) browser.js("return [...document.querySelectorAll('[data-step] .card-state path')].map((path) => path.getAttribute('d'))"))
                .forEach(outline -> outlines.add(String.valueOf(outline)));
        return new TreeSet<>(outlines);
    }

    /** Drawn when it is first looked at. */
    private static void theMatrixOfTheOperatorIsAHeatMap(Trial trial) {
        trial.choose("fit");
        String map = "[data-look=fit] [data-output=operator] figure.lk-matrix";
        trial.browser().see(map);
        trial.browser().js("document.querySelector(arguments[0]).scrollIntoView({block: 'center'})", map);
        trial.browser().see(map + " canvas");
        trial.browser().see(map + " .lk-scale");
    }

    /** On a screen of 3840 x 2160 nothing is cut and letters are as large as those of a document. */
    private static void onALargeScreen(Browser browser) {
        browser.size(3840, 2160);
        browser.await("room for all", () -> Boolean.TRUE.equals(browser.js("return document.documentElement.scrollWidth <= innerWidth"
                + " && [...document.querySelectorAll('.card-title')].every((one) => one.scrollWidth <= one.clientWidth + 1)")));
        double letters = ((Number) browser.js("return parseFloat(getComputedStyle(document.querySelector('.card-title')).fontSize)")).doubleValue();
        assertTrue(letters >= 16, letters + " px");
        browser.picture("large-screen");
    }
}
