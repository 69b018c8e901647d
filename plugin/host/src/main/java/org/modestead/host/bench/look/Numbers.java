package org.modestead.host.bench.look;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;

/** Numbers as JSON, which knows no NaN and no infinity: {@code null} stands for both. */
final class Numbers {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private Numbers() {}

    static ArrayNode of(double[] values) {
        ArrayNode out = NODES.arrayNode(values.length);
        for (double value : values) {
            add(out, value);
        }
        return out;
    }

    static void add(ArrayNode out, double value) {
        if (Double.isFinite(value)) {
            out.add(value);
        } else {
            out.addNull();
        }
    }
}
