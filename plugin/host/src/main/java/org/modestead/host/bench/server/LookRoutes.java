package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import io.javalin.http.Context;
import io.javalin.router.JavalinDefaultRoutingApi;
import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.modestead.engine.Progress;
import org.modestead.host.bench.look.DocumentJson;
import org.modestead.host.bench.look.FigureJson;
import org.modestead.host.bench.look.FigureTable;
import org.modestead.host.bench.look.HeatMap;
import org.modestead.host.bench.look.Matrices;
import org.modestead.host.bench.look.PortFigures;
import org.modestead.host.bench.work.Looks;
import org.modestead.host.output.CsvWriter;
import org.modestead.host.table.TablePages;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.modelfile.PortFiles;
import org.modestead.nodes.render.FigureRenderer;
import org.modestead.nodes.render.MapRenderer;
import org.modestead.nodes.report.HtmlReport;
import org.modestead.nodes.table.ListCell;
import org.modestead.nodes.table.Table;

/** Everything that can be looked at or taken away of a result. */
final class LookRoutes implements AutoCloseable {

    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;
    private static final int USUAL_ROWS = 200;
    private static final double LARGEST_SCALE = 6;
    private static final long SAFE_WHOLE = 1L << 53;
    private static final String REPORT_POLICY = "default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-ancestors 'none'; base-uri 'none'";

    private final Looks looks;
    private final TableLooks tables = new TableLooks();

    LookRoutes(Looks looks) {
        this.looks = looks;
    }

    void on(JavalinDefaultRoutingApi server) {
        server.get("/api/steps/{id}/look", context -> Answer.json(context, LookJson.of(looks, looked(context))));
        server.get("/api/steps/{id}/figures/{figure}", context -> figure(context, looked(context).result().figures()));
        server.get("/api/steps/{id}/ports/{port}/figures/{figure}", context -> figure(context, PortFigures.of(value(looked(context), context.pathParam("port")))));
        server.get("/api/steps/{id}/tables/{port}", this::table);
        server.get("/api/steps/{id}/matrices/{port}/{matrix}", this::matrix);
        server.get("/api/steps/{id}/ports/{file}", this::port);
        server.get("/api/steps/{id}/document", context -> Answer.json(context, DocumentJson.of(document(looked(context)))));
        server.get("/api/steps/{id}/report.html", context -> report(context, document(looked(context))));
        server.get("/api/report.html", context -> report(context, looks.report()));
    }

    private Looks.Looked looked(Context context) {
        return looks.look(context.pathParam("id"));
    }

    private void figure(Context context, List<Figure> figures) throws IOException {
        PictureName name = PictureName.read(context.pathParam("figure"));
        Figure figure = figures.stream().filter(found -> found.id().equals(name.id())).findFirst().orElseThrow(() -> missing("picture " + name.id()));
        switch (name.form()) {
            case SVG -> svg(context, name, FigureRenderer.svg(figure));
            case PNG -> taken(context, name.whole()).contentType("image/png").result(FigureRenderer.png(figure, scale(context)));
            case CSV -> csv(context, name, FigureTable.of(figure));
            case DATA -> Answer.json(context, FigureJson.of(figure));
        }
    }

    private static void svg(Context context, PictureName name, String svg) {
        taken(context, name.whole()).contentType("image/svg+xml").result("<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n" + svg);
    }

    private static void csv(Context context, PictureName name, Table table) throws IOException {
        Answer.file(context, context.pathParam("id") + "-" + name.whole());
        context.contentType("text/csv; charset=utf-8");
        CsvWriter.write(table, context.outputStream(), Progress.NONE);
    }

    private static Context taken(Context context, String name) {
        if (context.queryParam("download") != null) {
            Answer.file(context, context.pathParam("id") + "-" + name);
        }
        return context;
    }

    private static double scale(Context context) {
        double scale = number(context, "scale", 2);
        if (!(scale > 0) || scale > LARGEST_SCALE) {
            throw new RequestFault(400, "parameter scale", Double.toString(scale), "use a number above 0 and at most " + LARGEST_SCALE);
        }
        return scale;
    }

    private static double number(Context context, String name, double usual) {
        String given = context.queryParam(name);
        try {
            return given == null ? usual : Double.parseDouble(given);
        } catch (NumberFormatException notANumber) {
            throw new RequestFault(400, "parameter " + name, "\"" + given + "\"", "use a number");
        }
    }

    private void table(Context context) throws IOException {
        String name = context.pathParam("port");
        boolean csv = name.endsWith(".csv");
        String port = csv ? name.substring(0, name.length() - ".csv".length()) : name;
        Looks.Looked looked = looked(context);
        if (!(value(looked, port) instanceof Table table)) {
            throw missing("table " + port);
        }
        if (csv) {
            csv(context, PictureName.read(name), table);
            return;
        }
        String sort = context.queryParam("sort");
        OptionalInt column = sort == null || sort.isEmpty() ? OptionalInt.empty() : table.schema().indexOf(sort);
        if (sort != null && !sort.isEmpty() && column.isEmpty()) {
            throw missing("column " + sort);
        }
        TablePages.Wish wish = new TablePages.Wish((long) number(context, "offset", 0), (int) number(context, "limit", USUAL_ROWS), column,
                "down".equals(context.queryParam("order")), Optional.ofNullable(context.queryParam("find")).orElse(""),
                context.queryParam("whole") != null);
        Answer.json(context, page(LookJson.columns(table, LookJson.timeUnit(looks, looked), looked.node().declaration()), wish,
                 tables.page(looked.id() + "." + port, table, wish)));
    }

    private static ObjectNode page(ArrayNode columns, TablePages.Wish wish, TablePages.Page page) {
        ObjectNode json = JSON.objectNode();
        json.set("columns", columns);
        json.put("whole", page.whole()).put("total", page.total()).put("found", page.found()).put("offset", wish.offset());
        ArrayNode rows = json.putArray("rows");
        page.rows().forEach(row -> {
            ArrayNode cells = rows.addArray();
            row.forEach(cell -> cells.add(cell.map(LookRoutes::cell).orElse(JSON.nullNode())));
        });
        ArrayNode numbers = json.putArray("numbers");
        page.numbers().forEach(numbers::add);
        return json;
    }

    /** Writes a cell so that a page reads what was there. */
    static JsonNode cell(Object cell) {
        if (cell instanceof Double number) {
            return Double.isInfinite(number) ? JSON.textNode(number > 0 ? "Infinity" : "-Infinity") : JSON.numberNode(number);
        } else if (cell instanceof Long whole) {
            return Math.abs(whole) <= SAFE_WHOLE ? JSON.numberNode(whole) : JSON.textNode(whole.toString());
        } else if (cell instanceof Boolean flag) {
            return JSON.booleanNode(flag);
        }
        if (cell instanceof ListCell list) {
            ArrayNode entries = JSON.arrayNode();
            list.entries().forEach(entry -> entries.add(entry.map(LookRoutes::cell).orElse(JSON.nullNode())));
            return entries;
        }
        return JSON.textNode(CsvWriter.written(cell));
    }

    private void matrix(Context context) throws IOException {
        PictureName name = PictureName.read(context.pathParam("matrix"));
        HeatMap matrix = Matrices.of(value(looked(context), context.pathParam("port"))).stream().filter(found -> found.id().equals(name.id())).findFirst()
                .orElseThrow(() -> missing("matrix " + name.id())).map().get();
        switch (name.form()) {
            case SVG -> svg(context, name, MapRenderer.svg(matrix.picture()));
            case PNG -> taken(context, name.whole()).contentType("image/png").result(MapRenderer.png(matrix.picture(), scale(context)));
            case CSV -> csv(context, name, matrix.table());
            case DATA -> Answer.json(context, matrix.json());
        }
    }

    private void port(Context context) throws IOException {
        String name = context.pathParam("file");
        Looks.Looked looked = looked(context);
        Port port = looked.node().declaration().outputs().stream().filter(found -> name.equals(found.id() + ".zip") && found.type() != PortType.TABLE)
                .findFirst().orElseThrow(() -> missing("file " + name));
        Answer.file(context, context.pathParam("id") + "-" + name);
        context.contentType("application/zip");
        try (OutputStream out = new BufferedOutputStream(context.outputStream())) {
            PortFiles.write(port.type(), looked.result().outputs().get(port.id()), out);
        }
    }

    private static Object value(Looks.Looked looked, String port) {
        return Optional.ofNullable(looked.result().outputs().get(port)).orElseThrow(() -> missing("output " + port));
    }

    private static ReportDocument document(Looks.Looked looked) {
        return looked.result().document().orElseThrow(() -> missing("report"));
    }

    private static void report(Context context, ReportDocument document) {
        taken(context.header("Content-Security-Policy", REPORT_POLICY), document);
        context.html(HtmlReport.write(document));
    }

    private static void taken(Context context, ReportDocument document) {
        if (context.queryParam("download") != null) {
            Answer.file(context, document.title() + ".html");
        }
    }

    private static RequestFault missing(String what) {
        return new RequestFault(404, what, "the result has none of this name", "choose one that is there");
    }

    @Override
    public void close() {
        tables.close();
    }
}
