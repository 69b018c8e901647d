package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.Combinators;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.recording.Snapshots.Part;

class SnapshotPropertiesTest {
    private static final int CHANNELS = 3;

    /** Two runs of noise on drifting waves, at jittered times, some cells missing, one input; values known at the seed. */
    private static Recording recording(long seed) {
        Random random = new Random(seed);
        List<Run> runs = new ArrayList<>();
        for (String id : List.of("A", "B")) {
            int p = 60 + random.nextInt(40);
            double[] times = new double[p];
            DMatrixRMaj values = new DMatrixRMaj(p, CHANNELS);
            DMatrixRMaj inputs = new DMatrixRMaj(p, 1);
            for (int k = 0; k < p; k++) {
                times[k] = (k + 0.3 * random.nextDouble()) / 4;
                for (int c = 0; c < CHANNELS; c++) {
                    double value = 10 * c + Math.sin((c + 1) * times[k]) + 0.2 * times[k] + 0.1 * random.nextGaussian();
                    values.set(k, c, random.nextInt(25) == 0 ? Double.NaN : value);
                }
                inputs.set(k, 0, random.nextInt(2));
            }
            runs.add(new Run(id, times, values, inputs, 0));
        }
        List<Channel> channels = List.of(new Channel("p", "bar"), new Channel("q", "bar"), new Channel("r", ""));
        return new Recording(channels, List.of(new Channel("valve", "")), runs, new TimeAxis(TimeAxis.Kind.NUMBER, "s"));
    }

    @Provide
    Arbitrary<SnapshotPlan> plans() {
        Arbitrary<Split> holdouts = Arbitraries.of(new Split.None(), new Split.Tail(0.25), new Split.TailDuration(3.1),
                new Split.Runs(List.of("B")));
        Arbitrary<Split> calibrations = Arbitraries.of(new Split.None(), new Split.Tail(0.2));
        return Combinators.combine(Arbitraries.of(Detrend.class), Arbitraries.of(Scaling.class), holdouts, calibrations,
                Arbitraries.of(true, false)).as((detrend, scaling, holdout, calibration, uniform) -> {
                    SnapshotPlan plan = SnapshotPlan.DEFAULT.withPreparation(detrend, scaling).withHoldout(holdout)
                            .withCalibration(calibration);
                    return uniform ? plan.withUniformStep(0.25).withDelay(3, 2) : plan;
                });
    }

    private static Snapshots build(Recording recording, SnapshotPlan plan) {
        return SnapshotBuilder.build(recording, plan, Progress.NONE);
    }

    private static Recording changed(Recording recording, List<Run> runs) {
        return new Recording(recording.channels(), recording.inputs(), runs, recording.time());
    }

    private static List<Run> all(Snapshots snapshots) {
        List<Run> runs = new ArrayList<>();
        for (Part part : Part.values()) {
            runs.addAll(snapshots.runs(part));
        }
        return runs;
    }

    @Property(tries = 60, seed = "20261201")
    void restoringAPreparedValueGivesTheRecordedOne(@ForAll long seed, @ForAll("plans") SnapshotPlan plan) {
        Recording recording = recording(seed);
        List<Run> plain = all(build(recording, plan.withPreparation(Detrend.NONE, Scaling.NONE)));
        Snapshots prepared = build(recording, plan);
        for (int r = 0; r < plain.size(); r++) {
            Run run = all(prepared).get(r);
            for (int k = 0; k < run.samples(); k++) {
                for (int c = 0; c < CHANNELS; c++) {
                    double back = prepared.preparation().restore(c, run.times()[k], run.values().get(k, c));
                    // values up to 30: a few units in the last place
                    assertEquals(plain.get(r).values().get(k, c), back, 3e-14);
                }
            }
        }
    }

    @Property(tries = 60, seed = "20261201")
    void theOrderOfChannelsOnlyPermutesTheResults(@ForAll long seed, @ForAll("plans") SnapshotPlan plan) {
        Recording recording = recording(seed);
        int[] order = {2, 0, 1};
        List<Run> turned = recording.runs().stream().map(run -> permuted(run, order)).toList();
        List<Channel> channels = List.of(recording.channels().get(2), recording.channels().get(0),
                recording.channels().get(1));
        Snapshots expected = build(recording, plan);
        Snapshots found = build(new Recording(channels, recording.inputs(), turned, recording.time()), plan);
        for (int r = 0; r < all(expected).size(); r++) {
            // the pooled deviation of a unit is summed in another order
            assertArrayEquals(permuted(all(expected).get(r), order).values().data, all(found).get(r).values().data, 1e-13);
        }
        assertEquals(expected.step(), found.step());
    }

    private static Run permuted(Run run, int[] order) {
        DMatrixRMaj values = new DMatrixRMaj(run.samples(), CHANNELS);
        for (int k = 0; k < run.samples(); k++) {
            for (int c = 0; c < CHANNELS; c++) {
                values.set(k, c, run.values().get(k, order[c]));
            }
        }
        return new Run(run.id(), run.times(), values, run.inputs(), run.leadIn());
    }

    @Property(tries = 60, seed = "20261201")
    void shiftingTimeAndChangingItsUnitLeavesTheStatesAlone(@ForAll long seed, @ForAll("plans") SnapshotPlan plan) {
        Recording recording = recording(seed);
        double unit = 60;
        double shift = 1000;
        List<Run> moved = recording.runs().stream().map(run -> {
            double[] times = Arrays.stream(run.times()).map(t -> unit * t + shift).toArray();
            return new Run(run.id(), times, run.values(), run.inputs(), run.leadIn());
        }).toList();
        List<StateRun> expected = states(build(recording, plan));
        List<StateRun> found = states(build(changed(recording, moved), inUnit(plan, unit)));
        assertEquals(expected.size(), found.size());
        for (int r = 0; r < expected.size(); r++) {
            // times of 1000 are rounded to 1e-13, slopes of the signals are below 10 per second
            assertArrayEquals(expected.get(r).states().data, found.get(r).states().data, 1e-10);
            assertEquals(unit * expected.get(r).times()[0] + shift, found.get(r).times()[0], 1e-9);
        }
    }

    private static SnapshotPlan inUnit(SnapshotPlan plan, double unit) {
        SnapshotPlan same = plan.holdout() instanceof Split.TailDuration tail
                ? plan.withHoldout(new Split.TailDuration(unit * tail.time())) : plan;
        return plan.step().isPresent() ? same.withUniformStep(unit * plan.step().getAsDouble()) : same;
    }

    private static List<StateRun> states(Snapshots snapshots) {
        List<StateRun> states = new ArrayList<>();
        for (Part part : Part.values()) {
            states.addAll(snapshots.states(part));
        }
        return states;
    }

    @Property(tries = 60, seed = "20261201")
    void trainingNeverSeesAValueOfCalibrationOrHoldout(@ForAll long seed, @ForAll("plans") SnapshotPlan plan) {
        Recording recording = recording(seed);
        List<Cut> cuts = Splitter.cuts(recording.runs(), plan.holdout(), plan.calibration());
        List<Run> spoiled = new ArrayList<>();
        for (int r = 0; r < cuts.size(); r++) {
            spoiled.add(spoiled(recording.runs().get(r), cuts.get(r).trainingEnd()));
        }
        Snapshots expected = build(recording, plan);
        Snapshots found = build(changed(recording, spoiled), plan);
        assertEquals(expected.training().size(), found.training().size());
        for (int r = 0; r < expected.training().size(); r++) {
            assertArrayEquals(expected.training().get(r).times(), found.training().get(r).times());
            assertArrayEquals(expected.training().get(r).values().data, found.training().get(r).values().data);
            assertArrayEquals(expected.training().get(r).inputs().data, found.training().get(r).inputs().data);
        }
        assertArrayEquals(expected.preparation().offset(), found.preparation().offset());
        assertArrayEquals(expected.preparation().slope(), found.preparation().slope());
        assertArrayEquals(expected.preparation().scale(), found.preparation().scale());
    }

    private static Run spoiled(Run run, int from) {
        DMatrixRMaj values = run.values().copy();
        DMatrixRMaj inputs = run.inputs().copy();
        for (int k = from; k < run.samples(); k++) {
            inputs.set(k, 0, -7);
            for (int c = 0; c < CHANNELS; c++) {
                values.set(k, c, 1e6 * (k % 3) - c);
            }
        }
        return new Run(run.id(), run.times(), values, inputs, run.leadIn());
    }

    @Property(tries = 60, seed = "20261201")
    void straightLinesAreResampledAndFilledExactly(@ForAll long seed, @ForAll("plans") SnapshotPlan plan) {
        Recording noisy = recording(seed);
        List<Run> lines = noisy.runs().stream().map(SnapshotPropertiesTest::straightened).toList();
        Snapshots snapshots = build(changed(noisy, lines), plan.withPreparation(Detrend.NONE, Scaling.NONE));
        for (Run run : all(snapshots)) {
            for (int k = 0; k < run.samples(); k++) {
                for (int c = 0; c < CHANNELS; c++) {
                    // lines reach 75
                    assertEquals(c + (c + 1) * run.times()[k], run.values().get(k, c), 1e-11);
                }
            }
        }
    }

    private static Run straightened(Run run) {
        DMatrixRMaj values = run.values().copy();
        for (int k = 0; k < run.samples(); k++) {
            for (int c = 0; c < CHANNELS; c++) {
                if (!Double.isNaN(values.get(k, c))) {
                    values.set(k, c, c + (c + 1) * run.times()[k]);
                }
            }
        }
        return new Run(run.id(), run.times(), values, run.inputs(), run.leadIn());
    }

    @Property(tries = 40, seed = "20261201")
    void theSamePlanGivesTheSameBits(@ForAll long seed, @ForAll("plans") SnapshotPlan plan) {
        Snapshots first = build(recording(seed), plan);
        Snapshots second = build(recording(seed), plan);
        assertEquals(first.facts(), second.facts());
        assertEquals(first.doubts(), second.doubts());
        for (int r = 0; r < all(first).size(); r++) {
            assertArrayEquals(all(first).get(r).values().data, all(second).get(r).values().data);
        }
    }
}
