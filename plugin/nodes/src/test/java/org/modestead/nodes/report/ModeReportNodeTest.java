package org.modestead.nodes.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.modestead.engine.Progress;
import org.modestead.engine.forecast.ForecastResult;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Grade;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

class ModeReportNodeTest {

    static ReportDocument full(Grade first) {
        return run(inputs(first)).document().orElseThrow();
    }

    static ReportDocument of(Spectrum spectrum, Snapshots snapshots) {
        return run(Map.of("spectrum", spectrum, "snapshots", snapshots)).document().orElseThrow();
    }

    static NodeResult run(Map<String, Object> inputs) {
        Settings settings = new Settings(Map.of("title", "Pump house north", "notes", "Recorded after the repair.",
                "modes", 4L,
                "channels", 2L));
        return new ModeReportNode().run(new NodeInputs(inputs), settings,
                new RunContext(Progress.NONE, Path.of("."), Path.of(".")));
    }

    static Map<String, Object> inputs(Grade first) {
        Snapshots snapshots = ReportFixture.snapshots();
        ForecastResult forecast = ReportFixture.forecast(snapshots);
        return Map.of("snapshots", snapshots, "spectrum", ReportFixture.spectrum(), "verdict", ReportFixture.verdict(first),
                "forecast", ReportFixture.forecastTable(forecast, snapshots), "scores", ReportFixture.scoreTable(forecast));
    }

    @Test
    void theReportRunsFromSummaryToCautions() {
        assertEquals(List.of("summary", "modes", "existence", "forecast", "method", "limits", "data", "next", "doubts"),
                full(Grade.STANDS).sections().stream().map(Section::id).toList());
    }

    @Test
    void intervalsStandBesideTheFigures() {
        Map<String, Object> inputs = Map.of("spectrum", ReportFixture.withIntervals());
        String modes = text(run(inputs), "Modes");
        for (String cell : List.of("1.52 (1.50 to 1.54)", "\u22120.172 (\u22120.250 to \u22120.100)", "1.8 % (1.0 % to 2.6 %)",
                "\u22124.03 (\u22126.93 to \u22122.77)", "1.00 (0.900 to 1.10)", "90 % intervals")) {
            assertTrue(modes.contains(cell), cell + " in " + modes);
        }
    }

    @Test
    void theSummaryHasHeadlineShareVerdictAndSkillInWords() {
        String summary = text(run(inputs(Grade.STANDS)), "Summary");
        assertTrue(summary.contains("Mode 1 stands (report the mode): 1.52 Hz, damping ratio 1.8 %; 70 % of the signal."),
                summary);
        assertTrue(summary.contains("3 of 5 modes carry 100 % of the signal, the constant part among them."), summary);
        assertTrue(summary.contains("the modes drift"), summary);
        assertTrue(summary.contains("Of 2 modes that carry a stated share of the signal 1 has this verdict: mode 2."),
                summary);
        assertTrue(summary.contains("0.5 s ahead the modal forecast errs 50 % less than persistence"), summary);
        assertTrue(summary.contains("2 s ahead the modal forecast errs 33 % more than persistence"), summary);
        assertTrue(summary.contains("Recorded after the repair."), summary);
    }

    @ParameterizedTest
    @EnumSource(Grade.class)
    void everyVerdictSaysWhatItMeansWhatDecidedItAndWhatMayBeDone(Grade grade) {
        String told = text(run(inputs(grade)), "Does each mode exist?");
        assertTrue(told.contains("What may be done: " + grade.advice() + "."), told);
        assertTrue(told.contains("Settling: passed (0.004, threshold 0.05). The rate moved by 0.4 %."), told);
        assertTrue(told.contains("Symmetry defect: for information (0.83)"), told);
    }

    @Test
    void withoutAVerdictTheReportWarnsThatNobodyJudged() {
        NodeResult result = run(Map.of("spectrum", ReportFixture.spectrum()));
        String summary = text(result, "Summary");
        assertTrue(summary.contains("Caution") || rows(result).contains("Caution"), summary);
        assertTrue(summary.contains("it was not judged whether these modes exist"), summary);
        assertTrue(text(result, "Forecast").contains("No forecast was handed to this report."));
        assertTrue(text(result, "Modes").contains("not judged"));
    }

    @Test
    void everyDoubtOfEveryInputAndTheStandingCautionsAreTold() {
        String doubts = text(run(inputs(Grade.STANDS)), "Doubts and cautions");
        for (String said : List.of("17 cells were interpolated.", "Frequencies above 10 Hz appear folded.",
                "Only one run was recorded.", "licensed engineer", "local codes", "extrapolation", "not exchangeable")) {
            assertTrue(doubts.contains(said), said + " in " + doubts);
        }
    }

    @Test
    void theTableHoldsEverySectionOfTheDocument() {
        NodeResult result = run(inputs(Grade.STANDS));
        String rows = rows(result);
        result.document().orElseThrow().sections().forEach(section -> assertTrue(rows.contains(section.heading())));
    }

    @Test
    void aForeignTableIsRefusedWithTheColumnThatIsMissing() {
        Map<String, Object> inputs = new HashMap<>(inputs(Grade.STANDS));
        inputs.put("scores", MemoryTable.builder(TableSchema.of(Column.text("method")), "other.csv").row("modal").build());
        SettingFault fault = assertThrows(SettingFault.class, () -> run(inputs));
        assertTrue(fault.getMessage().contains("other.csv: there is no column horizon"), fault.getMessage());
    }

    @Test
    void whatTheNodeSaysOfItselfIsShort() {
        List<String> summary = run(inputs(Grade.STANDS)).summary();
        assertEquals(3, summary.size());
        assertFalse(summary.stream().anyMatch(String::isBlank));
    }

    private static String text(NodeResult result, String section) {
        StringBuilder text = new StringBuilder();
        try (RowCursor cursor = ((Table) result.outputs().get("report")).open()) {
            while (cursor.next()) {
                if (cursor.text(0).equals(section)) {
                    text.append(cursor.text(2)).append('\n');
                }
            }
        }
        return text.toString();
    }

    private static String rows(NodeResult result) {
        StringBuilder text = new StringBuilder();
        try (RowCursor cursor = ((Table) result.outputs().get("report")).open()) {
            while (cursor.next()) {
                text.append(cursor.text(0)).append(' ').append(cursor.text(1)).append(' ').append(cursor.text(2))
                        .append('\n');
            }
        }
        return text.toString();
    }
}
