package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.function.UnaryOperator;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Detrend;
import org.modestead.engine.recording.Recording;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.SnapshotBuilder;
import org.modestead.engine.recording.SnapshotPlan;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Split;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.SpectrumExtractor;

/** What must not matter: units of channels, order of runs and of channels, unit of time. */
class InvarianceTest {

    private static final double STEP = 0.1;

    private record Outcome(List<Mode> modes, Verdict verdict) {}

    private static List<Run> runs() {
        Random random = new Random(9);
        List<Run> out = new ArrayList<>();
        for (int i = 0; i < 8; i++) {
            double a = 0.5 + random.nextDouble();
            double turn = 6 * random.nextDouble();
            double b = 1 + random.nextDouble();
            out.add(Motions.run("r" + i, Motions.grid(120, STEP), t -> {
                double c = a * Math.exp(-0.1 * t) * Math.cos(2 * t + turn);
                double s = a * Math.exp(-0.1 * t) * Math.sin(2 * t + turn);
                double d = b * Math.exp(-0.3 * t);
                return new double[] {c + 0.3 * d, 0.5 * s - 0.2 * d, d + 0.1 * c};
            }, 0.002, random));
        }
        return out;
    }

    private static Outcome outcome(List<Run> runs, double timeUnit, Estimator estimator, int rank) {
        Recording recording = new Recording(List.of(new Channel("a", "bar"), new Channel("b", "m"), new Channel("c", "K")),
                List.of(), runs,
                new TimeAxis(TimeAxis.Kind.NUMBER, "s"));
        int depth = estimator instanceof LinearEstimator ? 4 : 1;
        SnapshotPlan plan = SnapshotPlan.DEFAULT.withUniformStep(STEP * timeUnit).withDelay(depth, 1)
                .withPreparation(Detrend.NONE, Scaling.STD).withHoldout(new Split.Runs(List.of("r2", "r5")));
        Snapshots snapshots = SnapshotBuilder.build(recording, plan, Progress.NONE);
        FittedOperator operator = Motions.fit(snapshots, estimator, rank);
        return new Outcome(SpectrumExtractor.extract(operator, Progress.NONE).modes(),
                Motions.judge(operator, JudgeSettings.DEFAULT));
    }

    private static void assertSame(UnaryOperator<List<Run>> change, double timeUnit) {
        assertSame(change, timeUnit, new LinearEstimator(), 3);
        assertSame(change, timeUnit, new KernelStepEstimator(Motions.kernel("linear"), 100), 3);
        assertSame(change, timeUnit, new OccupationEstimator(Motions.kernel("linear"), new SegmentPlan(10, 10), 1), 3);
    }

    private static void assertSame(UnaryOperator<List<Run>> change, double timeUnit, Estimator estimator, int rank) {
        Outcome before = outcome(runs(), 1, estimator, rank);
        Outcome after = outcome(change.apply(runs()), timeUnit, estimator, rank);
        List<Mode> modes = byRate(before.modes());
        List<Mode> again = byRate(after.modes());
        assertEquals(modes.size(), again.size());
        for (int k = 0; k < modes.size(); k++) {
            // only the order of additions changes; the fits have condition below 1e3
            assertEquals(modes.get(k).rate().re(), again.get(k).rate().re() * timeUnit, 1e-9, estimator.id());
            assertEquals(modes.get(k).rate().im(), again.get(k).rate().im() * timeUnit, 1e-9, estimator.id());
            assertEquals(modes.get(k).energyShare(), again.get(k).energyShare(), 1e-9, estimator.id());
            assertEquals(before.verdict().of(modes.get(k).number()).orElseThrow().grade(),
                    after.verdict().of(again.get(k).number()).orElseThrow().grade(), estimator.id());
        }
        assertEquals(before.verdict().overall().grade(), after.verdict().overall().grade());
    }

    private static List<Mode> byRate(List<Mode> modes) {
        return modes.stream().sorted(Comparator.comparingDouble(mode -> mode.rate().im())).toList();
    }

    private static List<Run> mapped(List<Run> runs, double timeUnit, UnaryOperator<double[]> row) {
        List<Run> out = new ArrayList<>();
        for (Run run : runs) {
            DMatrixRMaj values = new DMatrixRMaj(run.samples(), 3);
            double[] times = run.times().clone();
            for (int k = 0; k < run.samples(); k++) {
                times[k] *= timeUnit;
                double[] changed = row.apply(new double[] {run.values().get(k, 0), run.values().get(k, 1),
                        run.values().get(k, 2)});
                System.arraycopy(changed, 0, values.data, 3 * k, 3);
            }
            out.add(new Run(run.id(), times, values));
        }
        return out;
    }

    @Test
    void unitsOfChannelsDoNotMatterWhenScaledByTheirSpread() {
        assertSame(runs -> mapped(runs, 1, row -> new double[] {1e5 * row[0], 0.01 * row[1], row[2]}), 1);
    }

    @Test
    void orderOfRunsDoesNotMatter() {
        assertSame(runs -> {
            List<Run> reversed = new ArrayList<>(runs);
            Collections.reverse(reversed);
            return reversed;
        }, 1);
    }

    @Test
    void orderOfChannelsDoesNotMatter() {
        assertSame(runs -> mapped(runs, 1, row -> new double[] {row[2], row[0], row[1]}), 1);
    }

    @Test
    void unitOfTimeOnlyScalesTheRates() {
        assertSame(runs -> mapped(runs, 60, row -> row), 60);
        assertSame(runs -> mapped(runs, 1e-3, row -> row), 1e-3);
    }

    @Test
    void unevenTimesGiveTheGeneratorTheSameRates() {
        List<Run> uneven = new ArrayList<>();
        Random random = new Random(4);
        for (int i = 0; i < 6; i++) {
            double turn = i;
            double[] times = Motions.grid(80, 0.05);
            for (int k = 1; k < 79; k++) {
                times[k] += 0.02 * random.nextDouble();
            }
            uneven.add(Motions.run("r" + i, times, t -> new double[] {
                Math.exp(-0.1 * t) * Math.cos(2 * t + turn), Math.exp(-0.1 * t) * Math.sin(2 * t + turn)}, 0, random));
        }
        Snapshots snapshots = Motions.snapshots(OptionalDouble.empty(), DelayEmbedding.NONE, uneven, List.of());
        Mode mode = SpectrumExtractor.extract(Motions.fit(snapshots, new OccupationEstimator(Motions.kernel("linear"),
                new SegmentPlan(10, 0), 1), 2),
                Progress.NONE).modes().get(0);
        // closed form; quadrature of order 6 at steps of 0.05
        assertEquals(-0.1, mode.rate().re(), 1e-7);
        assertEquals(2, mode.rate().im(), 1e-7);
    }
}
