package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Entry;
import org.modestead.nodes.document.ReportDocument.KeyValues;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.figure.SingularValues;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.TimeUnit;

/** How the figures came about: function space and operator. */
final class MethodSection {
    private MethodSection() {}

    static Section of(ReportSource source) {
        List<Block> blocks = new ArrayList<>();
        source.operator().ifPresent(operator -> {
            blocks.add(operator(operator, source.unit()));
            blocks.add(new Picture(SingularValues.figure(operator)));
        });
        if (blocks.isEmpty()) {
            blocks.add(new Paragraph("What was fitted was not handed to this report; see the steps below."));
        }
        return new Section("method", "Method", blocks);
    }

    private static KeyValues operator(FittedOperator operator, TimeUnit unit) {
        List<Entry> entries = new ArrayList<>();
        entries.add(new Entry("What was fitted", Sentence.of(operator.method())));
        entries.add(new Entry("Estimator", operator.estimator().id()));
        entries.add(new Entry("Kernel", operator.kernel().map(KernelSpec::label).orElse("none")));
        entries.add(new Entry("Inner product", operator.functions().innerProduct() == InnerProduct.SPACE
                ? "that of the kernel's space" : "average over the data"));
        entries.add(new Entry("Evolution", evolution(operator.evolution(), unit)));
        entries.add(new Entry("Rank", operator.rank() + " of at most " + operator.functions().rank()));
        entries.add(new Entry("Why this rank", Sentence.of(operator.rankChoice())));
        return new KeyValues("Operator", entries);
    }

    private static String evolution(Evolution evolution, TimeUnit unit) {
        if (evolution instanceof Evolution.StepMap map) {
            return "one step of " + unit.exactly(map.step()) + "; frequencies above "
                    + Digits.frequency(map.aliasingLimit(), unit.frequency()) + " appear folded";
        }
        double contraction = ((Evolution.Generator) evolution).contraction();
        return contraction == 1 ? "continuous time" : "continuous time, states contracted by " + Digits.cell(contraction);
    }
}
