package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.RecordingFault;

class SplitterTest {
    private static final Split NONE = new Split.None();

    private static List<Run> runs(int... samples) {
        return IntStream.range(0, samples.length)
                .mapToObj(r -> Recordings.run("r" + (r + 1), Recordings.grid(samples[r], 0.1), t -> t)).toList();
    }

    private static String fault(List<Run> runs, Split holdout, Split calibration) {
        return assertThrows(RecordingFault.class, () -> Splitter.cuts(runs, holdout, calibration)).getMessage();
    }

    @Test
    void withoutSplitEverythingTrains() {
        assertEquals(List.of(new Cut(10, 10), new Cut(20, 20)), Splitter.cuts(runs(10, 20), NONE, NONE));
    }

    @Test
    void namedRunsAreKeptAwayWhole() {
        assertEquals(List.of(new Cut(0, 10), new Cut(20, 20), new Cut(0, 0)),
                Splitter.cuts(runs(10, 20, 30), new Split.Runs(List.of("r3")), new Split.Runs(List.of("r1"))));
    }

    @Test
    void aShareOfRunsTakesTheLastOnesAndCalibrationTheLastOfTheRest() {
        assertEquals(List.of(new Cut(5, 5), new Cut(5, 5), new Cut(0, 5), new Cut(0, 0), new Cut(0, 0)),
                Splitter.cuts(runs(5, 5, 5, 5, 5), new Split.RunShare(0.4), new Split.RunShare(0.2)));
    }

    @Test
    void aTailShareCountsSamplesAndCalibrationLiesJustBefore() {
        assertEquals(List.of(new Cut(64, 80), new Cut(32, 40)),
                Splitter.cuts(runs(100, 50), new Split.Tail(0.2), new Split.Tail(0.2)));
    }

    @Test
    void twentyFourOf468MonthsAreATailOfExactly24() {
        assertEquals(List.of(new Cut(444, 444)), Splitter.cuts(runs(468), new Split.Tail(24.0 / 468), NONE));
    }

    @Test
    void aTailOfTwoSecondsAtATenthHoldsTwentySamplesWhateverTheRoundingOfTimes() {
        for (int samples = 40; samples < 140; samples++) {
            assertEquals(List.of(new Cut(samples - 20, samples - 20)),
                    Splitter.cuts(runs(samples), new Split.TailDuration(2), NONE));
        }
    }

    @Test
    void aTailLongerThanARunTakesTheRunWholeWhenAnotherTrains() {
        assertEquals(List.of(new Cut(0, 0), new Cut(30, 30)), Splitter.cuts(runs(10, 50), new Split.TailDuration(2), NONE));
    }

    @Test
    void anUnknownRunIsRefusedWithTheKnownOnes() {
        assertEquals("holdout run r9: there is no such run; name one of r1, r2.",
                fault(runs(5, 5), new Split.Runs(List.of("r9")), NONE));
    }

    @Test
    void aRunKeptAwayTwiceIsRefused() {
        assertEquals("calibration run r2: it is kept away already; name it once only.",
                fault(runs(5, 5), new Split.Runs(List.of("r2")), new Split.Runs(List.of("r2"))));
    }

    @Test
    void aSplitThatLeavesNothingToTrainIsRefused() {
        assertEquals("holdout: no run of r1, r2 is left for training; "
                + "keep fewer or shorter runs away, or use the end of every run instead of whole runs.",
                fault(runs(5, 5), new Split.Runs(List.of("r1", "r2")), NONE));
        assertEquals("calibration: no run of r1, r2 is left for training; "
                + "keep fewer or shorter runs away, or use the end of every run instead of whole runs.",
                fault(runs(5, 5), new Split.RunShare(0.5), new Split.RunShare(0.5)));
    }

    @Test
    void noNameIsRefused() {
        assertEquals("holdout: no run is named; name at least one of r1.", fault(runs(5), new Split.Runs(List.of()), NONE));
    }

    @Test
    void sharesOutsideZeroToOneAndTimesThatAreNotPositiveAreProgrammingErrors() {
        assertThrows(IllegalArgumentException.class, () -> new Split.Tail(1));
        assertThrows(IllegalArgumentException.class, () -> new Split.RunShare(0));
        assertThrows(IllegalArgumentException.class, () -> new Split.Tail(Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> new Split.TailDuration(0));
    }
}
