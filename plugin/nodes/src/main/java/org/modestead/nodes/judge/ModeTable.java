package org.modestead.nodes.judge;

import java.util.Optional;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * The mode table: one row a mode, a conjugate pair as one row. Rates in 1/time unit, frequency in cycles/time unit,
 * period and doubling time in time units (negative: minus the halving time); what is infinite is missing.
 */
final class ModeTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("mode"), Column.number("lambda_real"),
            Column.number("lambda_imag"), Column.number("frequency"), Column.number("period"),
                    Column.number("damping_ratio"),
            Column.number("doubling_time"), Column.number("amplitude"), Column.number("energy_share"),
                    Column.text("verdict"));

    private ModeTable() {}

    static MemoryTable of(Spectrum spectrum, Optional<Verdict> verdict) {
        MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "modes");
        for (Mode mode : spectrum.modes()) {
            rows.row((long) mode.number(), mode.rate().re(), mode.rate().im(), mode.frequency(), finite(mode.period()),
                    mode.dampingRatio(), finite(mode.doublingTime()), mode.amplitude(), mode.energyShare(),
                    verdict.flatMap(given -> given.of(mode.number())).map(given -> given.grade().word()).orElse(null));
        }
        return rows.build();
    }

    private static Double finite(double value) {
        return Double.isFinite(value) ? value : Double.NaN;
    }
}
