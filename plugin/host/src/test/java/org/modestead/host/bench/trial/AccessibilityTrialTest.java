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
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The checker axe finds nothing on any kind of page, light or dark; all that is pressed is large enough, and no page is wider than its window, even at 200 %. */
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

    /** What is pressed is 24 px wide and high, with what reaches beyond its frame (WCAG 2.2, 2.5.8); nothing is wider than the window. */
    private static final String SMALL_OR_WIDE = """
            const found = [];
            const root = document.querySelector('dialog[open]') ?? document.body;
            for (const one of root.querySelectorAll('button, a[href], input, select, textarea, summary, [role=separator][tabindex]')) {
              const frame = one.getBoundingClientRect();
              const reach = getComputedStyle(one, '::after');
              const reached = reach.content !== 'none' && reach.position === 'absolute';
              const label = one.closest('label')?.getBoundingClientRect();
              const width = Math.max(frame.width, label?.width ?? 0, reached ? parseFloat(reach.width) : 0);
              const height = Math.max(frame.height, label?.height ?? 0, reached ? parseFloat(reach.height) : 0);
              if (frame.width > 1 && !one.matches('.skip, .unseen') && (width < 23.9 || height < 23.9)) {
                found.push(`${one.outerHTML.slice(0, 120)} is ${width} x ${height}`);
              }
            }
            if (document.documentElement.scrollWidth > innerWidth) {
              found.push(`the page is ${document.documentElement.scrollWidth} wide in a window of ${innerWidth}`);
            }
            return found;
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
        ((List<?>) browser.js(SMALL_OR_WIDE)).forEach(one -> found.add(page + ": " + one));
        browser.size(640, 400);
        ((List<?>) browser.js(SMALL_OR_WIDE)).forEach(one -> found.add(page + " at twice the size: " + one));
        browser.size(1280, 800);
    }

    static String axe() throws IOException {
        try (InputStream source = AccessibilityTrialTest.class.getResourceAsStream(AXE)) {
            return new String(source.readAllBytes(), StandardCharsets.UTF_8);
        }
    }
}
