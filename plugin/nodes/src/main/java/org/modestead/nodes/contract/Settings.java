package org.modestead.nodes.contract;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/**
 * Settings of one step, checked against the declaration and completed with defaults. Made by
 * {@link SettingsReader}.
 *
 * <p>Asking for a key that the declaration lacks, or as another kind, is a programming error and throws
 * {@link IllegalArgumentException}.
 *
 * @param values by key: Double, Long, String, Boolean, {@code List<String>} or {@code List<Double>}; a setting that
 *     is not set and has no default is absent
 */
public record Settings(Map<String, Object> values) {

    /** Takes an immutable copy. */
    public Settings {
        values = Map.copyOf(values);
    }

    /** Returns a number that has a default or is required. */
    public double number(String key) {
        return findNumber(key).orElseThrow(() -> missing(key));
    }

    /** Returns a number that may be unset. */
    public OptionalDouble findNumber(String key) {
        return find(key, Double.class).map(OptionalDouble::of).orElseGet(OptionalDouble::empty);
    }

    /** Returns a whole number that has a default. */
    public int whole(String key) {
        return Math.toIntExact(findWhole(key).orElseThrow(() -> missing(key)));
    }

    /** Returns a whole number that may be unset. */
    public OptionalLong findWhole(String key) {
        return find(key, Long.class).map(OptionalLong::of).orElseGet(OptionalLong::empty);
    }

    /** Returns a text, choice, file or column; empty text when unset. */
    public String text(String key) {
        return find(key, String.class).orElse("");
    }

    /** Returns a flag. */
    public boolean flag(String key) {
        return find(key, Boolean.class).orElseThrow(() -> missing(key));
    }

    /** Returns a list of texts or columns; empty when unset. */
    public List<String> texts(String key) {
        return list(key, String.class);
    }

    /** Returns a list of numbers; empty when unset. */
    public List<Double> numbers(String key) {
        return list(key, Double.class);
    }

    private <T> List<T> list(String key, Class<T> type) {
        return find(key, List.class).map(found -> ((List<?>) found).stream().map(type::cast).toList()).orElse(List.of());
    }

    private <T> Optional<T> find(String key, Class<T> type) {
        Object value = values.get(key);
        if (value != null && !type.isInstance(value)) {
            throw new IllegalArgumentException("setting " + key + " is a " + value.getClass().getSimpleName() + ", not a "
                    + type.getSimpleName());
        }
        return Optional.ofNullable(value).map(type::cast);
    }

    private static IllegalArgumentException missing(String key) {
        return new IllegalArgumentException("setting " + key + " has no value");
    }
}
