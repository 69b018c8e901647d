package org.knime.core.node.config.base;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface ConfigBaseWO {
    void addInt(String key, int value);

    void addDouble(String key, double value);

    void addLong(String key, long value);

    void addString(String key, String value);

    void addBoolean(String key, boolean value);

    void addDoubleArray(String key, double... values);

    void addStringArray(String key, String... values);

    void addLongArray(String key, long... values);

    void addIntArray(String key, int... values);
}
