package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.junit.jupiter.api.io.TempDir;

/** The checker axe finds nothing on any kind of page, light or dark. */
@NeedsBrowser
class AccessibilityTrialTest {

    private static final String AXE = "/META-INF/resources/webjars/axe-core/4.6.3/axe.min.js";
    /** The attribute aria-description came with ARIA 1.3, after this release of axe. */
    static final String RUN = """
            const done = arguments[0];
            axe.configure({standards: {ariaAttrs: {'aria-description': {type: 'string', allowEmpty: true, global: true}}}});
            axe.run(document, {resultTypes: ['violations']}).then(
                (found) => done(JSON.stringify(found.violations.map((v) => ({id: v.id, help: v.help, at: v.nodes.map((n) => n.target.join(' ') + ': ' + n.failureSummary)})))),
                (fault) => done(JSON.stringify([{id: 'axe', help: String(fault), at: []}])));
            """;

    @TempDir
    Path folder;

    @ParameterizedTest
    @ValueSource(strings = {"light", "dark"})
    void axeFindsNothing(String scheme) throws IOException {
        SmallStation.write(folder);
        List<String> found = new ArrayList<>();
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            Browser browser = trial.browser();
            browser.system(scheme);
            browser.see("[data-example=pump-house]");
            browser.see("html[data-theme=" + scheme + "]");
            browser.js(axe());
            check(browser, "start-" + scheme, found);
            openFile(trial);
            browser.see("[data-card=spectrum]");
            browser.click("[data-action=run-all]");
            trial.state("spectrum", "done", "doubts");
            trial.rest();
            trial.choose("station");
            browser.see("[data-table][data-ready=true]");
            check(browser, "table-" + scheme, found);
            trial.choose("spectrum");
            browser.see(".lk-plot [data-drawn=true]");
            check(browser, "pictures-" + scheme, found);
            trial.settings("snapshots");
            check(browser, "settings-" + scheme, found);
        }
        assertEquals(List.of(), found);
    }

    private static void openFile(Trial trial) {
        Browser browser = trial.browser();
        browser.click("[data-action=open]");
        browser.see("dialog .file-list");
        browser.await("the workflow in an opened folder", () -> {
            if (!browser.has("dialog [data-file=\"workflow.json\"]") && browser.has("dialog .file-item")) {
                browser.all("dialog .file-item").get(browser.all("dialog .file-item").size() - 1).click();
            }
            return browser.has("dialog [data-file=\"workflow.json\"]");
        });
        browser.click("dialog [data-file=\"workflow.json\"]");
    }

    private static void check(Browser browser, String page, List<String> found) throws IOException {
        browser.picture(page);
        JsonNode violations = new ObjectMapper().readTree(String.valueOf(browser.later(RUN)));
        violations.forEach(violation -> found.add(page + ": " + violation));
    }

    static String axe() throws IOException {
        try (InputStream source = AccessibilityTrialTest.class.getResourceAsStream(AXE)) {
            return new String(source.readAllBytes(), StandardCharsets.UTF_8);
        }
    }
}
