package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Entry;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Head;
import org.modestead.nodes.document.ReportDocument.KeyValues;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.figure.RecordingFigure;
import org.modestead.nodes.figure.SingularValues;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.TimeUnit;

/** How the figures came about: data, preparation, function space, operator. */
final class MethodSection {
    private static final int MOST_CHANNELS = 40;

    private MethodSection() {}

    static Section of(ReportSource source) {
        List<Block> blocks = new ArrayList<>();
        source.snapshots().ifPresent(snapshots -> {
            blocks.add(data(snapshots, source.unit()));
            blocks.add(new Picture(RecordingFigure.figure(snapshots, source.channels())));
            blocks.add(channels(snapshots, source.unit()));
        });
        source.operator().ifPresent(operator -> {
            blocks.add(operator(operator, source.unit()));
            blocks.add(new Picture(SingularValues.figure(operator)));
        });
        if (blocks.isEmpty()) {
            blocks.add(new Paragraph("Neither the recording nor the operator was handed to this report; see the steps"
                    + " below."));
        }
        return new Section("method", "How it was done", blocks);
    }

    private static KeyValues data(Snapshots snapshots, TimeUnit unit) {
        List<Entry> told = snapshots.facts().stream().map(fact -> new Entry(Sentence.capital(fact.item()), fact.value()))
                .toList();
        return new KeyValues("Data and preparation", told.isEmpty() ? counted(snapshots, unit) : told);
    }

    /** What can be seen from the runs themselves, where nobody recorded what was done to them. */
    private static List<Entry> counted(Snapshots snapshots, TimeUnit unit) {
        List<Entry> entries = new ArrayList<>();
        for (Snapshots.Part part : Snapshots.Part.values()) {
            List<Run> runs = snapshots.runs(part);
            int samples = runs.stream().mapToInt(run -> run.samples() - run.leadIn()).sum();
            entries.add(new Entry(Sentence.capital(part.name().toLowerCase(Locale.ROOT)), runs.isEmpty() ? "none"
                    : Sentence.count(samples, "sample") + " in " + Sentence.count(runs.size(), "run")));
        }
        entries.add(new Entry("Time step", snapshots.step().isPresent() ? unit.exactly(snapshots.step().getAsDouble())
                : "uneven"));
        entries.add(new Entry("Delay coordinates", snapshots.delay().depth() == 1 ? "none" : snapshots.delay().depth()
                + " samples stacked, " + Sentence.count(snapshots.delay().spacing(), "sample") + " apart"));
        return entries;
    }

    private static Grid channels(Snapshots snapshots, TimeUnit unit) {
        Preparation preparation = snapshots.preparation();
        int shown = Math.min(MOST_CHANNELS, snapshots.channels().size());
        List<List<String>> rows = IntStream.range(0, shown).mapToObj(c -> List.of(snapshots.channels().get(c).name(),
                snapshots.channels().get(c).unit().isEmpty() ? "unknown" : snapshots.channels().get(c).unit(),
                Digits.cell(preparation.offset()[c]), Digits.cell(preparation.slope()[c]),
                Digits.cell(preparation.scale()[c]))).toList();
        int left = snapshots.channels().size() - shown;
        return new Grid("Channels and how they were prepared", List.of(new Head("Channel", false), new Head("Unit", false),
                new Head("Offset taken off", true), new Head("Slope taken off [unit · " + unit.rate() + "]", true),
                new Head("Divided by", true)), rows, left == 0 ? "" : "And " + Sentence.count(left, "more channel") + ".");
    }

    private static KeyValues operator(FittedOperator operator, TimeUnit unit) {
        List<Entry> entries = new ArrayList<>();
        entries.add(new Entry("What was fitted", Sentence.of(operator.method())));
        entries.add(new Entry("Estimator", operator.estimator().id()));
        entries.add(new Entry("Kernel", operator.kernel().map(KernelSpec::label).orElse("none")));
        entries.add(new Entry("Inner product", operator.compression().innerProduct() == InnerProduct.SPACE
                ? "that of the kernel's space" : "average over the data"));
        entries.add(new Entry("Evolution", evolution(operator.evolution(), unit)));
        entries.add(new Entry("Rank", operator.rank() + " of at most " + operator.compression().rank()));
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
