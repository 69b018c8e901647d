package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.RecordingFault;

/**
 * Whether a recording can be used at all, before any preparation.
 *
 * <p>Refused: no channel, no run, two runs of one name, a run of fewer than two samples, times that are no finite
 * numbers or do not rise, infinite values, numbers beyond {@link SizeLimits}, a channel or an input without a single number in some run,
 * and channels that are all constant. One constant channel among others is a doubt: it carries nothing, but harms nothing either.
 */
public final class RecordingChecks {
    private final Recording recording;
    private final Wording wording;

    private RecordingChecks(Recording recording) {
        this.recording = recording;
        this.wording = new Wording(recording.time());
    }

    /**
     * Checks a recording.
     *
     * @param recording any
     * @return one doubt for each constant channel, in column order
     * @throws RecordingFault for the first thing that makes it unusable
     */
    public static List<Doubt> check(Recording recording) {
        RecordingChecks checks = new RecordingChecks(recording);
        checks.content();
        for (Run run : recording.runs()) {
            checks.times(run);
            checks.numbers(run, run.values(), recording.channels(), "channel");
            checks.numbers(run, run.inputs(), recording.inputs(), "input");
        }
        checks.sizes(recording.channels().size(), false);
        checks.sizes(recording.inputs().size(), true);
        return checks.constants();
    }

    private void content() {
        if (recording.channels().isEmpty()) {
            throw new RecordingFault("recording", "it has no channel", "name at least one column as a channel");
        }
        if (recording.runs().isEmpty()) {
            throw new RecordingFault("recording", "it has no run", "give a table with at least two rows");
        }
        Map<String, Integer> seen = new HashMap<>();
        for (int i = 0; i < recording.runs().size(); i++) {
            Run run = recording.runs().get(i);
            Integer earlier = seen.put(run.id(), i + 1);
            if (earlier != null) {
                throw new RecordingFault("recording", "runs " + earlier + " and " + (i + 1) + " are both named " + run.id(),
                        "give every run a name of its own");
            }
            if (run.samples() < 2) {
                throw new RecordingFault("run " + run.id(), "it has " + Wording.count(run.samples(), "sample"),
                        "a run needs at least 2 samples; leave this run out or check the run column");
            }
        }
    }

    private void times(Run run) {
        double[] times = run.times();
        for (int i = 0; i < times.length; i++) {
            if (!Double.isFinite(times[i])) {
                throw new RecordingFault("run " + run.id() + ", sample " + (i + 1), "the time is " + times[i],
                        "give every sample a finite time or leave the sample out");
            }
            if (i > 0 && times[i] <= times[i - 1]) {
                throw risingFault(run, i);
            }
            Optional<RecordingFault> size = SizeLimits.ofTime("run " + run.id() + ", sample " + (i + 1), times[i], i == 0 ? 1 : times[i] - times[i - 1]);
            if (size.isPresent()) {
                throw size.get();
            }
        }
    }

    private RecordingFault risingFault(Run run, int row) {
        double earlier = run.times()[row - 1];
        double later = run.times()[row];
        String where = "run " + run.id() + ", samples " + row + " and " + (row + 1);
        if (earlier == later) {
            return new RecordingFault(where, "both have the time " + wording.time(earlier),
                    "keep one of the two, or name the column that tells runs apart");
        }
        return new RecordingFault(where, "the time falls from " + wording.time(earlier) + " to " + wording.time(later),
                "sort the samples by time, or name the column that tells runs apart");
    }

    private void numbers(Run run, DMatrixRMaj values, List<Channel> columns, String kind) {
        int n = columns.size();
        boolean[] hasNumber = new boolean[n];
        boolean whole = false;
        for (int i = 0; i < run.samples(); i++) {
            if (!usable(values.data, i * n, n)) {
                cells(run, i, values, columns, kind, hasNumber);
            } else if (!whole) {
                Arrays.fill(hasNumber, true);
                whole = true;
            }
        }
        for (int c = 0; c < n; c++) {
            if (!hasNumber[c]) {
                throw new RecordingFault("run " + run.id() + ", " + kind + " " + columns.get(c).name(),
                        "none of the " + run.samples() + " samples has a number",
                        "leave out this " + kind + " or this run, or check that the column holds numbers");
            }
        }
    }

    private void sizes(int columns, boolean input) {
        for (int c = 0; c < columns; c++) {
            Optional<RecordingFault> tooSmall = SizeLimits.ofColumn(recording, c, input);
            if (tooSmall.isPresent()) {
                throw tooSmall.get();
            }
        }
    }

    private static boolean usable(double[] data, int from, int length) {
        boolean usable = true;
        for (int k = from; k < from + length; k++) {
            usable &= SizeLimits.holds(data[k]);
        }
        return usable;
    }

    private void cells(Run run, int row, DMatrixRMaj values, List<Channel> columns, String kind, boolean[] hasNumber) {
        for (int c = 0; c < hasNumber.length; c++) {
            double value = values.data[row * hasNumber.length + c];
            if (!SizeLimits.holds(value) && !Double.isNaN(value)) {
                throw SizeLimits.tooLarge(wording.sample(run, row) + ", " + kind + " " + columns.get(c).name(), value);
            }
            hasNumber[c] |= !Double.isNaN(value);
        }
    }

    private List<Doubt> constants() {
        int n = recording.channels().size();
        double[] seen = new double[n];
        Arrays.fill(seen, Double.NaN);
        int[] unmoved = unmoved(seen);
        if (unmoved.length == n) {
            throw new RecordingFault("recording", n == 1 ? "channel " + recording.channels().get(0).name() + " is "
                    + Wording.number(seen[0]) + " in every sample" : "all " + n + " channels are constant",
                    "name at least one channel that moves");
        }
        return Arrays.stream(unmoved).mapToObj(c -> new Doubt("constant-channel", "Channel " + recording.channels().get(c).name() + " is "
                + Wording.number(seen[c]) + " in every sample; it tells nothing about the motion.")).toList();
    }

    /** Channels without two different numbers; moving ones drop out at the first difference and are not looked at further. */
    private int[] unmoved(double[] seen) {
        int[] left = IntStream.range(0, seen.length).toArray();
        int count = left.length;
        for (Run run : recording.runs()) {
            for (int i = 0; i < run.samples() && count > 0; i++) {
                count = alike(left, count, run.values().data, i * seen.length, seen);
            }
        }
        return Arrays.copyOf(left, count);
    }

    private static int alike(int[] left, int count, double[] data, int from, double[] seen) {
        int kept = 0;
        for (int k = 0; k < count; k++) {
            int c = left[k];
            seen[c] = Double.isNaN(seen[c]) ? data[from + c] : seen[c];
            if (data[from + c] == seen[c] || Double.isNaN(data[from + c])) {
                left[kept++] = c;
            }
        }
        return kept;
    }
}
