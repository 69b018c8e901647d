package org.modestead.host.bench.server;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import io.javalin.http.Context;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.engine.Fault;
import org.modestead.host.workflow.JsonWords;

/** JSON in requests and answers. */
final class Answer {

    /** Of a body that nobody asked for; a longer one ends its connection. */
    private static final long MOST_UNREAD = 8L << 20;

    private static final ObjectMapper MAPPER = JsonMapper.builder().enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION).build();

    private Answer() {}

    /**
     * Returns the body of a request.
     *
     * @throws RequestFault if it broke off or is no JSON
     */
    static JsonNode body(Context context) {
        try {
            byte[] bytes = context.bodyAsBytes();
            return bytes.length == 0 ? JsonNodeFactory.instance.objectNode() : MAPPER.readTree(bytes);
        } catch (JsonProcessingException broken) {
            throw new RequestFault(400, "request", "its body is no JSON (" + JsonWords.of(broken) + ")", "send JSON");
        } catch (IOException gone) {
            // bodyAsBytes throws it undeclared
            throw new RequestFault(400, "request", "its body broke off (" + gone.getMessage() + ")", "send it again");
        }
    }

    /**
     * Reads what nobody has read of a request's body. A connection whose body is not at its end is closed behind the answer, and the page's
     * next request, which may be on its way already, would get none.
     */
    static void readToTheEnd(Context context) {
        try {
            InputStream body = context.bodyInputStream();
            long left = MOST_UNREAD;
            for (long skipped = body.skip(left); skipped > 0; skipped = body.skip(left)) {
                left -= skipped;
            }
        } catch (IOException gone) {
            // who has left gets no answer, and asks for nothing more
            context.header("Connection", "close");
        }
    }

    /** Returns the fields of an object as plain values. */
    static Map<String, Object> values(JsonNode object) {
        Map<String, Object> values = new LinkedHashMap<>();
        object.properties().forEach(entry -> values.put(entry.getKey(), MAPPER.convertValue(entry.getValue(), Object.class)));
        return values;
    }

    /** Returns the entries of a list as texts; none where it is no list. */
    static List<String> texts(JsonNode list) {
        List<String> texts = new ArrayList<>();
        list.forEach(entry -> texts.add(entry.asText()));
        return texts;
    }

    static void json(Context context, JsonNode json) {
        context.contentType("application/json").result(bytes(json));
    }

    static void refuse(Context context, int status, Fault fault) {
        json(context.status(status), refusal(fault));
    }

    /** Returns what a refusal says. */
    static JsonNode refusal(Fault fault) {
        ObjectNode json = JsonNodeFactory.instance.objectNode();
        json.putObject("error").put("sentence", fault.getMessage()).put("where", fault.where()).put("seen", fault.seen()).put("wanted", fault.wanted());
        return json;
    }

    static byte[] bytes(JsonNode json) {
        return text(json).getBytes(StandardCharsets.UTF_8);
    }

    static String text(JsonNode json) {
        try {
            return MAPPER.writeValueAsString(json);
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException("a tree could not be written", impossible);
        }
    }

    /** Names an answer as a file to be kept. */
    static void file(Context context, String name) {
        context.header("Content-Disposition", "attachment; filename=\"" + name.replaceAll("[^A-Za-z0-9._-]", "_") + "\"");
    }
}
