package org.modestead.nodes.modal;

import java.util.OptionalDouble;
import org.modestead.engine.spectrum.Pole;
import org.modestead.engine.spectrum.PoleLine;
import org.modestead.engine.spectrum.Stabilisation;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * Every pole at every order, and the lines they form. Frequencies in cycles per time unit, rates per time unit, the period in time units;
 * damping ratio and period are missing where nothing oscillates.
 */
final class PoleTable {

    static final TableSchema POLES = TableSchema.of(Column.whole("order"), Column.number("frequency"), Column.number("damping_ratio"),
            Column.number("period"), Column.number("lambda_real"), Column.number("lambda_imag"), Column.flag("stable_frequency"),
            Column.flag("stable_damping"), Column.flag("stable_shape"), Column.whole("stable_orders"));

    static final TableSchema LINES = TableSchema.of(Column.whole("line"), Column.number("frequency"), Column.number("damping_ratio"),
            Column.number("period"), Column.number("lambda_real"), Column.number("frequency_spread"), Column.number("damping_spread"),
            Column.whole("orders"), Column.whole("first_order"), Column.whole("last_order"));

    private PoleTable() {}

    static MemoryTable poles(Stabilisation found) {
        MemoryTable.Builder rows = MemoryTable.builder(POLES, "poles");
        for (Pole pole : found.poles()) {
            rows.row((long) pole.order(), pole.frequency(), damping(pole.dampingRatio()), period(pole.frequency()), pole.rate().re(),
                    pole.rate().im(), pole.stableFrequency(), pole.stableDamping(), pole.stableShape(), (long) pole.stableOrders());
        }
        return rows.build();
    }

    /** @param least fewest orders of a line */
    static MemoryTable lines(Stabilisation found, int least) {
        MemoryTable.Builder rows = MemoryTable.builder(LINES, "lines");
        for (int i = 0; i < found.lines().size(); i++) {
            PoleLine line = found.lines().get(i);
            if (line.poles().size() >= least) {
                double frequency = line.median(Pole::frequency);
                boolean oscillates = line.poles().stream().allMatch(pole -> pole.dampingRatio().isPresent());
                rows.row((long) i + 1, frequency, oscillates ? line.median(PoleTable::ratio) : Double.NaN, period(frequency),
                        line.median(pole -> pole.rate().re()), line.spread(Pole::frequency),
                        oscillates ? line.spread(PoleTable::ratio) : Double.NaN, (long) line.poles().size(),
                        (long) line.poles().get(0).order(), (long) line.last().order());
            }
        }
        return rows.build();
    }

    private static double ratio(Pole pole) {
        return pole.dampingRatio().orElseThrow();
    }

    private static double damping(OptionalDouble ratio) {
        return ratio.orElse(Double.NaN);
    }

    private static double period(double frequency) {
        return frequency > 0 ? 1 / frequency : Double.NaN;
    }
}
