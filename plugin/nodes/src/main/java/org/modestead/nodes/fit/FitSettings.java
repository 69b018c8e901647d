package org.modestead.nodes.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.ExtrapolatedEstimator;
import org.modestead.engine.operator.InputUse;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.operator.Structure;
import org.modestead.engine.operator.StructuredEstimator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;

/** Settings of the Operator Fitter, and what they mean for the engine. */
final class FitSettings {

    static final String ESTIMATOR = "estimator";
    static final String NOISE_CORRECTION = "noise-correction";
    private static final String EXTRAPOLATION = "extrapolation";
    static final String INPUTS = "inputs";
    static final String STRUCTURE = "structure";
    static final String NONE = "none";
    static final String DICTIONARY = "dictionary";
    static final String PERIODS = "periods";
    static final String RANK_RULE = "rank-rule";
    static final String RIDGE = "ridge";
    static final String SEGMENT = "segment-samples";

    private static final String[] GENERATORS = {"generator", "scaled-generator"};
    private static final double LARGEST = Double.MAX_VALUE;

    private FitSettings() {}

    /** Returns the settings in dialog order. */
    static List<Setting> declared() {
        List<Setting> all = new ArrayList<>();
        all.add(estimator());
        all.add(noiseCorrection());
        all.add(inputs());
        all.add(structure());
        all.addAll(dictionarySettings());
        all.addAll(kernelSettings());
        all.addAll(rankSettings());
        return all;
    }

    private static Setting estimator() {
        return new Setting.Choice(new Common(ESTIMATOR, "Operator", "Operator", "Which operator is fitted, and through"
                + " which functions."), List.of(
                new Option("linear", "Step map, linear", "One step of the state by least squares, in the (delay)"
                        + " coordinates themselves; needs an even step."),
                new Option(DICTIONARY, "Step map, dictionary", "One step of named functions of the state by least"
                        + " squares; needs an even step."),
                new Option("kernel-step", "Step map, kernel", "One step in the space of the connected kernel; needs an"
                        + " even step."),
                new Option("generator", "Generator", "The rate of change in continuous time, in the space of the"
                        + " connected kernel, from averages along pieces of runs; uneven steps are welcome and no"
                        + " derivative is taken."),
                new Option("scaled-generator", "Scaled generator", "As the generator, with states contracted towards"
                        + " zero: this makes the operator compact for more flows, but its eigenvalues are only near"
                        + " those of the generator.")),
                "linear");
    }

    private static Setting noiseCorrection() {
        return new Setting.Choice(new Common(NOISE_CORRECTION, "Noise correction", "Operator", "Noise makes least squares"
                + " report too much damping, the more the weaker the signal. A correction takes that bias away where noise"
                + " is white and of the same size in all prepared channels; estimates scatter a little more. It depends on"
                + " the rank: a rank above that of the signal fits noise. Needs a ridge of 0."), List.of(
                new Option("none", "None", "Least squares: right for clean samples."),
                new Option("total-least-squares", "Total least squares", "Noise in the earlier and in the later state alike"
                        + " is projected out. Linear operator only."),
                new Option("forward-backward", "Forward and backward", "The mean of the step forward and the inverted step"
                        + " backward: noise shrinks both alike, so the shrinkage cancels. Linear operator only."),
                new Option(EXTRAPOLATION, "Extrapolation", "The level of the noise is measured, as much again is added, and what"
                        + " that changes in the averages is taken off. For every operator; channels may carry noise of different"
                        + " size. Not beside separated inputs.")),
                "none");
    }

    private static Setting inputs() {
        return new Setting.Choice(new Common(INPUTS, "Inputs", "Operator", "What is made of the input columns of the"
                + " snapshots, where there are any. Separated, the modes are those of the motion left to itself, with"
                + " inputs resting at their mean over training, and what drives it adds no mode of its own. Inputs count as"
                + " free of noise, must vary independently of the state, and act within the delay depth: choose it long enough"
                + " for dead times."), List.of(
                new Option("held", "Separate, held", "Each input keeps its value until the next sample: set points,"
                        + " switched valves. Step maps, linear or dictionary, only."),
                new Option("straight", "Separate, straight", "Each input runs straight to the next sample: loads and"
                        + " weather. Not where a controller sets the input from the state of the same moment. Step maps,"
                        + " linear or dictionary, only."),
                new Option("leave-in", "Leave in", "Inputs are not told to the fit: what they cause counts as free motion"
                        + " and may appear as modes.")),
                "held");
    }

    private static Setting structure() {
        return new Setting.Choice(new Common(STRUCTURE, "Structure", "Operator", "What is known of the motion beforehand and"
                + " imposed on the operator, at every rank: the nearest operator that has it. Sizes and angles are those of"
                + " the average over the training data, or of the kernel's space. Orthogonality that is imposed is no evidence: a"
                + " mode that would stand is then said to settle. Needs a ridge of 0."), List.of(
                new Option(NONE, "None", "The operator is as the data give it."),
                new Option("self-adjoint", "Self-adjoint", "Reversible motion such as diffusion: rates are real,"
                        + " eigenfunctions orthogonal."),
                new Option("skew", "Skew-adjoint", "For the generator: motion that keeps averages, rates are purely"
                        + " oscillating."),
                new Option("unitary", "Unitary", "For step maps: motion that keeps averages, nothing grows or fades. Runs"
                        + " must be long enough, or many enough, that their average is the lasting one. It takes feigned damping"
                        + " away; frequencies are found about as well as without it."),
                new Option("stable", "Stable", "Nothing grows: growing parts are brought to the edge of stability at the"
                        + " least change of the operator.")),
                NONE);
    }

    private static List<Setting> dictionarySettings() {
        String group = "Dictionary";
        return List.of(
                new Setting.Choice(new Common(DICTIONARY, "Functions", group, "Named functions of the state.")
                        .when(ESTIMATOR, DICTIONARY), List.of(
                        new Option("monomials", "Monomials", "All products of powers of the state's components up to a"
                                + " total degree."),
                        new Option("fourier", "Fourier", "Sines and cosines of each component, for components that are"
                                + " angles or otherwise periodic.")), "monomials"),
                new Setting.Whole(new Common("degree", "Degree", group, "Largest total degree. The number of functions"
                        + " grows fast with it: with N components and degree d it is (N+d)!/(N! d!).").when(DICTIONARY,
                        "monomials"), "", 1, 20,
                        OptionalLong.of(2)),
                new Setting.Whole(new Common("order", "Order", group, "Number of harmonics of each component.")
                        .when(DICTIONARY, "fourier"), "", 1, 100, OptionalLong.of(3)),
                new Setting.Numbers(new Common(PERIODS, "Periods", group, "Period of each component of the state, in"
                        + " prepared units; one number holds for all. Empty takes 2π, right for angles in radians.")
                        .when(DICTIONARY, "fourier"), "", 1e-12, LARGEST, List.of()));
    }

    private static List<Setting> kernelSettings() {
        String group = "Kernel";
        return List.of(
                new Setting.Whole(new Common("landmarks", "Landmarks", group, "Most states that carry a function each"
                        + " when there are many; recordings of a few hundred samples use all. More cost time in"
                        + " proportion and add detail.").when(ESTIMATOR, "kernel-step"), "states", 1, 100_000,
                        OptionalLong.of(500)),
                new Setting.Whole(new Common(SEGMENT, "Steps a piece", group, "Runs are cut into pieces of this many"
                        + " sampling steps, each of which carries one function; 0 takes whole runs. Cut long runs, for"
                        + " their average over many periods says little.").when(ESTIMATOR, GENERATORS), "steps", 0,
                        1_000_000, OptionalLong.of(20)),
                new Setting.Whole(new Common("end-smoothing", "Smoothing of the ends", group, "Samples in the local"
                        + " cubic that smooths the ends of each piece, where noise acts most; fewer than 5 take the ends"
                        + " as recorded.").when(ESTIMATOR, GENERATORS), "samples", 0, 1000, OptionalLong.of(0)),
                new Setting.Number(new Common("contraction", "Contraction", group, "Factor a by which states are"
                        + " contracted; nearer to 1 is nearer to the generator.").when(ESTIMATOR, "scaled-generator"), "",
                        0, true, 0.999999,
                        OptionalDouble.of(0.99)));
    }

    static List<Setting> rankSettings() {
        String group = "Rank";
        return List.of(
                new Setting.Choice(new Common(RANK_RULE, "Rank by", group, "How many orthonormal functions are kept:"
                        + " too few miss motion, too many fit noise."), List.of(
                        new Option("energy", "Share of the variance", "As many as hold the given share of the squared"
                                + " singular values."),
                        new Option("fixed", "Number", "The number given here."),
                        new Option("hard-threshold", "Noise threshold", "Singular values above the threshold that is"
                                + " optimal for white noise of unknown level."),
                        new Option("holdout", "Smallest holdout error", "The number that predicts best one step ahead on"
                                + " a quarter of the training samples, left out while choosing."),
                        new Option("drop", "Clear drop", "As many as stand above the last place where singular values fall to a"
                                + " fifth or less from one to the next; where none falls so clearly, as by the smallest holdout"
                                + " error. For recordings of which little is known beforehand.")),
                        "energy"),
                new Setting.Number(new Common("energy", "Share", group, "Share of the sum of squared singular values to"
                        + " be held.")
                        .when(RANK_RULE, "energy"), "", 0, true, 1, OptionalDouble.of(0.9999)),
                new Setting.Whole(new Common("rank", "Rank", group, "Number of functions kept.").when(RANK_RULE, "fixed"),
                        "functions", 1, 10_000, OptionalLong.of(10)),
                new Setting.Whole(new Common("largest-rank", "Largest rank", group, "Largest number of functions tried.")
                        .when(RANK_RULE, "holdout", "drop"), "functions", 1, 10_000, OptionalLong.of(30)),
                new Setting.Number(new Common(RIDGE, "Ridge", group, "Added to the squared singular values, relative to"
                        + " the largest, before they are divided by: steadies an ill-conditioned fit at the price of a"
                        + " small bias; 0 adds nothing."), "", 0, false, 1, OptionalDouble.of(0)));
    }

    /**
     * Returns the estimator asked for.
     *
     * @throws SettingFault if it needs a kernel and none is connected
     */
    static Estimator estimator(Settings settings, Optional<Kernel> kernel) {
        Estimator free = free(settings, kernel);
        return structure(settings).<Estimator>map(structure -> new StructuredEstimator(free, structure)).orElse(free);
    }

    private static Optional<Structure> structure(Settings settings) {
        return switch (settings.text(STRUCTURE)) {
            case "self-adjoint" -> Optional.of(Structure.SELF_ADJOINT);
            case "skew" -> Optional.of(Structure.SKEW);
            case "unitary" -> Optional.of(Structure.UNITARY);
            case "stable" -> Optional.of(Structure.STABLE);
            default -> Optional.empty();
        };
    }

    private static boolean extrapolated(Settings settings) {
        return correction(settings) == NoiseCorrection.EXTRAPOLATION;
    }

    private static Estimator free(Settings settings, Optional<Kernel> kernel) {
        Estimator plain = plain(settings, kernel);
        return extrapolated(settings) ? new ExtrapolatedEstimator(plain) : plain;
    }

    private static Estimator plain(Settings settings, Optional<Kernel> kernel) {
        return switch (settings.text(ESTIMATOR)) {
            case "linear" -> new LinearEstimator(1, extrapolated(settings) ? NoiseCorrection.NONE : correction(settings), inputUse(settings));
            case DICTIONARY -> new DictionaryEstimator(dictionary(settings), 1, inputUse(settings));
            case "kernel-step" -> new KernelStepEstimator(needed(settings, kernel), settings.whole("landmarks"));
            case "generator" -> new OccupationEstimator(needed(settings, kernel), segments(settings), 1);
            default -> new OccupationEstimator(needed(settings, kernel), segments(settings),
                    settings.number("contraction"));
        };
    }

    private static NoiseCorrection correction(Settings settings) {
        return switch (settings.text(NOISE_CORRECTION)) {
            case "total-least-squares" -> NoiseCorrection.TOTAL_LEAST_SQUARES;
            case "forward-backward" -> NoiseCorrection.FORWARD_BACKWARD;
            case EXTRAPOLATION -> NoiseCorrection.EXTRAPOLATION;
            default -> NoiseCorrection.NONE;
        };
    }

    private static InputUse inputUse(Settings settings) {
        return switch (settings.text(INPUTS)) {
            case "leave-in" -> InputUse.LEFT_IN;
            case "straight" -> InputUse.STRAIGHT;
            default -> InputUse.HELD;
        };
    }

    /**
     * Checks that the operator can do with the inputs what is asked.
     *
     * @throws SettingFault if it uses a kernel and inputs are to be separated
     */
    static void requireSeparable(Settings settings, Snapshots snapshots) {
        boolean kernel = !List.of("linear", DICTIONARY).contains(settings.text(ESTIMATOR));
        if (kernel && !snapshots.inputs().isEmpty() && inputUse(settings) != InputUse.LEFT_IN) {
            throw new SettingFault("setting " + INPUTS, "inputs to be separated by the operator " + settings.text(ESTIMATOR)
                    + ", in whose space an input multiplies the state in more ways than data can tell apart",
                    "fit the linear or the dictionary step map, or leave the inputs in");
        }
    }

    private static Dictionary dictionary(Settings settings) {
        return settings.text(DICTIONARY).equals("monomials") ? Dictionary.monomials(settings.whole("degree"))
                : Dictionary.fourier(settings.whole("order"), periods(settings.numbers(PERIODS)));
    }

    private static double[] periods(List<Double> given) {
        return given.isEmpty() ? new double[] {2 * Math.PI} : given.stream().mapToDouble(Double::doubleValue).toArray();
    }

    private static SegmentPlan segments(Settings settings) {
        return new SegmentPlan(settings.whole(SEGMENT), settings.whole("end-smoothing"));
    }

    private static Kernel needed(Settings settings, Optional<Kernel> kernel) {
        return kernel.orElseThrow(() -> new SettingFault("setting " + ESTIMATOR, "the operator "
                + settings.text(ESTIMATOR)
                + " without a kernel", "connect a Kernel Chooser to the input kernel, or choose linear or dictionary"));
    }

    /** Returns what is wrong whatever is connected. */
    static List<SettingProblem> problems(Settings settings) {
        List<SettingProblem> problems = new ArrayList<>();
        if (List.of(GENERATORS).contains(settings.text(ESTIMATOR)) && settings.whole(SEGMENT) == 1) {
            problems.add(new SettingProblem(SEGMENT, "pieces of one step", "give at least 2 steps, or 0 for whole runs"));
        }
        NoiseCorrection correction = correction(settings);
        boolean corrected = correction != NoiseCorrection.NONE;
        if (corrected && correction != NoiseCorrection.EXTRAPOLATION && !settings.text(ESTIMATOR).equals("linear")) {
            problems.add(new SettingProblem(NOISE_CORRECTION, settings.text(NOISE_CORRECTION) + " with the operator " + settings.text(ESTIMATOR),
                    "choose extrapolation, which every operator can do, or none"));
        }
        if (corrected && settings.number(RIDGE) > 0) {
            problems.add(new SettingProblem(RIDGE, "a ridge beside the noise correction " + settings.text(NOISE_CORRECTION)
                    + ", which it would undo", "set the ridge to 0, or the noise correction to none"));
        }
        structure(settings).ifPresent(structure -> problems.addAll(problems(settings, structure, corrected)));
        return problems;
    }

    private static List<SettingProblem> problems(Settings settings, Structure structure, boolean corrected) {
        List<SettingProblem> problems = new ArrayList<>();
        String estimator = settings.text(ESTIMATOR);
        boolean generator = List.of(GENERATORS).contains(estimator);
        if (structure == Structure.SKEW && !estimator.equals("generator")) {
            problems.add(new SettingProblem(STRUCTURE, "the operator " + estimator + " to be made skew-adjoint", generator
                    ? "fit the plain generator" : "choose unitary for a step map, or fit the generator"));
        }
        if (structure == Structure.UNITARY && generator) {
            problems.add(new SettingProblem(STRUCTURE, "the operator " + estimator + " to be made unitary",
                    "choose skew-adjoint for the generator, or fit a step map"));
        }
        if (corrected && structure.orthogonal()) {
            problems.add(new SettingProblem(STRUCTURE, "the noise correction " + settings.text(NOISE_CORRECTION)
                    + " beside an operator made " + structure.words(), "choose one of the two"));
        }
        if (settings.number(RIDGE) > 0) {
            problems.add(new SettingProblem(RIDGE, "a ridge beside an operator made " + structure.words(),
                    "set the ridge to 0: the structure steadies the fit"));
        }
        return problems;
    }

    /** Returns how the rank is chosen. */
    static RankRule rankRule(Settings settings) {
        return switch (settings.text(RANK_RULE)) {
            case "fixed" -> new RankRule.Fixed(settings.whole("rank"));
            case "hard-threshold" -> new RankRule.HardThreshold();
            case "drop" -> new RankRule.Drop(settings.whole("largest-rank"));
            case "holdout" -> new RankRule.Holdout(settings.whole("largest-rank"));
            default -> new RankRule.Energy(settings.number("energy"));
        };
    }
}
