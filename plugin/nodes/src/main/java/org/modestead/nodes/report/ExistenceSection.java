package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.wellposed.Finding;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Head;
import org.modestead.nodes.document.ReportDocument.Heading;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Points;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.document.ReportDocument.Tone;
import org.modestead.nodes.figure.LadderFigures;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.VerdictWords;

/** Whether each mode exists, and what decided it. */
final class ExistenceSection {
    private static final int MOST_FINDINGS = 120;

    private ExistenceSection() {}

    static Section of(ReportSource source) {
        List<Block> blocks = source.verdict().map(verdict -> judged(source, verdict))
                .orElseGet(() -> List.of(new Callout(Tone.CAUTION, "not judged",
                List.of("No verdict was handed to this report."))));
        return new Section("existence", "Does each mode exist?", blocks);
    }

    static Tone tone(Grade grade) {
        return switch (grade) {
            case STANDS -> Tone.FIRM;
            case SETTLES -> Tone.NOTE;
            case UNDECIDED, DRIFTS -> Tone.CAUTION;
            case ABSENT -> Tone.STOP;
        };
    }

    private static List<Block> judged(ReportSource source, Verdict verdict) {
        List<Block> blocks = new ArrayList<>();
        List<Finding> whole = of(verdict, 0);
        if (!whole.isEmpty()) {
            blocks.add(new Heading("The operator as a whole"));
            blocks.add(new Points(whole.stream().map(ExistenceSection::told).toList()));
        }
        source.leading().forEach(mode -> verdict.of(mode.number())
                .ifPresent(one -> blocks.addAll(mode(source, verdict, mode, one))));
        List<Block> figures = LadderFigures.figures(source.spectrum(), verdict).stream().<Block>map(Picture::new).toList();
        if (!figures.isEmpty()) {
            blocks.add(new Heading("What becomes of the modes as functions are added"));
            blocks.addAll(figures);
        }
        blocks.add(new Heading("All findings"));
        blocks.add(table(verdict));
        return blocks;
    }

    private static List<Block> mode(ReportSource source, Verdict verdict, Mode mode, ModeVerdict one) {
        List<Block> blocks = new ArrayList<>();
        blocks.add(new Heading("Mode " + mode.number() + " (" + ModeWords.headline(mode, source.unit()) + "): "
                + one.grade().word()));
        List<Finding> deciding = of(verdict, mode.number()).stream()
                .filter(finding -> one.decidedBy().contains(finding.check())).toList();
        String reasons = deciding.isEmpty() ? Sentence.of(one.sentence()) + " " : "";
        blocks.add(new Paragraph(VerdictWords.meaning(one.grade()) + " " + reasons + VerdictWords.advice(one)));
        if (!deciding.isEmpty()) {
            blocks.add(new Paragraph("Decided by:"));
            blocks.add(new Points(deciding.stream().map(ExistenceSection::told).toList()));
        }
        return blocks;
    }

    private static List<Finding> of(Verdict verdict, int mode) {
        return verdict.findings().stream().filter(finding -> finding.mode() == mode).toList();
    }

    private static String told(Finding finding) {
        String threshold = Double.isNaN(finding.threshold()) ? "" : ", threshold " + Digits.cell(finding.threshold());
        String value = Double.isNaN(finding.value()) ? "" : " (" + Digits.cell(finding.value()) + threshold + ")";
        return name(finding) + ": " + outcome(finding) + value + ". " + Sentence.of(finding.sentence());
    }

    private static String name(Finding finding) {
        return Sentence.capital(finding.check().replace('-', ' '));
    }

    private static String outcome(Finding finding) {
        if (Double.isNaN(finding.threshold())) {
            return "for information";
        }
        return finding.passed() ? "passed" : "failed";
    }

    private static Grid table(Verdict verdict) {
        List<Finding> findings = verdict.findings();
        List<List<String>> rows = findings.stream().limit(MOST_FINDINGS).map(finding -> List.of(
                finding.mode() == 0 ? "all" : Integer.toString(finding.mode()), name(finding), Digits.cell(finding.value()),
                Digits.cell(finding.threshold()), outcome(finding), Sentence.of(finding.sentence()))).toList();
        String rest = findings.size() > MOST_FINDINGS ? (findings.size() - MOST_FINDINGS)
                + " more are in the finding table's CSV file."
                : "";
        return new Grid("Every check with its figure", List.of(new Head("Mode", false), new Head("Check", false),
                new Head("Value", true),
                new Head("Threshold", true), new Head("Outcome", false), new Head("Finding", false)), rows, rest);
    }
}
