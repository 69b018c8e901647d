package org.modestead.nodes.report;

import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Heading;
import org.modestead.nodes.document.ReportDocument.KeyValues;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Points;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/** A report as rows of a table: what is said where, for further processing. */
final class ReportRows {
    static final TableSchema SCHEMA = TableSchema.of(new Column("section", CellType.TEXT),
            new Column("item", CellType.TEXT),
            new Column("text", CellType.TEXT));

    private final MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "report");
    private String section = "";
    private String heading = "";

    private ReportRows() {}

    static MemoryTable of(ReportDocument document) {
        ReportRows report = new ReportRows();
        document.sections().forEach(report::section);
        return report.rows.build();
    }

    private void section(Section told) {
        section = told.heading();
        heading = "";
        told.blocks().forEach(this::block);
    }

    private void block(Block block) {
        if (block instanceof Heading below) {
            heading = below.text();
        } else if (block instanceof Paragraph paragraph) {
            row(heading, paragraph.text());
        } else if (block instanceof Points points) {
            points.items().forEach(item -> row(heading, item));
        } else if (block instanceof Callout callout) {
            row(callout.tone().word(), callout.title() + ": " + String.join(" ", callout.sentences()));
        } else if (block instanceof KeyValues pairs) {
            pairs.entries().forEach(entry -> row(pairs.caption(), entry.name() + ": " + entry.value()));
        } else if (block instanceof Grid grid) {
            grid.rows().forEach(cells -> row(grid.caption(), IntStream.range(0, cells.size())
                    .mapToObj(c -> grid.columns().get(c).text() + ": " + cells.get(c)).collect(Collectors.joining("; "))));
        } else if (block instanceof Picture picture) {
            row("Figure", picture.figure().title() + ". " + picture.figure().caption());
        }
    }

    private void row(String item, String text) {
        rows.row(section, item, text);
    }
}
