package org.modestead.engine.watch;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.hipparchus.distribution.discrete.BinomialDistribution;
import org.hipparchus.distribution.discrete.PoissonDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.modestead.engine.Progress;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.watch.WatchedStations.Change;

/**
 * How often a watch of stationary recordings alarms, and how soon it finds a frequency that is 2 % lower. A few dozen recordings without
 * resampled fits of every window by default, hundreds with them, and the figures printed, with {@code -Dwatch=full}.
 */
class WatchRatesTest {

    private static final double CYCLES = 60;
    private static final int SAMPLES = (int) Math.round(CYCLES / WatchedStations.STEP);
    private static final int BASELINE = 20;
    private static final int STATIONARY = 40;
    private static final int BEFORE = 5;
    private static final int AFTER = 12;

    private static final WatchedStations QUIET = new WatchedStations(0.02, new LinearEstimator(), 4);
    private static final WatchedStations NOISY = new WatchedStations(0.2, new LinearEstimator(NoiseCorrection.FORWARD_BACKWARD), 12);

    /** What came of many watches. */
    private record Counts(int recordings, int windows, int stormiest, List<Alarm> falseAlarms, List<Integer> foundAfter, double predicted) {

        String words() {
            return String.format(Locale.ROOT, "%d recordings, %d stationary windows, %d false alarms (%s), most in one recording %d; 2 %% found"
                    + " after %s windows, predicted on the mean %.1f", recordings, windows, falseAlarms.size(),
                    falseAlarms.stream().map(alarm -> alarm.kind().word()).sorted().toList(), stormiest, foundAfter.stream().sorted().toList(),
                    predicted);
        }

        long foundWithin(int windows) {
            return foundAfter.stream().filter(after -> after <= windows).count();
        }
    }

    private static Counts count(WatchedStations stations, int recordings, int replicates, long seed) {
        WatchPlan plan = WatchPlan.DEFAULT.withWindow(CYCLES).withWindowReplicates(replicates);
        Random random = new Random(seed);
        List<Alarm> alarms = new ArrayList<>();
        List<Integer> foundAfter = new ArrayList<>();
        int stormiest = 0;
        int windows = 0;
        double predicted = 0;
        for (int k = 0; k < recordings; k++) {
            Model model = stations.model(BASELINE * SAMPLES, random);
            WatchResult calm = watch(stations, model, STATIONARY, Change.NONE, plan, random);
            windows += calm.looks().size();
            alarms.addAll(calm.alarms());
            stormiest = Math.max(stormiest, calm.alarms().size());
            WatchResult shifted = watch(stations, model, BEFORE + AFTER, Change.ofFrequency(BEFORE * SAMPLES, 0.98), plan, random);
            WatchedMode slow = shifted.modes().stream().filter(mode -> Math.abs(mode.mode().frequency() - 1) < 0.1).findFirst().orElseThrow();
            foundAfter.add(shifted.alarms().stream().filter(alarm -> alarm.mode() == slow.mode().number()
                    && alarm.kind() == Alarm.Kind.FREQUENCY && alarm.first() >= BEFORE && alarm.change() < 0)
                    .mapToInt(alarm -> alarm.first() - BEFORE + 1).min().orElse(99));
            Reference reference = slow.references().get(Quantity.FREQUENCY);
            predicted += reference.windowsToFind(0.98 * reference.figure(0)) / recordings;
        }
        return new Counts(recordings, windows, stormiest, alarms, foundAfter, predicted);
    }

    private static WatchResult watch(WatchedStations stations, Model model, int windows, Change change, WatchPlan plan, Random random) {
        return ModeWatch.of(model, stations.snapshots(List.of(stations.run("new", 0, windows * SAMPLES, change, random))), plan, Progress.NONE);
    }

    /** No more false alarms than chance allows at the rate asked for, and never a storm. */
    private static void assertQuietWhenNothingChanged(Counts counts) {
        int most = new PoissonDistribution(counts.windows() / WatchPlan.DEFAULT.falseAlarmEvery()).inverseCumulativeProbability(0.995);
        assertTrue(counts.falseAlarms().size() <= most, () -> "at most " + most + " wanted: " + counts.words());
        assertTrue(counts.stormiest() <= 3, counts::words);
    }

    /** 90 % within 10 windows of 60 cycles, as far as the binomial distribution can tell from so many recordings. */
    private static void assertTwoPerCentFound(Counts counts) {
        int least = new BinomialDistribution(counts.recordings(), 0.9).inverseCumulativeProbability(0.005);
        assertTrue(counts.foundWithin(10) >= least, () -> "at least " + least + " within 10 windows wanted: " + counts.words());
    }

    @Test
    void stationaryRecordingsHardlyAlarmAndTwoPerCentAreFound() {
        Counts counts = count(QUIET, 15, 0, 11);
        assertQuietWhenNothingChanged(counts);
        assertTwoPerCentFound(counts);
    }

    @Test
    void alsoWithRealisticMeasurementNoise() {
        Counts counts = count(NOISY, 8, 0, 12);
        assertQuietWhenNothingChanged(counts);
        assertTwoPerCentFound(counts);
    }

    @Test
    @EnabledIfSystemProperty(named = "watch", matches = "full")
    void manyRecordings() {
        measure(QUIET);
    }

    @Test
    @EnabledIfSystemProperty(named = "watch", matches = "full")
    void manyNoisyRecordings() {
        measure(NOISY);
    }

    private static void measure(WatchedStations stations) {
        Counts counts = count(stations, Integer.getInteger("watch.recordings", 200), WatchPlan.DEFAULT.windowReplicates(), 7);
        System.out.println("noise " + 100 * stations.noise() + " %: " + counts.words());
        assertQuietWhenNothingChanged(counts);
        assertTwoPerCentFound(counts);
    }
}
