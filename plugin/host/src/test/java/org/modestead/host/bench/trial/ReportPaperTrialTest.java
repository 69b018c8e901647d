package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.modestead.host.run.CancelSwitch;
import org.modestead.host.run.RunListener;
import org.modestead.host.run.WorkflowRunner;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.nodes.contract.NodeCatalog;

/** The report of a run on A4 and on Letter paper: nothing is cut at the edge, nothing that belongs together is torn apart, axe finds nothing. */
@NeedsBrowser
class ReportPaperTrialTest {

    private static final Path WORKFLOWS = Path.of(System.getProperty("basedir", ""), "../../test-workflows").toAbsolutePath().normalize();
    private static final double MM = 96 / 25.4;
    /** Margins of the style sheet's page: 14 mm at the sides, 16 mm above and below. */
    private static final double SIDES = 28;
    private static final double ENDS = 32;
    private static final String WIDER = """
            const width = document.documentElement.clientWidth + 1;
            return [...document.querySelectorAll('body *')].filter((e) => !e.closest('svg') && !e.closest('.skip'))
                .filter((e) => e.getBoundingClientRect().right > width || e.scrollWidth > e.clientWidth + 1 && e.clientWidth > 0 && getComputedStyle(e).display !== 'inline')
                .map((e) => e.tagName + '.' + e.className + ' ' + e.textContent.slice(0, 40) + ' ' + e.getBoundingClientRect().right).slice(0, 8).join(' | ');
            """;
    private static final String TORN = """
            const most = arguments[0];
            return [...document.querySelectorAll('figure, tr, .callout')].filter((e) => getComputedStyle(e).breakInside !== 'avoid' || e.getBoundingClientRect().height > most)
                .map((e) => e.tagName + ' ' + getComputedStyle(e).breakInside + ' ' + e.getBoundingClientRect().height + ' ' + e.textContent.slice(0, 40)).slice(0, 8).join(' | ');
            """;

    /** Paper sizes in millimetres. */
    private enum Paper {
        A4(210, 297), LETTER(215.9, 279.4);

        private final double width;
        private final double height;

        Paper(double width, double height) {
            this.width = width;
            this.height = height;
        }
    }

    @TempDir
    static Path folder;
    private static String report;

    @BeforeAll
    static void run() {
        NodeCatalog catalog = NodeCatalog.load(List.of(ReportPaperTrialTest.class.getClassLoader()));
        WorkflowChecker.Outcome checked = new WorkflowChecker(catalog).check(WorkflowFile.read(WORKFLOWS.resolve("city-weather")), List.of());
        Path out = WorkflowRunner.once().run(checked.plan().orElseThrow(), folder.resolve("out"), RunListener.NONE, new CancelSwitch()).folder();
        report = out.resolve("report.html").toUri().toString();
    }

    @ParameterizedTest
    @EnumSource
    void nothingIsCutOrTornOnPaper(Paper paper) throws IOException {
        try (Browser browser = new Browser(folder)) {
            browser.medium("print");
            browser.size((int) Math.floor((paper.width - SIDES) * MM), (int) Math.floor((paper.height - ENDS) * MM));
            browser.open(report);
            assertEquals("", browser.js(WIDER), "wider than " + paper);
            assertEquals("", browser.js(TORN, (paper.height - ENDS) * MM), "may be torn on " + paper);
            byte[] pdf = browser.pdf(paper.width / 25.4, paper.height / 25.4);
            Files.createDirectories(Path.of("target", "report-paper"));
            Files.write(Path.of("target", "report-paper", paper.name().toLowerCase(Locale.ROOT) + ".pdf"), pdf);
            // 72 points an inch, rounded by the writer
            Matcher pages = Pattern.compile("/MediaBox \\[0 0 ([0-9.]+) ([0-9.]+)]").matcher(new String(pdf, StandardCharsets.ISO_8859_1));
            int count = 0;
            while (pages.find()) {
                assertEquals(paper.width / 25.4 * 72, Double.parseDouble(pages.group(1)), 1.5);
                assertEquals(paper.height / 25.4 * 72, Double.parseDouble(pages.group(2)), 1.5);
                count++;
            }
            assertTrue(count >= 3, count + " pages");
        }
    }

    @Test
    void itIsReadableWithoutSightAndAxeFindsNothing() throws IOException {
        try (Browser browser = new Browser(folder)) {
            browser.open(report);
            assertEquals("en", browser.js("return document.documentElement.lang"));
            assertEquals(1L, browser.js("return document.querySelectorAll('h1').length"));
            assertEquals("", browser.js("return [...document.querySelectorAll('figure svg')].filter((s) => s.getAttribute('role') !== 'img' || !s.querySelector('title')"
                    + " || !(s.getAttribute('aria-label') || '').length).map((s) => s.outerHTML.slice(0, 80)).join('|')"));
            assertEquals("", browser.js("return [...document.querySelectorAll('table')].filter((t) => !t.caption || !t.querySelector('th[scope]')).map((t) => t.outerHTML.slice(0, 80))"
                    + ".join('|')"));
            browser.js(AccessibilityTrialTest.axe());
            assertEquals("[]", browser.later(AccessibilityTrialTest.RUN));
        }
    }
}
