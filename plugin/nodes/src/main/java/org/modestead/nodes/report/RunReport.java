package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import org.modestead.nodes.contract.NodeDeclaration.Stage;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Entry;
import org.modestead.nodes.document.ReportDocument.Heading;
import org.modestead.nodes.document.ReportDocument.KeyValues;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Points;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.document.ReportDocument.Tone;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.words.Sentence;

/**
 * Assembles the report of a whole workflow run.
 *
 * <p>A step that handed over a document leads: its sections come first, and the sections of the steps leave out figures
 * and doubts that were told there. Without such a step the steps' own summaries, figures and tables make the report.
 * The last sections hold the doubts and everything needed to repeat the run.
 */
public final class RunReport {
    private static final Set<Stage> TOLD_BY_DOCUMENT = Set.of(Stage.JUDGE, Stage.FORECAST, Stage.REPORT);

    private static final int MOST_ROWS = 50;
    private static final int MOST_RAW_ROWS = 10;

    private final List<StepAccount> steps;
    private final boolean led;
    private final Set<List<String>> shown = new HashSet<>();

    private RunReport(List<StepAccount> steps) {
        this.steps = steps;
        this.led = leading().isPresent();
    }

    /**
     * @param title of the run, for example the workflow's name
     * @param steps in the order of the work, only those that were done
     * @param versions what the run was done with, in the order in which they are to be read
     * @return never null; the same arguments give the same document
     */
    public static ReportDocument assemble(String title, List<StepAccount> steps, Map<String, String> versions) {
        RunReport report = new RunReport(List.copyOf(steps));
        List<Section> sections = new ArrayList<>(report.documents());
        if (!report.led) {
            sections.add(report.overview());
        }
        for (int i = 0; i < steps.size(); i++) {
            if (steps.get(i).result().document().isEmpty()) {
                sections.add(report.step(i));
            }
        }
        if (!report.led) {
            sections.add(DoubtsSection.of(steps.stream().flatMap(step -> step.result().doubts().stream()).distinct()
                    .toList()));
        }
        sections.add(report.repeat(versions));
        String done = "Workflow " + title + ", " + Sentence.count(steps.size(), "step") + ".";
        return report.leading().map(document -> new ReportDocument(document.title(), done, sections))
                .orElseGet(() -> new ReportDocument(title, done, sections));
    }

    private Optional<ReportDocument> leading() {
        return steps.stream().flatMap(step -> step.result().document().stream()).findFirst();
    }

    private List<Section> documents() {
        List<Section> sections = new ArrayList<>();
        for (StepAccount step : steps) {
            step.result().document().ifPresent(document -> document.sections().forEach(section ->
                    sections.add(sections.stream().anyMatch(earlier -> earlier.id().equals(section.id()))
                            ? new Section(id("of", sections.size(), section.id()),
                            section.heading() + " (" + step.stepId() + ")",
                                    section.blocks()) : section)));
        }
        sections.stream().flatMap(section -> section.blocks().stream()).forEach(this::remember);
        return sections;
    }

    private void remember(Block block) {
        if (block instanceof Picture picture) {
            shown.add(drawnData(picture.figure()));
        } else if (block instanceof Points points) {
            points.items().forEach(item -> shown.add(List.of(item)));
        }
    }

    private Section overview() {
        return new Section("overview", "What was"
                + " done", List.of(new Points(steps.stream().map(step -> step.nodeTitle() + " (" + step.stepId()
                + ")" + step.result().summary().stream().findFirst().map(first -> ": " + Sentence.of(first)).orElse(""))
                .toList())));
    }

    private Section step(int index) {
        StepAccount step = steps.get(index);
        List<Block> blocks = new ArrayList<>();
        step.result().summary().forEach(sentence -> blocks.add(new Paragraph(Sentence.of(sentence))));
        List<String> doubts = step.result().doubts().stream().map(DoubtsSection::told).distinct()
                .filter(told -> !shown.contains(List.of(told))).toList();
        if (!doubts.isEmpty()) {
            blocks.add(new Callout(Tone.CAUTION, "doubts raised by this step", doubts));
        }
        List<Figure> fresh = step.result().figures().stream().filter(figure -> shown.add(drawnData(figure))).toList();
        fresh.forEach(figure -> blocks.add(new Picture(figure)));
        boolean toldAbove = led && TOLD_BY_DOCUMENT.contains(step.stage()) && fresh.isEmpty();
        if (!toldAbove) {
            blocks.addAll(tables(step));
        }
        if (blocks.isEmpty()) {
            blocks.add(new Paragraph("Everything this step found is told above."));
        }
        return new Section(id("step", index + 1, step.stepId()), "Step: " + step.nodeTitle() + " (" + step.stepId() + ")",
                blocks);
    }

    private static List<Block> tables(StepAccount step) {
        int most = step.stage() == Stage.DATA ? MOST_RAW_ROWS : MOST_ROWS;
        List<Block> tables = new ArrayList<>();
        new TreeMap<>(step.result().outputs()).forEach((port, value) -> {
            if (value instanceof Table table) {
                tables.add(TableExcerpt.of(table, step.stepId(), port, most));
            }
        });
        return tables;
    }

    private Section repeat(Map<String, String> versions) {
        List<Block> blocks = new ArrayList<>();
        if (!versions.isEmpty()) {
            blocks.add(new KeyValues("Versions", entries(versions)));
        }
        blocks.add(new Heading("Settings by step"));
        for (StepAccount step : steps) {
            blocks.add(step.settings().isEmpty() ? new Paragraph(step.nodeTitle() + " (" + step.stepId()
                    + ") has no settings.")
                    : new KeyValues(step.nodeTitle() + " (" + step.stepId() + ")", entries(step.settings())));
        }
        return new Section("repeat", "How to repeat this run", blocks);
    }

    private static List<Entry> entries(Map<String, String> values) {
        return values.entrySet().stream().map(entry -> new Entry(entry.getKey(), entry.getValue())).toList();
    }

    private static String id(String prefix, int number, String name) {
        return prefix + "-" + number + "-" + name.replaceAll("[^A-Za-z0-9_-]", "-");
    }

    /** What a figure shows, whatever it is called: the same data are not drawn twice in one report. */
    private static List<String> drawnData(Figure figure) {
        List<String> data = new ArrayList<>(List.of(figure.id()));
        figure.layers().stream().map(DrawnData::of).sorted().forEach(data::add);
        return data;
    }
}
