package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.Doubt;

/** Counts what happens to the samples of a recording, run by run, and writes it as doubts. */
final class PreparationLog {
    private static final double MUCH = 0.05;

    private final Wording wording;
    private final List<String> columnNames;
    private final long[] filled;
    private final List<Doubt> doubts = new ArrayList<>();
    private long recorded;
    private long missing;
    private long interpolated;
    private long dropped;
    private int gaps;
    private double lost;

    PreparationLog(Wording wording, List<String> columnNames) {
        this.wording = wording;
        this.columnNames = columnNames;
        this.filled = new long[columnNames.size()];
    }

    /** Notes one recorded run with its gaps and missing cells. */
    void recorded(Gaps found, MissingCells cells, GapPolicy policy) {
        recorded += found.run().samples();
        gaps += found.count();
        lost += found.lost();
        missing += cells.count();
        found.doubt(policy, wording).ifPresent(doubts::add);
    }

    /** Notes one piece that is kept. */
    void kept(Piece piece) {
        interpolated += piece.interpolated();
        for (int c = 0; c < filled.length; c++) {
            filled[c] += piece.filled()[c];
        }
    }

    /** Notes the samples of one run or piece that are left out. */
    void leftOut(String run, long samples, String reason) {
        if (samples > 0) {
            dropped += samples;
            doubts.add(new Doubt("samples-left-out", "Run " + run + ": " + Wording.count(samples, "sample")
                    + " left out, " + reason + "."));
        }
    }

    void add(Doubt doubt) {
        doubts.add(doubt);
    }

    long recorded() {
        return recorded;
    }

    long interpolated() {
        return interpolated;
    }

    long dropped() {
        return dropped;
    }

    /** Returns the gaps in words, for the summary. */
    String gaps(GapPolicy policy) {
        if (gaps == 0) {
            return "none";
        }
        return gaps + " found, " + (policy == GapPolicy.SPLIT ? "split" : "interpolated") + ", " + wording.span(lost)
                + " in all";
    }

    /** Returns the missing cells in words, for the summary. */
    String missing(MissingPolicy policy) {
        String found = missing + " of " + recorded * columnNames.size();
        if (missing == 0) {
            return found;
        }
        return found + (policy == MissingPolicy.SPLIT ? ", split there" : ", " + filledCells() + " interpolated");
    }

    /** Returns all doubts, those about single columns last. */
    List<Doubt> doubts() {
        List<Doubt> all = new ArrayList<>(doubts);
        for (int c = 0; c < filled.length; c++) {
            muchFilled(c).ifPresent(all::add);
        }
        return all;
    }

    private Optional<Doubt> muchFilled(int column) {
        if (filled[column] <= MUCH * recorded) {
            return Optional.empty();
        }
        return Optional.of(new Doubt("many-missing-cells", "Column " + columnNames.get(column) + ": "
                + Wording.number(100.0 * filled[column] / recorded) + " % of its samples (" + filled[column] + " of "
                + recorded + ") were missing and are interpolated; what moves within such holes is invented."));
    }

    private long filledCells() {
        long sum = 0;
        for (long cells : filled) {
            sum += cells;
        }
        return sum;
    }
}
