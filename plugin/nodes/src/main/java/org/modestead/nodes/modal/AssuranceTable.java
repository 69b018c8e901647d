package org.modestead.nodes.modal;

import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ShapeComparison;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * Every mode of one spectrum with every mode of another. Frequencies in cycles per time unit; their change relative to the first, missing
 * where that does not oscillate, as is its damping ratio.
 */
final class AssuranceTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("mode_a"), Column.whole("mode_b"), Column.number("frequency_a"),
            Column.number("frequency_b"), Column.number("frequency_change"), Column.number("damping_ratio_a"),
            Column.number("damping_ratio_b"), Column.number("mac"), Column.flag("paired"));

    private AssuranceTable() {}

    static MemoryTable of(ShapeComparison comparison) {
        MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "assurance");
        for (ShapeComparison.Pair pair : comparison.pairs()) {
            rows.row((long) pair.a().number(), (long) pair.b().number(), pair.a().frequency(), pair.b().frequency(), pair.frequencyChange(),
                    damping(pair.a()), damping(pair.b()), pair.assurance(), pair.paired());
        }
        return rows.build();
    }

    private static double damping(Mode mode) {
        return mode.oscillates() ? mode.dampingRatio() : Double.NaN;
    }
}
