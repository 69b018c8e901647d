package org.modestead.host.bench.look;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import org.modestead.nodes.document.ReportDocument;

/** Writes a report that a node made as JSON, block by block; pictures are figures as everywhere. */
public final class DocumentJson {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private DocumentJson() {}

    /** Returns the whole report. */
    public static ObjectNode of(ReportDocument document) {
        ObjectNode out = NODES.objectNode().put("title", document.title()).put("subtitle", document.subtitle());
        ArrayNode sections = out.putArray("sections");
        document.sections().forEach(section -> {
            ArrayNode blocks = sections.addObject().put("id", section.id()).put("heading", section.heading()).putArray("blocks");
            section.blocks().forEach(block -> blocks.add(block(block)));
        });
        return out;
    }

    private static ObjectNode block(ReportDocument.Block block) {
        ObjectNode out = NODES.objectNode();
        if (block instanceof ReportDocument.Heading heading) {
            return out.put("type", "heading").put("text", heading.text());
        }
        if (block instanceof ReportDocument.Paragraph paragraph) {
            return out.put("type", "paragraph").put("text", paragraph.text());
        }
        if (block instanceof ReportDocument.Points points) {
            texts(out.put("type", "points").putArray("items"), points.items());
            return out;
        }
        if (block instanceof ReportDocument.Callout callout) {
            texts(out.put("type", "callout").put("tone", callout.tone().name()).put("word", callout.tone().word()).put("title", callout.title())
                    .putArray("sentences"), callout.sentences());
            return out;
        }
        if (block instanceof ReportDocument.KeyValues values) {
            ArrayNode entries = out.put("type", "values").put("caption", values.caption()).putArray("entries");
            values.entries().forEach(entry -> entries.addObject().put("name", entry.name()).put("value", entry.value()));
            return out;
        }
        if (block instanceof ReportDocument.Grid grid) {
            return grid(out, grid);
        }
        return out.put("type", "picture").set("figure", FigureJson.of(((ReportDocument.Picture) block).figure()));
    }

    private static ObjectNode grid(ObjectNode out, ReportDocument.Grid grid) {
        ArrayNode columns = out.put("type", "grid").put("caption", grid.caption()).put("note", grid.note()).putArray("columns");
        grid.columns().forEach(head -> columns.addObject().put("text", head.text()).put("numeric", head.numeric()));
        ArrayNode rows = out.putArray("rows");
        grid.rows().forEach(row -> texts(rows.addArray(), row));
        return out;
    }

    private static void texts(ArrayNode out, List<String> texts) {
        texts.forEach(out::add);
    }
}
