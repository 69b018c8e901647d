package org.modestead.nodes.fit;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.moments.MomentFit;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.SingularValues;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/** Fits an operator to sums of snapshot pairs, as every node does that has them, wherever they come from. */
public final class MomentFitting {

    /** Columns of the tables that are given. */
    public static final TableSchema TABLE = FitTable.SCHEMA;

    private MomentFitting() {}

    /** Returns the settings of the rank, in dialog order. */
    public static List<Setting> settings() {
        return FitSettings.rankSettings();
    }

    /**
     * @param moments with sums of pairs
     * @param settings with those of the rank
     * @return outputs {@code snapshots}, {@code operator}, {@code fit} and {@code summary}
     * @throws org.modestead.engine.FitFault if there is no pair, or the rank asked for is more than the data hold
     */
    public static NodeResult fit(Moments moments, Settings settings, Progress progress) {
        double ridge = settings.number(FitSettings.RIDGE);
        return of(moments, MomentFit.fit(moments, FitSettings.rankRule(settings), ridge, progress), ridge);
    }

    private static NodeResult of(Moments moments, FittedOperator operator, double ridge) {
        MemoryTable.Builder summary = MemoryTable.builder(FitTable.SCHEMA, "summary");
        operator.snapshots().facts().forEach(fact -> summary.row(fact.item(), fact.value()));
        Set<Doubt> doubts = new LinkedHashSet<>(operator.snapshots().doubts());
        doubts.addAll(operator.doubts());
        List<String> said = new ArrayList<>();
        said.add("Fitted: " + operator.method() + ".");
        said.add(String.format(Locale.ROOT, "%d rows of %d runs were read; %d samples gave %d pairs of states.", moments.counts().rows(),
                moments.counts().runs(), moments.counts().training(), moments.pairs().pairs()));
        said.add("Rank " + operator.rank() + " of at most " + operator.functions().rank() + ": " + operator.rankChoice() + ".");
        return new NodeResult(Map.of("snapshots", operator.snapshots(), "operator", operator, "fit", FitTable.of(operator, ridge), "summary",
                summary.build()), List.of(SingularValues.figure(operator)), said, List.copyOf(doubts));
    }
}
