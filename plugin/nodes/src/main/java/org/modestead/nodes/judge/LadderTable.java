package org.modestead.nodes.judge;

import org.modestead.engine.wellposed.LadderRow;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/** The ladder table: every mode on every rung that was judged. */
final class LadderTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("rank"), Column.whole("mode"),
            Column.number("lambda_real"),
            Column.number("lambda_imag"), Column.number("weight"), Column.number("norm_ratio"),
                    Column.number("residual"));

    private LadderTable() {}

    static MemoryTable of(Verdict verdict) {
        MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "ladder");
        for (LadderRow row : verdict.ladder()) {
            rows.row((long) row.rank(), (long) row.mode(), row.rate().re(), row.rate().im(), row.weightNorm(),
                    row.normRatio(),
                    row.residual());
        }
        return rows.build();
    }
}
