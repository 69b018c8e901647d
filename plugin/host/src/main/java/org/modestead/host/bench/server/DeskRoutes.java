package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import io.javalin.router.JavalinDefaultRoutingApi;
import java.nio.charset.StandardCharsets;
import org.modestead.host.bench.desk.EditReader;
import org.modestead.host.bench.work.Workbench;
import org.modestead.host.workflow.WorkflowText;

/** Requests that change the desk or run it: each answers with the desk after it. */
final class DeskRoutes {

    private final Workbench workbench;
    private final DeskJson json;

    DeskRoutes(Workbench workbench, DeskJson json) {
        this.workbench = workbench;
        this.json = json;
    }

    void on(JavalinDefaultRoutingApi server) {
        server.get("/api/desk", context -> Answer.json(context, json.of(workbench.view())));
        server.post("/api/edit", context -> {
            JsonNode body = Answer.body(context);
            Workbench.Edited edited = workbench.edit(EditReader.read(body.path("edits")), body.path("label").asText(""));
            ObjectNode answer = json.of(edited.view());
            answer.set("made", NodesJson.texts(edited.made()));
            Answer.json(context, answer);
        });
        server.post("/api/undo", context -> Answer.json(context, json.of(workbench.undo())));
        server.post("/api/redo", context -> Answer.json(context, json.of(workbench.redo())));
        server.post("/api/save", context -> {
            Workbench.Saved saved = workbench.save(Answer.body(context).path("path").asText(""));
            Answer.json(context, json.of(saved.view()).put("told", saved.told()));
        });
        server.post("/api/desk/close", context -> Answer.json(context, json.of(workbench.leave())));
        server.post("/api/run", context -> {
            JsonNode body = Answer.body(context);
            Answer.json(context, json.of(workbench.run(Answer.texts(body.path("steps")), body.path("again").asBoolean(false))));
        });
        server.post("/api/cancel", context -> Answer.json(context, json.of(workbench.stop())));
        server.get("/api/workflow.json", context -> {
            Answer.file(context, "workflow.json");
            context.contentType("application/json").result(new String(WorkflowText.write(workbench.workflow()), StandardCharsets.UTF_8));
        });
    }
}
