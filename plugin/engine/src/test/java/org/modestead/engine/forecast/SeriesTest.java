package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.List;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Snapshots.Part;

/** What a forecast may look back on. */
class SeriesTest {

    private static final Fixture.Signal CLOCK = t -> 10 * t;

    private static Snapshots snapshots(List<Run> training, List<Run> calibration, List<Run> holdout, OptionalDouble step) {
        return Fixture.snapshots(List.of("m"), training, calibration, holdout, step);
    }

    @Test
    void tailReachesBackThroughCalibrationIntoTraining() {
        Snapshots cut = snapshots(List.of(Fixture.run("a", 0, 10, 0, 1, CLOCK)),
                List.of(Fixture.run("a", 8, 15, 2, 1, CLOCK)), List.of(Fixture.run("a", 13, 20, 2, 1, CLOCK)),
                OptionalDouble.of(1));
        Series series = Series.of(cut, Part.HOLDOUT, 1).get(0);
        assertEquals(20, series.length());
        assertEquals(15, series.first());
        assertArrayEquals(Fixture.run("a", 0, 20, 0, 1, CLOCK).times(), series.times());
        assertArrayEquals(Fixture.run("a", 0, 20, 0, 1, CLOCK).values().data, series.values().data);
    }

    @Test
    void tailWithoutLeadInContinuesTheSampleBefore() {
        Snapshots cut = snapshots(List.of(Fixture.run("a", 0, 10, 0, 1, CLOCK)), List.of(),
                List.of(Fixture.run("a", 10, 14, 0, 1, CLOCK)),
                OptionalDouble.of(1));
        Series series = Series.of(cut, Part.HOLDOUT, 1).get(0);
        assertEquals(10, series.first());
        assertEquals(9, series.firstOrigin(1));
        assertEquals(4, series.ahead(1));
    }

    @Test
    void piecesAcrossAGapAreNotJoined() {
        Snapshots cut = snapshots(List.of(Fixture.run("a", 0, 10, 0, 1, CLOCK)), List.of(),
                List.of(Fixture.run("a", 13, 17, 0, 1, CLOCK)),
                OptionalDouble.of(1));
        Series series = Series.of(cut, Part.HOLDOUT, 1).get(0);
        assertEquals(4, series.length());
        assertEquals(0, series.firstOrigin(1), "the first sample of a run of its own is an origin, not a target");
    }

    @Test
    void everyRunEndsWhereItsLastPartEnds() {
        List<Run> training = List.of(Fixture.run("a", 0, 10, 0, 1, CLOCK), Fixture.run("b", 0, 5, 0, 1, CLOCK));
        Snapshots cut = snapshots(training, List.of(), List.of(Fixture.run("a", 10, 14, 0, 1, CLOCK)),
                OptionalDouble.of(1));
        List<Series> ends = Series.ends(cut, 1);
        assertEquals(List.of("a", "b"), ends.stream().map(Series::id).toList());
        assertEquals(13, ends.get(0).end());
        assertEquals(4, ends.get(1).end());
    }

    @Test
    void unevenRunsAreInterpolatedOntoAGridThroughTheOrigin() {
        double[] times = {0, 0.7, 2, 3.5, 4, 6};
        DMatrixRMaj values = new DMatrixRMaj(times.length, 1);
        for (int k = 0; k < times.length; k++) {
            values.data[k] = 3 - 2 * times[k];
        }
        Run holdout = new Run("a", times, values, new DMatrixRMaj(times.length, 0), 4);
        Series series = Series.of(snapshots(List.of(Fixture.run("b", 0, 5, 0, 1, CLOCK)), List.of(), List.of(holdout),
                OptionalDouble.empty()), Part.HOLDOUT, 1).get(0);
        // The last sample before the holdout is at 3.5; linear interpolation keeps a straight line.
        assertArrayEquals(new double[] {0.5, 1.5, 2.5, 3.5, 4.5, 5.5}, series.times(), 1e-12);
        assertEquals(4, series.first());
        for (int k = 0; k < 6; k++) {
            assertEquals(3 - 2 * series.times()[k], series.values().data[k], 1e-12);
        }
    }

    /** A grid of 10^12 steps, and one whose count passes what a whole number holds. */
    @Test
    void aTimeFarOffIsRefusedBeforeAGridFillsTheMemory() {
        for (double far : new double[] {1e12, 1e99}) {
            Run run = new Run("a", new double[] {0, 1, 2, far}, new DMatrixRMaj(4, 1), new DMatrixRMaj(4, 0), 0);
            Snapshots uneven = snapshots(List.of(Fixture.run("b", 0, 5, 0, 1, CLOCK)), List.of(), List.of(run), OptionalDouble.empty());
            String sentence = "run a: its times from 0.0 to " + far + " are " + (far == 1e12 ? "1.00e+12" : "1.00e+99")
                    + " steps of 1.0; split the run where its times leap, or resample it to a longer step.";
            assertEquals(sentence, assertThrows(ForecastFault.class, () -> Series.of(uneven, Part.HOLDOUT, 1)).getMessage());
            assertEquals(sentence, assertThrows(ForecastFault.class, () -> Series.ends(uneven, 1)).getMessage());
        }
    }
}
