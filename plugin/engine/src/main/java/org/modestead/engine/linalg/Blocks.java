package org.modestead.engine.linalg;

import java.util.stream.IntStream;

/**
 * Rows cut into blocks that are worked on by all cores. Where the cuts lie depends on the number of rows and on the size of a block, never on
 * the number of cores, so work that writes each row once gives the same bytes on every machine.
 */
public final class Blocks {

    private Blocks() {}

    /** Works on rows {@code from} (included) to {@code to} (not). Runs beside others, so it writes to its own rows only. */
    @FunctionalInterface
    public interface Work {
        void rows(int from, int to);
    }

    /**
     * Works on all rows.
     *
     * @param rows how many, at least 0
     * @param size rows of a block, at least 1; the last block may have fewer
     * @param work done once a block, in no particular order
     */
    public static void of(int rows, int size, Work work) {
        int count = (int) (((long) rows + size - 1) / size);
        if (count <= 1) {
            work.rows(0, rows);
            return;
        }
        IntStream.range(0, count).parallel().forEach(b -> work.rows(b * size, (int) Math.min(rows, (b + 1L) * size)));
    }
}
