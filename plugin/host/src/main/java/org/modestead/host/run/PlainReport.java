package org.modestead.host.run;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.Doubt;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Points;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.document.ReportDocument.Tone;

/** The report of a run whose workflow makes none itself: what each step says, doubts and figures, in file order. */
final class PlainReport {

    private PlainReport() {}

    static ReportDocument of(RunResult result) {
        List<Section> sections = new ArrayList<>();
        for (PlannedStep step : result.plan().steps()) {
            sections.add(new Section("step-" + step.id(), step.declaration().title() + " (" + step.id() + ")",
                    blocks(step, result.outcomes().get(step.id()))));
        }
        return new ReportDocument(result.plan().workflow().name(), "Results of " + result.plan().workflow().fileName(), sections);
    }

    private static List<Block> blocks(PlannedStep step, StepOutcome outcome) {
        List<Block> blocks = new ArrayList<>();
        if (outcome instanceof StepOutcome.Done done) {
            NodeResult result = done.result();
            blocks.add(new Paragraph(step.declaration().purpose()));
            if (!result.summary().isEmpty()) {
                blocks.add(new Points(result.summary()));
            }
            if (!result.doubts().isEmpty()) {
                blocks.add(new Callout(Tone.CAUTION, "What a reader must know",
                        result.doubts().stream().map(Doubt::sentence).toList()));
            }
            result.figures().forEach(figure -> blocks.add(new Picture(figure)));
        } else {
            String why = outcome instanceof StepOutcome.Failed failed ? failed.sentence()
                    : outcome instanceof StepOutcome.Skipped skipped
                            ? "It was left out because step " + skipped.because() + " gave no result." : "It gave no result.";
            blocks.add(new Callout(Tone.STOP, "No result", List.of(why)));
        }
        return blocks;
    }
}
