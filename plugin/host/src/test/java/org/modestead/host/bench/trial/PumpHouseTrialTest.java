package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.Keys;

/**
 * The pump-house workflow from an empty bench by drag and drop, set up in the dialogs, run, looked at, changed, undone, saved; then the
 * process is killed and everything is found again in another one.
 */
@NeedsBrowser
class PumpHouseTrialTest {

    @TempDir
    Path folder;

    /** The branch with a kernel, from recording to report: every stage has a step. */
    @Test
    void aBranchBuiltByHandRunsIsChangedAndIsFoundAgainAfterACrash() throws Exception {
        trial(PumpHouse.BRANCH);
    }

    /** All fifteen steps. */
    @Test
    @EnabledIfSystemProperty(named = "trials", matches = "whole", disabledReason = "takes minutes: -Dtrials=whole")
    void theWholeBuiltByHandIsTheExampleAndIsFoundAgainAfterACrash() throws Exception {
        PumpHouse.WHOLE.assertIsTheExample(trial(PumpHouse.WHOLE));
    }

    /** Returns the saved file. */
    private Path trial(PumpHouse plan) throws IOException, InterruptedException {
        Path data = Files.createDirectory(folder.resolve("station")).resolve("recordings.csv");
        Files.write(data, plan.recording());
        String[] arguments = {"--desk", folder.resolve("desk").toString(), "--folder", data.getParent().toString()};
        Map<String, String> results;
        String kernel;
        try (BenchProcess process = BenchProcess.start(folder, arguments); Trial trial = Trial.at(Optional.empty(), process.url(), folder)) {
            Browser browser = trial.browser();
            browser.size(1400, 1400);
            trial.empty();
            plan.build(trial);
            browser.picture("built");
            plan.configure(trial, data);
            browser.click("[data-action=run-all]");
            browser.see("[data-run=running]");
            browser.picture("running");
            plan.names().forEach(step -> trial.state(step.getKey(), "done", "doubts"));
            trial.rest();
            theVerdictIsTold(trial, plan);
            changeTheKernel(trial, plan);
            undoAndRedo(trial);
            saveAs(trial, "workflow.json");
            browser.picture("saved");
            results = results(trial.desk());
            kernel = kernel(trial);
            process.kill();
            browser.reads(".strip", "does not answer");
        }
        try (BenchProcess process = BenchProcess.start(folder, arguments); Trial trial = Trial.at(Optional.empty(), process.url(), folder)) {
            trial.browser().click("[data-resume]");
            plan.names().forEach(step -> trial.state(step.getKey(), "done", "doubts"));
            assertEquals(results, results(trial.desk()), "the results are those from before the crash");
            assertEquals(kernel, kernel(trial));
            theVerdictIsTold(trial, plan);
            trial.browser().picture("found-again");
        }
        return data.resolveSibling("workflow.json");
    }

    /** In plain words, with the frequency of the surge that the recording was made with. */
    private static void theVerdictIsTold(Trial trial, PumpHouse plan) {
        trial.choose(plan.verdict());
        trial.browser().see("[data-look=\"" + plan.verdict() + "\"] [data-verdict]");
        trial.verdictTells(0.62, "Hz");
        plan.modes().forEach(mode -> trial.browser().see("[data-verdict] [data-row-mode=\"" + mode + "\"][data-grade=stands],"
                + "[data-verdict] [data-row-mode=\"" + mode + "\"][data-grade=settles]"));
        trial.browser().picture("verdict");
    }

    /** Only what hangs on the kernel runs again. */
    private static void changeTheKernel(Trial trial, PumpHouse plan) throws IOException {
        Map<String, String> before = results(trial.desk());
        trial.settings("kernel-chooser");
        new Form(trial.browser()).fill(new ObjectMapper().readTree("{\"choose\": \"family\", \"family\": \"gaussian\", \"scale-factor\": 5}"));
        trial.keep();
        plan.behindKernel().forEach(step -> trial.state(step, "stale", "ready", "waiting"));
        trial.browser().picture("out-of-date");
        trial.browser().click("[data-action=run-all]");
        plan.behindKernel().forEach(step -> trial.state(step, "done", "doubts"));
        trial.rest();
        Map<String, String> after = results(trial.desk());
        Set<String> changed = new TreeSet<>(after.keySet());
        changed.removeIf(step -> after.get(step).equals(before.get(step)));
        assertEquals(new TreeSet<>(plan.behindKernel()), changed, "what hangs on the kernel ran again, nothing else did");
    }

    private static void undoAndRedo(Trial trial) {
        String changed = kernel(trial);
        trial.browser().click("[data-part=bar] [data-action=undo]");
        trial.browser().await("the old kernel", () -> !kernel(trial).equals(changed));
        trial.browser().click("[data-part=bar] [data-action=redo]");
        trial.browser().await("the new kernel", () -> kernel(trial).equals(changed));
        trial.browser().chord("z", Keys.CONTROL);
        trial.browser().await("the old kernel", () -> !kernel(trial).equals(changed));
    }

    /** Its settings in words; 20.0 and 20 are one number. */
    private static String kernel(Trial trial) {
        for (JsonNode step : trial.desk().path("steps")) {
            if (step.path("id").asText().equals("kernel-chooser")) {
                return step.path("settings").toString().replaceAll("(\\d)\\.0\\b", "$1");
            }
        }
        throw new AssertionError("no kernel");
    }

    private static void saveAs(Trial trial, String name) {
        trial.browser().click("[data-action=workflow-menu]");
        trial.browser().click("[role=menu] [data-action=save-as]");
        trial.browser().see("dialog[data-dialog=save-as] .file-list");
        trial.browser().await("the opened folders", () -> {
            // at the top there is no way up: a press that waits for one would never come back
            trial.browser().pressIfThere("dialog [data-action=folder-up]");
            return trial.browser().has("dialog [data-file$=\"/station\"]");
        });
        trial.browser().click("dialog [data-file$=\"/station\"]");
        trial.browser().reads("dialog code", "station/" + name);
        trial.browser().click("dialog [data-action=apply]");
        trial.browser().gone("dialog");
        trial.browser().see("[data-saved=true]");
    }

    private static Map<String, String> results(JsonNode desk) {
        Map<String, String> results = new TreeMap<>();
        desk.path("steps").forEach(step -> results.put(step.path("id").asText(), step.path("resultId").asText()));
        return results;
    }
}
