package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;

class FingerprintTest {

    private static Snapshots snapshots(double last, String name) {
        Run run = Motions.run(name, 5, 0.1, t -> new double[] {t, t < 0.35 ? 2 * t : last});
        return Motions.snapshots(0.1, 1, List.of(run), List.of());
    }

    @Test
    void theSameDataHaveTheSameFingerprintAndOtherDataAnother() {
        String print = Fingerprint.of(snapshots(1, "a"));
        assertTrue(print.matches("[0-9a-f]{64}"), print);
        assertEquals(print, Fingerprint.of(snapshots(1, "a")));
        assertNotEquals(print, Fingerprint.of(snapshots(Math.nextUp(1.0), "a")));
        assertNotEquals(print, Fingerprint.of(snapshots(1, "b")));
    }

    @Test
    void whatJudgesCountsToo() {
        Snapshots one = snapshots(1, "a");
        Snapshots moved = one.replaced(one.training(), one.training(), one.smoothing());
        assertNotEquals(Fingerprint.of(one), Fingerprint.of(moved));
    }
}
