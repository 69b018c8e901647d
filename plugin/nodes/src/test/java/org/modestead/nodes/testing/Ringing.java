package org.modestead.nodes.testing;

import java.time.LocalDateTime;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * Two channels that ring down together, {@code x = e^(σt) cos(ωt + phase)} and {@code y = 2 e^(σt) sin(ωt + phase)}, in
 * several runs that start at different phases.
 */
public final class Ringing {

    /** Cycles per time unit. */
    public static final double FREQUENCY = 1.5;
    /** Damping ratio -σ/|λ|. */
    public static final double DAMPING = 0.03;
    /** Samples a run. */
    public static final int SAMPLES = 60;
    /** Time between samples, in time units. */
    public static final double STEP = 0.05;

    private static final double OMEGA = 2 * Math.PI * FREQUENCY;
    private static final double SIGMA = -DAMPING / Math.sqrt(1 - DAMPING * DAMPING) * OMEGA;
    private static final int SECONDS_AN_HOUR = 3600;

    private Ringing() {}

    /** Returns the runs with times as numbers. */
    public static MemoryTable numbers(int runs) {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("time"),
                Column.number("x [bar]"),
                Column.number("y [m]")), "ringing");
        for (int run = 0; run < runs; run++) {
            for (int k = 0; k < SAMPLES; k++) {
                rows.row("r" + run, k * STEP, x(run, k), y(run, k));
            }
        }
        return rows.build();
    }

    /** Returns the runs with times as date-times; the time unit is the hour. */
    public static MemoryTable dateTimes(int runs) {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), new Column("time",
                CellType.DATE_TIME),
                Column.number("x [bar]"), Column.number("y [m]")), "ringing");
        for (int run = 0; run < runs; run++) {
            LocalDateTime start = LocalDateTime.of(2026, 3, 1 + run, 6, 0);
            for (int k = 0; k < SAMPLES; k++) {
                rows.row("r" + run, start.plusSeconds(Math.round(k * STEP * SECONDS_AN_HOUR)), x(run, k), y(run, k));
            }
        }
        return rows.build();
    }

    private static double x(int run, int k) {
        return Math.exp(SIGMA * k * STEP) * Math.cos(OMEGA * k * STEP + run);
    }

    private static double y(int run, int k) {
        return 2 * Math.exp(SIGMA * k * STEP) * Math.sin(OMEGA * k * STEP + run);
    }
}
