package org.modestead.nodes.judge;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/** The columns of the mode table, then the ends of the intervals of those figures that have one; no verdict is given. */
final class RefinedModeTable {

    private static final List<String> WITH_INTERVAL = List.of("lambda_real", "lambda_imag", "frequency", "period", "damping_ratio",
            "doubling_time");

    static final TableSchema SCHEMA = schema();

    private RefinedModeTable() {}

    private static TableSchema schema() {
        List<Column> columns = new ArrayList<>(ModeTable.SCHEMA.columns());
        for (String name : WITH_INTERVAL) {
            columns.add(Column.number(name + "_low"));
            columns.add(Column.number(name + "_high"));
        }
        return TableSchema.of(columns.toArray(Column[]::new));
    }

    static MemoryTable of(List<Mode> modes) {
        MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "refined modes");
        for (Mode mode : modes) {
            List<Object> row = new ArrayList<>(List.of((long) mode.number(), mode.rate().re(), mode.rate().im(), mode.frequency(),
                    finite(mode.period()), mode.dampingRatio(), finite(mode.doublingTime()), mode.amplitude(), mode.energyShare()));
            row.add(null);
            for (Interval interval : intervals(mode)) {
                row.add(finite(interval.low()));
                row.add(finite(interval.high()));
            }
            rows.row(row.toArray());
        }
        return rows.build();
    }

    private static List<Interval> intervals(Mode mode) {
        return mode.intervals().map(found -> List.of(found.growth(), found.turning(), found.frequency(),
                mode.oscillates() ? found.period() : Interval.UNKNOWN, found.dampingRatio(), found.doublingTime(mode.rate().re())))
                .orElse(Collections.nCopies(WITH_INTERVAL.size(), Interval.UNKNOWN));
    }

    private static Double finite(double value) {
        return Double.isFinite(value) ? value : Double.NaN;
    }
}
