package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Snapshots;

class ModeShapesTest {

    private static final double W = 2;
    private static final double STEP = 0.1;

    private static Snapshots travelling() {
        // 4 cos(wt), 2 cos(wt - π/3), 1 cos(wt + 2.5)
        return Motions.snapshots(OptionalDouble.of(STEP), new DelayEmbedding(3, 2),
                List.of(Motions.run("a", 120, STEP, t -> new double[] {
            4 * Math.cos(W * t), 2 * Math.cos(W * t - Math.PI / 3), Math.cos(W * t + 2.5)})), List.of());
    }

    private static List<ModeShapes.Entry> shape(Preparation preparation) {
        Spectrum spectrum = Motions.spectrum(travelling(), new LinearEstimator(), 2);
        return ModeShapes.of(spectrum, spectrum.modes().get(0), preparation);
    }

    @Test
    void phasesAreThoseOfTheSignalRelativeToTheLargestChannel() {
        List<ModeShapes.Entry> shape = shape(Preparation.identity(3));
        assertEquals(0, shape.get(0).phase(), 1e-12);
        assertEquals(-Math.PI / 3, shape.get(1).phase(), 1e-9);
        assertEquals(2.5, shape.get(2).phase(), 1e-9);
        assertEquals(2, shape.get(0).magnitude() / shape.get(1).magnitude(), 1e-9);
        assertEquals(4, shape.get(0).magnitude() / shape.get(2).magnitude(), 1e-9);
    }

    @Test
    void anEarlierSampleLagsByItsDelay() {
        List<ModeShapes.Entry> shape = shape(Preparation.identity(3));
        assertEquals(9, shape.size());
        for (int delay = 0; delay < 3; delay++) {
            ModeShapes.Entry entry = shape.get(3 * delay);
            assertEquals(delay, entry.delay());
            assertEquals(0, entry.channelIndex());
            // spacing of two samples: e^(-iω 2Δt delay)
            assertEquals(-W * 2 * STEP * delay, entry.phase(), 1e-9);
        }
    }

    @Test
    void magnitudesAreInRecordedUnitsAndTheReferenceIsChosenInThem() {
        // prepared values were recorded ones over 1, 100, 1: the second channel is the largest as recorded
        List<ModeShapes.Entry> shape = shape(new Preparation(0, new double[3], new double[3], new double[] {1, 100, 1}));
        assertEquals(0, shape.get(1).phase(), 1e-12);
        assertEquals(Math.PI / 3, shape.get(0).phase(), 1e-9);
        assertEquals(50, shape.get(1).magnitude() / shape.get(0).magnitude(), 1e-8);
    }

    @Test
    void oppositeMotionIsHalfATurnAndStaysInTheRange() {
        Snapshots snapshots = Motions.snapshots(STEP, 1, List.of(
                Motions.run("a", 40, STEP, t -> new double[] {Math.exp(-t), -0.5 * Math.exp(-t)})), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new LinearEstimator(), 1);
        assertEquals(Math.PI, ModeShapes.of(spectrum, spectrum.modes().get(0), Preparation.identity(2)).get(1).phase(),
                1e-12);
    }
}
