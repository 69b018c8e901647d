package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Entry;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Head;
import org.modestead.nodes.document.ReportDocument.Heading;
import org.modestead.nodes.document.ReportDocument.KeyValues;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Points;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.render.FigureRenderer;
import org.modestead.nodes.words.Digits;

/**
 * Writes a report as one HTML file that needs nothing beside it: style and pictures are in the page, there is no
 * script, and nothing is fetched. Readable in light and dark surroundings, on a screen and on A4 or Letter paper, with
 * the keyboard alone and read aloud. The same document gives the same text.
 */
public final class HtmlReport {
    private final StringBuilder out = new StringBuilder();
    private final List<String> drawn;
    private int figures;
    private int tables;

    private HtmlReport(List<String> drawn) {
        this.drawn = drawn;
    }

    /**
     * @param document to write
     * @return a whole page, UTF-8 when stored
     */
    public static String write(ReportDocument document) {
        HtmlReport report = new HtmlReport(drawn(document));
        report.page(document);
        return report.out.toString();
    }

    /** Every figure in the order of the page. Drawing takes most of the time, and the figures know nothing of each other: all cores draw. */
    private static List<String> drawn(ReportDocument document) {
        List<Figure> figures = new ArrayList<>();
        document.sections().forEach(section -> section.blocks().forEach(block -> {
            if (block instanceof Picture picture) {
                figures.add(picture.figure().named("figure-" + (figures.size() + 1)));
            }
        }));
        return figures.parallelStream().map(FigureRenderer::svg).toList();
    }

    private void page(ReportDocument document) {
        out.append("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n")
                .append("<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n")
                .append("<meta name=\"color-scheme\" content=\"light dark\">\n");
        element("title", document.title());
        out.append("<style>\n").append(ReportStyle.css()).append("</style>\n</head>\n<body>\n")
                .append("<a class=\"skip\" href=\"#report\">Skip to the report</a>\n<header>\n");
        element("h1", document.title());
        if (!document.subtitle().isEmpty()) {
            out.append("<p class=\"subtitle\">").append(escaped(document.subtitle())).append("</p>\n");
        }
        out.append("</header>\n");
        contents(document.sections());
        out.append("<main id=\"report\">\n");
        document.sections().forEach(this::section);
        out.append("</main>\n<footer>\n<p>Written by Modestead. Every table in full lies beside this report as a CSV"
                + " file.</p>\n</footer>\n")
                .append("</body>\n</html>\n");
    }

    private void contents(List<Section> sections) {
        out.append("<nav aria-labelledby=\"contents\">\n<h2 id=\"contents\">Contents</h2>\n<ol>\n");
        for (Section section : sections) {
            out.append("<li><a href=\"#").append(escaped(section.id())).append("\">").append(escaped(section.heading()))
                    .append("</a></li>\n");
        }
        out.append("</ol>\n</nav>\n");
    }

    private void section(Section section) {
        String id = escaped(section.id());
        out.append("<section aria-labelledby=\"").append(id).append("\">\n<h2 id=\"").append(id).append("\">")
                .append(escaped(section.heading())).append("</h2>\n");
        List<Block> blocks = section.blocks();
        for (int i = 0; i < blocks.size(); i++) {
            if (small(blocks, i) && small(blocks, i + 1)) {
                out.append("<div class=\"pair\">\n");
                while (small(blocks, i)) {
                    block(blocks.get(i++));
                }
                i--;
                out.append("</div>\n");
            } else {
                block(blocks.get(i));
            }
        }
        out.append("</section>\n");
    }

    private static boolean small(List<Block> blocks, int i) {
        return i < blocks.size() && blocks.get(i) instanceof Picture picture && width(picture.figure()).equals("small");
    }

    private static String width(Figure figure) {
        return switch (figure.kind()) {
            case TIME_SERIES -> "wide";
            case COMPLEX_PLANE, MARKS -> "middle";
            case CURVES, SHAPES, BARS -> "small";
        };
    }

    private void block(Block block) {
        if (block instanceof Heading heading) {
            element("h3", heading.text());
        } else if (block instanceof Paragraph paragraph) {
            element("p", paragraph.text());
        } else if (block instanceof Points points) {
            out.append("<ul>\n");
            points.items().forEach(item -> element("li", item));
            out.append("</ul>\n");
        } else if (block instanceof Callout callout) {
            callout(callout);
        } else if (block instanceof KeyValues pairs) {
            pairs(pairs);
        } else if (block instanceof Grid grid) {
            grid(grid);
        } else if (block instanceof Picture picture) {
            picture(picture.figure());
        }
    }

    private void callout(Callout callout) {
        out.append("<div class=\"callout ").append(callout.tone().name().toLowerCase(Locale.ROOT))
                .append("\" role=\"note\">\n<p class=\"title\">")
                .append(escaped(callout.tone().word() + ": " + callout.title())).append("</p>\n");
        callout.sentences().forEach(sentence -> element("p", sentence));
        out.append("</div>\n");
    }

    private void pairs(KeyValues pairs) {
        open(pairs.caption());
        out.append("<tbody>\n");
        for (Entry entry : pairs.entries()) {
            out.append("<tr><th scope=\"row\">").append(escaped(entry.name())).append("</th><td>")
                    .append(escaped(entry.value()))
                    .append("</td></tr>\n");
        }
        out.append("</tbody>\n</table></div>\n");
    }

    private void grid(Grid grid) {
        open(grid.caption());
        out.append("<thead><tr>");
        grid.columns().forEach(head -> cell("th scope=\"col\"", "th", head, head.text()));
        out.append("</tr></thead>\n<tbody>\n");
        for (List<String> row : grid.rows()) {
            out.append("<tr>");
            for (int c = 0; c < row.size(); c++) {
                cell(c == 0 ? "th scope=\"row\"" : "td", c == 0 ? "th" : "td", grid.columns().get(c), row.get(c));
            }
            out.append("</tr>\n");
        }
        out.append("</tbody>\n</table></div>\n");
        if (!grid.note().isEmpty()) {
            out.append("<p class=\"below\">").append(escaped(grid.note())).append("</p>\n");
        }
    }

    private void open(String caption) {
        tables++;
        out.append("<div class=\"table\" role=\"group\" tabindex=\"0\" aria-labelledby=\"table-").append(tables)
                .append("\"><table>\n<caption id=\"table-").append(tables).append("\">").append(escaped(caption))
                .append("</caption>\n");
    }

    private void cell(String start, String end, Head head, String text) {
        out.append('<').append(start).append(head.numeric() ? " class=\"number\"" : "").append('>').append(escaped(Digits.prose(text)))
                .append("</")
                .append(end).append('>');
    }

    private void picture(Figure figure) {
        figures++;
        out.append("<figure class=\"").append(width(figure)).append("\">\n")
                .append(drawn.get(figures - 1)).append("\n<figcaption>").append(escaped("Figure " + figures + "."
                + " " + figure.caption()))
                .append("</figcaption>\n</figure>\n");
    }

    private void element(String name, String text) {
        out.append('<').append(name).append('>').append(escaped(Digits.prose(text))).append("</").append(name).append(">\n");
    }

    private static String escaped(String text) {
        return HtmlText.escape(text);
    }
}
