package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.Keys;

/** What is looked at: a mode marked in one picture is marked in all and in the table; pictures and tables become files. */
@NeedsBrowser
class LooksTrialTest {

    @TempDir
    Path folder;

    @Test
    void aModeMarkedInOnePictureIsMarkedEverywhereUntilEscape() throws IOException {
        try (Trial trial = Trial.start(folder, Optional.of(SmallStation.write(folder)))) {
            Browser browser = trial.browser();
            ran(trial);
            browser.click("[data-action=widen]");
            browser.see(".lk-complex-plane .lk-plot [data-drawn=true]");
            browser.tabTo(".lk-complex-plane .lk-plot");
            browser.await("a marked mode", () -> {
                if (browser.has(".lk-complex-plane.lk-chosen")) {
                    return true;
                }
                browser.keys(Keys.ARROW_RIGHT, Keys.ENTER);
                return false;
            });
            String mode = browser.text(".lk-complex-plane .lk-tag").replaceAll("\\D", "");
            browser.see("[data-table=modes] tr[data-row-mode=\"" + mode + "\"][aria-selected=true]");
            browser.await("the mode in other pictures", () -> browser.all(".lk-picture.lk-chosen").size() > 1);
            browser.reads(".lk-selected", "mode " + mode);
            browser.picture("mode-marked");
            browser.keys(Keys.ESCAPE);
            browser.gone(".lk-chosen");
            browser.gone("tr[aria-selected=true]");
            String clicked = clickAMark(browser, ".lk-complex-plane .lk-canvas");
            browser.reads(".lk-selected", clicked);
            browser.see("[data-table=modes] tr[data-row-mode=\"" + clicked.replaceAll("\\D", "") + "\"][aria-selected=true]");
            browser.await("the mode in other pictures", () -> browser.all(".lk-picture.lk-chosen").size() > 1);
            browser.click("[data-table=modes] tr[data-row-mode=\"1\"] td:nth-child(2)");
            browser.reads(".lk-selected", "mode 1");
            browser.see(".lk-picture.lk-chosen");
        }
    }

    /** Looks for a place where the pointer becomes a hand, presses the mouse there, and returns the mode that the picture names for it. */
    private static String clickAMark(Browser browser, String canvas) {
        List<?> place = (List<?>) browser.js("""
                const box = document.querySelector(arguments[0]);
                box.scrollIntoView({block: 'center'});
                const drawn = box.querySelector('canvas');
                const frame = drawn.getBoundingClientRect();
                for (let y = 4; y < frame.height; y += 6) {
                  for (let x = 4; x < frame.width; x += 6) {
                    drawn.dispatchEvent(new MouseEvent('mousemove', {bubbles: true, clientX: frame.left + x, clientY: frame.top + y}));
                    if (drawn.parentElement.style.cursor === 'pointer') {
                      const outer = box.getBoundingClientRect();
                      return [Math.round(frame.left - outer.left + x), Math.round(frame.top - outer.top + y)];
                    }
                  }
                }
                return null;
                """, canvas);
        assertTrue(place != null, "some mark answers to the pointer");
        browser.clickAt(canvas, ((Number) place.get(0)).longValue(), ((Number) place.get(1)).longValue());
        browser.see(".lk-complex-plane.lk-chosen .lk-tag");
        return browser.text(".lk-complex-plane .lk-tag").replaceAll("(?s).*?(mode \\d+).*", "$1");
    }

    /** Of the example: lines at 0.62, 1.37 and 2.90 Hz end at one order, side by side. */
    @Test
    void everyLineOfTheStabilisationDiagramBearsItsFrequency() {
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            Browser browser = trial.browser();
            browser.click("[data-example=pump-house]");
            trial.choose("stabilisation");
            browser.click("[data-action=run-step]");
            trial.state("stabilisation", "done", "doubts");
            browser.see("figure.lk-marks [data-drawn=true]");
            browser.await("three labels", () -> labels(browser).size() == 3);
            List<List<Number>> boxes = new ArrayList<>();
            List<String> words = new ArrayList<>();
            labels(browser).forEach(label -> {
                words.add(label.get(0).toString());
                boxes.add(List.of((Number) label.get(1), (Number) label.get(2), (Number) label.get(3), (Number) label.get(4)));
            });
            assertTrue(words.stream().anyMatch(word -> word.startsWith("1.37")), words.toString());
            for (int i = 0; i < boxes.size(); i++) {
                for (int j = 0; j < i; j++) {
                    assertFalse(overlap(boxes.get(i), boxes.get(j)), words + " at " + boxes);
                }
            }
            browser.picture("stabilisation");
        }
    }

    /** Frequencies that are written in the picture, each with left, top, right and bottom. */
    @SuppressWarnings("unchecked")
    private static List<List<Object>> labels(Browser browser) {
        return (List<List<Object>>) browser.later("""
                const done = arguments[0];
                import('/lib/echarts.esm.min.js').then((library) => {
                  const chart = library.getInstanceByDom(document.querySelector('figure.lk-marks [data-drawn=true]'));
                  done(chart.getZr().storage.getDisplayList(true).filter((one) => / Hz$/.test(one.style?.text ?? '')).map((one) => {
                    const box = one.getBoundingRect().clone();
                    box.applyTransform(one.getComputedTransform() ?? [1, 0, 0, 1, 0, 0]);
                    return [one.style.text, box.x, box.y, box.x + box.width, box.y + box.height];
                  }));
                }, (fault) => done([[String(fault), 0, 0, 0, 0]]));
                """);
    }

    private static boolean overlap(List<Number> a, List<Number> b) {
        return a.get(0).doubleValue() < b.get(2).doubleValue() && b.get(0).doubleValue() < a.get(2).doubleValue()
                && a.get(1).doubleValue() < b.get(3).doubleValue() && b.get(1).doubleValue() < a.get(3).doubleValue();
    }

    @Test
    void picturesAndTablesBecomeFiles() throws IOException {
        try (Trial trial = Trial.start(folder, Optional.of(SmallStation.write(folder)))) {
            Browser browser = trial.browser();
            ran(trial);
            String figure = browser.see("figure.lk-complex-plane").getAttribute("data-figure");
            browser.click("[data-figure=\"" + figure + "\"] [data-action=svg]");
            browser.click("[data-figure=\"" + figure + "\"] [data-action=png]");
            browser.click("[data-table=modes] [data-action=csv]");
            browser.await("the picture, its file, and the table", () -> files(".svg") == 1 && files(".png") == 1 && files(".csv") == 1);
            assertTrue(new String(downloaded(browser, ".svg"), StandardCharsets.UTF_8).contains("<svg"));
            assertEquals("[-119, 80, 78, 71]", Arrays.toString(Arrays.copyOf(downloaded(browser, ".png"), 4)));
            String rows = browser.see("[data-table=modes]").getAttribute("data-rows");
            assertEquals(Integer.parseInt(rows) + 1, new String(downloaded(browser, ".csv"), StandardCharsets.UTF_8).lines().count());
            browser.click("[data-figure=\"" + figure + "\"] [data-action=numbers-csv]");
            browser.await("the numbers of the picture", () -> files(".csv") == 2);
            browser.click("[data-action=workflow-menu]");
            assertFalse(browser.has("[role=menu] [data-action=report][aria-disabled=true]"), "there are results to report");
            String report = String.valueOf(browser.later("fetch('/api/report.html').then((answer) => answer.text()).then(arguments[0])"));
            assertTrue(report.strip().endsWith("</html>") && report.contains("Spectrum Extractor"), "the report is a whole page and tells of every step");
        }
    }

    @Test
    void theFirstPaintIsMeasuredAndThePageComplainsOfNothing() {
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            trial.browser().see("[data-example=pump-house]");
            trial.browser().picture("start");
            trial.browser().await("the first paint", () -> trial.browser().firstPaint() > 0);
            System.out.printf(Locale.ROOT, "trials: first paint of the start page after %.0f ms, of all that it offers after %.0f ms%n", trial.browser().firstPaint(),
                    filled(trial.browser()));
            assertEquals("[]", trial.browser().js("return JSON.stringify(performance.getEntriesByType('resource').map(e => new URL(e.name).pathname)"
                    + ".filter(path => ['/api/start', '/api/desk'].includes(path)))"), "what the start page offers comes with the page");
            trial.empty();
            trial.put("signal-generator", "[data-band=data]");
            assertTrue(trial.browser().requests().size() > 10, "the browser's log of requests is read");
            assertEquals("[]", trial.browser().complaints().toString());
        }
    }

    /** The largest paint so far: the start page has it when its lists are there. */
    private static double filled(Browser browser) {
        return ((Number) browser.later("const tell = arguments[0]; new PerformanceObserver(all => tell(all.getEntries().at(-1).startTime))"
                + ".observe({type: 'largest-contentful-paint', buffered: true})")).doubleValue();
    }

    private static void ran(Trial trial) {
        trial.browser().click("[data-action=run-all]");
        trial.state("spectrum", "done", "doubts");
        trial.rest();
        trial.choose("spectrum");
        trial.browser().see("[data-look=spectrum] [data-table=modes][data-ready=true]");
    }

    /** Waits for a whole file of that ending. */
    private byte[] downloaded(Browser browser, String end) throws IOException {
        browser.await("a file " + end, () -> file(end).isPresent());
        return Files.readAllBytes(file(end).orElseThrow());
    }

    private long files(String end) {
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(file -> file.toString().endsWith(end)).count();
        } catch (IOException broken) {
            throw new java.io.UncheckedIOException(broken);
        }
    }

    private Optional<Path> file(String end) {
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(file -> file.toString().endsWith(end)).findFirst();
        } catch (IOException broken) {
            throw new java.io.UncheckedIOException(broken);
        }
    }
}
