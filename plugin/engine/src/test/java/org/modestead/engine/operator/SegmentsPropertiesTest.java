package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.OccupationFunctions.Segment;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

class SegmentsPropertiesTest {

    private static List<Segment> segments(int steps, int samples) {
        Snapshots snapshots = Motions.snapshots(0.5, 1, List.of(Motions.run("a", steps + 1, 0.5, t -> new double[] {t})),
                List.of());
        return Segments.of(snapshots.states(Snapshots.Part.TRAINING), new SegmentPlan(samples, 0));
    }

    @Property(tries = 200, seed = "20261201")
    void segmentsCoverTheRunWithoutGapOrOverlap(@ForAll @IntRange(min = 1, max = 200) int steps,
            @ForAll @IntRange(min = 2, max = 50) int samples) {
        List<Segment> segments = segments(steps, samples);
        double at = 0;
        for (Segment segment : segments) {
            assertEquals(at, segment.times()[0], 1e-12);
            assertArrayEquals(new double[] {segment.times()[0]}, segment.start(), 1e-12);
            at = segment.times()[segment.times().length - 1];
            assertArrayEquals(new double[] {at}, segment.end(), 1e-12);
        }
        assertEquals(0.5 * steps, at, 1e-12);
    }

    @Property(tries = 200, seed = "20261201")
    void noSegmentIsShorterThanHalfOrLongerThanOneAndAHalfOfThePlan(@ForAll @IntRange(min = 1, max = 200) int steps,
            @ForAll @IntRange(min = 2, max = 50) int samples) {
        for (Segment segment : segments(steps, samples)) {
            int length = segment.times().length - 1;
            assertTrue(length <= 1.5 * samples, length + " steps");
            assertTrue(length >= 0.5 * Math.min(samples, steps), length + " steps");
        }
    }

    @Property(tries = 50, seed = "20261201")
    void aPlanOfZeroTakesTheWholeRun(@ForAll @IntRange(min = 1, max = 100) int steps) {
        assertEquals(1, segments(steps, 0).size());
    }

    @Property(tries = 20, seed = "20261201")
    void aRunOfOneStateHasNoSegment(@ForAll @IntRange(min = 2, max = 9) int samples) {
        StateRun single = new StateRun("a", new double[] {1}, new DMatrixRMaj(1, 1), new DMatrixRMaj(1, 0));
        assertTrue(Segments.of(List.of(single), new SegmentPlan(samples, 0)).isEmpty());
    }
}
