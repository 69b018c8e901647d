package org.modestead.host.bench.look;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;

/** Numbers as JSON, which knows no NaN and no infinity: {@code null} stands for both. */
public final class Numbers {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private Numbers() {}

    static ArrayNode of(double[] values) {
        ArrayNode out = NODES.arrayNode(values.length);
        for (double value : values) {
            add(out, value);
        }
        return out;
    }

    /** Sets a field. */
    public static void put(ObjectNode out, String field, double value) {
        if (Double.isFinite(value)) {
            out.put(field, value);
        } else {
            out.putNull(field);
        }
    }

    static void add(ArrayNode out, double value) {
        if (Double.isFinite(value)) {
            out.add(value);
        } else {
            out.addNull();
        }
    }
}
