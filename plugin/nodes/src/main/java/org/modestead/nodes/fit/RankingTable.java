package org.modestead.nodes.fit;

import java.util.List;
import java.util.Optional;
import org.modestead.engine.choose.KernelVerdict;
import org.modestead.engine.choose.RankedKernel;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/** The kernels compared, best first; what was not judged is missing. */
final class RankingTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("place"), Column.text("kernel"), Column.whole("rank"),
            Column.number("holdout_error"), Column.number("persistence_error"), Column.text("note"), Column.text("verdict"),
            Column.number("captured_share"), Column.number("holdout_residual"), Column.number("settling"), Column.text("holds"));

    private RankingTable() {}

    static MemoryTable of(List<RankedKernel> rows) {
        MemoryTable.Builder table = MemoryTable.builder(SCHEMA, "ranking");
        for (int i = 0; i < rows.size(); i++) {
            RankedKernel row = rows.get(i);
            Optional<KernelVerdict> verdict = row.verdict();
            table.row(i + 1L, row.kernel().label(), row.rank() == 0 ? null : (long) row.rank(), row.heldOutError(),
                    row.persistenceError(), row.note(), verdict.map(given -> given.grade().word()).orElse(null),
                    verdict.map(KernelVerdict::capturedShare).orElse(Double.NaN),
                    verdict.map(KernelVerdict::residual).orElse(Double.NaN),
                    verdict.map(KernelVerdict::settling).orElse(Double.NaN), row.room().statement());
        }
        return table.build();
    }
}
