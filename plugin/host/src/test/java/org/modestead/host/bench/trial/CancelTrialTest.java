package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A run that is stopped stops at once, says so in words, keeps what was done, and the bench works on. */
@NeedsBrowser
class CancelTrialTest {

    /** Told is about a second; this is what a machine with ten times too much to do may take. */
    private static final double LONGEST_SECONDS = 20;

    @TempDir
    Path folder;

    @Test
    void aRunIsStoppedInTheMiddle() {
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            Browser browser = trial.browser();
            browser.click("[data-example=pump-house]");
            browser.click("[data-action=run-all]");
            trial.state("kernel", "running");
            trial.state("snapshots", "done", "doubts");
            browser.reads("[data-step=kernel] .card-state", "running");
            browser.picture("mid-run");
            long pressed = System.nanoTime();
            browser.click("[data-action=cancel]");
            trial.rest();
            double seconds = (System.nanoTime() - pressed) / 1e9;
            System.out.printf(Locale.ROOT, "trials: a run stood still %.1f s after Stop was pressed%n", seconds);
            assertTrue(seconds < LONGEST_SECONDS, seconds + " s");
            assertFalse(browser.has("[data-state=running]"));
            assertTrue(browser.text("[data-run=idle]").toLowerCase(Locale.ROOT).contains("stopped"), browser.text("[data-run=idle]"));
            trial.state("kernel", "stopped", "ready");
            trial.state("snapshots", "done", "doubts");
            browser.picture("stopped");
            trial.choose("fit");
            browser.click("[data-action=run-step]");
            trial.state("fit", "done", "doubts");
        }
    }
}
