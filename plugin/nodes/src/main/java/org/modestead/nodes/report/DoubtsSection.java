package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.Doubt;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Heading;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Points;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.document.ReportDocument.Tone;
import org.modestead.nodes.words.Cautions;
import org.modestead.nodes.words.Sentence;

/** What a reader must know before relying on anything above. */
final class DoubtsSection {
    private DoubtsSection() {}

    static Section of(List<Doubt> doubts) {
        List<Block> blocks = new ArrayList<>();
        blocks.add(new Heading("Doubts raised by this work"));
        blocks.add(doubts.isEmpty() ? new Paragraph("None of the steps raised a doubt.")
                : new Points(doubts.stream().map(DoubtsSection::told).distinct().toList()));
        blocks.add(new Heading("Cautions that always hold"));
        blocks.add(new Callout(Tone.CAUTION, "before these results are used", Cautions.STANDING));
        return new Section("doubts", "Doubts and cautions", blocks);
    }

    static String told(Doubt doubt) {
        return Sentence.of(doubt.sentence());
    }
}
