package org.modestead.engine.kernel;

import java.util.Map;
import java.util.OptionalDouble;
import java.util.TreeMap;

/**
 * Names a kernel: enough to make it again.
 *
 * @param family id of the {@link KernelFamily}
 * @param parameters by name, sorted
 */
public record KernelSpec(String family, Map<String, Double> parameters) {

    /** Takes an immutable, sorted copy. */
    public KernelSpec {
        parameters = java.util.Collections.unmodifiableMap(new TreeMap<>(parameters));
    }

    /** Returns the length over which the kernel varies: its scale, or one over the root of its rate; empty when it has neither. */
    public OptionalDouble scale() {
        if (parameters.containsKey("scale")) {
            return OptionalDouble.of(parameters.get("scale"));
        }
        return parameters.containsKey("rate") ? OptionalDouble.of(1 / Math.sqrt(parameters.get("rate"))) : OptionalDouble.empty();
    }

    /** Returns for example {@code gaussian(scale=0.8)}. */
    public String label() {
        StringBuilder text = new StringBuilder(family).append('(');
        parameters.forEach((name, value) -> text.append(text.charAt(text.length() - 1) == '(' ? "" : ", ").append(name)
                .append('=').append(value % 1 == 0 ? Long.toString(value.longValue()) : String.format(java.util.Locale.ROOT, "%.6g", value)));
        return text.append(')').toString();
    }
}
