package org.modestead.host.workflow;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import org.modestead.nodes.contract.NearestName;

/** Turns the JSON tree of a workflow file into a workflow and tells everything that does not fit the format. */
final class WorkflowTree {

    private static final List<String> WORKFLOW_FIELDS = List.of("format", "name", "steps", "links", "notes");
    private static final List<String> STEP_FIELDS = List.of("id", "node", "settings", "title", "note", "place");
    private static final List<String> LINK_FIELDS = List.of("from", "to");

    private final Path file;
    private final JsonNode root;
    private final List<Problem> problems = new ArrayList<>();

    WorkflowTree(Path file, JsonNode root) {
        this.file = file;
        this.root = root;
    }

    WorkflowFile.Reading read() {
        JsonNode format = root.path("format");
        if (!format.isTextual() || !format.textValue().equals(WorkflowFile.FORMAT)) {
            problem("", "field format", JsonKind.of(format), "write \"" + WorkflowFile.FORMAT
                    + "\", the one format this release knows");
        }
        unknownFields(root, WORKFLOW_FIELDS, "", "the workflow");
        List<Step> steps = steps();
        List<Link> links = links();
        return new WorkflowFile.Reading(Optional.of(new Workflow(name(), file, steps, links, text(root, "notes", ""))), problems);
    }

    private String name() {
        JsonNode name = root.path("name");
        if (name.isTextual() && !name.textValue().isBlank()) {
            return name.textValue();
        }
        if (!name.isMissingNode()) {
            problem("", "field name", JsonKind.of(name), "write a name in quotes, or leave the field out");
        }
        Path folder = file.getParent().getFileName();
        return folder == null ? file.getFileName().toString() : folder.toString();
    }

    private List<Step> steps() {
        List<Step> steps = new ArrayList<>();
        Map<String, String> seen = new HashMap<>();
        for (JsonNode entry : list("steps", true)) {
            String place = "entry " + (steps.size() + 1) + " of steps";
            Optional<Step> step = entry.isObject() ? step(entry, place) : refuse(place, entry);
            step.map(Step::id).filter(id -> seen.putIfAbsent(id.toLowerCase(Locale.ROOT), id) != null)
                    .ifPresent(id -> problem(id, "field id", "a second step with this id", "give every step an id of its own"
                            + " (capital letters make no difference)"));
            steps.add(step.orElseGet(() -> new Step("", "", Map.of())));
        }
        steps.removeIf(step -> step.id().isEmpty());
        return steps;
    }

    private Optional<Step> step(JsonNode entry, String place) {
        JsonNode id = entry.path("id");
        if (!id.isTextual() || !Step.isId(id.textValue())) {
            problem("", place + ", field id", JsonKind.of(id), "write an id of letters, digits, - and _ in quotes");
            return Optional.empty();
        }
        String step = id.textValue();
        unknownFields(entry, STEP_FIELDS, step, "a step");
        JsonNode node = entry.path("node");
        if (!node.isTextual()) {
            problem(step, "field node", JsonKind.of(node), "write the id of a node in quotes");
        }
        JsonNode settings = entry.path("settings");
        boolean usable = settings.isObject() || settings.isMissingNode();
        if (!usable) {
            problem(step, "field settings", JsonKind.of(settings), "write an object, {\"key\": value}");
        }
        return Optional.of(new Step(step, node.asText(""), settings.isObject() ? values(settings) : Map.of(),
                label(entry, step)));
    }

    private StepLabel label(JsonNode entry, String step) {
        JsonNode place = entry.path("place");
        boolean sound = place.isMissingNode() || place.isInt() && place.intValue() >= 0;
        if (!sound) {
            problem(step, "field place", JsonKind.of(place), "write a whole number from 0, the order among the steps of its stage");
        }
        return new StepLabel(text(entry, "title", step), text(entry, "note", step),
                sound && !place.isMissingNode() ? OptionalInt.of(place.intValue()) : OptionalInt.empty());
    }

    private String text(JsonNode object, String field, String step) {
        JsonNode text = object.path(field);
        if (!text.isTextual() && !text.isMissingNode()) {
            problem(step, "field " + field, JsonKind.of(text), "write a text in quotes, or leave the field out");
        }
        return text.isTextual() ? text.textValue() : "";
    }

    private List<Link> links() {
        List<Link> links = new ArrayList<>();
        int number = 0;
        for (JsonNode entry : list("links", false)) {
            String place = "entry " + ++number + " of links";
            if (!entry.isObject()) {
                refuse(place, entry);
                continue;
            }
            unknownFields(entry, LINK_FIELDS, "", "a link (" + place + ")");
            Optional<Link.End> from = end(entry, "from", place);
            Optional<Link.End> to = end(entry, "to", place);
            if (from.isPresent() && to.isPresent()) {
                links.add(new Link(from.get(), to.get()));
            }
        }
        return links;
    }

    private Optional<Link.End> end(JsonNode entry, String field, String place) {
        JsonNode text = entry.path(field);
        Optional<Link.End> end = text.isTextual() ? Link.End.read(text.textValue()) : Optional.empty();
        if (end.isEmpty()) {
            problem("", place + ", field " + field, JsonKind.of(text), "write \"step.port\"");
        }
        return end;
    }

    private Iterable<JsonNode> list(String field, boolean required) {
        JsonNode list = root.path(field);
        boolean wrong = list.isMissingNode() ? required : !list.isArray();
        if (wrong) {
            problem("", "field " + field, JsonKind.of(list), "write a list, [ ... ]");
        } else if (required && list.isEmpty()) {
            problem("", "field " + field, WorkflowFile.NO_STEP, "write at least one step");
        }
        return list.isArray() ? list : JsonNodeFactory.instance.arrayNode();
    }

    private Optional<Step> refuse(String place, JsonNode entry) {
        problem("", place, JsonKind.of(entry), "write an object, { ... }");
        return Optional.empty();
    }

    private void unknownFields(JsonNode object, List<String> known, String step, String what) {
        object.fieldNames().forEachRemaining(field -> {
            if (!known.contains(field)) {
                problem(step, "field " + field, what + " has no such field" + NearestName.hint(field, known),
                        "use " + String.join(", ", known));
            }
        });
    }

    private static Map<String, Object> values(JsonNode settings) {
        Map<String, Object> values = new LinkedHashMap<>();
        ObjectMapper mapper = new ObjectMapper();
        settings.properties()
                .forEach(field -> values.put(field.getKey(), mapper.convertValue(field.getValue(), Object.class)));
        return values;
    }

    private void problem(String step, String key, String seen, String wanted) {
        problems.add(new Problem(file.getFileName().toString(), step, key, seen, wanted));
    }
}
