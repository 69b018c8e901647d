package org.modestead.host.workflow;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.stream.Collectors;

/**
 * Writes workflow files as people write them: one step a line, one link a line. What {@link WorkflowFile} reads from it is the
 * same workflow.
 */
public final class WorkflowText {

    private static final ObjectMapper MAPPER = JsonMapper.builder().build();

    private WorkflowText() {}

    /** Returns the bytes of the file. */
    public static byte[] write(Workflow workflow) {
        StringBuilder text = new StringBuilder("{\n  \"format\": ").append(json(WorkflowFile.FORMAT))
                .append(",\n  \"name\": ").append(json(workflow.name()));
        if (!workflow.notes().isEmpty()) {
            text.append(",\n  \"notes\": ").append(json(workflow.notes()));
        }
        text.append(",\n  \"steps\": ").append(lines(workflow.steps().stream().map(WorkflowText::step).toList()));
        text.append(",\n  \"links\": ").append(lines(workflow.links().stream().map(WorkflowText::link).toList()));
        return text.append("\n}\n").toString().getBytes(StandardCharsets.UTF_8);
    }

    private static String lines(List<String> entries) {
        return entries.isEmpty() ? "[]" : entries.stream().collect(Collectors.joining(",\n    ", "[\n    ", "\n  ]"));
    }

    private static String step(Step step) {
        Map<String, Object> fields = new LinkedHashMap<>();
        fields.put("id", step.id());
        fields.put("node", step.node());
        StepLabel label = step.label();
        if (!label.title().isEmpty()) {
            fields.put("title", label.title());
        }
        if (!label.note().isEmpty()) {
            fields.put("note", label.note());
        }
        label.place().ifPresent(place -> fields.put("place", place));
        Map<String, Object> settings = new LinkedHashMap<>(step.settings());
        settings.values().removeIf(Objects::isNull);
        fields.put("settings", settings);
        return object(fields);
    }

    private static String link(Link link) {
        return "{\"from\": " + json(link.from().toString()) + ", \"to\": " + json(link.to().toString()) + "}";
    }

    private static String object(Map<?, ?> fields) {
        return fields.entrySet().stream().map(field -> json(field.getKey()) + ": " + value(field.getValue()))
                .collect(Collectors.joining(", ", "{", "}"));
    }

    private static String value(Object value) {
        if (value instanceof Map<?, ?> fields) {
            return object(fields);
        }
        return value instanceof List<?> list ? list.stream().map(WorkflowText::value).collect(Collectors.joining(", ", "[", "]"))
                : json(value);
    }

    private static String json(Object value) {
        try {
            return MAPPER.writeValueAsString(value);
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException("a value that came from JSON has no JSON", impossible);
        }
    }
}
