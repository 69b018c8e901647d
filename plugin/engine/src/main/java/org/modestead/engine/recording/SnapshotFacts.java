package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.recording.Snapshots.Fact;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * Writes what was done to a recording as lines for the summary table.
 *
 * @param recording as logged
 * @param plan what was asked
 * @param log what was counted
 * @param weights of the training runs
 * @param bare snapshots that have no facts yet
 */
record SnapshotFacts(Recording recording, SnapshotPlan plan, PreparationLog log, RunWeights weights, Snapshots bare) {

    /** Returns the snapshots with their facts. */
    Snapshots complete() {
        return new Snapshots(bare.channels(), bare.inputs(), bare.time(), bare.training(), bare.calibration(),
                bare.holdout(), bare.step(), bare.delay(), bare.preparation(), bare.smoothing(), facts(), bare.doubts());
    }

    private List<Fact> facts() {
        List<Fact> facts = new ArrayList<>();
        facts.add(new Fact("recorded runs", Integer.toString(recording.runs().size())));
        facts.add(new Fact("recorded samples", Long.toString(log.recorded())));
        facts.add(new Fact("channels", labels(bare.channels())));
        facts.add(new Fact("inputs", labels(bare.inputs())));
        facts.add(new Fact("step", step()));
        facts.add(new Fact("gaps", log.gaps(plan.gapPolicy())));
        facts.add(new Fact("missing cells", log.missing(plan.missing())));
        facts.add(new Fact("samples left out", Long.toString(log.dropped())));
        facts.add(new Fact("samples at new times", Long.toString(log.interpolated())));
        facts.add(new Fact("detrend", lower(plan.detrend())));
        facts.add(new Fact("scaling", plan.scaling().words()));
        facts.add(new Fact("smoothing", bare.smoothing().active() ? words(bare.smoothing(), bare.channels(), bare.preparation()) : "none"));
        facts.add(new Fact("delay", delay()));
        facts.add(new Fact("run weights", weights.words(plan.weighting())));
        for (Part part : Part.values()) {
            facts.add(new Fact(lower(part) + " runs", Integer.toString(bare.runs(part).size())));
            facts.add(new Fact(lower(part) + " samples", Long.toString(samples(part))));
            facts.add(new Fact(lower(part) + " states", Long.toString(states(part))));
        }
        return facts;
    }

    private long samples(Part part) {
        return bare.runs(part).stream().mapToLong(run -> run.samples() - run.leadIn()).sum();
    }

    private long states(Part part) {
        return bare.runs(part).stream().mapToLong(run -> Math.max(0, run.samples() - bare.delay().reach())).sum();
    }

    private String step() {
        if (bare.step().isEmpty()) {
            return "uneven, recorded times kept";
        }
        String step = new Wording(bare.time()).span(bare.step().getAsDouble());
        return step + (plan.resampling() == Resampling.UNIFORM && log.interpolated() > 0 ? ", resampled" : ", as recorded");
    }

    private String delay() {
        int depth = bare.delay().depth();
        if (depth == 1) {
            return "none";
        }
        String window = new Wording(bare.time()).span(bare.delay().reach() * bare.step().orElse(Double.NaN));
        return "depth " + depth + ", spacing " + bare.delay().spacing() + ", reaching back " + window;
    }

    /** Returns what was smoothed, for example {@code level: 6 samples either side, noise 0.31 m}. */
    static String words(Smoothing smoothing, List<Channel> channels, Preparation preparation) {
        List<String> parts = new ArrayList<>();
        for (int c = 0; c < channels.size(); c++) {
            if (smoothing.touches(c)) {
                String unit = channels.get(c).unit();
                parts.add(channels.get(c).name() + ": " + smoothing.reach().get(c) + " samples either side, noise "
                        + Wording.number(smoothing.noise().get(c) * preparation.scale()[c]) + (unit.isEmpty() ? "" : " " + unit));
            }
        }
        return String.join("; ", parts);
    }

    private static String labels(List<Channel> channels) {
        return channels.isEmpty() ? "none" : channels.size() + ": "
                + String.join(", ", channels.stream().map(Channel::label).toList());
    }

    static String lower(Enum<?> choice) {
        return choice.name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }
}
