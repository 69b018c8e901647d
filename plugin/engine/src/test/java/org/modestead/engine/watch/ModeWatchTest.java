package org.modestead.engine.watch;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Doubt;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalAssurance;
import org.modestead.engine.watch.WatchedStations.Change;
import org.modestead.engine.wellposed.Grade;

class ModeWatchTest {

    private static final WatchedStations STATION = new WatchedStations(0.05, new LinearEstimator(), 4);
    private static final int WINDOW = 600;
    private static final WatchPlan PLAN = plan(60);

    /** Without resampled fits of every window, for speed. */
    private static WatchPlan plan(double window) {
        return WatchPlan.DEFAULT.withWindow(window).withWindowReplicates(0);
    }

    private static WatchResult watch(Change change, int windows, long seed) {
        Random random = new Random(seed);
        Model model = STATION.model(20 * WINDOW, random);
        return ModeWatch.of(model, STATION.snapshots(List.of(STATION.run("new", 5000, windows * WINDOW, change, random))), PLAN, Progress.NONE);
    }

    /** The watched mode at 1 cycle a time unit. */
    private static int slow(WatchResult result) {
        return result.modes().stream().filter(mode -> Math.abs(mode.mode().frequency() - 1) < 0.1).findFirst().orElseThrow().mode().number();
    }

    private static List<Alarm> of(WatchResult result, Alarm.Kind kind) {
        return result.alarms().stream().filter(alarm -> alarm.kind() == kind).toList();
    }

    private static List<String> codes(WatchResult result) {
        return result.doubts().stream().map(Doubt::code).toList();
    }

    @Test
    void aFrequencyThatFallsByFivePerCentIsOneAlarmWithItsSizeAndBegin() {
        WatchResult result = watch(Change.ofFrequency(8 * WINDOW, 0.95), 20, 1);
        assertEquals(1, of(result, Alarm.Kind.FREQUENCY).size());
        Alarm alarm = of(result, Alarm.Kind.FREQUENCY).get(0);
        assertEquals(slow(result), alarm.mode());
        // 5 % are 7 deviations of a window: clipped scores alarm in the second window, index 9
        assertTrue(alarm.first() >= 9 && alarm.first() <= 11, alarm.toString());
        assertTrue(alarm.began() >= 6 && alarm.began() <= 9, alarm.toString());
        assertTrue(alarm.ongoing());
        assertEquals(19, alarm.last());
        // 12 windows of deviation 0.7 %, centre known to 0.16 %: three deviations of the mean, and up to two calm windows counted in
        assertEquals(-0.05, alarm.change(), 0.013);
    }

    @Test
    void aChangeThatEndsIsAnEventWithAnEnd() {
        Random random = new Random(2);
        Model model = STATION.model(20 * WINDOW, random);
        Run first = STATION.run("a", 0, 8 * WINDOW, Change.ofFrequency(2 * WINDOW, 0.95), random);
        Run second = STATION.run("b", 1000, 12 * WINDOW, Change.NONE, random);
        WatchResult result = ModeWatch.of(model, STATION.snapshots(List.of(first, second)), PLAN, Progress.NONE);
        List<Alarm> alarms = of(result, Alarm.Kind.FREQUENCY);
        assertEquals(1, alarms.size());
        assertEquals(false, alarms.get(0).ongoing());
        assertTrue(alarms.get(0).last() >= 7 && alarms.get(0).last() <= 14, alarms.toString());
    }

    @Test
    void aModeThatIsNoLongerPushedIsMissingOnceAndNotEveryWindow() {
        WatchResult result = watch(new Change(5 * WINDOW, 1, 1, 1, 0), 20, 3);
        List<Alarm> missing = of(result, Alarm.Kind.MISSING);
        assertEquals(1, missing.size(), result.alarms().toString());
        assertEquals(slow(result), missing.get(0).mode());
        assertTrue(Double.isNaN(missing.get(0).to()));
        // it rings down over a window before it is lost
        assertTrue(missing.get(0).began() >= 5 && missing.get(0).began() <= 8, missing.toString());
    }

    @Test
    void moreDampingIsFound() {
        WatchResult result = watch(new Change(5 * WINDOW, 1, 4, 1, 2), 20, 4);
        List<Alarm> alarms = of(result, Alarm.Kind.DAMPING).stream().filter(alarm -> alarm.mode() == slow(result)).toList();
        assertEquals(1, alarms.size(), result.alarms().toString());
        assertTrue(alarms.get(0).change() > 1, alarms.toString());
    }

    @Test
    void anotherShapeIsFoundWithTheAssuranceThatFollowsFromIt() {
        WatchResult result = watch(new Change(5 * WINDOW, 1, 1, 0.3, 1), 20, 5);
        List<Alarm> alarms = of(result, Alarm.Kind.SHAPE);
        assertEquals(1, alarms.size(), result.alarms().toString());
        assertTrue(alarms.get(0).first() <= 8);
        assertTrue(result.alarms().stream().noneMatch(alarm -> alarm.mode() != slow(result)), "what changes by less than 0.02 raises no alarm");
        // closed form: gauges see (1, 0.6 g, -0.3, 0.2) x + (0.1, -0.2 g, 0.1, 0.7) y; a mode that turns has the shape of x + i y
        double expected = ModalAssurance.of(shape(1), shape(0.3));
        assertEquals(expected, alarms.get(0).to(), 0.03);
    }

    private static List<org.modestead.engine.linalg.Complex> shape(double gauge) {
        double[][] seen = WatchedStations.SHAPES;
        return IntStream.range(0, 4).mapToObj(c -> new org.modestead.engine.linalg.Complex(seen[c][0] * (c == 1 ? gauge : 1),
                seen[c][1] * (c == 1 ? gauge : 1))).toList();
    }

    @Test
    void everyWindowHasARowForEveryModeAndScoresBeyondOneAlarm() {
        WatchResult result = watch(Change.ofFrequency(8 * WINDOW, 0.95), 12, 6);
        assertEquals(12 * 2, result.rows().size());
        assertEquals(8, result.charts());
        for (WatchRow row : result.rows()) {
            double average = row.averages().get(Quantity.FREQUENCY);
            assertTrue(Math.abs(average) <= 1 || row.alarms().contains(Alarm.Kind.FREQUENCY));
        }
        assertEquals(5000, result.looks().get(0).window().start());
        assertEquals(5000 + 12 * 60 - WatchedStations.STEP, result.looks().get(11).window().end(), 1e-6);
    }

    @Test
    void theSameRecordingsGiveTheSameResult() {
        assertEquals(watch(Change.ofFrequency(3 * WINDOW, 0.95), 6, 7).alarms(), watch(Change.ofFrequency(3 * WINDOW, 0.95), 6, 7).alarms());
    }

    @Test
    void windowsOfTooFewCyclesAreADoubtThatSaysHowManyTheyHold() {
        Random random = new Random(8);
        Model model = STATION.model(20 * WINDOW, random);
        WatchResult result = ModeWatch.of(model, STATION.snapshots(List.of(STATION.run("new", 0, 4 * WINDOW, Change.NONE, random))), plan(6),
                Progress.NONE);
        List<Doubt> doubts = result.doubts().stream().filter(doubt -> doubt.code().equals("short-windows")).toList();
        assertEquals(1, doubts.size(), codes(result).toString());
        assertTrue(doubts.get(0).sentence().contains("holds only 5.99 cycles") || doubts.get(0).sentence().contains("holds only 6 cycles")
                || doubts.get(0).sentence().contains("holds only 6.0"), doubts.toString());
        assertTrue(doubts.get(0).sentence().contains("would hold 10"));
    }

    @Test
    void theWindowChosenHoldsThirtyCyclesOfTheSlowestModeUnlessTheBaselineIsShort() {
        Random random = new Random(9);
        WatchPlan own = WatchPlan.DEFAULT.withWindowReplicates(0);
        Model longOne = STATION.model(20 * WINDOW, random);
        Snapshots fresh = STATION.snapshots(List.of(STATION.run("new", 0, 2 * WINDOW, Change.NONE, random)));
        assertEquals(30, ModeWatch.of(longOne, fresh, own, Progress.NONE).length(), 0.5);
        Model shortOne = STATION.model(5 * WINDOW, random);
        assertEquals(15, ModeWatch.of(shortOne, fresh, own, Progress.NONE).length(), 0.5);
    }

    @Test
    void aBaselineOfFewWindowsIsWatchedByTheBootstrapAloneAndSaidSo() {
        Random random = new Random(10);
        Model model = STATION.model(3 * WINDOW, random);
        WatchResult result = ModeWatch.of(model, STATION.snapshots(List.of(STATION.run("new", 0, 10 * WINDOW,
                Change.ofFrequency(5 * WINDOW, 0.9), random))), PLAN, Progress.NONE);
        assertTrue(codes(result).contains("short-baseline"));
        assertEquals(List.of(Quantity.FREQUENCY, Quantity.DAMPING), result.modes().get(0).quantities());
        assertEquals(1, of(result, Alarm.Kind.FREQUENCY).size());
    }

    @Test
    void gapsAndSeveralRunsAreWatchedToo() {
        Random random = new Random(11);
        Model model = STATION.model(20 * WINDOW, random);
        Run whole = STATION.run("day", 0, 10 * WINDOW, Change.ofFrequency(6 * WINDOW, 0.95), random);
        // every 700 samples 50 are lost
        List<Run> pieces = new ArrayList<>();
        for (int from = 0; from < whole.samples(); from += 750) {
            Run piece = whole.cut(from, Math.min(whole.samples(), from + 700));
            pieces.add(new Run("day#" + (pieces.size() + 1), piece.times(), piece.values()));
        }
        pieces.add(STATION.run("night", 0, 3 * WINDOW, Change.ofFrequency(0, 0.95), random));
        WatchResult result = ModeWatch.of(model, STATION.snapshots(pieces), PLAN, Progress.NONE);
        assertEquals(1, of(result, Alarm.Kind.FREQUENCY).size(), result.alarms().toString());
        assertTrue(of(result, Alarm.Kind.FREQUENCY).get(0).ongoing());
        assertEquals(12, result.looks().size());
    }

    @Test
    void unevenSamplesOfManyShortRunsAreWatchedThroughTheGenerator() {
        Random random = new Random(12);
        Model model = WatchedStations.model(ringing(60, 1, random), new OccupationEstimator(Motions.kernel("linear"), new SegmentPlan(5, 0), 1), 2,
                Grade.STANDS);
        List<Run> fresh = new ArrayList<>(ringing(15, 1, random).training());
        ringing(15, 0.96, random).training().forEach(run -> fresh.add(new Run(run.id() + " later", run.times(), run.values())));
        WatchResult result = ModeWatch.of(model, Motions.snapshots(OptionalDouble.empty(), DelayEmbedding.NONE, fresh, List.of()), plan(30),
                Progress.NONE);
        // three runs of 10 time units each make a window
        assertEquals(10, result.looks().size());
        assertEquals(3, result.looks().get(0).window().pieces().size());
        List<Alarm> alarms = of(result, Alarm.Kind.FREQUENCY);
        assertEquals(1, alarms.size(), result.rows().stream().map(row -> row.sighting().map(seen -> seen.found().rate()) + " " + row.averages()).toList().toString());
        assertEquals(5, alarms.get(0).began());
        assertEquals(-0.04, alarms.get(0).change(), 0.01);
    }

    /** An oscillation of 1 cycle a time unit that rings down with 2 % damping, seen at 100 uneven times in each run with 2 % noise. */
    private static Snapshots ringing(int runs, double factor, Random random) {
        List<Run> out = new ArrayList<>();
        double omega = 2 * Math.PI * factor;
        for (int r = 0; r < runs; r++) {
            double[] times = IntStream.range(0, 100).mapToDouble(k -> 0.1 * k + 0.08 * random.nextDouble()).toArray();
            double phase = 2 * Math.PI * random.nextDouble();
            out.add(Motions.run("r" + r, times, t -> new double[] {Math.exp(-0.02 * omega * t) * Math.cos(omega * t + phase),
                Math.exp(-0.02 * omega * t) * Math.sin(omega * t + phase)}, 0.02, random));
        }
        return Motions.snapshots(OptionalDouble.empty(), DelayEmbedding.NONE, out, List.of());
    }

    @Test
    void onlyModesThatExistAreWatchedUnlessAskedOtherwise() {
        Random random = new Random(13);
        Snapshots known = STATION.snapshots(List.of(STATION.run("known", 0, 20 * WINDOW, Change.NONE, random)));
        Model drifting = STATION.model(known, Grade.DRIFTS);
        Snapshots fresh = STATION.snapshots(List.of(STATION.run("new", 0, 2 * WINDOW, Change.NONE, random)));
        FitFault fault = assertThrows(FitFault.class, () -> ModeWatch.of(drifting, fresh, PLAN, Progress.NONE));
        assertTrue(fault.getMessage().contains("none of these stands or settles"), fault.getMessage());
        assertEquals(2, ModeWatch.of(drifting, fresh, PLAN.withAnyVerdict(), Progress.NONE).modes().size());
    }

    @Test
    void recordingsShorterThanHalfAWindowAreRefused() {
        Random random = new Random(14);
        Model model = STATION.model(20 * WINDOW, random);
        Snapshots fresh = STATION.snapshots(List.of(STATION.run("new", 0, WINDOW / 3, Change.NONE, random)));
        assertThrows(RecordingFault.class, () -> ModeWatch.of(model, fresh, PLAN, Progress.NONE));
    }

    @Test
    void itCanBeCancelled() {
        Random random = new Random(15);
        Model model = STATION.model(20 * WINDOW, random);
        Snapshots fresh = STATION.snapshots(List.of(STATION.run("new", 0, 2 * WINDOW, Change.NONE, random)));
        assertThrows(Cancelled.class, () -> ModeWatch.of(model, fresh, PLAN, new Progress() {
            private int asked;

            @Override
            public void report(double fraction, String message) {
                // nobody watches
            }

            @Override
            public void checkCancelled() {
                if (++asked > 5) {
                    throw new Cancelled("by the test");
                }
            }
        }));
    }
}
