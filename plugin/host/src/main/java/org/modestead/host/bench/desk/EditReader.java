package org.modestead.host.bench.desk;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import org.modestead.host.workflow.Link;

/** Reads edits from the JSON that the page sends. */
public final class EditReader {

    private static final int LONGEST_TEXT = 100_000;
    private static final int MOST_EDITS = 1000;
    private static final ObjectMapper MAPPER = new ObjectMapper();

    private final JsonNode edit;

    private EditReader(JsonNode edit) {
        this.edit = edit;
    }

    /**
     * @param list of objects, each with a field {@code do}
     * @throws EditFault if it is something else
     */
    public static List<Edit> read(JsonNode list) {
        if (!list.isArray() || list.isEmpty() || list.size() > MOST_EDITS) {
            throw new EditFault("edits", list.isArray() ? list.size() + " edits" : "no list", "send a list of 1 to " + MOST_EDITS + " edits");
        }
        List<Edit> edits = new ArrayList<>();
        list.forEach(edit -> edits.add(new EditReader(edit).read()));
        return edits;
    }

    private Edit read() {
        String kind = text("do");
        return switch (kind) {
            case "add" -> new StepEdit.Add(text("node"), textOr("id"), textOr("title"), values("settings"), place(), end("from"), end("to"));
            case "remove" -> new StepEdit.Remove(texts("steps"));
            case "copy" -> new StepEdit.Copy(texts("steps"));
            case "rename" -> new StepEdit.Rename(text("step"), text("id"));
            case "link" -> new LinkEdit.Connect(link(), edit.path("replace").asBoolean(false));
            case "unlink" -> new LinkEdit.Disconnect(link());
            case "set" -> edit.has("typed") ? new SettingEdit.Type(text("step"), values("typed")) : new SettingEdit.Replace(text("step"), values("settings"));
            case "title" -> new LabelEdit.Title(text("step"), text("title"));
            case "note" -> new LabelEdit.Note(text("step"), text("note"));
            case "move" -> new LabelEdit.Move(text("step"), place().orElseThrow(() -> missing("place", "a whole number")));
            case "name" -> new LabelEdit.Name(text("name"));
            case "notes" -> new LabelEdit.Notes(text("notes"));
            default -> throw new EditFault("edit", "\"" + kind + "\" is none", "use add, remove, copy, rename, link, unlink, set, title, note, "
                    + "move, name or notes");
        };
    }

    private String text(String field) {
        JsonNode value = edit.path(field);
        if (!value.isTextual() || value.textValue().length() > LONGEST_TEXT) {
            throw missing(field, "a text of at most " + LONGEST_TEXT + " letters");
        }
        return value.textValue();
    }

    private String textOr(String field) {
        return edit.path(field).isMissingNode() || edit.path(field).isNull() ? "" : text(field);
    }

    private List<String> texts(String field) {
        List<String> texts = new ArrayList<>();
        edit.path(field).forEach(entry -> texts.add(entry.asText()));
        if (texts.isEmpty()) {
            throw missing(field, "a list of ids");
        }
        return texts.stream().distinct().toList();
    }

    private OptionalInt place() {
        return edit.path("place").isInt() ? OptionalInt.of(edit.path("place").intValue()) : OptionalInt.empty();
    }

    private Map<String, Object> values(String field) {
        Map<String, Object> values = new LinkedHashMap<>();
        edit.path(field).properties().forEach(entry -> values.put(entry.getKey(), MAPPER.convertValue(entry.getValue(), Object.class)));
        return values;
    }

    private Link link() {
        return new Link(end("from").orElseThrow(() -> missing("from", "\"step.port\"")), end("to").orElseThrow(() -> missing("to", "\"step.port\"")));
    }

    private Optional<Link.End> end(String field) {
        JsonNode value = edit.path(field);
        return value.isTextual() ? Optional.of(Ends.read(value.textValue())) : Optional.empty();
    }

    private static EditFault missing(String field, String wanted) {
        return new EditFault("edit, field " + field, "it is missing or of another kind", "send " + wanted);
    }
}
