package org.knime.core.node.config.base;

import java.io.IOException;
import java.io.OutputStream;
import java.util.Set;
import org.knime.core.node.InvalidSettingsException;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface ConfigBaseRO extends Iterable<String> {
    int getInt(String key) throws InvalidSettingsException;

    int getInt(String key, int def);

    double getDouble(String key) throws InvalidSettingsException;

    double getDouble(String key, double def);

    long getLong(String key) throws InvalidSettingsException;

    long getLong(String key, long def);

    String getString(String key) throws InvalidSettingsException;

    String getString(String key, String def);

    boolean getBoolean(String key) throws InvalidSettingsException;

    boolean getBoolean(String key, boolean def);

    double[] getDoubleArray(String key) throws InvalidSettingsException;

    String[] getStringArray(String key) throws InvalidSettingsException;

    long[] getLongArray(String key) throws InvalidSettingsException;

    float[] getFloatArray(String key) throws InvalidSettingsException;

    int[] getIntArray(String key) throws InvalidSettingsException;

    String getKey();

    Set<String> keySet();

    boolean containsKey(String key);

    void saveToXML(OutputStream out) throws IOException;
}
