package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;
import org.modestead.engine.wellposed.Grade;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Head;
import org.modestead.nodes.document.ReportDocument.Heading;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.figure.EigenvaluePlane;
import org.modestead.nodes.figure.ShapeFigures;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.Estimate;
import org.modestead.nodes.words.TimeUnit;

/** The modes in figures: table, complex plane, shapes. */
final class ModesSection {
    private static final int MOST_ROWS = 30;

    private ModesSection() {}

    static Section of(ReportSource source) {
        List<Block> blocks = new ArrayList<>();
        blocks.add(table(source));
        blocks.add(new Picture(EigenvaluePlane.figure(source.spectrum(), source.verdict())));
        blocks.add(new Heading("Mode shapes"));
        if (source.leading().isEmpty()) {
            blocks.add(new Paragraph("There is no mode but the constant part, so there are no shapes."));
        }
        ShapeFigures.figures(source.spectrum(), preparation(source), source.modes())
                .forEach(figure -> blocks.add(new Picture(figure)));
        return new Section("modes", "Modes", blocks);
    }

    private static Preparation preparation(ReportSource source) {
        return source.snapshots().map(Snapshots::preparation)
                .orElseGet(() -> Preparation.identity(source.spectrum().channels().size()));
    }

    private static Grid table(ReportSource source) {
        List<Mode> modes = source.spectrum().modes();
        List<List<String>> rows = modes.stream().limit(MOST_ROWS).map(mode -> row(source, mode)).toList();
        String rest = modes.size() > MOST_ROWS ? (modes.size() - MOST_ROWS) + " weaker modes are in the mode table's CSV"
                + " file. " : "";
        return new Grid("Modes by falling share of the signal", heads(source.unit()), rows,
                rest + "Frequency is the damped one, as it"
                + " is seen in the signal; the natural one is what it would be without damping. Amplitude is in prepared"
                + " units." + intervals(modes));
    }

    private static List<Head> heads(TimeUnit unit) {
        return List.of(new Head("Mode", true), new Head("Frequency [" + unit.frequency() + "]", true),
                new Head("Natural frequency [" + unit.frequency() + "]", true),
                new Head("Period [" + unit.name() + "]", true),
                new Head("Growth rate [" + unit.rate() + "]", true), new Head("Damping ratio", true),
                new Head("Doubles (+) or halves (−) in [" + unit.name() + "]", true), new Head("Amplitude", true),
                new Head("Share of the signal", true), new Head("Verdict", false));
    }

    private static List<String> row(ReportSource source, Mode mode) {
        String verdict = mode.constant() ? "constant, no evidence" : source.grade(mode).map(Grade::word).orElse("not"
                + " judged");
        boolean oscillates = mode.oscillates();
        return List.of(Integer.toString(mode.number()),
                oscillates ? estimate(mode, mode.frequency(), ModeIntervals::frequency).figure() : "none",
                oscillates ? Digits.figure(mode.naturalFrequency()) : "none",
                oscillates ? estimate(mode, mode.period(), ModeIntervals::period).figure() : "none",
                estimate(mode, mode.rate().re(), ModeIntervals::growth).figure(),
                oscillates ? estimate(mode, mode.dampingRatio(), ModeIntervals::dampingRatio).percent() : "none",
                estimate(mode, mode.doublingTime(), found -> found.doublingTime(mode.rate().re())).figure(),
                estimate(mode, mode.amplitude(), ModeIntervals::amplitude).figure(),
                Digits.percent(mode.energyShare()), verdict);
    }

    private static Estimate estimate(Mode mode, double value, Function<ModeIntervals, Interval> which) {
        return new Estimate(value, mode.intervals().map(which).orElse(Interval.UNKNOWN));
    }

    private static String intervals(List<Mode> modes) {
        return modes.stream().flatMap(mode -> mode.intervals().stream()).findFirst().map(found -> " In brackets where a figure may"
                + " lie, told by fits to resampled runs or blocks: " + Digits.percent(found.level()) + " intervals, which hold spread"
                + " but no bias that stays, such as the damping that noise feigns. An end that runs to infinity is not told.").orElse("");
    }
}
