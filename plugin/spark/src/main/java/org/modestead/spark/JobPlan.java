package org.modestead.spark;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.moments.Apart;
import org.modestead.engine.moments.Features;
import org.modestead.engine.moments.Keeping;
import org.modestead.engine.moments.StreamPlan;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.GapPolicy;
import org.modestead.engine.recording.MissingPolicy;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.TimeAxis;

/** What the options mean for the engine. */
final class JobPlan {

    private static final List<String> FUNCTIONS = List.of("linear", "monomials", "random-waves", "landmarks");
    private static final List<String> APART = List.of("stretches", "run-share", "runs", "none");

    private JobPlan() {}

    /**
     * @param columns of the channels
     * @param axis how times are written
     * @param scale of the kernel, read where the options give none
     */
    static StreamPlan of(JobOptions options, List<String> columns, TimeAxis axis, double scale) {
        String detrend = one(options, "detrend", List.of("none", "mean"));
        int stretch = options.whole("stretch", 2000, 2);
        int kept = options.whole("kept-samples", 40_000, stretch);
        return new StreamPlan(channels(options, columns), axis, options.number("step"), options.number("gap-factor").orElse(1.5),
                options.choice("gap-policy", GapPolicy.class, GapPolicy.SPLIT), options.choice("missing", MissingPolicy.class, MissingPolicy.SPLIT),
                detrend.equals("mean"), options.choice("scaling", Scaling.class, Scaling.NONE),
                new DelayEmbedding(options.whole("delay-depth", 1, 1), options.whole("delay-spacing", 1, 1)), options.whole("stride", 1, 1),
                features(options, options.number("scale").orElse(scale)),
                new Keeping(options.whole("seed", 1, 0), apart(options), stretch, kept, kept));
    }

    /** Returns whether the kernel's scale is to be taken from the first rows. */
    static boolean needsScale(JobOptions options) {
        return FUNCTIONS.indexOf(one(options, "functions", FUNCTIONS)) >= 2 && options.number("scale").isEmpty();
    }

    private static Features features(JobOptions options, double scale) {
        KernelSpec kernel = new KernelSpec(options.text("kernel", "gaussian"), Map.of("scale", scale));
        return switch (one(options, "functions", FUNCTIONS)) {
            case "monomials" -> new Features.Monomials(options.whole("degree", 2, 1));
            case "random-waves" -> new Features.RandomFourier(kernel, options.whole("waves", 100, 1), options.whole("seed", 1, 0));
            case "landmarks" -> new Features.Landmarks(kernel, options.whole("landmarks", 200, 1));
            default -> new Features.Coordinates(options.choice("noise-correction", NoiseCorrection.class, NoiseCorrection.NONE));
        };
    }

    private static Apart apart(JobOptions options) {
        String kind = one(options, "holdout", APART);
        return switch (kind) {
            case "none" -> new Apart.None();
            case "runs" -> new Apart.Runs(options.set("holdout-runs"), options.set("calibration-runs"));
            default -> new Apart.Shares(options.number("holdout-share").orElse(0.2), options.number("calibration-share").orElse(0.1),
                    kind.equals("run-share"));
        };
    }

    private static String one(JobOptions options, String name, List<String> allowed) {
        String found = options.text(name, allowed.get(0));
        if (!allowed.contains(found)) {
            throw new JobFault("option --" + name, "the value " + found, "choose one of " + String.join(", ", allowed));
        }
        return found;
    }

    /** A column named {@code flow [m3/h]} tells its unit. */
    private static List<Channel> channels(JobOptions options, List<String> columns) {
        Map<String, String> units = new LinkedHashMap<>();
        options.list("units").forEach(entry -> {
            int sign = entry.lastIndexOf('=');
            units.put(entry.substring(0, Math.max(0, sign)).strip(), entry.substring(sign + 1).strip());
        });
        return columns.stream().map(column -> {
            int open = column.endsWith("]") ? column.lastIndexOf('[') : -1;
            String name = open > 0 ? column.substring(0, open).strip() : column;
            String told = open > 0 ? column.substring(open + 1, column.length() - 1).strip() : "";
            return new Channel(name, units.getOrDefault(column, units.getOrDefault(name, told)));
        }).toList();
    }
}
