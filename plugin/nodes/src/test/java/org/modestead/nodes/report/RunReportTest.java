package org.modestead.nodes.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Doubt;
import org.modestead.engine.wellposed.Grade;
import org.modestead.nodes.contract.NodeDeclaration.Stage;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Entry;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.KeyValues;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.figure.LadderFigures;
import org.modestead.nodes.figure.RecordingFigure;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

class RunReportTest {
    private static final Map<String, String> VERSIONS = Map.of("Modestead", "0.1.0");

    @Test
    void aModeReportLeadsAndItsFiguresAreNotDrawnAgain() {
        ReportDocument document = RunReport.assemble("pumps", List.of(builder(), checker(), reporter()), VERSIONS);
        assertEquals("Pump house north", document.title());
        assertEquals(List.of("summary", "modes", "existence", "forecast", "method", "limits", "data", "next", "doubts", "step-1-build",
                "step-2-judge", "repeat"),
                document.sections().stream().map(Section::id).toList());
        assertTrue(pictures(section(document, "step-1-build")).isEmpty());
        assertTrue(pictures(section(document, "step-2-judge")).isEmpty());
    }

    @Test
    void withoutAModeReportTheStepsTellTheirStory() {
        ReportDocument document = RunReport.assemble("pumps", List.of(builder(), checker()), VERSIONS);
        assertEquals("pumps", document.title());
        assertEquals(List.of("overview", "step-1-build", "step-2-judge", "doubts", "repeat"),
                document.sections().stream().map(Section::id).toList());
        assertEquals(List.of("recording"), pictures(section(document, "step-1-build")));
        assertEquals(5, pictures(section(document, "step-2-judge")).size());
        assertTrue(section(document, "doubts").toString().contains("17 cells were interpolated."));
    }

    @Test
    void aFigureThatShowsOtherDataStaysEvenIfItIsCalledTheSame() {
        NodeResult other = new NodeResult(Map.of(), List.of(RecordingFigure.figure(ReportFixture.snapshots(
                ReportFixture.snapshots().channels(), ReportFixture.SECONDS, 100, 0.05), 2)), List.of(), List.of());
        ReportDocument document = RunReport.assemble("pumps", List.of(new StepAccount("other", "Snapshot"
                + " Builder", Stage.PREPARE, other,
                Map.of()), reporter()), VERSIONS);
        assertEquals(List.of("recording"), pictures(section(document, "step-1-other")));
    }

    @Test
    void aSecondPipelineThatTheModeReportDoesNotTellKeepsItsTables() {
        MemoryTable modes = MemoryTable.builder(TableSchema.of(Column.number("mode")), "modes").row(1.0).build();
        StepAccount other = new StepAccount("other", "Spectrum Extractor", Stage.JUDGE,
                new NodeResult(Map.of("modes", modes),
                List.of(RecordingFigure.figure(ReportFixture.snapshots(), 1)), List.of(), List.of()), Map.of());
        StepAccount told = new StepAccount("told", "Spectrum Extractor", Stage.JUDGE, new NodeResult(Map.of("modes", modes),
                List.of(RecordingFigure.figure(ReportFixture.snapshots(), 2)), List.of(), List.of()), Map.of());
        ReportDocument document = RunReport.assemble("pumps", List.of(other, told, reporter()), VERSIONS);
        assertTrue(section(document, "step-1-other").blocks().stream().anyMatch(Grid.class::isInstance));
        assertFalse(section(document, "step-2-told").blocks().stream().anyMatch(Grid.class::isInstance));
    }

    @Test
    void longTablesAreCutAndSaySo() {
        ReportDocument document = RunReport.assemble("pumps", List.of(builder()), VERSIONS);
        Grid grid = (Grid) section(document, "step-1-build").blocks().stream().filter(Grid.class::isInstance).findFirst()
                .orElseThrow();
        assertEquals(50, grid.rows().size());
        assertEquals("10 more rows in build/summary.csv.", grid.note());
        assertEquals(List.of("0", "1.5", ""), grid.rows().get(0));
    }

    @Test
    void settingsAndVersionsToRepeatTheRunAreListedInOrder() {
        Section repeat = section(RunReport.assemble("pumps", List.of(builder()), VERSIONS), "repeat");
        List<KeyValues> lists = repeat.blocks().stream().filter(KeyValues.class::isInstance).map(KeyValues.class::cast)
                .toList();
        assertEquals(List.of(new Entry("Modestead", "0.1.0")), lists.get(0).entries());
        assertEquals(List.of(new Entry("time", "t"), new Entry("depth", "2")), lists.get(1).entries());
    }

    @Test
    void theSameRunGivesTheSamePage() {
        List<StepAccount> steps = List.of(builder(), checker(), reporter());
        assertEquals(HtmlReport.write(RunReport.assemble("pumps", steps, VERSIONS)),
                HtmlReport.write(RunReport.assemble("pumps", List.of(builder(), checker(), reporter()), VERSIONS)));
    }

    @Test
    void twoModeReportsKeepTheirSectionsApart() {
        StepAccount second = new StepAccount("second", "Mode Report", Stage.REPORT, reporter().result(), Map.of());
        String page = HtmlReport.write(RunReport.assemble("pumps", List.of(reporter(), second), VERSIONS));
        assertTrue(page.contains("Summary (second)"));
        List<String> ids = Pattern.compile("\\sid=\"([^\"]*)\"").matcher(page).results()
                .map(m -> m.group(1)).toList();
        assertEquals(ids.stream().distinct().count(), ids.size());
        assertFalse(page.contains("null"));
    }

    private static StepAccount builder() {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("item"), Column.number("value"),
                Column.text("note")),
                "summary");
        for (int i = 0; i < 60; i++) {
            rows.row(Integer.toString(i), 1.5, null);
        }
        Map<String, String> settings = new LinkedHashMap<>();
        settings.put("time", "t");
        settings.put("depth", "2");
        return new StepAccount("build", "Snapshot Builder", Stage.PREPARE, new NodeResult(Map.of("summary", rows.build()),
                List.of(RecordingFigure.figure(ReportFixture.snapshots(), 2)), List.of("1200 rows became one run"),
                List.of(new Doubt("gaps", "17 cells were interpolated"))), settings);
    }

    private static StepAccount checker() {
        return new StepAccount("judge", "Well-posedness Checker", Stage.JUDGE, new NodeResult(Map.of(),
                LadderFigures.figures(ReportFixture.spectrum(), ReportFixture.verdict(Grade.STANDS)),
                List.of("the modes drift"),
                List.of()), Map.of());
    }

    private static StepAccount reporter() {
        return new StepAccount("report", "Mode"
                + " Report", Stage.REPORT, ModeReportNodeTest.run(ModeReportNodeTest.inputs(Grade.STANDS)),
                Map.of("title", "Pump house north"));
    }

    private static Section section(ReportDocument document, String id) {
        return document.sections().stream().filter(section -> section.id().equals(id)).findFirst().orElseThrow();
    }

    private static List<String> pictures(Section section) {
        return section.blocks().stream().filter(Picture.class::isInstance).map(block -> ((Picture) block).figure().id())
                .toList();
    }
}
