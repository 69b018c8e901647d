package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import org.modestead.engine.Doubt;
import org.modestead.engine.recording.Fingerprint;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Entry;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Head;
import org.modestead.nodes.document.ReportDocument.KeyValues;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.document.ReportDocument.Tone;
import org.modestead.nodes.figure.RecordingFigure;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.TimeUnit;

/** What the recording was like and what was done to it: gaps, missing cells, noise, preparation. */
final class DataSection {
    private static final int MOST_CHANNELS = 40;

    private DataSection() {}

    static Section of(ReportSource source) {
        List<Block> blocks = new ArrayList<>();
        source.snapshots().ifPresentOrElse(snapshots -> {
            blocks.add(quality(snapshots));
            blocks.add(data(snapshots, source.unit()));
            blocks.add(new Picture(RecordingFigure.figure(snapshots, source.channels())));
            blocks.add(channels(snapshots, source.unit()));
        }, () -> blocks.add(new Paragraph("The recording was not handed to this report.")));
        return new Section("data", "Data quality", blocks);
    }

    private static Callout quality(Snapshots snapshots) {
        List<String> doubts = snapshots.doubts().stream().map(Doubt::sentence).map(Sentence::of).distinct().toList();
        return doubts.isEmpty() ? new Callout(Tone.NOTE, "nothing about the recording raised a doubt", List.of("Gaps, missing cells, steps and"
                + " scales were looked at; what was done to them stands below."))
                : new Callout(Tone.CAUTION, "what the recording leaves open", doubts);
    }

    private static KeyValues data(Snapshots snapshots, TimeUnit unit) {
        List<Entry> told = new ArrayList<>();
        snapshots.facts().forEach(fact -> told.add(new Entry(Sentence.capital(fact.item()), fact.value())));
        if (told.isEmpty()) {
            told.addAll(counted(snapshots, unit));
        }
        told.add(new Entry("Fingerprint of the data (SHA-256)", Fingerprint.of(snapshots)));
        return new KeyValues("Data and preparation", told);
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
}
