package org.modestead.nodes.judge;

import org.modestead.engine.wellposed.Finding;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * The finding table: first the operator as a whole (mode 0), then mode by mode; the first row of each is its verdict
 * ({@code check = verdict}, passed when the mode may be reported), the others its checks. A value beyond all numbers is missing; the
 * sentence tells it.
 */
final class FindingTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("mode"), Column.text("check"), Column.number("value"),
            Column.number("threshold"), Column.flag("passed"), Column.text("finding"));

    private FindingTable() {}

    static MemoryTable of(Verdict verdict) {
        MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "findings");
        add(rows, verdict.overall(), verdict);
        verdict.modes().forEach(mode -> add(rows, mode, verdict));
        return rows.build();
    }

    private static void add(MemoryTable.Builder rows, ModeVerdict judged, Verdict verdict) {
        boolean passed = judged.grade() == Grade.STANDS || judged.grade() == Grade.SETTLES;
        rows.row((long) judged.mode(), "verdict", null, null, passed, judged.sentence());
        for (Finding finding : verdict.findings()) {
            if (finding.mode() == judged.mode()) {
                rows.row((long) finding.mode(), finding.check(), finite(finding.value()), finding.threshold(), finding.passed(),
                        finding.sentence());
            }
        }
    }

    private static double finite(double value) {
        return Double.isInfinite(value) ? Double.NaN : value;
    }
}
