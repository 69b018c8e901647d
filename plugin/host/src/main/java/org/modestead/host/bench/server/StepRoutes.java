package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import io.javalin.http.Context;
import io.javalin.router.JavalinDefaultRoutingApi;
import java.util.Map;
import org.modestead.engine.Fault;
import org.modestead.host.bench.check.DialogData;
import org.modestead.host.bench.check.Fitting;
import org.modestead.host.bench.desk.Ends;
import org.modestead.host.bench.work.Workbench;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Step;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.words.NameWithUnit;

/** Dialogs of steps, and which ends of links fit. */
final class StepRoutes {

    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;

    private final Workbench workbench;

    StepRoutes(Workbench workbench) {
        this.workbench = workbench;
    }

    void on(JavalinDefaultRoutingApi server) {
        server.get("/api/steps/{id}/dialog", context -> dialog(context, Map.of()));
        server.post("/api/steps/{id}/check", context -> dialog(context, Answer.values(Answer.body(context).path("typed"))));
        server.get("/api/links/fitting", this::fitting);
        server.get("/api/links/refusal", context -> {
            Link link = new Link(Ends.read(given(context, "from")), Ends.read(given(context, "to")));
            Answer.json(context, JSON.objectNode().put("refusal", workbench.refusal(link).map(Fault::getMessage).orElse("")));
        });
    }

    /** Returns a parameter of the query. */
    static String given(Context context, String name) {
        String value = context.queryParam(name);
        if (value == null) {
            throw new RequestFault(400, "request", "the parameter " + name + " is missing", "add ?" + name + "=...");
        }
        return value;
    }

    private void dialog(Context context, Map<String, Object> typed) {
        String id = context.pathParam("id");
        DialogData dialog = workbench.dialog(id, typed);
        Step step = workbench.step(id);
        ObjectNode json = JSON.objectNode().put("step", id).put("node", step.node());
        json.set("settings", DeskJson.settings(dialog.stored()));
        json.set("values", DeskJson.settings(dialog.values()));
        json.set("visible", NodesJson.texts(dialog.visible()));
        ArrayNode problems = json.putArray("problems");
        dialog.problems().forEach(problem -> problems.add(DeskJson.problem(id, problem)));
        json.put("timeUnit", dialog.timeUnit());
        ObjectNode columns = json.putObject("columns");
        dialog.columns().forEach((port, schema) -> {
            ArrayNode list = columns.putArray(port);
            schema.columns().forEach(column -> list.add(column(column)));
        });
        ObjectNode words = json.putObject("columnsWords");
        dialog.columnsWords().forEach(words::put);
        Answer.json(context, json);
    }

    private static ObjectNode column(Column column) {
        return JSON.objectNode().put("name", column.name()).put("type", column.type().title()).put("cell", column.type().name())
                .put("unit", unit(column.name()));
    }

    /** Returns the unit that stands in brackets behind a name; empty without one. */
    static String unit(String name) {
        return NameWithUnit.of(name).unit().orElse("");
    }

    private void fitting(Context context) {
        Link.End end = Ends.read(given(context, "end"));
        String side = context.queryParam("side");
        Fitting fitting = side == null ? either(end) : workbench.fitting(end, side.equals("output"));
        ObjectNode json = JSON.objectNode().put("end", end.toString()).put("output", fitting.output()).put("type", NodesJson.word(fitting.type()));
        ArrayNode ports = json.putArray("ports");
        fitting.ports().forEach(port -> ports.addObject().put("end", port.end().toString()).put("fits", port.refusal().isEmpty())
                .put("fed", port.fed().map(Link.End::toString).orElse(null)).put("refusal", port.refusal().map(Fault::getMessage).orElse("")));
        ArrayNode nodes = json.putArray("nodes");
        fitting.nodes().forEach(offer -> nodes.addObject().put("node", offer.node()).put("port", offer.port()));
        Answer.json(context, json);
    }

    private Fitting either(Link.End end) {
        try {
            return workbench.fitting(end, true);
        } catch (Fault noOutput) {
            return workbench.fitting(end, false);
        }
    }
}
