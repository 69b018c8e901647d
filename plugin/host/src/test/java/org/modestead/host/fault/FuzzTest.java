package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Whatever comes from outside is taken, or refused with a sentence: no other error, and no more memory than a bound. Few inputs in the
 * ordinary build, {@code -Dfuzz=1000000} for many.
 */
class FuzzTest {

    private static final long SEED = 20261202;
    /** Most inputs of the ordinary build, of a reader that is quick. */
    private static final int FEW = 600;
    /** The readers of tables start a database each time, and requests go through a socket. */
    private static final int SLOWER = 20;
    /** A file of few kilobytes: an entry of 16 MB unpacked, and twice that while it grows, is the most that any may need. */
    private static final long MOST_BYTES = 300_000_000;

    @TempDir
    Path folder;

    @Test
    void workflows() throws IOException {
        feed(new WorkflowFuzz(folder), 1);
    }

    @Test
    void settings() throws IOException {
        feed(new SettingsFuzz(), 1);
    }

    @Test
    void edits() throws IOException {
        feed(new EditFuzz(), 1);
    }

    @Test
    void models() throws IOException {
        feed(ModelFuzz.models(), 1);
    }

    @Test
    void moments() throws IOException {
        feed(ModelFuzz.moments(SampleSums.file()), 1);
    }

    @Test
    void tables() throws IOException {
        for (String ending : List.of("csv", "csv.gz", "json", "npy")) {
            feed(new TableFuzz(folder, ending), SLOWER);
        }
    }

    @Test
    void requests() throws IOException, InterruptedException {
        feed(new RequestFuzz(folder), SLOWER);
    }

    private static void feed(FuzzedReader reader, int share) throws IOException {
        try (reader) {
            Tally tally = Tally.of(reader, Integer.getInteger("fuzz", FEW) / share, SEED);
            System.out.println(tally.words());
            assertEquals(List.of(), tally.defects(), tally.words());
            assertTrue(tally.taken() > 0 && tally.refused() > 0, tally.words());
            assertTrue(tally.mostBytes() < MOST_BYTES, tally.words());
        }
    }
}
