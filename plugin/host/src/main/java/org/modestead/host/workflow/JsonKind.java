package org.modestead.host.workflow;

import com.fasterxml.jackson.databind.JsonNode;

/** Says in words what kind of JSON value was found. */
final class JsonKind {

    private JsonKind() {}

    static String of(JsonNode node) {
        return switch (node.getNodeType()) {
            case OBJECT -> "an object";
            case ARRAY -> "a list";
            case STRING -> "the text \"" + node.textValue() + "\"";
            case NUMBER -> "the number " + node.asText();
            case BOOLEAN -> node.asText();
            case NULL, MISSING -> "nothing";
            default -> "something unknown";
        };
    }
}
