package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.List;
import java.util.Random;
import java.util.stream.DoubleStream;
import org.hipparchus.stat.StatUtils;
import org.hipparchus.stat.regression.SimpleRegression;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;

class PreparationFitTest {
    private static final double[] TIMES = Recordings.grid(50, 0.1);

    private static Run noisy(String id, long seed, double level) {
        Random random = new Random(seed);
        return Recordings.run(id, TIMES, t -> level + 3 * t + random.nextGaussian(), t -> random.nextGaussian() * 0.01);
    }

    private static double[] pooled(int channel, Run... runs) {
        return DoubleStream.concat(DoubleStream.of(Recordings.column(runs[0], channel)),
                DoubleStream.of(Recordings.column(runs[1], channel))).toArray();
    }

    @Test
    void meanAndDeviationAreThoseOfAllTrainingRunsTogetherByHipparchus() {
        Run a = noisy("A", 1, 1000);
        Run b = noisy("B", 2, 1005);
        Preparation found = Recordings.build(SnapshotPlan.DEFAULT.withPreparation(Detrend.MEAN, Scaling.STD), a, b)
                .preparation();
        for (int c = 0; c < 2; c++) {
            double[] all = pooled(c, a, b);
            // sums of 100 terms of size up to 1000
            assertEquals(StatUtils.mean(all), found.offset()[c], 1e-10);
            assertEquals(Math.sqrt(StatUtils.populationVariance(all)), found.scale()[c], 1e-10);
        }
    }

    @Test
    void oneLineThroughAllTrainingRunsAsByHipparchus() {
        Run a = noisy("A", 1, 10);
        Run b = noisy("B", 2, 12);
        Preparation found = Recordings.build(SnapshotPlan.DEFAULT.withPreparation(Detrend.LINEAR, Scaling.STD), a, b)
                .preparation();
        for (int c = 0; c < 2; c++) {
            SimpleRegression line = new SimpleRegression();
            for (int k = 0; k < TIMES.length; k++) {
                line.addData(TIMES[k], a.values().get(k, c));
                line.addData(TIMES[k], b.values().get(k, c));
            }
            assertEquals(line.getSlope(), found.slope()[c], 1e-12);
            assertEquals(line.predict(found.origin()), found.offset()[c], 1e-12);
            assertEquals(Math.sqrt(line.getSumSquaredErrors() / 100), found.scale()[c], 1e-12);
        }
    }

    @Test
    void channelsOfOneUnitShareOnePooledDeviationAndChannelsWithoutUnitStandAlone() {
        Run run = Recordings.run("A", TIMES, Math::sin, t -> 5 * Math.cos(2 * t), t -> 7 * Math.sin(3 * t),
                t -> t, t -> 2 * t);
        List<Channel> channels = List.of(new Channel("p", "bar"), new Channel("q", "m3/h"), new Channel("r", "bar"),
                new Channel("s", ""), new Channel("t", ""));
        Snapshots snapshots = SnapshotBuilder.build(
                new Recording(channels, List.of(), List.of(run), new TimeAxis(TimeAxis.Kind.NUMBER, "s")),
                SnapshotPlan.DEFAULT.withPreparation(Detrend.NONE, Scaling.UNIT_GROUP), Progress.NONE);
        double[] variance = new double[5];
        for (int c = 0; c < 5; c++) {
            variance[c] = StatUtils.populationVariance(Recordings.column(run, c));
        }
        double bar = Math.sqrt((variance[0] + variance[2]) / 2);
        double[] expected = {bar, Math.sqrt(variance[1]), bar, Math.sqrt(variance[3]), Math.sqrt(variance[4])};
        assertArrayEquals(expected, snapshots.preparation().scale(), 1e-13);
    }

    @Test
    void aConstantChannelAmongOthersOfItsUnitDoesNotStopUnitScaling() {
        Run run = Recordings.run("A", TIMES, Math::sin, t -> 2);
        List<Channel> channels = List.of(new Channel("p", "bar"), new Channel("q", "bar"));
        Snapshots snapshots = SnapshotBuilder.build(
                new Recording(channels, List.of(), List.of(run), new TimeAxis(TimeAxis.Kind.NUMBER, "s")),
                SnapshotPlan.DEFAULT.withPreparation(Detrend.MEAN, Scaling.UNIT_GROUP), Progress.NONE);
        double variance = StatUtils.populationVariance(Recordings.column(run, 0));
        assertEquals(Math.sqrt(variance / 2), snapshots.preparation().scale()[1], 1e-14);
        assertEquals("constant-channel", snapshots.doubts().get(0).code());
    }

    @Test
    void aChannelThatStandsStillInTrainingCannotBeScaledEvenIfItMovesInTheHoldout() {
        Run run = Recordings.run("A", TIMES, Math::sin, t -> t < 4 ? 0.1 : t);
        SnapshotPlan plan = SnapshotPlan.DEFAULT.withHoldout(new Split.TailDuration(1.5))
                .withPreparation(Detrend.MEAN, Scaling.STD);
        RecordingFault fault = assertThrows(RecordingFault.class, () -> Recordings.build(plan, run));
        assertEquals("channel c1", fault.where());
        assertEquals("leave the channel out or choose another scaling", fault.wanted());
    }

    @Test
    void aStraightLineCannotBeScaledByWhatIsLeftOfItAfterLinearDetrending() {
        Run run = Recordings.run("A", TIMES, t -> 101_325 + 0.3 * t);
        SnapshotPlan plan = SnapshotPlan.DEFAULT.withPreparation(Detrend.LINEAR, Scaling.STD);
        assertEquals("channel c0", assertThrows(RecordingFault.class, () -> Recordings.build(plan, run)).where());
    }
}
