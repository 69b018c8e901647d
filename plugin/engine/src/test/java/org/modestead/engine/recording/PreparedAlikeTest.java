package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;

class PreparedAlikeTest {

    private static final double[] TIMES = Recordings.grid(20, 0.5);
    private static final TimeAxis SECONDS = new TimeAxis(TimeAxis.Kind.NUMBER, "s");

    private static Snapshots fitted(SnapshotPlan plan) {
        return Recordings.build(plan, driven("a"), driven("b"));
    }

    /** x = 3 + t, y = cos t, driven by u = t² and v = -t. */
    private static Run driven(String id) {
        return new Run(id, TIMES, Recordings.run(id, TIMES, t -> 3 + t, Math::cos).values(),
                Recordings.run(id, TIMES, t -> t * t, t -> -t).values(), 0);
    }

    private static Snapshots fresh(SnapshotPlan plan, List<String> channels, List<String> inputs, Run... runs) {
        return SnapshotBuilder.build(new Recording(channels.stream().map(name -> new Channel(name, "")).toList(),
                inputs.stream().map(name -> new Channel(name, "")).toList(), List.of(runs), SECONDS), plan, Progress.NONE);
    }

    /** prepared = (recorded - mean over a) / deviation over a: for the line 3 + t that is (t - mean t) / deviation of t. */
    @Test
    void trendAndScaleAreThoseOfTheFitAndColumnsAreFoundByName() {
        Snapshots fitted = fitted(SnapshotPlan.DEFAULT.withPreparation(Detrend.MEAN, Scaling.STD).withDelay(2, 3));
        double[] later = Recordings.grid(9, 0.5);
        DMatrixRMaj values = Recordings.run("c", later, t -> -1, t -> 100 + t, t -> 7).values();
        DMatrixRMaj known = Recordings.run("c", later, t -> 5, t -> 6).values();
        Snapshots now = PreparedAlike.of(fitted, fresh(SnapshotPlan.DEFAULT, List.of("z", "c0", "c1"), List.of("u1", "u0"),
                new Run("c", later, values, known, 0)));
        double mean = 4.75;
        double deviation = 0.5 * Math.sqrt((20 * 20 - 1) / 12.0);
        Run run = now.holdout().get(0);
        for (int k = 0; k < later.length; k++) {
            // rounding of numbers around 100
            assertEquals((97 + later[k] - mean) / deviation, run.values().get(k, 0), 1e-12);
            assertEquals(6, run.inputs().get(k, 0));
            assertEquals(5, run.inputs().get(k, 1));
        }
        assertEquals(fitted.training(), now.training());
        assertEquals(fitted.delay(), now.delay());
        assertTrue(now.doubts().stream().anyMatch(doubt -> doubt.code().equals("beyond-training") && doubt.sentence().contains("c0 in 100 % of its samples")),
                now.doubts().toString());
    }

    @Test
    void partsOfARunAreJoinedWithoutTheHistoryThatRepeatsThem() {
        Snapshots fitted = fitted(SnapshotPlan.DEFAULT);
        SnapshotPlan parted = SnapshotPlan.DEFAULT.withDelay(3, 1).withHoldout(new Split.Tail(0.3)).withCalibration(new Split.Tail(0.3));
        Snapshots now = PreparedAlike.of(fitted, fresh(parted, List.of("c0", "c1"), List.of("u0", "u1"), driven("a"), driven("d")));
        assertEquals(List.of("a (new)", "d"), now.holdout().stream().map(Run::id).toList());
        for (Run run : now.holdout()) {
            assertArrayEquals(TIMES, run.times());
            assertArrayEquals(driven("d").values().data, run.values().data);
            assertArrayEquals(driven("d").inputs().data, run.inputs().data);
            assertEquals(0, run.leadIn());
        }
    }

    @Test
    void whatDoesNotSuitIsRefused() {
        Snapshots fitted = fitted(SnapshotPlan.DEFAULT.withDelay(4, 1));
        List<String> channels = List.of("c0", "c1");
        List<String> inputs = List.of("u0", "u1");
        double[] uneven = TIMES.clone();
        uneven[4] += 0.1;
        assertEquals("new recording: its steps are uneven; resample it to the step of the model, 0.5 s.", refused(fitted,
                fresh(SnapshotPlan.DEFAULT, channels, inputs, new Run("d", uneven, driven("d").values(), driven("d").inputs(), 0))));
        assertEquals("new recording: it has no input u1; bring every input of the model: u0, u1.", refused(fitted,
                fresh(SnapshotPlan.DEFAULT, channels, List.of("u0", "w"), driven("d"))));
        double[] brief = Recordings.grid(4, 0.5);
        assertEquals("new recording: no run has the 5 samples that two states need; bring longer runs.", refused(fitted,
                fresh(SnapshotPlan.DEFAULT, channels, inputs, new Run("d", brief, Recordings.run("d", brief, t -> t, t -> t).values(), new DMatrixRMaj(4, 2), 0))));
        Snapshots dates = SnapshotBuilder.build(new Recording(fitted.channels(), fitted.inputs(), List.of(driven("d")),
                new TimeAxis(TimeAxis.Kind.DATE_TIME, "s")), SnapshotPlan.DEFAULT, Progress.NONE);
        assertEquals("new recording: its times are date-times in s, those of the model numbers in s; give them alike, and count them in the same unit.",
                refused(fitted, dates));
    }

    private static String refused(Snapshots fitted, Snapshots fresh) {
        return assertThrows(RecordingFault.class, () -> PreparedAlike.of(fitted, fresh)).getMessage();
    }
}
