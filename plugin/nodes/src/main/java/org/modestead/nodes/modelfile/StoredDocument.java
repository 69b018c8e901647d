package org.modestead.nodes.modelfile;

import java.util.List;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.FieldsWriter;
import org.modestead.engine.modelfile.Stored;
import org.modestead.nodes.document.ReportDocument;

/** A report: sections of blocks. */
final class StoredDocument {

    private StoredDocument() {}

    static Stored.Fields of(ReportDocument document) {
        return new FieldsWriter().text("title", document.title()).text("subtitle", document.subtitle())
                .list("sections", document.sections(), StoredDocument::of).done();
    }

    static ReportDocument read(FieldsReader in) {
        return new ReportDocument(in.text("title"), in.text("subtitle"), in.objects("sections", StoredDocument::section));
    }

    private static Stored.Fields of(ReportDocument.Section section) {
        return new FieldsWriter().text("id", section.id()).text("heading", section.heading())
                .list("blocks", section.blocks(), StoredDocument::of).done();
    }

    private static ReportDocument.Section section(FieldsReader in) {
        return new ReportDocument.Section(in.text("id"), in.text("heading"), in.objects("blocks", StoredDocument::block));
    }

    private static Stored.Fields of(ReportDocument.Block block) {
        FieldsWriter out = new FieldsWriter();
        if (block instanceof ReportDocument.Heading heading) {
            return out.text("kind", "heading").text("text", heading.text()).done();
        }
        if (block instanceof ReportDocument.Paragraph paragraph) {
            return out.text("kind", "paragraph").text("text", paragraph.text()).done();
        }
        if (block instanceof ReportDocument.Points points) {
            return out.text("kind", "points").texts("items", points.items()).done();
        }
        if (block instanceof ReportDocument.Callout callout) {
            return out.text("kind", "callout").choice("tone", callout.tone()).text("title", callout.title())
                    .texts("sentences", callout.sentences()).done();
        }
        if (block instanceof ReportDocument.KeyValues pairs) {
            return out.text("kind", "key-values").text("caption", pairs.caption()).list("entries", pairs.entries(), entry ->
                    new FieldsWriter().text("name", entry.name()).text("value", entry.value()).done()).done();
        }
        if (block instanceof ReportDocument.Grid grid) {
            return filled(out.text("kind", "grid"), grid);
        }
        return out.text("kind", "picture").put("figure", StoredFigure.of(((ReportDocument.Picture) block).figure())).done();
    }

    private static ReportDocument.Block block(FieldsReader in) {
        String kind = in.text("kind");
        return switch (kind) {
            case "heading" -> new ReportDocument.Heading(in.text("text"));
            case "paragraph" -> new ReportDocument.Paragraph(in.text("text"));
            case "points" -> new ReportDocument.Points(in.texts("items"));
            case "callout" -> new ReportDocument.Callout(in.choice("tone", ReportDocument.Tone.class), in.text("title"), in.texts("sentences"));
            case "key-values" -> new ReportDocument.KeyValues(in.text("caption"), in.objects("entries", entry ->
                    new ReportDocument.Entry(entry.text("name"), entry.text("value"))));
            case "grid" -> grid(in);
            case "picture" -> new ReportDocument.Picture(in.object("figure", StoredFigure::read));
            default -> throw in.wrong("kind", "a block of kind " + kind, "a kind that is known here");
        };
    }

    static Stored.Fields of(ReportDocument.Grid grid) {
        return filled(new FieldsWriter(), grid);
    }

    private static Stored.Fields filled(FieldsWriter out, ReportDocument.Grid grid) {
        return out.text("caption", grid.caption()).list("columns", grid.columns(), head -> new FieldsWriter().text("text", head.text())
                .flag("numeric", head.numeric()).done()).list("rows", grid.rows(), row -> new FieldsWriter().texts("cells", row).done())
                .text("note", grid.note()).done();
    }

    static ReportDocument.Grid grid(FieldsReader in) {
        List<ReportDocument.Head> columns = in.objects("columns", head -> new ReportDocument.Head(head.text("text"), head.flag("numeric")));
        List<List<String>> rows = in.objects("rows", row -> row.texts("cells"));
        return new ReportDocument.Grid(in.text("caption"), columns, rows, in.text("note"));
    }
}
