package org.modestead.knime.view;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import org.modestead.knime.swing.Sheet;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Heading;
import org.modestead.nodes.document.ReportDocument.KeyValues;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Points;

/** A report as Swing components below each other, in reading order. */
final class ReportPane {

    private ReportPane() {}

    static JScrollPane of(ReportDocument document) {
        List<JComponent> parts = new ArrayList<>(List.of(Texts.heading(document.title(), true)));
        if (!document.subtitle().isEmpty()) {
            parts.add(Texts.paragraph(document.subtitle(), "Subtitle"));
        }
        for (ReportDocument.Section section : document.sections()) {
            parts.add(Texts.heading(section.heading(), true));
            section.blocks().forEach(block -> parts.addAll(parts(block, section.heading())));
        }
        return Sheet.scrolled(parts);
    }

    private static List<JComponent> parts(Block block, String where) {
        if (block instanceof Heading heading) {
            return List.of(Texts.heading(heading.text(), false));
        } else if (block instanceof Paragraph paragraph) {
            return List.of(Texts.paragraph(paragraph.text(), where));
        } else if (block instanceof Points points) {
            return List.of(Texts.paragraph(points.items().stream().map(item -> "\u2022 " + item).collect(Collectors.joining("\n")), where));
        } else if (block instanceof Callout callout) {
            return List.of(Texts.heading(callout.tone().word() + ": " + callout.title(), false),
                    Texts.paragraph(String.join("\n", callout.sentences()), callout.title()));
        } else if (block instanceof KeyValues values) {
            return List.of(Texts.heading(values.caption(), false), FactList.of(values.entries().stream()
                    .map(entry -> new FactList.Fact(entry.name(), entry.value())).toList()));
        } else if (block instanceof Grid grid) {
            return grid(grid);
        }
        FigureCanvas canvas = new FigureCanvas();
        canvas.show(((Picture) block).figure());
        return List.of(canvas, Texts.paragraph(((Picture) block).figure().caption(), ((Picture) block).figure().title()));
    }

    /** Returns a table with its caption and note. */
    static List<JComponent> grid(Grid grid) {
        List<JComponent> parts = new ArrayList<>(List.of(Texts.heading(grid.caption(), false), GridTable.of(grid)));
        if (!grid.note().isEmpty()) {
            parts.add(Texts.paragraph(grid.note(), grid.caption()));
        }
        return parts;
    }
}
