package org.modestead.knime.trial;

import java.util.Arrays;
import java.util.stream.Stream;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeSettings;

/** Writes one stored setting. The path to it has its parts separated by slashes. */
final class StoredSetting {

    private StoredSetting() {}

    /**
     * Replaces a value.
     *
     * @param root settings of a node
     * @param path keys separated by slashes, folders first
     * @param type text, number, whole, int, flag, texts or numbers
     * @param value as text; the parts of a list are separated by {@code |}
     */
    static void write(NodeSettings root, String path, String type, String value) throws InvalidSettingsException {
        String[] keys = path.split("/");
        NodeSettings folder = root;
        for (String key : Arrays.copyOf(keys, keys.length - 1)) {
            folder = folder.containsKey(key) ? folder.getNodeSettings(key) : (NodeSettings) folder.addNodeSettings(key);
        }
        String key = keys[keys.length - 1];
        switch (type) {
            case "text" -> folder.addString(key, value);
            case "number" -> folder.addDouble(key, Double.parseDouble(value));
            case "whole" -> folder.addLong(key, Long.parseLong(value));
            case "int" -> folder.addInt(key, Integer.parseInt(value));
            case "flag" -> folder.addBoolean(key, Boolean.parseBoolean(value));
            case "texts" -> folder.addStringArray(key, parts(value).toArray(String[]::new));
            case "numbers" -> folder.addDoubleArray(key, parts(value).mapToDouble(Double::parseDouble).toArray());
            default -> throw new IllegalArgumentException("no type " + type);
        }
    }

    private static Stream<String> parts(String value) {
        return value.isEmpty() ? Stream.empty() : Stream.of(value.split("[|]", -1));
    }
}
