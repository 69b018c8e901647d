package org.modestead.nodes.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Color;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.wellposed.Grade;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Head;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.document.ReportDocument.Tone;
import org.modestead.nodes.render.ColourVision;

class HtmlReportTest {
    private static final String PAGE = HtmlReport.write(ModeReportNodeTest.full(Grade.STANDS));

    @Test
    void thePageRefersToNothingOutsideItselfAndRunsNothing() {
        assertEquals(List.of(), found("(?:href|src|srcset|action|data)=\"(?!#)[^\"]*\""));
        assertEquals(List.of(), found("url\\((?!#)"));
        assertEquals(List.of(), found("(?i)<(script|link|iframe|object|embed|img|form|base)\\b"));
        assertEquals(List.of(), found("(?i)\\son[a-z]+=|@import|javascript:"));
        assertFalse(PAGE.replace("xmlns=\"http://www.w3.org/2000/svg\"", "").contains("http"));
    }

    @Test
    void everyLinkLeadsSomewhereAndEveryIdIsUnique() {
        List<String> ids = Pattern.compile("\\sid=\"([^\"]*)\"").matcher(PAGE).results().map(m -> m.group(1)).toList();
        assertEquals(ids.size(), new HashSet<>(ids).size());
        for (String kind : List.of("href=\"#([^\"]*)\"", "url\\(#([^)]*)\\)", "aria-labelledby=\"([^\"]*)\"")) {
            List<String> targets = Pattern.compile(kind).matcher(PAGE).results().map(m -> m.group(1)).toList();
            assertFalse(targets.isEmpty(), kind);
            assertTrue(ids.containsAll(targets), kind);
        }
    }

    @Test
    void everyTableHasACaptionAndItsHeadsHaveAScope() {
        List<String> tables = pieces("<table>", "</table>");
        assertTrue(tables.size() > 4);
        for (String table : tables) {
            assertTrue(Pattern.compile("<caption[^>]*>[^<]+</caption>").matcher(table).find(), table);
            assertFalse(Pattern.compile("<th(?! scope=\"(col|row)\")[ >]").matcher(table).find(), table);
        }
    }

    @Test
    void everyFigureHasItsCaptionAsTextAlternative() {
        List<String> figures = pieces("<figure", "</figure>");
        assertTrue(figures.size() > 8);
        for (String figure : figures) {
            String caption = between(between(figure, "<figcaption>", "</figcaption>"), ". ", "");
            String alternative = between(figure, "aria-label=\"", "\"");
            assertTrue(alternative.endsWith(caption), alternative);
            assertTrue(figure.contains("role=\"img\""));
        }
    }

    @Test
    void headingsDescendOneLevelAtATimeBelowOneTitle() {
        List<Integer> levels = Pattern.compile("<h([1-6])").matcher(PAGE).results().map(m -> Integer.valueOf(m.group(1)))
                .toList();
        assertEquals(1, levels.get(0));
        assertEquals(1, levels.stream().filter(level -> level == 1).count());
        for (int i = 1; i < levels.size(); i++) {
            assertTrue(levels.get(i) <= levels.get(i - 1) + 1, levels.toString());
        }
    }

    @Test
    void landmarksLanguageAndSkipLinkAreThere() {
        for (String part : List.of("<html lang=\"en\">", "<header>", "<nav aria-labelledby=", "<main id=\"report\">",
                "<footer>",
                "href=\"#report\"", "<meta charset=\"utf-8\">", "name=\"viewport\"", "prefers-color-scheme:dark",
                "@media print",
                "@page")) {
            assertTrue(PAGE.contains(part), part);
        }
    }

    @Test
    void everyTextColourStandsOutFromEveryGroundByAtLeastFourAndAHalf() {
        for (ReportColours colours : List.of(ReportColours.LIGHT, ReportColours.DARK)) {
            assertEquals(9, colours.pairs().size());
            for (List<String> pair : colours.pairs()) {
                double contrast = ColourVision.contrast(Color.decode(pair.get(0)), Color.decode(pair.get(1)));
                assertTrue(contrast >= 4.5, pair + " " + contrast);
            }
        }
    }

    @Test
    void theStyleSheetNamesNoColourBesideTheCheckedOnes() {
        String css = ReportStyle.css().replace(ReportColours.LIGHT.css(), "").replace(ReportColours.DARK.css(), "");
        // White is the paper of the pictures, which bring their own checked ink.
        assertEquals(List.of("#fff"), Pattern.compile("#[0-9a-fA-F]{3,8}\\b").matcher(css).results()
                .map(MatchResult::group).toList());
        Pattern.compile("var\\(--([a-z]+)\\)").matcher(css).results().map(m -> m.group(1)).forEach(name -> assertTrue(
                ReportColours.LIGHT.css().contains("--" + name + ":")
                && ReportColours.DARK.css().contains("--" + name + ":"), name));
    }

    @Test
    void theSameDocumentGivesTheSameBytes() {
        assertEquals(PAGE, HtmlReport.write(ModeReportNodeTest.full(Grade.STANDS)));
    }

    @Test
    void textFromDataIsEscaped() {
        List<Channel> nasty = List.of(new Channel("<script>alert(\"x\")</script>", "\"bar'"), new Channel("a&b", "<i>"));
        String page = HtmlReport.write(ModeReportNodeTest.of(ReportFixture.spectrum(nasty),
                ReportFixture.snapshots(nasty, ReportFixture.SECONDS, 0, 0.05)));
        assertFalse(page.contains("<script"));
        assertFalse(page.contains("<i>"));
        assertTrue(page.contains("&lt;script&gt;"));
        assertTrue(page.contains("a&amp;b"));
    }

    @Test
    void charactersThatNoPageMayHoldAreReplaced() {
        assertEquals("a\uFFFDb\uFFFDc\uFFFD\nd", HtmlText.escape("a\u0000b\u001bc\ud800\nd"));
    }

    @Test
    void everyToneIsToldByAWord() {
        for (Tone tone : Tone.values()) {
            String page = HtmlReport.write(new ReportDocument("t", "s", List.of(new Section("a", "A",
                    List.of(new Callout(tone, "title", List.of("sentence")))))));
            assertTrue(page.contains(tone.word() + ": title"), page);
        }
    }

    @Test
    void aTableWithoutRowsStillSaysWhatItWouldShow() {
        String page = HtmlReport.write(new ReportDocument("t", "", List.of(new Section("a", "A", List.of(
                new Grid("Findings", List.of(new Head("Mode", true)), List.of(), "None."), new Paragraph("End."))))));
        assertTrue(page.contains(">Findings</caption>"));
        assertTrue(page.contains("None."));
    }

    private static List<String> found(String pattern) {
        return Pattern.compile(pattern).matcher(PAGE).results().map(MatchResult::group).toList();
    }

    private static List<String> pieces(String start, String end) {
        List<String> pieces = new ArrayList<>();
        for (int at = PAGE.indexOf(start); at >= 0; at = PAGE.indexOf(start, at + 1)) {
            pieces.add(PAGE.substring(at, PAGE.indexOf(end, at)));
        }
        return pieces;
    }

    private static String between(String text, String start, String end) {
        int from = text.indexOf(start) + start.length();
        return end.isEmpty() ? text.substring(from) : text.substring(from, text.indexOf(end, from));
    }
}
