package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import io.javalin.http.Context;
import io.javalin.router.JavalinDefaultRoutingApi;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.Optional;
import java.util.function.Supplier;
import org.modestead.host.bench.desk.Desk;
import org.modestead.host.bench.desk.DeskFault;
import org.modestead.host.bench.recording.RecordingGuess;
import org.modestead.host.bench.recording.RecordingWish;
import org.modestead.host.bench.run.Spans;
import org.modestead.host.bench.start.Doors;
import org.modestead.host.bench.start.Examples;
import org.modestead.host.bench.work.DeskView;
import org.modestead.host.bench.work.Workbench;

/** The start page: ways in, uploads, and what is guessed of a recording. */
final class StartRoutes {

    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;
    private static final int MOST_RECENT = 12;

    private final Workbench workbench;
    private final Doors doors;
    private final DeskJson deskJson;
    private final PageFiles files;

    StartRoutes(Workbench workbench, Doors doors, DeskJson deskJson, PageFiles files) {
        this.workbench = workbench;
        this.doors = doors;
        this.deskJson = deskJson;
        this.files = files;
    }

    void on(JavalinDefaultRoutingApi server) {
        server.get("/", context -> files.serve(context, first()));
        server.get("/api/start", context -> Answer.json(context, start()));
        server.post("/api/desk", context -> Answer.json(context, deskJson.of(workbench.open(door(Answer.body(context))))));
        server.post("/api/desk/forget", context -> {
            String id = Answer.body(context).path("desk").asText();
            if (workbench.view().desk().filter(open -> open.id().equals(id)).isPresent()) {
                throw new DeskFault("desk " + id, "it is open", "close it first");
            }
            doors.desks().forget(id);
            Answer.json(context, start());
        });
        server.post("/api/upload", this::upload);
        server.post("/api/recording", context -> {
            JsonNode body = Answer.body(context);
            String id = body.path("upload").asText();
            Answer.json(context, guess(id, RecordingGuess.of(doors.uploads().file(id), wish(body))));
        });
    }

    /** What the page shows before it has asked for anything; nothing while a desk is open, since how its steps stand may have to be read of files. */
    private ObjectNode first() {
        ObjectNode json = JSON.objectNode();
        if (!workbench.isOpen()) {
            json.set("desk", deskJson.of(workbench.view()));
            json.set("start", start());
        }
        return json;
    }

    private ObjectNode start() {
        ObjectNode json = JSON.objectNode();
        ArrayNode examples = json.putArray("examples");
        Examples.all().forEach(example -> examples.addObject().put("id", example.id()).put("title", example.title()).put("words", example.words()));
        ArrayNode recent = json.putArray("recent");
        doors.desks().desks().stream().limit(MOST_RECENT).forEach(kept -> recent.addObject().put("desk", kept.id()).put("name", kept.name())
                .put("file", kept.file().toString()).put("when", kept.changed().toString()).put("unsaved", kept.unsaved())
                .put("words", "edited " + Spans.words(Math.max(0, Duration.between(kept.changed(), Instant.now()).toSeconds())) + " ago"
                        + (kept.unsaved() ? ", not saved in its file but kept here" : ", saved"))
                .put("steps", kept.steps()));
        return json.put("folder", doors.desks().root().toString()).put("uploadLimit", doors.uploads().limit());
    }

    private Supplier<Desk> door(JsonNode body) {
        if (body.has("example")) {
            return () -> doors.example(body.path("example").asText());
        } else if (body.has("resume")) {
            return () -> doors.resume(body.path("resume").asText());
        } else if (body.has("open")) {
            return () -> doors.open(body.path("open").asText());
        } else if (body.has("workflow")) {
            return () -> doors.dropped(body.path("workflow").asText(), body.path("name").asText(""));
        } else if (body.has("recording")) {
            JsonNode recording = body.path("recording");
            return () -> doors.recording(recording.path("upload").asText(), wish(recording), recording.path("name").asText(""));
        } else if (body.path("empty").asBoolean()) {
            return () -> doors.empty(body.path("name").asText(""));
        }
        throw new RequestFault(400, "request", "it names nothing to be opened", "send empty, example, resume, open, workflow or recording");
    }

    private void upload(Context context) {
        String id = doors.uploads().take(StepRoutes.given(context, "name"), context.bodyInputStream(), context.req().getContentLengthLong());
        Path file = doors.uploads().file(id);
        Answer.json(context, guess(id, RecordingGuess.of(file, RecordingWish.NONE)));
    }

    private static RecordingWish wish(JsonNode body) {
        Optional<JsonNode> reading = Optional.of(body.path("reading")).filter(JsonNode::isObject);
        Optional<JsonNode> columns = Optional.of(body.path("columns")).filter(JsonNode::isObject);
        return new RecordingWish(reading.map(Answer::values), columns.map(found -> new RecordingWish.Roles(found.path("time").asText(""),
                found.path("timeUnit").asText(""), found.path("run").asText(""), Answer.texts(found.path("channels")), Answer.texts(found.path("inputs")))));
    }

    /** Beside the guess stands the name under which a step of the open desk would read the file. */
    private ObjectNode guess(String id, RecordingGuess guess) {
        Optional<DeskView.Open> desk = workbench.view().desk();
        return RecordingJson.of(id, guess, desk.map(open -> path(open, id)));
    }

    private String path(DeskView.Open open, String id) {
        Path own = doors.desks().place(open.id());
        Path file = doors.uploads().into(id, own.resolve("data"));
        Path base = open.workflow().baseFolder();
        return base.equals(own) ? "data/" + file.getFileName() : file.toString();
    }
}
