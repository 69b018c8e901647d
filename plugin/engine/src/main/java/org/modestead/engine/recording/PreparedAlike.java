package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.Snapshots.Fact;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * New recordings brought to where earlier ones are: the same channels in the same order, the same trend taken out, the same scales, step,
 * smoothing (unless they were smoothed already) and delays. They become the holdout, since no fit saw them; training and calibration stay those of the earlier recordings, so that
 * whatever is said of the new ones is measured against them.
 */
public final class PreparedAlike {

    private static final double SAME_STEP = 1e-6;
    /** Share of the training range by which a sample may leave it. */
    private static final double MARGIN = 0.1;

    private final Snapshots fitted;
    private final Snapshots fresh;
    private final int[] channels;
    private final int[] inputs;

    private PreparedAlike(Snapshots fitted, Snapshots fresh) {
        this.fitted = fitted;
        this.fresh = fresh;
        this.channels = places("channel", fitted.channels(), fresh.channels());
        this.inputs = places("input", fitted.inputs(), fresh.inputs());
    }

    /**
     * @param fitted those of a fit
     * @param fresh new recordings, prepared in any way: what was subtracted and divided by is undone first. Parts of one run are joined
     * @return the new runs as holdout; a run that is named as one of the fit is called {@code name (new)}
     * @throws RecordingFault if a channel is missing or in another unit, if times are counted otherwise, if the step is another one, or
     *     if no run is long enough for two states
     */
    public static Snapshots of(Snapshots fitted, Snapshots fresh) {
        checkTimes(fitted, fresh);
        return new PreparedAlike(fitted, fresh).joined();
    }

    /**
     * Checks ahead of a recording what its columns tell.
     *
     * @throws RecordingFault if a channel or an input is missing or in another unit
     */
    public static void check(List<Channel> channels, List<Channel> fresh, List<Channel> inputs, List<Channel> freshInputs) {
        places("channel", channels, fresh);
        places("input", inputs, freshInputs);
    }

    /**
     * Checks ahead of a recording what its time column tells.
     *
     * @throws RecordingFault if times are counted otherwise
     */
    public static void check(TimeAxis fitted, TimeAxis fresh) {
        if (!fitted.equals(fresh)) {
            throw new RecordingFault("new recording", "its times are " + words(fresh) + ", those of the model " + words(fitted),
                    "give them alike, and count them in the same unit");
        }
    }

    private static void checkTimes(Snapshots fitted, Snapshots fresh) {
        check(fitted.time(), fresh.time());
        Wording wording = new Wording(fitted.time());
        OptionalDouble wanted = fitted.step();
        if (wanted.isPresent()) {
            double step = fresh.step().orElse(Double.NaN);
            if (!(Math.abs(step - wanted.getAsDouble()) <= SAME_STEP * wanted.getAsDouble())) {
                throw new RecordingFault("new recording", Double.isNaN(step) ? "its steps are uneven" : "its step is " + wording.span(step),
                        "resample it to the step of the model, " + wording.span(wanted.getAsDouble()));
            }
        }
    }

    private static String words(TimeAxis time) {
        String kind = switch (time.kind()) {
            case NUMBER -> "numbers";
            case DATE -> "dates";
            case DATE_TIME -> "date-times";
        };
        return time.unit().isEmpty() ? kind + " without a unit" : kind + " in " + time.unit();
    }

    private static int[] places(String what, List<Channel> wanted, List<Channel> there) {
        List<String> names = there.stream().map(Channel::name).toList();
        return wanted.stream().mapToInt(channel -> {
            int place = names.indexOf(channel.name());
            if (place < 0) {
                throw new RecordingFault("new recording", "it has no " + what + " " + channel.name(), "bring every " + what
                        + " of the model: " + String.join(", ", wanted.stream().map(Channel::label).toList()));
            }
            String unit = there.get(place).unit();
            if (!unit.isEmpty() && !channel.unit().isEmpty() && !unit.equals(channel.unit())) {
                throw new RecordingFault(what + " " + channel.name(), "it is recorded in " + unit + ", in the model in " + channel.unit(),
                        "convert it before");
            }
            return place;
        }).toArray();
    }

    private Snapshots joined() {
        Map<String, List<Run>> byName = new LinkedHashMap<>();
        for (Part part : Part.values()) {
            fresh.runs(part).forEach(run -> byName.computeIfAbsent(run.id(), id -> new ArrayList<>()).add(run));
        }
        Set<String> taken = new HashSet<>();
        for (Part part : Part.values()) {
            fitted.runs(part).forEach(run -> taken.add(run.id()));
        }
        List<Run> runs = new ArrayList<>();
        byName.forEach((name, parts) -> {
            Run run = joined(taken.contains(name) ? name + " (new)" : name, parts);
            if (run.samples() > fitted.delay().reach() + 1) {
                runs.add(run);
            }
        });
        if (runs.isEmpty()) {
            throw new RecordingFault("new recording", "no run has the " + (fitted.delay().reach() + 2) + " samples that two states need",
                    "bring longer runs");
        }
        List<Doubt> doubts = new ArrayList<>(fitted.doubts());
        doubts.addAll(fresh.doubts());
        beyond(runs).ifPresent(doubts::add);
        return new Snapshots(fitted.channels(), fitted.inputs(), fitted.time(), fitted.training(), fitted.calibration(), runs, fitted.step(),
                fitted.delay(), fitted.preparation(), fitted.smoothing(), facts(runs), doubts);
    }

    /** The parts of a run follow each other, each after a lead-in that repeats the end of the one before. */
    private Run joined(String name, List<Run> parts) {
        int samples = IntStream.range(0, parts.size()).map(i -> parts.get(i).samples() - repeated(parts, i)).sum();
        double[] times = new double[samples];
        DMatrixRMaj values = new DMatrixRMaj(samples, channels.length);
        DMatrixRMaj known = new DMatrixRMaj(samples, inputs.length);
        int at = 0;
        for (int i = 0; i < parts.size(); i++) {
            Run part = parts.get(i);
            for (int k = repeated(parts, i); k < part.samples(); k++, at++) {
                times[at] = part.times()[k];
                for (int c = 0; c < channels.length; c++) {
                    double recorded = fresh.preparation().restore(channels[c], times[at], part.values().get(k, channels[c]));
                    values.set(at, c, fitted.preparation().prepare(c, times[at], recorded));
                }
                for (int q = 0; q < inputs.length; q++) {
                    known.set(at, q, part.inputs().get(k, inputs[q]));
                }
            }
        }
        SizeLimits.requirePrepared(name, values, fitted.channels());
        Run run = new Run(name, times, values, known, 0, parts.get(0).weight());
        return fresh.smoothing().active() ? run : fitted.smoothing().apply(run);
    }

    private static int repeated(List<Run> parts, int i) {
        if (i == 0) {
            return 0;
        }
        double end = parts.get(i - 1).times()[parts.get(i - 1).samples() - 1];
        int repeated = 0;
        while (repeated < parts.get(i).samples() && parts.get(i).times()[repeated] <= end) {
            repeated++;
        }
        return repeated;
    }

    private List<Fact> facts(List<Run> runs) {
        int samples = runs.stream().mapToInt(Run::samples).sum();
        int states = runs.stream().mapToInt(run -> run.samples() - fitted.delay().reach()).sum();
        Map<String, Integer> now = Map.of("holdout runs", runs.size(), "holdout samples", samples, "holdout states", states);
        List<Fact> facts = new ArrayList<>();
        fitted.facts().forEach(fact -> facts.add(now.containsKey(fact.item()) ? new Fact(fact.item(), now.get(fact.item()) + ", new")
                : fact));
        return facts;
    }

    private Optional<Doubt> beyond(List<Run> runs) {
        double[] low = new double[channels.length];
        double[] high = new double[channels.length];
        Arrays.fill(low, Double.POSITIVE_INFINITY);
        Arrays.fill(high, Double.NEGATIVE_INFINITY);
        fitted.training().forEach(run -> {
            for (int k = 0; k < run.values().getNumElements(); k++) {
                low[k % low.length] = Math.min(low[k % low.length], run.values().data[k]);
                high[k % low.length] = Math.max(high[k % low.length], run.values().data[k]);
            }
        });
        List<String> outside = new ArrayList<>();
        for (int c = 0; c < channels.length; c++) {
            double share = shareOutside(runs, c, low[c] - MARGIN * (high[c] - low[c]), high[c] + MARGIN * (high[c] - low[c]));
            if (share > 0) {
                outside.add(String.format(Locale.ROOT, "%s in %.3g %% of its samples", fitted.channels().get(c).label(), 100 * share));
            }
        }
        return outside.isEmpty() ? Optional.empty() : Optional.of(new Doubt("beyond-training", "The new recordings leave the range that the"
                + " model was fitted in, by more than a tenth of it: " + String.join(", ", outside) + ". There the model extrapolates."));
    }

    private static double shareOutside(List<Run> runs, int channel, double low, double high) {
        long outside = 0;
        long samples = 0;
        for (Run run : runs) {
            for (int k = 0; k < run.samples(); k++) {
                double value = run.values().get(k, channel);
                outside += value < low || value > high ? 1 : 0;
            }
            samples += run.samples();
        }
        return (double) outside / samples;
    }
}
