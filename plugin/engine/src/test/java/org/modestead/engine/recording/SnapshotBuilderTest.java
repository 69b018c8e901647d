package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.modestead.engine.recording.Recordings.build;
import static org.modestead.engine.recording.Recordings.column;
import static org.modestead.engine.recording.Recordings.fact;
import static org.modestead.engine.recording.Recordings.grid;
import static org.modestead.engine.recording.Recordings.ids;
import static org.modestead.engine.recording.Recordings.run;
import static org.modestead.engine.recording.Recordings.without;

import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.DoubleStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.Snapshots.Part;

class SnapshotBuilderTest {
    private static final SnapshotPlan PLAIN = SnapshotPlan.DEFAULT;
    /** One step a second, with a pause of 5 s after the time 9. */
    private static final double[] PAUSE = DoubleStream.concat(DoubleStream.of(grid(10, 1)),
            DoubleStream.of(grid(10, 1)).map(t -> t + 14)).toArray();

    private static String fault(SnapshotPlan plan, Run... runs) {
        return assertThrows(RecordingFault.class, () -> build(plan, runs)).getMessage();
    }

    private static List<String> doubts(Snapshots snapshots) {
        return snapshots.doubts().stream().map(Doubt::sentence).toList();
    }

    @Test
    void anEvenRecordingPassesUnchangedWithItsStep() {
        Run run = run("A", grid(20, 0.1), Math::sin, Math::cos);
        Snapshots snapshots = build(PLAIN, run);
        assertEquals(0.1, snapshots.step().orElseThrow(), 1e-16);
        assertArrayEquals(run.times(), snapshots.training().get(0).times());
        assertSame(run.values(), snapshots.training().get(0).values(), "what is not changed is not copied");
        assertEquals(List.of(), snapshots.doubts());
        assertArrayEquals(new double[] {1, 1}, snapshots.preparation().scale());
    }

    @Test
    void theRecordedArraysAreNeverWritten() {
        Run run = without(run("A", grid(20, 0.1), Math::sin, t -> 3 + t), 4, 0);
        double[] before = run.values().data.clone();
        build(PLAIN.withPreparation(Detrend.LINEAR, Scaling.NONE), run);
        assertArrayEquals(before, run.values().data);
    }

    @Test
    void norAreThoseOfARunWithoutAHole() {
        Run run = run("A", grid(20, 0.1), Math::sin, t -> 3 + t);
        double[] before = run.values().data.clone();
        Snapshots detrended = build(PLAIN.withPreparation(Detrend.LINEAR, Scaling.NONE), run);
        assertArrayEquals(before, run.values().data);
        assertEquals(0, detrended.training().get(0).values().get(7, 1), 1e-12, "a straight line is all trend");
    }

    @Test
    void aGapSplitsARunAndTheDoubtSaysWhereAndHowLong() {
        Snapshots snapshots = build(PLAIN, run("A", PAUSE, Math::sin), run("B", grid(5, 1), Math::cos));
        assertEquals(List.of("A#1", "A#2", "B"), ids(snapshots.training()));
        assertEquals(9, snapshots.training().get(0).times()[9]);
        assertEquals(14, snapshots.training().get(1).times()[0]);
        assertEquals(OptionalDouble.of(1), snapshots.step());
        assertEquals(List.of("Run A has 1 gap, split there: 5 s after 9.0 s; the median step is 1 s."), doubts(snapshots));
        assertEquals("1 found, split, 4 s in all", fact(snapshots, "gaps"));
    }

    @Test
    void aGapIsBridgedByEvenSamplesWhenRecordedTimesAreKept() {
        Snapshots snapshots = build(PLAIN.withGaps(GapPolicy.INTERPOLATE, 1.5), run("A", PAUSE, t -> 2 * t - 1));
        Run run = snapshots.training().get(0);
        assertArrayEquals(grid(24, 1), run.times());
        // a straight line
        assertArrayEquals(Arrays.stream(grid(24, 1)).map(t -> 2 * t - 1).toArray(), column(run, 0), 1e-13);
        assertEquals("4", fact(snapshots, "samples at new times"));
        assertEquals("1 found, interpolated, 4 s in all", fact(snapshots, "gaps"));
        assertEquals(List.of("Run A has 1 gap, bridged by interpolation: 5 s after 9.0 s; the median step is 1 s."),
                doubts(snapshots));
    }

    @Test
    void aGapIsRefusedWithPlaceLengthAndRemedy() {
        assertEquals("run A, samples 10 and 11: a gap of 5 s from 9.0 s to 14.0 s, the median step is 1 s (1 gap in this "
                + "run); have gaps split or interpolated, or raise the gap factor.",
                fault(PLAIN.withGaps(GapPolicy.REFUSE, 1.5), run("A", PAUSE, Math::sin)));
    }

    @Test
    void aStepOfExactlyTheGapFactorIsNoGap() {
        double[] times = {0, 1, 2, 3.5, 4.5, 5.5};
        assertEquals(List.of("A"), ids(build(PLAIN, run("A", times, Math::sin)).training()));
        assertEquals(List.of("A#1", "A#2"),
                ids(build(PLAIN.withGaps(GapPolicy.SPLIT, 1.4), run("A", times, Math::sin)).training()));
    }

    @Test
    void aPieceTooShortForTwoStatesIsLeftOutWithADoubtAndTheOthersKeepTheirNumbers() {
        double[] times = {0, 1, 2, 3, 4, 10, 11, 20, 21, 22, 23};
        Snapshots snapshots = build(PLAIN.withDelay(2, 1), run("A", times, Math::sin));
        assertEquals(List.of("A#1", "A#3"), ids(snapshots.training()));
        assertTrue(doubts(snapshots).contains(
                "Run A: 2 samples left out, in pieces with fewer than the 3 samples two states need."),
                doubts(snapshots)::toString);
        assertEquals("2", fact(snapshots, "samples left out"));
    }

    @Test
    void aRunTooShortForTheDelaysIsRefusedWithWhatItHasAndNeeds() {
        assertEquals("run B: it has 4 samples, two states of delay depth 3 and spacing 2 need 6; "
                + "choose a smaller delay depth, or leave this run out.",
                fault(PLAIN.withDelay(3, 2), run("A", grid(20, 1), Math::sin), run("B", grid(4, 1), Math::sin)));
    }

    @Test
    void aRunThatFallsIntoPiecesTooShortIsRefused() {
        assertEquals("run A: the longest of its 3 pieces has 3 samples, two states of delay depth 4 and spacing 1 need 5; "
                + "have gaps and missing cells interpolated or raise the gap factor, choose a smaller delay depth, "
                + "or leave this run out.",
                fault(PLAIN.withDelay(4, 1), run("A", new double[] {0, 1, 2, 8, 9, 10, 18, 19}, Math::sin)));
    }

    @Test
    void resamplingNeverLeavesTheRunAndNeverCrossesASplitGap() {
        Snapshots snapshots = build(PLAIN.withUniformStep(0.4), run("A", PAUSE, t -> t < 10 ? 0.5 * t : 100 - t));
        Run first = snapshots.training().get(0);
        Run second = snapshots.training().get(1);
        assertEquals(23, first.samples());
        assertEquals(8.8, first.times()[22], 1e-14);
        assertEquals(14, second.times()[0]);
        assertEquals(OptionalDouble.of(0.4), snapshots.step());
        for (int k = 0; k < 23; k++) {
            // lines on both sides: a curve that saw the other side would bend at the ends
            assertEquals(0.5 * first.times()[k], first.values().get(k, 0), 1e-13);
            assertEquals(100 - second.times()[k], second.values().get(k, 0), 1e-12);
        }
    }

    @Test
    void resamplingWithoutAStepTakesTheMedianOfAllRuns() {
        Snapshots snapshots = build(PLAIN.withUniformStep(), run("A", new double[] {0, 0.9, 2, 3, 4.1, 5}, Math::sin),
                run("B", grid(9, 1), Math::sin));
        assertEquals(OptionalDouble.of(1), snapshots.step());
        assertArrayEquals(grid(6, 1), snapshots.training().get(0).times());
        assertEquals("2", fact(snapshots, "samples at new times"), "1 and 4; the other four are recorded");
        assertEquals("1 s, resampled", fact(snapshots, "step"));
    }

    @Test
    void resamplingAnEvenRecordingToItsOwnStepChangesNoValue() {
        Run run = run("A", grid(1000, 0.1), Math::sin);
        Snapshots snapshots = build(PLAIN.withUniformStep(0.1), run);
        assertArrayEquals(run.values().data, snapshots.training().get(0).values().data);
        assertEquals("0", fact(snapshots, "samples at new times"));
    }

    @Test
    void everyFifthSampleIsTakenAsItIsWhateverTheRoundingOfTimes() {
        Run run = run("A", grid(5001, 0.01), Math::sin);
        Snapshots snapshots = build(PLAIN.withUniformStep(0.05), run);
        assertEquals("0", fact(snapshots, "samples at new times"));
        assertEquals(1001, snapshots.training().get(0).samples());
        assertEquals(List.of("Resampling to a step of 0.05 s, coarser than the recorded 0.01 s, keeps no frequency above "
                + "10 cycles per s; faster motion in the recording appears folded, as no filter is applied."),
                doubts(snapshots));
    }

    @Test
    void theLastSampleOfAGridIsNotLostToRounding() {
        double[] times = {0, 0.12, 0.2, 0.3};
        assertTrue(0.3 / 0.1 < 3, "the case means nothing if the quotient is exact");
        Run run = build(PLAIN.withUniformStep(0.1), run("A", times, t -> t)).training().get(0);
        assertArrayEquals(new double[] {0, 0.1, 0.2, 0.3}, run.times(), 1e-15);
        assertArrayEquals(new double[] {0, 0.1, 0.2, 0.3}, column(run, 0), 1e-15);
    }

    @Test
    void aStepThatWouldFillTheMemoryIsRefused() {
        assertEquals("run A: a step of 1E-12 would give 1.9E+13 samples; choose a step near the median step 1.",
                fault(PLAIN.withUniformStep(1e-12), run("A", grid(20, 1), Math::sin)));
    }

    @Test
    void unevenTimesAreKeptWithoutDelaysAndRefusedWithThem() {
        Run run = run("A", new double[] {0, 1, 2.2, 3.1, 4}, Math::sin);
        assertEquals(OptionalDouble.empty(), build(PLAIN, run).step());
        assertEquals("uneven, recorded times kept", fact(build(PLAIN, run), "step"));
        assertEquals("recording: its time steps run from 0.9 s to 1.2 s, but delay depth 2 needs one step throughout; "
                + "resample to a uniform step, for example the median 1 s.", fault(PLAIN.withDelay(2, 1), run));
    }

    @Test
    void inputsAreCarriedAlongResampledButNeitherDetrendedNorScaled() {
        double[] times = {0, 0.9, 2, 3.2, 4, 5};
        DMatrixRMaj input = new DMatrixRMaj(6, 1, true, times);
        Run run = run("A", times, Math::sin);
        Snapshots snapshots = build(PLAIN.withUniformStep(1).withPreparation(Detrend.LINEAR, Scaling.STD),
                new Run("A", times, run.values(), input, 0));
        assertArrayEquals(grid(6, 1), snapshots.training().get(0).inputs().data, 1e-14);
    }

    @Test
    void missingCellsAreInterpolatedInTheirOwnColumnAndCounted() {
        Run run = run("A", grid(60, 0.1), t -> 3 * t, Math::sin);
        Snapshots snapshots = build(PLAIN, without(without(run, 5, 0), 6, 0));
        assertArrayEquals(column(run, 0), column(snapshots.training().get(0), 0), 1e-13);
        assertArrayEquals(column(run, 1), column(snapshots.training().get(0), 1));
        assertEquals("2 of 120, 2 interpolated", fact(snapshots, "missing cells"));
        assertEquals(List.of(), doubts(snapshots), "2 of 60 is below 5 %");
    }

    @Test
    void aColumnWithMoreThanATwentiethInterpolatedIsADoubt() {
        Run run = run("A", grid(40, 0.1), Math::cos, Math::sin);
        Snapshots snapshots = build(PLAIN, without(without(without(run, 5, 1), 6, 1), 20, 1));
        assertEquals(List.of("Column c1: 7.5 % of its samples (3 of 40) were missing and are interpolated; "
                + "what moves within such holes is invented."), doubts(snapshots));
    }

    @Test
    void samplesBeforeTheFirstAndAfterTheLastNumberOfAColumnAreLeftOut() {
        Run run = run("A", grid(60, 1), Math::cos, Math::sin);
        Snapshots snapshots = build(PLAIN, without(without(without(run, 0, 1), 1, 1), 59, 0));
        assertEquals(57, snapshots.training().get(0).samples());
        assertEquals(2, snapshots.training().get(0).times()[0]);
        assertEquals(List.of("Run A: 3 samples left out, where a column has no number."), doubts(snapshots));
        assertEquals("3 of 120, 0 interpolated", fact(snapshots, "missing cells"));
    }

    @Test
    void missingCellsSplitTheRunAroundTheirSamples() {
        Run run = without(run("A", grid(20, 1), Math::cos, Math::sin), 7, 1);
        Snapshots snapshots = build(PLAIN.withMissing(MissingPolicy.SPLIT), run);
        assertEquals(List.of("A#1", "A#2"), ids(snapshots.training()));
        assertEquals(7, snapshots.training().get(0).samples());
        assertEquals(8, snapshots.training().get(1).times()[0]);
        assertEquals("1 of 40, split there", fact(snapshots, "missing cells"));
    }

    @Test
    void missingCellsAreRefusedWithRunSampleTimeAndColumn() {
        Run run = without(without(run("A", grid(20, 0.5), Math::cos, Math::sin), 7, 1), 9, 0);
        assertEquals("run A, sample 8 (time 3.5 s), column c1: the cell has no number (2 such cells in this run); "
                + "fill the cells, or have them interpolated or split.",
                fault(PLAIN.withMissing(MissingPolicy.REFUSE), run));
    }

    @Test
    void theFirstHoldoutStateIsTheLastStateBeforeTheSplit() {
        Run run = run("A", grid(50, 0.1), Math::sin, Math::cos);
        Snapshots snapshots = build(PLAIN.withDelay(4, 2).withHoldout(new Split.Tail(0.2)), run);
        StateRun training = snapshots.states(Part.TRAINING).get(0);
        StateRun holdout = snapshots.states(Part.HOLDOUT).get(0);
        assertEquals(7, snapshots.holdout().get(0).leadIn());
        assertEquals(training.times()[training.count() - 1], holdout.times()[0]);
        assertEquals(11, holdout.count(), "one known state and ten to predict");
        for (int c = 0; c < 8; c++) {
            assertEquals(training.states().get(training.count() - 1, c), holdout.states().get(0, c));
        }
        assertEquals("10", fact(snapshots, "holdout samples"));
        assertEquals("11", fact(snapshots, "holdout states"));
    }

    @Test
    void withoutDelaysATailCarriesTheOneSampleBeforeIt() {
        Snapshots snapshots = build(PLAIN.withHoldout(new Split.Tail(0.2)), run("A", grid(50, 0.1), Math::sin));
        assertEquals(1, snapshots.holdout().get(0).leadIn());
        assertEquals(11, snapshots.holdout().get(0).samples());
    }

    @Test
    void calibrationLiesBetweenTrainingAndATailHoldoutAndHandsOnTheHistory() {
        Snapshots snapshots = build(
                PLAIN.withDelay(3, 1).withHoldout(new Split.Tail(0.2)).withCalibration(new Split.Tail(0.1)),
                run("A", grid(50, 1), Math::sin));
        assertEquals(35, snapshots.training().get(0).times()[35]);
        assertEquals(36, snapshots.training().get(0).samples());
        assertArrayEquals(new double[] {33, 34, 35, 36, 37, 38, 39}, snapshots.calibration().get(0).times());
        assertEquals(37, snapshots.holdout().get(0).times()[0], "three samples of history before 40");
        assertEquals(3, snapshots.calibration().get(0).leadIn());
    }

    @Test
    void aWholeRunKeptAwayHasNoLeadIn() {
        Snapshots snapshots = build(PLAIN.withDelay(3, 1).withHoldout(new Split.Runs(List.of("B"))),
                run("A", grid(50, 1), Math::sin), run("B", grid(30, 1), Math::cos));
        assertEquals(List.of("B"), ids(snapshots.holdout()));
        assertEquals(0, snapshots.holdout().get(0).leadIn());
        assertEquals(30, snapshots.holdout().get(0).samples());
    }

    @Test
    void aTailAfterAGapIsAPieceOfItsOwn() {
        Snapshots snapshots = build(PLAIN.withHoldout(new Split.Tail(0.6)), run("A", PAUSE, Math::sin));
        assertEquals(List.of("A#1"), ids(snapshots.training()));
        assertEquals(8, snapshots.training().get(0).samples());
        assertEquals(List.of("A#1", "A#2"), ids(snapshots.holdout()));
        assertEquals(1, snapshots.holdout().get(0).leadIn());
        assertEquals(0, snapshots.holdout().get(1).leadIn());
    }

    @Test
    void aResampledTailContinuesTheGridOfItsTraining() {
        double[] times = Arrays.stream(grid(60, 1)).map(t -> t + 0.1 * Math.sin(t)).toArray();
        Snapshots snapshots = build(PLAIN.withUniformStep(0.7).withHoldout(new Split.Tail(0.25)),
                run("A", times, Math::sin));
        Run training = snapshots.training().get(0);
        Run holdout = snapshots.holdout().get(0);
        assertEquals(training.times()[training.samples() - 1], holdout.times()[0]);
        assertEquals(0.7, holdout.times()[1] - holdout.times()[0], 1e-12);
        assertTrue(training.times()[training.samples() - 1] <= times[44]);
    }

    @Test
    void aPartTooShortToTrainIsLeftOutWithADoubtButStaysHistory() {
        Snapshots snapshots = build(PLAIN.withDelay(3, 1).withHoldout(new Split.TailDuration(8)),
                run("A", grid(30, 1), Math::sin), run("B", grid(10, 1), Math::cos));
        assertEquals(List.of("A"), ids(snapshots.training()));
        assertEquals(List.of("Run B: 2 samples left out, too few for two states in the training part (4 samples)."),
                doubts(snapshots));
        assertEquals(2, snapshots.holdout().get(1).leadIn());
        assertEquals(10, snapshots.holdout().get(1).samples());
    }

    @Test
    void aTrainingPartTooShortEverywhereIsRefused() {
        assertEquals("training part: no run left for it has the 4 samples two states need; "
                + "keep less away or choose a smaller delay depth.",
                fault(PLAIN.withDelay(3, 1).withHoldout(new Split.TailDuration(8)), run("B", grid(10, 1), Math::cos)));
    }

    @Test
    void theSummaryNamesEveryStepOfThePreparation() {
        Snapshots snapshots = build(PLAIN.withDelay(4, 2).withHoldout(new Split.Tail(0.2))
                .withPreparation(Detrend.MEAN, Scaling.UNIT_GROUP), run("A", grid(50, 0.1), Math::sin, Math::cos));
        assertEquals(List.of("recorded runs: 1", "recorded samples: 50", "channels: 2: c0, c1", "inputs: none",
                "step: 0.1 s, as recorded", "gaps: none", "missing cells: 0 of 100", "samples left out: 0",
                "samples at new times: 0", "detrend: mean", "scaling: standard deviation of the unit",
                "smoothing: none", "delay: depth 4, spacing 2, reaching back 0.6 s", "run weights: every sample alike",
                "training runs: 1", "training samples: 40",
                "training states: 34", "calibration runs: 0", "calibration samples: 0", "calibration states: 0",
                "holdout runs: 1", "holdout samples: 10", "holdout states: 11"),
                snapshots.facts().stream().map(fact -> fact.item() + ": " + fact.value()).toList());
    }

    @Test
    void manyGapsAreNamedAsUnevenSampling() {
        double[] times = new double[40];
        for (int k = 1; k < 40; k++) {
            times[k] = times[k - 1] + (k % 4 == 0 ? 2 : 1);
        }
        String doubt = doubts(build(PLAIN, run("A", times, Math::sin))).get(0);
        assertEquals("Run A has 9 gaps, split there: 2 s after 3.0 s, 2 s after 8.0 s, 2 s after 13.0 s, 2 s after 18.0 s, "
                + "2 s after 23.0 s and 4 more; the median step is 1 s; so many gaps mean uneven sampling rather than "
                + "pauses, for which a larger gap factor is right.", doubt);
    }

    @Test
    void cancellingStopsBeforeTheNextRun() {
        Progress stopAtSecond = new Progress() {
            private int polls;

            @Override
            public void report(double fraction, String message) {
                assertFalse(message.contains("run B"), "work went on after the request to stop");
            }

            @Override
            public void checkCancelled() {
                if (++polls == 2) {
                    throw new Cancelled("enough");
                }
            }
        };
        Recording recording = Recordings.of(run("A", grid(5, 1), Math::sin), run("B", grid(5, 1), Math::sin));
        assertThrows(Cancelled.class, () -> SnapshotBuilder.build(recording, PLAIN, stopAtSecond));
    }

    @Test
    void progressNeverFallsAndEndsAtOne() {
        double[] last = {0};
        Progress rising = new Progress() {
            @Override
            public void report(double fraction, String message) {
                assertTrue(fraction >= last[0]);
                last[0] = fraction;
            }

            @Override
            public void checkCancelled() {
                // never asked to stop
            }
        };
        Recording recording = Recordings.of(run("A", grid(5, 1), Math::sin), run("B", grid(5, 1), Math::sin));
        SnapshotBuilder.build(recording, PLAIN, rising);
        assertEquals(1, last[0]);
    }
}
