package org.modestead.nodes.judge;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.modestead.engine.Doubt;
import org.modestead.engine.refine.RateModel;
import org.modestead.engine.refine.RateTerm;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.Settings;

/** Settings of the Rate Refinement, and the sum of exponentials that they ask for. */
final class RefinementSettings {

    static final String LEAST_SHARE = "least-share";
    static final String START_RATES = "start-rates";
    static final String START_PERIODS = "start-periods";
    static final String FIXED_PERIODS = "fixed-periods";
    static final String OSCILLATIONS = "oscillations";
    static final String CONSTANT = "constant";
    static final String FROM_ZERO = "from-zero";
    static final String TIME_ZERO = "time-zero";
    static final String LEVEL = "level";

    private static final double LARGEST = Double.MAX_VALUE;

    private RefinementSettings() {}

    /** Returns the settings in dialog order. */
    static List<Setting> declared() {
        String start = "Start";
        String model = "Model";
        return List.of(
                new Setting.Number(new Common(LEAST_SHARE, "Least share", start, "Modes of the connected spectrum that carry at"
                        + " least this share of the signal are refined; others are left out. Without effect where no spectrum is"
                        + " connected."), "", 0, false, 1, OptionalDouble.of(0.01)),
                new Setting.Numbers(new Common(START_RATES, "Further rates", start, "Growth rates from which further real terms"
                        + " start, negative for decays, one a term."), "1/time", -LARGEST, LARGEST, List.of()),
                new Setting.Numbers(new Common(START_PERIODS, "Further periods", start, "Periods from which further oscillations"
                        + " start, steady at first, one a term."), "time", 1e-12, LARGEST, List.of()),
                new Setting.Numbers(new Common(FIXED_PERIODS, "Known periods", model, "Periods of steady oscillations that are"
                        + " known, such as the day or the year: their sizes are fitted, their periods are not."), "time",
                        1e-12, LARGEST, List.of()),
                new Setting.Choice(new Common(OSCILLATIONS, "Oscillations", model, "What is fitted of each oscillation that is not"
                        + " known."), List.of(
                        new Setting.Option("free", "Growth and frequency", "Each may grow or fade at its own rate."),
                        new Setting.Option("steady", "Frequency only", "None grows or fades.")), "free"),
                new Setting.Flag(new Common(CONSTANT, "Constant", model, "Whether a constant of its own is added for every run and"
                        + " channel, in place of any the spectrum holds: offsets of sensors, and what subtracting a mean leaves. Without"
                        + " it slow rates bend to make up for offsets."), true),
                new Setting.Flag(new Common(FROM_ZERO, "From zero", model, "Whether the signal is zero at time zero, as that of a"
                        + " motion that starts from rest there."), false),
                new Setting.Choice(new Common(TIME_ZERO, "Time zero", model, "Where time is zero for each run. It matters for"
                        + " From zero only, and for numbers far from zero."), List.of(
                        new Setting.Option("run-start", "Start of the run", "The first sample of each run."),
                        new Setting.Option("recorded", "As recorded", "Zero of the recorded times.")), "run-start"),
                new Setting.Number(new Common(LEVEL, "Level", "Intervals", "How often intervals should hold the true value, for"
                        + " white noise and the right number of terms."), "", 0.5, false, 0.999, OptionalDouble.of(0.95)));
    }

    /**
     * The terms to start from.
     *
     * @param model at the start values
     * @param doubts modes of the spectrum that could not be taken as they are
     */
    record Start(RateModel model, List<Doubt> doubts) {}

    /**
     * Returns the terms asked for: those of the spectrum, the further ones, the known periods, the constant.
     *
     * @throws SettingFault if there is none, or none that is free
     */
    static Start start(Settings settings, Optional<Spectrum> spectrum) {
        boolean steady = settings.text(OSCILLATIONS).equals("steady");
        boolean constant = settings.flag(CONSTANT);
        List<RateTerm> terms = new ArrayList<>();
        List<Doubt> doubts = new ArrayList<>();
        if (constant) {
            terms.add(RateTerm.constant());
        }
        spectrum.ifPresent(given -> given.modes().stream().filter(mode -> mode.energyShare() >= settings.number(LEAST_SHARE))
                .forEach(mode -> take(mode, steady, constant, terms, doubts)));
        settings.numbers(START_RATES).forEach(rate -> terms.add(new RateTerm.Real(rate, true)));
        settings.numbers(START_PERIODS).forEach(period -> terms.add(pair(0, 2 * Math.PI / period, steady)));
        settings.numbers(FIXED_PERIODS).forEach(period -> terms.add(RateTerm.periodic(period, false)));
        if (terms.stream().noneMatch(RefinementSettings::free)) {
            throw new SettingFault("rate refinement", spectrum.isPresent() ? "no mode of the spectrum carries a share of "
                    + settings.number(LEAST_SHARE) + " and no further rate or period is given" : "neither a spectrum is connected nor a"
                    + " rate or period given", "connect a spectrum, or give rates or periods to start from");
        }
        boolean fromZero = settings.flag(FROM_ZERO);
        if (fromZero && terms.stream().mapToInt(RateTerm::functions).sum() < 2) {
            throw new SettingFault("setting " + FROM_ZERO, "a single term that is to be zero at time zero", "add a constant or a further term");
        }
        return new Start(fromZero ? RateModel.fromZero(terms) : new RateModel(terms), doubts);
    }

    private static void take(Mode mode, boolean steady, boolean constant, List<RateTerm> terms, List<Doubt> doubts) {
        if (!Double.isFinite(mode.rate().re())) {
            doubts.add(new Doubt("mode-left-out", "Mode " + mode.number() + " fades within a step, so no rate of it can be refined."));
        } else if (mode.constant()) {
            if (!constant) {
                terms.add(RateTerm.constant());
            }
        } else {
            if (mode.cluster() != 0) {
                doubts.add(new Doubt("cluster-as-one", "Mode " + mode.number() + " gathers several nearly equal rates; it is refined as"
                        + " one exponential, which its motion is not."));
            }
            terms.add(mode.oscillates() ? pair(mode.rate().re(), mode.rate().im(), steady) : new RateTerm.Real(mode.rate().re(), true));
        }
    }

    private static RateTerm pair(double growth, double angular, boolean steady) {
        return new RateTerm.Pair(steady ? 0 : growth, Math.abs(angular), !steady, true);
    }

    private static boolean free(RateTerm term) {
        return term instanceof RateTerm.Real real ? real.free() : ((RateTerm.Pair) term).angularFree();
    }
}
