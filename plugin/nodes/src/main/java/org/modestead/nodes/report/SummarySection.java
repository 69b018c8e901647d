package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Points;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.document.ReportDocument.Tone;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.VerdictWords;

/** The first page: what was fitted, what came out, what may be done with it. */
final class SummarySection {
    private static final double MOST_OF_SIGNAL = 0.95;

    private SummarySection() {}

    static Section of(ReportSource source, String notes) {
        List<Block> blocks = new ArrayList<>();
        if (!notes.isBlank()) {
            blocks.add(new Paragraph(notes.strip()));
        }
        blocks.add(new Paragraph(fitted(source)));
        blocks.add(new Paragraph(carrying(source)));
        blocks.add(verdict(source));
        blocks.add(new Points(source.leading().stream().map(mode -> headline(source, mode)).toList()));
        ForecastSkill.sentence(source).ifPresent(skill -> blocks.add(new Paragraph(skill)));
        return new Section("summary", "Summary", blocks);
    }

    /** Returns what the node says of itself: count, verdict and skill. */
    static List<String> sentences(ReportSource source) {
        List<String> sentences = new ArrayList<>();
        sentences.add(carrying(source));
        source.verdict().ifPresent(verdict -> sentences.add(VerdictWords.overall(verdict.overall().grade())));
        ForecastSkill.sentence(source).ifPresent(sentences::add);
        return sentences;
    }

    private static String fitted(ReportSource source) {
        String data = source.snapshots().map(SummarySection::data).orElse("");
        String method = source.operator().map(operator -> Sentence.of(operator.method()) + " Rank " + operator.rank() + " ("
                + operator.rankChoice() + ").").orElse("The spectrum has rank " + source.spectrum().rank()
                + "; what it was fitted with was not handed to this report.");
        return data.isEmpty() ? method : data + " " + method;
    }

    private static String data(Snapshots snapshots) {
        int samples = snapshots.training().stream().mapToInt(Run::samples).sum();
        return "Fitted to " + Sentence.count(samples, "sample") + " of"
                + " " + Sentence.count(snapshots.channels().size(), "channel")
                + " in " + Sentence.count(snapshots.training().size(), "training run") + "; "
                + (snapshots.holdout().isEmpty() ? "nothing was held"
                + " out." : Sentence.count(snapshots.holdout().size(), "part")
                + " held out to judge.");
    }

    private static String carrying(ReportSource source) {
        List<Mode> modes = source.spectrum().modes();
        double share = 0;
        int carrying = 0;
        while (carrying < modes.size() && share < MOST_OF_SIGNAL) {
            share += modes.get(carrying).energyShare();
            carrying++;
        }
        boolean constant = modes.stream().limit(carrying).anyMatch(Mode::constant);
        return carrying + " of " + Sentence.count(modes.size(), "mode") + (carrying == 1 ? " carries " : " carry ")
                + Digits.percent(share) + " of the signal" + (constant ? ", the constant part among them." : ".");
    }

    private static Callout verdict(ReportSource source) {
        return source.verdict().map(SummarySection::told).orElseGet(() -> new Callout(Tone.CAUTION,
                "it was not judged whether these modes exist", List.of("The figures below may be the weights of one"
                + " projection"
                + " only. Connect a Well-posedness Checker before any of them is reported as a mode.")));
    }

    private static Callout told(Verdict verdict) {
        Grade grade = verdict.overall().grade();
        List<String> same = verdict.modes().stream().filter(mode -> mode.counts() && mode.grade() == grade)
                .map(mode -> Integer.toString(mode.mode())).toList();
        if (same.isEmpty()) {
            return new Callout(ExistenceSection.tone(grade), VerdictWords.headline(grade),
                    List.of(Sentence.of(verdict.overall().sentence()), VerdictWords.advice(grade)));
        }
        long counted = verdict.modes().stream().filter(ModeVerdict::counts).count();
        return new Callout(ExistenceSection.tone(grade), VerdictWords.headline(grade), List.of(VerdictWords.overall(grade),
                "Of " + Sentence.count(counted, "mode") + (counted == 1 ? " that carries" : " that carry")
                + " a stated share of the signal " + same.size()
                        + (same.size() == 1 ? " has" : " have") + " this verdict: "
                        + (same.size() == 1 ? "mode " : "modes ") + String.join(", ", same) + ".",
                        VerdictWords.advice(grade)));
    }

    private static String headline(ReportSource source, Mode mode) {
        Optional<Grade> grade = source.grade(mode);
        return "Mode " + mode.number() + grade.map(g -> " " + VerdictWords.verb(g) + " (" + g.advice() + ")").orElse("")
                + ": "
                + ModeWords.headline(mode, source.unit()) + "; " + Digits.percent(mode.energyShare()) + " of the signal.";
    }
}
