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

    /** Everything else that is refused while something is held: circles, ends of one side, a link that is there, a node and a step out of place. */
    @Test
    void whateverElseIsRefusedIsToldWhileDragging() throws IOException {
        Path chain = TestWorkflows.write(folder, List.of("made:signal-generator", "a:table-query", "b:table-query", "snapshots:snapshot-builder"),
                List.of("made.table>a.input", "a.table>b.input"));
        try (Trial trial = Trial.start(folder, Optional.of(chain))) {
            Browser browser = trial.browser();
            browser.size(1500, 1500);
            int links = trial.desk().path("links").size();
            refused(trial, "b", Trial.output("b.table"), Trial.input("a.input"), "already takes input from", "circle");
            refused(trial, "b", Trial.output("b.table"), Trial.input("b.input"), "both ends are the same step");
            refused(trial, "b", Trial.output("b.table"), Trial.output("a.table"), "An output cannot feed another output");
            refused(trial, "b", Trial.input("b.input"), Trial.input("a.input"), "An input cannot feed another input");
            refused(trial, "a", Trial.output("a.table"), Trial.input("b.input"), "These two are linked already");
            refused(trial, "snapshots", Trial.output("snapshots.snapshots"), "[data-card=made]", "takes no Snapshots");
            refused(trial, "made", ".shelf-item[data-node=operator-fitter]", Trial.output("made.table"), "gives Table here", "takes none");
            refused(trial, "made", "[data-card=made]", "[data-band=prepare] .band-title", "a step stays in the band of its stage");
            assertEquals(links, trial.desk().path("links").size(), "no link is made and none is lost");
            assertEquals(4, trial.desk().path("steps").size(), "no step is added");
            trial.choose("made");
            browser.hold(Trial.output("made.table"), Trial.input("b.input"), 0, 0);
            browser.reads("[data-drag-words]", "Links, in place of");
            browser.keys(Keys.ESCAPE);
            browser.gone("[data-drag-words]");
            browser.drop();
            assertEquals(links, trial.desk().path("links").size(), "a link that is given up changes nothing");
            trial.linked("a.table", "b.input");
        }
    }

    /** Holds one thing over another, reads why it is refused, drops it and reads that again. */
    private static void refused(Trial trial, String chosen, String held, String over, String... words) {
        Browser browser = trial.browser();
        trial.choose(chosen);
        browser.hold(held, over, 0, 0);
        browser.reads(".drag-ghost.refused [data-drag-words]", words);
        browser.drop();
        browser.reads("[data-notice=stop] p", words);
        browser.click("[data-action=close-notice]");
        browser.gone("[data-notice=stop]");
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
