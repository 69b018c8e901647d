package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashSet;
import java.util.List;
import java.util.stream.IntStream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.Size;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.Preparation;

/** The naive methods in recorded units do not know how the values were prepared; origins lie where they are asked for. */
class BaselinePropertiesTest {

    private static final int STEPS = 7;

    private static List<ForecastRoute> baselines(Preparation preparation, double step) {
        return List.of(new Persistence(preparation, step), new SeasonalNaive(preparation, step, 3),
                new Drift(preparation, step), new RunMean(preparation, step));
    }

    private static DMatrixRMaj prepared(List<Double> recorded, Preparation preparation, double step) {
        DMatrixRMaj out = new DMatrixRMaj(recorded.size(), 1);
        for (int k = 0; k < recorded.size(); k++) {
            out.set(k, 0, preparation.prepare(0, k * step, recorded.get(k)));
        }
        return out;
    }

    @Property(tries = 200, seed = "20261201")
    void detrendingAndScalingLeaveTheNaiveForecastsAlone(
            @ForAll @Size(min = 3, max = 30) List<@DoubleRange(min = -100, max = 100) Double> recorded,
            @ForAll @DoubleRange(min = -5, max = 5) double slope, @ForAll @DoubleRange(min = 0.1, max = 10) double scale,
            @ForAll @DoubleRange(min = 0.1, max = 2) double step) {
        Preparation lined = new Preparation(1, new double[] {3}, new double[] {slope}, new double[] {scale});
        Preparation none = Preparation.identity(1);
        for (int b = 0; b < 4; b++) {
            DMatrixRMaj plain = baselines(none, step).get(b).forecast(prepared(recorded, none, step), STEPS);
            DMatrixRMaj other = baselines(lined, step).get(b).forecast(prepared(recorded, lined, step), STEPS);
            for (int h = 1; h <= STEPS; h++) {
                double time = (recorded.size() - 1 + h) * step;
                // Values and trends up to some 1000, divided by scales down to 0.1 and back: 1e-16 · 1e4, some times.
                assertEquals(plain.get(h - 1, 0), lined.restore(0, time, other.get(h - 1, 0)), 1e-10,
                        baselines(none, step).get(b).id());
            }
        }
    }

    @Property(tries = 100, seed = "20261201")
    void aLineIsContinuedByDriftAndALevelByAllOfThem(@ForAll @DoubleRange(min = -100, max = 100) double level,
            @ForAll @DoubleRange(min = -5, max = 5) double rise, @ForAll @IntRange(min = 3, max = 30) int samples) {
        Preparation none = Preparation.identity(1);
        List<Double> line = IntStream.range(0, samples).mapToObj(k -> level + rise * k).toList();
        DMatrixRMaj on = new Drift(none, 1).forecast(prepared(line, none, 1), STEPS);
        List<Double> flat = IntStream.range(0, samples).mapToObj(k -> level).toList();
        for (int h = 1; h <= STEPS; h++) {
            assertEquals(level + rise * (samples - 1 + h), on.get(h - 1, 0), 1e-10);
            for (ForecastRoute baseline : baselines(none, 1)) {
                assertEquals(level, baseline.forecast(prepared(flat, none, 1), STEPS).get(h - 1, 0), 1e-11, baseline.id());
            }
        }
    }

    @Property(tries = 200, seed = "20261201")
    void spreadOriginsAreDistinctRisingAndSeeTheWholeHorizon(
            @ForAll @Size(min = 1, max = 6) List<@IntRange(min = 1, max = 40) Integer> lengths,
            @ForAll @IntRange(min = 1, max = 8) int memory, @ForAll @IntRange(min = 1, max = 20) int reach,
            @ForAll @IntRange(min = 1, max = 30) int most) {
        List<Series> all = lengths.stream().map(length -> new Series("r", IntStream.range(0, length).asDoubleStream()
                .toArray(), new DMatrixRMaj(length, 1), 0)).toList();
        List<Start> starts = Start.spread(all, memory, reach, most);
        int possible = lengths.stream().mapToInt(length -> Math.max(0, length - memory + 1 - reach)).sum();
        assertEquals(Math.min(most, possible), starts.size());
        assertEquals(starts.size(), new HashSet<>(starts).size());
        for (Start start : starts) {
            assertTrue(start.origin() + 1 >= memory && start.origin() + reach < lengths.get(start.series()),
                    start.toString());
        }
        assertEquals(starts, starts.stream().sorted((a, b) -> a.series() != b.series()
                ? Integer.compare(a.series(), b.series()) : Integer.compare(a.origin(), b.origin())).toList());
    }
}
