package org.knime.core.data;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface DoubleValue extends DataValue {
    double getDoubleValue();
}
