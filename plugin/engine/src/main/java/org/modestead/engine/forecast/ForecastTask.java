package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.OptionalInt;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.modestead.engine.Doubt;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Snapshots.Part;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/**
 * What a plan means for the snapshots at hand, in steps.
 *
 * @param snapshots to forecast
 * @param plan as asked for
 * @param step Δt of every forecast, in time units
 * @param memory samples of history that the fitted operator needs
 * @param steps horizon in steps, at least 1
 * @param season m of the seasonal naive baseline, empty for none
 * @param region sampled in training
 * @param holdout series that judge
 * @param bands what the bands are calibrated on
 */
record ForecastTask(
        Snapshots snapshots,
        ForecastPlan plan,
        double step,
        int memory,
        int steps,
        OptionalInt season,
        Region region,
        List<Series> holdout,
        BandSource bands) {

    private static final int MOST_STEPS = Integer.MAX_VALUE / 2;
    // Times are read from text and added up; a step shorter than this share of a step too much is rounding.
    private static final double ROUNDING = 1e-6;
    private static final double DEFAULT_SHARE = 0.1;
    // A row takes some 60 bytes: 2 GB.
    private static final double MOST_ROWS = 1 << 25;

    /** @throws ForecastFault if the parts do not belong together or the plan cannot be met */
    static ForecastTask of(Snapshots snapshots, FittedOperator operator, Spectrum spectrum, ForecastPlan plan) {
        requireSame(snapshots, operator, spectrum);
        double step = step(snapshots, operator);
        int memory = snapshots.delay().reach() + 1;
        List<Series> holdout = Series.of(snapshots, Part.HOLDOUT, step);
        List<Series> calibration = Series.of(snapshots, Part.CALIBRATION, step);
        int steps = steps(snapshots, plan, holdout, memory, step);
        requireMemory(snapshots, steps);
        return new ForecastTask(snapshots, plan, step, memory, steps,
                season(snapshots, plan, spectrum, step), Region.of(snapshots), holdout,
                BandSource.of(calibration, holdout, memory));
    }

    private static void requireSame(Snapshots snapshots, FittedOperator operator, Spectrum spectrum) {
        Snapshots fitted = operator.snapshots();
        if (!states(snapshots).equals(states(fitted))) {
            throw new ForecastFault("forecast", "the snapshots have " + states(snapshots) + ", the operator was fitted to "
                    + states(fitted), "both must be the same");
        }
        if (!samePreparation(snapshots.preparation(), fitted.preparation())) {
            throw new ForecastFault("forecast", "the snapshots were detrended or scaled otherwise than those of the fit",
                    "forecast from the snapshots of the fit");
        }
        if (spectrum.rank() != operator.rank()) {
            throw new ForecastFault("forecast", "the spectrum has rank " + spectrum.rank() + ", the operator "
                    + operator.rank(), "extract the spectrum from this operator");
        }
    }

    private static String states(Snapshots snapshots) {
        List<String> labels = snapshots.channels().stream().map(Channel::label).toList();
        return "channels " + labels + " with " + snapshots.delay().depth() + " delays "
                + snapshots.delay().spacing() + " samples apart";
    }

    private static boolean samePreparation(Preparation a, Preparation b) {
        return a.origin() == b.origin() && Arrays.equals(a.offset(), b.offset()) && Arrays.equals(a.slope(), b.slope())
                && Arrays.equals(a.scale(), b.scale());
    }

    private static double step(Snapshots snapshots, FittedOperator operator) {
        if (!(operator.evolution() instanceof Evolution.StepMap map)) {
            return snapshots.step().orElseGet(() -> medianStep(snapshots.training()));
        }
        double sampled = snapshots.step().orElse(map.step());
        if (Math.abs(sampled - map.step()) > ROUNDING * map.step()) {
            throw new ForecastFault("forecast", "the snapshots have the step " + sampled + ", the step map " + map.step(),
                    "both must have the same step");
        }
        return map.step();
    }

    private static double medianStep(List<Run> runs) {
        double[] steps = runs.stream().flatMapToDouble(ForecastTask::gaps).sorted().toArray();
        if (steps.length == 0) {
            throw new ForecastFault("forecast", "no training run has two samples", "the time step cannot be told");
        }
        return steps[steps.length / 2];
    }

    private static DoubleStream gaps(Run run) {
        double[] t = run.times();
        return IntStream.range(1, t.length).mapToDouble(k -> t[k] - t[k - 1]);
    }

    private static int steps(Snapshots snapshots, ForecastPlan plan, List<Series> holdout, int memory, double step) {
        if (plan.horizon().isPresent()) {
            return wholeSteps(plan.horizon().getAsDouble(), step);
        }
        int held = observedLeads(holdout, memory);
        double longest = runs(snapshots).mapToDouble(Run::duration).max().orElse(0);
        return held > 0 ? held : wholeSteps(DEFAULT_SHARE * longest, step);
    }

    private static void requireMemory(Snapshots snapshots, int steps) {
        double runs = runs(snapshots).map(Run::id).distinct().count();
        double rows = runs * steps * snapshots.channels().size();
        if (rows > MOST_ROWS) {
            throw new ForecastFault("forecast horizon", String.format(Locale.ROOT, "%d steps of %.0f runs and %d channels are %.3g rows", steps, runs,
                    snapshots.channels().size(), rows), "choose a shorter horizon, fewer runs or fewer channels");
        }
    }

    private static Stream<Run> runs(Snapshots snapshots) {
        return Stream.of(Part.values()).flatMap(part -> snapshots.runs(part).stream());
    }

    /** Returns a time rounded up to whole steps, at least 1. */
    static int wholeSteps(double time, double step) {
        double steps = Math.ceil(time / step - ROUNDING);
        if (steps > MOST_STEPS) {
            throw new ForecastFault("forecast horizon", "it is " + time + ", that is " + steps + " steps of " + step,
                    "it must be shorter");
        }
        return Math.max(1, (int) steps);
    }

    private static OptionalInt season(Snapshots snapshots, ForecastPlan plan, Spectrum spectrum, double step) {
        int longest = snapshots.training().stream().mapToInt(Run::samples).max().orElse(0);
        if (plan.season() >= longest) {
            throw new ForecastFault("forecast season", "it is " + plan.season() + " steps, the longest training run has "
                    + longest + " samples", "it must be shorter than that run");
        }
        if (plan.season() > 0) {
            return plan.season() > 1 ? OptionalInt.of(plan.season()) : OptionalInt.empty();
        }
        return spectrum.modes().stream().filter(Mode::oscillates).findFirst().map(mode -> mode.period() / step)
                .filter(period -> period >= 2 - ROUNDING && Math.rint(period) < longest)
                .map(period -> OptionalInt.of((int) Math.rint(period))).orElse(OptionalInt.empty());
    }

    /** Returns the same task with another horizon, in steps, at least 1. */
    ForecastTask withSteps(int other) {
        return new ForecastTask(snapshots, plan, step, memory, other, season, region, holdout, bands);
    }

    /** Returns the longest lead time that forecast table or scores can need, in steps. */
    int leads() {
        return Math.max(steps, scoreSteps().stream().mapToInt(Integer::intValue).max().orElse(1));
    }

    /** Returns the longest lead time observed in the holdout, in steps, 0 without holdout. */
    int observedLeads() {
        return observedLeads(memory);
    }

    /** Returns the longest lead time observed in the holdout after so many samples of history, in steps, 0 for none. */
    int observedLeads(int history) {
        return observedLeads(holdout, history);
    }

    private static int observedLeads(List<Series> holdout, int memory) {
        return Math.max(0, holdout.stream().mapToInt(series -> series.ahead(memory)).max().orElse(0));
    }

    /** Returns the score horizons in steps, rising, those that the holdout is too short for included. */
    List<Integer> scoreSteps() {
        int full = Math.min(steps, Math.max(1, observedLeads()));
        Stream<Integer> asked = plan.scoreHorizons().isEmpty()
                ? Stream.of(1, (full + 3) / 4, (full + 1) / 2, full)
                : plan.scoreHorizons().stream().map(time -> wholeSteps(time, step));
        return asked.distinct().sorted().toList();
    }

    /** Returns the longest score horizon in steps that the holdout reaches, 0 for none. */
    int longestScored() {
        return scoreSteps().stream().filter(horizon -> horizon <= observedLeads()).max(Integer::compare).orElse(0);
    }

    /** Returns m of the scaled errors: the season, or 1. */
    int scaleSeason() {
        return season.orElse(1);
    }

    /** Returns what a reader must know about the data that the operator goes on from. */
    List<Doubt> doubts(FittedOperator operator) {
        List<Doubt> out = new ArrayList<>();
        if (snapshots.step().isEmpty()) {
            out.add(new Doubt("uneven-times", "The recording is sampled unevenly: forecasts are " + Summary.figure(step)
                    + " apart (the median training step), and observed values are interpolated linearly to these times for"
                    + " the scores."));
        }
        if (operator.functions().inputs().isPresent()) {
            out.add(new Doubt("inputs-assumed", "Forecast and scores take the inputs as they were recorded, those after the origin"
                    + " included; where the recording ends they are held at their last values."));
        } else if (!snapshots.inputs().isEmpty()) {
            out.add(new Doubt("inputs-not-forecast", "The forecast does not know what the " + snapshots.inputs().size()
                    + " inputs will do; it goes on as the training runs did on the whole."));
        }
        if (operator.evolution() instanceof Evolution.Generator generator && generator.contraction() != 1) {
            out.add(new Doubt("scaled-generator", "The forecast reads the scaled generator (factor "
                    + Summary.figure(generator.contraction()) + ") as that of the flow itself; the further the factor is"
                    + " from 1, the rougher that is."));
        }
        return out;
    }
}
