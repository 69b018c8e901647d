package org.modestead.nodes.judge;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * The mode table: one row a mode, a conjugate pair as one row. Rates in 1/time unit, frequency in cycles/time unit,
 * period and doubling time in time units (negative: minus the halving time); what is infinite is missing. The ends of
 * intervals follow, missing where none were computed or where an end runs to infinity.
 */
final class ModeTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("mode"), Column.number("lambda_real"),
            Column.number("lambda_imag"), Column.number("frequency"), Column.number("period"),
                    Column.number("damping_ratio"),
            Column.number("doubling_time"), Column.number("amplitude"), Column.number("energy_share"),
                    Column.text("verdict"),
            Column.number("lambda_real_low"), Column.number("lambda_real_high"),
            Column.number("lambda_imag_low"), Column.number("lambda_imag_high"),
            Column.number("frequency_low"), Column.number("frequency_high"),
            Column.number("period_low"), Column.number("period_high"),
            Column.number("damping_ratio_low"), Column.number("damping_ratio_high"),
            Column.number("doubling_time_low"), Column.number("doubling_time_high"),
            Column.number("amplitude_low"), Column.number("amplitude_high"));

    private static final int INTERVALS = 7;

    private ModeTable() {}

    static MemoryTable of(Spectrum spectrum, Optional<Verdict> verdict) {
        return of(spectrum.modes(), verdict);
    }

    static MemoryTable of(List<Mode> modes, Optional<Verdict> verdict) {
        MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "modes");
        for (Mode mode : modes) {
            List<Object> cells = new ArrayList<>();
            cells.addAll(List.of((long) mode.number(), mode.rate().re(), mode.rate().im(), mode.frequency(),
                    finite(mode.period()), mode.dampingRatio(), finite(mode.doublingTime()), mode.amplitude(),
                    mode.energyShare()));
            cells.add(verdict.flatMap(given -> given.of(mode.number())).map(given -> given.grade().word()).orElse(null));
            intervals(mode).forEach(interval -> cells.addAll(List.of(interval.low(), interval.high())));
            rows.row(cells.toArray());
        }
        return rows.build();
    }

    /** In the order of the columns. */
    private static List<Interval> intervals(Mode mode) {
        return mode.intervals().map(found -> List.of(found.growth(), found.turning(), found.frequency(), found.period(),
                found.dampingRatio(), found.doublingTime(mode.rate().re()), found.amplitude()))
                .orElseGet(() -> Collections.nCopies(INTERVALS, Interval.UNKNOWN));
    }

    private static Double finite(double value) {
        return Double.isFinite(value) ? value : Double.NaN;
    }
}
