package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Somebody who sees the bench for the first time comes to a verdict, on a recording of their own and on the example. */
@NeedsBrowser
class OwnFileTrialTest {

    private static final int MOST_INTERACTIONS = 10;

    @TempDir
    Path folder;

    private int interactions;

    @Test
    void anOwnRecordingComesToAVerdictWithinTenInteractions() throws IOException {
        Path recording = TankRecording.write(folder.resolve("tank.csv"));
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            Browser browser = trial.browser();
            browser.see("[data-action=choose-recording]");
            browser.dropFile(recording, "[data-part=start]");
            interactions++;
            browser.reads("[data-recording]", "tank.csv");
            browser.see("[data-column=\"time [s]\"]");
            assertTrue(browser.has("[data-role=\"time [s]\"] option[value=time]:checked"), "the time is guessed");
            assertTrue(browser.has("[data-role=\"run\"] option[value=run]:checked"), "the run is guessed");
            assertTrue(browser.has("[data-role=\"level [m]\"] option[value=channel]:checked"), "a channel is guessed");
            browser.see(".preview svg");
            browser.picture("recording");
            press(trial, "[data-action=lay-out-run]");
            browser.see("[data-look] [data-verdict]");
            trial.verdictTells(0.25, "Hz");
            browser.picture("own-file-verdict");
            System.out.println("trials: an own recording came to its verdict with " + interactions + " interactions");
            assertTrue(interactions <= MOST_INTERACTIONS, interactions + " interactions");
        }
    }

    /** The pump-house recordings as somebody's own file: the verdict names the modes that they were made with (data/truth.csv), and no other. */
    @Test
    void thePumpHouseAsAnOwnFileComesToATruthfulVerdict() {
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            Browser browser = trial.browser();
            browser.see("[data-action=choose-recording]");
            interactions += 2; // the button, and the choice in the system's own dialog, which no test can press
            browser.type("#recording-file", Path.of("..", "..", "test-workflows", "pump-house", "data", "recordings.csv").toAbsolutePath().normalize().toString());
            press(trial, "[data-action=lay-out-run]");
            List.of("snapshots", "fit", "spectrum", "check").forEach(step -> trial.state(step, "done", "doubts"));
            browser.see("[data-look] [data-verdict=stands]");
            trial.verdictTells(0.62, "cycles/time unit");
            trial.verdictTells(2.9, "cycles/time unit");
            List<String> counted = new ArrayList<>();
            for (JsonNode mode : trial.json("/api/steps/check/look").path("verdict").path("modes")) {
                if (mode.path("counts").asBoolean()) {
                    counted.add(mode.path("grade").asText() + ": " + mode.path("figures").asText());
                } else {
                    assertTrue(List.of("undecided", "stands", "settles").contains(mode.path("grade").asText()), "weak but there, not absent: " + mode);
                }
            }
            assertEquals(3, counted.size(), counted.toString());
            assertTrue(counted.stream().allMatch(mode -> mode.startsWith("stands")), counted.toString());
            assertTrue(counted.stream().anyMatch(mode -> mode.contains("halves every 25.")), "the draining halves in 25 s, the file names no unit: " + counted);
            browser.picture("own-pump-house-verdict");
        }
    }

    /** From the command, as typed, to the verdict; the figures are printed and bound nothing. */
    @Test
    void theExampleComesToAVerdictWithTwoPresses() throws IOException, InterruptedException {
        long begin = System.nanoTime();
        try (BenchProcess process = BenchProcess.start(folder, "--desk", folder.resolve("desk").toString());
                Trial trial = Trial.at(Optional.empty(), process.url(), folder)) {
            trial.browser().see("[data-example=pump-house]");
            trial.browser().await("the first paint", () -> trial.browser().firstPaint() > 0);
            double paint = trial.browser().firstPaint();
            press(trial, "[data-example=pump-house]");
            press(trial, "[data-action=run-all]");
            trial.browser().see("[data-look] [data-verdict]");
            trial.verdictTells(0.62, "Hz");
            System.out.printf(Locale.ROOT, "trials: first paint %.0f ms after the page was asked for%n"
                    + "trials: verdict on the example %.0f s after the command, start of Java and browser included, with %d interactions%n", paint,
                    (System.nanoTime() - begin) / 1e9, interactions);
            assertEquals(2, interactions);
            trial.browser().picture("example-verdict");
        }
    }

    private void press(Trial trial, String css) {
        interactions++;
        trial.browser().click(css);
    }
}
