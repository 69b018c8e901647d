package org.modestead.nodes.judge;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.spectrum.ChannelGroup;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.spread.SamplingSpread;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.EigenvaluePlane;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.figure.GroupFigures;
import org.modestead.nodes.figure.ShapeFigures;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.TimeUnit;

/** Extracts growth rates, frequencies, damping and shapes from a fitted operator. */
public final class SpectrumExtractorNode implements Node {

    private static final String SHAPE_MODES = "shape-modes";
    private static final String SHAPE_DELAYS = "shape-delays";
    private static final int MODES_DRAWN = 3;

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("spectrum-extractor", "Spectrum Extractor", NodeDeclaration.Stage.JUDGE,
                "Extracts modes from the fitted operator: growth rate, frequency, damping, share of the signal and"
                        + " shape.",
                description(), List.of("Rowley, Mezić, Bagheri, Schlatter and Henningson, Spectral analysis of"
                        + " nonlinear flows, Journal of Fluid Mechanics 641:115, 2009", "Politis and Romano, in LePage and Billard"
                        + " (eds.), Exploring the Limits of Bootstrap, Wiley 1992; after Künsch, Annals of Statistics 17:1217, 1989"),
                List.of("modes", "eigenvalues", "frequency", "damping", "growth rate", "mode shape", "modal analysis"),
                List.of(Port.of("operator", PortType.OPERATOR, "Operator", "The fitted operator.")),
                List.of(Port.of("spectrum", PortType.SPECTRUM, "Spectrum", "Eigenvalues, eigenfunctions and weights."),
                        Port.table("modes", "Modes", "One row a mode, strongest first, with intervals; not judged yet, so the"
                                + " verdict is missing.",
                                ModeTable.SCHEMA),
                        Port.table("shapes", "Shapes", "How far and how far out of step each channel moves in each mode.",
                                ShapeTable.SCHEMA),
                        Port.table("groups", "Groups", "How each group of channels moves in each mode; empty when channels"
                                + " are not grouped.", GroupTable.SCHEMA)),
                settings(), 1);
    }

    private static String description() {
        return """
                Decomposes the compressed operator. An eigenvalue becomes a rate λ = σ + iω per time unit (for a step map \
                λ = log(μ)/step): σ is the growth rate, |ω|/2π the damped frequency in cycles per time unit, -σ/|λ| the \
                damping ratio, ln 2/σ the doubling time (negative: minus the halving time). A conjugate pair is one mode. \
                Modes are numbered by falling share of the signal's mean square.

                The shape tells by channel how far it moves in the mode and with what phase against the channel that \
                moves most. Phases of channels that hardly move mean nothing. Channels can be grouped, by the beginning of \
                their names or by a list; then each group's share of the mode and the phase of its mean are told as well.

                Intervals tell how far a figure would come out otherwise with another recording of the same kind: the fit is \
                repeated with whole runs drawn anew, or with blocks of neighbouring samples where there are fewer than eight \
                runs, and every mode is found again in each replicate. They hold the spread, and the bias that fades as \
                recordings grow, but not the bias that stays: measurement noise makes plain least squares report too much \
                damping however long the recording is. Correct the noise in the Operator Fitter to be rid of that. A mode \
                that four of five replicates do not show has no interval. Doubling time runs through infinity where the growth \
                rate may be zero: that end is missing.

                These are the modes of one projection. Whether they belong to the system is not known until the \
                Well-posedness Checker has looked. Do not report them before.

                With a step map, motion faster than half the sampling rate appears folded to a lower frequency and cannot \
                be told apart here. Cost: the cube of the rank, once, and once a replicate for the intervals.""";
    }

    private static List<Setting> settings() {
        List<Setting> all = new ArrayList<>(List.of(
                new Setting.Whole(new Setting.Common(SHAPE_MODES, "Modes in the shape table", "Tables", "Number of"
                        + " modes, strongest first, whose shapes, and those of groups, are written; 0 writes all."), "modes", 0,
                        100_000,
                        OptionalLong.of(0)),
                new Setting.Choice(new Setting.Common(SHAPE_DELAYS, "Delays in the shape table", "Tables", "Whether"
                        + " shapes are written for the newest sample of the state only or for the delayed ones too."),
                        List.of(
                        new Setting.Option("newest", "Newest sample", "One row a mode and channel."),
                        new Setting.Option("all", "All samples", "One row a mode, channel and delay.")), "newest")));
        all.addAll(GroupSettings.declared());
        all.addAll(IntervalSettings.declared());
        return all;
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        return GroupSettings.problems(settings);
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        FittedOperator operator = inputs.get("operator", FittedOperator.class);
        List<ChannelGroup> groups = GroupSettings.read(settings, operator.snapshots().channels().stream().map(Channel::name).toList());
        Spectrum spectrum = spectrum(operator, settings, context.progress());
        Preparation preparation = operator.snapshots().preparation();
        List<Figure> figures = new ArrayList<>();
        figures.add(EigenvaluePlane.figure(spectrum, Optional.empty()));
        figures.addAll(ShapeFigures.figures(spectrum, preparation, MODES_DRAWN));
        figures.addAll(GroupFigures.figures(spectrum, groups, MODES_DRAWN));
        int most = settings.whole(SHAPE_MODES);
        return new NodeResult(Map.of("spectrum", spectrum, "modes", ModeTable.of(spectrum, Optional.empty()), "shapes",
                ShapeTable.of(spectrum, preparation, most, settings.text(SHAPE_DELAYS).equals("all")),
                "groups", GroupTable.of(spectrum, groups, most)),
                figures, summary(spectrum), spectrum.doubts());
    }

    private static Spectrum spectrum(FittedOperator operator, Settings settings, Progress progress) {
        Spectrum plain = SpectrumExtractor.extract(operator, progress.part(0, 0.2));
        if (IntervalSettings.tooCostly(settings, operator.rank())) {
            return plain.with(plain.modes(), List.of(new Doubt("no-intervals", "No intervals were computed: at rank " + operator.rank()
                    + " the replicates take long; ask for them with 'always', or lower the rank.")));
        }
        return IntervalSettings.read(settings, operator.rank())
                .map(plan -> SamplingSpread.of(operator, plain, plan, progress.part(0.2, 1)).in(plain)).orElse(plain);
    }

    private static List<String> summary(Spectrum spectrum) {
        TimeUnit unit = new TimeUnit(spectrum.timeUnit());
        List<String> sentences = new ArrayList<>();
        sentences.add(spectrum.modes().size() + (spectrum.modes().size() == 1 ? " mode" : " modes") + " at rank "
                + spectrum.rank()
                + ", not judged yet.");
        spectrum.modes().stream().filter(mode -> !mode.constant()).findFirst()
                .ifPresent(mode -> sentences.add("The strongest " + describe(mode, unit) + "."));
        return sentences;
    }

    private static String describe(Mode mode, TimeUnit unit) {
        String motion = mode.oscillates() ? "oscillates at " + Digits.frequency(mode.frequency(), unit.frequency())
                + " with a damping ratio of " + Digits.percent(mode.dampingRatio())
                : (mode.rate().re() < 0 ? "decays" : "grows") + " at a rate of " + Digits.figure(mode.rate().re(),
                        unit.rate());
        return motion + " and carries " + Digits.percent(mode.energyShare()) + " of the signal";
    }
}
