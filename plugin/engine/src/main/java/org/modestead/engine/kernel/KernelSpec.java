package org.modestead.engine.kernel;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.stream.Collectors;

/**
 * Names a kernel: enough to make it again.
 *
 * @param family id of the {@link KernelFamily}
 * @param parameters by name, sorted
 */
public record KernelSpec(String family, Map<String, Double> parameters) {

    private static final MathContext DIGITS = new MathContext(4);

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

    /** Returns the name for people, for example {@code Gaussian (scale 0.8)}, numbers to four significant digits; the id of a family that is not at hand. */
    public String label() {
        String title = KernelFamilies.byId(family).map(KernelFamily::title).orElse(family);
        String values = parameters.entrySet().stream().map(one -> one.getKey() + " " + rounded(one.getValue())).collect(Collectors.joining(", "));
        return values.isEmpty() ? title : title + " (" + values + ")";
    }

    private static String rounded(double value) {
        BigDecimal number = new BigDecimal(value, DIGITS).stripTrailingZeros();
        return number.scale() <= 0 && number.precision() - number.scale() < 7 ? number.toPlainString() : number.toString();
    }
}
