package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.Keys;

/** Everything by keys alone: a step added, another linked to it, set up in its dialog, run; the focus comes back where it was. */
@NeedsBrowser
class KeyboardTrialTest {

    @TempDir
    Path folder;

    @Test
    void stepsAreAddedLinkedSetUpAndRunWithoutAMouse() {
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            Browser browser = trial.browser();
            browser.see("[data-action=new-empty]");
            browser.tabTo("[data-action=new-empty]");
            browser.keys(Keys.ENTER);
            browser.see("[data-part=shelf]");
            browser.tabTo("#shelf-query");
            browser.keys("invented recordings");
            browser.await("one node found", () -> browser.all(".shelf-item").size() == 1);
            browser.keys(Keys.ARROW_DOWN, Keys.ENTER);
            browser.see("[data-step=signal-generator]");
            browser.await("the bench by F6", () -> {
                browser.keys(Keys.F6);
                return browser.focused("[data-part=bench] *");
            });
            browser.tabTo("[data-card=signal-generator]");
            setUp(trial);
            link(trial);
            browser.keys(Keys.ENTER);
            browser.see("dialog[data-dialog=settings] [data-setting]");
            browser.tabTo("[data-field=time-column]");
            browser.keys("time");
            browser.reads("dialog .dialog-foot [role=status]", "All settings can be used");
            browser.keys(Keys.ESCAPE);
            browser.see("[data-action=stay]");
            browser.tabTo("[data-action=apply], [data-action=stay]");
            browser.keys(Keys.ENTER);
            browser.tabTo("[data-action=apply]");
            browser.keys(Keys.ENTER);
            browser.gone("dialog");
            browser.await("the focus back on the step", () -> browser.focused("[data-card=snapshot-builder]"));
            browser.chord(Keys.ENTER, Keys.CONTROL);
            trial.state("snapshot-builder", "done", "doubts");
            browser.reads("[data-look=snapshot-builder]", "Snapshots");
            browser.await("the focus still there", () -> browser.focused("[data-card=snapshot-builder]"));
            write(trial);
            copy(trial);
        }
    }

    private static boolean down(Browser browser) {
        browser.keys(Keys.ARROW_DOWN);
        return false;
    }

    /** A recording of their own by keys: only the choice in the system's own dialog cannot be pressed here. */
    @Test
    void anOwnRecordingComesToAVerdictWithoutAMouse() throws IOException {
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            Browser browser = trial.browser();
            browser.see("[data-action=choose-recording]");
            browser.tabTo("[data-action=choose-recording]");
            browser.type("#recording-file", TankRecording.write(folder.resolve("tank.csv")).toString());
            browser.reads("[data-recording]", "tank.csv");
            browser.tabTo("[data-action=lay-out-run]");
            browser.keys(Keys.ENTER);
            browser.see("[data-look] [data-verdict]");
            trial.verdictTells(0.25, "Hz");
            browser.await("the bench by F6", () -> {
                browser.keys(Keys.F6);
                return browser.focused("[data-card=check]");
            });
            browser.await("the look by F6, still of the step with the verdict", () -> {
                browser.keys(Keys.F6);
                return browser.focused("[data-part=look] .look-title");
            });
            theReasonOfAVerdictIsRead(trial);
        }
    }

    /** The Tab key comes to the button that explains a verdict and goes on from there, also after the step found something else meanwhile. */
    private static void theReasonOfAVerdictIsRead(Trial trial) {
        Browser browser = trial.browser();
        trial.rest();
        browser.tabTo("[data-look=check] [data-action=why]");
        browser.keys(Keys.ENTER);
        browser.see("[data-action=why][aria-expanded=true]");
        browser.see("[data-look=check] .lk-findings [data-check]");
        browser.await("the focus still on the button", () -> browser.focused("[data-action=why]"));
        String result = result(trial, "check");
        browser.later("""
                const done = arguments[0];
                Promise.all([import('/js/actions.js'), import('/js/store.js')]).then(async ([{edit, run}, {getState}]) => {
                  const {settings} = getState().desk.steps.find((step) => step.id === 'check');
                  await edit([{do: 'set', step: 'check', settings: {...settings, 'share-threshold': 0.06}}]);
                  await run(['check']);
                  done('');
                });
                """);
        browser.await("another result", () -> !result(trial, "check").equals(result));
        trial.rest();
        browser.see("[data-look=check] [data-verdict]");
        assertTrue(browser.focused("[data-look=check] *, .look-title"), "the focus stays in the look when another result is drawn");
        browser.tabTo("[data-look=check] [data-action=why]");
    }

    private static String result(Trial trial, String step) {
        for (JsonNode one : trial.desk().path("steps")) {
            if (one.path("id").asText().equals(step)) {
                return one.path("resultId").asText();
            }
        }
        throw new AssertionError("no step " + step);
    }

    /** Gives the step a name and a note of the person's own. */
    private static void write(Trial trial) {
        Browser browser = trial.browser();
        browser.keys(Keys.F2);
        browser.see("dialog[data-dialog=rename]");
        browser.await("the focus in the field", () -> browser.focused("#rename-field"));
        browser.chord("a", Keys.CONTROL);
        browser.keys("States of the first trip", Keys.ENTER);
        browser.gone("dialog");
        browser.reads("[data-step=snapshot-builder] .card-title", "States of the first trip");
        browser.reads("[data-step=snapshot-builder] .card-kind", "Snapshot Builder");
        browser.tabTo("[data-action=step-menu]");
        browser.keys(Keys.ENTER);
        browser.see("[role=menu] [data-action=note-step]");
        browser.await("the entry in the menu", () -> browser.focused("[role=menu] [data-action=note-step]") || down(browser));
        browser.keys(Keys.ENTER);
        browser.await("the focus in the field", () -> browser.focused("#note-field"));
        browser.keys("Gauge 2 was stuck.");
        browser.tabTo("dialog [data-action=apply]");
        browser.keys(Keys.ENTER);
        browser.gone("dialog");
        browser.reads("[data-step=snapshot-builder] .card-note", "Gauge 2 was stuck.");
        browser.reads("[data-look=snapshot-builder]", "Snapshots");
    }

    /** Copies the step with all that is written on it, and takes that back. */
    private static void copy(Trial trial) {
        Browser browser = trial.browser();
        browser.await("the bench by F6", () -> {
            browser.keys(Keys.F6);
            return browser.focused("[data-part=bench] *");
        });
        browser.click("[data-card=snapshot-builder]");
        browser.chord("c", Keys.CONTROL);
        browser.chord("v", Keys.CONTROL);
        browser.see("[data-step=snapshot-builder-2]");
        browser.reads("[data-step=snapshot-builder-2] .card-title", "States of the first trip");
        browser.reads("[data-step=snapshot-builder-2] .card-note", "Gauge 2 was stuck.");
        browser.await("the copy is chosen", () -> browser.has("[data-card=snapshot-builder-2][aria-current=true]"));
        browser.chord("z", Keys.CONTROL);
        browser.gone("[data-step=snapshot-builder-2]");
        browser.reads("[data-step=snapshot-builder] .card-note", "Gauge 2 was stuck.");
    }

    /** Opens a dialog, makes a choice, changes a number, keeps both. */
    private static void setUp(Trial trial) {
        Browser browser = trial.browser();
        browser.keys(Keys.ENTER);
        browser.see("dialog[data-dialog=settings] [data-field=runs]");
        browser.tabTo("[data-field=scenario] *");
        browser.keys(Keys.ARROW_DOWN);
        browser.see("[data-field=flow]");
        browser.tabTo("[data-field=runs]");
        browser.keys("1", Keys.ENTER);
        browser.gone("dialog");
        browser.await("the focus back on the step", () -> browser.focused("[data-card=signal-generator]"));
    }

    /** Links a new step by the list of what fits. */
    private static void link(Trial trial) {
        Browser browser = trial.browser();
        browser.tabTo(Trial.output("signal-generator.table"));
        browser.keys(Keys.ENTER);
        browser.see("dialog[data-dialog=picker] .picker-list[aria-busy=false]");
        browser.keys(Keys.ESCAPE);
        browser.gone("dialog");
        browser.await("the focus back on the port", () -> browser.focused(Trial.output("signal-generator.table")));
        browser.keys(Keys.ENTER);
        browser.see("dialog[data-dialog=picker] [data-pick=snapshot-builder]");
        browser.keys("snapshot builder", Keys.ENTER);
        trial.linked("signal-generator.table", "snapshot-builder.table");
        browser.await("the focus on the new step", () -> browser.focused("[data-card=snapshot-builder]"));
    }
}
