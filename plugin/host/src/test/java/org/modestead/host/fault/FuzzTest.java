package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Whatever comes from outside is taken, or refused with a sentence: no other error, and no more memory than a bound.
 *
 * <p>{@code -Dfuzz=N} feeds about N inputs in all, the ordinary build few. They are split by what one costs, in thousandths of N: edits 300,
 * sums 290, workflows 150, settings 120, requests 100 (each goes through a socket), models 30 (files of some 60 kB, unpacked and packed
 * again) and each of the five kinds of tables 2 (each starts a database); at least 30 of each.
 */
class FuzzTest {

    private static final long SEED = 20261202;
    /** Inputs of the ordinary build in all. */
    private static final int FEW = 1500;
    /** Of each reader: fewer would seldom hold one that is taken. */
    private static final int LEAST = 30;
    /** A file of few kilobytes: an entry of 16 MB unpacked, and twice that while it grows, is the most that any may need. */
    private static final long MOST_BYTES = 300_000_000;

    @TempDir
    Path folder;

    @Test
    void workflows() throws IOException {
        feed(new WorkflowFuzz(folder), 150);
    }

    @Test
    void settings() throws IOException {
        feed(new SettingsFuzz(), 120);
    }

    @Test
    void edits() throws IOException {
        feed(new EditFuzz(), 300);
    }

    @Test
    void models() throws IOException {
        feed(ModelFuzz.models(), 30);
    }

    @Test
    void moments() throws IOException {
        feed(ModelFuzz.moments(SampleSums.file()), 290);
    }

    @Test
    void tables() throws IOException {
        for (String ending : List.of("csv", "csv.gz", "json", "npy", "parquet")) {
            feed(new TableFuzz(folder, ending), 2);
        }
    }

    @Test
    void requests() throws IOException, InterruptedException {
        feed(new RequestFuzz(folder), 100);
    }

    private static void feed(FuzzedReader reader, int thousandths) throws IOException {
        try (reader) {
            Tally tally = Tally.of(reader, Math.max(LEAST, (int) (Long.getLong("fuzz", FEW) * thousandths / 1000)), SEED);
            System.out.println(tally.words());
            assertEquals(List.of(), tally.defects(), tally.words());
            assertTrue(tally.taken() > 0 && tally.refused() > 0, tally.words());
            assertTrue(tally.mostBytes() < MOST_BYTES, tally.words());
        }
    }
}
