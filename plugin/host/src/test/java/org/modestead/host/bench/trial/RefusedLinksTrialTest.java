package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;
import org.openqa.selenium.Keys;

/** Every pair of types that does not fit is refused with its reason, with the mouse and without, and no link is made. */
@NeedsBrowser
class RefusedLinksTrialTest {

    private static final Map<String, String> OUTPUTS = ordered("Table", "source.table", "Snapshots", "snapshots.snapshots", "Kernel", "kernel.kernel",
            "Operator", "fit.operator", "Spectrum", "spectrum.spectrum", "Verdict", "check.verdict", "Model", "reader.model");
    private static final Map<String, String> INPUTS = ordered("Table", "snapshots-2.table", "Snapshots", "kernel-2.snapshots", "Kernel", "fit-2.kernel",
            "Operator", "spectrum-2.operator", "Spectrum", "check-2.spectrum", "Verdict", "forecast.verdict", "Model", "applier.model");

    @TempDir
    Path folder;

    @Test
    void whileDraggingTheReasonIsToldAndADropMakesNoLink() throws IOException {
        try (Trial trial = Trial.start(folder, Optional.of(unlinked()))) {
            Browser browser = trial.browser();
            browser.size(1500, 1500);
            for (Map.Entry<String, String> output : OUTPUTS.entrySet()) {
                List<Map.Entry<String, String>> wrong = INPUTS.entrySet().stream().filter(input -> !input.getKey().equals(output.getKey())).toList();
                trial.choose(step(output.getValue()));
                browser.hold(Trial.output(output.getValue()), Trial.input(wrong.get(0).getValue()), 0, 0);
                for (Map.Entry<String, String> input : wrong) {
                    browser.over(Trial.input(input.getValue()));
                    browser.reads(".drag-ghost.refused [data-drag-words]", "gives " + article(output.getKey()), "takes " + article(input.getKey()));
                }
                if (output.getKey().equals("Kernel")) {
                    browser.picture("refused");
                }
                browser.drop();
                String last = wrong.get(wrong.size() - 1).getKey();
                browser.reads("[data-notice=stop] p", "gives " + article(output.getKey()), "takes " + article(last));
                browser.click("[data-action=close-notice]");
            }
            assertEquals(0, trial.desk().path("links").size());
            assertFalse(browser.has("g[data-link]"));
        }
    }

    @Test
    void withoutAMouseOnlyWhatFitsIsOfferedAndTheReasonIsToldOfTheRest() throws IOException {
        try (Trial trial = Trial.start(folder, Optional.of(unlinked()))) {
            Browser browser = trial.browser();
            for (Map.Entry<String, String> output : OUTPUTS.entrySet()) {
                trial.choose(step(output.getValue()));
                browser.tabTo(Trial.output(output.getValue()));
                browser.keys(Keys.ENTER);
                browser.see("dialog[data-dialog=picker] .picker-list[aria-busy=false]");
                assertTrue(browser.has("dialog [data-pick=\"" + INPUTS.get(output.getKey()) + "\"]"), output + " is offered what fits");
                browser.tabTo("details.unfit > summary");
                browser.keys(Keys.ENTER);
                List<String> reasons = browser.text("details.unfit[open] ul").lines().toList();
                for (Map.Entry<String, String> input : INPUTS.entrySet()) {
                    if (!input.getKey().equals(output.getKey())) {
                        assertFalse(browser.has("dialog [data-pick=\"" + input.getValue() + "\"]"), input + " is not offered to " + output);
                        assertTrue(reasons.stream().anyMatch(reason -> tells(reason, output.getKey(), input.getKey())), input + " of " + output + " in " + reasons);
                    }
                }
                browser.keys(Keys.ESCAPE);
                browser.gone("dialog");
                browser.await("the focus back on the port", () -> browser.focused(Trial.output(output.getValue())));
            }
            assertEquals(0, trial.desk().path("links").size());
        }
    }

    private static boolean tells(String reason, String given, String taken) {
        return reason.contains("gives " + article(given)) && reason.contains("takes " + article(taken));
    }

    private static String article(String type) {
        return type.equals("Snapshots") ? type : (type.equals("Operator") ? "an " : "a ") + type;
    }

    private static String step(String end) {
        return end.substring(0, end.indexOf('.'));
    }

    private Path unlinked() throws IOException {
        return TestWorkflows.write(folder, List.of("source:table-source", "reader:model-reader", "snapshots:snapshot-builder",
                "snapshots-2:snapshot-builder", "applier:model-applier", "kernel:kernel-chooser", "kernel-2:kernel-chooser", "fit:operator-fitter",
                "fit-2:operator-fitter", "spectrum:spectrum-extractor", "spectrum-2:spectrum-extractor", "check:wellposedness-checker",
                "check-2:wellposedness-checker", "forecast:forecast"), List.of());
    }

    private static Map<String, String> ordered(String... pairs) {
        Map<String, String> map = new LinkedHashMap<>();
        for (int i = 0; i < pairs.length; i += 2) {
            map.put(pairs[i], pairs[i + 1]);
        }
        return map;
    }
}
