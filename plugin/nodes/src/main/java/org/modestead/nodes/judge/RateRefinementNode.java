package org.modestead.nodes.judge;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.modestead.engine.Doubt;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.refine.RefinedModes;
import org.modestead.engine.refine.RefinedRates;
import org.modestead.engine.refine.RefinedRates.Convergence;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.TimeUnit;

/** Refines rates by fitting a sum of exponentials to the samples themselves, at the recorded times. */
public final class RateRefinementNode implements Node {

    private static final TableSchema FIT = TableSchema.of(Column.text("item"), Column.text("value"));

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("rate-refinement", "Rate Refinement", NodeDeclaration.Stage.JUDGE,
                "Refines growth rates and frequencies by fitting a sum of exponentials to the samples themselves, at even or uneven"
                        + " times.",
                description(), List.of(
                        "Golub and Pereyra, The differentiation of pseudo-inverses and nonlinear least squares problems whose"
                                + " variables separate, SIAM Journal on Numerical Analysis 10:413, 1973",
                        "Askham and Kutz, Variable projection methods for an optimized dynamic mode decomposition, SIAM Journal on"
                                + " Applied Dynamical Systems 17:380, 2018"),
                List.of("variable projection", "optimised fit", "exponentials", "uneven times", "standard error", "damping", "nonlinear"
                        + " least squares"),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "Prepared runs; the training part is fitted, delays"
                        + " play no part."),
                        Port.optional("spectrum", PortType.SPECTRUM, "Spectrum", "Modes whose rates the search starts from.")),
                List.of(Port.table("modes", "Modes", "Refined modes, strongest first, with intervals; not judged, so the verdict is"
                        + " missing.", ModeTable.SCHEMA),
                        Port.table("fit", "Fit", "How well the sum of exponentials meets the samples and how the search ended.", FIT)),
                RefinementSettings.declared(), 1);
    }

    private static String description() {
        return """
                A fit of steps or pieces is a detour: noise in the states bends its rates. Here the signal of every run and channel \
                is written as a sum of exponentials, steady, growing or fading, with rates that all runs share and sizes of their \
                own, and the squared misfit to all samples is made as small as it gets. For any rates the best sizes follow at once, \
                so that the search runs over the rates alone. Times may be uneven; runs of greater weight count more.

                The search finds the minimum next to its start. Start from the spectrum of a fitted operator, and add periods that \
                are known from elsewhere or rates that it missed. Compare the residual with the noise you expect: if it is much larger, \
                terms are missing.

                The intervals are those of least squares, for white noise and the right number of terms. They say nothing of whether \
                the modes exist: the Well-posedness Checker judges the operator, not this fit. Do not use it for motion that is \
                no sum of exponentials, or whose inputs matter.

                Cost: samples times channels times the square of the number of terms, for each of some ten steps.""";
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Snapshots snapshots = inputs.get("snapshots", Snapshots.class);
        Optional<Spectrum> spectrum = inputs.find("spectrum", Spectrum.class);
        RefinementSettings.Start start = RefinementSettings.start(settings, spectrum);
        RefinedModes refined = RefinedModes.of(start.model(), snapshots.training(),
                settings.text(RefinementSettings.TIME_ZERO).equals("run-start"), settings.number(RefinementSettings.LEVEL),
                context.progress());
        List<Doubt> doubts = new ArrayList<>(start.doubts());
        doubts.addAll(doubts(refined.rates(), snapshots));
        return new NodeResult(Map.of("modes", ModeTable.of(refined.modes(), Optional.empty()), "fit", fit(refined)), List.of(),
                summary(refined, snapshots), doubts);
    }

    private static MemoryTable fit(RefinedModes refined) {
        RefinedRates rates = refined.rates();
        MemoryTable.Builder rows = MemoryTable.builder(FIT, "refinement");
        rows.row("runs", Integer.toString(refined.runs().size()));
        rows.row("terms", Integer.toString(rates.model().terms().size()));
        rows.row("residual sum", Double.toString(rates.residualSum()));
        rows.row("residual deviation", Double.toString(rates.residualDeviation()));
        rows.row("degrees of freedom", Integer.toString(rates.degreesOfFreedom()));
        rows.row("steps", Integer.toString(rates.iterations()));
        rows.row("search", words(rates.convergence()));
        rows.row("distance from the minimum", Digits.cell(rates.offset()) + " standard errors");
        return rows.build();
    }

    private static String words(Convergence convergence) {
        return switch (convergence) {
            case CONVERGED -> "converged";
            case STALLED -> "stalled";
            case UNFINISHED -> "unfinished";
        };
    }

    private static List<Doubt> doubts(RefinedRates rates, Snapshots snapshots) {
        List<Doubt> doubts = new ArrayList<>();
        if (rates.convergence() != Convergence.CONVERGED) {
            doubts.add(new Doubt("refinement-not-converged", String.format(Locale.ROOT, "The search %s after %d steps, %.2g standard"
                    + " errors from the minimum: start from other rates or fewer terms.", rates.convergence() == Convergence.STALLED
                    ? "came to no better rates" : "was not finished", rates.iterations(), rates.offset())));
        }
        boolean undecided = IntStream.range(0, rates.growthErrors().length)
                .anyMatch(k -> Double.isNaN(rates.growthErrors()[k]) || Double.isNaN(rates.angularErrors()[k]));
        if (undecided) {
            doubts.add(new Doubt("rates-undecided", "The samples do not decide some of the rates: terms coincide or fade at once, so those"
                    + " have no interval. Leave them out."));
        }
        if (!snapshots.inputs().isEmpty()) {
            doubts.add(new Doubt("inputs-not-separated", "A sum of exponentials knows nothing of inputs: what they drive is fitted as if it"
                    + " were free motion."));
        }
        return doubts;
    }

    private static List<String> summary(RefinedModes refined, Snapshots snapshots) {
        TimeUnit unit = new TimeUnit(snapshots.time().unit());
        List<String> sentences = new ArrayList<>();
        sentences.add(refined.modes().size() + (refined.modes().size() == 1 ? " term" : " terms") + " fitted to "
                + refined.runs().size() + (refined.runs().size() == 1 ? " run" : " runs") + "; the samples lie "
                + Digits.figure(refined.rates().residualDeviation()) + " (prepared units, root mean square) off.");
        refined.modes().stream().filter(mode -> !mode.constant()).findFirst().ifPresent(mode -> sentences.add("The strongest "
                + strongest(mode, unit) + "."));
        return sentences;
    }

    private static String strongest(Mode mode, TimeUnit unit) {
        return mode.oscillates() ? "oscillates at " + Digits.frequency(mode.frequency(), unit.frequency()) + " with a damping ratio of "
                + Digits.percent(mode.dampingRatio())
                : (mode.rate().re() < 0 ? "decays" : "grows") + " at a rate of " + Digits.figure(mode.rate().re(), unit.rate());
    }
}
