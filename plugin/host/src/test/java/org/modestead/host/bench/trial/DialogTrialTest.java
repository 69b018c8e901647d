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
import org.openqa.selenium.Keys;

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

    /** Of the example, whose columns are known before anything ran. */
    @Test
    void unitsRangesHelpDependentFieldsAndFaultsAreTold() {
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            Browser browser = trial.browser();
            browser.click("[data-example=pump-house]");
            trial.settings("snapshots");
            browser.reads("[data-setting=step]", "Time step", "Allowed: above 0 s", "Step of the even times");
            browser.reads("[data-setting=step] .setting-unit", "s");
            everyColumnBearsItsUnit(browser);
            browser.click("[data-setting=resampling] [data-option=keep]");
            browser.gone("[data-setting=step]");
            browser.type("[data-field=delay-depth]", Keys.chord(Keys.CONTROL, "a"), "0");
            browser.reads("[data-setting=delay-depth] .setting-error", "0", "at least 1");
            browser.reads("dialog .dialog-foot [role=status]", "1 thing to set right");
            browser.click("[data-reset=delay-depth]");
            browser.gone(".setting-error");
        }
    }

    /** A name gives way where there is little room, its unit does not; the name is whole in its tip. */
    private static void everyColumnBearsItsUnit(Browser browser) {
        browser.see("[data-setting=channels] [data-unit=bar]");
        assertEquals("[bar, bar, m3/h, m, A, mm/s, mm/s, degC]", String.valueOf(browser.js("""
                return [...document.querySelectorAll('[data-setting=channels] [data-unit]')].filter((one) => one.dataset.unit
                    && one.textContent === one.dataset.unit && one.scrollWidth <= one.clientWidth + 1 && one.previousElementSibling.title.endsWith(`[${one.dataset.unit}]`))
                    .map((one) => one.dataset.unit);
                """)));
    }
}
