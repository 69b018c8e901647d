package org.modestead.nodes.modal;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.modestead.engine.Doubt;
import org.modestead.engine.spectrum.ComparisonLimits;
import org.modestead.engine.spectrum.ShapeComparison;
import org.modestead.engine.spectrum.ShapeComparison.Pair;
import org.modestead.engine.spectrum.ShapeScaling;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.AssuranceFigure;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.TimeUnit;

/** Holds the modes of two recordings, or of two fits, against each other by shape and frequency. */
public final class ShapeComparisonNode implements Node {

    private static final String A = "spectrum-a";
    private static final String B = "spectrum-b";
    private static final String UNITS = "shape-units";
    private static final String LEAST = "least-assurance";
    private static final String CHANGE = "largest-change";
    private static final String MODES = "modes";
    private static final double ALIKE = 0.9;

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("shape-comparison", "Shape Comparison", NodeDeclaration.Stage.JUDGE,
                "Compares the mode shapes of two recordings, or of one with itself, and pairs the modes.",
                description(), List.of(
                        "Allemang and Brown, A correlation coefficient for modal vector analysis, Proceedings of the 1st"
                                + " International Modal Analysis Conference, 1982",
                        "Kuhn, The Hungarian method for the assignment problem, Naval Research Logistics Quarterly 2:83, 1955"),
                List.of("modal assurance criterion", "MAC", "mode shape", "mode pairing", "model correlation", "change detection"),
                List.of(Port.of(A, PortType.SPECTRUM, "Spectrum a", "Modes of one recording or fit."),
                        Port.optional(B, PortType.SPECTRUM, "Spectrum b", "Modes to compare with; when not connected spectrum a is"
                                + " compared with itself.")),
                List.of(Port.table("assurance", "Assurance", "Every mode of a with every mode of b: likeness of their shapes, change of"
                        + " frequency, and which are taken for the same mode.", AssuranceTable.SCHEMA)),
                settings(), 1);
    }

    private static String description() {
        return """
                The modal assurance of two shapes is |a* b|²/((a* a)(b* b)): 1 when they are proportional, 0 when they have \
                nothing in common, whatever complex factor either carries. The node takes the shapes of the newest sample \
                over the channels that both spectra name alike; earlier delay samples are left out.

                Two modes may be the same when their shapes are alike enough and their frequencies near enough; among those, \
                pairs are chosen so that the sum of the unlikeness and the relative changes of frequency is smallest. Modes that \
                do not oscillate are held against each other by their growth rates.

                Use it between two days, two operating points or two fits: what a mode keeps and what it changes tells wear, \
                icing or a loose joint from a mere change of load. With spectrum a alone it tells which modes these channels \
                cannot tell apart by shape: high figures beside the diagonal.

                Few channels make everything alike: with one channel the assurance is always 1. Channels of different \
                quantities must be brought to a common size first, as the default does. Cost: modes squared times channels.""";
    }

    private static List<Setting> settings() {
        return List.of(
                new Setting.Choice(new Common(UNITS, "Units of shapes", "Shapes", "What a component of a shape counts in."), List.of(
                        new Option("prepared", "Scaled", "Recorded units divided, channel by channel, by the geometric mean of the"
                                + " scales both recordings were prepared with: for channels of different quantities."),
                        new Option("recorded", "As recorded", "Recorded units: where all channels measure the same quantity.")), "prepared"),
                new Setting.Number(new Common(LEAST, "Least assurance of a pair", "Pairs", "Modal assurance from which on two modes may"
                        + " be the same. Figures above 0.9 are commonly read as alike, below 0.6 as different."), "", 0, true, 1,
                        OptionalDouble.of(0.8)),
                new Setting.Number(new Common(CHANGE, "Largest change of frequency", "Pairs", "Relative change of the frequency, or of the"
                        + " growth rate of what does not oscillate, up to which two modes may be the same."), "", 0, true, 1,
                        OptionalDouble.of(0.2)),
                new Setting.Whole(new Common(MODES, "Modes compared", "Pairs", "Number of modes of each spectrum, strongest first; the"
                        + " constant does not count."), "modes", 1, 1000, OptionalLong.of(12)));
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Spectrum a = inputs.get(A, Spectrum.class);
        Optional<Spectrum> b = inputs.find(B, Spectrum.class);
        ShapeScaling scaling = settings.text(UNITS).equals("recorded") ? ShapeScaling.RECORDED : ShapeScaling.PREPARED;
        ShapeComparison comparison = ShapeComparison.of(a, b.orElse(a), scaling,
                new ComparisonLimits(settings.number(LEAST), settings.number(CHANGE)), settings.whole(MODES));
        TimeUnit unit = new TimeUnit(a.timeUnit());
        return new NodeResult(Map.of("assurance", AssuranceTable.of(comparison)),
                comparison.pairs().isEmpty() ? List.of() : List.of(AssuranceFigure.figure(comparison, b.isEmpty())),
                b.isEmpty() ? alike(comparison, unit) : paired(comparison, unit), doubts(comparison));
    }

    /** Which modes of one spectrum look alike. */
    private static List<String> alike(ShapeComparison comparison, TimeUnit unit) {
        List<Pair> pairs = comparison.pairs().stream().filter(pair -> pair.a().number() < pair.b().number())
                .sorted(Comparator.comparingDouble(Pair::assurance).reversed()).toList();
        List<String> sentences = new ArrayList<>();
        sentences.add(pairs.isEmpty() ? "There are fewer than two modes to compare." : "Of different modes, " + two(pairs.get(0), unit)
                + " are the most alike: modal assurance " + Digits.figure(pairs.get(0).assurance()) + ".");
        long many = pairs.stream().filter(pair -> pair.assurance() >= ALIKE).count();
        if (many > 0) {
            sentences.add(Sentence.count(many, "pair") + " of modes reach " + ALIKE + ": these channels hardly tell them apart by shape.");
        }
        return sentences;
    }

    private static List<String> paired(ShapeComparison comparison, TimeUnit unit) {
        List<Pair> pairs = comparison.pairs().stream().filter(Pair::paired).toList();
        List<String> sentences = new ArrayList<>();
        sentences.add(pairs.isEmpty() ? "No mode of a was found again in b." : Sentence.count(pairs.size(), "mode")
                + " of a found again in b.");
        pairs.stream().filter(pair -> pair.a().oscillates()).forEach(pair -> sentences.add("Mode " + pair.a().number() + " of a ("
                + ModeWords.cycle(pair.a(), unit) + ") is mode " + pair.b().number() + " of b: frequency "
                + (pair.frequencyChange() < 0 ? "lower" : "higher") + " by " + Digits.percent(Math.abs(pair.frequencyChange()))
                + ", modal assurance " + Digits.figure(pair.assurance()) + "."));
        return sentences;
    }

    private static String two(Pair pair, TimeUnit unit) {
        return "mode " + pair.a().number() + " (" + ModeWords.headline(pair.a(), unit) + ") and mode " + pair.b().number() + " ("
                + ModeWords.headline(pair.b(), unit) + ")";
    }

    private static List<Doubt> doubts(ShapeComparison comparison) {
        List<Doubt> doubts = new ArrayList<>();
        if (!comparison.leftOut().isEmpty()) {
            doubts.add(new Doubt("channels-left-out", "Only one of the spectra has " + String.join(", ", comparison.leftOut())
                    + "; shapes were compared over " + String.join(", ", comparison.channels()) + "."));
        }
        if (comparison.channels().size() == 1) {
            doubts.add(new Doubt("one-channel", "Over one channel, " + comparison.channels().get(0)
                    + ", all shapes are alike: modes were paired by frequency alone."));
        }
        return doubts;
    }
}
