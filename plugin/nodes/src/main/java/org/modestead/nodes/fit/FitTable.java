package org.modestead.nodes.fit;

import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.InputUse;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.nodes.contract.SettingText;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.TimeUnit;

/** What was fitted and how well it is conditioned, one item a row. */
final class FitTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.text("item"), Column.text("value"));

    private FitTable() {}

    static MemoryTable of(FittedOperator operator, double ridge) {
        double[] singular = operator.functions().singular();
        TimeUnit unit = new TimeUnit(operator.snapshots().time().unit());
        MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "fit");
        rows.row("operator", operator.estimator().id());
        rows.row("method", operator.method());
        rows.row("kernel", operator.kernel().map(KernelSpec::label).orElse("none"));
        rows.row("kind", kind(operator.evolution(), unit));
        rows.row("highest frequency", frequency(operator.evolution().aliasingLimit(), unit));
        rows.row("inner product", operator.functions().innerProduct() == InnerProduct.DATA ? "average over the data"
                : "kernel space");
        rows.row("functions", operator.functions().basis().describe());
        rows.row("inputs", inputs(operator));
        rows.row("structure", structure(operator.chosen()));
        rows.row("snapshot pairs or pieces", Integer.toString(operator.functions().snapshots()));
        rows.row("largest rank", Integer.toString(operator.functions().rank()));
        rows.row("rank", Integer.toString(operator.rank()));
        rows.row("rank chosen by", operator.rankChoice());
        rows.row("condition", Digits.cell(singular[0] / singular[operator.rank() - 1]));
        rows.row("ridge", SettingText.plain(ridge));
        return rows.build();
    }

    private static String structure(OrthonormalCompression chosen) {
        return chosen.imposed().map(imposing -> imposing.structure().words() + ", changes the operator by "
                + Digits.cell(imposing.change(chosen.action())) + " of its size").orElse("none");
    }

    private static String inputs(FittedOperator operator) {
        int columns = operator.snapshots().inputs().size();
        return columns == 0 ? "none" : operator.functions().inputs().map(effect -> columns + ", " + effect.use().words() + ", "
                + effect.count() + " independent terms").orElse(columns + ", " + InputUse.LEFT_IN.words());
    }

    private static String kind(Evolution evolution, TimeUnit unit) {
        if (evolution instanceof Evolution.StepMap map) {
            return "step map, step " + Digits.cell(map.step()) + " " + unit.name();
        }
        double contraction = ((Evolution.Generator) evolution).contraction();
        return contraction == 1 ? "generator" : "scaled generator, contraction " + SettingText.plain(contraction);
    }

    private static String frequency(double limit, TimeUnit unit) {
        return Double.isInfinite(limit) ? "no limit" : Digits.cell(limit) + " " + unit.frequency();
    }
}
