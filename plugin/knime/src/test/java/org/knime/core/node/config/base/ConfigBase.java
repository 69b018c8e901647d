package org.knime.core.node.config.base;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.Map;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.IntStream;
import org.knime.core.node.InvalidSettingsException;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public abstract class ConfigBase implements ConfigBaseRO, ConfigBaseWO {

    private final String name;
    protected final Map<String, Object> entries = new LinkedHashMap<>();

    protected ConfigBase(final String name) {
        this.name = name;
    }

    protected abstract ConfigBase child(String key);

    private <T> T get(final String key, final Class<T> type) throws InvalidSettingsException {
        if (!entries.containsKey(key)) {
            throw new InvalidSettingsException("no entry " + key);
        } else if (entries.get(key) != null && !type.isInstance(entries.get(key))) {
            throw new InvalidSettingsException(key + " is no " + type.getSimpleName());
        }
        return type.cast(entries.get(key));
    }

    private <T> T or(final String key, final Class<T> type, final T def) {
        try {
            return get(key, type);
        } catch (InvalidSettingsException missing) {
            return def;
        }
    }

    private <T> T[] array(final String key, final Class<T> type, final Function<Integer, T[]> maker) throws InvalidSettingsException {
        ConfigBase array = get(key, ConfigBase.class);
        T[] all = maker.apply(array.get("array-size", Integer.class));
        for (int i = 0; i < all.length; i++) {
            all[i] = array.get(Integer.toString(i), type);
        }
        return all;
    }

    private void add(final String key, final Object[] values) {
        ConfigBase array = child(key);
        array.entries.put("array-size", values.length);
        IntStream.range(0, values.length).forEach(i -> array.entries.put(Integer.toString(i), values[i]));
        entries.put(key, array);
    }

    @Override
    public int getInt(final String key) throws InvalidSettingsException {
        return get(key, Integer.class);
    }

    @Override
    public int getInt(final String key, final int def) {
        return or(key, Integer.class, def);
    }

    @Override
    public void addInt(final String key, final int value) {
        entries.put(key, value);
    }

    @Override
    public double getDouble(final String key) throws InvalidSettingsException {
        return get(key, Double.class);
    }

    @Override
    public double getDouble(final String key, final double def) {
        return or(key, Double.class, def);
    }

    @Override
    public void addDouble(final String key, final double value) {
        entries.put(key, value);
    }

    @Override
    public long getLong(final String key) throws InvalidSettingsException {
        return get(key, Long.class);
    }

    @Override
    public long getLong(final String key, final long def) {
        return or(key, Long.class, def);
    }

    @Override
    public void addLong(final String key, final long value) {
        entries.put(key, value);
    }

    @Override
    public String getString(final String key) throws InvalidSettingsException {
        return get(key, String.class);
    }

    @Override
    public String getString(final String key, final String def) {
        return or(key, String.class, def);
    }

    @Override
    public void addString(final String key, final String value) {
        entries.put(key, value);
    }

    @Override
    public boolean getBoolean(final String key) throws InvalidSettingsException {
        return get(key, Boolean.class);
    }

    @Override
    public boolean getBoolean(final String key, final boolean def) {
        return or(key, Boolean.class, def);
    }

    @Override
    public void addBoolean(final String key, final boolean value) {
        entries.put(key, value);
    }

    @Override
    public double[] getDoubleArray(final String key) throws InvalidSettingsException {
        return Arrays.stream(array(key, Double.class, Double[]::new)).mapToDouble(value -> value).toArray();
    }

    @Override
    public void addDoubleArray(final String key, final double... values) {
        add(key, Arrays.stream(values).boxed().toArray());
    }

    @Override
    public String[] getStringArray(final String key) throws InvalidSettingsException {
        return array(key, String.class, String[]::new);
    }

    @Override
    public void addStringArray(final String key, final String... values) {
        add(key, values);
    }

    @Override
    public long[] getLongArray(final String key) throws InvalidSettingsException {
        return Arrays.stream(array(key, Long.class, Long[]::new)).mapToLong(value -> value).toArray();
    }

    @Override
    public void addLongArray(final String key, final long... values) {
        add(key, Arrays.stream(values).boxed().toArray());
    }

    @Override
    public float[] getFloatArray(final String key) throws InvalidSettingsException {
        Float[] boxed = array(key, Float.class, Float[]::new);
        float[] values = new float[boxed.length];
        for (int i = 0; i < values.length; i++) {
            values[i] = boxed[i];
        }
        return values;
    }

    /** As the platform writes it where a variable replaces a list that was stored empty. */
    public void addFloatArray(final String key, final float... values) {
        Object[] boxed = new Object[values.length];
        for (int i = 0; i < values.length; i++) {
            boxed[i] = values[i];
        }
        add(key, boxed);
    }

    @Override
    public int[] getIntArray(final String key) throws InvalidSettingsException {
        return Arrays.stream(array(key, Integer.class, Integer[]::new)).mapToInt(value -> value).toArray();
    }

    @Override
    public void addIntArray(final String key, final int... values) {
        add(key, Arrays.stream(values).boxed().toArray());
    }

    @Override
    public String getKey() {
        return name;
    }

    @Override
    public Set<String> keySet() {
        return new LinkedHashSet<>(entries.keySet());
    }

    @Override
    public boolean containsKey(final String key) {
        return entries.containsKey(key);
    }

    @Override
    public Iterator<String> iterator() {
        return entries.keySet().iterator();
    }

    /** In the platform's form. */
    @Override
    public void saveToXML(final OutputStream out) throws IOException {
        String head = "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n<config xmlns=\"http://www.knime.org/2008/09/XMLConfig\" key=\"" + name + "\">\n";
        out.write((head + inner("    ") + "</config>\n").getBytes(StandardCharsets.UTF_8));
    }

    private String inner(final String indent) {
        StringBuilder xml = new StringBuilder();
        entries.forEach((key, value) -> {
            if (value instanceof ConfigBase config) {
                xml.append(indent).append("<config key=\"").append(escaped(key)).append("\">\n").append(config.inner(indent + "    "))
                        .append(indent).append("</config>\n");
            } else {
                xml.append(indent).append("<entry key=\"").append(escaped(key)).append("\" type=\"x").append(type(value))
                        .append("\" value=\"").append(escaped(String.valueOf(value))).append("\"/>\n");
            }
        });
        return xml.toString();
    }

    private static String type(final Object value) {
        return value instanceof Integer ? "int" : value == null ? "string" : value.getClass().getSimpleName().toLowerCase(java.util.Locale.ROOT);
    }

    private static String escaped(final String text) {
        return text.replace("&", "&amp;").replace("<", "&lt;").replace("\"", "&quot;").replace("\n", "&#10;");
    }
}
