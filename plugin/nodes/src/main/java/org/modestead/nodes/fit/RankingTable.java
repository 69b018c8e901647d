package org.modestead.nodes.fit;

import java.util.List;
import org.modestead.engine.operator.KernelRanking;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/** The kernels compared, best first, as table and picture. */
final class RankingTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("place"), Column.text("kernel"), Column.whole("rank"),
            Column.number("holdout_error"), Column.number("persistence_error"), Column.text("note"));

    private RankingTable() {}

    static MemoryTable of(List<KernelRanking.Row> rows) {
        MemoryTable.Builder table = MemoryTable.builder(SCHEMA, "ranking");
        for (int i = 0; i < rows.size(); i++) {
            KernelRanking.Row row = rows.get(i);
            table.row(i + 1L, row.kernel().label(), row.rank() == 0 ? null : (long) row.rank(), row.holdoutError(),
                    row.persistenceError(), row.note());
        }
        return table.build();
    }

    /** Returns the errors as bars; nothing when nothing was compared. */
    static List<Figure> figures(List<KernelRanking.Row> rows) {
        List<KernelRanking.Row> compared = rows.stream().filter(row -> Double.isFinite(row.holdoutError())).toList();
        if (compared.size() < 2) {
            return List.of();
        }
        return List.of(new Figure("kernel-ranking", Figure.Kind.BARS, "One-step error by kernel",
                "One-step error on data that the fit did not see, best kernel first, against that of persistence. A"
                        + " small error says that the space forecasts well, not that modes exist in it.",
                Figure.Axis.categories("kernel", compared.stream().map(row -> row.kernel().label()).toList()),
                Figure.Axis.linear("one-step error / spread"),
                List.of(new Figure.Bars("fitted", "", column(compared, false)),
                        new Figure.Bars("persistence", "", column(compared, true)))));
    }

    private static double[] column(List<KernelRanking.Row> rows, boolean persistence) {
        return rows.stream().mapToDouble(row -> persistence ? row.persistenceError() : row.holdoutError()).toArray();
    }
}
