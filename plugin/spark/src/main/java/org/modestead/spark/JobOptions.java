package org.modestead.spark;

import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * What stands after the jar's name: pairs of {@code --name value}. Names and values are those of the settings of the Streaming Fit.
 *
 * @param values by name
 */
record JobOptions(Map<String, String> values) {

    private static final Map<String, String> KNOWN = known();

    private static Map<String, String> known() {
        Map<String, String> out = new LinkedHashMap<>();
        out.put("input", "Parquet file, or folder of such files");
        out.put("output", "file to write, ending in .zip");
        out.put("time-column", "column of times");
        out.put("time-unit", "unit of the times; empty for s or d where they are date-times or dates");
        out.put("run-column", "column that names the run; empty for one run");
        out.put("channels", "columns, with commas between; empty for all columns of numbers");
        out.put("units", "channel=unit, with commas between");
        out.put("step", "usual time from row to row; empty for the median of the first rows");
        out.put("gap-factor", "a step is a gap when it is longer than this many usual ones (1.5)");
        out.put("gap-policy", "split or refuse (split)");
        out.put("missing", "split or refuse (split)");
        out.put("detrend", "none or mean (none)");
        out.put("scaling", "none, std or unit-group (none)");
        out.put("delay-depth", "samples stacked into a state (1)");
        out.put("delay-spacing", "samples between them (1)");
        out.put("stride", "sampling steps from a state to its partner (1)");
        out.put("functions", "linear, monomials, random-waves or landmarks (linear)");
        out.put("noise-correction", "none, total-least-squares or forward-backward (none)");
        out.put("degree", "of monomials (2)");
        out.put("waves", "number of random waves (100)");
        out.put("landmarks", "most landmarks (200)");
        out.put("kernel", "gaussian, matern52, matern32 or laplacian (gaussian)");
        out.put("scale", "of the kernel; empty for the median distance of the first states");
        out.put("holdout", "stretches, run-share, runs or none (stretches)");
        out.put("holdout-share", "share that judges (0.2)");
        out.put("calibration-share", "share that calibrates (0.1)");
        out.put("holdout-runs", "names of runs that judge, with commas between");
        out.put("calibration-runs", "names of runs that calibrate, with commas between");
        out.put("stretch", "samples of a stretch (2000)");
        out.put("kept-samples", "most samples kept of each part (40000)");
        out.put("seed", "of the draws (1)");
        out.put("slice", "rows of a run that one task reads; longer runs are cut into slices (1000000)");
        out.put("partitions", "tasks of the pass; empty for Spark's own choice");
        return out;
    }

    /** @throws JobFault if a name is not known, stands alone or is there twice */
    static JobOptions of(String... arguments) {
        Map<String, String> values = new LinkedHashMap<>();
        for (int i = 0; i < arguments.length; i += 2) {
            String name = arguments[i].startsWith("--") ? arguments[i].substring(2) : "";
            if (!KNOWN.containsKey(name)) {
                throw new JobFault("option " + arguments[i], "it is not known", "use\n" + help());
            }
            if (i + 1 == arguments.length || values.put(name, arguments[i + 1]) != null) {
                throw new JobFault("option " + arguments[i], i + 1 == arguments.length ? "it has no value" : "it is there twice", "give one value");
            }
        }
        return new JobOptions(values);
    }

    /** Returns all options, one a line. */
    static String help() {
        StringBuilder out = new StringBuilder();
        KNOWN.forEach((name, words) -> out.append("  --").append(name).append("  ").append(words).append('\n'));
        return out.toString();
    }

    String text(String name, String initial) {
        return values.getOrDefault(name, initial);
    }

    /** @throws JobFault if it is missing */
    String required(String name) {
        if (text(name, "").isBlank()) {
            throw new JobFault("option --" + name, "it is missing", "give the " + KNOWN.get(name));
        }
        return values.get(name);
    }

    List<String> list(String name) {
        return Arrays.stream(text(name, "").split(",")).map(String::strip).filter(item -> !item.isEmpty()).toList();
    }

    Set<String> set(String name) {
        return new LinkedHashSet<>(list(name));
    }

    int whole(String name, int initial, int least) {
        double found = number(name).orElse(initial);
        if (found != Math.rint(found) || found < least || found > Integer.MAX_VALUE) {
            throw new JobFault("option --" + name, "the value " + text(name, ""), "give a whole number of at least " + least);
        }
        return (int) found;
    }

    OptionalDouble number(String name) {
        String found = text(name, "").strip();
        try {
            return found.isEmpty() ? OptionalDouble.empty() : OptionalDouble.of(Double.parseDouble(found));
        } catch (NumberFormatException wrong) {
            throw new JobFault("option --" + name, "the value " + found, "give a number with a decimal point");
        }
    }

    /** @throws JobFault if the value is none of those of the type */
    <E extends Enum<E>> E choice(String name, Class<E> type, E initial) {
        String found = text(name, "").strip();
        return found.isEmpty() ? initial : Arrays.stream(type.getEnumConstants())
                .filter(one -> one.name().equals(found.toUpperCase(java.util.Locale.ROOT).replace('-', '_'))).findFirst()
                .orElseThrow(() -> new JobFault("option --" + name, "the value " + found, "choose " + KNOWN.get(name)));
    }
}
