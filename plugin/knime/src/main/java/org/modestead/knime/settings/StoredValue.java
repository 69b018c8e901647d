package org.modestead.knime.settings;

import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.stream.IntStream;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeSettingsRO;

/** Reads one native key as a wanted type, or as whatever it is; empty where that is not stored. */
final class StoredValue {

    private StoredValue() {}

    /** Reads one native type. */
    private interface Getter<T> {
        T get() throws InvalidSettingsException;
    }

    static Optional<Double> number(NodeSettingsRO from, String key) {
        return tried(() -> from.getDouble(key)).or(() -> whole(from, key).map(Long::doubleValue));
    }

    static Optional<Long> whole(NodeSettingsRO from, String key) {
        return tried(() -> from.getLong(key)).or(() -> tried(() -> from.getInt(key)).map(Integer::longValue));
    }

    static Optional<Boolean> flag(NodeSettingsRO from, String key) {
        return tried(() -> from.getBoolean(key));
    }

    static Optional<String> text(NodeSettingsRO from, String key) {
        return tried(() -> from.getString(key));
    }

    static Optional<List<String>> texts(NodeSettingsRO from, String key) {
        return tried(() -> from.getStringArray(key)).map(array -> Arrays.stream(array).filter(Objects::nonNull).toList());
    }

    static Optional<List<Double>> numbers(NodeSettingsRO from, String key) {
        return tried(() -> from.getDoubleArray(key)).map(array -> Arrays.stream(array).boxed().toList())
                .or(() -> tried(() -> from.getIntArray(key)).map(array -> Arrays.stream(array).asDoubleStream().boxed().toList()))
                .or(() -> tried(() -> from.getFloatArray(key)).map(StoredValue::doubles));
    }

    /** The platform takes a list that was stored empty for one of the narrowest type, and writes a variable's numbers there so. */
    private static List<Double> doubles(float[] narrow) {
        return IntStream.range(0, narrow.length).mapToObj(i -> Double.valueOf(Float.toString(narrow[i]))).toList();
    }

    /** Returns the value as whatever native type it has. */
    static Optional<Object> any(NodeSettingsRO from, String key) {
        return text(from, key).map(Object.class::cast)
                .or(() -> flag(from, key))
                .or(() -> whole(from, key))
                .or(() -> number(from, key))
                .or(() -> texts(from, key).filter(list -> !list.isEmpty()))
                .or(() -> numbers(from, key));
    }

    private static <T> Optional<T> tried(Getter<T> getter) {
        try {
            return Optional.ofNullable(getter.get());
        } catch (InvalidSettingsException anotherType) {
            return Optional.empty();
        }
    }
}
