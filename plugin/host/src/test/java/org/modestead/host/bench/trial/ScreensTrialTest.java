package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What is looked at follows the screen: on a large one more of a table is in sight, nothing is wider than the page or lies under the name of the step. */
@NeedsBrowser
class ScreensTrialTest {

    /** A small screen, one of 3840 x 2160 with two of its pixels for each of the page, and one with one. */
    private static final List<Screen> SCREENS = List.of(new Screen(1280, 800, 1), new Screen(1920, 1080, 2), new Screen(3840, 2160, 1));

    /** Rows of a table that are wholly in sight. */
    private static final String ROWS = """
            const box = document.querySelector('[data-table=table] .lk-rows').getBoundingClientRect();
            return [...document.querySelectorAll('[data-table=table] tr[data-row]')].map((row) => row.getBoundingClientRect())
                .filter((row) => row.top >= box.top && row.bottom <= box.bottom + 1).length;
            """;

    /** How far the list of parts, where it stays in sight, reaches under the name of the step, in whole pixels. */
    private static final String COVERED = """
            document.querySelector('.look').scrollTop = 1e6;
            const parts = document.querySelector('.lk-parts');
            return getComputedStyle(parts).position !== 'sticky' ? 0 : Math.floor(document.querySelector('.look-head').getBoundingClientRect().bottom
                - parts.getBoundingClientRect().top);
            """;

    @TempDir
    Path folder;

    private record Screen(int width, int height, double scale) {}

    @Test
    void everyScreenShowsTablesAndPicturesWhole() throws IOException {
        try (Trial trial = Trial.start(folder, Optional.of(SmallStation.write(folder)))) {
            Browser browser = trial.browser();
            browser.click("[data-action=run-all]");
            trial.state("spectrum", "done", "doubts");
            trial.rest();
            trial.choose("station");
            browser.see("[data-table=table][data-ready=true]");
            long small = rowsOn(browser, SCREENS.get(0), 12);
            long large = rowsOn(browser, SCREENS.get(2), 20);
            assertTrue(large > small, large + " rows of a large screen, " + small + " of a small one");
            trial.choose("spectrum");
            browser.see(".lk-plot [data-drawn=true]");
            for (String scheme : List.of("light", "dark")) {
                browser.system(scheme);
                for (Screen screen : SCREENS) {
                    browser.size(screen.width, screen.height, screen.scale);
                    browser.await("the parts below the name of the step on " + screen, () -> ((Number) browser.js(COVERED)).intValue() <= 0);
                    browser.await("no picture wider than the page on " + screen, () -> Boolean.TRUE.equals(browser.js(
                            "return [...document.querySelectorAll('.lk-picture canvas')].every((one) => one.getBoundingClientRect().right <= innerWidth)")));
                    assertEquals(screen.scale, ((Number) browser.js("return devicePixelRatio")).doubleValue());
                    browser.picture("screen-" + scheme + "-" + screen.width + "-" + screen.height);
                }
            }
        }
    }

    private static long rowsOn(Browser browser, Screen screen, int least) {
        browser.size(screen.width, screen.height, screen.scale);
        browser.await("at least " + least + " rows on " + screen, () -> ((Number) browser.js(ROWS)).longValue() >= least);
        browser.picture("screen-table-" + screen.width);
        return ((Number) browser.js(ROWS)).longValue();
    }
}
