package org.modestead.engine.watch;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Snapshots.Part;

class WindowsTest {

    /** A run of whole-numbered samples from a time on, one a time unit. */
    private static Run run(String id, int from, int samples) {
        return new Run(id, IntStream.range(from, from + samples).asDoubleStream().toArray(), new DMatrixRMaj(samples, 1));
    }

    private static List<Integer> samples(Windows windows) {
        return windows.windows().stream().map(Window::samples).toList();
    }

    @Test
    void aLongRunIsCutIntoWindowsThatShareNoSample() {
        Windows windows = Windows.of(List.of(run("a", 0, 100)), 20, 2);
        assertEquals(List.of(20, 20, 20, 20, 20), samples(windows));
        assertEquals(List.of(0.0, 20.0, 40.0, 60.0, 80.0), windows.windows().stream().map(Window::start).toList());
        assertEquals(0, windows.leftOut());
    }

    @Test
    void aRestOfHalfAWindowIsKeptAndLessIsLeftOut() {
        assertEquals(List.of(20, 20, 12), samples(Windows.of(List.of(run("a", 0, 52)), 20, 2)));
        Windows less = Windows.of(List.of(run("a", 0, 48)), 20, 2);
        assertEquals(List.of(20, 20), samples(less));
        assertEquals(8, less.leftOut(), 1e-9);
    }

    @Test
    void aWindowGoesOnAfterAGap() {
        // 30 samples, a pause of 5, 30 more: 20, 10 + 10, 20
        Windows windows = Windows.of(List.of(run("a#1", 0, 30), run("a#2", 35, 30)), 20, 2);
        assertEquals(List.of(20, 20, 20), samples(windows));
        assertEquals(List.of(1, 2, 1), windows.windows().stream().map(window -> window.pieces().size()).toList());
        assertEquals("a#1 to a#2", windows.windows().get(1).run());
        assertEquals(20, windows.windows().get(1).recorded(), 1e-9);
    }

    @Test
    void aPauseLongerThanAWindowEndsIt() {
        Windows windows = Windows.of(List.of(run("a#1", 0, 32), run("a#2", 100, 40)), 20, 2);
        assertEquals(List.of(20, 12, 20, 20), samples(windows));
    }

    @Test
    void shortRunsAreGatheredWhole() {
        List<Run> runs = IntStream.range(0, 7).mapToObj(k -> run("r" + k, 0, 8)).toList();
        Windows windows = Windows.of(runs, 20, 2);
        // three runs of 8 are the first to reach 20
        assertEquals(List.of(24, 24), samples(windows));
        assertEquals("r0 to r2", windows.windows().get(0).run());
        assertEquals(8, windows.leftOut(), 1e-9);
    }

    @Test
    void anotherLongRunStartsAWindowOfItsOwn() {
        assertEquals(List.of(20, 15, 20, 15), samples(Windows.of(List.of(run("a", 0, 35), run("b", 0, 35)), 20, 2)));
    }

    @Test
    void piecesTooShortForTwoStatesAreLeftOut() {
        Windows windows = Windows.of(List.of(run("a#1", 0, 18), run("a#2", 20, 3), run("a#3", 25, 20)), 20, 5);
        assertTrue(windows.windows().stream().flatMap(window -> window.pieces().stream()).allMatch(piece -> piece.samples() >= 5));
        assertEquals(3, windows.leftOut(), 1e-9);
    }

    @Test
    void unevenTimesAreCutByTime() {
        double[] times = IntStream.range(0, 101).mapToDouble(k -> k + 0.4 * Math.sin(k)).toArray();
        Windows windows = Windows.of(List.of(new Run("a", times, new DMatrixRMaj(101, 1))), 20, 2);
        for (Window window : windows.windows()) {
            assertEquals(20, window.recorded(), 1.5);
        }
    }

    @Test
    void historyIsNotCountedTwiceAndPartsOfARunFollowEachOther() {
        Run tail = new Run("a", run("a", 25, 25).times(), new DMatrixRMaj(25, 1), new DMatrixRMaj(25, 0), 5);
        Snapshots snapshots = Motions.snapshots(1, 1, List.of(run("a", 0, 30)), List.of(tail));
        List<Run> runs = Windows.runs(snapshots, List.of(Part.values()));
        assertEquals(List.of(30, 20), runs.stream().map(Run::samples).toList());
        assertEquals(List.of(25, 25), samples(Windows.of(runs, 25, 2)));
    }
}
