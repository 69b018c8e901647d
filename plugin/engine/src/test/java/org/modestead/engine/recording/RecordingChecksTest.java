package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.time.LocalDateTime;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Doubt;
import org.modestead.engine.RecordingFault;

class RecordingChecksTest {
    private static final TimeAxis SECONDS = new TimeAxis(TimeAxis.Kind.NUMBER, "s");

    private static String fault(Recording recording) {
        return assertThrows(RecordingFault.class, () -> RecordingChecks.check(recording)).getMessage();
    }

    private static Run run(String id, double[] times, double... values) {
        return new Run(id, times, new DMatrixRMaj(times.length, values.length / times.length, true, values));
    }

    @Test
    void aSoundRecordingRaisesNothing() {
        assertEquals(List.of(), RecordingChecks.check(Recordings.of(run("A", new double[] {0, 0.5}, 1, 2))));
    }

    @Test
    void noRunIsRefused() {
        assertEquals("recording: it has no run; give a table with at least two rows.",
                fault(new Recording(List.of(new Channel("p", "bar")), List.of(), List.of(), SECONDS)));
    }

    @Test
    void noChannelIsRefused() {
        assertEquals("recording: it has no channel; name at least one column as a channel.",
                fault(new Recording(List.of(), List.of(), List.of(), SECONDS)));
    }

    @Test
    void aRunOfOneSampleIsRefusedByName() {
        Run good = run("A", new double[] {0, 1}, 1, 2);
        assertEquals("run B: it has 1 sample; a run needs at least 2 samples; leave this run out or check the run column.",
                fault(Recordings.of(good, run("B", new double[] {0}, 1))));
    }

    @Test
    void twoRunsOfOneNameAreRefused() {
        Run good = run("A", new double[] {0, 1}, 1, 2);
        assertEquals("recording: runs 1 and 2 are both named A; give every run a name of its own.",
                fault(Recordings.of(good, good)));
    }

    @Test
    void aTimeThatIsNoNumberIsRefusedWithItsSample() {
        assertEquals("run A, sample 2: the time is NaN; give every sample a finite time or leave the sample out.",
                fault(Recordings.of(run("A", new double[] {0, Double.NaN, 2}, 1, 2, 3))));
        assertEquals("run A, sample 3: the time is Infinity; give every sample a finite time or leave the sample out.",
                fault(Recordings.of(run("A", new double[] {0, 1, Double.POSITIVE_INFINITY}, 1, 2, 3))));
    }

    @Test
    void aTimeThatFallsIsRefusedWithBothSamplesAndBothTimes() {
        assertEquals("run A, samples 2 and 3: the time falls from 1.0 s to 0.25 s; "
                + "sort the samples by time, or name the column that tells runs apart.",
                fault(Recordings.of(run("A", new double[] {0, 1, 0.25}, 1, 2, 3))));
    }

    @Test
    void aRepeatedTimeIsRefusedAsItWasWritten() {
        double noon = TimeAxis.ofDateTime(LocalDateTime.of(2024, 5, 1, 12, 0));
        Recording recording = new Recording(List.of(new Channel("p", "bar")), List.of(),
                List.of(run("A", new double[] {noon - 1, noon, noon}, 1, 2, 3)),
                new TimeAxis(TimeAxis.Kind.DATE_TIME, "s"));
        assertEquals("run A, samples 2 and 3: both have the time 2024-05-01T12:00:00; "
                + "keep one of the two, or name the column that tells runs apart.", fault(recording));
    }

    @Test
    void anInfiniteValueIsRefusedWithSampleTimeAndChannel() {
        assertEquals("run A, sample 2 (time 0.5 s), channel c1: the value is -Infinity; "
                + "replace it by a finite number or leave the cell empty.",
                fault(Recordings.of(run("A", new double[] {0, 0.5}, 1, 2, 3, Double.NEGATIVE_INFINITY))));
    }

    @Test
    void aChannelWithoutANumberInSomeRunIsRefused() {
        Run good = run("A", new double[] {0, 1}, 1, 2);
        assertEquals("run B, channel c0: none of the 2 samples has a number; "
                + "leave out this channel or this run, or check that the column holds numbers.",
                fault(Recordings.of(good, run("B", new double[] {0, 1}, Double.NaN, Double.NaN))));
    }

    @Test
    void anInputIsCheckedLikeAChannel() {
        DMatrixRMaj input = new DMatrixRMaj(2, 1, true, 0, Double.POSITIVE_INFINITY);
        Run run = new Run("A", new double[] {0, 1}, new DMatrixRMaj(2, 1, true, 1, 2), input, 0);
        assertEquals("run A, sample 2 (time 1.0 s), input u0: the value is Infinity; "
                + "replace it by a finite number or leave the cell empty.", fault(Recordings.of(run)));
    }

    @Test
    void aConstantChannelIsADoubtAmongOthersAndMissingCellsDoNotCount() {
        List<Doubt> doubts = RecordingChecks.check(
                Recordings.of(run("A", new double[] {0, 1, 2}, 1, 4.5, 2, Double.NaN, 3, 4.5)));
        assertEquals(List.of(new Doubt("constant-channel",
                "Channel c1 is 4.5 in every sample; it tells nothing about the motion.")), doubts);
    }

    @Test
    void aChannelThatStartsWithMissingCellsIsConstantAllTheSame() {
        List<Doubt> doubts = RecordingChecks.check(
                Recordings.of(run("A", new double[] {0, 1, 2, 3}, 1, Double.NaN, 2, 4.5, 2, 4.5, 2, Double.NaN)));
        assertEquals(List.of("constant-channel"), doubts.stream().map(Doubt::code).toList());
    }

    @Test
    void anInfiniteValueBesideAMissingCellIsRefused() {
        assertEquals("run A, sample 2 (time 1.0 s), channel c1: the value is Infinity; "
                + "replace it by a finite number or leave the cell empty.",
                fault(Recordings.of(run("A", new double[] {0, 1}, 1, 2, Double.NaN, Double.POSITIVE_INFINITY))));
    }

    @Test
    void onlyConstantChannelsAreRefused() {
        assertEquals("recording: all 2 channels are constant; name at least one channel that moves.",
                fault(Recordings.of(run("A", new double[] {0, 1}, 1, 4, 1, 4))));
        assertEquals("recording: channel c0 is 1 in every sample; name at least one channel that moves.",
                fault(Recordings.of(run("A", new double[] {0, 1}, 1, 1))));
    }

    @Test
    void aChannelThatIsConstantWithinRunsButNotBetweenThemMoves() {
        assertEquals(List.of(), RecordingChecks.check(
                Recordings.of(run("A", new double[] {0, 1}, 1, 1), run("B", new double[] {0, 1}, 2, 2))));
    }

    @Test
    void valuesAndTimesWhoseSquaresLeaveTheRangeOfNumbersAreRefused() {
        double[] times = {0, 0.5};
        assertEquals("run A, sample 2 (time 0.5 s), channel c0: the value is -2E+100; leave the cell empty if such a number marks what is missing,"
                + " or take a larger unit, so that values do not pass 1.0E100.", fault(Recordings.of(run("A", times, 1, -2e100))));
        assertEquals("channel c0: its largest value is 5E-101; take a smaller unit, so that values reach 1.0E-100.",
                fault(Recordings.of(run("A", times, 1e-200, -5e-101), run("B", times, 0, Double.MIN_VALUE))));
        assertEquals("run A, sample 2: the time is 2E+100; count times from a nearer origin or in a larger unit, so that they do not pass 1.0E100.",
                fault(Recordings.of(run("A", new double[] {0, 2e100}, 1, 2))));
        assertEquals("run A, sample 2: the time is 1E-101 after the one before; count times in a smaller unit, so that steps reach 1.0E-100.",
                fault(Recordings.of(run("A", new double[] {0, 1e-101}, 1, 2))));
    }

    @Test
    void theLimitsThemselvesAndSmallNumbersAmongOrdinaryOnesArePassed() {
        assertEquals(List.of(), RecordingChecks.check(Recordings.of(run("A", new double[] {0, 1e-100}, 1e-100, -1e100),
                run("B", new double[] {-1e100, 1e100}, Double.MIN_VALUE, 0))));
    }
}
