package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Optional;
import org.modestead.host.bench.look.FigureJson;
import org.modestead.host.bench.look.Numbers;
import org.modestead.host.bench.recording.RecordingGuess;

/** What is guessed of a recording, as JSON. */
final class RecordingJson {

    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;

    private RecordingJson() {}

    static ObjectNode of(String upload, RecordingGuess guess, Optional<String> path) {
        ObjectNode json = JSON.objectNode().put("upload", upload).put("name", guess.file().getFileName().toString()).put("bytes", guess.file().toFile().length())
                .put("path", path.orElse(null));
        json.set("reading", DeskJson.settings(guess.reading()));
        ObjectNode columns = json.putObject("columns").put("time", guess.roles().time()).put("timeUnit", guess.roles().timeUnit()).put("run", guess.roles().run());
        columns.set("channels", NodesJson.texts(guess.roles().channels()));
        columns.set("inputs", NodesJson.texts(guess.roles().inputs()));
        ArrayNode ignored = columns.putArray("ignored");
        ArrayNode all = json.putArray("all");
        guess.eachColumn(column -> {
            if (column.role().equals("none")) {
                ignored.add(column.name());
            }
            ObjectNode entry = all.addObject().put("name", column.name()).put("title", column.title()).put("unit", column.unit()).put("cell", column.type().name())
                    .put("type", column.type().title()).put("missing", column.missing());
            Numbers.put(entry, "low", column.low());
            Numbers.put(entry, "high", column.high());
            entry.put("role", column.role()).put("why", column.why());
        });
        json.put("rows", guess.rows()).put("whole", guess.whole()).put("runs", guess.runs().runs().size());
        Numbers.put(json, "step", guess.step());
        json.put("even", guess.runs().isEven());
        json.set("sentences", NodesJson.texts(guess.sentences()));
        json.set("problems", NodesJson.texts(guess.problems()));
        json.set("figure", guess.figure().<JsonNode>map(FigureJson::of).orElse(JSON.nullNode()));
        return json;
    }
}
