package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.wellposed.Grade;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Points;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.Sentence;

/** What to do next, mode by mode and on the whole. */
final class NextSection {

    private NextSection() {}

    static Section of(ReportSource source) {
        List<String> steps = new ArrayList<>();
        source.leading().forEach(mode -> source.verdict().flatMap(verdict -> verdict.of(mode.number())).ifPresent(judged -> steps.add(Sentence.of("Mode "
                + mode.number() + " (" + ModeWords.headline(mode, source.unit()) + "): " + judged.advice()))));
        if (source.verdict().isEmpty()) {
            steps.add("Have a Well-posedness Checker judge these modes before any of them is reported.");
        }
        if (source.snapshots().map(Snapshots::holdout).filter(List::isEmpty).isPresent()) {
            steps.add("Hold out runs that the fit does not see, or record further ones: nothing here was tried on data of its own.");
        }
        source.leading().stream().filter(mode -> mode.rate().re() > 0 && carries(source, mode)).findFirst().ifPresent(mode -> steps.add("Mode "
                + mode.number() + " grows: find out at once whether it is real, by its recordings and by independent measurement, before the plant is"
                + " run there again."));
        Extrapolation.sentence(source).ifPresent(sentence -> steps.add(sentence + " Do not decide by that part of it."));
        if (source.verdict().map(verdict -> verdict.overall().grade()).filter(NextSection::found).isPresent()) {
            steps.add("Keep the fit with a Model Writer, and let a Mode Watch tell when later recordings differ.");
        }
        return new Section("next", "What to do next", List.of(new Paragraph("What these recordings allow, in the order of the modes. Whoever decides"
                + " holds it against independent measurements and against the limits of the equipment first."), new Points(steps)));
    }

    private static boolean carries(ReportSource source, Mode mode) {
        return source.verdict().flatMap(verdict -> verdict.of(mode.number())).map(verdict -> verdict.grade() != Grade.ABSENT).orElse(true);
    }

    private static boolean found(Grade grade) {
        return grade == Grade.STANDS || grade == Grade.SETTLES;
    }
}
