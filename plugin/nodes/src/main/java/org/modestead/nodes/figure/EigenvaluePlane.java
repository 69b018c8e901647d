package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.TimeUnit;

/**
 * The modes in the complex plane: growth rate across, frequency upwards. A conjugate pair is one point (its upper
 * half), and the verdict is told by shape and filling.
 */
public final class EigenvaluePlane {
    private static final double CARRIES = 1e-3;
    private static final double REACH = 2;

    private EigenvaluePlane() {}

    /**
     * Draws every mode with a finite rate, except weak ones (below 0.1 % of the signal) that would stretch the picture
     * beyond twice the range of the others; the caption says how many those are.
     *
     * @param spectrum the modes
     * @param verdict what may be said of them, when it was judged
     * @return kind {@link Figure.Kind#COMPLEX_PLANE}, selection keys {@code mode:<number>}
     */
    public static Figure figure(Spectrum spectrum, Optional<Verdict> verdict) {
        TimeUnit unit = new TimeUnit(spectrum.timeUnit());
        List<Mode> shown = shown(spectrum.modes());
        List<Figure.Layer> layers = new ArrayList<>();
        layers.add(new Figure.Rule("zero growth", "", true, 0));
        shown.stream().filter(EigenvaluePlane::carries).forEach(mode -> layers.addAll(bars(mode)));
        shown.stream().sorted(Comparator.comparing(mode -> order(mode, verdict)))
                .forEach(mode -> layers.add(point(mode, verdict)));
        int hidden = spectrum.modes().size() - shown.size();
        return new Figure("eigenvalues", Figure.Kind.COMPLEX_PLANE, "Eigenvalues in the complex plane",
                caption(spectrum, verdict, hidden),
                Axes.growth(unit), Axes.frequency(unit), layers);
    }

    private static List<Mode> shown(List<Mode> modes) {
        List<Mode> finite = modes.stream().filter(mode -> Double.isFinite(mode.rate().abs())).toList();
        double growth = reach(finite, true);
        double frequency = reach(finite, false);
        return finite.stream().filter(mode -> carries(mode)
                || Math.abs(mode.rate().re()) <= growth && mode.frequency() <= frequency).toList();
    }

    private static double reach(List<Mode> modes, boolean growth) {
        double largest = modes.stream().filter(EigenvaluePlane::carries)
                .mapToDouble(mode -> growth ? Math.abs(mode.rate().re()) : mode.frequency()).max().orElse(0);
        return largest == 0 ? Double.POSITIVE_INFINITY : REACH * largest;
    }

    private static boolean carries(Mode mode) {
        return mode.energyShare() >= CARRIES;
    }

    private static int order(Mode mode, Optional<Verdict> verdict) {
        return mode.constant() ? -1 : grade(mode, verdict).map(Grade::ordinal).orElse(0);
    }

    private static Optional<Grade> grade(Mode mode, Optional<Verdict> verdict) {
        return verdict.flatMap(v -> v.of(mode.number())).map(ModeVerdict::grade);
    }

    private static Figure.Points point(Mode mode, Optional<Verdict> verdict) {
        Optional<Grade> grade = mode.constant() ? Optional.empty() : grade(mode, verdict);
        String name = mode.constant() ? "constant (no evidence)" : grade.map(Grade::word).orElse("mode");
        String label = mode.constant() ? "" : Integer.toString(mode.number());
        Figure.Emphasis emphasis = mode.constant() ? Figure.Emphasis.FAINT
                : grade.map(VerdictMarks::emphasis).orElse(Figure.Emphasis.STRONG);
        Figure.Mark mark = mode.constant() ? Figure.Mark.RING : grade.map(VerdictMarks::mark).orElse(Figure.Mark.DISC);
        return new Figure.Points(name, "mode:" + mode.number(), new double[] {mode.rate().re()},
                new double[] {mode.frequency()},
                List.of(label), emphasis, mark);
    }

    /** One bar across, for the growth rate, and one upwards, for the frequency. */
    private static List<Figure.Layer> bars(Mode mode) {
        return mode.intervals().map(found -> {
            Interval growth = found.growth();
            Interval frequency = found.frequency();
            String selection = "mode:" + mode.number();
            return List.<Figure.Layer>of(
                    new Figure.Line("interval", selection, new double[] {growth.low(), growth.high()},
                            new double[] {mode.frequency(), mode.frequency()}, Figure.Emphasis.NORMAL),
                    new Figure.Line("interval", selection, new double[] {mode.rate().re(), mode.rate().re()},
                            new double[] {frequency.low(), frequency.high()}, Figure.Emphasis.NORMAL));
        }).orElse(List.of());
    }

    private static String caption(Spectrum spectrum, Optional<Verdict> verdict, int hidden) {
        String shapes = verdict.isPresent() ? " Shape and filling of a mark tell the verdict." : "";
        String bars = spectrum.modes().stream().flatMap(mode -> mode.intervals().stream()).findFirst()
                .map(found -> " Bars are " + Digits.percent(found.level()) + " intervals.").orElse("");
        String left = hidden == 0 ? "" : " Left out: " + hidden + (hidden == 1 ? " mode" : " modes")
                + " with less than 0.1 % of the signal far outside this range, or with an infinite rate.";
        return "Each mark is a mode, numbered by falling share of the signal; a conjugate pair is one mark. Left of the"
                + " line of zero"
                + " growth a mode decays, right of it it grows." + shapes + bars + left;
    }
}
