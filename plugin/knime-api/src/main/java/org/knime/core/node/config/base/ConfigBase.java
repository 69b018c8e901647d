package org.knime.core.node.config.base;

import java.io.IOException;
import java.io.OutputStream;
import java.util.Iterator;
import java.util.Set;
import org.knime.core.node.InvalidSettingsException;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class ConfigBase implements ConfigBaseRO, ConfigBaseWO {
    @Override
    public int getInt(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public int getInt(final String key, final int def) {
        throw new UnsupportedOperationException();
    }

    @Override
    public void addInt(final String key, final int value) {
        throw new UnsupportedOperationException();
    }

    @Override
    public double getDouble(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public double getDouble(final String key, final double def) {
        throw new UnsupportedOperationException();
    }

    @Override
    public void addDouble(final String key, final double value) {
        throw new UnsupportedOperationException();
    }

    @Override
    public long getLong(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public long getLong(final String key, final long def) {
        throw new UnsupportedOperationException();
    }

    @Override
    public void addLong(final String key, final long value) {
        throw new UnsupportedOperationException();
    }

    @Override
    public String getString(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public String getString(final String key, final String def) {
        throw new UnsupportedOperationException();
    }

    @Override
    public void addString(final String key, final String value) {
        throw new UnsupportedOperationException();
    }

    @Override
    public boolean getBoolean(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public boolean getBoolean(final String key, final boolean def) {
        throw new UnsupportedOperationException();
    }

    @Override
    public void addBoolean(final String key, final boolean value) {
        throw new UnsupportedOperationException();
    }

    @Override
    public double[] getDoubleArray(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public void addDoubleArray(final String key, final double... values) {
        throw new UnsupportedOperationException();
    }

    @Override
    public String[] getStringArray(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public void addStringArray(final String key, final String... values) {
        throw new UnsupportedOperationException();
    }

    @Override
    public long[] getLongArray(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public void addLongArray(final String key, final long... values) {
        throw new UnsupportedOperationException();
    }

    @Override
    public float[] getFloatArray(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public int[] getIntArray(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public void addIntArray(final String key, final int... values) {
        throw new UnsupportedOperationException();
    }

    @Override
    public String getKey() {
        throw new UnsupportedOperationException();
    }

    @Override
    public Set<String> keySet() {
        throw new UnsupportedOperationException();
    }

    @Override
    public boolean containsKey(final String key) {
        throw new UnsupportedOperationException();
    }

    @Override
    public void saveToXML(final OutputStream out) throws IOException {
        throw new UnsupportedOperationException();
    }

    @Override
    public Iterator<String> iterator() {
        throw new UnsupportedOperationException();
    }
}
